"use client";

import Link from "next/link";
import { useState } from "react";
import { CONTROL } from "../../../_ui/field";
import { LocalTime } from "../../../_ui/local-time";
import { EmptyState } from "../../../_ui/states";
import { PageHead } from "../../_parts/page-head";
import type { TeamChoice } from "../../_shell/team-choices";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListFilter, ListTools } from "../../_table/list-tools";
import { TeamFilter } from "../../_table/shared-columns";
import { useList } from "../../_table/use-list";
import type { ListState } from "../../_table/use-list-state";
import { ActDialog } from "./act-dialog";
import {
  ACT_KINDS,
  actionWords,
  ACTOR_KINDS,
  type ActShown,
  subjectName,
  subjectPage,
} from "./activity-words";
import { changesLine } from "./told-changes";

const FILTERS = ["team", "kind", "actor", "subject", "from", "to"] as const;

interface ActivityListProps {
  readonly teams: readonly TeamChoice[];
  /** Whether everything is shown, or the acts of the reader's teams. */
  readonly all: boolean;
}

/** Who did what, newest first; nothing in it can be changed or removed. */
export function ActivityList({ teams, all }: ActivityListProps) {
  const { state, table } = useList<ActShown>("activity", {
    sort: "-at",
    filters: FILTERS,
    refreshMs: 30_000,
  });
  const [open, setOpen] = useState<ActShown | null>(null);
  const columns = columnsFor(setOpen);

  return (
    <>
      <PageHead title="Activity">
        {all ? "Every change, by whom and from where." : "Changes of your teams, and your own."} Entries
        cannot be altered.
      </PageHead>
      <ListTools state={state} columns={columns} searches="who, what, id" csv="activity">
        <TeamFilter state={state} teams={teams} />
        <ListFilter state={state} name="kind" label="About" options={ACT_KINDS} />
        <ListFilter state={state} name="actor" label="By" options={ACTOR_KINDS} />
        <DayFilter state={state} name="from" label="From (UTC)" />
        <DayFilter state={state} name="to" label="To (UTC)" />
      </ListTools>
      <ConsoleTable
        caption="Activity"
        columns={columns}
        {...table}
        rowKey={({ id }) => id}
        empty={
          <EmptyState title="Nothing yet">Changes are listed here as soon as somebody makes one.</EmptyState>
        }
      />
      {open ? <ActDialog act={open} onClose={() => setOpen(null)} /> : null}
    </>
  );
}

function DayFilter({
  state,
  name,
  label,
}: {
  readonly state: ListState;
  readonly name: string;
  readonly label: string;
}) {
  return (
    <label className="block text-table">
      <span className="block text-small text-ink-soft">{label}</span>
      <input
        type="date"
        value={state.filter(name)}
        onChange={(event) => state.change({ filters: { [name]: event.target.value } })}
        className={`${CONTROL} max-w-20`}
      />
    </label>
  );
}

function columnsFor(onOpen: (act: ActShown) => void): readonly ListColumn<ActShown>[] {
  return [
    { id: "at", title: "When", sortable: true, fixed: true, cell: ({ at }) => <LocalTime at={at} /> },
    {
      id: "actor",
      title: "Who",
      fixed: true,
      cell: ({ actor }) => (
        <>
          {actor.name}
          {actor.kind === "key" ? <span className="text-ink-soft"> (key)</span> : null}
        </>
      ),
    },
    {
      id: "action",
      title: "What",
      fixed: true,
      cell: (act) => <What act={act} onOpen={onOpen} />,
    },
    { id: "team", title: "Team", from: "medium", cell: ({ team }) => team?.name ?? "" },
    { id: "address", title: "From", from: "wide", cell: ({ address }) => <code>{address ?? ""}</code> },
    { id: "subject", title: "Id", from: "extra", cell: ({ subject }) => <code>{subject.id}</code> },
  ];
}

function What({ act, onOpen }: { readonly act: ActShown; readonly onOpen: (act: ActShown) => void }) {
  const page = subjectPage(act);
  const line = changesLine(act);
  const own = act.subject.id === act.actor.id;
  return (
    <>
      <button
        type="button"
        onClick={() => onOpen(act)}
        className="link min-h-3 cursor-pointer rounded text-start"
      >
        {actionWords(act.action)}
        {own || page ? null : <span className="[overflow-wrap:anywhere]"> {subjectName(act)}</span>}
      </button>{" "}
      {!own && page ? (
        <Link className="link inline-block min-h-3 min-w-3 [overflow-wrap:anywhere]" href={page}>
          {subjectName(act)}
        </Link>
      ) : null}
      {line ? <span className="block text-small text-ink-soft [overflow-wrap:anywhere]">{line}</span> : null}
    </>
  );
}

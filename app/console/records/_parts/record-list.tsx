"use client";

import Link from "next/link";
import { useMemo, useState } from "react";
import { RotateCw } from "lucide-react";
import { Button, ButtonLink } from "../../../_ui/button";
import { LocalTime } from "../../../_ui/local-time";
import { EmptyState } from "../../../_ui/states";
import { operationText } from "../../_parts/numbers";
import { NoTeamYet } from "../../_parts/no-team-yet";
import { PageHead } from "../../_parts/page-head";
import type { TeamChoice } from "../../_shell/team-choices";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListFilter, ListTools } from "../../_table/list-tools";
import { columnsForTeams, TeamFilter, teamColumn } from "../../_table/shared-columns";
import { useList } from "../../_table/use-list";
import { DriftWord } from "./drift-word";
import { LabelCell } from "./label-cell";
import { useReplays } from "./use-replays";

export interface ListedRecord {
  readonly id: string;
  readonly teamId: string;
  readonly teamName: string;
  readonly operation: string;
  readonly label: string;
  readonly shape: string | null;
  readonly createdAt: string;
  readonly byName: string;
  readonly engine: string;
  readonly resistance: string | null;
}

const FILTERS = ["team", "operation", "material", "shape"];
const OPERATIONS = ["resistance", "sizing", "network", "field"].map((value) => ({
  value,
  label: operationText(value),
}));

interface RecordListProps {
  readonly teams: readonly TeamChoice[];
  /** Ids of the teams whose records the person may relabel, replay and delete. */
  readonly managed: readonly string[];
}

/** Stored calculations: found, relabelled, replayed. */
export function RecordList({ teams, managed }: RecordListProps) {
  const { state, table, data, mutate } = useList<ListedRecord>("records", {
    sort: "-createdAt",
    size: 25,
    filters: FILTERS,
  });
  const { replays, running, replayAll } = useReplays();
  const [relabelling, setRelabelling] = useState<string | null>(null);
  const replayable = (data?.rows ?? []).filter(
    ({ operation, teamId }) => operation === "resistance" && managed.includes(teamId),
  );
  const columns = useMemo((): readonly ListColumn<ListedRecord>[] => {
    const all: readonly ListColumn<ListedRecord>[] = [
      {
        id: "label",
        title: "Label",
        sortable: true,
        fixed: true,
        cell: (record) => (
          <LabelCell
            record={record}
            mayManage={managed.includes(record.teamId)}
            open={relabelling === record.id}
            onOpen={(open) => setRelabelling(open ? record.id : null)}
            mutate={mutate}
          />
        ),
      },
      {
        id: "resistance",
        title: "Resistance",
        align: "end",
        cell: ({ resistance }) => resistance ?? "–",
      },
      {
        id: "drift",
        title: "Replay",
        cell: ({ id, operation }) => <DriftWord replay={replays.get(id)} operation={operation} id={id} />,
      },
      { id: "shape", title: "Shape", sortable: true, from: "medium", cell: ({ shape }) => shape ?? "–" },
      {
        id: "operation",
        title: "Operation",
        sortable: true,
        from: "extra",
        cell: ({ operation }) => operationText(operation),
      },
      teamColumn("wide"),
      {
        id: "createdAt",
        title: "Stored",
        sortable: true,
        from: "medium",
        cell: ({ createdAt }) => <LocalTime at={createdAt} />,
      },
      { id: "by", title: "By", sortable: true, from: "wide", cell: ({ byName }) => byName },
      { id: "engine", title: "Engine", from: "extra", cell: ({ engine }) => engine },
    ];
    return columnsForTeams(all, teams.length > 1);
  }, [managed, mutate, relabelling, replays, teams.length]);
  const material = state.filter("material");
  return (
    <>
      <PageHead
        title="Records"
        actions={
          replayable.length > 0 ? (
            <Button onClick={() => void replayAll(replayable.map(({ id }) => id))} disabled={running}>
              <RotateCw aria-hidden size={16} />
              {running ? "Replaying …" : `Replay the ${replayable.length} shown`}
            </Button>
          ) : null
        }
      >
        Stored calculations of your teams. A replay computes one again with the material versions it pinned.
      </PageHead>
      {material !== "" ? (
        <p className="mb-1.5 text-table">
          Only those that used the material{" "}
          <Link className="link font-mono" href={`/console/materials/${material}`}>
            {material}
          </Link>
          .
        </p>
      ) : null}
      <ListTools state={state} columns={columns} searches="label, who" csv="records">
        <TeamFilter state={state} teams={teams} />
        <ListFilter state={state} name="operation" label="Operation" options={OPERATIONS} />
      </ListTools>
      <ConsoleTable
        caption="Records"
        columns={columns}
        {...table}
        rowKey={({ id }) => id}
        empty={
          teams.length === 0 ? (
            <NoTeamYet what="Records" />
          ) : (
            <EmptyState title="No records yet" action={<ButtonLink href="/calculate">Calculate</ButtonLink>}>
              Save an answer on the pages, or send <code>record</code> with a request.
            </EmptyState>
          )
        }
      />
    </>
  );
}

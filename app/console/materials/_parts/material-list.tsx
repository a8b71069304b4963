"use client";

import Link from "next/link";
import { useState } from "react";
import { Plus } from "lucide-react";
import { Button } from "../../../_ui/button";
import { EmptyState } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { countText } from "../../_parts/numbers";
import { PageHead } from "../../_parts/page-head";
import { StateWord } from "../../_parts/state-word";
import type { TeamChoice } from "../../_shell/team-choices";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListFilter, ListTools } from "../../_table/list-tools";
import { useList } from "../../_table/use-list";
import { KINDS, type ListedMaterial } from "./material";
import { MaterialDialog } from "./material-dialog";
import { resistivityText } from "./material-facts";

const COLUMNS: readonly ListColumn<ListedMaterial>[] = [
  {
    id: "name",
    title: "Name",
    sortable: true,
    fixed: true,
    cell: ({ id, name, retiredAt }) => (
      <>
        <Link className="link font-medium" href={`/console/materials/${id}`}>
          {name}
        </Link>{" "}
        {retiredAt ? <StateWord tone="bad">retired</StateWord> : null}
        <span className="block font-mono text-small text-ink-soft">{id}</span>
      </>
    ),
  },
  {
    id: "owner",
    title: "Owner",
    sortable: true,
    from: "medium",
    cell: ({ teamName }) => teamName ?? "library",
  },
  { id: "version", title: "Version", align: "end", from: "medium", cell: ({ version }) => version },
  { id: "kind", title: "Kind", sortable: true, from: "medium", cell: ({ kind }) => kind },
  {
    id: "resistivity",
    title: "Resistivity",
    sortable: true,
    align: "end",
    cell: ({ resistivityOhmM, atC }) => (
      <>
        {resistivityText(resistivityOhmM)}
        <span className="block text-small text-ink-soft">{`${Number(atC.toPrecision(4))}\u2009°C`}</span>
      </>
    ),
  },
  { id: "provenance", title: "Provenance", from: "wide", cell: ({ provenance }) => provenance },
  {
    id: "records",
    title: "Records",
    sortable: true,
    align: "end",
    from: "medium",
    cell: ({ id, records }) =>
      records === 0 ? (
        "0"
      ) : (
        <Link className="link" href={`/console/records?material=${id}`}>
          {countText(records)}
        </Link>
      ),
  },
];

const FILTERS = ["owner", "kind", "state"];

interface MaterialListProps {
  readonly teams: readonly TeamChoice[];
  readonly createFor: readonly TeamChoice[];
  readonly ownTeamId: string;
}

/** The library and the teams' own materials. */
export function MaterialList({ teams, createFor, ownTeamId }: MaterialListProps) {
  const { state, table, mutate } = useList<ListedMaterial>("materials", { sort: "name", filters: FILTERS });
  const [creating, setCreating] = useState(false);
  const toast = useToast();
  return (
    <>
      <PageHead
        title="Materials"
        actions={
          createFor.length > 0 ? (
            <Button variant="primary" onClick={() => setCreating(true)}>
              <Plus aria-hidden size={16} /> Add a material
            </Button>
          ) : null
        }
      >
        The library is the same everywhere; a team adds its own, and every change of one is a new version.
      </PageHead>
      <ListTools state={state} columns={COLUMNS} searches="name, id" csv="materials">
        <ListFilter
          state={state}
          name="owner"
          label="Owner"
          options={[
            { value: "library", label: "Library" },
            ...teams.map(({ id, name }) => ({ value: id, label: name })),
          ]}
        />
        <ListFilter
          state={state}
          name="kind"
          label="Kind"
          options={KINDS.map((kind) => ({ value: kind, label: kind }))}
        />
        <ListFilter
          state={state}
          name="state"
          label="State"
          options={[
            { value: "in-use", label: "In use" },
            { value: "retired", label: "Retired" },
          ]}
        />
      </ListTools>
      <ConsoleTable
        caption="Materials"
        columns={COLUMNS}
        {...table}
        rowKey={({ id }) => id}
        empty={<EmptyState title="No materials" />}
      />
      {creating ? (
        <MaterialDialog
          teams={createFor}
          ownTeamId={ownTeamId}
          onClose={() => setCreating(false)}
          onSaved={() => {
            setCreating(false);
            void mutate();
            toast("The material is stored; requests may name it at once.");
          }}
        />
      ) : null}
    </>
  );
}

"use client";

import Link from "next/link";
import { useSearchParams } from "next/navigation";
import { useState } from "react";
import type { EmbedRowView } from "@/lib/embeds/embed-list";
import { Button } from "../../_ui/button";
import { EmptyState } from "../../_ui/states";
import { countText } from "../_parts/numbers";
import { NoTeamYet } from "../_parts/no-team-yet";
import type { ListColumn } from "../_table/column";
import { ConsoleTable } from "../_table/console-table";
import { ListFilter, ListTools } from "../_table/list-tools";
import { madeColumn, teamColumn } from "../_table/shared-columns";
import { useList } from "../_table/use-list";
import { NewEmbed } from "./new-embed";
import { StateMark } from "./state-mark";

export interface ShapeChoice {
  readonly id: string;
  readonly title: string;
  readonly family: string;
}

interface EmbedListProps {
  /** Teams for which the person may make widgets. */
  readonly teams: readonly { readonly id: string; readonly name: string }[];
  /** Whether there is any team that the person sees. */
  readonly anyTeam: boolean;
  readonly ownTeam: string;
  readonly shapes: readonly ShapeChoice[];
}

const STATES = [
  { value: "draft", label: "Draft" },
  { value: "published", label: "Published" },
  { value: "withdrawn", label: "Withdrawn" },
];

const COLUMNS: readonly ListColumn<EmbedRowView>[] = [
  {
    id: "name",
    title: "Name",
    sortable: true,
    fixed: true,
    cell: ({ id, name }) => (
      <Link href={`/console/embeds/${id}`} className="link">
        {name}
      </Link>
    ),
  },
  {
    id: "state",
    title: "State",
    sortable: true,
    cell: ({ state, version }) => <StateMark state={state} version={version} />,
  },
  teamColumn(),
  {
    id: "requests",
    title: "Calls, 31 days",
    sortable: true,
    align: "end",
    cell: ({ requests }) => countText(requests),
  },
  {
    id: "remaining",
    title: "Left this month",
    sortable: true,
    align: "end",
    from: "medium",
    cell: ({ month }) => `${countText(month.remaining)} of ${countText(month.quota)}`,
  },
  {
    id: "origins",
    title: "Origins",
    from: "wide",
    cell: ({ origins }) => (origins.length === 0 ? "none yet" : origins.join(", ")),
  },
  madeColumn("Made", "wide"),
];

const FILTERS = ["state"];

/** The widgets of the person's teams, and the way to a new one. */
export function EmbedList({ teams, anyTeam, ownTeam, shapes }: EmbedListProps) {
  const { state, table } = useList<EmbedRowView>("embeds", { sort: "-createdAt", filters: FILTERS });
  // A calculation page leads here with its shape and its values.
  const address = useSearchParams();
  const wanted = shapes.find(({ id }) => id === address.get("shape"));
  // The outline page leads here with what it kept.
  const outlineId = address.get("outline") ?? undefined;
  const [making, setMaking] = useState(wanted !== undefined || outlineId !== undefined);
  const mayMake = teams.length > 0;
  return (
    <>
      <div className="mb-2 flex flex-wrap items-start gap-2">
        <div className="grow">
          <h1>Embeds</h1>
          <p className="mt-0.5 max-w-prose text-table text-ink-soft">
            Calculators of your team for intranet pages and wikis: one shape or outline, your own limits, in a
            frame.
          </p>
        </div>
        {mayMake ? (
          <Button variant="primary" onClick={() => setMaking(true)}>
            New embed
          </Button>
        ) : null}
      </div>
      <ListTools state={state} columns={COLUMNS} searches="name, id" csv="embeds">
        <ListFilter state={state} name="state" label="State" options={STATES} />
      </ListTools>
      <ConsoleTable
        caption="Embeds"
        columns={COLUMNS}
        {...table}
        rowKey={({ id }) => id}
        empty={
          anyTeam ? (
            <EmptyState title="No embeds yet">
              {mayMake
                ? "Make one: choose a shape or an outline, say what visitors may change, publish, and copy the snippet."
                : "Developers of your team make them; they will stand here."}
            </EmptyState>
          ) : (
            <NoTeamYet what="Embeds" />
          )
        }
      />
      {making && mayMake ? (
        <NewEmbed
          teams={teams}
          ownTeam={ownTeam}
          shapes={shapes}
          shape={wanted?.id}
          values={wanted ? Object.fromEntries(address) : {}}
          outlineId={wanted ? undefined : outlineId}
          onClose={() => setMaking(false)}
        />
      ) : null}
    </>
  );
}

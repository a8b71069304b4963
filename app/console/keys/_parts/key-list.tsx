"use client";

import Link from "next/link";
import { useMemo, useState } from "react";
import { Plus } from "lucide-react";
import { Button } from "../../../_ui/button";
import { LocalTime } from "../../../_ui/local-time";
import { EmptyState } from "../../../_ui/states";
import { Meter } from "../../_parts/meter";
import { clientText } from "../../_parts/numbers";
import { NoTeamYet } from "../../_parts/no-team-yet";
import { PageHead } from "../../_parts/page-head";
import type { TeamChoice } from "../../_shell/team-choices";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListFilter, ListTools } from "../../_table/list-tools";
import { columnsForTeams, madeColumn, TeamFilter, teamColumn } from "../../_table/shared-columns";
import { useList } from "../../_table/use-list";
import { IssueDialog } from "./issue-dialog";
import type { Key } from "./key";
import { KeyState } from "./key-state";

const COLUMNS: readonly ListColumn<Key>[] = [
  {
    id: "name",
    title: "Name",
    sortable: true,
    fixed: true,
    cell: ({ id, name }) => (
      <>
        <Link className="link font-medium" href={`/console/keys/${id}`}>
          {name}
        </Link>
        <span className="block font-mono text-small text-ink-soft">{id}</span>
      </>
    ),
  },
  {
    id: "state",
    title: "State",
    cell: ({ state, expiresAt }) => <KeyState state={state} expiresAt={expiresAt} />,
  },
  teamColumn(),
  {
    id: "month",
    title: "This month",
    sortable: true,
    cell: ({ monthUsed, quotas }) => <Meter used={monthUsed} quota={quotas.month} what="computations" />,
  },
  {
    id: "lastUsedAt",
    title: "Last use",
    sortable: true,
    from: "medium",
    cell: ({ lastUsedAt, lastClient }) =>
      lastUsedAt === null ? (
        <span className="text-ink-soft">never</span>
      ) : (
        <>
          <LocalTime at={lastUsedAt} />
          {lastClient ? (
            <span className="block text-small text-ink-soft">{clientText(lastClient)}</span>
          ) : null}
        </>
      ),
  },
  {
    id: "expiresAt",
    title: "Expires",
    sortable: true,
    from: "wide",
    cell: ({ expiresAt }) =>
      expiresAt === null ? <span className="text-ink-soft">never</span> : <LocalTime at={expiresAt} />,
  },
  {
    id: "scopes",
    title: "Scopes",
    from: "extra",
    cell: ({ scopes }) => <span className="font-mono text-small">{scopes.join(" ")}</span>,
  },
  madeColumn("Issued", "extra"),
];

const STATES = [
  { value: "active", label: "Active" },
  { value: "expiring", label: "Expiring soon" },
  { value: "expired", label: "Expired" },
  { value: "revoked", label: "Revoked" },
];

const FILTERS = ["team", "state"];

interface KeyListProps {
  readonly teams: readonly TeamChoice[];
  /** Teams for which the person may issue keys; none: the person only looks. */
  readonly issueFor: readonly TeamChoice[];
  readonly ownTeamId: string;
}

/** All keys of the person's teams. */
export function KeyList({ teams, issueFor, ownTeamId }: KeyListProps) {
  const { state, table, mutate } = useList<Key>("keys", { sort: "-createdAt", filters: FILTERS });
  const [issuing, setIssuing] = useState(false);
  const columns = useMemo(() => columnsForTeams(COLUMNS, teams.length > 1), [teams.length]);
  const issue =
    issueFor.length > 0 ? (
      <Button variant="primary" onClick={() => setIssuing(true)}>
        <Plus aria-hidden size={16} /> Issue a key
      </Button>
    ) : null;
  return (
    <>
      <PageHead title="Keys" actions={issue}>
        A program calls the API with a key of its team. A revoked key stays listed for the usage that names
        it.
      </PageHead>
      <ListTools state={state} columns={columns} searches="name, id, issuer" csv="keys">
        <TeamFilter state={state} teams={teams} />
        <ListFilter state={state} name="state" label="State" options={STATES} />
      </ListTools>
      <ConsoleTable
        caption="Keys"
        columns={columns}
        {...table}
        rowKey={({ id }) => id}
        empty={
          teams.length === 0 ? (
            <NoTeamYet what="Keys" />
          ) : (
            <EmptyState title="No keys yet">
              {issueFor.length > 0
                ? "Issue the first one: it is shown once, ready to copy into a script."
                : "A developer of your team can issue one."}
            </EmptyState>
          )
        }
      />
      {issuing ? (
        <IssueDialog
          teams={issueFor}
          ownTeamId={ownTeamId}
          onClose={() => setIssuing(false)}
          onIssued={() => void mutate()}
        />
      ) : null}
    </>
  );
}

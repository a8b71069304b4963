"use client";

import { useMemo, useState } from "react";
import { Button } from "../../../_ui/button";
import { LocalTime } from "../../../_ui/local-time";
import { EmptyState } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { ConfirmDialog } from "../../_parts/confirm-dialog";
import { PageHead } from "../../_parts/page-head";
import { StateWord } from "../../_parts/state-word";
import { callConsole } from "../../_shell/call-console";
import { useConsole } from "../../_shell/use-console";
import type { ListColumn } from "../../_table/column";
import { ConsoleTable } from "../../_table/console-table";
import { ListFilter, ListTools } from "../../_table/list-tools";
import { TeamFilter } from "../../_table/shared-columns";
import { useList } from "../../_table/use-list";
import { InviteDialog } from "./invite-dialog";
import { type PersonShown, ROLE_CHOICES, type TeamShown } from "./person";
import { PersonDialog } from "./person-dialog";

interface PeopleListProps {
  /** Whether the reader may invite, change and remove. */
  readonly manages: boolean;
  readonly selfId: string;
}

const FILTERS = ["team", "role", "state"] as const;

type Open =
  { readonly kind: "invite" } | { readonly kind: "change" | "remove"; readonly person: PersonShown };

/** Who may sign in, with what role, for which teams. */
export function PeopleList({ manages, selfId }: PeopleListProps) {
  const { state, table, mutate } = useList<PersonShown>("people", { sort: "name", filters: FILTERS });
  const { data: teams, mutate: mutateTeams } = useConsole<{ rows: readonly TeamShown[] }>("teams");
  const [open, setOpen] = useState<Open | null>(null);
  const say = useToast();
  const columns = useMemo(() => columnsFor(manages, selfId, setOpen), [manages, selfId]);

  async function refresh(what?: string) {
    if (what) say(what);
    await Promise.all([mutate(), mutateTeams()]);
  }

  async function remove(person: PersonShown) {
    await callConsole("DELETE", `people/${person.id}`);
    setOpen(null);
    await refresh(`${person.name} is removed.`);
  }

  return (
    <>
      <PageHead
        title="People"
        actions={
          manages ? (
            <Button variant="primary" onClick={() => setOpen({ kind: "invite" })}>
              Invite
            </Button>
          ) : undefined
        }
      >
        {manages ? undefined : "Those who belong to your teams."}
      </PageHead>
      <ListTools state={state} columns={columns} searches="name, e-mail" csv="people">
        <TeamFilter state={state} teams={teams?.rows ?? []} />
        <ListFilter state={state} name="role" label="Role" options={ROLE_CHOICES} />
        <ListFilter
          state={state}
          name="state"
          label="State"
          options={[
            { value: "active", label: "active" },
            { value: "invited", label: "invited" },
          ]}
        />
      </ListTools>
      <ConsoleTable
        caption="People"
        columns={columns}
        {...table}
        rowKey={({ id }) => id}
        empty={<EmptyState title="Nobody belongs to your teams">An administrator sets who does.</EmptyState>}
      />
      {open?.kind === "invite" ? (
        <InviteDialog
          teams={teams?.rows ?? []}
          onClose={() => setOpen(null)}
          onInvited={() => void refresh()}
        />
      ) : null}
      {open?.kind === "change" ? (
        <PersonDialog
          person={open.person}
          teams={teams?.rows ?? []}
          onClose={() => setOpen(null)}
          onChanged={(what) => void refresh(what)}
          onRemove={() => setOpen({ kind: "remove", person: open.person })}
        />
      ) : null}
      {open?.kind === "remove" ? (
        <ConfirmDialog
          title={`Remove ${open.person.name}?`}
          action="Remove"
          onConfirm={() => remove(open.person)}
          onClose={() => setOpen(null)}
        >
          <p>
            {sessionsText(open.person.sessions)} Keys, embeds, materials and records stay with{" "}
            {open.person.teams.map(({ name }) => name).join(", ") || "the teams"}, and programs go on calling.
          </p>
          <p className="mt-1">
            A new invitation to {open.person.email} brings the account back, without its password and teams.
          </p>
        </ConfirmDialog>
      ) : null}
    </>
  );
}

function sessionsText(sessions: number): string {
  if (sessions === 0) return "No device is signed in at the moment.";
  return sessions === 1 ? "One device is signed out at once." : `${sessions} devices are signed out at once.`;
}

function columnsFor(
  manages: boolean,
  selfId: string,
  onOpen: (open: Open) => void,
): readonly ListColumn<PersonShown>[] {
  return [
    {
      id: "name",
      title: "Name",
      sortable: true,
      fixed: true,
      cell: (person) => (
        <>
          {manages ? (
            <button
              type="button"
              onClick={() => onOpen({ kind: "change", person })}
              className="link cursor-pointer rounded text-start font-medium"
            >
              {person.name}
            </button>
          ) : (
            <span className="font-medium">{person.name}</span>
          )}
          {person.id === selfId ? <span className="text-ink-soft"> (you)</span> : null}
        </>
      ),
    },
    { id: "email", title: "E-mail", sortable: true, from: "medium", cell: ({ email }) => email },
    { id: "role", title: "Role", sortable: true, cell: ({ role }) => role },
    { id: "teams", title: "Teams", cell: ({ teams }) => teams.map(({ name }) => name).join(", ") || "none" },
    {
      id: "state",
      title: "State",
      sortable: true,
      from: "medium",
      cell: ({ state }) => <StateWord tone={state === "active" ? "good" : "plain"}>{state}</StateWord>,
    },
    {
      id: "lastSeenAt",
      title: "Last seen",
      sortable: true,
      from: "wide",
      cell: ({ lastSeenAt }) => (lastSeenAt ? <LocalTime at={lastSeenAt} /> : "not signed in"),
    },
    {
      id: "createdAt",
      title: "Added",
      sortable: true,
      from: "extra",
      cell: ({ createdAt }) => <LocalTime at={createdAt} />,
    },
  ];
}

"use client";

import { type FormEvent, useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { SessionList, type SessionShown } from "../../_parts/session-list";
import { callConsole } from "../../_shell/call-console";
import { useConsole } from "../../_shell/use-console";
import { useFormErrors } from "../../_shell/use-form-errors";
import { InvitationLink } from "./invite-dialog";
import type { InvitedShown, PersonShown, TeamShown } from "./person";
import { PersonFields, readPersonFields } from "./person-fields";

interface PersonDialogProps {
  readonly person: PersonShown;
  readonly teams: readonly TeamShown[];
  readonly onClose: () => void;
  /** Something was changed; what it was, in a sentence. */
  readonly onChanged: (what: string) => void;
  readonly onRemove: () => void;
}

/** One person: name, role, teams, devices, invitation, removal. */
export function PersonDialog({ person, teams, onClose, onChanged, onRemove }: PersonDialogProps) {
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    setBusy(true);
    errors.clear();
    try {
      await callConsole("PATCH", `people/${person.id}`, readPersonFields(form));
      onChanged(`${person.name} is changed.`);
      onClose();
    } catch (error) {
      errors.take(error, form);
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={person.name}
      description={person.email}
      actions={
        <>
          <Button variant="danger" onClick={onRemove}>
            Remove …
          </Button>
          <span className="grow" />
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form="person" disabled={busy}>
            Save
          </Button>
        </>
      }
    >
      <form id="person" method="post" onSubmit={submit} noValidate>
        <PersonFields
          name={person.name}
          role={person.role}
          teamIds={person.teams.map(({ id }) => id)}
          teams={teams}
          errorOf={errors.of}
        />
        <div role="alert">{errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}</div>
      </form>
      {person.state === "invited" ? (
        <InviteAgain person={person} />
      ) : (
        <Devices person={person} onChanged={onChanged} />
      )}
    </Dialog>
  );
}

function InviteAgain({ person }: { readonly person: PersonShown }) {
  const [invited, setInvited] = useState<InvitedShown | null>(null);
  return (
    <section className="mt-2 border-t border-rule pt-1.5">
      <h3 className="text-table">Invitation</h3>
      <p className="mb-1 text-table text-ink-soft">
        {person.name} has not chosen a password yet. A new link ends the one before.
      </p>
      {invited ? (
        <InvitationLink invited={invited} />
      ) : (
        <Button
          onClick={async () =>
            setInvited(await callConsole<InvitedShown>("POST", `people/${person.id}/invitation`))
          }
        >
          Make a new link
        </Button>
      )}
    </section>
  );
}

function Devices({ person, onChanged }: Pick<PersonDialogProps, "person" | "onChanged">) {
  const path = `people/${person.id}/sessions`;
  const { data, error, mutate } = useConsole<{ rows: readonly SessionShown[] }>(path);
  const others = data?.rows.filter(({ current }) => !current) ?? [];

  async function end(what: string) {
    await callConsole("DELETE", what);
    await mutate();
    onChanged("Signed out there.");
  }

  return (
    <section className="mt-2 border-t border-rule pt-1.5">
      <div className="mb-1 flex items-center gap-1">
        <h3 className="grow text-table">Signed in on</h3>
        {others.length > 1 ? (
          <Button variant="quiet" onClick={() => end(path)}>
            End all
          </Button>
        ) : null}
      </div>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data && data.rows.length === 0 ? <p className="text-table text-ink-soft">No device.</p> : null}
      {data && data.rows.length > 0 ? (
        <SessionList sessions={data.rows} onEnd={(session) => end(`${path}/${session.id}`)} />
      ) : null}
    </section>
  );
}

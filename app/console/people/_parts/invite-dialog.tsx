"use client";

import { type FormEvent, useState } from "react";
import { Button } from "../../../_ui/button";
import { CopyButton } from "../../../_ui/copy-button";
import { Dialog } from "../../../_ui/dialog";
import { LocalTime } from "../../../_ui/local-time";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { TextField } from "../../../_ui/text-field";
import { callConsole } from "../../_shell/call-console";
import { useFormErrors } from "../../_shell/use-form-errors";
import type { InvitedShown, TeamShown } from "./person";
import { PersonFields, readPersonFields } from "./person-fields";

interface InviteDialogProps {
  readonly teams: readonly TeamShown[];
  readonly onClose: () => void;
  readonly onInvited: () => void;
}

/** Invites somebody, and shows the link where no mail server brings it. */
export function InviteDialog({ teams, onClose, onInvited }: InviteDialogProps) {
  const [busy, setBusy] = useState(false);
  const [invited, setInvited] = useState<InvitedShown | null>(null);
  const errors = useFormErrors();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    setBusy(true);
    errors.clear();
    try {
      const body = { email: new FormData(form).get("email"), ...readPersonFields(form) };
      setInvited(await callConsole<InvitedShown>("POST", "people", body));
      onInvited();
    } catch (error) {
      errors.take(error, form);
    }
    setBusy(false);
  }

  if (invited) {
    return (
      <Dialog
        open
        onOpenChange={(open) => !open && onClose()}
        title={`${invited.person.name} is invited`}
        actions={
          <Button variant="primary" onClick={onClose}>
            Done
          </Button>
        }
      >
        <InvitationLink invited={invited} />
      </Dialog>
    );
  }
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Invite somebody"
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form="invite" disabled={busy}>
            Invite
          </Button>
        </>
      }
    >
      <form id="invite" method="post" onSubmit={submit} noValidate>
        <TextField
          label="E-mail address"
          name="email"
          type="email"
          autoComplete="off"
          required
          error={errors.of("email")}
        />
        <PersonFields name="" role="developer" teamIds={[]} teams={teams} errorOf={errors.of} />
        <div role="alert">{errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}</div>
      </form>
    </Dialog>
  );
}

/** How the link of an invitation reaches the person. */
export function InvitationLink({ invited: { person, link, expiresAt } }: { readonly invited: InvitedShown }) {
  return (
    <div role="status" className="text-table">
      {link === null ? (
        <p>
          A link went to {person.email}. It works once, until <LocalTime at={expiresAt} />.
        </p>
      ) : (
        <>
          <p>
            No mail server is set, so pass this link on yourself. It works once, until{" "}
            <LocalTime at={expiresAt} />.
          </p>
          <div className="mt-1 flex items-start gap-1">
            <code className="min-w-0 grow rounded border border-rule bg-paper px-1 py-0.5 break-all">
              {link}
            </code>
            <CopyButton text={link} what="the link" />
          </div>
        </>
      )}
    </div>
  );
}

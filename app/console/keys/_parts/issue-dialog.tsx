"use client";

import { type FormEvent, useId, useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Select } from "../../../_ui/select";
import { callConsole } from "../../_shell/call-console";
import type { TeamChoice } from "../../_shell/team-choices";
import { useFormErrors } from "../../_shell/use-form-errors";
import type { ShownKey } from "./key";
import { KeyFields, keyBody, NEW_KEY } from "./key-form";
import { ShownSecret } from "./shown-secret";

interface IssueDialogProps {
  readonly teams: readonly TeamChoice[];
  readonly ownTeamId: string;
  readonly onClose: () => void;
  readonly onIssued: () => void;
}

/** Issues a key, then shows it once. */
export function IssueDialog({ teams, ownTeamId, onClose, onIssued }: IssueDialogProps) {
  const [teamId, setTeamId] = useState(teams.some(({ id }) => id === ownTeamId) ? ownTeamId : teams[0].id);
  const [draft, setDraft] = useState(NEW_KEY);
  const [busy, setBusy] = useState(false);
  const [shown, setShown] = useState<ShownKey | null>(null);
  const errors = useFormErrors();
  const form = useId();

  async function issue(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const element = event.currentTarget;
    setBusy(true);
    errors.clear();
    try {
      setShown(await callConsole<ShownKey>("POST", "keys", { teamId, ...keyBody(draft) }));
      onIssued();
    } catch (failure) {
      errors.take(failure, element);
    } finally {
      setBusy(false);
    }
  }

  if (shown) return <ShownSecret shown={shown} onClose={onClose} />;
  return (
    <Dialog
      open
      deliberate={busy}
      onOpenChange={onClose}
      title="Issue a key"
      actions={
        <>
          <Button onClick={onClose} disabled={busy}>
            Cancel
          </Button>
          <Button variant="primary" type="submit" form={form} disabled={busy}>
            {busy ? "Issuing …" : "Issue"}
          </Button>
        </>
      }
    >
      <form id={form} onSubmit={issue} noValidate>
        {errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}
        {teams.length > 1 ? (
          <Select
            label="Team"
            name="teamId"
            value={teamId}
            onChange={(event) => setTeamId(event.target.value)}
            options={teams.map(({ id, name }) => ({ value: id, label: name }))}
            help="The key stays with the team, whoever leaves it."
          />
        ) : null}
        <KeyFields start={NEW_KEY} errors={errors} onChange={setDraft} />
      </form>
    </Dialog>
  );
}

"use client";

import { type FormEvent, useId, useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { callConsole } from "../../_shell/call-console";
import { useFormErrors } from "../../_shell/use-form-errors";
import type { KeyDetail } from "./key";
import { type KeyDraft, KeyFields, keyBody } from "./key-form";

interface EditDialogProps {
  readonly keyShown: KeyDetail;
  readonly onClose: () => void;
  readonly onChanged: () => void;
}

/** Changes what a key may do; its secret stays the same. */
export function EditDialog({ keyShown: key, onClose, onChanged }: EditDialogProps) {
  const [start] = useState<KeyDraft>(() => ({
    name: key.name,
    scopes: key.scopes,
    minute: String(key.quotas.minute),
    month: String(key.quotas.month),
    origins: key.origins.join("\n"),
    allowedInUrl: key.allowedInUrl,
    expires: key.expiresAt?.slice(0, 10) ?? "",
  }));
  const [draft, setDraft] = useState(start);
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();
  const form = useId();

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const element = event.currentTarget;
    setBusy(true);
    errors.clear();
    try {
      const { expiresAt, ...body } = keyBody(draft);
      // An end that was not touched keeps its hour.
      const end = draft.expires === start.expires ? {} : { expiresAt: expiresAt ?? null };
      await callConsole("PATCH", `keys/${key.id}`, { ...body, ...end });
      onChanged();
    } catch (failure) {
      errors.take(failure, element);
    } finally {
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Change the key"
      description="It holds from the next request on; the secret stays the same."
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form={form} disabled={busy}>
            {busy ? "Saving …" : "Save"}
          </Button>
        </>
      }
    >
      <form id={form} onSubmit={save} noValidate>
        {errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}
        <KeyFields start={start} errors={errors} onChange={setDraft} />
      </form>
    </Dialog>
  );
}

"use client";

import { useRef, useState } from "react";
import { Save } from "lucide-react";
import { Button, ButtonLink } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { CONTROL, Field } from "../../../_ui/field";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { useToast } from "../../../_ui/toast";
import { newAttemptKey } from "../../_live/attempt-key";
import { ApiProblem, postApi } from "../../_live/call-api";

/** Who may save: a reader who is signed in, or one who has to sign in first. */
export type Saving = { readonly kind: "signed-in" } | { readonly kind: "sign-in"; readonly href: string };

interface SaveRecordProps {
  readonly saving: Saving;
  /** Operation that stores it. */
  readonly path: "/resistance" | "/fields";
  readonly body: object;
  /** Proposed name of the record. */
  readonly title: string;
}

interface Stored {
  readonly record?: { readonly id: string; readonly url: string };
}

/** Stores the calculation for the reader's team. One press stores once, however often it is repeated. */
export function SaveRecord({ saving, path, body, title }: SaveRecordProps) {
  const [open, setOpen] = useState(false);
  const [label, setLabel] = useState(title);
  /** A repeat of the same text has the same key, so that it stores once; another text is another record. */
  const attempt = useRef({ text: "", key: "" });
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiProblem | Error | null>(null);
  const toast = useToast();

  if (saving.kind === "sign-in") {
    return (
      <ButtonLink href={saving.href} variant="primary">
        <Save aria-hidden size={16} /> Sign in to save
      </ButtonLink>
    );
  }

  function start() {
    attempt.current = { text: "", key: "" };
    setProblem(null);
    setOpen(true);
  }

  async function store() {
    setBusy(true);
    setProblem(null);
    const text = JSON.stringify({ ...body, record: { label: label.trim() } });
    if (attempt.current.text !== text) attempt.current = { text, key: newAttemptKey() };
    try {
      await postApi<Stored>(path, text, { idempotencyKey: attempt.current.key });
      setOpen(false);
      toast(`“${label.trim()}” is saved as a record.`);
    } catch (failure) {
      setProblem(failure instanceof Error ? failure : new Error("The record was not saved."));
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button variant="primary" onClick={start}>
        <Save aria-hidden size={16} /> Save as a record
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Save as a record"
        description="A record keeps the request, the answer and all versions; it can be replayed later."
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Not now</Button>
            <Button variant="primary" onClick={store} disabled={busy || label.trim() === ""}>
              {busy ? "Saving …" : "Save"}
            </Button>
          </>
        }
      >
        <Field label="Name of the record">
          {(control) => (
            <input
              {...control}
              value={label}
              maxLength={200}
              onChange={(event) => setLabel(event.target.value)}
              className={`${CONTROL} font-sans!`}
            />
          )}
        </Field>
        {problem ? (
          <ProblemNotice
            problem={
              problem instanceof ApiProblem
                ? problem.problem
                : {
                    title: "The record was not saved",
                    detail: "The service cannot be reached. Nothing is lost.",
                  }
            }
          />
        ) : null}
      </Dialog>
    </>
  );
}

"use client";

import { useRef, useState } from "react";
import { Save } from "lucide-react";
import { useRouter } from "next/navigation";
import { Button, ButtonLink } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { CONTROL, Field } from "../../../_ui/field";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { newAttemptKey } from "../../_live/attempt-key";
import { ApiProblem, postApi } from "../../_live/call-api";

/** Who may save: a reader who is signed in, or one who has to sign in first. */
export type Saving = { readonly kind: "signed-in" } | { readonly kind: "sign-in"; readonly href: string };

interface SaveRecordProps {
  readonly saving: Saving;
  /** Operation that stores it. */
  readonly path: "/resistance" | "/sizing" | "/fields" | "/networks";
  readonly body: object;
  /** Proposed name of the record. */
  readonly title: string;
  /** Path that leads back to exactly this state after signing in, where the page's own address does not. */
  readonly back?: () => string;
  /** Words of the button where the page has more than one thing to save. */
  readonly action?: string;
}

interface Stored {
  readonly record?: { readonly id: string; readonly url: string };
}

/** Stores the calculation for the reader's team. One press stores once, however often it is repeated. */
export function SaveRecord({
  saving,
  path,
  body,
  title,
  back,
  action = "Save as a record",
}: SaveRecordProps) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [label, setLabel] = useState(title);
  /** A repeat of the same text has the same key, so that it stores once; another text is another record. */
  const attempt = useRef({ text: "", key: "" });
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiProblem | Error | null>(null);
  /** What was stored; its id is null while a field solution is still on its way. */
  const [stored, setStored] = useState<{ readonly label: string; readonly id: string | null } | null>(null);

  if (saving.kind === "sign-in") {
    return (
      <ButtonLink
        href={saving.href}
        variant="primary"
        prefetch={false}
        onClick={(event) => {
          if (!back || event.metaKey || event.ctrlKey || event.shiftKey) return;
          event.preventDefault();
          router.push(`/sign-in?next=${encodeURIComponent(back())}`);
        }}
      >
        <Save aria-hidden size={16} /> Sign in to save
      </ButtonLink>
    );
  }

  function start() {
    attempt.current = { text: "", key: "" };
    setProblem(null);
    setStored(null);
    setOpen(true);
  }

  async function store() {
    setBusy(true);
    setProblem(null);
    const text = JSON.stringify({ ...body, record: { label: label.trim() } });
    if (attempt.current.text !== text) attempt.current = { text, key: newAttemptKey() };
    try {
      const { record } = await postApi<Stored>(path, text, { idempotencyKey: attempt.current.key, wait: 20 });
      setStored({ label: label.trim(), id: record?.id ?? null });
    } catch (failure) {
      setProblem(failure instanceof Error ? failure : new Error("The record was not saved."));
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button variant="primary" onClick={start}>
        <Save aria-hidden size={16} /> {action}
      </Button>
      {stored ? (
        <StoredDialog open={open} onOpenChange={setOpen} label={stored.label} id={stored.id} />
      ) : (
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
                onKeyDown={(event) => {
                  if (event.key === "Enter" && !busy && label.trim() !== "") void store();
                }}
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
      )}
    </>
  );
}

interface StoredDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly label: string;
  readonly id: string | null;
}

/** What was stored, and where it is. */
function StoredDialog({ open, onOpenChange, label, id }: StoredDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={id ? "The record is saved" : "The record is on its way"}
      description={
        id
          ? `“${label}” keeps the request, the answer and all versions.`
          : `“${label}” is stored once the field is solved; it then stands among the team’s records.`
      }
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Go on here</Button>
          <ButtonLink href={id ? `/records/${id}` : "/console/records"} variant="primary" prefetch={false}>
            {id ? "Open the record" : "Open the records"}
          </ButtonLink>
        </>
      }
    >
      {id ? (
        <p className="flex flex-wrap gap-x-2 text-table">
          Its sheet as PDF:
          <a className="link" href={`/records/${id}/sheet.pdf?paper=a4`}>
            A4
          </a>
          <a className="link" href={`/records/${id}/sheet.pdf?paper=letter`}>
            Letter
          </a>
        </p>
      ) : (
        <p className="text-table">It needs nothing more from this page.</p>
      )}
    </Dialog>
  );
}

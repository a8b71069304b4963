"use client";

import { useRef, useState } from "react";
import { Save } from "lucide-react";
import { useRouter } from "next/navigation";
import { Button, ButtonLink } from "../../../_ui/button";
import { callConsole, ConsoleProblem } from "../../../console/_shell/call-console";
import type { TeamChoice } from "../../../console/_shell/team-choices";
import { Dialog } from "../../../_ui/dialog";
import { CONTROL, Field } from "../../../_ui/field";
import { type ErrorShown, ProblemNotice } from "../../../_ui/problem-notice";
import { Select } from "../../../_ui/select";
import { newAttemptKey } from "../../_live/attempt-key";
import { ApiProblem, postApi } from "../../_live/call-api";
import type { RecordSummary } from "../../records/_server/record-summary";
import { StoredDialog, type StoredRecord } from "./stored-dialog";

/** Who may save: a reader who is signed in, or one who has to sign in first. */
export type Saving =
  | {
      readonly kind: "signed-in";
      /** Id of the team that this browser's pages work for. */
      readonly team: string;
      /** Those whose records the reader may store. */
      readonly teams: readonly TeamChoice[];
    }
  | { readonly kind: "sign-in"; readonly href: string };

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
  /** How the page calls the place of what is wrong with the body. */
  readonly placeOf?: (error: ErrorShown) => string | undefined;
}

interface Stored {
  readonly record?: { readonly id: string };
}

/** The same width for both words, so that what stands beside it does not move when the reader signs in. */
const SAVE_WIDTH = "min-w-[12rem]";

/** Stores the calculation for a team of the reader's. One press stores once, however often it is repeated. */
export function SaveRecord({
  saving,
  path,
  body,
  title,
  back,
  action = "Save as a record",
  placeOf,
}: SaveRecordProps) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [label, setLabel] = useState(title);
  /** A repeat of the same text has the same key, so that it stores once; another text is another record. */
  const attempt = useRef({ text: "", key: "" });
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<Error | null>(null);
  const [stored, setStored] = useState<StoredRecord | null>(null);
  /** The team that was chosen here; the pages' own where nothing was. */
  const [chosen, setChosen] = useState<string | null>(null);

  if (saving.kind === "sign-in") {
    return (
      <ButtonLink
        href={saving.href}
        variant="primary"
        className={SAVE_WIDTH}
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

  const { teams, team: current } = saving;
  const team = teams.find(({ id }) => id === (chosen ?? current)) ?? teams[0];

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
    // For another team it is another record.
    if (attempt.current.text !== text + team.id) {
      attempt.current = { text: text + team.id, key: newAttemptKey() };
    }
    try {
      if (team.id !== current) {
        await callConsole("PATCH", "account", { team: team.id });
        router.refresh();
      }
      const { record } = await postApi<Stored>(path, text, { idempotencyKey: attempt.current.key, wait: 20 });
      const told = record ? await summaryOf(record.id) : null;
      setStored({
        label: label.trim(),
        id: record?.id ?? null,
        code: told?.code ?? null,
        team: told?.team ?? team.name,
      });
    } catch (failure) {
      setProblem(failure instanceof Error ? failure : new Error("The record was not saved."));
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button variant="primary" className={SAVE_WIDTH} onClick={start}>
        <Save aria-hidden size={16} /> {action}
      </Button>
      {stored ? (
        <StoredDialog open={open} onOpenChange={setOpen} stored={stored} />
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
          {teams.length > 1 ? (
            <Select
              label="Team that owns it"
              help="The pages of this browser then work for that team."
              value={team.id}
              options={teams.map(({ id, name }) => ({ value: id, label: name }))}
              onChange={(event) => setChosen(event.target.value)}
            />
          ) : (
            <p className="text-table text-ink-soft">
              It belongs to the team <span className="text-ink">{team.name}</span>.
            </p>
          )}
          {problem ? (
            <ProblemNotice
              placeOf={placeOf}
              problem={
                problem instanceof ApiProblem || problem instanceof ConsoleProblem
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

/** Code and owner of what was stored; null where they cannot be asked for now. */
async function summaryOf(id: string): Promise<RecordSummary | null> {
  try {
    const response = await fetch(`/records/${id}/summary`);
    return response.ok ? ((await response.json()) as RecordSummary) : null;
  } catch {
    return null;
  }
}

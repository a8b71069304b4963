"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Download, PenLine, Printer, RotateCw, SquarePen, Trash2 } from "lucide-react";
import { Button, ButtonLink } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { CONTROL, Field } from "../../../_ui/field";
import { ProblemNotice, type ProblemShown } from "../../../_ui/problem-notice";
import { ToastArea, useToast } from "../../../_ui/toast";
import { ApiProblem, callApi } from "../../_live/call-api";
import type { OpenAgain } from "../_content/content";
import { Replay } from "./replay";

interface RecordActionsProps {
  readonly id: string;
  readonly label: string;
  readonly openAgain?: OpenAgain;
  /** Why the reader cannot replay, relabel and delete; null where they can. */
  readonly readOnly: string | null;
}

/** What can be done with a record: its sheet, a replay, another name, its end. */
export function RecordActions(props: RecordActionsProps) {
  return (
    <ToastArea>
      <Actions {...props} />
    </ToastArea>
  );
}

function Actions({ id, label, openAgain, readOnly }: RecordActionsProps) {
  const [asking, setAsking] = useState<"relabel" | "delete" | null>(null);
  const [replaying, setReplaying] = useState(0);
  return (
    <div className="mt-1.5 print:hidden">
      <div className="flex flex-wrap items-center gap-1">
        <SheetLink id={id} paper="a4" label="PDF, A4" />
        <SheetLink id={id} paper="letter" label="PDF, Letter" />
        <Button variant="quiet" onClick={() => window.print()}>
          <Printer aria-hidden size={16} /> Print
        </Button>
        {openAgain ? (
          <ButtonLink href={openAgain.href} variant="quiet" prefetch={false}>
            <SquarePen aria-hidden size={16} /> Open in {openAgain.page}
          </ButtonLink>
        ) : null}
        {readOnly === null ? (
          <>
            <Button variant="quiet" onClick={() => setReplaying((count) => count + 1)}>
              <RotateCw aria-hidden size={16} /> Replay
            </Button>
            <Button variant="quiet" onClick={() => setAsking("relabel")}>
              <PenLine aria-hidden size={16} /> Relabel
            </Button>
            <Button variant="quiet" onClick={() => setAsking("delete")}>
              <Trash2 aria-hidden size={16} /> Delete
            </Button>
          </>
        ) : (
          <p className="text-small text-ink-soft">{readOnly}</p>
        )}
      </div>
      {replaying > 0 ? <Replay key={replaying} id={id} /> : null}
      <Relabel id={id} label={label} open={asking === "relabel"} close={() => setAsking(null)} />
      <Delete id={id} label={label} open={asking === "delete"} close={() => setAsking(null)} />
    </div>
  );
}

function SheetLink({
  id,
  paper,
  label,
}: {
  readonly id: string;
  readonly paper: string;
  readonly label: string;
}) {
  return (
    <a
      href={`/records/${id}/sheet.pdf?paper=${paper}`}
      className="inline-flex min-h-5.5 items-center gap-1 rounded border border-edge bg-sheet px-2 py-1 text-table font-medium hover:border-ink medium:min-h-5"
    >
      <Download aria-hidden size={16} /> {label}
    </a>
  );
}

interface AskProps {
  readonly id: string;
  readonly label: string;
  readonly open: boolean;
  readonly close: () => void;
}

function Relabel({ id, label, open, close }: AskProps) {
  const [text, setText] = useState(label);
  const { busy, problem, run } = useCall("The record was not relabelled");
  const router = useRouter();
  const toast = useToast();

  async function save() {
    const done = await run(() =>
      callApi("PATCH", `/records/${id}`, {}, JSON.stringify({ label: text.trim() })),
    );
    if (!done) return;
    close();
    toast("The record has its new name.");
    router.refresh();
  }

  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && close()}
      title="Relabel the record"
      description="Only the name changes; request, answer and versions stay as they are."
      actions={
        <>
          <Button onClick={close}>Not now</Button>
          <Button
            variant="primary"
            onClick={save}
            disabled={busy || text.trim() === "" || text.trim() === label}
          >
            {busy ? "Saving …" : "Save"}
          </Button>
        </>
      }
    >
      <Field label="Name of the record">
        {(control) => (
          <input
            {...control}
            value={text}
            maxLength={200}
            onChange={(event) => setText(event.target.value)}
            className={`${CONTROL} font-sans!`}
          />
        )}
      </Field>
      {problem ? <ProblemNotice problem={problem} /> : null}
    </Dialog>
  );
}

function Delete({ id, label, open, close }: AskProps) {
  const { busy, problem, run } = useCall("The record was not deleted");
  const router = useRouter();

  async function remove() {
    if (await run(() => callApi("DELETE", `/records/${id}`))) router.replace("/console/records");
  }

  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && close()}
      title="Delete the record?"
      description={`“${label}” and its answer are removed for good. Links to it and codes on printed sheets lead nowhere afterwards; the activity keeps who did it.`}
      actions={
        <>
          <Button onClick={close}>Keep it</Button>
          <Button variant="danger" onClick={remove} disabled={busy}>
            {busy ? "Deleting …" : "Delete for good"}
          </Button>
        </>
      }
    >
      {problem ? <ProblemNotice problem={problem} /> : <p className="text-table">This cannot be undone.</p>}
    </Dialog>
  );
}

/** One call at a time, with what went wrong. */
function useCall(failed: string) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemShown | null>(null);
  async function run(call: () => Promise<unknown>): Promise<boolean> {
    setBusy(true);
    setProblem(null);
    try {
      await call();
      return true;
    } catch (failure) {
      setProblem(
        failure instanceof ApiProblem
          ? failure.problem
          : { title: failed, detail: "The service cannot be reached. Nothing has changed." },
      );
      return false;
    } finally {
      setBusy(false);
    }
  }
  return { busy, problem, run };
}

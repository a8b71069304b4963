"use client";

import { type ReactNode, useState } from "react";
import { Button } from "../../_ui/button";
import { Dialog } from "../../_ui/dialog";
import { ProblemNotice } from "../../_ui/problem-notice";
import { ConsoleProblem } from "../_shell/call-console";

interface ConfirmDialogProps {
  /** A question: "Remove Tomas Vell?" */
  readonly title: string;
  /** What follows from a yes, in a sentence below the question. */
  readonly description?: string;
  /** The rest of what follows. */
  readonly children: ReactNode;
  /** The yes, as a verb: "Remove". */
  readonly action: string;
  /** The no. */
  readonly decline?: string;
  readonly onConfirm: () => Promise<void>;
  readonly onClose: () => void;
}

/** Asks before what cannot simply be undone; stays open with the reason where it is refused. */
export function ConfirmDialog({
  title,
  description,
  children,
  action,
  decline = "Cancel",
  onConfirm,
  onClose,
}: ConfirmDialogProps) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);

  async function confirm() {
    setBusy(true);
    setProblem(null);
    try {
      await onConfirm();
    } catch (failure) {
      if (!(failure instanceof ConsoleProblem)) throw failure;
      setProblem(failure);
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={title}
      description={description}
      actions={
        <>
          <Button onClick={onClose}>{decline}</Button>
          <Button variant="danger" onClick={confirm} disabled={busy}>
            {action}
          </Button>
        </>
      }
    >
      <div className="text-table">{children}</div>
      {problem ? (
        <div role="alert" className="mt-1.5">
          <ProblemNotice problem={problem.problem} />
        </div>
      ) : null}
    </Dialog>
  );
}

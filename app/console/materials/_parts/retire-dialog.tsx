"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import { countText } from "../../_parts/numbers";
import type { MaterialHistory, MaterialVersion } from "./material";

interface RetireDialogProps {
  readonly history: MaterialHistory;
  readonly current: MaterialVersion;
  readonly onClose: () => void;
  readonly onRetired: () => void;
}

/** Asks before a material is withdrawn, and says what goes on and what does not. */
export function RetireDialog({ history, current, onClose, onRetired }: RetireDialogProps) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);
  const records = history.uses.reduce((sum, use) => sum + use.records, 0);

  async function retire() {
    setBusy(true);
    setProblem(null);
    try {
      await callConsole("POST", `materials/${history.id}/retire`, { from: current.version });
      onRetired();
    } catch (failure) {
      if (!(failure instanceof ConsoleProblem)) throw failure;
      setProblem(failure);
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={onClose}
      title={`Retire ${current.name}?`}
      description="It cannot be brought back; add a new material instead."
      actions={
        <>
          <Button onClick={onClose}>Keep it</Button>
          <Button variant="danger" onClick={retire} disabled={busy}>
            {busy ? "Retiring …" : "Retire for good"}
          </Button>
        </>
      }
    >
      {problem ? <ProblemNotice problem={problem.problem} /> : null}
      <ul className="list-disc ps-2 text-table">
        <li>
          Requests, scripts and embeds that name <code>{history.id}</code> are refused from now on.
        </li>
        <li>
          {records === 0
            ? "No record has used it."
            : `${countText(records)} record${records === 1 ? "" : "s"} used it: they stay, and replay with the version they pinned.`}
        </li>
      </ul>
    </Dialog>
  );
}

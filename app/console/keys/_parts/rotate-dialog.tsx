"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Select } from "../../../_ui/select";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import { reachText } from "./client-table";
import type { KeyDetail, ShownKey } from "./key";
import { ShownSecret } from "./shown-secret";

const OVERLAPS = [
  { value: "0", label: "none: the old secret ends at once" },
  { value: "1h", label: "an hour" },
  { value: "1d", label: "a day" },
  { value: "7d", label: "a week" },
  { value: "30d", label: "30 days" },
  { value: "90d", label: "90 days" },
];

interface RotateDialogProps {
  readonly keyShown: KeyDetail;
  readonly onClose: () => void;
  readonly onRotated: () => void;
}

/** Gives a key a second secret, and the first one an end. */
export function RotateDialog({ keyShown: key, onClose, onRotated }: RotateDialogProps) {
  const [overlap, setOverlap] = useState("7d");
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);
  const [shown, setShown] = useState<ShownKey | null>(null);

  async function rotate() {
    setBusy(true);
    setProblem(null);
    try {
      setShown(await callConsole<ShownKey>("POST", `keys/${key.id}/rotate`, { overlap }));
      onRotated();
    } catch (failure) {
      if (!(failure instanceof ConsoleProblem)) throw failure;
      setProblem(failure);
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
      title={`Rotate ${key.name}?`}
      description={`A new secret counts at once. ${reachText(key)} They must change over before the overlap is over.`}
      actions={
        <>
          <Button onClick={onClose} disabled={busy}>
            Cancel
          </Button>
          <Button variant="primary" onClick={rotate} disabled={busy}>
            {busy ? "Rotating …" : "Rotate"}
          </Button>
        </>
      }
    >
      {problem ? <ProblemNotice problem={problem.problem} /> : null}
      <Select
        label="Overlap in which both secrets count"
        value={overlap}
        onChange={(event) => setOverlap(event.target.value)}
        options={OVERLAPS}
      />
    </Dialog>
  );
}

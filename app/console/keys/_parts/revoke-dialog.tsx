"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import { ClientTable } from "./client-table";
import type { KeyDetail } from "./key";

interface RevokeDialogProps {
  readonly keyShown: KeyDetail;
  readonly onClose: () => void;
  readonly onRevoked: () => void;
}

/** Asks before a key ends for good, and says whom that reaches. */
export function RevokeDialog({ keyShown: key, onClose, onRevoked }: RevokeDialogProps) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);

  async function revoke() {
    setBusy(true);
    setProblem(null);
    try {
      await callConsole("POST", `keys/${key.id}/revoke`);
      onRevoked();
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
      title={`Revoke ${key.name}?`}
      description="The next request with it is refused. A revoked key does not come back: issue a new one instead. Embeds have no key and go on."
      actions={
        <>
          <Button onClick={onClose}>Keep it</Button>
          <Button variant="danger" onClick={revoke} disabled={busy}>
            {busy ? "Revoking …" : "Revoke for good"}
          </Button>
        </>
      }
    >
      {problem ? <ProblemNotice problem={problem.problem} /> : null}
      <p className="mb-1 text-table">These clients stop working:</p>
      <ClientTable clients={key.clients} />
    </Dialog>
  );
}

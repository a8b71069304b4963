"use client";

import { ConfirmDialog } from "../../_parts/confirm-dialog";
import { callConsole } from "../../_shell/call-console";
import { ClientTable } from "./client-table";
import type { KeyDetail } from "./key";

interface RevokeDialogProps {
  readonly keyShown: KeyDetail;
  readonly onClose: () => void;
  readonly onRevoked: () => void;
}

/** Asks before a key ends for good, and says whom that reaches. */
export function RevokeDialog({ keyShown: key, onClose, onRevoked }: RevokeDialogProps) {
  return (
    <ConfirmDialog
      title={`Revoke ${key.name}?`}
      description="The next request with it is refused. A revoked key does not come back: issue a new one instead. Embeds have no key and go on."
      action="Revoke for good"
      decline="Keep it"
      onConfirm={async () => {
        await callConsole("POST", `keys/${key.id}/revoke`);
        onRevoked();
      }}
      onClose={onClose}
    >
      <p className="mb-1">These clients stop working:</p>
      <ClientTable clients={key.clients} />
    </ConfirmDialog>
  );
}

"use client";

import { ConfirmDialog } from "../../_parts/confirm-dialog";
import { countText } from "../../_parts/numbers";
import { callConsole } from "../../_shell/call-console";
import type { MaterialHistory, MaterialVersion } from "./material";

interface RetireDialogProps {
  readonly history: MaterialHistory;
  readonly current: MaterialVersion;
  readonly onClose: () => void;
  readonly onRetired: () => void;
}

/** Asks before a material is withdrawn, and says what goes on and what does not. */
export function RetireDialog({ history, current, onClose, onRetired }: RetireDialogProps) {
  const records = history.uses.reduce((sum, use) => sum + use.records, 0);
  return (
    <ConfirmDialog
      title={`Retire ${current.name}?`}
      description="It cannot be brought back; add a new material instead."
      action="Retire for good"
      decline="Keep it"
      onConfirm={async () => {
        await callConsole("POST", `materials/${history.id}/retire`, { from: current.version });
        onRetired();
      }}
      onClose={onClose}
    >
      <ul className="list-disc ps-2">
        <li>
          Requests, scripts and embeds that name <code>{history.id}</code> are refused from now on.
        </li>
        <li>
          {records === 0
            ? "No record has used it."
            : `${countText(records)} record${records === 1 ? "" : "s"} used it: they stay, and replay with the version they pinned.`}
        </li>
      </ul>
    </ConfirmDialog>
  );
}

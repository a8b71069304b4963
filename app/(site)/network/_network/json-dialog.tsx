"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { CopyButton } from "../../../_ui/copy-button";
import { Dialog } from "../../../_ui/dialog";
import { CONTROL, Field } from "../../../_ui/field";
import { FileButton } from "../../../_ui/file-button";
import { Notice } from "../../../_ui/notice";
import { saveFile } from "../../../_ui/picture-file";
import { jsonText } from "../../_live/snippets";
import { sentence } from "../../calculate/_model/complaints";
import type { Network } from "../_model/network";
import { type BodyComplaint, readBodyText } from "../_model/read-body";

interface JsonDialogProps {
  /** What the page asks now; null while it is not known whole. */
  readonly body: object | null;
  readonly onTake: (network: Network) => void;
  readonly onClose: () => void;
}

/** The network as the API's JSON, to take away, to change, to paste or to read from a file. */
export function JsonDialog({ body, onTake, onClose }: JsonDialogProps) {
  const [text, setText] = useState(() => (body ? jsonText(body) : ""));
  const [complaints, setComplaints] = useState<readonly BodyComplaint[]>([]);

  function take(next: string) {
    const reading = readBodyText(next);
    if (reading.ok) return onTake(reading.network);
    setText(next);
    setComplaints(reading.complaints);
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Network as JSON"
      description="The body of POST /networks. What the page shows now stands below."
      wide
      actions={
        <>
          <FileButton label="Read a file" accept=".json,application/json" onText={take} />
          <Button onClick={() => saveFile("network.json", text, "application/json")}>Download</Button>
          <CopyButton text={text} what="the JSON" />
          <Button variant="primary" onClick={() => take(text)}>
            Take over
          </Button>
        </>
      }
    >
      <Field label="JSON">
        {(control) => (
          <textarea
            {...control}
            rows={18}
            value={text}
            spellCheck={false}
            aria-invalid={complaints.length > 0 ? true : undefined}
            onChange={(event) => setText(event.target.value)}
            className={`${CONTROL} resize-y`}
          />
        )}
      </Field>
      <div aria-live="polite">
        {complaints.length > 0 ? (
          <Notice tone="problem" title="This cannot be taken over">
            <ul>
              {complaints.map(({ pointer, detail }, k) => (
                <li key={k}>
                  <code>{pointer}</code> {pointer === "#" ? sentence(detail) : detail}
                </li>
              ))}
            </ul>
          </Notice>
        ) : null}
      </div>
    </Dialog>
  );
}

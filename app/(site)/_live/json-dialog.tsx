"use client";

import { useState } from "react";
import { Button } from "../../_ui/button";
import { CopyButton } from "../../_ui/copy-button";
import { Dialog } from "../../_ui/dialog";
import { CONTROL, Field } from "../../_ui/field";
import { FileButton } from "../../_ui/file-button";
import { Notice } from "../../_ui/notice";
import { saveFile } from "../../_ui/picture-file";
import { sentence } from "../calculate/_model/complaints";
import { jsonText } from "./snippets";

export interface JsonComplaint {
  readonly pointer: string;
  readonly detail: string;
}

interface JsonDialogProps {
  readonly title: string;
  /** What may stand in the text. */
  readonly description: string;
  /** What the page asks now; null while it is not known whole. */
  readonly body: object | null;
  readonly fileName: string;
  /** Largest file, MB: as much as the API takes. */
  readonly mostMB: number;
  /** Takes a text over, or says what is wrong with it. */
  readonly take: (text: string) => readonly JsonComplaint[];
  readonly onClose: () => void;
}

/** Longer texts of files are not shown where they are wrong: a browser chokes on them. */
const LONGEST_SHOWN = 500_000;

/** A page as the API's JSON, to take away, to change, to paste or to read from a file. */
export function JsonDialog(props: JsonDialogProps) {
  const { title, description, body, fileName, mostMB, take, onClose } = props;
  const [text, setText] = useState(() => (body ? jsonText(body) : ""));
  const [complaints, setComplaints] = useState<readonly JsonComplaint[]>([]);

  async function read(file: File) {
    if (file.size > mostMB * 1e6) {
      const size = (file.size / 1e6).toLocaleString("en", { maximumFractionDigits: 1 });
      return setComplaints([
        { pointer: file.name, detail: `has ${size} MB; at most ${mostMB} MB are taken.` },
      ]);
    }
    const next = await file.text();
    // The mark that some editors write in front is no part of the JSON.
    const found = take(next.replace(/^\ufeff/, ""));
    setComplaints(found);
    if (found.length > 0 && next.length <= LONGEST_SHOWN && !next.includes("\0")) setText(next);
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={title}
      description={`${description} What the page shows now stands below.`}
      wide
      actions={
        <>
          <FileButton
            label="Read a file"
            accept=".json,application/json"
            onFile={(file) => void read(file)}
          />
          <Button onClick={() => saveFile(fileName, text, "application/json")}>Download</Button>
          <CopyButton text={text} what="the JSON" />
          <Button variant="primary" onClick={() => setComplaints(take(text))}>
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

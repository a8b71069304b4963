"use client";

import { Button } from "../../../../_ui/button";
import { Notice } from "../../../../_ui/notice";
import type { Kept } from "./kept";
import { count } from "./run-bar";
import type { Incoming } from "./use-import";

interface IncomingNoticeProps {
  readonly incoming: Incoming;
  /** Told the shape that every row is to have. */
  readonly onShape: (shape: string) => void;
  readonly onDismiss: () => void;
}

/** What the reader should know of the rows that came in last, or why none did. */
export function IncomingNotice({ incoming, onShape, onDismiss }: IncomingNoticeProps) {
  const { refused, notes, likely } = incoming;
  return (
    <div role={refused ? "alert" : "status"} className="mb-2">
      <Notice
        tone={refused ? "problem" : "caution"}
        title={refused ? "Nothing was taken in" : "About the rows that came in"}
      >
        <ul className="grid max-w-prose gap-0.5">
          {notes.map((note) => (
            <li key={note}>{note}</li>
          ))}
          {likely === null ? null : (
            <li>
              No column says the shape of a row, and each row needs one. Say in a head which column it is, or
              put the same in every row.
            </li>
          )}
        </ul>
        <div className="mt-1 flex flex-wrap gap-1">
          {likely === null ? null : (
            <Button onClick={() => onShape(likely)}>Put “{likely}” in every row</Button>
          )}
          <Button variant="quiet" onClick={onDismiss}>
            Close
          </Button>
        </div>
      </Notice>
    </div>
  );
}

interface AsideNoticeProps {
  readonly aside: Kept;
  readonly onBringBack: (kept: Kept) => void;
  readonly onForget: () => void;
}

/** What this tab had before an address asked for an example. */
export function AsideNotice({ aside, onBringBack, onForget }: AsideNoticeProps) {
  return (
    <div className="mb-2">
      <Notice title={`This tab has a table of ${count(aside.table.rows.length, "row")}`}>
        <p className="max-w-prose">It is set aside for the example below, until one of the two is chosen.</p>
        <div className="mt-1 flex flex-wrap gap-1">
          <Button onClick={() => onBringBack(aside)}>Bring it back</Button>
          <Button variant="quiet" onClick={onForget}>
            Go on with the example
          </Button>
        </div>
      </Notice>
    </div>
  );
}

"use client";

import { Button } from "../../../../_ui/button";
import { Dialog } from "../../../../_ui/dialog";
import { count } from "./run-bar";

/** What to do with rows that come in while others are there. */
export type Way = "replace" | "below" | "from";

interface ImportDialogProps {
  /** Rows that come in, and rows that are there. */
  readonly coming: number;
  readonly there: number;
  /** The ways that are open; rows without their shape fit nothing but the cell that has the focus. */
  readonly ways: readonly Way[];
  readonly notes: readonly string[];
  /** Why the way that was chosen last is not open after all. */
  readonly refusal: string | null;
  readonly onChoose: (way: Way) => void;
  readonly onCancel: () => void;
}

/** Asks before rows that are on the page would go. */
export function ImportDialog(props: ImportDialogProps) {
  const { coming, there, ways, notes, refusal, onChoose, onCancel } = props;
  const texts: Readonly<Record<Way, string>> = {
    replace: `Replace the ${count(there, "row")}`,
    below: "Add below them",
    from: "Fill in from this cell on",
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onCancel()}
      title={`${count(coming, "row")} to take in`}
      description={`The table has ${count(there, "row")} already.`}
      actions={
        <>
          <Button onClick={onCancel}>Cancel</Button>
          {ways.map((way, k) => (
            <Button
              key={way}
              variant={k === ways.length - 1 ? "primary" : "plain"}
              onClick={() => onChoose(way)}
            >
              {texts[way]}
            </Button>
          ))}
        </>
      }
    >
      <ul className="grid gap-0.5 text-table">
        {notes.map((note) => (
          <li key={note}>{note}</li>
        ))}
        <li>What is done can be undone right afterwards.</li>
      </ul>
      {refusal ? (
        <p role="alert" className="mt-1 text-table text-oxide">
          {refusal}
        </p>
      ) : null}
    </Dialog>
  );
}

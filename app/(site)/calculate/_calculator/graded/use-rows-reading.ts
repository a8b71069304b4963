"use client";

import { useState } from "react";
import { readFile } from "../../table/_model/read-file";
import { type PointsReading, readPoints } from "./read-points";

export interface RowsReading {
  /** What was understood of the last text or file; null before the first. */
  readonly notes: PointsReading | null;
  /** Counts the changes that do not come from the text itself, which then starts anew. */
  readonly revision: number;
  readonly restart: () => void;
  /** Takes what can be read of a text while it is written. */
  readonly read: (text: string) => Promise<void>;
  /** Takes a file, or nothing of it: who uploads one does not see which lines are missing. */
  readonly take: (file: File) => Promise<void>;
}

/** Rows of two columns from a text or a file. */
export function useRowsReading(set: (rows: PointsReading["rows"]) => void): RowsReading {
  const [notes, setNotes] = useState<PointsReading | null>(null);
  const [revision, setRevision] = useState(0);
  const restart = () => setRevision((before) => before + 1);

  async function read(text: string) {
    const reading = await readPoints(text);
    setNotes(reading);
    if (reading.rows.length > 0) set(reading.rows);
  }

  async function take(file: File) {
    const content = await readFile(file);
    if (!content.ok) {
      setNotes({ rows: [], problems: [content.reason] });
      return;
    }
    const reading = await readPoints(content.text);
    if (reading.problems.length > 0) {
      setNotes({ ...reading, rows: [], note: `Nothing of “${file.name}” was taken.` });
      return;
    }
    const said = [reading.note, content.note].filter(Boolean).join(" ");
    setNotes({ ...reading, note: said === "" ? undefined : said });
    set(reading.rows);
    restart();
  }

  return { notes, revision, restart, read, take };
}

"use client";

import { useState } from "react";
import { type PointsReading, readPoints, readPointsFile } from "./read-points";

export interface RowsReading {
  /** What was understood of the last text or file; null before the first. */
  readonly notes: PointsReading | null;
  /** Counts the changes that do not come from the text itself, which then starts anew. */
  readonly revision: number;
  readonly restart: () => void;
  /** Takes what can be read of a text while it is written. */
  readonly read: (text: string) => Promise<void>;
  /** Takes a file, or nothing of it. */
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
    const reading = await readPointsFile(file);
    setNotes(reading);
    if (reading.rows.length === 0) return;
    set(reading.rows);
    restart();
  }

  return { notes, revision, restart, read, take };
}

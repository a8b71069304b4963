"use client";

import { Download, Play, Square } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { ProblemNotice } from "../../../../_ui/problem-notice";
import type { Run } from "./use-run";

interface RunBarProps {
  readonly run: Run;
  /** Rows with something in them, and how many of those have no answer yet. */
  readonly full: number;
  readonly open: number;
  readonly refused: number;
  readonly onStart: () => void;
  readonly onStop: () => void;
  readonly onSave: () => void;
}

/** Starts and stops the computation, says how far it is, and hands over what came out. */
export function RunBar({ run, full, open, refused, onStart, onStop, onSave }: RunBarProps) {
  return (
    <div className="mt-2 border-t border-rule pt-2">
      <div className="flex flex-wrap items-center gap-1">
        {run.busy ? (
          <Button onClick={onStop}>
            <Square aria-hidden size={14} /> Stop
          </Button>
        ) : (
          <Button variant="primary" disabled={open === 0} onClick={onStart}>
            <Play aria-hidden size={14} />
            {startText(full, open)}
          </Button>
        )}
        <Button disabled={full === 0} onClick={onSave}>
          <Download aria-hidden size={16} /> Download CSV
        </Button>
        <span className="flex grow flex-wrap items-center gap-1 text-table text-ink-soft">
          {run.busy ? (
            <progress
              max={run.sent}
              value={run.done}
              aria-label="Rows that have come back"
              className="h-1 w-24 accent-copper"
            />
          ) : null}
          {progressText(run, full - open, refused)}
        </span>
      </div>
      {run.problem ? (
        <div className="mt-2">
          <ProblemNotice problem={run.problem} />
        </div>
      ) : null}
    </div>
  );
}

function startText(full: number, open: number): string {
  if (full === 0) return "Compute";
  if (open === full) return `Compute ${count(full, "row")}`;
  return open === 0 ? "All rows are answered" : `Compute the ${count(open, "open row")}`;
}

/** How far the run is, or how it ended. */
export function progressText(run: Run, answered: number, refused: number): string {
  if (run.sent === 0 || run.problem) return "Refused rows cost nothing.";
  if (run.busy) return `${run.done.toLocaleString("en")} of ${count(run.sent, "row")} came back`;
  const told = `${count(answered, "row")} answered, ${refused.toLocaleString("en")} refused`;
  return run.done < run.sent
    ? `Stopped: ${run.done.toLocaleString("en")} of ${count(run.sent, "row")} came back. ${told}.`
    : `${told}.`;
}

export function count(number: number, noun: string): string {
  return `${number.toLocaleString("en")} ${noun}${number === 1 ? "" : "s"}`;
}

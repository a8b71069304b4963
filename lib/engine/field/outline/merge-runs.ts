import { showDomainPoint, type Frame } from "./frame";
import { edgeCount, edgeLength, ringPoint, type Ring } from "./ring";
import type { OutlineError } from "./schema";
import type { Stretch } from "./terminal-runs";

/** A stretch of one ring that is a terminal, from position `start` to `end` (edge + t), 0 ≤ start < end ≤ edges. */
export interface Run {
  readonly start: number;
  readonly end: number;
  readonly terminal: number;
}

/**
 * Joins the stretches of each ring into disjoint runs in order. Two terminals that overlap or touch are refused: the
 * resistance between them is zero.
 */
export function mergeStretches(
  stretches: readonly Stretch[],
  rings: readonly Ring[],
  names: readonly string[],
  frame: Frame,
  errors: OutlineError[],
): Run[][] {
  return rings.map((ring) => {
    const pieces = stretches.filter((s) => s.ring === ring.number).flatMap((s) => unwrap(s, edgeCount(ring)));
    pieces.sort((p, q) => p.start - q.start || q.end - p.end);
    const clash = (before: Stretch, after: Stretch, overlap: boolean): void => {
      const edge = Math.min(Math.floor(after.start), edgeCount(ring) - 1);
      const [x, y] = ringPoint(ring, edge, after.start - edge);
      errors.push({
        pointer: after.pointer,
        detail:
          `Terminals "${names[before.terminal]}" and "${names[after.terminal]}" ${overlap ? "overlap" : "touch"} at ` +
          `${showDomainPoint(frame, x, y)}: the resistance between them is zero. Leave insulated boundary between them.`,
      });
    };
    const runs: Stretch[] = [];
    for (const piece of pieces) {
      const last = runs.at(-1);
      if (last === undefined || !reaches(ring, last.end, piece.start, frame)) {
        runs.push(piece);
        continue;
      }
      if (last.terminal !== piece.terminal) clash(last, piece, piece.start < last.end);
      runs[runs.length - 1] = { ...last, end: Math.max(last.end, piece.end) };
    }
    const first = runs[0];
    const last = runs.at(-1);
    if (first !== undefined && last !== undefined && first.terminal !== last.terminal) {
      if (first.start === 0 && last.end === edgeCount(ring)) clash(last, first, false);
    }
    return runs.map(({ start, end, terminal }) => ({ start, end, terminal }));
  });
}

/** Stretches that pass vertex 0 in two pieces. */
function unwrap(stretch: Stretch, edges: number): Stretch[] {
  const turns = Math.floor(stretch.start / edges) * edges;
  const start = stretch.start - turns;
  const end = stretch.end - turns;
  if (end <= edges) return [{ ...stretch, start, end }];
  return [
    { ...stretch, start, end: edges },
    { ...stretch, start: 0, end: end - edges },
  ];
}

function reaches(ring: Ring, end: number, start: number, frame: Frame): boolean {
  if (start <= end) return true;
  const edge = Math.floor(end);
  if (edge !== Math.floor(start)) return false;
  return (start - end) * edgeLength(ring, edge) <= frame.touch;
}

/** What is still to be drawn before a solution can be asked for. */
import type { Sketch } from "./sketch";

/** The next thing to do, as a sentence; null where the API can be asked. */
export function whatIsMissing({ rings, terminals }: Sketch): string | null {
  if (rings[0].length === 0) {
    return "Draw the outer ring first: press its corners on the board one after another, or add a square or a disc below.";
  }
  const without = terminals.find(({ parts, segments }) => parts.length + segments.length === 0);
  if (terminals.length < 2) {
    const many = terminals.length === 0 ? "two terminals" : "a second terminal";
    return `Add ${many}, then press the edges where the current enters and leaves.`;
  }
  return without
    ? `Give terminal ${without.name} an edge: choose it, then press one on the board with the tool Terminals.`
    : null;
}

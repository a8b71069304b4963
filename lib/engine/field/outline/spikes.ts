import { arcDirection } from "./arc";
import type { Chain } from "./clean-ring";
import { showDomainPoint, type Frame } from "./frame";
import type { OutlineError } from "./schema";

/** Directions of an arc and its neighbour that differ by less count as one, in radians. */
const SAME_DIRECTION = 1e-9;

/**
 * Complains about vertices where the ring comes back along the line it came: a spike without width between straight edges, a
 * cusp where an arc is one of the two. Neither can be told from a mistake, so neither is repaired.
 */
export function checkSpikes(
  xy: Float64Array,
  chain: Chain,
  frame: Frame,
  pointer: string,
  title: string,
): OutlineError[] {
  const errors: OutlineError[] = [];
  const { arcs, source } = chain;
  const n = arcs.length;
  for (let k = 0; k < n && n > 1; k++) {
    const p = (k + n - 1) % n;
    const q = (k + 1) % n;
    const before = arcs[p];
    const after = arcs[k];
    const curved = before !== null || after !== null;
    const [bx, by] =
      before !== null
        ? arcDirection(before, 1).map((d) => -d)
        : [xy[2 * p] - xy[2 * k], xy[2 * p + 1] - xy[2 * k + 1]];
    const [ax, ay] =
      after !== null ? arcDirection(after, 0) : [xy[2 * q] - xy[2 * k], xy[2 * q + 1] - xy[2 * k + 1]];
    if (bx * ax + by * ay <= 0) continue;
    const cross = Math.abs(bx * ay - by * ax);
    const longer = Math.max(Math.hypot(bx, by), Math.hypot(ax, ay));
    const shorter = Math.min(Math.hypot(bx, by), Math.hypot(ax, ay));
    // Straight edges: how far the end of the shorter one lies off the other.
    if (curved ? cross > SAME_DIRECTION * longer * shorter : cross > frame.touch * longer) continue;
    const where = showDomainPoint(frame, xy[2 * k], xy[2 * k + 1]);
    errors.push({
      pointer: `${pointer}/${source[k]}`,
      detail: curved
        ? `The ${title} has a cusp at ${where}: its two edges leave that point in the same direction. Give them an angle.`
        : `The ${title} goes to ${where} and comes back along the same line: a spike without width. ` +
          `Leave the point out, or give the spike a width.`,
    });
  }
  return errors;
}

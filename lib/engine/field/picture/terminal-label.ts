/** Where the name of a terminal stands in a picture, and in which colour. */

export interface Frame {
  readonly left: number;
  readonly right: number;
}

export interface LabelPlace {
  readonly x: number;
  readonly y: number;
  readonly anchor: "start" | "middle" | "end";
  readonly text: string;
}

/** Colours of the high terminal, the low one, and those without current. */
export const TERMINAL_COLOURS = { high: "#7d3513", low: "#1f6f62", open: "#566067" } as const;

/** Longest name that is shown whole, characters; about so wide is one of them, px. */
const LONGEST = 40;
const CHARACTER = 8.5;
/** A terminal that is shorter has no room for its name inside the conductor, px. */
const ROOM = 30;

/**
 * Beside an upright terminal the name stands inside the conductor, or over it where that is too narrow; a level one has
 * it outside. `line` is the terminal's piece of the boundary in px, y downwards, conductor on its left as seen with y
 * upwards.
 */
export function placeLabel(
  line: readonly number[],
  middle: readonly [number, number],
  name: string,
  frame: Frame,
): LabelPlace {
  const text = name.length > LONGEST ? `${name.slice(0, LONGEST - 1)}…` : name;
  const width = CHARACTER * text.length;
  const last = line.length - 2;
  const [dx, dy] = [line[last] - line[0], line[last + 1] - line[1]];
  const ys = line.filter((_, k) => k % 2 === 1);
  const [upper, lower] = [Math.min(...ys), Math.max(...ys)];
  const [x, y] = middle;
  if (Math.abs(dy) > Math.abs(dx)) {
    const onLeft = x < (frame.left + frame.right) / 2;
    const anchor = onLeft ? "start" : "end";
    return lower - upper < ROOM
      ? { x, y: upper - 10, anchor, text }
      : { x: x + (onLeft ? 10 : -10), y: y + 5, anchor, text };
  }
  const centre = Math.min(Math.max(x, frame.left + width / 2), frame.right - width / 2);
  // With the conductor on the left, what runs to the left has the outside above it.
  return { x: centre, y: dx < 0 ? upper - 9 : lower + 20, anchor: "middle", text };
}

/** Where the names of terminals stand in a picture: outside the conductor, beside what they name, clear of each other. */

type Vec = readonly [number, number];

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** A piece of the boundary that is to be named; px, y downwards, the conductor on its left as seen with y upwards. */
export interface Named {
  readonly text: string;
  readonly line: readonly number[];
}

export interface PlacedName {
  readonly text: string;
  /** The name's own room. */
  readonly box: Box;
  /** From the terminal to a name that stands apart from it. */
  readonly leader: readonly [Vec, Vec] | null;
}

/** Longest name that is shown whole, characters; about so wide is one of them, px. */
const LONGEST = 40;
const CHARACTER = 8.4;
export const NAME_HEIGHT = 18;
/** Room between a terminal and its name, px; farther away it gets a leader. */
const BESIDE = 9;
/** Room around a name that nothing else takes, px. */
const CLEAR = 3;

const DISTANCES = [BESIDE, 15, 22, 32, 44, 58, 76, 98, 124, 154, 190, 240];
const TURNS = [0, 25, -25, 50, -50, 75, -75, 105, -105].map((degrees) => (degrees * Math.PI) / 180);

export function shortName(name: string): string {
  return name.length > LONGEST ? `${name.slice(0, LONGEST - 1)}…` : name;
}

export function nameWidth(text: string): number {
  return CHARACTER * text.length + 4;
}

/** The point half way along a line, and the direction out of the conductor there. */
export function middleOf(line: readonly number[]): { readonly at: Vec; readonly out: Vec } {
  const lengths: number[] = [];
  for (let k = 2; k < line.length; k += 2)
    lengths.push(Math.hypot(line[k] - line[k - 2], line[k + 1] - line[k - 1]));
  let rest = lengths.reduce((a, b) => a + b, 0) / 2;
  for (let k = 0; k < lengths.length; k++) {
    if (rest <= lengths[k] && lengths[k] > 0) {
      const [x, y] = [line[2 * k], line[2 * k + 1]];
      const [dx, dy] = [line[2 * k + 2] - x, line[2 * k + 3] - y];
      const t = rest / lengths[k];
      return { at: [x + t * dx, y + t * dy], out: [0 - dy / lengths[k], dx / lengths[k]] };
    }
    rest -= lengths[k];
  }
  return { at: [line[0], line[1]], out: [0, -1] };
}

/**
 * Places each name near its terminal: straight out of the conductor where there is room, else turned aside or farther
 * away with a leader, which crosses the conductor only where nothing else is left. `rings` are the conductor's borders
 * in px, `frame` is where names may stand.
 */
export function placeNames(
  names: readonly Named[],
  rings: readonly (readonly number[])[],
  frame: Box,
): PlacedName[] {
  const placed: PlacedName[] = [];
  for (const name of names) placed.push(placeName(name, rings, frame, placed));
  return placed;
}

interface Candidate {
  readonly box: Box;
  readonly leader: readonly [Vec, Vec] | null;
  readonly cost: number;
}

function placeName(
  { text, line }: Named,
  rings: readonly (readonly number[])[],
  frame: Box,
  placed: readonly PlacedName[],
): PlacedName {
  const { at, out } = middleOf(line);
  const size = { width: nameWidth(text), height: NAME_HEIGHT };
  const beside = DISTANCES.flatMap((distance) =>
    TURNS.map((turn) => towards(at, turned(out, turn), distance, size, distance + 30 * Math.abs(turn))),
  ).sort((a, b) => a.cost - b.cost);
  const free = ({ box }: Candidate): boolean => isFree(box, rings, frame, placed);
  const clear = ({ leader }: Candidate): boolean => !leader || !crosses(leader, rings, placed);
  // Over a grid as the last resort, the nearest place first.
  const found =
    beside.find((candidate) => free(candidate) && clear(candidate)) ??
    gridOver(frame, size, at).find(free) ??
    clamped(beside[0], frame);
  return { text, box: found.box, leader: found.leader };
}

function turned([x, y]: Vec, angle: number): Vec {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  return [c * x - s * y, s * x + c * y];
}

type Size = Pick<Box, "width" | "height">;

/** The box whose nearer side is that far from a point in a direction. */
function towards(at: Vec, [dx, dy]: Vec, distance: number, size: Size, cost: number): Candidate {
  // A box beside an upright edge touches with its side, one above a level edge with its lower side.
  const reach = Math.min(
    size.width / 2 / Math.max(Math.abs(dx), 1e-9),
    size.height / 2 / Math.max(Math.abs(dy), 1e-9),
  );
  const [x, y] = [at[0] + dx * (distance + reach), at[1] + dy * (distance + reach)];
  const box = { x: x - size.width / 2, y: y - size.height / 2, ...size };
  return { box, leader: leaderTo(box, at), cost };
}

function leaderTo(box: Box, at: Vec): readonly [Vec, Vec] | null {
  const end: Vec = [
    Math.min(Math.max(at[0], box.x), box.x + box.width),
    Math.min(Math.max(at[1], box.y + 2), box.y + box.height - 2),
  ];
  const distance = Math.hypot(end[0] - at[0], end[1] - at[1]);
  return distance > BESIDE + 8 ? [at, end] : null;
}

function gridOver(frame: Box, size: Size, at: Vec): Candidate[] {
  const all: Candidate[] = [];
  for (let y = frame.y; y <= frame.y + frame.height - size.height; y += 8) {
    for (let x = frame.x; x <= frame.x + frame.width - size.width; x += 16) {
      const box = { x, y, ...size };
      const cost = Math.hypot(x + size.width / 2 - at[0], y + size.height / 2 - at[1]);
      all.push({ box, leader: leaderTo(box, at), cost });
    }
  }
  return all.sort((a, b) => a.cost - b.cost);
}

function clamped({ box, leader, cost }: Candidate, frame: Box): Candidate {
  const x = Math.min(Math.max(box.x, frame.x), frame.x + frame.width - box.width);
  const y = Math.min(Math.max(box.y, frame.y), frame.y + frame.height - box.height);
  return { box: { ...box, x, y }, leader, cost };
}

function isFree(
  box: Box,
  rings: readonly (readonly number[])[],
  frame: Box,
  placed: readonly PlacedName[],
): boolean {
  const inside =
    box.x >= frame.x &&
    box.y >= frame.y &&
    box.x + box.width <= frame.x + frame.width &&
    box.y + box.height <= frame.y + frame.height;
  if (!inside) return false;
  const wide = grown(box, CLEAR);
  for (const { box: other, leader } of placed) {
    if (overlap(wide, other)) return false;
    if (leader && meets(wide, ...leader[0], ...leader[1])) return false;
  }
  let crossings = 0;
  const [cx, cy] = [box.x + box.width / 2, box.y + box.height / 2];
  for (const ring of rings) {
    for (let k = 0; k < ring.length; k += 2) {
      const [ax, ay] = [ring[k], ring[k + 1]];
      const next = k + 2 === ring.length ? 0 : k + 2;
      const [bx, by] = [ring[next], ring[next + 1]];
      if (meets(wide, ax, ay, bx, by)) return false;
      if (ay > cy !== by > cy && cx < ax + ((cy - ay) / (by - ay)) * (bx - ax)) crossings++;
    }
  }
  return crossings % 2 === 0;
}

function crosses(
  [from, to]: readonly [Vec, Vec],
  rings: readonly (readonly number[])[],
  placed: readonly PlacedName[],
): boolean {
  // It begins on the border itself.
  const start: Vec = [from[0] + 0.02 * (to[0] - from[0]), from[1] + 0.02 * (to[1] - from[1])];
  for (const { box, leader } of placed) {
    if (meets(grown(box, 1), ...start, ...to)) return true;
    if (leader && segmentsMeet(...start, ...to, ...leader[0], ...leader[1])) return true;
  }
  return rings.some((ring) => {
    for (let k = 0; k < ring.length; k += 2) {
      const next = k + 2 === ring.length ? 0 : k + 2;
      if (segmentsMeet(...start, ...to, ring[k], ring[k + 1], ring[next], ring[next + 1])) return true;
    }
    return false;
  });
}

function grown({ x, y, width, height }: Box, by: number): Box {
  return { x: x - by, y: y - by, width: width + 2 * by, height: height + 2 * by };
}

function overlap(a: Box, b: Box): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** Whether a segment has a point in a box. */
function meets({ x, y, width, height }: Box, ax: number, ay: number, bx: number, by: number): boolean {
  if (Math.max(ax, bx) < x || Math.min(ax, bx) > x + width) return false;
  if (Math.max(ay, by) < y || Math.min(ay, by) > y + height) return false;
  const isIn = (px: number, py: number) => px >= x && px <= x + width && py >= y && py <= y + height;
  if (isIn(ax, ay) || isIn(bx, by)) return true;
  return (
    segmentsMeet(ax, ay, bx, by, x, y, x + width, y + height) ||
    segmentsMeet(ax, ay, bx, by, x + width, y, x, y + height)
  );
}

function segmentsMeet(
  ax: number,
  ay: number,
  bx: number,
  by: number,
  cx: number,
  cy: number,
  dx: number,
  dy: number,
): boolean {
  const side = (px: number, py: number, qx: number, qy: number, rx: number, ry: number) =>
    Math.sign((qx - px) * (ry - py) - (qy - py) * (rx - px));
  return (
    side(ax, ay, bx, by, cx, cy) * side(ax, ay, bx, by, dx, dy) <= 0 &&
    side(cx, cy, dx, dy, ax, ay) * side(cx, cy, dx, dy, bx, by) <= 0
  );
}

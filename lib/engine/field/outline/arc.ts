/** A circular arc in the domain's frame, from its start (x0, y0) to its end (x1, y1). */
export interface Arc {
  readonly x0: number;
  readonly y0: number;
  readonly x1: number;
  readonly y1: number;
  readonly cx: number;
  readonly cy: number;
  readonly radius: number;
  /** Direction of the start, seen from the centre, in radians. */
  readonly start: number;
  /** Angle swept, positive counter-clockwise; ±2π for a full circle. */
  readonly sweep: number;
}

/**
 * The arc through both ends whose centre is the given one, moved onto the bisector of its ends (the two radii of the
 * request may differ by rounding). Equal ends make a full circle.
 */
export function makeArc(
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  cx: number,
  cy: number,
  clockwise: boolean,
): Arc {
  const dx = x1 - x0;
  const dy = y1 - y0;
  const squared = dx * dx + dy * dy;
  let centreX = cx;
  let centreY = cy;
  if (squared > 0) {
    const off = ((cx - 0.5 * (x0 + x1)) * dx + (cy - 0.5 * (y0 + y1)) * dy) / squared;
    centreX -= off * dx;
    centreY -= off * dy;
  }
  const radius = Math.hypot(x0 - centreX, y0 - centreY);
  const start = Math.atan2(y0 - centreY, x0 - centreX);
  const end = Math.atan2(y1 - centreY, x1 - centreX);
  let sweep = end - start;
  if (clockwise) {
    if (sweep >= 0) sweep -= 2 * Math.PI;
  } else if (sweep <= 0) sweep += 2 * Math.PI;
  if (squared === 0) sweep = clockwise ? -2 * Math.PI : 2 * Math.PI;
  return { x0, y0, x1, y1, cx: centreX, cy: centreY, radius, start, sweep };
}

/** Point of the arc at parameter t, 0 at its start and 1 at its end, where it is exact. */
export function arcPoint(arc: Arc, t: number): [number, number] {
  if (t <= 0) return [arc.x0, arc.y0];
  if (t >= 1) return [arc.x1, arc.y1];
  const angle = arc.start + t * arc.sweep;
  return [arc.cx + arc.radius * Math.cos(angle), arc.cy + arc.radius * Math.sin(angle)];
}

/** Parameter of the point of the arc nearest to (x, y). */
export function arcNearest(arc: Arc, x: number, y: number): number {
  let turn = Math.atan2(y - arc.cy, x - arc.cx) - arc.start;
  if (arc.sweep < 0) turn = -turn;
  const span = Math.abs(arc.sweep);
  turn -= 2 * Math.PI * Math.floor(turn / (2 * Math.PI));
  if (turn <= span) {
    // Where the direction falls just before the start, 2π minus a rounding means 0.
    return turn / span;
  }
  const toStart = Math.hypot(x - arc.x0, y - arc.y0);
  const toEnd = Math.hypot(x - arc.x1, y - arc.y1);
  return toStart <= toEnd ? 0 : 1;
}

/** Unit direction in which the arc runs at parameter t. */
export function arcDirection(arc: Arc, t: number): [number, number] {
  const angle = arc.start + t * arc.sweep;
  const sign = arc.sweep < 0 ? -1 : 1;
  return [-sign * Math.sin(angle), sign * Math.cos(angle)];
}

/** The same arc run through the other way. */
export function reverseArc(arc: Arc): Arc {
  return {
    ...arc,
    x0: arc.x1,
    y0: arc.y1,
    x1: arc.x0,
    y1: arc.y0,
    start: arc.start + arc.sweep,
    sweep: -arc.sweep,
  };
}

/** Signed area between the arc and its chord: positive when the arc runs counter-clockwise. */
export function arcSegmentArea(arc: Arc): number {
  const s = arc.sweep;
  // θ − sin θ loses its digits for small angles; there its series is used.
  const difference = Math.abs(s) < 1e-3 ? (s * s * s) / 6 : s - Math.sin(s);
  return 0.5 * arc.radius * arc.radius * difference;
}

/** Least box around the arc. */
export function arcBox(arc: Arc): { minX: number; minY: number; maxX: number; maxY: number } {
  const box = {
    minX: Math.min(arc.x0, arc.x1),
    minY: Math.min(arc.y0, arc.y1),
    maxX: Math.max(arc.x0, arc.x1),
    maxY: Math.max(arc.y0, arc.y1),
  };
  const low = Math.min(arc.start, arc.start + arc.sweep);
  const high = Math.max(arc.start, arc.start + arc.sweep);
  for (let k = Math.ceil(low / (Math.PI / 2)); k * (Math.PI / 2) <= high; k++) {
    const quarter = ((k % 4) + 4) % 4;
    if (quarter === 0) box.maxX = Math.max(box.maxX, arc.cx + arc.radius);
    if (quarter === 1) box.maxY = Math.max(box.maxY, arc.cy + arc.radius);
    if (quarter === 2) box.minX = Math.min(box.minX, arc.cx - arc.radius);
    if (quarter === 3) box.minY = Math.min(box.minY, arc.cy - arc.radius);
  }
  return box;
}

/** Number of equal chords with which the arc strays from them by no more than `tolerance`; 45° a chord at most. */
export function chordCount(arc: Arc, share: number, tolerance: number, least: number): number {
  const span = Math.abs(arc.sweep) * share;
  const ratio = Math.min(1, tolerance / arc.radius);
  // Sagitta r(1 − cos(θ/2)) ≤ tolerance.
  const widest = Math.min(Math.PI / 4, 4 * Math.asin(Math.sqrt(ratio / 2)));
  return Math.max(1, Math.ceil(span / widest - 1e-9), Math.ceil(least * share - 1e-9));
}

/**
 * Points strictly between parameters `from` and `to` of a polygon that replaces that stretch of the arc by `chords`
 * equal pieces: on the arc (`outside` false), or the corners of the tangents there (`outside` true), interleaved.
 */
export function arcPolygon(arc: Arc, from: number, to: number, chords: number, outside: boolean): number[] {
  const points: number[] = [];
  const step = (to - from) / chords;
  if (!outside) {
    for (let k = 1; k < chords; k++) points.push(...arcPoint(arc, from + k * step));
    return points;
  }
  const reach = arc.radius / Math.cos((step * arc.sweep) / 2);
  for (let k = 0; k < chords; k++) {
    const angle = arc.start + (from + (k + 0.5) * step) * arc.sweep;
    points.push(arc.cx + reach * Math.cos(angle), arc.cy + reach * Math.sin(angle));
  }
  return points;
}

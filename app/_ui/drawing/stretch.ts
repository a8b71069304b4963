/**
 * A monotone map from one coordinate of a drawing to pixels that keeps small distances visible: uniform scale
 * everywhere, but intervals that would come out too small are widened, at the expense of the rest.
 */

/** A distance that has to be readable: at least `pixels` wide on paper. */
export interface Need {
  readonly from: number;
  readonly to: number;
  readonly pixels: number;
}

export interface Stretch {
  readonly map: (value: number) => number;
  /** False where every need was met by the uniform scale. */
  readonly distorted: boolean;
}

/**
 * @param low Smallest coordinate of the drawing, model units.
 * @param high Largest coordinate of the drawing, model units.
 * @param scale Uniform scale, pixels a unit.
 * @param available Pixels that the range may take in all; exceeded only where the needs alone exceed it.
 */
export function stretch(
  low: number,
  high: number,
  scale: number,
  available: number,
  needs: readonly Need[],
): Stretch {
  const tolerance = 1e-14 * Math.max(Math.abs(low), Math.abs(high));
  const breaks = distinct([low, high, ...needs.flatMap(({ from, to }) => [from, to])], tolerance);
  const cells = breaks.slice(1).map((value, index) => (value - breaks[index]) * scale);
  const fixed = cells.map(() => false);

  const inside = (need: Need, index: number) =>
    breaks[index] >= Math.min(need.from, need.to) - tolerance &&
    breaks[index + 1] <= Math.max(need.from, need.to) + tolerance;
  const size = (need: Need) =>
    cells.reduce((sum, cell, index) => (inside(need, index) ? sum + cell : sum), 0);

  let distorted = false;
  for (const need of [...needs].sort((a, b) => Math.abs(a.to - a.from) - Math.abs(b.to - b.from))) {
    const now = size(need);
    if (now === 0) continue;
    const factor = Math.max(1, need.pixels / now);
    if (factor > 1.001) distorted = true;
    for (let index = 0; index < cells.length; index += 1) {
      if (!inside(need, index)) continue;
      if (factor > 1) cells[index] *= factor;
      if (factor > 1.001) fixed[index] = true;
    }
  }

  const total = (keep: boolean) =>
    cells.reduce((sum, cell, index) => (fixed[index] === keep ? sum + cell : sum), 0);
  const free = total(false);
  const excess = total(true) + free - available;
  if (distorted && excess > 0 && free > 0) {
    const factor = Math.max(0.25, (free - excess) / free);
    for (let index = 0; index < cells.length; index += 1) if (!fixed[index]) cells[index] *= factor;
  }

  const places = [0];
  for (const cell of cells) places.push(places[places.length - 1] + cell);
  const last = breaks.length - 1;
  const map = (value: number): number => {
    if (value <= breaks[0]) return (value - breaks[0]) * scale;
    if (value >= breaks[last]) return places[last] + (value - breaks[last]) * scale;
    let index = 0;
    while (value > breaks[index + 1]) index += 1;
    const share = (value - breaks[index]) / (breaks[index + 1] - breaks[index]);
    return places[index] + share * cells[index];
  };
  return { map, distorted };
}

/** Sorted values, those closer than the tolerance taken as one. */
export function distinct(values: readonly number[], tolerance: number): number[] {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted.filter((value, index) => index === 0 || value - sorted[index - 1] > tolerance);
}

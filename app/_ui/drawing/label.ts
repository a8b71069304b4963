/** Text on a drawing: how wide it is, and where it can stand without covering anything. */
import type { Point } from "@/lib/engine/shape/drawing";
import { symbolParts } from "../symbol-text";

export const FONT_SIZE = 13;

/** A rectangle on paper, y down. */
export interface Rect {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** What stands at a dimension line. */
export interface LabelText {
  readonly symbol: string;
  /** Formatted value with its unit; without one only the symbol is written. */
  readonly value?: string;
}

const WIDE = new Set("mwMWΩ%@");
const NARROW = new Set("ijl.,:;'|!");
const SLIM = new Set("tfr()[]1 -");

/** Estimated width in pixels; the true one depends on the reader's fonts, so it errs to the wide side. */
export function textWidth(text: string, size = FONT_SIZE): number {
  let width = 0;
  for (const character of text) {
    width += NARROW.has(character) ? 0.3 : SLIM.has(character) ? 0.42 : WIDE.has(character) ? 0.92 : 0.61;
  }
  return width * size;
}

export function labelWidth({ symbol, value }: LabelText): number {
  const letters = symbolParts(symbol).reduce(
    (sum, part) => sum + textWidth(part.text, part.sub ? 0.75 * FONT_SIZE : FONT_SIZE),
    0,
  );
  return letters + (value ? textWidth(` = ${value}`) : 0);
}

export function rectAround(x: number, y: number, width: number, height: number): Rect {
  return { x: x - width / 2, y: y - height / 2, width, height };
}

export function union(rects: readonly Rect[]): Rect {
  const x = Math.min(...rects.map((rect) => rect.x));
  const y = Math.min(...rects.map((rect) => rect.y));
  return {
    x,
    y,
    width: Math.max(...rects.map((rect) => rect.x + rect.width)) - x,
    height: Math.max(...rects.map((rect) => rect.y + rect.height)) - y,
  };
}

function overlap(a: Rect, b: Rect): number {
  const x = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const y = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return x > 0 && y > 0 ? x * y : 0;
}

/** What a label should not cover. */
export interface Obstacles {
  /** Other labels and dimension lines: as bad as the area covered. */
  readonly rects: readonly Rect[];
  /** Points along edges and terminals: covering one hides part of the contour. */
  readonly edges: readonly Point[];
  /** Whether a place lies in the hatched body, where a label is legible but less so. */
  readonly inBody: (x: number, y: number) => boolean;
}

function cost(candidate: Rect, { rects, edges, inBody }: Obstacles): number {
  const { x, y, width, height } = candidate;
  const covered = rects.reduce((sum, rect) => sum + overlap(candidate, rect), 0);
  const hidden = edges.filter(
    (edge) => edge[0] > x && edge[0] < x + width && edge[1] > y && edge[1] < y + height,
  );
  const hatched = [0.1, 0.5, 0.9].filter((share) => inBody(x + share * width, y + height / 2));
  return covered + 40 * hidden.length + 12 * hatched.length;
}

/** The candidate that costs least, the earlier one if two cost the same. */
export function place<C extends { readonly box: Rect }>(candidates: readonly C[], obstacles: Obstacles): C {
  let best = candidates[0];
  let least = Infinity;
  for (const candidate of candidates) {
    const costs = cost(candidate.box, obstacles);
    if (costs >= least) continue;
    best = candidate;
    least = costs;
  }
  return best;
}

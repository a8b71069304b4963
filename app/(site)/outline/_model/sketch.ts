/**
 * The state of the outline page: a drawing with its terminals and media, in the order and numbering of the API's body,
 * so that complaints and results point at what the page shows.
 */
import type { LengthUnit } from "@/lib/engine/field/outline/length-units";

/** Names and texts of a group of fields, as in the calculator. */
export type Parameters = Readonly<Record<string, string>>;

export type Point = readonly [number, number];

export interface ArcCentre {
  readonly x: number;
  readonly y: number;
  readonly clockwise: boolean;
}

/** A corner, in the outline's unit. `arc` says how the edge that ends here runs; without it the edge is straight. */
export interface Vertex {
  readonly x: number;
  readonly y: number;
  readonly arc?: ArcCentre;
}

/** Open list of vertices; edge i runs from vertex i to the next, the last edge back to vertex 0. */
export type Ring = readonly Vertex[];

/** A stretch of one edge, `from` and `to` between 0 and 1. */
export interface Part {
  readonly ring: number;
  readonly edge: number;
  readonly from: number;
  readonly to: number;
}

export interface Terminal {
  readonly name: string;
  readonly parts: readonly Part[];
  /** Stretches given by their ends that lie on no single edge here; kept as they came. */
  readonly segments: readonly (readonly [Point, Point])[];
}

/** A polygon of another medium; its vertices have no arcs. */
export interface Region {
  readonly ring: Ring;
  readonly medium: Parameters;
}

export interface Sketch {
  readonly unit: LengthUnit;
  readonly symmetry: "plan" | "axisymmetric";
  /** The outer ring, which may be empty while it is drawn, then the holes. */
  readonly rings: readonly Ring[];
  readonly terminals: readonly Terminal[];
  readonly medium: Parameters;
  readonly regions: readonly Region[];
  readonly accuracy: number;
  /** Temperature, voltage, current, power, min, max, where they are given. */
  readonly settings: Parameters;
}

/** Number of a ring: 0 the outer one, 1 … the holes, −1, −2 … the borders of the regions. */
export type RingKey = number;

export function regionKey(region: number): RingKey {
  return -1 - region;
}

export function ringOf(sketch: Sketch, key: RingKey): Ring {
  return (key >= 0 ? sketch.rings[key] : sketch.regions[-1 - key]?.ring) ?? [];
}

export function withRing(sketch: Sketch, key: RingKey, ring: Ring): Sketch {
  if (key >= 0) return { ...sketch, rings: sketch.rings.map((old, k) => (k === key ? ring : old)) };
  return {
    ...sketch,
    regions: sketch.regions.map((region, k) => (regionKey(k) === key ? { ...region, ring } : region)),
  };
}

/** All ring keys of a sketch that have vertices. */
export function ringKeys(sketch: Sketch): readonly RingKey[] {
  return [...sketch.rings.map((_, k) => k), ...sketch.regions.map((_, k) => regionKey(k))].filter(
    (key) => ringOf(sketch, key).length > 0,
  );
}

export function ringTitle(key: RingKey): string {
  if (key === 0) return "Outer ring";
  return key > 0 ? `Hole ${key - 1}` : `Region ${-1 - key}`;
}

/** A coordinate with the digits that it has, without the dust of sums in binary. */
export function coordinateText(value: number): string {
  return String(Number(value.toPrecision(12)));
}

export function tidy(value: number): number {
  return Number(value.toPrecision(12)) + 0;
}

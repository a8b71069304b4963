/**
 * A field solution as plain arrays: all that pictures, point values and lines need. It can be stored and sent.
 *
 * In each triangle both functions are given by their local coefficients in the order of its layout (interior functions
 * first, then vertices, then edges in the triangle's own direction), so no topology is needed to evaluate them.
 */

import { ElementField } from "../bounds/element-field";
import { elementLayout, type ElementLayout } from "../element/layout";
import type { BoundarySide } from "../mesh/mesh";
import type { DiscreteField, SolvedPair } from "../solve/pair";
import type { PartedVertices } from "./chord-corners";

export interface FieldMap {
  /** Vertices in the domain's frame, interleaved. */
  readonly xy: Float64Array;
  readonly triangles: Int32Array;
  readonly region: Int32Array;
  /** Vertices a, b and side of each boundary edge, conductor on the left. */
  readonly boundary: Int32Array;
  readonly sides: readonly BoundarySide[];
  /** Orders of the three edges of each triangle. */
  readonly edgeOrders: Uint8Array;
  /** Start of each triangle's coefficients, one entry more than triangles. */
  readonly start: Int32Array;
  /** Volts for one volt between the two terminals of the picture. */
  readonly potential: Float64Array;
  /** Stream function: its difference between two points is the current that passes between them, in amperes. */
  readonly stream: Float64Array;
  /** Point of the outline, in its unit, that is the domain's origin, and length of the domain's unit. */
  readonly origin: readonly [number, number];
  readonly scale: number;
  /** Metres in one unit of the domain. */
  readonly unitM: number;
  /** Current for one volt between the two terminals, in amperes. */
  readonly current: number;
  readonly axisymmetric: boolean;
  /** Terminals between which the current flows: high, low. */
  readonly between: readonly [number, number];
  /** Vertices at which the potential goes like r^exponent with an exponent that is no whole number. */
  readonly singularVertex: Int32Array;
  readonly singularExponent: Float64Array;
  /** Vertices at which only the chords of an arc make the field singular. */
  readonly chordVertex: Int32Array;
}

export interface MapFrame {
  readonly origin: readonly [number, number];
  readonly scale: number;
  readonly unitM: number;
  readonly axisymmetric: boolean;
  readonly between: readonly [number, number];
}

/**
 * The map of one combination of a solution's fields: potential shift + Σ c_a V_a, stream function
 * conductance·Σ c_a ψ_a. The stream function is turned so that its rotation is the current density -σ∇V.
 */
export function makeFieldMap(
  pair: SolvedPair,
  combination: readonly number[],
  shift: number,
  conductance: number,
  singular: PartedVertices,
  frame: MapFrame,
): FieldMap {
  const { set } = pair;
  const count = set.triangleCount;
  const start = new Int32Array(count + 1);
  const edgeOrders = new Uint8Array(3 * count);
  for (let t = 0; t < count; t++) {
    start[t + 1] = start[t] + set.layouts[t].size;
    edgeOrders.set(set.layouts[t].edgeOrder, 3 * t);
  }
  const potential = new Float64Array(start[count]);
  const stream = new Float64Array(start[count]);
  const v = combined(pair.potentials, combination, 1);
  const s = combined(pair.streams, combination, -conductance);
  const element = new ElementField();
  for (let t = 0; t < count; t++) {
    const size = start[t + 1] - start[t];
    element.load(pair.potentialSystem, v, t);
    element.recover(pair.potentialSystem, t);
    potential.set(element.values.subarray(0, size), start[t]);
    const vertices = start[t] + set.layouts[t].interior;
    for (let i = 0; i < 3; i++) potential[vertices + i] += shift;
    element.load(pair.streamSystem, s, t);
    element.recover(pair.streamSystem, t);
    stream.set(element.values.subarray(0, size), start[t]);
  }
  const { xy, triangles, region, boundary, sides } = set.mesh;
  const form = pair.currents[frame.between[0]];
  let current = 0;
  for (let k = 0; k < form.entity.length; k++) {
    current -= form.coefficient[k] * s.x[pair.streamSystem.structure.entityFirst[form.entity[k]]];
  }
  return {
    xy,
    triangles,
    region,
    boundary,
    sides,
    edgeOrders,
    start,
    potential,
    stream,
    current,
    singularVertex: Int32Array.from(singular.own, ({ vertex }) => vertex),
    singularExponent: Float64Array.from(singular.own, ({ exponent }) => exponent),
    chordVertex: Int32Array.from(singular.ofChords, ({ vertex }) => vertex),
    ...frame,
  };
}

/** Layout of a triangle of a map. */
export function layoutOf(map: FieldMap, t: number): ElementLayout {
  const { edgeOrders } = map;
  return elementLayout(edgeOrders[3 * t], edgeOrders[3 * t + 1], edgeOrders[3 * t + 2]);
}

function combined(
  fields: readonly DiscreteField[],
  combination: readonly number[],
  scale: number,
): DiscreteField {
  const x = new Float64Array(fields[0].x.length);
  const prescribed = new Array<number>(fields[0].prescribed.length).fill(0);
  fields.forEach((field, a) => {
    const c = scale * combination[a];
    if (c === 0) return;
    for (let i = 0; i < x.length; i++) x[i] += c * field.x[i];
    field.prescribed.forEach((value, k) => (prescribed[k] += c * value));
  });
  return { x, prescribed };
}

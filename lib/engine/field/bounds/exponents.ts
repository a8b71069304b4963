/**
 * Where and how strongly the field is singular.
 *
 * Near a point at which the boundary turns, a terminal ends or media meet, the potential goes like r^α. With Φ(θ) the
 * angular part, (σΦ')' + α²σΦ = 0 in each sector of constant σ, Φ and σΦ' are continuous, and α is the smallest
 * positive number that fits the conditions at the two borders (or the period, for an inner point). In one medium this
 * is π/ω between like borders and π/2ω between a terminal and insulation. Other than on whole numbers the function
 * is not smooth, and the mesh has to be graded towards the point.
 */

import type { BoundaryRuns } from "../assembly/boundary-runs";
import type { FieldMesh } from "../mesh/mesh";

export interface SingularVertex {
  readonly vertex: number;
  /** The gradient goes like r^(α-1). */
  readonly exponent: number;
}

/** Smallest exponent that is looked for; stronger singularities are graded as if they had this one. */
const SMALLEST = 0.02;

/** Corners sharper than this leave a field so smooth that no grading is worth while. */
const LARGEST = 4;

/** All vertices where the exponent is not (nearly) a whole number. */
export function singularVertices(mesh: FieldMesh, runs: BoundaryRuns, sigma: Float64Array): SingularVertex[] {
  const { xy, triangles } = mesh;
  const vertexCount = xy.length / 2;
  const angle = new Float64Array(vertexCount);
  const medium = new Float64Array(vertexCount);
  const mixed = new Uint8Array(vertexCount);
  for (let h = 0; h < triangles.length; h++) {
    const v = triangles[h];
    angle[v] += cornerAngle(mesh, h);
    const s = sigma[(h / 3) | 0];
    if (medium[v] === 0) medium[v] = s;
    else if (medium[v] !== s) mixed[v] = 1;
  }
  const result: SingularVertex[] = [];
  let corners: Map<number, number[]> | null = null;
  for (let v = 0; v < vertexCount; v++) {
    let exponent = 1;
    if (mixed[v]) {
      corners ??= cornersOf(mesh, mixed);
      exponent = sectorExponent(mesh, runs, sigma, v, corners.get(v) ?? []);
    } else if (runs.next[v] >= 0) {
      const change = runs.terminalOf[v] >= 0 && runs.insulatedRun[v] >= 0;
      exponent = Math.PI / (change ? 2 * angle[v] : angle[v]);
    } else continue;
    if (exponent < LARGEST && Math.abs(exponent - Math.round(exponent)) > 1e-7 * exponent) {
      result.push({ vertex: v, exponent });
    }
  }
  return result;
}

/** Angle of a triangle at its corner number h = 3t + i. */
function cornerAngle(mesh: FieldMesh, h: number): number {
  const { xy, triangles } = mesh;
  const base = h - (h % 3);
  const v = 2 * triangles[h];
  const a = 2 * triangles[base + ((h + 1) % 3)];
  const b = 2 * triangles[base + ((h + 2) % 3)];
  const ax = xy[a] - xy[v];
  const ay = xy[a + 1] - xy[v + 1];
  const bx = xy[b] - xy[v];
  const by = xy[b + 1] - xy[v + 1];
  return Math.atan2(ax * by - ay * bx, ax * bx + ay * by);
}

function cornersOf(mesh: FieldMesh, wanted: Uint8Array): Map<number, number[]> {
  const corners = new Map<number, number[]>();
  mesh.triangles.forEach((v, h) => {
    if (!wanted[v]) return;
    const list = corners.get(v);
    if (list) list.push(h);
    else corners.set(v, [h]);
  });
  return corners;
}

interface Sector {
  angle: number;
  readonly sigma: number;
}

function sectorExponent(
  mesh: FieldMesh,
  runs: BoundaryRuns,
  sigma: Float64Array,
  v: number,
  corners: readonly number[],
): number {
  const { triangles } = mesh;
  const byFirst = new Map<number, number>();
  for (const h of corners) byFirst.set(triangles[h - (h % 3) + ((h + 1) % 3)], h);
  const inner = runs.next[v] < 0;
  // Start at the boundary edge, or inside at a border between media, and go round counter-clockwise.
  let start = inner ? -1 : runs.next[v];
  if (inner) {
    for (const h of corners) {
      const after = byFirst.get(triangles[h - (h % 3) + ((h + 2) % 3)]);
      if (after !== undefined && sigma[(after / 3) | 0] !== sigma[(h / 3) | 0]) {
        start = triangles[after - (after % 3) + ((after + 1) % 3)];
      }
    }
  }
  const sectors: Sector[] = [];
  let next = start;
  for (let k = 0; k < corners.length; k++) {
    const h = byFirst.get(next);
    if (h === undefined) break;
    const s = sigma[(h / 3) | 0];
    const last = sectors[sectors.length - 1];
    if (last && last.sigma === s) last.angle += cornerAngle(mesh, h);
    else sectors.push({ angle: cornerAngle(mesh, h), sigma: s });
    next = triangles[h - (h % 3) + ((h + 2) % 3)];
  }
  if (inner) {
    // A straight border is no corner: the field is smooth on either side.
    if (sectors.length === 2 && Math.abs(sectors[0].angle - Math.PI) < 1e-9) return 1;
    return smallestRoot((alpha) => transfer(sectors, alpha).trace - 2);
  }
  const first = runs.terminalAfter[v] >= 0;
  const last = next >= 0 && runs.terminalAfter[next] >= 0 && runs.next[next] === v;
  return smallestRoot((alpha) => {
    const m = transfer(sectors, alpha);
    if (first) return last ? m.valueOfFlux : m.fluxOfFlux;
    return last ? m.valueOfValue : m.fluxOfValue;
  });
}

/** How (Φ, σΦ') at the end of the sectors depends on the two at their beginning. */
function transfer(sectors: readonly Sector[], alpha: number) {
  let a = 1;
  let b = 0;
  let c = 0;
  let d = 1;
  // Conductivities are taken relative to the first, so that their size does not matter.
  for (const { angle, sigma } of sectors) {
    const s = (alpha * sigma) / sectors[0].sigma;
    const cos = Math.cos(alpha * angle);
    const sin = Math.sin(alpha * angle);
    [a, b, c, d] = [
      cos * a + (sin / s) * c,
      cos * b + (sin / s) * d,
      cos * c - s * sin * a,
      cos * d - s * sin * b,
    ];
  }
  return { valueOfValue: a, valueOfFlux: b, fluxOfValue: c, fluxOfFlux: d, trace: a + d };
}

/** First change of sign in (SMALLEST, 1), or 1 if there is none. */
function smallestRoot(f: (alpha: number) => number): number {
  const steps = 200;
  let low = SMALLEST / 4;
  let atLow = f(low);
  for (let k = 1; k <= steps; k++) {
    const high = low + (1 - SMALLEST / 4) / steps;
    const atHigh = f(high);
    if (atLow * atHigh < 0) {
      let p = low;
      let q = high;
      for (let i = 0; i < 40; i++) {
        const middle = (p + q) / 2;
        if (f(middle) * atLow > 0) p = middle;
        else q = middle;
      }
      return Math.max(SMALLEST, (p + q) / 2);
    }
    low = high;
    atLow = atHigh;
  }
  return 1;
}

/**
 * The true equipotential rod: a round cylinder with its flat end face, driven from the surface of the ground, by
 * boundary elements. Rings of charge on the surface and their images above the ground; the kernel of two rings is
 * 1/agm(largest, smallest distance). Panels graded towards the edge, four unknowns each; against finer panels the result
 * changes by less than 1e-6.
 */
import { agm } from "@/lib/engine/numeric/agm";
import { gaussLegendre } from "@/lib/engine/numeric/gauss-legendre";
import { solveInPlace } from "@/lib/engine/numeric/lu-solve";

const ORDER = 4;
const NODES = gaussLegendre(ORDER);
const RULE = gaussLegendre(16);

interface Panel {
  readonly face: "side" | "end";
  /** Distance from the lower edge: up along the side, or inwards on the end face. */
  readonly from: number;
  readonly to: number;
}

/** Resistance over resistivity times the radius, of a rod that many radii long. */
export function trueRod(slenderness: number): number {
  const panels = [
    ...graded(slenderness).map(([from, to]): Panel => ({ face: "side", from, to })),
    ...graded(1).map(([from, to]): Panel => ({ face: "end", from, to })),
  ];
  const place = (face: Panel["face"], u: number): readonly [number, number] =>
    face === "side" ? [1, slenderness - u] : [1 - u, slenderness];
  const n = panels.length * ORDER;
  const matrix = new Float64Array(n * n);
  const weights = new Float64Array(n);
  panels.forEach((target, k) => {
    for (let i = 0; i < ORDER; i++) {
      const row = k * ORDER + i;
      const u = target.from + (target.to - target.from) * NODES.nodes[i];
      weights[row] = (target.to - target.from) * NODES.weights[i];
      const [r, z] = place(target.face, u);
      panels.forEach((source, j) => {
        const same = source.face === target.face;
        const nearest = same ? Math.min(Math.max(u, source.from), source.to) : source.from;
        const [rn, zn] = place(source.face, nearest);
        const width = source.to - source.from;
        const close = Math.hypot(r - rn, z - zn) < 2 * width;
        for (const [a, b] of close ? shrinking(source, nearest) : [[source.from, source.to]]) {
          for (let q = 0; q < 16; q++) {
            const v = a + (b - a) * RULE.nodes[q];
            const [rs, zs] = place(source.face, v);
            // The difference along one face without subtracting places.
            const gap = same ? Math.abs(v - u) : Math.hypot(r - rs, z - zs);
            const rings =
              1 / agm(Math.hypot(r + rs, same && source.face === "side" ? v - u : z - zs), gap) +
              1 / agm(Math.hypot(r + rs, z + zs), Math.hypot(r - rs, z + zs));
            const weight = Math.abs(b - a) * RULE.weights[q] * rings;
            const s = (v - source.from) / width;
            for (let p = 0; p < ORDER; p++) matrix[row * n + j * ORDER + p] += weight * lagrange(p, s);
          }
        }
      });
    }
  });
  const charge = solveInPlace(matrix, new Float64Array(n).fill(1));
  return 1 / (4 * Math.PI * charge.reduce((sum, q, i) => sum + q * weights[i], 0));
}

/** Panels from 0, doubling in length away from it. */
function graded(length: number): (readonly [number, number])[] {
  const ends = [length];
  while (ends[ends.length - 1] > 1e-5) ends.push(ends[ends.length - 1] / 2);
  ends.push(0);
  return ends.slice(1).map((end, i) => [end, ends[i]] as const);
}

/** Pieces of a panel that shrink towards a place in it or at its end. */
function shrinking({ from, to }: Panel, place: number): (readonly [number, number])[] {
  const pieces: (readonly [number, number])[] = [];
  for (const end of [from, to]) {
    const reach = end - place;
    if (reach === 0) continue;
    for (let k = 0, inner = 0; k <= 13; k++) {
      const outer = k === 13 ? 1 : 4 ** (k - 13);
      pieces.push([place + reach * inner, place + reach * outer]);
      inner = outer;
    }
  }
  return pieces;
}

function lagrange(p: number, s: number): number {
  let product = 1;
  for (let j = 0; j < ORDER; j++) {
    if (j !== p) product *= (s - NODES.nodes[j]) / (NODES.nodes[p] - NODES.nodes[j]);
  }
  return product;
}

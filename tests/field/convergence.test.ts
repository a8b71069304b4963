import { describe, expect, it } from "vitest";
import { refine } from "@/lib/engine/field/mesh/bisect";
import type { FieldMesh } from "@/lib/engine/field/mesh/mesh";
import { bendMesh, squareMesh, withBoundary } from "./support/meshes";
import { solveOn } from "./support/solutions";

/** All triangles bisected twice: the mesh width halves. */
function halved(mesh: FieldMesh): FieldMesh {
  const all = (m: FieldMesh): Uint8Array => new Uint8Array(m.triangles.length / 3).fill(1);
  const once = refine(mesh, all(mesh));
  return refine(once, all(once));
}

/** A square mesh whose inner vertices are shifted, so that nothing lines up. */
function crookedSquare(n: number): FieldMesh {
  const mesh = squareMesh(n);
  const xy = mesh.xy.map((value, k) => {
    const v = k - (k % 2);
    const [x, y] = [mesh.xy[v], mesh.xy[v + 1]];
    const bump = Math.sin(5 * x + 3 * y) * x * (1 - x) * y * (1 - y);
    return value + (k % 2 === 0 ? 0.5 : -0.4) * bump;
  });
  return withBoundary(xy, mesh.triangles, (x) => (x < 1e-9 ? 0 : x > 1 - 1e-9 ? 1 : -1));
}

describe("patch test", () => {
  it.each([1, 2, 3, 4, 5, 6, 8])("a uniform field is exact on a crooked mesh at order %i", (order) => {
    const { lower, upper, gap } = solveOn(crookedSquare(4), order);
    expect(lower).toBeLessThanOrEqual(1);
    expect(upper).toBeGreaterThanOrEqual(1);
    expect(upper - lower).toBeLessThan(1e-12);
    expect(gap).toBeLessThan(1e-20);
  });

  it("two media in series and in parallel are exact", () => {
    const mesh = squareMesh(4);
    const split = (axis: 0 | 1): FieldMesh => ({
      ...mesh,
      region: Int32Array.from({ length: mesh.triangles.length / 3 }, (_, t) => {
        const at = [0, 1, 2].reduce((s, i) => s + mesh.xy[2 * mesh.triangles[3 * t + i] + axis], 0) / 3;
        return at < 0.5 ? 0 : 1;
      }),
    });
    for (const ratio of [1e-8, 3, 1e8]) {
      const series = solveOn(split(0), 3, [1, ratio]);
      expect(series.lower / (0.5 + 0.5 / ratio)).toBeCloseTo(1, 12);
      expect(series.upper / (0.5 + 0.5 / ratio)).toBeCloseTo(1, 12);
      const parallel = solveOn(split(1), 3, [1, ratio]);
      expect(parallel.lower * (0.5 + 0.5 * ratio)).toBeCloseTo(1, 12);
      expect(parallel.upper * (0.5 + 0.5 * ratio)).toBeCloseTo(1, 12);
    }
  });
});

describe("manufactured solution", () => {
  // σ = e^(ax+by) on the unit square: V depends on x alone, R = ∫e^(-ax)dx / ∫e^(by)dy.
  it.each([1, 2, 3, 4, 5, 6])("at order %i both bounds converge like h^2p", (order) => {
    // High orders need a steeper field, or two meshes would not lie between the first and the last digit.
    const [a, b] = order < 4 ? [2, -1.5] : [8, -6];
    const sigma = (x: number, y: number): number => Math.exp(a * x + b * y);
    const exact = (1 - Math.exp(-a)) / a / ((Math.exp(b) - 1) / b);
    const first = crookedSquare(order < 6 ? 4 : 2);
    const coarse = solveOn(first, order, [sigma]);
    const fine = solveOn(halved(first), order, [sigma]);
    for (const s of [coarse, fine]) {
      expect(s.lower).toBeLessThanOrEqual(exact);
      expect(s.upper).toBeGreaterThanOrEqual(exact);
    }
    const orderOf = (x: number, y: number): number => Math.log2(x / y) / 2;
    expect(Math.abs(orderOf(exact - coarse.lower, exact - fine.lower) - order)).toBeLessThan(0.35);
    expect(Math.abs(orderOf(coarse.upper - exact, fine.upper - exact) - order)).toBeLessThan(0.35);
    expect(Math.abs(orderOf(coarse.gap, fine.gap) - order)).toBeLessThan(0.35);
  });
});

describe("monotone bounds", () => {
  it("come nearer with every refinement and every order, and keep the truth between them", () => {
    // The exact bend: legs of 2 from the inner corner; short legs keep it below 4 + 1 - (2/π)ln2 by about 4e-7.
    const limit = 4 + 1 - (2 / Math.PI) * Math.LN2;
    let mesh = bendMesh(1);
    let last = { lower: 0, upper: Infinity };
    for (let level = 0; level < 4; level++) {
      const bounds = [1, 2, 3, 4, 5].map((order) => solveOn(mesh, order));
      for (let k = 0; k < bounds.length; k++) {
        const before = k === 0 ? last : bounds[k - 1];
        if (k > 0 || level > 0) {
          const floor = k === 0 ? last : before;
          expect(bounds[k].lower).toBeGreaterThanOrEqual(floor.lower * (1 - 1e-13));
          expect(bounds[k].upper).toBeLessThanOrEqual(floor.upper * (1 + 1e-13));
        }
        expect(bounds[k].lower).toBeLessThan(limit);
        expect(bounds[k].upper).toBeGreaterThan(limit - 1e-6);
        const width = 1 / bounds[k].lower - 1 / bounds[k].upper;
        expect(bounds[k].gap / width).toBeCloseTo(1, 9);
      }
      last = bounds[0];
      mesh = halved(mesh);
    }
  });
});

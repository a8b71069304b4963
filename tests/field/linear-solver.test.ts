import { describe, expect, it } from "vitest";
import { makeElements } from "@/lib/engine/field/assembly/elements";
import { factorPanel, subtractBorder } from "@/lib/engine/field/solve/dense";
import { dissect } from "@/lib/engine/field/solve/dissection";
import { factorise, SingularMatrixError, substitute } from "@/lib/engine/field/solve/factor";
import { InterruptedError } from "@/lib/engine/field/solve/interruption";
import { localUnknowns, MOST_OUTER } from "@/lib/engine/field/solve/assemble";
import { localTerms } from "@/lib/engine/field/solve/terms";
import type { LinearSystem } from "@/lib/engine/field/solve/system";
import { seededRandom } from "./random-outlines";
import { bendMesh, holedMesh, onHole } from "./support/meshes";
import { solveOn } from "./support/solutions";

describe("dense kernels", () => {
  it.each([
    [1, 1],
    [3, 5],
    [7, 7],
    [16, 40],
    [17, 23],
    [50, 97],
    [61, 61],
  ])("factorise %i of %i columns", (k, n) => {
    const random = seededRandom(100 * k + n);
    // A symmetric positive definite matrix: B·Bᵗ + 1.
    const b = Array.from({ length: n }, () => Array.from({ length: n }, () => random() - 0.5));
    const a = b.map((row, i) =>
      b.map((other, j) => row.reduce((s, x, l) => s + x * other[l], 0) + (i === j ? 1 : 0)),
    );
    const panel = new Float64Array(n * k + 5);
    for (let i = 0; i < n; i++) for (let j = 0; j < k; j++) panel[5 + i * k + j] = a[i][j];
    expect(factorPanel(panel, 5, k, n)).toBe(true);
    const m = n - k;
    const border = new Float64Array(m * m);
    for (let i = 0; i < m; i++) for (let j = 0; j <= i; j++) border[i * m + j] = a[k + i][k + j];
    subtractBorder(panel, 5, k, n, border, 0);
    const l = (i: number, j: number): number => (j > i ? 0 : panel[5 + i * k + j]);
    for (let i = 0; i < n; i++) {
      for (let j = 0; j <= i; j++) {
        let sum = 0;
        for (let c = 0; c < k; c++) sum += l(i, c) * l(j, c);
        if (j >= k) sum += border[(i - k) * m + (j - k)];
        expect(sum).toBeCloseTo(a[i][j], 10);
      }
    }
  });

  it("see a pivot that is not positive", () => {
    expect(factorPanel(Float64Array.from([1, 0, 2, 1]), 0, 2, 2)).toBe(false);
  });
});

describe("dissection", () => {
  it("is a tree of sets: every triangle in one leaf, children before parents, halves not too uneven", () => {
    const mesh = bendMesh(6);
    const count = mesh.triangles.length / 3;
    const tree = dissect(makeElements(mesh, new Uint8Array(count).fill(4)));
    const seen = new Uint8Array(count);
    for (let n = 0; n < tree.nodeCount; n++) {
      if (tree.left[n] < 0) {
        for (let k = tree.first[n]; k < tree.last[n]; k++) seen[tree.order[k]]++;
        continue;
      }
      expect(tree.left[n]).toBeLessThan(n);
      expect(tree.right[n]).toBeLessThan(n);
      expect(tree.parent[tree.left[n]]).toBe(n);
      expect(tree.parent[tree.right[n]]).toBe(n);
      expect(tree.first[n]).toBe(tree.first[tree.left[n]]);
      expect(tree.last[n]).toBe(tree.last[tree.right[n]]);
      expect(tree.last[tree.left[n]]).toBe(tree.first[tree.right[n]]);
    }
    expect(seen.every((times) => times === 1)).toBe(true);
  });
});

/** K·x by elements, as the fronts never do it. */
function product(system: LinearSystem, x: Float64Array): Float64Array {
  const result = new Float64Array(x.length);
  const unknowns = new Int32Array(MOST_OUTER);
  for (let t = 0; t < system.set.triangleCount; t++) {
    const n = localUnknowns(system, t, unknowns);
    const { local, unknown, coefficient } = localTerms(system, t, n, unknowns);
    const start = system.matrices.start[t];
    for (let p = 0; p < local.length; p++) {
      for (let q = 0; q < local.length; q++) {
        const i = Math.max(local[p], local[q]);
        const j = Math.min(local[p], local[q]);
        const k = system.matrices.values[start + (i * (i + 1)) / 2 + j];
        result[unknown[p]] += system.weight[t] * coefficient[p] * coefficient[q] * k * x[unknown[q]];
      }
    }
  }
  return result;
}

describe("multifrontal factorisation", () => {
  const solved = [
    solveOn(bendMesh(4), 5),
    solveOn(
      holedMesh(10, (x, y) => (onHole(x, y) ? 0 : x > 1 - 1e-9 ? 1 : -1)),
      4,
    ),
  ];

  it.each([0, 1])("solves both systems to rounding (mesh %i)", (which) => {
    const { pair } = solved[which];
    for (const system of [pair.potentialSystem, pair.streamSystem]) {
      const random = seededRandom(7);
      const truth = Float64Array.from({ length: system.structure.unknowns }, () => random() - 0.5);
      const x = product(system, truth);
      substitute(factorise(system), x);
      const worst = x.reduce((w, value, k) => Math.max(w, Math.abs(value - truth[k])), 0);
      expect(worst).toBeLessThan(1e-10);
    }
  });

  it("is far cheaper than dense elimination and grows slower than N^1.5", () => {
    const small = solveOn(bendMesh(4), 4).pair;
    const large = solveOn(bendMesh(16), 4).pair;
    const n = (p: typeof small): number => p.potentialSystem.structure.unknowns;
    const work = (p: typeof small): number => p.potentialSystem.structure.operations;
    const exponent = Math.log(work(large) / work(small)) / Math.log(n(large) / n(small));
    expect(exponent).toBeLessThan(1.5);
    expect(work(large)).toBeLessThan(n(large) ** 3 / 3 / 1000);
  });

  it("says so if the matrix is singular, and stops when asked", () => {
    const { potentialSystem } = solved[0].pair;
    const singular = { ...potentialSystem, weight: potentialSystem.weight.map(() => 0) };
    expect(() => factorise(singular)).toThrow(SingularMatrixError);
    const large = solveOn(bendMesh(16), 6).pair.potentialSystem;
    expect(() => factorise(large, () => true)).toThrow(InterruptedError);
  });
});

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { solveSymmetric } from "@/lib/engine/numeric/cholesky";
import { solveInPlace } from "@/lib/engine/numeric/lu-solve";

const system = fc
  .integer({ min: 1, max: 12 })
  .chain((n) =>
    fc.tuple(
      fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: n * n, maxLength: n * n }),
      fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: n, maxLength: n }),
    ),
  );

function residual(matrix: readonly number[], x: Float64Array, right: readonly number[]): number {
  const n = right.length;
  let worst = 0;
  for (let i = 0; i < n; i++) {
    let sum = -right[i];
    for (let j = 0; j < n; j++) sum += matrix[i * n + j] * x[j];
    worst = Math.max(worst, Math.abs(sum));
  }
  return worst;
}

describe("solveInPlace", () => {
  it("leaves a small residual", () => {
    fc.assert(
      fc.property(system, ([entries, right]) => {
        const n = right.length;
        // A strong diagonal keeps it regular; the rows turned by one ask for pivoting at every step.
        const regular = entries.map((value, k) => (k % (n + 1) === 0 ? value + 2 * n : value));
        const matrix = [...regular.slice(n), ...regular.slice(0, n)];
        const x = solveInPlace(Float64Array.from(matrix), Float64Array.from(right));
        expect(residual(matrix, x, right)).toBeLessThan(1e-12);
      }),
      { seed: 1, numRuns: 200 },
    );
  });

  it("pivots", () => {
    expect(Array.from(solveInPlace(Float64Array.of(0, 2, 3, 0), Float64Array.of(4, 6)))).toEqual([2, 2]);
  });

  it("refuses a singular matrix and one that does not fit", () => {
    expect(() => solveInPlace(Float64Array.of(1, 2, 2, 4), Float64Array.of(1, 1))).toThrow(RangeError);
    expect(() => solveInPlace(Float64Array.of(1, 2), Float64Array.of(1, 1))).toThrow(RangeError);
  });
});

describe("solveSymmetric", () => {
  it("leaves a small residual and agrees with elimination", () => {
    fc.assert(
      fc.property(system, ([entries, right]) => {
        const n = right.length;
        // BᵀB + I is positive definite.
        const matrix = new Array<number>(n * n).fill(0);
        for (let i = 0; i < n; i++) {
          for (let j = 0; j < n; j++) {
            for (let k = 0; k < n; k++) matrix[i * n + j] += entries[k * n + i] * entries[k * n + j];
            if (i === j) matrix[i * n + j] += 1;
          }
        }
        const x = solveSymmetric(Float64Array.from(matrix), Float64Array.from(right));
        const y = solveInPlace(Float64Array.from(matrix), Float64Array.from(right));
        expect(residual(matrix, x, right)).toBeLessThan(1e-12);
        x.forEach((value, i) => expect(Math.abs(value - y[i])).toBeLessThan(1e-12));
      }),
      { seed: 2, numRuns: 200 },
    );
  });

  it("refuses an indefinite matrix", () => {
    expect(() => solveSymmetric(Float64Array.of(1, 2, 2, 1), Float64Array.of(1, 1))).toThrow(RangeError);
    expect(() => solveSymmetric(Float64Array.of(1), Float64Array.of(1, 1))).toThrow(RangeError);
  });
});

import { describe, expect, it } from "vitest";
import { findRoots } from "@/lib/engine/numeric/find-roots";

const grid = (from: number, to: number, count: number): number[] =>
  Array.from({ length: count + 1 }, (_, k) => from + ((to - from) * k) / count);

describe("all roots on an interval", () => {
  it("of a sine, to the last bits", () => {
    const { roots } = findRoots(Math.sin, grid(1, 20, 37));
    expect(roots).toHaveLength(6);
    roots.forEach((root, k) => expect(Math.abs(root - (k + 1) * Math.PI)).toBeLessThan(1e-14 * root));
  });

  it("two that a dip between grid points hides, and none where it stays above", () => {
    const dip = (depth: number) => (x: number) => (x - 0.503) ** 2 - depth;
    const { roots, low } = findRoots(dip(1e-8), grid(0, 1, 10));
    expect(roots).toHaveLength(2);
    expect(Math.abs(roots[0] - (0.503 - 1e-4))).toBeLessThan(1e-11);
    expect(Math.abs(roots[1] - (0.503 + 1e-4))).toBeLessThan(1e-11);
    expect(low.value).toBeLessThan(0);
    const above = findRoots(dip(-1e-8), grid(0, 1, 10));
    expect(above.roots).toEqual([]);
    expect(Math.abs(above.low.value - 1e-8)).toBeLessThan(1e-12);
  });

  it("up to the edge of the domain, where the function runs off", () => {
    const f = (x: number): number => (x <= 2 ? Number.NaN : Math.log(Math.log(x / 2)) + 20);
    const { roots, ends } = findRoots(f, grid(0, 10, 20));
    expect(roots).toHaveLength(1);
    expect(Math.abs(Math.log(roots[0] / 2) / Math.exp(-20) - 1)).toBeLessThan(1e-6);
    expect(ends?.[0].x).toBeGreaterThan(2);
    expect(findRoots(() => Number.NaN, grid(0, 1, 4)).ends).toBeNull();
  });

  it("on a point of the grid counts once", () => {
    expect(findRoots((x) => x - 0.5, grid(0, 1, 10)).roots).toEqual([0.5]);
  });
});

import { describe, expect, it } from "vitest";
import { Random } from "@/lib/engine/numeric/random";

describe("seeded random numbers", () => {
  it("are the same for a seed and differ between seeds", () => {
    const draw = (seed: number): number[] => {
      const random = new Random(seed);
      return Array.from({ length: 20 }, () => random.uniform());
    };
    expect(draw(7)).toEqual(draw(7));
    expect(draw(7)).not.toEqual(draw(8));
    for (const seed of [0, 1, 2 ** 32 - 1]) expect(new Set(draw(seed)).size).toBe(20);
  });

  it("have the moments of their distributions", () => {
    const random = new Random(1);
    const n = 400_000;
    const moments = [0, 0, 0, 0, 0, 0];
    for (let k = 0; k < n; k++) {
      const u = random.uniform() - 0.5;
      const z = random.normal();
      moments[0] += u / n;
      moments[1] += (u * u) / n;
      moments[2] += z / n;
      moments[3] += (z * z) / n;
      moments[4] += (z * z * z * z) / n;
      moments[5] += (u * z) / n;
    }
    const [meanU, squareU, meanZ, squareZ, fourthZ, mixed] = moments;
    // Five standard deviations of each mean.
    expect(Math.abs(meanU)).toBeLessThan((5 * Math.sqrt(1 / 12)) / Math.sqrt(n));
    expect(Math.abs(squareU - 1 / 12)).toBeLessThan((5 * Math.sqrt(1 / 180)) / Math.sqrt(n));
    expect(Math.abs(meanZ)).toBeLessThan(5 / Math.sqrt(n));
    expect(Math.abs(squareZ - 1)).toBeLessThan((5 * Math.sqrt(2)) / Math.sqrt(n));
    expect(Math.abs(fourthZ - 3)).toBeLessThan((5 * Math.sqrt(96)) / Math.sqrt(n));
    expect(Math.abs(mixed)).toBeLessThan((5 * Math.sqrt(1 / 12)) / Math.sqrt(n));
  });
});

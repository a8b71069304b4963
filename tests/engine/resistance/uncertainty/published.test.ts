/**
 * Worked examples of the GUM itself. Values are as printed; those marked "memory" were recalled, and each was recomputed
 * here by the printed model beside it.
 */
import { describe, expect, it } from "vitest";
import { Random } from "@/lib/engine/numeric/random";
import { samplerOf, shiftOf, standardOf, varianceOf } from "@/lib/engine/resistance/uncertainty/distribution";
import { coverageInterval } from "@/lib/engine/resistance/uncertainty/monte-carlo";
import { compute } from "../../../support/compute";

const uniform = { nominal: 0, minus: Math.sqrt(3), plus: Math.sqrt(3), distribution: "uniform" } as const;

/** Sum of inputs by the engine's own samplers, its standard uncertainty and coverage interval. */
function trialsOf(spreads: readonly Parameters<typeof standardOf>[0][], trials: number) {
  const random = new Random(1);
  const samplers = spreads.map((spread) => samplerOf(spread, random));
  const found = new Float64Array(trials);
  for (let k = 0; k < trials; k++) found[k] = samplers.reduce((sum, draw) => sum + draw(), 0);
  const mean = found.reduce((sum, y) => sum + y, 0) / trials;
  const standard = Math.sqrt(found.reduce((sum, y) => sum + (y - mean) ** 2, 0) / (trials - 1));
  return { mean, standard, interval: coverageInterval(found.sort()) };
}

describe("standard uncertainties of inputs", () => {
  it("JCGM 100, 4.3.7: the expansion coefficient of copper, 0.40e-6 either way, u = 0.23e-6", () => {
    const copper = { nominal: 16.52e-6, minus: 0.4e-6, plus: 0.4e-6, distribution: "uniform" } as const;
    expect(Number((standardOf(copper) * 1e6).toFixed(2))).toBe(0.23);
  });

  it("JCGM 100, 4.3.8: limits that are not symmetric, u² = (b₊ + b₋)²/12", () => {
    const lopsided = { nominal: 1, minus: 0.1, plus: 0.3, distribution: "uniform" } as const;
    expect(standardOf(lopsided) ** 2).toBeCloseTo(0.4 ** 2 / 12, 15);
    expect(shiftOf(lopsided)).toBeCloseTo(0.1, 15);
  });

  it("JCGM 100, 4.3.9: triangular within ±a, u = a/√6", () => {
    expect(standardOf({ nominal: 5, minus: 0.6, plus: 0.6, distribution: "triangular" })).toBeCloseTo(
      0.6 / Math.sqrt(6),
      15,
    );
  });

  it.each(["uniform", "normal", "triangular"] as const)(
    "samples of %s have these moments",
    (distribution) => {
      const sides = distribution === "normal" ? [0.3, 0.3] : [0.1, 0.5];
      const spread = { nominal: 2, minus: sides[0], plus: sides[1], distribution };
      const { mean, standard } = trialsOf([spread], 200_000);
      expect(Math.abs(mean - 2 - shiftOf(spread))).toBeLessThan((5 * standard) / Math.sqrt(200_000));
      expect(Math.abs(standard / standardOf(spread) - 1)).toBeLessThan(0.01);
      expect(Math.abs(Math.sqrt(varianceOf(spread, (x) => x)) / standardOf(spread) - 1)).toBeLessThan(1e-4);
    },
  );
});

describe("JCGM 101, 9.2: the additive model of four inputs", () => {
  it("9.2.3, table 3 (memory): four rectangular inputs, u = 2.00, 95 % interval [−3.88, 3.88]", () => {
    const { standard, interval } = trialsOf([uniform, uniform, uniform, uniform], 1_000_000);
    expect(Math.abs(standard - 2)).toBeLessThan(0.005);
    expect(Math.abs(interval[0] + 3.88)).toBeLessThan(0.015);
    expect(Math.abs(interval[1] - 3.88)).toBeLessThan(0.015);
  });

  it("9.2.2, table 2 (memory): four standard normal inputs, u = 2.00, 95 % interval [−3.92, 3.92]", () => {
    const normal = { nominal: 0, minus: 2, plus: 2, distribution: "normal" } as const;
    const { standard, interval } = trialsOf([normal, normal, normal, normal], 1_000_000);
    expect(Math.abs(standard - 2)).toBeLessThan(0.005);
    expect(Math.abs(interval[0] + 3.92)).toBeLessThan(0.02);
    expect(Math.abs(interval[1] - 3.92)).toBeLessThan(0.02);
  });

  it("9.2.4, table 4 (memory): one rectangular input ten times as wide, u = √103, 95 % interval [−17.0, 17.0]", () => {
    const wide = {
      nominal: 0,
      minus: 10 * Math.sqrt(3),
      plus: 10 * Math.sqrt(3),
      distribution: "uniform",
    } as const;
    const { standard, interval } = trialsOf([uniform, uniform, uniform, wide], 1_000_000);
    expect(Math.abs(standard - Math.sqrt(103))).toBeLessThan(0.02);
    expect(Math.abs(interval[0] + 17)).toBeLessThan(0.05);
    expect(Math.abs(interval[1] - 17)).toBeLessThan(0.05);
  });
});

describe("JCGM 100, 5.1.6: products of powers", () => {
  it("relative variances add with the squares of the exponents", () => {
    // R = 4ρL/(πd²): p = 1, 1 and −2.
    const result = compute({
      shape: "round-wire",
      dimensions: {
        length: { value: "10 m", tolerance: "1 %", distribution: "normal" },
        diameter: { value: "2 mm", tolerance: "0.4 %", distribution: "normal" },
      },
      medium: { resistivity: { value: 1.7e-8, tolerance: "0.6 %", distribution: "normal" } },
      uncertainty: { method: "propagation" },
    });
    const relative = Math.sqrt(0.005 ** 2 + (2 * 0.002) ** 2 + 0.003 ** 2);
    const { standard = 0, contributions = [] } = result.uncertainty ?? {};
    expect(Math.abs(standard / result.resistance.value / relative - 1)).toBeLessThan(1e-9);
    expect(contributions.map(({ input, share }) => [input, Number(share.toFixed(9))])).toEqual([
      ["dimensions.length", 0.5],
      ["dimensions.diameter", 0.32],
      ["medium.resistivity", 0.18],
    ]);
  });
});

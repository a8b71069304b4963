/** The rod in two layers: check values, a second route by images, limits, ratios of 1e-4 to 1e4. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { InputError } from "@/lib/engine";
import { equalSegments, gradedSegments, layeredRodResistance } from "@/lib/engine/shape/earthing/layered-rod";
import { resistanceByImages } from "@/lib/engine/shape/earthing/layered-rod-images";
import { mediaFactor } from "../../../support/media-law";
import { law, referenceValue } from "../../../support/shape-law";

const off = (found: number, expected: number) => Math.abs(found / expected - 1);
const rod = { length: 3, diameter: 0.016 };
const value = (upperDepth: number, upper: number, lower: number) =>
  mediaFactor("earth-rod-layered", { ...rod, upperDepth }, { upper, lower }).value;

describe("check values (L = 3 m, a = 8 mm; recomputed, no publication)", () => {
  it.each([
    [100, 300, 64.8540720548],
    [300, 100, 41.3419178136],
    [100, 100, 33.4501356331],
    [100, 1, 0.46833233206],
    [100, 10_000, 150.141860827],
  ])("through both layers, h = 1 m, %d over %d Ω·m, one segment a layer", (upper, lower, expected) => {
    // The last of these was printed from a series that ended early: 40 digits give 150.1418608011633 (below).
    expect(off(value(1, upper, lower), expected)).toBeLessThan(lower === 10_000 ? 2e-10 : 1e-11);
  });

  it.each([
    [100, 300, 35.8261386744],
    [300, 100, 96.3056060877],
    [100, 100, 33.4997455763],
  ])("within the upper layer, h = 5 m, %d over %d Ω·m", (upper, lower, expected) => {
    expect(off(value(5, upper, lower), expected)).toBeLessThan(2e-12);
  });

  it.each([
    [100, 300, 64.6505],
    [300, 100, 41.0945],
    [100, 100, 33.2871],
  ])("with 8 + 8 segments, h = 1 m, %d over %d Ω·m; inside the bounds", (upper, lower, expected) => {
    const soil = { upper, lower, upperDepth: 1 };
    expect(off(layeredRodResistance(0.008, soil, equalSegments(3, 1, 8)), expected)).toBeLessThan(2e-6);
    const bounds = mediaFactor("earth-rod-layered", { ...rod, upperDepth: 1 }, { upper, lower });
    expect(bounds.lower).toBeLessThan(expected);
    expect(bounds.upper).toBeGreaterThan(expected);
  });

  it("H-twolayer-rod-1, the potential taken at the surface end (Tagg, from memory), lies near it and not on it", () => {
    const { value: expected, inputs } = referenceValue("H-twolayer-rod-1");
    const found = mediaFactor(
      "earth-rod-layered",
      { length: inputs.L, diameter: 2 * inputs.a, upperDepth: inputs.h },
      { upper: inputs.rho1, lower: inputs.rho2 },
    ).value;
    expect(off(found, Number(expected))).toBeLessThan(4e-3);
    expect(off(found, Number(expected))).toBeGreaterThan(1e-4);
  });
});

/** Lengths, slenderness, depth of the boundary over the length, and both resistivities. */
const soils = fc.record({
  length: fc.double({ min: 0.5, max: 30, noNaN: true }),
  ratio: fc.double({ min: 1.3, max: 4, noNaN: true }),
  deep: fc.double({ min: -1, max: 1, noNaN: true }),
  contrast: fc.double({ min: -1.2, max: 1.2, noNaN: true }),
});

describe("against the images summed one by one", () => {
  it("agrees to 1e-11 with one segment and with four a layer", () => {
    fc.assert(
      fc.property(soils, fc.constantFrom(1, 4), ({ length, ratio, deep, contrast }, count) => {
        const radius = length / 10 ** ratio;
        const upperDepth = length * 10 ** deep;
        fc.pre(upperDepth > radius);
        const soil = { upper: 1, lower: 10 ** contrast, upperDepth };
        const segments = equalSegments(length, upperDepth, count);
        const images = resistanceByImages(radius, soil, segments);
        expect(images).not.toBeNull();
        expect(off(layeredRodResistance(radius, soil, segments), images ?? NaN)).toBeLessThan(1e-11);
      }),
      { seed: 5, numRuns: 60 },
    );
  });

  /** Direct sums of 400 images and an Euler–Maclaurin tail, or alternating acceleration; 40 digits (mpmath); h = 1 m. */
  it.each([
    [1, 10_000, 2.2525810342621619],
    [10_000, 1, 0.47026370668958358],
    [100, 10_000, 150.141860801163313],
    [1, 50, 1.37385680091158874],
    [50, 1, 0.466398692284718418],
  ])("agrees for %d over %d Ω·m where no plain sum ends", (upper, lower, expected) => {
    expect(off(value(1, upper, lower), expected)).toBeLessThan(1e-11);
  });
});

describe("limits", () => {
  it("equal layers are the single soil: the rod in the upper layer exactly, the one through both within its bounds", () => {
    const single = law("earth-rod", rod) * 100;
    expect(off(value(5, 100, 100), single)).toBeLessThan(1e-14);
    for (const h of [0.3, 1, 2, 2.9]) {
      const {
        value: found,
        lower,
        upper,
      } = mediaFactor("earth-rod-layered", { ...rod, upperDepth: h }, { upper: 100, lower: 100 });
      expect(off(found, single)).toBeLessThan(9.2e-3);
      expect(lower).toBeLessThan(single / 1.0092);
      expect(upper).toBeGreaterThan(single / 1.0092);
    }
  });

  it("a boundary far below is the upper soil, a thin upper layer the lower one", () => {
    const single = law("earth-rod", rod);
    expect(off(value(1e9, 100, 1e4), 100 * single)).toBeLessThan(1e-6);
    const thin = mediaFactor("earth-rod-layered", { ...rod, upperDepth: 0.009 }, { upper: 50, lower: 100 });
    expect(off(thin.value, 100 * single)).toBeLessThan(6e-3);
  });

  it("K → 0 is smooth", () => {
    for (const h of [1, 5]) {
      const middle = value(h, 100, 100);
      const [less, more] = [value(h, 100, 100 * (1 - 1e-6)), value(h, 100, 100 * (1 + 1e-6))];
      expect(less).toBeLessThan(middle);
      expect(more).toBeGreaterThan(middle);
      expect(off((less + more) / 2, middle)).toBeLessThan(1e-11);
    }
  });

  it("doubling both resistivities doubles it; each alone raises it", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -4, max: 4, noNaN: true }),
        fc.constantFrom(0.5, 1, 2.5, 4, 20),
        (contrast, h) => {
          const lower = 10 ** contrast;
          const found = value(h, 1, lower);
          expect(off(value(h, 2, 2 * lower), 2 * found)).toBeLessThan(1e-13);
          expect(value(h, 1.01, lower)).toBeGreaterThan(found);
          expect(value(h, 1, 1.01 * lower)).toBeGreaterThan(found);
        },
      ),
      { seed: 6, numRuns: 60 },
    );
  });
});

describe("bounds", () => {
  it("hold the finely divided rod for every ratio from 1e-4 to 1e4", () => {
    fc.assert(
      fc.property(soils, fc.double({ min: -4, max: 4, noNaN: true }), ({ length, ratio, deep }, contrast) => {
        const radius = length / 10 ** ratio;
        const upperDepth = length * 10 ** deep;
        fc.pre(upperDepth > radius);
        const soil = { upper: 1, lower: 10 ** contrast, upperDepth };
        const fine = layeredRodResistance(radius, soil, gradedSegments(length, radius, upperDepth));
        const {
          value: found,
          lower,
          upper,
        } = mediaFactor(
          "earth-rod-layered",
          { length, diameter: 2 * radius, upperDepth },
          { upper: 1, lower: soil.lower },
        );
        expect(lower).toBeLessThanOrEqual(fine);
        expect(upper).toBeGreaterThanOrEqual(found);
        expect(found).toBeGreaterThanOrEqual(fine * (1 - 1e-9));
      }),
      { seed: 7, numRuns: 60 },
    );
  });

  /**
   * The whole cylinder with its end face by boundary elements, images of both boundaries (numpy): L/a = 20, the rod
   * ending `gap` radii above the boundary; a·R/ρ₁.
   */
  it.each([
    [0.001, 0.3, 0.0142713],
    [0.001, 1, 0.0172836],
    [0.001, 3, 0.0195438],
    [0.001, 10, 0.021953],
    [0.1, 0.3, 0.0166877],
    [0.1, 3, 0.020534],
    [10, 0.3, 0.0426855],
    [10, 3, 0.0396202],
    [10, 10, 0.0358213],
  ])("hold the whole cylinder: ρ₂/ρ₁ = %d, gap %d radii", (lowerSoil, gap, truth) => {
    const { lower, upper } = mediaFactor(
      "earth-rod-layered",
      { length: 20, diameter: 2, upperDepth: 20 + gap },
      { upper: 1, lower: lowerSoil },
    );
    expect(lower).toBeLessThan(truth);
    expect(upper).toBeGreaterThan(truth);
  });

  it("tell by a caution where the even current is far from the truth", () => {
    const close = mediaFactor("earth-rod-layered", { ...rod, upperDepth: 3.01 }, { upper: 100, lower: 1 });
    expect(close.cautions?.join(" ")).toMatch(/near the lower bound/);
    const plain = mediaFactor("earth-rod-layered", { ...rod, upperDepth: 5 }, { upper: 100, lower: 300 });
    expect(plain.cautions).toEqual([]);
  });
});

describe("proportions that doubles cannot resolve", () => {
  it.each([
    { length: 3.6e9, diameter: 7e-14, upperDepth: 1.5e-5, upper: 4, lower: 1.2e4 },
    { length: 1.00000001, diameter: 1.0000000000001, upperDepth: 1.0000000000001, upper: 1.7, lower: 1 },
  ])("refuses %j with a sentence, never an inner error", ({ upper, lower, ...shape }) => {
    expect(() => mediaFactor("earth-rod-layered", shape, { upper, lower })).toThrow(InputError);
  });
});

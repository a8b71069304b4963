/** The largest field of the spreading shapes, against numerical derivatives and limits. */
import { describe, expect, it } from "vitest";
import { squareDuctCollocation } from "@/lib/engine/shape/spreading/square-duct";
import { law, resolve, shapeOf, type Given } from "../../../support/shape-law";

function peak(id: string, given: Given): number {
  const { answer } = shapeOf(id);
  if (answer.kind !== "factor" || !answer.peak) throw new Error(`${id} tells no peak`);
  const { fieldPerVolt } = answer.peak(resolve(id, given));
  if (fieldPerVolt === null) throw new Error("unbounded");
  return fieldPerVolt;
}

describe("cylinders", () => {
  it("concentric: 1/(a·ln(b/a))", () => {
    const given = { innerRadius: 1, outerRadius: 3, offset: 0, length: 1 };
    expect(peak("eccentric-cylinders", given)).toBeCloseTo(1 / Math.log(3), 14);
  });

  it("from the image lines: E = Σ λ/(2πr)", () => {
    // Two equal cylinders, a = 1, axes 3 apart: lines at ±c from the middle, c² = (s/2)² − a².
    const [half, a] = [1.5, 1];
    const c = Math.sqrt(half * half - a * a);
    const nearest = half - a;
    const span =
      2 * Math.PI * law("parallel-cylinders", { radius1: a, radius2: a, spacing: 2 * half, length: 1 });
    const expected = (1 / (c - nearest) + 1 / (c + nearest)) / span;
    const given = { radius1: a, radius2: a, spacing: 2 * half, length: 1 };
    expect(peak("parallel-cylinders", given) / expected).toBeCloseTo(1, 13);
    const plane = peak("cylinder-plane", { radius: a, height: half, length: 1 });
    // Half the voltage over half the distance.
    expect(plane / (2 * expected)).toBeCloseTo(1, 13);
  });

  it("tends to the voltage over a narrow gap", () => {
    for (const gap of [1e-6, 1e-10]) {
      expect(peak("parallel-cylinders", { radius1: 1, radius2: 2, gap, length: 1 }) * gap).toBeCloseTo(1, 5);
      expect(
        peak("eccentric-cylinders", { innerRadius: 1, outerRadius: 2, gap, length: 1 }) * gap,
      ).toBeCloseTo(1, 5);
      expect(peak("cylinder-plane", { radius: 1, gap, length: 1 }) * gap).toBeCloseTo(1, 5);
    }
  });

  it("square duct: the gap form meets the collocation", () => {
    const collocated = squareDuctCollocation(0.9 - 1e-9).fieldTimesRadius / 0.45;
    expect(peak("cylinder-in-square", { diameter: 0.9 + 1e-9, side: 1, length: 1 }) / collocated).toBeCloseTo(
      1,
      5,
    );
  });
});

describe("spheres", () => {
  it("alone: 1/a", () => {
    expect(peak("sphere-plane", { radius: 2, gap: 1e9 }) * 2).toBeCloseTo(1, 8);
    expect(peak("sphere-buried", { radius: 2, cover: 1e9 }) * 2).toBeCloseTo(1, 8);
    // Two equal spheres share the voltage.
    expect(peak("sphere-pair", { radius1: 2, radius2: 2, gap: 1e9 }) * 4).toBeCloseTo(1, 8);
    // A small one far from a large one takes nearly all of it.
    expect(peak("sphere-pair", { radius1: 1, radius2: 1e6, gap: 1e15 })).toBeCloseTo(1, 5);
  });

  it("nearly touching: the images meet the lubrication expansion", () => {
    const jump = (id: string, at: (gap: number) => Given) =>
      (peak(id, at(1.0001e-4)) * 1.0001e-4) / (peak(id, at(0.9999e-4)) * 0.9999e-4) - 1;
    expect(Math.abs(jump("sphere-plane", (gap) => ({ radius: 1, gap })))).toBeLessThan(5e-8);
    expect(Math.abs(jump("sphere-pair", (gap) => ({ radius1: 1, radius2: 3, gap })))).toBeLessThan(5e-8);
  });

  it("the plane is half of two equal spheres", () => {
    for (const gap of [0.01, 0.5, 7]) {
      const pair = peak("sphere-pair", { radius1: 1, radius2: 1, gap: 2 * gap });
      expect(peak("sphere-plane", { radius: 1, gap }) / (2 * pair)).toBeCloseTo(1, 10);
    }
  });

  it("buried just below the surface: between one sphere's and two touching spheres' outer pole", () => {
    const field = peak("sphere-buried", { radius: 1, cover: 1e-12 });
    // Two touching spheres at one volt: Σ(−1)ⁿ⁺¹/n·[(2−1/n)⁻² + (2+1/n)⁻²].
    let expected = 0;
    for (let n = 200000; n >= 1; n--) {
      const weight = n === 200000 ? 0.5 : 1;
      expected += ((weight * (n % 2 === 1 ? 1 : -1)) / n) * ((2 - 1 / n) ** -2 + (2 + 1 / n) ** -2);
    }
    expect(field).toBeCloseTo(expected, 5);
  });
});

describe("spheroid", () => {
  it("sphere: 1/a; needle: 1/(p·…) at the poles; disc: at the equator", () => {
    expect(peak("spheroid", { polarRadius: 2, equatorialRadius: 2 })).toBeCloseTo(0.5, 15);
    // Charge by Gauss's law from R, curvature at the pole p/e²: E = Q/(4πε e²).
    const given = { polarRadius: 5, equatorialRadius: 1 };
    expect(peak("spheroid", given) * 4 * Math.PI * law("spheroid", given)).toBeCloseTo(1, 14);
    const flat = { polarRadius: 1, equatorialRadius: 5 };
    expect(peak("spheroid", flat) * 4 * Math.PI * law("spheroid", flat) * 5).toBeCloseTo(1, 14);
  });
});

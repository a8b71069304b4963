/** Wires and strips wound up: what the curvature can change, between conducting sheets and insulating walls. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { integrate } from "@/lib/engine/numeric/gauss-kronrod";
import type { Dimensions, Resolved } from "@/lib/engine/shape/define-shape";
import { law, shapeOf, type Given } from "../../../support/shape-law";

const decade = (from: number, to: number) =>
  fc.double({ min: from, max: to, noNaN: true }).map((x) => 10 ** x);
const off = (found: number, expected: number) => Math.abs(found / expected - 1);

/** lowerRatio and upperRatio of a centre-line law. */
function ratios(
  id: string,
  given: Given,
): { lowerRatio: number; upperRatio: number; cautions?: readonly string[] } {
  const { answer } = shapeOf(id);
  if (answer.kind !== "flow" || !answer.accuracy) throw new Error(`${id} states no accuracy`);
  return answer.accuracy(given as Resolved<Dimensions>);
}

describe("helical-winding bounds", () => {
  it("without rise are the exact torus and its centre line", () => {
    const [meanDiameter, wireDiameter] = [0.02, 0.006];
    const torus = law("torus-arc", {
      bendRadius: meanDiameter / 2,
      diameter: wireDiameter,
      angle: 360,
    });
    const given = { turns: 1, meanDiameter, pitch: 1e-9, wireDiameter };
    const { lowerRatio, upperRatio } = ratios("helical-winding", given);
    expect(off(law("helical-winding", given) * lowerRatio, torus)).toBeLessThan(1e-12);
    expect(upperRatio).toBe(1);
  });

  it("enclose the current that follows helices, which can only be too high", () => {
    // J along the helices of the winding's own pitch: R ≤ 1/∬r/(r²+b²) over the cut by a half-plane through the axis.
    // The cut of the round wire is taken from the wire's section normal to its centre line.
    for (const [R, b, a] of [
      [1, 0.2, 0.5],
      [1, 1, 0.3],
      [1, 0.05, 0.8],
    ]) {
      const given = { turns: 1, meanDiameter: 2 * R, pitch: 2 * Math.PI * b, wireDiameter: 2 * a };
      const { lowerRatio } = ratios("helical-winding", given);
      expect(law("helical-winding", given) * lowerRatio).toBeLessThan(helicalFlow(R, b, a));
    }
  });

  it("say that turns overlap, not for a single turn", () => {
    const given = { meanDiameter: 0.01, pitch: 0.0004, wireDiameter: 0.0005 };
    expect(ratios("helical-winding", { ...given, turns: 3 }).cautions).toHaveLength(1);
    expect(ratios("helical-winding", { ...given, turns: 1 }).cautions).toHaveLength(0);
    expect(ratios("helical-winding", { ...given, turns: 3, pitch: 0.0006 }).cautions).toHaveLength(0);
  });
});

/** One turn with J ∝ (r θ̂ + b ẑ)/(r²+b²): 2π over the integral of 1/(r²+b²)·(flux through the normal section). */
function helicalFlow(R: number, b: number, a: number): number {
  const speed = Math.hypot(R, b);
  // Normal section: n along the radius, m along the binormal; the field's component along the tangent there.
  const row = (n: number) =>
    integrate(
      (m) => {
        const x = R - n;
        const y = -(m * b) / speed;
        const square = x * x + y * y + b * b;
        // u·T with u = (−y, x, b) and T = (0, R, b)/speed at the section's place.
        return (x * R + b * b) / speed / square;
      },
      -Math.sqrt(a * a - n * n),
      Math.sqrt(a * a - n * n),
      { relative: 1e-10 },
    ).value;
  return (
    (2 * Math.PI) / integrate((n) => row(n), -a * (1 - 1e-12), a * (1 - 1e-12), { relative: 1e-8 }).value
  );
}

describe("flat-spiral", () => {
  it("has the arc length of its integral", () => {
    for (const [turns, innerRadius, pitch] of [
      [13.25, 2.1e-3, 5.7e-4],
      [0.3, 1, 5],
      [40, 1e-5, 1e-3],
    ]) {
      const b = pitch / (2 * Math.PI);
      const arc = integrate((phi) => Math.hypot(innerRadius + b * phi, b), 0, 2 * Math.PI * turns, {
        relative: 1e-12,
      });
      expect(
        off(law("flat-spiral", { turns, innerRadius, pitch, width: 1e-6, thickness: 1e6 }), arc.value),
      ).toBeLessThan(1e-11);
    }
  });

  it("encloses the sheet bound, the arc law at every curvature", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 20, noNaN: true }),
        decade(-3, 1),
        fc.double({ min: 0.01, max: 0.95, noNaN: true }),
        (turns, wide, part) => {
          const innerRadius = 1;
          const b = wide / (2 * Math.PI);
          const curvatureRadius = (r: number) => (r * r + b * b) ** 1.5 / (r * r + 2 * b * b);
          const width = 2 * part * curvatureRadius(innerRadius);
          const given = { turns, innerRadius, pitch: wide, width, thickness: 1 };
          const sheets = integrate(
            (phi) => {
              const r = innerRadius + b * phi;
              const x = width / 2 / curvatureRadius(r);
              return (Math.hypot(r, b) * x) / Math.atanh(x) / width;
            },
            0,
            2 * Math.PI * turns,
            { relative: 1e-10 },
          );
          const centre = law("flat-spiral", given);
          const { lowerRatio, upperRatio } = ratios("flat-spiral", given);
          expect(centre * lowerRatio).toBeLessThanOrEqual(sheets.value * (1 + 1e-9));
          expect(centre * upperRatio).toBeGreaterThanOrEqual(sheets.value);
        },
      ),
      { seed: 8, numRuns: 100 },
    );
  });

  it("refuses a strip that folds over itself at the inner end", () => {
    const { constraints } = shapeOf("flat-spiral");
    const fits = (width: number) =>
      constraints.every(({ holds }) =>
        holds({ turns: 2, innerRadius: 1e-3, pitch: 1e-4, width, thickness: 1e-5 } as Resolved<Dimensions>),
      );
    expect(fits(1.9e-3)).toBe(true);
    expect(fits(2.1e-3)).toBe(false);
  });
});

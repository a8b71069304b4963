import { describe, expect, it } from "vitest";
import { findScale, libraryMaterial, readFieldSizing, type FieldResult } from "@/lib/engine";
import { STRIP } from "../support/field";

const sizing = readFieldSizing(
  { ...STRIP, solveFor: "scaleX", target: 300, within: [0.5, 2] },
  { material: libraryMaterial, outline: () => undefined },
);

/** Solves nothing: a resistance by the width of the outline, told with bounds of 1e-6. */
function solvedBy(law: (scale: number) => number): Parameters<typeof findScale>[1] {
  return ({ outline }) => {
    const xs = (outline?.outer ?? []).flatMap((corner) => (Array.isArray(corner) ? [corner[0]] : []));
    const value = law(Math.max(...xs) / 10);
    const answer: Pick<FieldResult, "resistance" | "method" | "operating" | "checks" | "cautions"> & object =
      {
        resistance: {
          value,
          unit: "ohm",
          text: "",
          lower: value * (1 - 1e-6),
          upper: value * (1 + 1e-6),
          boundsBasis: "energy",
          proved: true,
        },
        method: "field",
        operating: { temperature: 20 },
        checks: [],
        cautions: [],
      };
    return Promise.resolve({ ...answer, assumptions: [], materials: [] } as unknown as FieldResult);
  };
}

describe("the search of a scale", () => {
  it("claims the target only where it lies within the bounds of the solution", async () => {
    const smooth = await findScale(
      sizing,
      solvedBy((scale) => 250 * scale),
    );
    expect(smooth.solutions).toHaveLength(1);
    const [{ exact, resistance, dimension }] = smooth.solutions;
    expect([exact, resistance.lower <= 300 && 300 <= resistance.upper]).toEqual([true, true]);
    expect(Math.abs(dimension.value / 1.2 - 1)).toBeLessThan(1e-6);
  });

  it("says how far off it ended where the resistance jumps past the target", async () => {
    const { solutions } = await findScale(
      sizing,
      solvedBy((scale) => (scale < 1.3 ? 297 : 306)),
    );
    expect(solutions).toHaveLength(1);
    expect(solutions[0].exact).toBe(false);
    expect(solutions[0].cautions.at(-1)).toMatch(/^The search ended [12] % from the target/);
  });
});

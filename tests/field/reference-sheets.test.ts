import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { solveField, type SheetConductance } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

/** Brackets of an independent adaptive fourth-order solution (see shared reference; copied to the fixtures). */
interface ReferenceSheet {
  id: string;
  outer: [number, number][];
  holes: [number, number][][];
  terminals: Record<string, { edge: number; from: number; to: number }[]>;
  sheet:
    | { type: "uniform"; sigma: number }
    | { type: "regions"; default: number; regions: { polygon: [number, number][]; sigma: number }[] }
    | { type: "function"; sigma: string };
  lower: string;
  upper: string;
}

const sheets = JSON.parse(
  readFileSync(new URL("../fixtures/sheets.json", import.meta.url), "utf8"),
) as ReferenceSheet[];

function conductanceOf(sheet: ReferenceSheet["sheet"]): SheetConductance[] {
  if (sheet.type === "uniform") return [sheet.sigma];
  if (sheet.type === "regions") return [sheet.default, ...sheet.regions.map((r) => r.sigma)];
  // Coordinates of the fixture are millimetres, those of the engine's functions metres.
  expect(sheet.sigma).toBe("exp(-(x*x + y*y)/8)");
  return [(xM, yM) => Math.exp(-(xM * xM + yM * yM) * (1e6 / 8))];
}

describe("reference sheets", () => {
  it.each(sheets.map((sheet) => [sheet.id, sheet] as const))(
    "%s: brackets overlap at every accuracy",
    (_, sheet) => {
      const terminals = Object.entries(sheet.terminals).map(([name, parts]) => ({
        name,
        parts: parts.map((part) => ({ ring: 0, ...part })),
      }));
      const regions = sheet.sheet.type === "regions" ? sheet.sheet.regions.map((r) => r.polygon) : undefined;
      const outline = accept({ unit: "mm", outer: sheet.outer, holes: sheet.holes }, terminals, regions);
      const [lower, upper] = [Number(sheet.lower), Number(sheet.upper)];
      let last = { lower: 0, upper: Infinity };
      for (const accuracy of [1e-2, 1e-4, 1e-6, 1e-8]) {
        const solution = solveField({ outline, conductance: conductanceOf(sheet.sheet) }, { accuracy });
        const { resistance } = solution;
        if (!resistance) throw new Error("no resistance");
        expect(solution.status).toBe("done");
        expect((resistance.upper - resistance.lower) / resistance.value).toBeLessThanOrEqual(accuracy);
        expect(resistance.lower).toBeLessThanOrEqual(upper);
        expect(resistance.upper).toBeGreaterThanOrEqual(lower);
        // Also with the engine's own brackets of other accuracies.
        expect(resistance.lower).toBeLessThanOrEqual(last.upper);
        expect(resistance.upper).toBeGreaterThanOrEqual(last.lower);
        expect(solution.checks.every((check) => check.passed)).toBe(true);
        const graded = sheet.sheet.type === "function";
        expect(solution.boundsBasis).toBe(graded ? "energy-quadrature" : "energy");
        expect(solution.proved).toBe(!graded);
        last = resistance;
      }
    },
  );
});

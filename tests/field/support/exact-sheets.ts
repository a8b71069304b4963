import { readFileSync } from "node:fs";
import { expect } from "vitest";
import { solveField, type SheetConductance } from "@/lib/engine/field/solve-field";
import { accept } from "./outlines";

/**
 * Exact answers by conformal mapping and by flow tubes. Values and their sources: tests/fixtures/values.json (50 digits,
 * two routes) and the closed forms beside each check.
 */
interface ReferenceValue {
  id: string;
  inputs: Record<string, number>;
  value: string;
  uncertainty: number;
}

const values = JSON.parse(
  readFileSync(new URL("../../fixtures/values.json", import.meta.url), "utf8"),
) as ReferenceValue[];

export function reference(id: string): { value: number; inputs: Record<string, number> } {
  const entry = values.find((v) => v.id === id);
  if (!entry) throw new Error(`no reference value ${id}`);
  return { value: Number(entry.value), inputs: entry.inputs };
}

export type Points = [number, number][];
export type Arc = { arcTo: [number, number]; center: [number, number]; clockwise?: boolean };
export type Segment = [[number, number], [number, number]];

export interface Sheet {
  outer: (Points[number] | Arc)[];
  holes?: (Points[number] | Arc)[][];
  a: Segment[];
  b: Segment[];
  conductance?: SheetConductance;
}

/** Brackets at rising accuracy must hold the exact value; `slack` allows for what a finite outline leaves out. */
export function expectBracketed(
  sheet: Sheet,
  exact: number,
  accuracies: number[],
  below = 0,
  above = 0,
): void {
  const outline = accept({ unit: "m", outer: sheet.outer, holes: sheet.holes ?? [] }, [
    { name: "a", segments: sheet.a },
    { name: "b", segments: sheet.b },
  ]);
  for (const accuracy of accuracies) {
    const solution = solveField({ outline, conductance: [sheet.conductance ?? 1] }, { accuracy });
    const { resistance } = solution;
    if (!resistance) throw new Error("no resistance");
    expect(solution.status).toBe("done");
    expect(resistance.lower).toBeLessThanOrEqual(exact + above);
    expect(resistance.upper).toBeGreaterThanOrEqual(exact - below);
    expect(resistance.upper - resistance.lower).toBeLessThanOrEqual(accuracy * resistance.value);
  }
}

export const rectangle = (l: number, w: number): Points => [
  [0, 0],
  [l, 0],
  [l, w],
  [0, w],
];

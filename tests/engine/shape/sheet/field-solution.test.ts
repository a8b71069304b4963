/**
 * Sheet patterns against the field solver on the very outline that the shape draws: exact laws must lie in its bracket,
 * long-leg formulas must hold the true value between their bounds, however short the legs.
 */
import { describe, expect, it } from "vitest";
import { solveField } from "@/lib/engine/field/solve-field";
import type { DrawingPath, Point } from "@/lib/engine/shape/drawing";
import { accept } from "../../../field/support/outlines";
import { factor, resolve, shapeOf, type Given } from "../../../support/shape-law";

/** Squares by the field solver, [lower, upper]. */
function bracket(id: string, given: Given, accuracy: number): { lower: number; upper: number } {
  const { views } = shapeOf(id).drawing(resolve(id, given));
  const [plan] = views;
  const points = ({ from, steps }: DrawingPath): [number, number][] =>
    [from, ...steps.map(({ to }) => to)].map(([x, y]: Point) => [x, y]);
  const segments = (paths: readonly DrawingPath[]) =>
    paths.map((path) => points(path)) as [[number, number], [number, number]][];
  const outline = accept({ unit: "m", outer: points(plan.conductor[0]), holes: [] }, [
    { name: "high", segments: segments(plan.high) },
    { name: "low", segments: segments(plan.low) },
  ]);
  const { resistance } = solveField({ outline, conductance: [1] }, { accuracy });
  if (!resistance) throw new Error("no resistance");
  return resistance;
}

describe("exact laws lie in the bracket", () => {
  const cases: readonly (readonly [string, Given, number])[] = [
    ["sheet-strip", { length: 3, width: 2 }, 1e-8],
    ["sheet-end-terminal", { length: 1.3, width: 1, terminalWidth: 0.3, position: "edge" }, 1e-6],
    ["sheet-end-terminal", { length: 1.3, width: 1, terminalWidth: 0.3, position: "centre" }, 1e-6],
    ["sheet-end-terminal", { length: 0.2, width: 1, terminalWidth: 0.85, position: "edge" }, 1e-6],
    ["sheet-end-terminal", { length: 0.6, width: 1, terminalWidth: 0.04, position: "centre" }, 1e-6],
    ["sheet-bend", { legLength1: 6, width1: 1, legLength2: 9, width2: 1.5 }, 1e-7],
    ["sheet-step", { length1: 5, width1: 1, length2: 12, width2: 2.37, alignment: "edge" }, 1e-7],
    ["sheet-step", { length1: 4, width1: 1, length2: 8, width2: 3, alignment: "centre" }, 1e-7],
    [
      "sheet-tee",
      { barWidth: 1, stubWidth: 0.7, leftLength: 5, rightLength: 6, stubLength: 4, path: "through" },
      1e-7,
    ],
    [
      "sheet-tee",
      { barWidth: 1, stubWidth: 0.7, leftLength: 5, rightLength: 6, stubLength: 4, path: "branch" },
      1e-7,
    ],
    [
      "sheet-tee",
      { barWidth: 1, stubWidth: 1.6, leftLength: 5, rightLength: 8, stubLength: 7, path: "both" },
      1e-7,
    ],
  ];

  it.each(cases)("%s %o", (id, given, accuracy) => {
    const found = bracket(id, given, accuracy);
    const { value } = factor(id, given);
    expect(value).toBeGreaterThan(found.lower * (1 - 1e-10));
    expect(value).toBeLessThan(found.upper * (1 + 1e-10));
  });
});

describe("short legs", () => {
  const legs = [0.05, 0.2, 0.5, 1] as const;

  /** The true value within the bounds, and the bounds not wider than `slack` times what is really off. */
  function holds(id: string, given: Given, slack: number): void {
    const { value, lower = value, upper = value } = factor(id, given);
    const found = bracket(id, given, 1e-6);
    expect(lower, `${id} ${JSON.stringify(given)}: lower`).toBeLessThanOrEqual(found.upper);
    expect(upper, `${id} ${JSON.stringify(given)}: upper`).toBeGreaterThanOrEqual(found.lower);
    const off = Math.max(Math.abs(found.lower - value), Math.abs(found.upper - value));
    expect(upper - lower).toBeLessThan(slack * off + 1e-9);
  }

  it.each(legs)(
    "bend of equal widths, legs of %d widths: below the formula by about 0.11·exp(−2πL/w)",
    (leg) => {
      const given = { legLength1: leg, width1: 1, legLength2: leg, width2: 1 };
      holds("sheet-bend", given, 2.2);
      const { value } = factor("sheet-bend", given);
      const found = bracket("sheet-bend", given, 1e-7);
      if (leg >= 0.5) expect((value - found.upper) / (0.11 * Math.exp(-2 * Math.PI * leg))).toBeCloseTo(1, 1);
      expect(found.upper).toBeLessThan(value);
    },
  );

  it.each(legs)("bend of unlike widths, legs of %d widths", (leg) => {
    holds("sheet-bend", { legLength1: leg, width1: 1, legLength2: 3 * leg, width2: 3 }, 4);
    holds("sheet-bend", { legLength1: 3, width1: 1, legLength2: 0.2 * leg, width2: 0.2 }, 4);
  });

  it.each(legs)("step, parts of %d widths", (leg) => {
    holds("sheet-step", { length1: leg, width1: 1, length2: 2 * leg, width2: 2, alignment: "edge" }, 4);
    holds("sheet-step", { length1: 5 * leg, width1: 5, length2: leg, width2: 1, alignment: "centre" }, 4);
  });

  it.each(legs)("T junction, arms of %d widths", (leg) => {
    const tee = (
      barWidth: number,
      stubWidth: number,
      left: number,
      right: number,
      stub: number,
      path: string,
    ) => ({
      barWidth,
      stubWidth,
      leftLength: left * barWidth,
      rightLength: right * barWidth,
      stubLength: stub * stubWidth,
      path,
    });
    // A short floating arm raises the resistance, short terminal arms lower it.
    const raised = tee(1, 1, 3, 3, leg, "through");
    holds("sheet-tee", raised, 4);
    expect(bracket("sheet-tee", raised, 1e-7).lower).toBeGreaterThan(
      factor("sheet-tee", raised).value * (1 - 1e-7),
    );
    holds("sheet-tee", tee(1, 2, leg, leg, leg, "through"), 8);
    holds("sheet-tee", tee(1, 1, leg, leg, leg, "branch"), 8);
    holds("sheet-tee", tee(1, 0.5, 3, leg, 3, "branch"), 4);
    holds("sheet-tee", tee(1, 1.5, leg, 2 * leg, leg, "both"), 6);
  });

  it.each([0.05, 0.2, 0.5, 1])("meander, gap of %d widths", (gap) => {
    holds("sheet-meander", { legs: 2, legLength: 2, width: 1, gap }, 12);
    holds("sheet-meander", { legs: 5, legLength: 0.7, width: 1, gap }, 40);
  });

  it("the two corners of a turn lower the resistance by about 0.11·exp(−πg/w)", () => {
    const given = { legs: 2, legLength: 3, width: 1, gap: 1.2 };
    const found = bracket("sheet-meander", given, 1e-7);
    const off = factor("sheet-meander", given).value - found.upper;
    expect(off / (0.11 * Math.exp(-Math.PI * 1.2))).toBeGreaterThan(0.9);
    expect(off / (0.11 * Math.exp(-Math.PI * 1.2))).toBeLessThan(1.1);
  });
});

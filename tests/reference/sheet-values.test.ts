/** Entries of tests/fixtures/values.json that are sheet patterns (50-digit arithmetic, agreed by a second route). */
import { describe, expect, it } from "vitest";
import { compute, deviation } from "../support/compute";
import { factor, law, referenceValue, type Given } from "../support/shape-law";

const squares = (shape: string, dimensions: Record<string, number | string>) =>
  compute({ shape, dimensions, medium: { sheetResistance: 1 } }).resistance.value;

/** Legs long enough that their ends change nothing, and no longer, so that the excess keeps its digits. */
const LONG = 12;

describe("sheet reference values", () => {
  it("F-rect-1", () => {
    const { inputs, value } = referenceValue("F-rect-1");
    expect(deviation(squares("sheet-strip", { length: inputs.L, width: inputs.W }), value)).toBeLessThan(
      1e-15,
    );
  });

  const excess: readonly (readonly [
    string,
    string,
    (i: Readonly<Record<string, number>>) => [Given, number],
  ])[] = [
    [
      "F-bend90-1",
      "sheet-bend",
      ({ a, b }) => [{ legLength1: LONG * a, width1: a, legLength2: LONG * b, width2: b }, 2 * LONG],
    ],
    [
      "F-step1-1",
      "sheet-step",
      ({ a, b }) => [
        { length1: LONG * a, width1: a, length2: LONG * b, width2: b, alignment: "edge" },
        2 * LONG,
      ],
    ],
    [
      "F-step2-1",
      "sheet-step",
      ({ a, b }) => [
        { length1: LONG * b, width1: b, length2: LONG * a, width2: a, alignment: "centre" },
        2 * LONG,
      ],
    ],
    [
      "F-Tthrough-1",
      "sheet-tee",
      ({ a, b }) => [
        {
          barWidth: a,
          stubWidth: b,
          leftLength: LONG * a,
          rightLength: LONG * a,
          stubLength: LONG * b,
          path: "through",
        },
        2 * LONG,
      ],
    ],
    [
      "F-Tbranch-1",
      "sheet-tee",
      ({ a, b }) => [
        {
          barWidth: a,
          stubWidth: b,
          leftLength: LONG * a,
          rightLength: LONG * a,
          stubLength: LONG * b,
          path: "branch",
        },
        2 * LONG,
      ],
    ],
    [
      "F-Tboth-1",
      "sheet-tee",
      ({ a, b }) => [
        {
          barWidth: a,
          stubWidth: b,
          leftLength: LONG * a,
          rightLength: LONG * a,
          stubLength: LONG * b,
          path: "both",
        },
        1.5 * LONG,
      ],
    ],
    [
      "F-iris-1",
      "sheet-slit",
      ({ W, d }) => [{ length: LONG * W, width: W, opening: d, kind: "iris" }, LONG],
    ],
    [
      "F-slit-1",
      "sheet-slit",
      ({ W, d }) => [{ length: LONG * W, width: W, opening: d, kind: "edge" }, LONG],
    ],
    [
      "F-endcontact-1",
      "sheet-end-terminal",
      ({ W, c }) => [{ length: LONG * W, width: W, terminalWidth: c, position: "edge" }, LONG],
    ],
  ];

  it.each(excess)("%s is the excess of %s", (id, shape, build) => {
    const { inputs, value } = referenceValue(id);
    const [given, legs] = build(inputs);
    // The sum of legs and excess is rounded at 1e-16 of the sum.
    expect(Math.abs(law(shape, given) - legs - Number(value))).toBeLessThan(1e-14);
    expect(factor(shape, given).boundsBasis).toBe("rounding");
  });

  it("F-dogbone-1 is two centred steps in series", () => {
    const { inputs, value } = referenceValue("F-dogbone-1");
    const { w, W, ln, lh } = inputs;
    const half = law("sheet-step", {
      length1: ln / 2,
      width1: w,
      length2: lh,
      width2: W,
      alignment: "centre",
    });
    // The entry's own uncertainty is 1e-8 (the interaction of its two steps).
    expect(Math.abs(2 * half - Number(value))).toBeLessThan(2e-8);
  });
});

describe("published and stated values", () => {
  const corner = (ratio: number) =>
    law("sheet-bend", { legLength1: 20 * ratio, width1: ratio, legLength2: 20, width2: 1 }) - 40;

  it("corners of 6-checks: equal 0.55873; width ratios 1.5, 2, 3", () => {
    // P. M. Hall, Thin Solid Films 1 (1968) 277 (formulas from memory; agreed with finite differences to 2e-5).
    expect(corner(1)).toBeCloseTo(0.55873, 5);
    expect(corner(1.5)).toBeCloseTo(0.5883, 5);
    expect(corner(2)).toBeCloseTo(0.64354, 5);
    expect(corner(3)).toBeCloseTo(0.76348, 5);
    expect(corner(1)).toBeCloseTo(1 - (2 / Math.PI) * Math.LN2, 13);
    expect(corner(0.5)).toBeCloseTo(0.643537249489, 12);
  });

  it("common practice (no source): a right-angle corner counts about 0.56 squares", () => {
    expect(corner(1)).toBeCloseTo(0.56, 2);
  });

  it("edge steps of 6-checks: α=0.5 0.24983, α=0.25 0.64997", () => {
    const step = (alpha: number) =>
      law("sheet-step", { length1: 20 * alpha, width1: alpha, length2: 20, width2: 1, alignment: "edge" }) -
      40;
    expect(step(0.5)).toBeCloseTo(0.24983, 5);
    expect(step(0.25)).toBeCloseTo(0.64997, 5);
    expect(step(0.5)).toBeCloseTo(0.249832585631, 12);
  });

  it("8-formulas: end terminal, slit, disc", () => {
    const end = (length: number, position: string) =>
      law("sheet-end-terminal", { length, width: 1, terminalWidth: 0.3, position });
    expect(end(1.3, "edge")).toBeCloseTo(1.80249778527133294, 14);
    expect(end(1.3, "centre")).toBeCloseTo(1.55136260253142005, 14);
    expect(end(0.2, "edge")).toBeCloseTo(0.515130914874582, 14);
    const slit = (kind: string) => law("sheet-slit", { length: 1.6, width: 1, opening: 0.3, kind });
    expect(slit("edge")).toBeCloseTo(2.59497749848337285, 14);
    expect(slit("centre")).toBeCloseTo(2.10269072232276755, 14);
    expect(slit("iris")).toBe(slit("centre"));
    const disc = (t1: number, t2: number) =>
      law("sheet-disc", { diameter: 1, terminalAngle1: `${t1} rad`, terminalAngle2: `${t2} rad` });
    expect(disc(0.6, 1.7)).toBeCloseTo(1.29472118980540729, 14);
    expect(disc(Math.PI / 2, Math.PI / 2)).toBeCloseTo(1, 14);
  });

  it("8-formulas: T junction of equal widths", () => {
    const tee = (path: string) =>
      law("sheet-tee", {
        barWidth: 1,
        stubWidth: 1,
        leftLength: 12,
        rightLength: 12,
        stubLength: 12,
        path,
      });
    expect(tee("through") - 24).toBeCloseTo(0.846890361542079, 13);
    expect(tee("branch") - 24).toBeCloseTo(0.533491215129991, 13);
    expect(tee("both") - 18).toBeCloseTo(0.321768624744471, 13);
  });
});

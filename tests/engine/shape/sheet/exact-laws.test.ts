/** Sheet patterns in 60-digit arithmetic, extremes included, and their limits. */
import type Decimal from "decimal.js";
import { describe, expect, it } from "vitest";
import potential from "../../../fixtures/potential-values.json";
import { D, deviationFrom, exact, factor, law, type Given } from "../../../support/shape-law";

const pi = D.acos(-1);

function check(id: string, given: Given, expected: Decimal | string, tolerance = 1e-13): void {
  expect(deviationFrom(law(id, given), expected), `${id} ${JSON.stringify(given)}`).toBeLessThan(tolerance);
}

describe("sheet-end-terminal and sheet-slit", () => {
  it.each(potential.endTerminal)("L=%d, W=%d, c=%d", (length, width, terminalWidth, value) => {
    const [l, w, c] = [Number(length), Number(width), Number(terminalWidth)];
    const edge = String(value);
    check("sheet-end-terminal", { length: l, width: w, terminalWidth: c, position: "edge" }, edge);
    const half = new D(edge).div(2);
    check("sheet-end-terminal", { length: l, width: 2 * w, terminalWidth: 2 * c, position: "centre" }, half);
    check("sheet-slit", { length: 2 * l, width: w, opening: c, kind: "edge" }, new D(edge).mul(2));
    check("sheet-slit", { length: 2 * l, width: 2 * w, opening: 2 * c, kind: "centre" }, edge);
    check("sheet-slit", { length: 2 * l, width: 2 * w, opening: 2 * c, kind: "iris" }, edge);
  });

  it("a terminal over the whole end is the strip", () => {
    for (const length of [1e-6, 0.7, 1, 50]) {
      for (const position of ["edge", "centre"]) {
        check("sheet-end-terminal", { length, width: 1, terminalWidth: 1, position }, exact(length));
      }
    }
  });

  it("a long sheet adds −(2/π)·ln sin(πc/2W)", () => {
    for (const c of [1e-9, 0.2, 0.5, 0.95]) {
      const expected = exact(8).minus(pi.mul(exact(c)).div(2).sin().ln().mul(2).div(pi));
      check("sheet-end-terminal", { length: 8, width: 1, terminalWidth: c, position: "edge" }, expected);
    }
  });

  it("a short sheet is c/L parallel squares and the fringe at one end, 2·ln2/π", () => {
    const [length, terminalWidth] = [1e-3, 0.4];
    const conductance = terminalWidth / length + (2 / Math.PI) * Math.LN2;
    const found = law("sheet-end-terminal", { length, width: 1, terminalWidth, position: "edge" });
    expect(found * conductance).toBeCloseTo(1, 12);
  });
});

describe("sheet-disc", () => {
  it.each(potential.disc)("arcs of %d and %d rad", (t1, t2, value) => {
    const given = { diameter: 1, terminalAngle1: `${t1} rad`, terminalAngle2: `${t2} rad` };
    const free = 2 * Math.PI - Number(t1) - Number(t2);
    // What is left free of the rim carries the rounding of the angles.
    check("sheet-disc", given, String(value), 1e-14 + 1e-15 / free);
  });

  it("complementary arcs are reciprocal", () => {
    // Terminals and insulated arcs exchanged: t and π − t. Conjugate quadrilaterals have R₁R₂ = 1 (Hakula, Rasila,
    // Vuorinen, ETNA 48 (2018) 462, seen).
    for (const t of [1e-6, 0.01, 0.5, 1.3]) {
      const disc = (angle: number) =>
        law("sheet-disc", { diameter: 3, terminalAngle1: `${angle} rad`, terminalAngle2: `${angle} rad` });
      expect(disc(t) * disc(Math.PI - t)).toBeCloseTo(1, 9);
    }
  });
});

describe("sheet-bend", () => {
  const ratios = [1e-8, 1e-3, 0.5, 1, 1 + 2 ** -40, 2, 1e3, 1e8];

  it.each(ratios)("width ratio %d", (ratio) => {
    const [r, one] = [exact(ratio), new D(1)];
    const square = r.pow(2);
    const corner = r
      .mul(2)
      .mul(D.atan(one.div(r)))
      .plus(D.atan(r).mul(2).div(r))
      .minus(square.mul(16).div(square.plus(1).pow(2)).ln())
      .div(pi);
    const legs = 20;
    const given = { legLength1: legs * ratio, width1: ratio, legLength2: legs, width2: 1 };
    check("sheet-bend", given, corner.plus(exact(legs * ratio).div(r)).plus(legs));
    expect(factor("sheet-bend", given).boundsBasis).toBe("rounding");
  });

  it("is the same from either end", () => {
    const one = factor("sheet-bend", { legLength1: 0.4, width1: 1, legLength2: 0.9, width2: 3 });
    const other = factor("sheet-bend", { legLength1: 0.9, width1: 3, legLength2: 0.4, width2: 1 });
    expect(one.value).toBe(other.value);
    expect((one.lower ?? 0) / (other.lower ?? 1)).toBeCloseTo(1, 13);
  });
});

describe("sheet-step", () => {
  it.each([1e-8, 1e-3, 0.25, 0.5, 0.9, 1 - 2 ** -20, 1 - 2 ** -45])("α=%d", (alpha) => {
    const a = exact(alpha);
    const square = a.pow(2);
    const excess = square
      .plus(1)
      .div(a)
      .mul(a.plus(1).div(new D(1).minus(a)).ln())
      .minus(a.mul(4).div(new D(1).minus(square)).ln().mul(2))
      .div(pi);
    const legs = 20;
    const parts = exact(legs * alpha)
      .div(a)
      .plus(legs);
    const given = { length1: legs * alpha, width1: alpha, length2: legs, width2: 1 };
    check("sheet-step", { ...given, alignment: "edge" }, parts.plus(excess));
    check("sheet-step", { ...given, alignment: "centre" }, parts.plus(excess.div(2)));
  });

  it("without a step is the strip", () => {
    const found = factor("sheet-step", {
      length1: 0.1,
      width1: 1,
      length2: 0.2,
      width2: 1,
      alignment: "edge",
    });
    expect(found.value).toBeCloseTo(0.3, 15);
    expect(found.boundsBasis).toBe("rounding");
  });
});

describe("sheet-tee", () => {
  it.each([1e-8, 1e-3, 0.3, 1, 1.99999, 2.00001, 40, 1e8])("q = 2a/b = %d", (q) => {
    const Q = exact(q);
    const square = Q.pow(2);
    const atan = D.atan(Q).mul(2).div(Q);
    const through = new D(1).plus(new D(1).div(square)).ln().plus(atan).mul(2).div(pi);
    const branch = atan
      .plus(Q.mul(D.atan(new D(1).div(Q))))
      .plus(square.plus(1).ln().mul("1.5"))
      .minus(Q.mul(2).ln().mul(2))
      .div(pi);
    const legs = 16;
    const [barWidth, stubWidth] = [q, 2];
    const given = {
      barWidth,
      stubWidth,
      leftLength: legs * barWidth,
      rightLength: legs * barWidth,
      stubLength: legs * stubWidth,
    };
    check("sheet-tee", { ...given, path: "through" }, through.plus(2 * legs));
    check("sheet-tee", { ...given, path: "branch" }, branch.plus(2 * legs));
    check("sheet-tee", { ...given, path: "both" }, branch.minus(through.div(4)).plus(1.5 * legs));
  });

  it("both arms of unequal length: the star of T/2, T/2 and B − T/2", () => {
    const [T, B] = [0.846890361542079, 0.533491215129991];
    const given = { barWidth: 1, stubWidth: 1, leftLength: 9, rightLength: 20, stubLength: 10, path: "both" };
    const expected = 1 / (1 / (T / 2 + 9) + 1 / (T / 2 + 20)) + (B - T / 2) + 10;
    expect(law("sheet-tee", given)).toBeCloseTo(expected, 12);
  });

  it("a narrow stub does not disturb the bar, and a wide one shorts it", () => {
    const through = (stubWidth: number) =>
      law("sheet-tee", {
        barWidth: 1,
        stubWidth,
        leftLength: 8,
        rightLength: 8,
        stubLength: 8 * stubWidth,
        path: "through",
      }) - 16;
    // The bar between the inner corners alone has b/a squares.
    expect(through(1e-4) / 1e-4).toBeCloseTo(1, 3);
    expect(through(3)).toBeLessThan(3);
  });
});

describe("sheet-meander", () => {
  it("is the strip for one leg and the bend's corners for two", () => {
    check("sheet-meander", { legs: 1, legLength: 3, width: 2, gap: 1 }, new D("1.5"));
    const corner = new D(1).minus(new D(2).ln().mul(2).div(pi));
    const given = { legs: 2, legLength: 30, width: 2, gap: 50 };
    check("sheet-meander", given, corner.mul(2).plus(30).plus(25));
    expect(factor("sheet-meander", given).boundsBasis).toBe("rounding");
  });

  it("U-bend of the reference sheets: the independent bracket lies within the bounds", () => {
    // tests/fixtures/sheets.json, 5.994059996508538 … 5.994059996846806 squares.
    const {
      value,
      lower = 0,
      upper = 0,
      boundsBasis,
    } = factor("sheet-meander", {
      legs: 2,
      legLength: 3,
      width: 1.3,
      gap: 0.4,
    });
    expect(boundsBasis).toBe("formula-accuracy");
    expect(lower).toBeLessThan(5.994059996508538);
    expect(upper).toBeGreaterThan(5.994059996846806);
    expect((upper - lower) / value).toBeLessThan(0.04);
  });

  it("states nearness as a caution only where it matters", () => {
    const cautions = (gap: number) =>
      factor("sheet-meander", { legs: 4, legLength: 20, width: 1, gap }).cautions ?? [];
    expect(cautions(3)).toHaveLength(0);
    expect(cautions(0.3)[0]).toContain("short against their width");
  });
});

describe("L-equal of the reference sheets", () => {
  it("lies within the bounds of the bend with legs of three widths", () => {
    // tests/fixtures/sheets.json, 6.55872879898384 squares (its bracket is narrower than the digits kept here).
    const { lower = 0, upper = 0 } = factor("sheet-bend", {
      legLength1: 3,
      width1: 1,
      legLength2: 3,
      width2: 1,
    });
    expect(lower).toBeLessThan(6.5587287991);
    expect(upper).toBeGreaterThan(6.5587287988);
    expect(upper - lower).toBeLessThan(2e-9);
  });
});

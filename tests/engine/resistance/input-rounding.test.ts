/** Proved bounds hold for the decimals that were typed, also where a difference of two inputs has lost digits. */
import { describe, expect, it } from "vitest";
import fc from "fast-check";
import Decimal from "decimal.js";
import { compute } from "../../support/compute";

const D = Decimal.clone({ precision: 60 });
const PI = D.acos(-1);

function expectInside(request: object, exact: Decimal): void {
  const { lower, upper, boundsBasis, proved } = compute(request).resistance;
  expect({ boundsBasis, proved }).toEqual({ boundsBasis: "rounding", proved: true });
  const told = `[${lower}, ${upper}] for ${exact.toPrecision(18)} of ${JSON.stringify(request)}`;
  expect(exact.gte(lower) && exact.lte(upper), told).toBe(true);
}

describe("inputs that nearly cancel", () => {
  // Relative differences from 1e-2 to 1e-12, in decimals that no double holds.
  const nearly = fc.record({
    start: fc.integer({ min: 1001, max: 8999 }),
    digits: fc.integer({ min: 2, max: 12 }),
  });

  it("keep the true value of a thin shell given by two radii inside", () => {
    fc.assert(
      fc.property(nearly, ({ start, digits }) => {
        const inner = new D(start).div(1000);
        const outer = inner.times(new D(10).pow(-digits).times(3).plus(1));
        const exact = D.ln(outer.div(inner)).div(PI.times(2));
        expectInside(
          {
            shape: "cylindrical-shell",
            dimensions: {
              innerRadius: `${inner.toFixed()} mm`,
              outerRadius: `${outer.toFixed()} mm`,
              length: 1,
            },
            medium: { resistivity: 1 },
          },
          exact,
        );
      }),
      { numRuns: 200, seed: 41 },
    );
  });

  it("keep the true value between two cones of nearly one angle inside", () => {
    fc.assert(
      fc.property(nearly, ({ start, digits }) => {
        const first = new D(start).div(100);
        const second = first.plus(new D(10).pow(1 - digits));
        const radians = (degrees: Decimal): Decimal => degrees.times(PI).div(180);
        const solid = D.cos(radians(first))
          .minus(D.cos(radians(second)))
          .times(PI)
          .times(2);
        expectInside(
          {
            shape: "conical-shell",
            dimensions: {
              innerRadius: 1,
              outerRadius: 2,
              innerHalfAngle: `${first.toFixed()} deg`,
              outerHalfAngle: `${second.toFixed()} deg`,
            },
            medium: { resistivity: 1 },
          },
          new D("0.5").div(solid),
        );
      }),
      { numRuns: 200, seed: 43 },
    );
  });

  it("stay as narrow as a closed form where the difference is an input of its own", () => {
    const { value, lower, upper } = compute({
      shape: "cylindrical-shell",
      dimensions: { innerRadius: "5 mm", wall: "1 nm", length: "1 m" },
      medium: { resistivity: 1 },
    }).resistance;
    expect((upper - lower) / value).toBeLessThan(2.2e-13);
  });
});

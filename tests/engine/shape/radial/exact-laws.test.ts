/** The radial shapes' closed forms against the textbook forms in 60-digit arithmetic, extremes included. */
import type Decimal from "decimal.js";
import { describe, expect, it } from "vitest";
import { D, deviationFrom, exact, law, type Given } from "../../../support/shape-law";

const pi = D.acos(-1);
const degrees = (value: number) => exact(value).mul(pi).div(180);

function check(id: string, given: Given, expected: Decimal, tolerance = 1e-13): void {
  const deviation = deviationFrom(law(id, given), expected);
  expect(deviation, `${id} ${JSON.stringify(given)}`).toBeLessThan(tolerance);
}

describe("confocal-shell", () => {
  it.each([
    [0.0431, 0.0173, 0.0057],
    [1, 1, 1e-12],
    [1, 1e-12, 1e-12],
    [1, 1e-12, 5],
    [1, 0.999999999, 1e8],
    [1e-9, 1e-15, 3e-21],
    [1e9, 2e3, 1e-3],
  ])("a₁=%d, b₁=%d, wall=%d", (innerMajor, innerMinor, wall) => {
    const [a, b, t] = [exact(innerMajor), exact(innerMinor), exact(wall)];
    const outer = a.plus(t).plus(a.plus(t).pow(2).minus(a.pow(2)).plus(b.pow(2)).sqrt());
    const expected = outer
      .div(a.plus(b))
      .ln()
      .div(pi.mul(2).mul(exact(0.31)));
    check("confocal-shell", { innerMajor, innerMinor, wall, length: 0.31 }, expected);
  });

  it("is the cylindrical shell where the axes are equal", () => {
    const given = { innerMajor: 0.02, innerMinor: 0.02, outerMajor: 0.05, length: 1 };
    const shell = law("cylindrical-shell", { innerRadius: 0.02, outerRadius: 0.05, length: 1 });
    expect(deviationFrom(law("confocal-shell", given), String(shell))).toBeLessThan(1e-14);
  });
});

describe("conical-shell", () => {
  it.each([
    [0.0131, 0.0212, 18, 22],
    [1, 1e-12, 30, 60],
    [1, 1e8, 0, 1e-6],
    [1, 1, 0, 180],
    [1e-6, 1e-6, 89, 89.0000001],
    [1, 0.3, 1e-9, 3e-9],
  ])("a=%d, wall=%d, θ=%d…%d°", (innerRadius, wall, innerHalfAngle, outerHalfAngle) => {
    const [a, t] = [exact(innerRadius), exact(wall)];
    const solid = degrees(innerHalfAngle).cos().minus(degrees(outerHalfAngle).cos()).mul(pi).mul(2);
    // Degrees become radians with a rounding, which a thin cone multiplies.
    const tolerance = 1e-14 + (4e-16 * (innerHalfAngle + outerHalfAngle)) / (outerHalfAngle - innerHalfAngle);
    const expected = t.div(solid.mul(a).mul(a.plus(t)));
    check("conical-shell", { innerRadius, wall, innerHalfAngle, outerHalfAngle }, expected, tolerance);
  });

  it("is the spherical shell where the inner half-angle is 0", () => {
    const cone = law("conical-shell", { innerRadius: 1, wall: 2, innerHalfAngle: 0, outerHalfAngle: 25 });
    const shell = law("spherical-shell", { innerRadius: 1, wall: 2, halfAngle: 25 });
    expect(deviationFrom(cone, String(shell))).toBeLessThan(1e-14);
  });
});

describe("bent-tube", () => {
  it.each([
    [0.0531, 0.0222, 0.0009, 90],
    [1, 1.9999999999, 1e-12, 360],
    [1e6, 1, 0.4999999, 1e-9],
    [1, 1e-9, 1e-12, 180],
  ])("R₀=%d, D=%d, wall=%d, %d°", (bendRadius, outerDiameter, wall, angle) => {
    const [r0, b] = [exact(bendRadius), exact(outerDiameter).div(2)];
    const a = b.minus(wall);
    const root = (radius: Decimal) => r0.pow(2).minus(radius.pow(2)).sqrt();
    const expected = degrees(angle).div(pi.mul(2).mul(root(a).minus(root(b))));
    check("bent-tube", { bendRadius, outerDiameter, wall, angle }, expected);
  });
});

describe("torus-arc", () => {
  it.each([
    [0.0131, 0.0094, 108.8],
    [1, 1.9999999999999, 360],
    [1e9, 1e-3, 1e-9],
    [3e-9, 1e-12, 90],
  ])("R₀=%d, d=%d, %d°", (bendRadius, diameter, angle) => {
    const [r0, r] = [exact(bendRadius), exact(diameter).div(2)];
    const expected = degrees(angle).div(pi.mul(2).mul(r0.minus(r0.pow(2).minus(r.pow(2)).sqrt())));
    check("torus-arc", { bendRadius, diameter, angle }, expected);
  });

  it("is the bent tube without a bore, in the limit", () => {
    const bar = law("torus-arc", { bendRadius: 3, diameter: 1, angle: 90 });
    const tube = law("bent-tube", { bendRadius: 3, outerDiameter: 1, wall: 0.4999999999, angle: 90 });
    expect(tube).toBeCloseTo(bar, 9);
  });
});

describe("hyperbolic-neck", () => {
  it.each([
    [1, 60, 2, 2],
    [0.0013, 90, 0.0047, 2],
    [1, 1e-6, 1e8, 1],
    [1, 90, 1e12, 2],
    [1, 45, 1e-12, 1],
  ])("a=%d, β=%d°, z=%d, sides %d", (throatRadius, openingAngle, length, sides) => {
    const [a, beta, z] = [exact(throatRadius), degrees(openingAngle), exact(length)];
    const expected = new D(sides)
      .mul(z.mul(beta.sin()).div(a).atan())
      .div(pi.mul(2).mul(a).mul(beta.div(2).tan()));
    check("hyperbolic-neck", { throatRadius, openingAngle, length, sides }, expected);
  });

  it("has the value of 8-formulas for a=1, β=60°, z=2, two sides", () => {
    // Source: 8-formulas, agreed there by a second route.
    const given = { throatRadius: 1, openingAngle: 60, length: 2, sides: 2 };
    expect(law("hyperbolic-neck", given)).toBeCloseTo(0.5773502691896, 13);
  });

  it("tends to Holm's ρ/(2a) for a plane with a hole", () => {
    const given = { throatRadius: 0.5, openingAngle: 90, length: 1e14, sides: 2 };
    expect(law("hyperbolic-neck", given)).toBeCloseTo(1, 13);
  });
});

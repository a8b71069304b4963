/**
 * The spreading shapes' closed forms against textbook forms of 60 digits: cylinders, spheroid and contact spots here in
 * decimal.js, spheres from tests/fixtures/potential-values.json. Nearly touching, nearly concentric and far apart.
 */
import type Decimal from "decimal.js";
import { describe, expect, it } from "vitest";
import potential from "../../../fixtures/potential-values.json";
import { D, deviationFrom, exact, law, type Given } from "../../../support/shape-law";

const pi = D.acos(-1);
const acosh = (x: Decimal) => x.plus(x.pow(2).minus(1).sqrt()).ln();
const TOLERANCE = 1e-13;

function check(id: string, given: Given, expected: Decimal | string, tolerance = TOLERANCE): void {
  expect(deviationFrom(law(id, given), expected), `${id} ${JSON.stringify(given)}`).toBeLessThan(tolerance);
}

describe("eccentric-cylinders", () => {
  const cases = [
    [0.0031, 0.0107, 0.0019],
    [1, 2, 1e-12],
    [1, 2, 1 - 1e-12],
    [1, 1.0000001, 1e-15],
    [1, 1e8, 1e-12],
    [1, 1e8, 9e7],
    [1e-9, 3e-9, 1e-21],
  ] as const;

  it.each(cases)("a=%d, b=%d, gap=%d", (innerRadius, outerRadius, gap) => {
    const [a, b] = [exact(innerRadius), exact(outerRadius)];
    const e = b.minus(a).minus(exact(gap));
    const argument = a.pow(2).plus(b.pow(2)).minus(e.pow(2)).div(a.mul(b).mul(2));
    check(
      "eccentric-cylinders",
      { innerRadius, outerRadius, gap, length: 1 },
      acosh(argument).div(pi.mul(2)),
    );
  });

  it.each([0, 1e-90, 1e-12, 0.3, 0.999999])("a=1, b=2, offset=%d", (offset) => {
    const e = exact(offset);
    const argument = new D(5).minus(e.pow(2)).div(4);
    const given = { innerRadius: 1, outerRadius: 2, offset, length: 1 };
    check("eccentric-cylinders", given, acosh(argument).div(pi.mul(2)));
  });

  it("is the cylindrical shell when concentric, whether by offset or by gap", () => {
    const shell = law("cylindrical-shell", { innerRadius: 0.005, outerRadius: 0.008, length: 2 });
    const given = { innerDiameter: "10 mm", outerDiameter: "16 mm", length: 2 };
    check("eccentric-cylinders", { ...given, offset: 0 }, String(shell));
    check("eccentric-cylinders", { ...given, gap: "3 mm" }, String(shell));
  });
});

describe("parallel-cylinders", () => {
  it.each([
    [0.0031, 0.0107, 0.19],
    [1, 1, 1e-12],
    [1, 1e8, 1e-12],
    [1, 3, 1e-15],
    [1, 1, 1e8],
    [2, 0.5, 1e90],
  ])("a=%d, b=%d, gap=%d", (radius1, radius2, gap) => {
    const [a, b] = [exact(radius1), exact(radius2)];
    const s = a.plus(b).plus(exact(gap));
    const argument = s.pow(2).minus(a.pow(2)).minus(b.pow(2)).div(a.mul(b).mul(2));
    check("parallel-cylinders", { radius1, radius2, gap, length: 1 }, acosh(argument).div(pi.mul(2)));
  });

  it("keeps the digits that a given spacing has", () => {
    const spacing = 2 + 2 ** -30;
    const argument = exact(spacing).pow(2).div(2).minus(1);
    const given = { radius1: 1, radius2: 1, spacing, length: 1 };
    check("parallel-cylinders", given, acosh(argument).div(pi.mul(2)));
  });
});

describe("cylinder-plane", () => {
  it.each([
    [0.0031, 0.21],
    [1, 1e-12],
    [1, 1e-15],
    [1, 1e8],
    [1e-9, 1e-21],
  ])("a=%d, gap=%d", (radius, gap) => {
    const argument = exact(gap).div(exact(radius)).plus(1);
    check("cylinder-plane", { radius, gap, length: 1 }, acosh(argument).div(pi.mul(2)));
  });
});

describe("spheroid", () => {
  it.each([
    [0.9, 0.3],
    [0.3, 0.9],
    [1, 1],
    [1, 1 + 2 ** -40],
    [1 + 2 ** -40, 1],
    [1e12, 1],
    [1e-12, 1],
    [1e-90, 1],
    [1, 1e-90],
  ])("polar %d, equatorial %d", (polarRadius, equatorialRadius) => {
    const [p, e] = [exact(polarRadius), exact(equatorialRadius)];
    const t = p.pow(2).minus(e.pow(2)).abs().sqrt();
    // asinh(t/e)/t and atan(t/p)/t; near the sphere 60 digits bear the cancellation.
    const integral = t.isZero()
      ? new D(1).div(e)
      : p.gt(e)
        ? t.div(e).plus(p.div(e)).ln().div(t)
        : D.atan(t.div(p)).div(t);
    check("spheroid", { polarRadius, equatorialRadius }, integral.div(pi.mul(4)));
    check("spheroid", { polarRadius, equatorialRadius, space: "half" }, integral.div(pi.mul(2)));
  });
});

describe("contact spots", () => {
  it("round: ρ/(4a) a side", () => {
    check("contact-spot", { spotDiameter: 0.3, sides: 1 }, new D(1).div(new D("0.6")));
    check("contact-spot", { spotRadius: 0.3 }, new D(1).div(new D("0.6")));
  });

  it.each([
    [5.3e-5, 2.1e-5],
    [1, 1],
    [1, 1e-12],
    [1, 1e-90],
    [1, 0.9999999],
  ])("elliptic, a=%d, b=%d", (majorRadius, minorRadius) => {
    let [a, b] = [exact(majorRadius), exact(minorRadius)];
    for (let step = 0; step < 40; step++) [a, b] = [a.plus(b).div(2), a.mul(b).sqrt()];
    check("elliptic-contact-spot", { majorRadius, minorRadius, sides: 1 }, new D(1).div(a.mul(4)));
  });

  it("elliptic with equal axes is the round spot", () => {
    const given = { majorDiameter: 0.3, minorDiameter: 0.3 };
    check("elliptic-contact-spot", given, String(law("contact-spot", { spotDiameter: 0.3 })));
  });
});

describe("spheres", () => {
  const four = pi.mul(4);

  it.each(potential.spherePlane)("plane, gap/a=%d", (x, value) => {
    check("sphere-plane", { radius: 1, gap: Number(x) }, new D(1).div(four.mul(String(value))));
  });

  it.each(potential.sphereBuried)("buried, cover/a=%d", (x, value) => {
    check("sphere-buried", { radius: 1, cover: Number(x) }, new D(1).div(four.mul(String(value))));
  });

  it.each(potential.spherePair)("pair, a=%d, b=%d, gap=%d", (a, b, gap, value) => {
    const expected = new D(String(value)).div(four);
    check("sphere-pair", { radius1: Number(a), radius2: Number(b), gap: Number(gap) }, expected);
    check("sphere-pair", { radius1: Number(b), radius2: Number(a), gap: Number(gap) }, expected);
  });

  it("the plane is half of two equal spheres", () => {
    for (const gap of [1e-12, 1e-3, 0.7, 40]) {
      const pair = law("sphere-pair", { radius1: 1, radius2: 1, gap: 2 * gap });
      check("sphere-plane", { radius: 1, gap }, String(pair / 2));
    }
  });

  it("a very large second sphere is a plane", () => {
    const pair = law("sphere-pair", { radius1: 1, radius2: 1e12, gap: 0.3 });
    expect(Math.abs(pair / law("sphere-plane", { radius: 1, gap: 0.3 }) - 1)).toBeLessThan(1e-11);
  });

  it("deep down the handbook form ρ/4π·(1/a + 1/2h) holds, and near the surface it does not", () => {
    const handbook = (h: number) => (1 + 1 / (2 * h)) / (4 * Math.PI);
    const error = (h: number) => Math.abs(law("sphere-buried", { radius: 1, depth: h }) / handbook(h) - 1);
    expect(error(1000)).toBeLessThan(1e-9);
    expect(error(1.1)).toBeGreaterThan(5e-3);
  });
});

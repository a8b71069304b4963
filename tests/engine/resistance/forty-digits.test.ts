/**
 * The closed forms of the first ten shapes recomputed with decimal.js at 40 digits, at ordinary and at extreme sizes:
 * a wall of 1e-12 of the radius, an arc of 1e-9 rad, a taper whose ends differ by 1e-13 of their width.
 */
import { describe, expect, it } from "vitest";
import fc from "fast-check";
import Decimal from "decimal.js";
import { findShape } from "@/lib/engine";
import { unitResistance } from "../../support/compute";

// 60 digits inside leave 40 after the cancellations that the plain formulas have at the extremes.
const D = Decimal.clone({ precision: 60, toExpNeg: -400, toExpPos: 400 });
const PI = D.acos(-1);
type Numbers = Readonly<Record<string, number>>;
/** The exact value of a double; `new Decimal(number)` would take its shortest decimal text. */
const d = (x: number): Decimal => {
  let integer = x;
  let power = 0;
  while (!Number.isInteger(integer)) {
    integer *= 2;
    power--;
  }
  return new D(BigInt(integer).toString()).times(new D(2).pow(power));
};

/** The naive formula of each shape, in the dimensions as they are given (angles in radians). */
const formulas: Readonly<Record<string, (n: Numbers) => Decimal>> = {
  bar: (n) => d(n.length).div(d(n.width).times(d(n.thickness))),
  "round-wire": (n) =>
    d(4)
      .times(d(n.length))
      .div(PI.times(d(n.diameter).pow(2))),
  tube: (n) => {
    const inner = d(n.outerDiameter).minus(d(n.wall).times(2));
    const area = PI.div(4).times(d(n.outerDiameter).pow(2).minus(inner.pow(2)));
    return d(n.length).div(area);
  },
  prism: (n) => d(n.length).div(d(n.area)),
  "parallel-plates": (n) => d(n.gap).div(d(n.area)),
  "cylindrical-shell": (n) =>
    D.ln(d(n.innerRadius).plus(d(n.wall)).div(d(n.innerRadius))).div(d(n.angle).times(d(n.length))),
  "spherical-shell": (n) => {
    const a = d(n.innerRadius);
    const solid = PI.times(2).times(d(1).minus(D.cos(d(n.halfAngle))));
    return d(1)
      .div(a)
      .minus(d(1).div(a.plus(d(n.wall))))
      .div(solid);
  },
  "arc-bar": (n) =>
    d(n.angle).div(d(n.thickness).times(D.ln(d(n.innerRadius).plus(d(n.width)).div(d(n.innerRadius))))),
  "cone-frustum": (n) =>
    d(4)
      .times(d(n.length))
      .div(PI.times(d(n.startDiameter)).times(d(n.endDiameter))),
  "tapered-strip": (n) => {
    const [w1, w2] = [d(n.startWidth), d(n.endWidth)];
    if (w1.equals(w2)) return d(n.length).div(w1.times(d(n.thickness)));
    return d(n.length)
      .div(d(n.thickness))
      .times(D.ln(w2.div(w1)))
      .div(w2.minus(w1));
  },
};

/** Upper over lower bound of the tapered shapes. */
const ratios: Readonly<Record<string, (n: Numbers) => Decimal>> = {
  "cone-frustum": (n) => {
    const t = d(n.endDiameter).minus(d(n.startDiameter)).div(2).div(d(n.length)).pow(2);
    return t.isZero() ? d(1) : t.div(D.ln(t.plus(1)));
  },
  "tapered-strip": (n) => {
    const t = d(n.endWidth).minus(d(n.startWidth)).abs().div(2).div(d(n.length));
    return t.isZero() ? d(1) : t.div(D.atan(t));
  },
};

function check(id: string, n: Numbers): void {
  const shape = findShape(id);
  if (!shape) throw new Error(id);
  const dimensions = Object.fromEntries(
    Object.entries(n).map(([name, value]) => {
      const dimension = shape.dimensions[name];
      const angle = dimension.type === "quantity" && dimension.kind === "angle";
      return [name, angle ? `${value} rad` : value];
    }),
  );
  const exact = formulas[id](n);
  const { resistance, checks } = unitResistance(id, dimensions);
  const off = (value: number, expected: Decimal): number => d(value).div(expected).minus(1).abs().toNumber();
  if (ratios[id]) {
    const upper = exact.times(ratios[id](n));
    // Bounds are widened outward by the rounding error that is allowed.
    expect(off(resistance.lower, exact)).toBeLessThan(3e-13);
    expect(off(resistance.upper, upper)).toBeLessThan(3e-13);
    expect(exact.gte(resistance.lower)).toBe(true);
    expect(upper.lte(resistance.upper)).toBe(true);
    expect(off(resistance.value, exact.plus(upper).div(2))).toBeLessThan(1e-13);
  } else {
    expect(off(resistance.value, exact)).toBeLessThan(2e-15);
    expect(exact.gt(resistance.lower) && exact.lt(resistance.upper)).toBe(true);
  }
  expect(resistance.lower).toBeLessThan(resistance.upper);
  for (const { applies, passed } of checks ?? []) expect(!applies || passed).toBe(true);
}

const size = fc.double({ min: -12, max: 12, noNaN: true }).map((exponent) => 10 ** exponent);
const angle = (most: number): fc.Arbitrary<number> =>
  fc.oneof(
    fc.double({ min: -9, max: 0, noNaN: true }).map((exponent) => most * 10 ** exponent),
    fc.constant(most),
  );

const random: Readonly<Record<string, fc.Arbitrary<Numbers>>> = {
  bar: fc.record({ length: size, width: size, thickness: size }),
  "round-wire": fc.record({ length: size, diameter: size }),
  tube: fc
    .tuple(size, size, fc.double({ min: -12, max: -0.302, noNaN: true }))
    .map(([length, outerDiameter, share]) => ({ length, outerDiameter, wall: outerDiameter * 10 ** share })),
  prism: fc.record({ length: size, area: size }),
  "parallel-plates": fc.record({ gap: size, area: size }),
  "cylindrical-shell": fc
    .tuple(size, fc.double({ min: -12, max: 8, noNaN: true }), size, angle(2 * Math.PI))
    .map(([innerRadius, share, length, phi]) => ({
      innerRadius,
      wall: innerRadius * 10 ** share,
      length,
      angle: phi,
    })),
  "spherical-shell": fc
    .tuple(size, fc.double({ min: -12, max: 8, noNaN: true }), angle(Math.PI))
    .map(([innerRadius, share, halfAngle]) => ({ innerRadius, wall: innerRadius * 10 ** share, halfAngle })),
  "arc-bar": fc
    .tuple(size, fc.double({ min: -12, max: 8, noNaN: true }), size, angle(2 * Math.PI))
    .map(([innerRadius, share, thickness, phi]) => ({
      innerRadius,
      width: innerRadius * 10 ** share,
      thickness,
      angle: phi,
    })),
  "cone-frustum": fc.record({ length: size, startDiameter: size, endDiameter: size }),
  "tapered-strip": fc.record({ length: size, startWidth: size, endWidth: size, thickness: size }),
};

describe("closed forms at 40 digits", () => {
  it.each(Object.keys(formulas))("%s over random dimensions", (id) => {
    fc.assert(
      fc.property(random[id], (n) => check(id, n)),
      { seed: 40, numRuns: 150 },
    );
  });

  it.each<[string, Numbers]>([
    ["cylindrical-shell", { innerRadius: 0.01, wall: 1e-14, length: 1, angle: 2 * Math.PI }],
    ["cylindrical-shell", { innerRadius: 0.01, wall: 0.003, length: 1, angle: 1e-9 }],
    ["spherical-shell", { innerRadius: 0.01, wall: 1e-14, halfAngle: Math.PI }],
    ["spherical-shell", { innerRadius: 0.01, wall: 0.003, halfAngle: 1e-9 }],
    ["arc-bar", { innerRadius: 0.01, width: 1e-14, thickness: 0.001, angle: 1e-9 }],
    ["arc-bar", { innerRadius: 1e-9, width: 1e9, thickness: 0.001, angle: 2 * Math.PI }],
    ["tube", { length: 1, outerDiameter: 0.02, wall: 2e-14 }],
    ["cone-frustum", { length: 1, startDiameter: 0.01, endDiameter: 0.01 * (1 + 1e-13) }],
    ["cone-frustum", { length: 1e-6, startDiameter: 0.01, endDiameter: 0.02 }],
    ["tapered-strip", { length: 1, startWidth: 0.01, endWidth: 0.01 * (1 + 1e-13), thickness: 1e-3 }],
    ["tapered-strip", { length: 1, startWidth: 0.01 * (1 + 1e-13), endWidth: 0.01, thickness: 1e-3 }],
    ["tapered-strip", { length: 1, startWidth: 0.01, endWidth: 0.01, thickness: 1e-3 }],
    ["tapered-strip", { length: 1e-9, startWidth: 1e-9, endWidth: 1, thickness: 1e-3 }],
  ])("%s at the extreme %o", (id, n) => check(id, n));

  it("keeps the digits of outer radii that are close to the inner one: the difference of doubles is exact", () => {
    const innerRadius = 0.01;
    const outerRadius = 0.01 * (1 + 3e-12);
    const exact = D.ln(d(outerRadius).div(d(innerRadius))).div(PI.times(2));
    const { resistance } = unitResistance("cylindrical-shell", { innerRadius, outerRadius, length: 1 });
    expect(d(resistance.value).div(exact).minus(1).abs().toNumber()).toBeLessThan(1e-15);
  });
});

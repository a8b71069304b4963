/** tests/fixtures/values.json, groups A to D and F, for the first ten shapes: value, bounds, and the checks of each answer. */
import { describe, expect, it } from "vitest";
import { compute, deviation } from "../support/compute";
import { reference } from "./values";

type Numbers = Readonly<Record<string, number>>;
type Case = readonly [string, string, (n: Numbers) => Record<string, number | string>];

const rad = (value: number): string => `${value} rad`;

const exact: readonly Case[] = [
  ["A-bar-1", "bar", (n) => ({ length: n.L, width: n.w, thickness: n.t })],
  ["A-wire-1", "round-wire", (n) => ({ length: n.L, diameter: n.d })],
  ["A-tube-1", "tube", (n) => ({ length: n.L, outerDiameter: n.D, wall: n.t })],
  ["A-plates-1", "parallel-plates", (n) => ({ gap: n.d, area: n.a * n.b })],
  [
    "A-segment-1",
    "prism",
    ({ L, r, h }) => ({
      length: L,
      area: r * r * Math.acos((r - h) / r) - (r - h) * Math.sqrt(2 * r * h - h * h),
    }),
  ],
  ["A-rounded-1", "prism", (n) => ({ length: n.L, area: n.w * n.t - (4 - Math.PI) * n.r * n.r })],
  ["A-ellipse-1", "prism", (n) => ({ length: n.L, area: Math.PI * n.a * n.b })],
  ["A-hexagon-1", "prism", (n) => ({ length: n.L, area: 1.5 * Math.sqrt(3) * n.s * n.s })],
  ["B-cylshell-1", "cylindrical-shell", (n) => ({ innerRadius: n.a, wall: n.t, length: n.L })],
  [
    "B-cylsector-1",
    "cylindrical-shell",
    (n) => ({ innerRadius: n.a, wall: n.t, length: n.L, angle: rad(n.phi) }),
  ],
  ["B-sphshell-1", "spherical-shell", (n) => ({ innerRadius: n.a, wall: n.t })],
  ["B-hemishell-1", "spherical-shell", (n) => ({ innerRadius: n.a, wall: n.t, halfAngle: 90 })],
  ["B-sphcone-1", "spherical-shell", (n) => ({ innerRadius: n.a, wall: n.t, halfAngle: rad(n.alpha) })],
  ["C-rect-1", "arc-bar", (n) => ({ innerRadius: n.a, width: n.w, thickness: n.t, angle: rad(n.phi) })],
  [
    "D-wedge-1",
    "cylindrical-shell",
    (n) => ({ innerRadius: n.r1, wall: n.L, length: n.t, angle: rad(n.alpha) }),
  ],
  ["D-conecap-1", "spherical-shell", (n) => ({ innerRadius: n.r1, wall: n.L, halfAngle: rad(n.theta) })],
  ["F-rect-1", "bar", (n) => ({ length: n.L, width: n.W, thickness: 1 })],
  [
    "F-annulusradial-1",
    "cylindrical-shell",
    (n) => ({ innerRadius: n.a, wall: n.w, length: 1, angle: rad(n.phi) }),
  ],
  [
    "F-annulusazimuthal-1",
    "arc-bar",
    (n) => ({ innerRadius: n.a, width: n.w, thickness: 1, angle: rad(n.phi) }),
  ],
];

describe("closed forms against 50-digit arithmetic", () => {
  it.each(exact)("%s on %s", (id, shape, dimensions) => {
    const { value, n, tolerance } = reference(id);
    const { resistance, method, checks } = compute({
      shape,
      dimensions: dimensions(n),
      medium: { resistivity: n.rho ?? 1 },
    });
    // Areas computed here in doubles add a few roundings of their own.
    expect(deviation(resistance.value, value)).toBeLessThan(shape === "prism" ? 2e-15 : tolerance);
    expect(resistance.lower).toBeLessThan(value);
    expect(resistance.upper).toBeGreaterThan(value);
    expect(method).toBe("closed-form");
    expect(resistance).toMatchObject({ boundsBasis: "rounding", proved: true });
    expect(checks?.every(({ applies, passed }) => applies && passed)).toBe(true);
  });
});

const slices: readonly Case[] = [
  [
    "D-strip1d-1",
    "tapered-strip",
    (n) => ({ length: n.L, startWidth: n.w1, endWidth: n.w1 + n.dw, thickness: n.t }),
  ],
  [
    "D-thick1d-1",
    "tapered-strip",
    (n) => ({ length: n.L, startWidth: n.w1 + n.dw, endWidth: n.w1, thickness: n.t }),
  ],
  ["D-cone1d-1", "cone-frustum", (n) => ({ length: n.L, startRadius: n.a, endRadius: n.b })],
];

describe("the lower bound of a taper is the one-dimensional slice formula", () => {
  it.each(slices)("%s on %s", (id, shape, dimensions) => {
    const { value, n } = reference(id);
    const { resistance } = compute({ shape, dimensions: dimensions(n), medium: { resistivity: n.rho } });
    // The bound is widened outward by the rounding error of the closed form.
    expect(deviation(resistance.lower, value)).toBeLessThan(2e-13);
    expect(resistance.lower).toBeLessThanOrEqual(value);
    expect(resistance).toMatchObject({ boundsBasis: "rayleigh", proved: true });
  });
});

describe("the bracket of a taper holds the field solution with flat ends", () => {
  it.each<Case>([
    ["D-frustumflat-1", "cone-frustum", (n) => ({ length: n.L, startRadius: n.a, endRadius: n.b })],
    [
      "D-trapezoidflat-1",
      "tapered-strip",
      (n) => ({ length: n.L, startWidth: n.w1, endWidth: n.w2, thickness: 1 }),
    ],
  ])("%s on %s", (id, shape, dimensions) => {
    const { value, n } = reference(id);
    const { resistance } = compute({ shape, dimensions: dimensions(n), medium: { resistivity: 1 } });
    expect(resistance.lower).toBeLessThan(value);
    expect(resistance.upper).toBeGreaterThan(value);
  });

  it("also graded: cone L=1, radii 0.3 to 0.9, σ=exp(−3x), field solution 5.09699 (8-formulas)", () => {
    const { resistance } = compute({
      shape: "cone-frustum",
      dimensions: { length: 1, startRadius: 0.3, endRadius: 0.9 },
      medium: {
        graded: {
          coordinate: "length",
          quantity: "conductivity",
          profile: { kind: "expression", value: "exp(-3*s)" },
        },
      },
    });
    expect(resistance.lower).toBeCloseTo(4.5079, 4);
    expect(resistance.upper).toBeCloseTo(5.2778, 4);
    expect(resistance.lower).toBeLessThan(5.09699);
    expect(resistance.upper).toBeGreaterThan(5.09699);
    expect(resistance).toMatchObject({ boundsBasis: "rayleigh", proved: true });
  });
});

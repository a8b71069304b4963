/** tests/fixtures/values.json, group G: media graded along and across the flow, and B-twolayer-1. */
import { describe, expect, it } from "vitest";
import { computeResistance, type Material } from "@/lib/engine";
import { deviation } from "../support/compute";
import { reference } from "./values";

type Numbers = Readonly<Record<string, number>>;
type Lists = Readonly<Record<string, readonly number[]>>;
interface Graded {
  readonly coordinate: string;
  readonly quantity?: "conductivity" | "resistivity";
  readonly profile: Record<string, unknown>;
}
type Case = readonly [
  string,
  string,
  (n: Numbers, lists: Lists) => Record<string, number | string>,
  (n: Numbers, lists: Lists) => Graded,
];

const rad = (value: number): string => `${value} rad`;
const series = (n: Numbers): Record<string, number> => ({ length: n.L, area: n.A });
const measured = (n: Numbers, { x }: Lists): Record<string, number> => ({
  length: x[x.length - 1],
  area: n.A,
});
const film = (n: Numbers): Record<string, number> => ({ length: n.L, width: n.w, thickness: n.d });
const shell = (n: Numbers): Record<string, number> => ({ innerRadius: n.a, wall: n.t, length: n.L });
const bend = (n: Numbers): Record<string, number | string> => ({
  innerRadius: n.a,
  width: n.w,
  thickness: n.t,
  angle: rad(n.phi),
});
const along =
  (coordinate: string) =>
  (quantity: "conductivity" | "resistivity", profile: Record<string, unknown>): Graded => ({
    coordinate,
    quantity,
    profile,
  });
const length = along("length");
const thickness = along("thickness");
const radius = along("radius");

const layers = (thicknesses: readonly number[], values: readonly number[]): Record<string, unknown> => ({
  kind: "layers",
  layers: thicknesses.map((t, i) => ({ thickness: t, value: values[i] })),
});
const table = (lists: Lists, interpolation: string): Record<string, unknown> => ({
  kind: "table",
  positions: [...lists.x],
  values: [...lists.v],
  interpolation,
});
const total = (parts: readonly number[]): number => parts.reduce((sum, part) => sum + part, 0);

const cases: readonly Case[] = [
  ["G-ser-rholin-1", "prism", series, (n) => length("resistivity", { kind: "linear", from: n.r0, to: n.r1 })],
  [
    "G-ser-siglin-1",
    "prism",
    series,
    (n) => length("conductivity", { kind: "linear", from: n.s0, to: n.s0 + n.ds }),
  ],
  [
    "G-ser-exp-1",
    "prism",
    series,
    (n) => length("resistivity", { kind: "exponential", from: n.r0, to: n.r0 * Math.exp(n.k * n.L) }),
  ],
  [
    "G-ser-exp-1",
    "prism",
    series,
    (n) => length("resistivity", { kind: "expression", value: `${n.r0}*exp(${n.k}*s)` }),
  ],
  [
    "G-ser-power-1",
    "prism",
    series,
    (n) => length("conductivity", { kind: "expression", value: `${n.s0}*(1+s/${n.x0})^${n.n}` }),
  ],
  [
    "G-ser-gauss-1",
    "prism",
    series,
    (n) => length("conductivity", { kind: "gaussian", peak: n.s0, center: 0, spread: n.s }),
  ],
  [
    "G-ser-erfc-1",
    "prism",
    series,
    (n) => length("conductivity", { kind: "complementary-error", surface: n.s0, length: n.l, from: "start" }),
  ],
  [
    "G-ser-erfc-1",
    "prism",
    series,
    (n) => length("conductivity", { kind: "expression", value: `${n.s0}*erfc(s/${n.l})` }),
  ],
  [
    "G-ser-layers-1",
    "prism",
    (n, { t }) => ({ length: total(t), area: n.A }),
    (_, { t, r }) => length("resistivity", layers(t, r)),
  ],
  ["G-ser-tabrho-1", "prism", measured, (_, lists) => length("resistivity", table(lists, "linear"))],
  ["G-ser-tabsig-1", "prism", measured, (_, lists) => length("conductivity", table(lists, "linear"))],
  ["G-ser-tablog-1", "prism", measured, (_, lists) => length("resistivity", table(lists, "log"))],
  ["G-par-lin-1", "bar", film, (n) => thickness("conductivity", { kind: "linear", from: n.s0, to: n.s1 })],
  [
    "G-par-exp-1",
    "bar",
    film,
    (n) => thickness("conductivity", { kind: "expression", value: `${n.s0}*exp(${n.k}*s)` }),
  ],
  [
    "G-par-gauss-1",
    "bar",
    film,
    (n) => thickness("conductivity", { kind: "gaussian", peak: n.s0, center: 0, spread: n.s }),
  ],
  [
    "G-par-erfc-1",
    "bar",
    film,
    (n) =>
      thickness("conductivity", { kind: "complementary-error", surface: n.s0, length: n.l, from: "start" }),
  ],
  [
    "G-par-layers-1",
    "bar",
    (n, { t }) => ({ length: n.L, width: n.w, thickness: total(t) }),
    (_, { t, r }) => thickness("resistivity", layers(t, r)),
  ],
  [
    "G-cyl-power-1",
    "cylindrical-shell",
    shell,
    (n) => radius("conductivity", { kind: "power", reference: n.s0, at: n.a, exponent: n.n }),
  ],
  [
    "G-cyl-exp-1",
    "cylindrical-shell",
    shell,
    (n) => radius("resistivity", { kind: "exponential", from: n.r0, to: n.r0 * Math.exp(n.t / n.l) }),
  ],
  [
    "G-cyl-lin-1",
    "cylindrical-shell",
    shell,
    (n) => radius("conductivity", { kind: "linear", from: n.s0, to: n.s0 * (1 + n.k * n.t) }),
  ],
  [
    "G-cyl-rholin-1",
    "cylindrical-shell",
    shell,
    (n) => radius("resistivity", { kind: "linear", from: n.r0, to: n.r0 + n.g * n.t }),
  ],
  [
    "G-sph-power-1",
    "spherical-shell",
    (n) => ({ innerRadius: n.a, wall: n.t }),
    (n) => radius("conductivity", { kind: "power", reference: n.s0, at: n.a, exponent: n.n }),
  ],
  [
    "G-sph-exp-1",
    "spherical-shell",
    (n) => ({ innerRadius: n.a, wall: n.t, halfAngle: 90 }),
    (n) => radius("resistivity", { kind: "exponential", from: n.r0, to: n.r0 * Math.exp(-n.t / n.l) }),
  ],
  [
    "G-ax-parab-1",
    "round-wire",
    (n) => ({ length: n.L, radius: n.a }),
    (n) => radius("conductivity", { kind: "expression", value: `${n.s0}*(1-${n.k}*(s/${n.a})^2)` }),
  ],
  [
    "G-ax-gauss-1",
    "round-wire",
    (n) => ({ length: n.L, radius: n.a }),
    (n) => radius("conductivity", { kind: "gaussian", peak: n.s0, center: 0, spread: n.s }),
  ],
  [
    "G-az-power-1",
    "arc-bar",
    bend,
    (n) => radius("conductivity", { kind: "power", reference: n.s0, at: n.a, exponent: n.n }),
  ],
  [
    "G-az-theta-1",
    "arc-bar",
    bend,
    (n) => along("angle")("conductivity", { kind: "expression", value: `${n.s0}*exp(${n.k}*s)` }),
  ],
  [
    "G-temp-lin-1",
    "prism",
    series,
    (n) => ({
      coordinate: "length",
      profile: { kind: "temperature", material: "sample", from: n.T1, to: n.T2 },
    }),
  ],
  [
    "G-temp-across-1",
    "bar",
    // The section's split into width and thickness does not matter.
    (n) => ({ length: n.L, width: n.A * 1000, thickness: 1e-3 }),
    (n) => ({
      coordinate: "thickness",
      profile: { kind: "temperature", material: "sample", from: n.T1, to: n.T2 },
    }),
  ],
  [
    "G-temp-parab-1",
    "prism",
    series,
    (n) =>
      length("resistivity", {
        kind: "expression",
        value: `${n.rho20}*(1+${n.alpha}*(${n.T0}+4*${n.dT}*u*(1-u)-20))`,
      }),
  ],
  [
    "G-temp-shell-1",
    "cylindrical-shell",
    shell,
    (n) =>
      radius("resistivity", {
        kind: "expression",
        value: `${n.rho20}*(1+${n.alpha}*(${n.T1}+(${n.T2}-${n.T1})*log(s/${n.a})/log(1+${n.t}/${n.a})-20))`,
      }),
  ],
  [
    "B-twolayer-1",
    "cylindrical-shell",
    (n) => ({ innerRadius: n.a, wall: n.t1 + n.t2, length: n.L }),
    (n) => radius("resistivity", layers([n.t1, n.t2], [n.r1, n.r2])),
  ],
];

describe("graded media against 50-digit arithmetic", () => {
  it.each(cases)("%s on %s", (id, shape, dimensions, graded) => {
    const { value, n, lists, tolerance } = reference(id);
    const sample: Material = {
      id: "sample",
      version: 1,
      name: "Sample",
      kind: "metal",
      resistivity: { model: "linear", resistivity: n.rho20 ?? 1, coefficient: n.alpha ?? 0, reference: 20 },
      range: { from: -100, to: 500 },
      uncertainty: { lower: 1, upper: 1, note: "a test" },
      source: "a test",
      provenance: "measured",
      owner: "library",
    };
    const request = { shape, dimensions: dimensions(n, lists), medium: { graded: graded(n, lists) } };
    const { resistance, quadrature, checks } = computeResistance(request, { material: () => sample });
    // 1e-10 is promised; the values reach rounding.
    expect(deviation(resistance.value, value)).toBeLessThan(Math.max(tolerance, 2e-15) + 1e-13);
    expect(resistance.lower).toBeLessThan(value);
    expect(resistance.upper).toBeGreaterThan(value);
    expect(resistance).toMatchObject({ boundsBasis: "quadrature", proved: false });
    expect(quadrature?.status).toBe("converged");
    expect(quadrature?.relativeError).toBeLessThan(1e-10);
    expect(checks?.every(({ applies, passed }) => !applies || passed)).toBe(true);
  });
});

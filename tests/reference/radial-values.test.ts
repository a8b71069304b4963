/** Entries of tests/fixtures/values.json that are radial shapes (50-digit arithmetic, agreed by a second route). */
import { describe, expect, it } from "vitest";
import { compute, deviation } from "../support/compute";
import { referenceValue } from "../support/shape-law";

const degrees = (radians: number) => `${radians} rad`;

type Entry = readonly [
  string,
  (inputs: Readonly<Record<string, number>>) => {
    shape: string;
    dimensions: Record<string, number | string>;
  },
];

const entries: readonly Entry[] = [
  [
    "B-elliptube-1",
    ({ a, b, t, L }) => ({
      shape: "confocal-shell",
      dimensions: { innerMajor: a, innerMinor: b, wall: t, length: L },
    }),
  ],
  [
    "C-torus-1",
    ({ R0, a, phi }) => ({
      shape: "torus-arc",
      dimensions: { bendRadius: R0, radius: a, angle: degrees(phi) },
    }),
  ],
  [
    "C-tubebend-1",
    ({ R0, a, t, phi }) => ({
      shape: "bent-tube",
      dimensions: { bendRadius: R0, outerRadius: a, wall: t, angle: degrees(phi) },
    }),
  ],
  [
    "D-conetube-1",
    ({ r1, L, th1, dth }) => ({
      shape: "conical-shell",
      dimensions: {
        innerRadius: r1,
        wall: L,
        innerHalfAngle: degrees(th1),
        outerHalfAngle: degrees(th1 + dth),
      },
    }),
  ],
  [
    "D-conecap-1",
    ({ r1, L, theta }) => ({
      shape: "conical-shell",
      dimensions: { innerRadius: r1, wall: L, innerHalfAngle: 0, outerHalfAngle: degrees(theta) },
    }),
  ],
  [
    "D-hyperboloid-1",
    ({ c, z, eta }) => ({
      shape: "hyperbolic-neck",
      dimensions: {
        throatRadius: c * Math.sqrt(1 - eta * eta),
        openingAngle: degrees(Math.acos(eta)),
        length: z,
        sides: 2,
      },
    }),
  ],
];

describe("radial reference values", () => {
  it.each(entries)("%s", (id, build) => {
    const { inputs, value, condition = 1 } = referenceValue(id);
    const result = compute({
      ...build(inputs),
      medium: { resistivity: inputs.rho },
      include: ["checks", "profile", "peak"],
    });
    const { resistance } = result;
    expect(deviation(resistance.value, value)).toBeLessThan((condition + 2) * 4e-16);
    expect(resistance.lower).toBeLessThan(Number(value));
    expect(resistance.upper).toBeGreaterThan(Number(value));
    expect(resistance.boundsBasis).toBe("rounding");
    for (const check of result.checks ?? []) expect(check.applies && !check.passed).toBe(false);
  });
});

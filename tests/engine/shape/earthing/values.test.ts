/** Check values and second routes of the earthing laws; published formulas stand beside them as comparisons. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { integrate } from "@/lib/engine/numeric/gauss-kronrod";
import { armAngles } from "@/lib/engine/shape/earthing/earth-star";
import { D, deviationFrom, exact, law, referenceValue } from "../../../support/shape-law";
import { armMean } from "../../../support/thin-wires";

/** R/ρ of a reference value given for a soil. */
function perResistivity(id: string): { value: number; inputs: Readonly<Record<string, number>> } {
  const { value, inputs } = referenceValue(id);
  return { value: Number(value) / inputs.rho, inputs };
}

const off = (found: number, expected: number) => Math.abs(found / expected - 1);

/** M(l, d) = (2/l)(asinh(l/d) − √(1+d²/l²) + d/l) with 60 digits. */
function meanOf(l: number, d: number) {
  const [length, distance] = [exact(l), exact(d)];
  const q = distance.div(length);
  return length.div(distance).asinh().minus(q.times(q).plus(1).sqrt()).plus(q).times(2).div(length);
}

describe("rods and wires, closed forms with 60 digits", () => {
  const sizes = fc.tuple(
    fc.double({ min: -3, max: 3, noNaN: true }),
    fc.double({ min: -4, max: 7, noNaN: true }),
    fc.double({ min: 0, max: 8, noNaN: true }),
  );
  it("agree to 1e-13 from stubs to rods of 1e7 radii", () => {
    fc.assert(
      fc.property(sizes, ([size, ratio, apart]) => {
        const length = 10 ** size;
        const diameter = length / 10 ** ratio;
        const spacing = diameter * 10 ** apart;
        const pi = D.acos(-1);
        const rod = meanOf(2 * length, diameter / 2).div(pi.times(2));
        expect(deviationFrom(law("earth-rod", { length, diameter }), rod)).toBeLessThan(1e-13);
        const both = meanOf(2 * length, diameter / 2).plus(meanOf(2 * length, spacing));
        const pair = both.div(pi.times(4));
        expect(deviationFrom(law("earth-rod-pair", { length, diameter, spacing }), pair)).toBeLessThan(1e-13);
        if (apart < 0.01) return;
        const wire = law("earth-wire", { length: 2 * length, diameter, depth: spacing / 2 });
        expect(deviationFrom(wire, pair)).toBeLessThan(1e-13);
      }),
      { seed: 11, numRuns: 300 },
    );
  });
});

describe("reference values with 50 digits", () => {
  it("H-rod-avg-1, H-rod-dwight-1, H-rod-ln4d-1", () => {
    const { value, inputs } = perResistivity("H-rod-avg-1");
    const found = law("earth-rod", { length: inputs.L, diameter: 2 * inputs.a });
    expect(off(found, value)).toBeLessThan(1e-14);
    // Dwight leaves out the terms in a/L.
    for (const id of ["H-rod-dwight-1", "H-rod-ln4d-1"]) {
      expect(off(perResistivity(id).value, found)).toBeLessThan(3e-4);
    }
  });

  it("H-rod-spheroid-1: a half spheroid inside the rod has the higher resistance", () => {
    const { value, inputs } = perResistivity("H-rod-spheroid-1");
    expect(law("earth-rod", { length: inputs.L, diameter: 2 * inputs.a })).toBeLessThan(value);
    expect(off(perResistivity("H-rod-ln2-1").value, value)).toBeLessThan(1e-5);
  });

  it("H-tworods-dwight-1", () => {
    const { value, inputs } = perResistivity("H-tworods-dwight-1");
    const found = law("earth-rod-pair", { length: inputs.L, diameter: 2 * inputs.a, spacing: inputs.s });
    expect(off(value, found)).toBeLessThan(5e-4);
  });

  it("H-wire-avg-1, H-wire-dwight-1", () => {
    const { value, inputs } = perResistivity("H-wire-avg-1");
    const found = law("earth-wire", { length: 2 * inputs.L, diameter: 2 * inputs.a, depth: inputs.s / 2 });
    expect(off(found, value)).toBeLessThan(1e-14);
    expect(off(perResistivity("H-wire-dwight-1").value, found)).toBeLessThan(6e-5);
  });

  it("H-ring-filament-1, H-ring-dwight-1", () => {
    const { value, inputs } = perResistivity("H-ring-filament-1");
    const found = law("earth-ring", { ringDiameter: inputs.D, wireDiameter: inputs.d, depth: inputs.s / 2 });
    expect(off(found, value)).toBeLessThan(1e-14);
    expect(off(perResistivity("H-ring-dwight-1").value, found)).toBeLessThan(1e-3);
  });

  it("H-halftorus-1: half a torus at the surface, twice the full space, lies below the thin ring by its bending", () => {
    const { value, inputs } = perResistivity("H-halftorus-1");
    const deep = law("earth-ring", { ringDiameter: 2 * inputs.A, wireDiameter: 2 * inputs.a, depth: 1e12 });
    const ratio = inputs.a / inputs.A;
    const excess = (2 * deep) / value - 1;
    expect(excess).toBeGreaterThan(0);
    expect(excess).toBeLessThan(0.25 * ratio * ratio * (1 + Math.log(1 / ratio)));
  });

  it("H-disc-exact-1, H-disc-dwight-1, H-disc-surface-1", () => {
    const { value, inputs } = perResistivity("H-disc-exact-1");
    const found = law("earth-plate", { diameter: 2 * inputs.a, depth: inputs.s / 2 });
    expect(off(found, value)).toBeLessThan(1e-13);
    expect(off(perResistivity("H-disc-dwight-1").value, found)).toBeLessThan(3e-3);
    const surface = perResistivity("H-disc-surface-1");
    expect(off(law("earth-plate", { diameter: 2 * inputs.a, depth: 1e-13 }), surface.value)).toBeLessThan(
      1e-11,
    );
  });

  it("H-hemisphere-1", () => {
    const { value, inputs } = perResistivity("H-hemisphere-1");
    expect(off(law("earth-hemisphere", { diameter: 2 * inputs.a }), value)).toBeLessThan(4e-16);
  });

  it.each([
    ["H-angle-dwight-1", 2],
    ["H-star3-dwight-1", 3],
    ["H-star4-dwight-1", 4],
    ["H-star6-dwight-1", 6],
    ["H-star8-dwight-1", 8],
  ] as const)("%s", (id, arms) => {
    const { value, inputs } = perResistivity(id);
    const found = law("earth-star", {
      arms,
      armLength: inputs.L,
      wireDiameter: 2 * inputs.a,
      depth: inputs.s / 2,
    });
    expect(off(value, found)).toBeLessThan(2e-4);
  });
});

describe("ring by integration of 1/distance around it", () => {
  it.each([
    [12.7, 0.0094, 0.8],
    [1, 0.5, 0.3],
    [1, 1e-6, 100],
  ])("D = %d, d = %d, h = %d", (ringDiameter, wireDiameter, depth) => {
    const around = (d: number) => {
      // θ = asin(sinh u·d/D) near the point itself takes the peak out; the rest is smooth.
      const k = d / ringDiameter;
      const u = Math.asinh(Math.SQRT1_2 / k);
      const near = integrate((t) => 1 / Math.sqrt(1 - (k * Math.sinh(t)) ** 2) / ringDiameter, 0, u, {
        relative: 1e-13,
      });
      const far = integrate((t) => 1 / Math.hypot(ringDiameter * Math.sin(t), d), Math.PI / 4, Math.PI / 2, {
        relative: 1e-13,
      });
      return (2 / Math.PI) * (near.value + far.value);
    };
    const expected = (around(wireDiameter / 2) + around(2 * depth)) / (4 * Math.PI);
    expect(off(law("earth-ring", { ringDiameter, wireDiameter, depth }), expected)).toBeLessThan(1e-12);
  });
});

describe("plate (a·R/ρ; recomputed, no publication)", () => {
  it.each([
    [0.2, 0.22267256001],
    [1, 0.18084305893],
    [2, 0.159897190764],
  ])("κ = %d", (kappa, value) => {
    expect(off(law("earth-plate", { diameter: 2, depth: kappa / 2 }), value)).toBeLessThan(3e-11);
  });

  it("is continuous where the method changes", () => {
    for (const depth of [0.1, 0.5, 0.5e-6]) {
      const [before, after] = [1 - 1e-9, 1 + 1e-9].map((q) =>
        law("earth-plate", { diameter: 2, depth: depth * q }),
      );
      expect(off(before, after)).toBeLessThan(2e-9);
    }
  });

  /** One Gauss rule of thousands of points over the whole interval (numpy). */
  it.each([
    [0.1, 0.233260058457616],
    [0.05, 0.240108206803388],
    [0.01, 0.24733898450426],
  ])("shallow, κ = %d", (kappa, value) => {
    expect(off(law("earth-plate", { diameter: 2, depth: kappa / 2 }), value)).toBeLessThan(1e-12);
  });

  it("Dwight's formula is 0.7 % high at h = a and 24 % at a/2", () => {
    const dwight = (h: number) => {
      const q = 1 / (4 * h * h);
      return 1 / 8 + (1 - (7 / 12) * q + (33 / 40) * q * q) / (8 * Math.PI * h);
    };
    expect(dwight(1) / law("earth-plate", { diameter: 2, depth: 1 }) - 1).toBeCloseTo(0.007, 3);
    expect(dwight(0.5) / law("earth-plate", { diameter: 2, depth: 0.5 }) - 1).toBeCloseTo(0.24, 2);
  });
});

describe("star by integration over the arms", () => {
  it("agrees to 1e-12", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(2, 3, 4, 6, 8),
        fc.double({ min: 0.5, max: 5, noNaN: true }),
        fc.double({ min: 0.1, max: 6, noNaN: true }),
        (arms, ratio, deep) => {
          const a = 10 ** -ratio;
          const depth = a * 10 ** deep;
          fc.pre(depth > a);
          let sum = 0;
          for (const d of [a, 2 * depth]) {
            // The arm itself by one integral over the difference of places.
            const own = integrate((t) => (1 - d * Math.sinh(t)) * 2, 0, Math.asinh(1 / d), {
              relative: 1e-13,
            });
            sum += own.value;
            for (const angle of armAngles(arms).slice(1)) sum += armMean(0, 1, 0, 1, angle, d);
          }
          const found = law("earth-star", { arms, armLength: 1, wireDiameter: 2 * a, depth });
          expect(off(found, sum / (4 * Math.PI * arms))).toBeLessThan(1e-12);
        },
      ),
      { seed: 12, numRuns: 60 },
    );
  });

  it("of Dwight agrees to 2e-4 up to h = L/10 and is low by up to 2.8 % at L/2", () => {
    const s = 1;
    const [a, L] = [0.3e-3, 1];
    const bracket =
      Math.log((2 * L) / a) + Math.log((2 * L) / s) + 10.98 - 5.51 * s + 3.26 * s ** 2 - 1.17 * s ** 4;
    const dwight = bracket / (16 * Math.PI * L);
    const found = law("earth-star", { arms: 8, armLength: L, wireDiameter: 2 * a, depth: s / 2 });
    expect(dwight / found - 1).toBeLessThan(-0.025);
    expect(dwight / found - 1).toBeGreaterThan(-0.029);
  });
});

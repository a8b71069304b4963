/** The radial shapes' flow: sections integrate to the closed forms, graded media against other routes. */
import { describe, expect, it } from "vitest";
import { compute, deviation, graded } from "../../../support/compute";
import { law, tubes } from "../../../support/shape-law";

const dimensions = {
  "confocal-shell": { innerMajor: 0.0431, innerMinor: 0.0173, wall: 0.0057, length: 0.31 },
  "conical-shell": { innerRadius: 0.0131, wall: 0.0212, innerHalfAngle: 18, outerHalfAngle: 22 },
  "bent-tube": { bendRadius: 0.0531, outerDiameter: 0.0222, wall: 0.0009, angle: 86 },
  "torus-arc": { bendRadius: 0.0131, diameter: 0.0094, angle: 109 },
  "hyperbolic-neck": { throatRadius: 0.001, openingAngle: 60, length: 0.004, sides: 2 },
} as const;

/** Composite Simpson, good enough for smooth integrands and independent of the engine's quadrature. */
function simpson(f: (x: number) => number, from: number, to: number, parts = 2000): number {
  const h = (to - from) / parts;
  let sum = f(from) + f(to);
  for (let i = 1; i < parts; i++) sum += (i % 2 === 1 ? 4 : 2) * f(from + i * h);
  return (sum * h) / 3;
}

describe.each(Object.entries(dimensions))("%s", (id, given) => {
  it("has a section that integrates to the closed form", () => {
    const { along } = tubes(id, given);
    const integral = simpson((x) => 1 / along.section(x), 0, along.extent);
    expect(Math.abs(integral / law(id, given) - 1)).toBeLessThan(1e-10);
  });

  it("has tubes across that integrate to the same conductance", () => {
    for (const { tube, extent } of tubes(id, given).across) {
      // Quadratic steps towards both ends, where a round section ends like a square root.
      const integral = simpson((u) => tube(extent * u * u * (3 - 2 * u)) * extent * 6 * u * (1 - u), 0, 1);
      expect(Math.abs(integral * law(id, given) - 1)).toBeLessThan(1e-6);
    }
  });

  it("passes the engine's checks", () => {
    const result = compute({
      shape: id,
      dimensions: given,
      medium: { resistivity: 1.7e-8 },
      include: ["checks", "peak", "profile", "steps"],
    });
    for (const check of result.checks ?? []) expect(check).toMatchObject({ applies: true, passed: true });
    expect(result.peak?.field.value).toBeGreaterThan(0);
  });

  it("passes them with a uniform medium given as graded", () => {
    for (const { name } of [tubes(id, given).along, ...tubes(id, given).across].map(({ coordinate }) => ({
      name: coordinate,
    }))) {
      const result = graded(id, given, name, "resistivity", { kind: "constant", value: 1 });
      expect(deviation(result.resistance.value, String(law(id, given)))).toBeLessThan(1e-10);
      for (const check of result.checks ?? []) expect(check).toMatchObject({ applies: true, passed: true });
    }
  });
});

describe("graded media", () => {
  it("hyperbolic neck: ρ = ρ₀(1 + (z/c)²) makes the integrand constant", () => {
    // R = sides·ρ₀·(z/c)/(2πc(1−cos β)); ρ as an expression of the place on the axis.
    const [a, beta, z] = [0.001, Math.PI / 3, 0.004];
    const c = a / Math.sin(beta);
    const result = graded("hyperbolic-neck", dimensions["hyperbolic-neck"], "level", "resistivity", {
      kind: "expression",
      value: `1+(s/${c})^2`,
    });
    expect(
      deviation(result.resistance.value, String((2 * (z / c)) / (2 * Math.PI * c * (1 - Math.cos(beta))))),
    ).toBeLessThan(1e-10);
  });

  it("torus arc: σ ∝ r makes every part of the section conduct alike", () => {
    // G = ∬σ₀(r/R₀)dA/(rφ) = σ₀πa²/(R₀φ).
    const [r0, a, phi] = [0.0131, 0.0047, (109 * Math.PI) / 180];
    const result = graded("torus-arc", dimensions["torus-arc"], "radius", "conductivity", {
      kind: "expression",
      value: "s/0.0131",
    });
    expect(deviation(result.resistance.value, String((r0 * phi) / (Math.PI * a * a)))).toBeLessThan(1e-10);
  });

  it("conical shell: two layers of angle conduct side by side", () => {
    const part = (from: number, to: number) =>
      1 /
      law("conical-shell", { innerRadius: 0.0131, wall: 0.0212, innerHalfAngle: from, outerHalfAngle: to });
    const expected = 1 / (5 * part(18, 20) + 2 * part(20, 22));
    const result = graded("conical-shell", dimensions["conical-shell"], "polarAngle", "conductivity", {
      kind: "layers",
      layers: [
        { thickness: 2, value: 5 },
        { thickness: 2, value: 2 },
      ],
    });
    expect(deviation(result.resistance.value, String(expected))).toBeLessThan(1e-10);
  });

  it("confocal shell: layers are shells in series", () => {
    const given = dimensions["confocal-shell"];
    const inner = law("confocal-shell", { ...given, wall: 0.002 });
    const whole = law("confocal-shell", given);
    const result = graded("confocal-shell", given, "level", "resistivity", {
      kind: "layers",
      layers: [
        { thickness: 0.002, value: 3 },
        { thickness: 0.0037, value: 7 },
      ],
    });
    expect(deviation(result.resistance.value, String(3 * inner + 7 * (whole - inner)))).toBeLessThan(1e-10);
  });
});

describe("peak", () => {
  it("bent tube: at the inside of the bend, 1/((R₀−b)φ) at one volt", () => {
    const result = compute({
      shape: "bent-tube",
      dimensions: dimensions["bent-tube"],
      medium: { resistivity: 1 },
      include: ["peak"],
    });
    const expected = 1 / ((0.0531 - 0.0111) * ((86 * Math.PI) / 180));
    expect(deviation(result.peak?.field.value ?? 0, String(expected))).toBeLessThan(1e-12);
  });

  it("is unbounded at the rim of a hole in a plane, and finite for every smaller opening", () => {
    const peak = (openingAngle: number) =>
      compute({
        shape: "hyperbolic-neck",
        dimensions: { throatRadius: 1, openingAngle, length: 3 },
        medium: { resistivity: 1 },
        include: ["peak", "profile"],
      });
    expect(peak(90).peak?.field.value).toBeNull();
    expect(peak(90).peak?.field.text).toBe("unbounded");
    expect(peak(90).profile?.field.every(Number.isFinite)).toBe(true);
    const { field } = peak(80).peak ?? { field: { value: null } };
    // E on the wall at the throat = V/(sides·a·cot(β/2)… ) from I = V/R and dA there: E = V·sin β/(2·a·cos β·atan(z sin β/a)).
    const beta = (80 * Math.PI) / 180;
    const expected = Math.sin(beta) / (2 * Math.cos(beta) * Math.atan(3 * Math.sin(beta)));
    expect(deviation(field.value ?? 0, String(expected))).toBeLessThan(1e-9);
  });
});

describe("hyperbolic-neck far longer than its throat", () => {
  // The tail beyond 1000 focal radii carries 6e-4 of the whole; a rule that spans it at once sees nothing of it.
  it.each([1e6, 1e12, 1e17, 1e30])("length %d throat radii: the integral is the closed form", (length) => {
    for (const openingAngle of [1e-9, 45, 90]) {
      const shape = { throatRadius: 1, openingAngle, length, sides: 2 };
      const uniform = compute({ shape: "hyperbolic-neck", dimensions: shape, medium: { resistivity: 1 } });
      const profile = { kind: "constant", value: 1 };
      const integral = graded("hyperbolic-neck", shape, "level", "resistivity", profile);
      expect(deviation(integral.resistance.value, uniform.resistance.value)).toBeLessThan(1e-10);
    }
  });
});

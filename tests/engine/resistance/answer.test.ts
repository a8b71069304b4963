/** The parts of an answer: operating point, verdict, peak, profile, steps, checks, statements. */
import { describe, expect, it } from "vitest";
import { catalogue, exampleRequest, libraryMaterial, resistanceResultSchema } from "@/lib/engine";
import { compute, deviation, graded } from "../../support/compute";

const shell = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
};
const all = ["steps", "profile", "checks", "peak"];

describe("the contract's example", () => {
  const result = compute({
    ...shell,
    operating: { temperature: "75 degC", voltage: "500 V" },
    include: all,
    record: { label: "Sleeve, rev C" },
  });

  it("has the numbers of the contract", () => {
    expect(result.resistance.value).toBeCloseTo(1.458322e11, -5);
    expect(result.resistance.text.replace("\u2009", " ")).toBe("145.83 GΩ");
    expect(result.conductance.value).toBeCloseTo(6.857e-12, 15);
    expect(result.operating).toEqual({
      temperature: 75,
      voltage: 500,
      current: 500 / result.resistance.value,
      power: (500 * 500) / result.resistance.value,
    });
    expect(result).toMatchObject({
      shape: "cylindrical-shell",
      method: "closed-form",
      engine: "1.0.0",
      catalogue: "1",
    });
    expect(result).not.toHaveProperty("record");
  });

  it("keeps to its schema, every shape's example as well", () => {
    expect(resistanceResultSchema.parse(result)).toEqual(result);
    for (const shape of catalogue) {
      const answer = compute({ ...exampleRequest(shape), include: all });
      expect(resistanceResultSchema.parse(answer)).toEqual(answer);
    }
  });

  it("has 101 samples from the high to the low terminal", () => {
    const { profile } = result;
    expect(profile?.coordinate).toBe("radius");
    expect(profile?.per).toBe("operating-point");
    for (const name of ["position", "potential", "field", "currentDensity", "conductivity"] as const) {
      expect(profile?.[name]).toHaveLength(101);
    }
    expect(profile?.position[0]).toBe(0.002);
    expect(profile?.position[100]).toBe(0.005);
    expect(profile?.potential[0]).toBe(500);
    expect(profile?.potential[100]).toBe(0);
    for (let i = 0; i <= 100; i++) {
      const r = 0.002 + 0.00003 * i;
      const exact = (500 * Math.log(0.005 / r)) / Math.log(2.5);
      expect(Math.abs((profile?.potential[i] ?? NaN) - exact)).toBeLessThan(1e-10);
      expect(deviation(profile?.field[i] ?? NaN, 500 / (r * Math.log(2.5)))).toBeLessThan(1e-13);
      expect(profile?.currentDensity[i]).toBeCloseTo((profile?.field[i] ?? NaN) * 1e-12, 20);
    }
  });

  it("has its peak at the inner surface", () => {
    const { peak } = result;
    expect(deviation(peak?.field.value ?? NaN, 500 / (0.002 * Math.log(2.5)))).toBeLessThan(1e-13);
    expect(peak?.position).toMatchObject({ coordinate: "radius", value: 0.002, unit: "m" });
    expect(peak?.currentDensity.value).toBeCloseTo((peak?.field.value ?? NaN) * 1e-12, 20);
  });

  it("has steps with TeX and three checks that pass", () => {
    expect(result.steps?.map(({ title }) => title)).toEqual([
      "Coordinates",
      "Medium",
      "Potential",
      "Field",
      "Current density",
      "Current",
      "Resistance",
    ]);
    for (const { tex } of result.steps ?? []) expect(tex.length).toBeGreaterThan(3);
    // E = V₀/(r·ln(b/a)) at both radii, and J = σE with σ = 1e-12 S/m.
    const said = Object.fromEntries(result.steps?.map(({ title, value }) => [title, value]) ?? []);
    expect(said.Potential).toBe("from 500\u2009V at s = 2\u2009mm to 0\u2009V at s = 5\u2009mm");
    expect(said.Field).toMatch(/^272\.84\u2009kV\/m at s = 2\u2009mm, 109\.14\u2009kV\/m at s = 5\u2009mm/);
    expect(said["Current density"]).toMatch(/^2\.7284.*10⁻⁷.A\/m² at s = 2.mm/);
    expect(result.checks?.map(({ name }) => name)).toEqual([
      "voltage-independence",
      "current-continuity",
      "second-route",
    ]);
    for (const { passed, deviation: off, tolerance } of result.checks ?? []) {
      expect(passed).toBe(true);
      expect(off).toBeLessThanOrEqual(tolerance ?? 0);
    }
  });
});

describe("include", () => {
  it("is checks by default, and nothing where it is empty", () => {
    expect(Object.keys(compute(shell))).toContain("checks");
    const bare = compute({ ...shell, include: [] });
    for (const name of ["checks", "steps", "profile", "peak"]) expect(bare).not.toHaveProperty(name);
  });

  it("does not change the number", () => {
    expect(compute({ ...shell, include: all }).resistance).toEqual(
      compute({ ...shell, include: [] }).resistance,
    );
  });
});

describe("the operating point", () => {
  it("follows from voltage, current or power, and is left out without one", () => {
    const { value } = compute(shell).resistance;
    const at = (operating: Record<string, unknown>) => compute({ ...shell, operating }).operating;
    expect(at({})).toEqual({ temperature: 20 });
    expect(at({ current: "2 nA" }).voltage).toBeCloseTo(2e-9 * value, 9);
    const byPower = at({ power: "1 mW" });
    expect(deviation((byPower.voltage ?? NaN) * (byPower.current ?? NaN), 1e-3)).toBeLessThan(1e-14);
    expect(deviation((byPower.voltage ?? NaN) / (byPower.current ?? NaN), value)).toBeLessThan(1e-14);
  });

  it("does not change the resistance: the assumed drive cancels", () => {
    const { resistance } = compute(shell);
    for (const operating of [{ voltage: 1e-6 }, { voltage: 1e6 }, { current: 3 }, { power: 0.1 }]) {
      expect(compute({ ...shell, operating }).resistance).toEqual(resistance);
    }
  });

  it("evaluates the medium at its temperature (IEC 60028: 1/58 Ω·mm²/m, 0.00393 1/K)", () => {
    const bar = { shape: "bar", dimensions: { length: "1 m", width: "1 mm", thickness: "1 mm" } };
    const copper = { ...bar, medium: { material: "copper-annealed" } };
    expect(deviation(compute(copper).resistance.value, 1 / 58)).toBeLessThan(1e-15);
    const warm = compute({ ...copper, operating: { temperature: 75 } });
    expect(deviation(warm.resistance.value, (1 / 58) * (1 + 0.00393 * 55))).toBeLessThan(1e-15);
    expect(warm.materials).toEqual([
      {
        id: "copper-annealed",
        version: libraryMaterial("copper-annealed")?.version,
        name: libraryMaterial("copper-annealed")?.name,
      },
    ]);
    expect(warm.assumptions.some((text) => text.includes("nominal"))).toBe(true);
  });

  it("extrapolates on request, with a caution", () => {
    const request = {
      shape: "bar",
      dimensions: { length: 1, width: 1, thickness: 1 },
      medium: { material: "copper-annealed", extrapolate: true },
      operating: { temperature: 1000 },
    };
    expect(compute(request).cautions.some((text) => text.startsWith("Extrapolated"))).toBe(true);
  });
});

describe("a requirement", () => {
  const taper = {
    shape: "cone-frustum",
    dimensions: { length: "10 mm", startDiameter: "4 mm", endDiameter: "20 mm" },
    medium: { resistivity: "1 ohm cm" },
  };
  const { lower, upper } = compute(taper).resistance;
  const verdict = (requirement: Record<string, number>) => compute({ ...taper, requirement }).verdict;

  it("is decided only where the bounds lie wholly on one side", () => {
    expect(verdict({ max: upper * 1.01 })).toBe("met");
    expect(verdict({ max: lower * 0.99 })).toBe("not-met");
    expect(verdict({ max: (lower + upper) / 2 })).toBe("undecided");
    expect(verdict({ min: lower * 0.99 })).toBe("met");
    expect(verdict({ min: upper * 1.01 })).toBe("not-met");
    expect(verdict({ min: lower * 0.99, max: upper * 1.01 })).toBe("met");
    expect(verdict({ min: upper * 1.01, max: upper * 2 })).toBe("not-met");
    expect(compute(taper).verdict).toBeUndefined();
  });
});

describe("graded answers", () => {
  const bend = { innerRadius: "1 mm", width: "3 mm", thickness: "1 mm", angle: 90 };

  it("across: the tubes' own samples, and a peak of current density away from the peak of the field", () => {
    const result = graded(
      "arc-bar",
      bend,
      "radius",
      "conductivity",
      { kind: "power", reference: 310, at: "1 mm", exponent: 2.1 },
      { include: all },
    );
    const { across } = result.profile ?? {};
    expect(across?.position).toHaveLength(101);
    expect(across?.conductivity[0]).toBeCloseTo(310, 9);
    expect(across?.currentDensity[0]).toBeCloseTo(310 / (0.001 * (Math.PI / 2)), 6);
    expect(result.peak?.position.value).toBe(0.001);
    expect(result.peak?.currentDensityPosition.value).toBe(0.004);
    // Seen along the flow, the potential falls evenly with the angle.
    expect(result.profile?.potential[50]).toBeCloseTo(0.5, 12);
  });

  it("along: the field is largest where the resistivity is, the current density where the section is smallest", () => {
    const profile = { kind: "linear", from: 1, to: 100 };
    const result = graded(
      "cylindrical-shell",
      { innerRadius: "2 mm", outerRadius: "3 mm", length: 1 },
      "radius",
      "resistivity",
      profile,
      { include: all },
    );
    expect(result.peak?.position.value).toBe(0.003);
    expect(result.peak?.currentDensityPosition.value).toBe(0.002);
    const { field = [], position = [], potential = [] } = result.profile ?? {};
    // The field is minus the slope of the potential.
    for (let i = 1; i < 100; i++) {
      const slope = (potential[i - 1] - potential[i + 1]) / (position[i + 1] - position[i - 1]);
      expect(deviation(slope, field[i])).toBeLessThan(1e-3);
    }
  });

  it("finds a peak inside a thin layer", () => {
    const layers = [
      { thickness: 0.3, value: 1 },
      { thickness: 1e-6, value: 1000 },
      { thickness: 0.699999, value: 1 },
    ];
    const { peak } = graded(
      "prism",
      { length: 1, area: 1 },
      "length",
      "resistivity",
      { kind: "layers", layers },
      { include: ["peak"] },
    );
    expect(peak?.position.value).toBeCloseTo(0.3, 5);
    expect(deviation(peak?.field.value ?? NaN, 1000 / 1.000999)).toBeLessThan(1e-9);
  });

  it("a tapered medium graded along its axis keeps a proved bracket", () => {
    const dimensions = { length: 1, startWidth: 0.2, endWidth: 0.5, thickness: 0.01 };
    for (const profile of [
      { kind: "exponential", from: 1, to: 100 },
      { kind: "expression", value: "if(u<0.5,1,10)" },
    ]) {
      const { resistance } = graded("tapered-strip", dimensions, "length", "conductivity", profile);
      expect(resistance).toMatchObject({ boundsBasis: "rayleigh", proved: true });
      const ratio = 0.15 / Math.atan(0.15);
      expect(resistance.upper / resistance.lower).toBeCloseTo(ratio, 11);
    }
  });

  it("says how the integral went", () => {
    const kink = graded("bar", { length: 1, width: 1, thickness: 1 }, "length", "conductivity", {
      kind: "expression",
      value: "1+abs(u-1/3)",
    });
    expect(kink.quadrature).toMatchObject({ status: "converged" });
    // ∫du/(1+|u−⅓|) = ln(4/3) + ln(5/3)
    expect(deviation(kink.resistance.value, Math.log(4 / 3) + Math.log(5 / 3))).toBeLessThan(1e-13);
    expect(kink.quadrature?.evaluations).toBeLessThan(2000);
  });

  it("sees a jump wherever it lies, also close to a border of the integration", () => {
    for (const at of [0.5, 0.4999, 0.50001, 1e-7, 0.9999999, 1 / 3, 0.0625, 0.06249]) {
      const profile = { kind: "expression", value: `if(u<${at},1,1000)` };
      const { resistance } = graded("prism", { length: 1, area: 1 }, "length", "resistivity", profile);
      expect(deviation(resistance.value, at + 1000 * (1 - at))).toBeLessThan(1e-12);
    }
  });
});

describe("a table of 10,000 points", () => {
  const n = 10_000;
  const positions = Array.from({ length: n }, (_, i) => i / (n - 1));
  const values = positions.map((x, i) => 1 + 0.5 * Math.sin(20 * x) + 0.01 * Math.sin(i * 12.9898));
  const slices = (piece: (a: number, b: number) => number): number => {
    let sum = 0;
    for (let i = 1; i < n; i++) sum += piece(values[i - 1], values[i]) * (positions[i] - positions[i - 1]);
    return sum;
  };

  it.each<[string, (a: number, b: number) => number]>([
    ["linear", (a, b) => (a === b ? 1 / a : Math.log1p((b - a) / a) / (b - a))],
    ["log", (a, b) => (a === b ? 1 / a : (1 / a - 1 / b) / Math.log1p((b - a) / a))],
  ])("%s agrees with the exact sum", (interpolation, piece) => {
    const profile = { kind: "table", positions, values, interpolation };
    const { resistance, quadrature } = graded(
      "prism",
      { length: 1, area: 1 },
      "length",
      "conductivity",
      profile,
    );
    expect(deviation(resistance.value, slices(piece))).toBeLessThan(1e-12);
    expect(quadrature?.status).toBe("converged");
  });

  it("monotone cubic lies close to the linear one and passes its second route", () => {
    const profile = { kind: "table", positions, values, interpolation: "monotone-cubic" };
    const { resistance, checks } = graded("prism", { length: 1, area: 1 }, "length", "conductivity", profile);
    const linear = slices((a, b) => (a === b ? 1 / a : Math.log1p((b - a) / a) / (b - a)));
    expect(deviation(resistance.value, linear)).toBeLessThan(1e-4);
    expect(checks?.every(({ passed }) => passed)).toBe(true);
  });
});

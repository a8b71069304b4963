import { describe, expect, it } from "vitest";
import {
  catalogue,
  computeResistance,
  exampleRequest,
  libraryMaterial,
  resistivityAt,
  type Material,
  type ResistanceResult,
} from "@/lib/engine";
import { complaints, compute } from "../../../support/compute";

interface Body {
  readonly shape: string;
  readonly dimensions: Readonly<Record<string, unknown>>;
  readonly [member: string]: unknown;
}

/** The shape's example with that tolerance on every quantity. */
function toleranced(id: string, tolerance: string): Body {
  const shape = catalogue.find((entry) => entry.id === id);
  if (!shape) throw new Error(id);
  const example = exampleRequest(shape) as unknown as Body;
  const dimensions = Object.entries(example.dimensions).map(([name, value]) => {
    const type = shape.dimensions[name]?.type ?? "quantity";
    return [name, type === "integer" || type === "choice" ? value : { value, tolerance }];
  });
  return { ...example, dimensions: Object.fromEntries(dimensions) };
}

function uncertaintyOf(body: Body, uncertainty: Record<string, unknown>) {
  const result: ResistanceResult = compute({ ...body, include: [], uncertainty });
  if (!result.uncertainty) throw new Error("no uncertainty");
  return { ...result.uncertainty, value: result.resistance.value };
}

describe("the three methods against each other", () => {
  it.each(catalogue.map(({ id }) => id))("small tolerances of %s", (id) => {
    const body = toleranced(id, "0.01 %");
    const slow = id === "earth-rod-layered";
    const first = uncertaintyOf(body, { method: "propagation" });
    const drawn = uncertaintyOf(body, { method: "monte-carlo", trials: slow ? 1000 : 4000, seed: 3 });
    // A sample's standard deviation strays by 1/√(2n); five of that.
    expect(Math.abs(drawn.standard / first.standard - 1)).toBeLessThan(slow ? 0.12 : 0.06);
    expect(first.contributions.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
    expect(drawn.contributions.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
    if (slow) return;
    const worst = uncertaintyOf(body, { method: "worst-case" });
    // Nothing that was drawn may lie outside the box's extremes.
    expect(worst.low).toBeLessThanOrEqual(drawn.low);
    expect(worst.high).toBeGreaterThanOrEqual(drawn.high);
    // To first order the box's half-width is the sum of |sensitivity|·tolerance, √3 standard uncertainties each.
    const reach = first.contributions.reduce(
      (sum, c) => sum + Math.abs(c.sensitivity) * c.standard * Math.sqrt(3),
      0,
    );
    const halfWidth = (worst.high - worst.low) / 2;
    const soil = first.contributions.some(
      ({ input, standard }) => input.endsWith("material") && standard > 0.05,
    );
    if (!soil) expect(Math.abs(halfWidth / reach - 1)).toBeLessThan(0.02);
  });

  it("repeat for a seed and differ for another", () => {
    const body = toleranced("bar", "1 %");
    const once = uncertaintyOf(body, { method: "monte-carlo", trials: 5000, seed: 9 });
    expect(uncertaintyOf(body, { method: "monte-carlo", trials: 5000, seed: 9 })).toEqual(once);
    expect(uncertaintyOf(body, { method: "monte-carlo", trials: 5000, seed: 10 }).low).not.toBe(once.low);
  });
});

describe("worst case where the resistance is not monotone", () => {
  /** Extremes over a dense grid of plain requests. */
  const dense = (values: readonly number[], body: (value: number) => Body): [number, number] => {
    const found = values.map((value) => compute({ ...body(value), include: [] }).resistance.value);
    return [Math.min(...found), Math.max(...found)];
  };
  const steps = (from: number, to: number): number[] =>
    Array.from({ length: 2001 }, (_, k) => from + ((to - from) * k) / 2000);

  it("in the temperature of a material whose resistivity has a peak", () => {
    const peaked: Material = {
      ...(libraryMaterial("constantan") ?? fail()),
      id: "peaked",
      uncertainty: { lower: 1, upper: 1, note: "none" },
      resistivity: {
        model: "polynomial",
        quantity: "resistivity",
        reference: 25,
        coefficients: [4.8e-7, 0, -2e-12],
      },
      range: { from: -50, to: 100 },
    };
    const rho = (t: number): number => resistivityAt(peaked, t);
    const context = { material: (id: string) => (id === "peaked" ? peaked : undefined) };
    const body = (temperature: unknown) => ({
      shape: "bar",
      dimensions: { length: 1, width: 1, thickness: 1 },
      medium: { material: "peaked" },
      operating: { temperature },
      include: [],
    });
    const result = computeResistance(
      { ...body({ value: 20, plus: 40, minus: 10 }), uncertainty: { method: "worst-case" } },
      context,
    );
    const { low = 0, high = 0, basis = "" } = result.uncertainty ?? {};
    expect(high).toBe(rho(25));
    expect(low).toBe(rho(60));
    expect(basis).toMatch(/rises and falls with operating\.temperature/);
  });

  it("in a dimension: the wide end of a steep taper", () => {
    const body = (startWidth: unknown): Body => ({
      shape: "tapered-strip",
      dimensions: { length: "80 mm", endWidth: "10 mm", thickness: "2 mm", startWidth },
      medium: { resistivity: 1.7e-8 },
    });
    const { low, high, basis } = uncertaintyOf(body({ value: 0.2, plus: 2, minus: 0.15 }), {
      method: "worst-case",
    });
    const [least, most] = dense(steps(0.05, 2.2), body);
    expect(low).toBeLessThanOrEqual(least);
    expect(Math.abs(low / least - 1)).toBeLessThan(1e-5);
    expect(Math.abs(high / most - 1)).toBeLessThan(1e-12);
    expect(basis).toMatch(/both rises and falls with dimensions\.startWidth/);
  });

  it("in the centre of a bell across the length of a bar", () => {
    const body = (center: unknown): Body => ({
      shape: "bar",
      dimensions: { length: 1, width: 1, thickness: 1 },
      medium: {
        graded: {
          coordinate: "length",
          quantity: "conductivity",
          profile: { kind: "gaussian", peak: 2, center, spread: 0.3, background: 1 },
        },
      },
    });
    const { low, high } = uncertaintyOf(body({ value: 0.4, plus: 0.5, minus: 0.3 }), {
      method: "worst-case",
    });
    const [least, most] = dense(steps(0.1, 0.9), body);
    expect(low).toBeLessThanOrEqual(least * (1 + 1e-9));
    expect(Math.abs(low / least - 1)).toBeLessThan(1e-6);
    expect(Math.abs(high / most - 1)).toBeLessThan(1e-9);
  });
});

function fail(): never {
  throw new Error("the library lacks the material");
}

describe("what joins in", () => {
  const bar: Body = {
    shape: "bar",
    dimensions: { length: "1 m", width: "50 mm", thickness: "10 mm" },
    medium: { material: "copper-annealed" },
  };

  it("the stated uncertainty of a material", () => {
    const { uncertainty } = libraryMaterial("copper-annealed") ?? fail();
    const { low, high, value, contributions } = uncertaintyOf(bar, { method: "worst-case" });
    expect(low / value).toBeCloseTo(uncertainty.lower, 12);
    expect(high / value).toBeCloseTo(uncertainty.upper, 12);
    expect(contributions.map(({ input }) => input)).toEqual(["medium.material"]);
    expect(contributions[0].sensitivity).toBeCloseTo(value, 15);
  });

  it("the materials of both media, graded or not", () => {
    const body: Body = {
      shape: "clad-wire",
      dimensions: { length: "1 m", coreDiameter: "1 mm", claddingThickness: "0.1 mm" },
      media: {
        core: { material: "copper-annealed" },
        cladding: {
          graded: {
            coordinate: "length",
            profile: { kind: "temperature", material: "nickel", from: 20, to: { value: 40, tolerance: 5 } },
          },
        },
      },
    };
    const { contributions } = uncertaintyOf(body, { method: "propagation" });
    expect(contributions.map(({ input }) => input).sort()).toEqual([
      "media.cladding.graded.profile.material",
      "media.cladding.graded.profile.to",
      "media.core.material",
    ]);
  });

  it("numbers inside a graded profile, by each method", () => {
    // ρ straight from 1 to 2 nΩ·m along 1 m of 1 mm²: R = (from + to)/2 · 1e6, to first order and beyond.
    const body: Body = {
      shape: "bar",
      dimensions: { length: "1 m", width: "1 mm", thickness: "1 mm" },
      medium: {
        graded: {
          coordinate: "length",
          quantity: "resistivity",
          profile: {
            kind: "linear",
            from: { value: 1e-9, tolerance: "10 %" },
            to: { value: 2e-9, plus: 4e-10 },
          },
        },
      },
    };
    const [from, to] = [1e-10 / Math.sqrt(3), 4e-10 / Math.sqrt(12)];
    const standard = (1e6 / 2) * Math.hypot(from, to);
    const first = uncertaintyOf(body, { method: "propagation" });
    expect(first.value).toBeCloseTo(1.5e-3, 12);
    expect(Math.abs(first.standard / standard - 1)).toBeLessThan(1e-6);
    expect(first.contributions.map(({ input }) => input)).toEqual([
      "medium.graded.profile.to",
      "medium.graded.profile.from",
    ]);
    expect(first.contributions[0].share).toBeCloseTo(to ** 2 / (from ** 2 + to ** 2), 6);
    const worst = uncertaintyOf(body, { method: "worst-case" });
    expect(worst.low / 1.45e-3).toBeCloseTo(1, 9);
    expect(worst.high / 1.75e-3).toBeCloseTo(1, 9);
    const drawn = uncertaintyOf(body, { method: "monte-carlo", trials: 4000, seed: 5 });
    expect(Math.abs(drawn.standard / standard - 1)).toBeLessThan(0.06);
  });

  it("values of layers and of a table, but not their places", () => {
    const medium = (profile: unknown) => ({
      graded: { coordinate: "length", quantity: "resistivity", profile },
    });
    const layers = (thickness: unknown) =>
      medium({
        kind: "layers",
        layers: [
          { thickness, value: { value: 1e-8, tolerance: "10 %" } },
          { thickness: "0.6 m", value: 2e-8 },
        ],
      });
    const table = medium({
      kind: "table",
      positions: [0, 1],
      values: [1e-8, { value: 2e-8, tolerance: "10 %" }],
      interpolation: "linear",
    });
    for (const [profile, input] of [
      [layers("0.4 m"), "medium.graded.profile.layers.0.value"],
      [table, "medium.graded.profile.values.1"],
    ] as const) {
      const { contributions } = uncertaintyOf({ ...bar, medium: profile }, { method: "propagation" });
      expect(contributions.map((entry) => entry.input)).toEqual([input]);
    }
    const toleranced = { ...bar, medium: layers({ value: "0.4 m", tolerance: "1 mm" }) };
    expect(complaints({ ...toleranced, uncertainty: { method: "propagation" } })).toEqual([
      expect.objectContaining({
        pointer: "#/medium/graded/profile/layers/0/thickness",
        detail: expect.stringContaining("takes no tolerance"),
      }),
    ]);
  });

  it("without a tolerance and a material nothing strays", () => {
    const { low, high, standard, value } = uncertaintyOf(
      { ...bar, medium: { resistivity: 1.7e-8 } },
      { method: "propagation" },
    );
    expect([low, high, standard]).toEqual([value, value, 0]);
  });

  it("tolerances without a request for uncertainty leave the number as it is, and it says so", () => {
    const dimensions = { ...bar.dimensions, width: { value: "50 mm", tolerance: "1 mm" } };
    const result = compute({ ...bar, dimensions });
    expect(result.resistance).toEqual(compute(bar).resistance);
    expect(result.uncertainty).toBeUndefined();
    expect(result.assumptions.join()).toMatch(/tolerances in the request are not used/);
  });

  it("the verdict holds the range against the requirement", () => {
    const body = { ...bar, medium: { resistivity: { value: 1.7e-8, tolerance: "2 %" } } };
    const value = compute(bar && body).resistance.value;
    const verdict = (max: number, uncertainty?: unknown) =>
      compute({ ...body, requirement: { max }, ...(uncertainty ? { uncertainty } : {}) }).verdict;
    expect(verdict(value * 1.01)).toBe("met");
    expect(verdict(value * 1.01, { method: "worst-case" })).toBe("undecided");
    expect(verdict(value * 1.021, { method: "worst-case" })).toBe("met");
    expect(verdict(value * 0.97, { method: "worst-case" })).toBe("not-met");
  });

  it("propagation rests no verdict on a first order that is nothing", () => {
    // Inner cylinder off the axis by up to 1 mm: R falls with the square of the offset, to acosh((a²+b²-e²)/(2ab))/(2πσL).
    const cylinders = {
      shape: "eccentric-cylinders",
      dimensions: {
        innerRadius: "2 mm",
        outerRadius: "5 mm",
        offset: { value: "0 mm", plus: "1 mm" },
        length: "1 m",
      },
      medium: { resistivity: 1 },
      requirement: { min: "145 mohm" },
      uncertainty: { method: "propagation" },
    };
    const offAxis = compute(cylinders);
    expect(offAxis.verdict).toBe("undecided");
    expect(offAxis.uncertainty?.low).toBeCloseTo(Math.acosh((4 + 25 - 1) / 20) / (2 * Math.PI), 9);
    expect(offAxis.cautions.join()).toMatch(/not straight/);
    // Neither a coefficient about zero nor a temperature at its reference does anything alone.
    const hot = compute({
      ...bar,
      medium: { resistivity: 1.7e-8, temperatureCoefficient: { value: 0, tolerance: 0.004 } },
      operating: { temperature: { value: 20, tolerance: 50 } },
      requirement: { max: compute(bar).resistance.value * 1.1 },
      uncertainty: { method: "propagation" },
    });
    expect(hot.verdict).toBe("undecided");
  });

  it("a tolerance of unequal sides moves the range", () => {
    const body = { ...bar, medium: { resistivity: { value: 1.7e-8, plus: "2 %" } } };
    const { low, high, value } = uncertaintyOf(body, { method: "worst-case" });
    expect(low).toBe(value);
    expect(high / value).toBeCloseTo(1.02, 12);
    const first = uncertaintyOf(body, { method: "propagation" });
    expect((first.low + first.high) / 2 / value).toBeCloseTo(1.01, 9);
  });
});

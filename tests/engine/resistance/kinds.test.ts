/** The kinds of answer beside flow tubes: shape factors, sheets, two media; and an engine check that fails. */
import { describe, expect, it } from "vitest";
import { catalogue, CheckFailure, exampleRequest, findShape } from "@/lib/engine";
import { listChecks, runChecks } from "@/lib/engine/resistance/checks";
import { AlongConductor, uniformLaw } from "@/lib/engine/resistance/along-conductor";
import type { Solution } from "@/lib/engine/resistance/solution";
import { reference } from "../../reference/values";
import { complaints, compute, deviation } from "../../support/compute";

describe("a shape known by a factor", () => {
  const hemisphere = {
    shape: "earth-hemisphere",
    dimensions: { diameter: "2 m" },
    medium: { resistivity: "100 ohm m" },
  };

  it("is the resistivity times the factor: ρ/(2πa)", () => {
    const { resistance } = compute(hemisphere);
    expect(deviation(resistance.value, 100 / (2 * Math.PI))).toBeLessThan(1e-14);
    expect(resistance.lower).toBeLessThan(resistance.value);
    expect(resistance.upper).toBeGreaterThan(resistance.value);
  });

  it("lists the checks that do not apply with a reason, and has no profile", () => {
    const { checks, profile, steps } = compute({ ...hemisphere, include: ["checks", "profile", "steps"] });
    expect(checks?.map(({ name }) => name)).toEqual([
      "voltage-independence",
      "current-continuity",
      "second-route",
    ]);
    expect(checks?.[0]).toMatchObject({ applies: false });
    expect(checks?.[0].reason).toContain("known as a whole");
    expect(profile).toBeNull();
    expect(steps?.length).toBeGreaterThan(2);
  });

  it("takes a material and a temperature coefficient like any other", () => {
    const medium = { resistivity: 100, temperatureCoefficient: -0.02 };
    const { resistance } = compute({ ...hemisphere, medium, operating: { temperature: 10 } });
    expect(deviation(resistance.value, 120 / (2 * Math.PI))).toBeLessThan(1e-14);
  });
});

describe("two media", () => {
  const clad = {
    shape: "clad-wire",
    dimensions: { length: 12.3, coreDiameter: 0.00197, claddingThickness: 7.3e-5 },
    media: { core: { resistivity: 2.79e-8 }, cladding: { resistivity: 1.7241e-8 } },
  };

  it("uniform: A-clad-1 of the reference values", () => {
    const { value, tolerance } = reference("A-clad-1");
    expect(deviation(compute(clad).resistance.value, value)).toBeLessThan(tolerance);
  });

  it("graded alike along the wire: the bracket closes on the exact value", () => {
    const along = (value: number) => ({
      graded: {
        coordinate: "length",
        quantity: "resistivity",
        profile: { kind: "linear", from: value, to: 3 * value },
      },
    });
    const { resistance } = compute({ ...clad, media: { core: along(2.79e-8), cladding: along(1.7241e-8) } });
    expect(deviation(resistance.value, 2 * compute(clad).resistance.value)).toBeLessThan(1e-11);
    expect(resistance).toMatchObject({ boundsBasis: "rayleigh", proved: true });
    expect(resistance.upper / resistance.lower - 1).toBeLessThan(1e-9);
  });

  it("graded against each other: the bracket stays open, and holds", () => {
    const along = (from: number, to: number) => ({
      graded: { coordinate: "length", quantity: "resistivity", profile: { kind: "linear", from, to } },
    });
    const { resistance } = compute({
      ...clad,
      media: { core: along(1e-8, 5e-8), cladding: along(5e-8, 1e-8) },
    });
    expect(resistance.upper).toBeGreaterThan(resistance.lower * 1.01);
    expect(resistance.value).toBeGreaterThan(resistance.lower);
  });

  it.each<[string, Record<string, unknown>, string]>([
    ["one of them missing", { media: { core: { resistivity: 1 } } }, "#/media/cladding"],
    ["an unknown one", { media: { ...clad.media, jacket: { resistivity: 1 } } }, "#/media/jacket"],
    ["a single medium", { media: undefined, medium: { resistivity: 1 } }, "#/medium"],
    ["none", { media: undefined }, "#/media"],
    [
      "a bad value inside",
      { media: { ...clad.media, core: { resistivity: "5 kg" } } },
      "#/media/core/resistivity",
    ],
  ])("%s is a complaint", (_, change, pointer) => {
    expect(complaints({ ...clad, ...change }).map((problem) => problem.pointer)).toContain(pointer);
  });
});

describe("sheets", () => {
  const shape = catalogue.find(({ family }) => family === "sheet");

  it.skipIf(!shape)("take a sheet resistance, or a material or resistivity with a thickness", () => {
    if (!shape) return;
    const sheet = { shape: shape.id, dimensions: shape.example.dimensions };
    const squares = compute({ ...sheet, medium: { sheetResistance: 1 } }).resistance.value;
    const ohms = (medium: Record<string, unknown>): number => compute({ ...sheet, medium }).resistance.value;
    expect(deviation(ohms({ sheetResistance: "50 ohm/sq" }), 50 * squares)).toBeLessThan(1e-14);
    expect(deviation(ohms({ resistivity: 1e-6, thickness: "2 um" }), 0.5 * squares)).toBeLessThan(1e-14);
    expect(
      deviation(
        ohms({ material: "copper-annealed", thickness: "1 oz/ft^2" }),
        (1e-6 / 58 / 34.3e-6) * squares,
      ),
    ).toBeLessThan(1e-14);
    const pointers = (medium: Record<string, unknown>): string[] =>
      complaints({ ...sheet, medium }).map(({ pointer }) => pointer);
    expect(pointers({ resistivity: 1 })).toEqual(["#/medium/thickness"]);
    expect(pointers({ sheetResistance: 50, thickness: 1 })).toEqual(["#/medium/thickness"]);
    const profile = { kind: "constant", value: 1 };
    expect(pointers({ graded: { coordinate: "x", quantity: "conductivity", profile } })).toEqual([
      "#/medium/graded",
    ]);
  });
});

describe("a check that fails", () => {
  const bar = findShape("bar");
  if (bar?.answer.kind !== "flow") throw new Error("bar");
  const { answer } = bar;
  const dimensions = { length: 1, width: 1, thickness: 1 };

  /** A solution of a bar whose closed form is off by the given part. */
  function wrong(part: number): Solution {
    const tubes = answer.flow(dimensions);
    const value = 1 + part;
    return {
      value,
      lower: value * 0.999,
      upper: value * 1.001,
      boundsBasis: "rounding",
      proved: true,
      method: "closed-form",
      cautions: [],
      assumptions: [],
      dimensions,
      view: {
        kind: "along",
        tubes: () => tubes,
        conductor: () => new AlongConductor(tubes.along, uniformLaw(1, 1)),
        integralOhm: value,
        medium: { kind: "uniform", value: 1, relativeError: 0, tex: () => "" },
        answer,
      },
    };
  }

  it("is a defect of the engine, not of the input", () => {
    expect(runChecks(wrong(0)).every(({ passed }) => passed)).toBe(true);
    expect(() => runChecks(wrong(1e-6))).toThrow(CheckFailure);
    const [, continuity, route] = listChecks(wrong(1e-6));
    expect(route).toMatchObject({ name: "second-route", passed: false });
    expect(route.deviation).toBeCloseTo(1e-6, 9);
    expect(continuity.deviation).toBeLessThan(1e-6);
  });
});

it("answers every example the same way twice", () => {
  for (const shape of catalogue) {
    const request = { ...exampleRequest(shape), include: ["steps", "profile", "checks", "peak"] };
    expect(compute(request)).toEqual(compute(request));
  }
});

/** What holds for every shape of the catalogue, now and later. */
import { describe, expect, it } from "vitest";
import {
  catalogue,
  exampleRequest,
  findShape,
  nearestNames,
  resolveDimensions,
  shapeEntry,
  shapeEntrySchema,
} from "@/lib/engine";
import { compute } from "../../support/compute";

it("has unique ids, and finds shapes by them", () => {
  expect(new Set(catalogue.map(({ id }) => id)).size).toBe(catalogue.length);
  for (const shape of catalogue) expect(findShape(shape.id)).toBe(shape);
  expect(findShape("nothing")).toBeUndefined();
});

describe.each(catalogue.map((shape) => [shape.id, shape] as const))("%s", (id, shape) => {
  const entry = shapeEntry(shape);

  it("has a complete wire entry", () => {
    expect(shapeEntrySchema.parse(entry)).toEqual(entry);
    expect(entry.summary.length).toBeGreaterThan(30);
    expect(entry.validity.length).toBeGreaterThan(0);
    expect(entry.sources.length).toBeGreaterThan(0);
    expect(entry.formula).toMatch(/[=≤]|\\le/);
    const names = entry.dimensions.map(({ name }) => name);
    expect(new Set(names).size).toBe(names.length);
    for (const group of entry.alternatives) for (const name of group) expect(names).toContain(name);
    for (const { help, label, symbol, type } of entry.dimensions) {
      expect(help.length).toBeGreaterThan(10);
      expect(label.length).toBeGreaterThan(1);
      // A choice stands in no formula.
      if (type !== "choice") expect(symbol.length).toBeGreaterThan(0);
    }
  });

  it("has an example that is answered, inside its bounds", () => {
    const { resistance, method, checks } = compute(exampleRequest(shape));
    expect(resistance.lower).toBeLessThanOrEqual(resistance.value);
    expect(resistance.upper).toBeGreaterThanOrEqual(resistance.value);
    expect(resistance.lower).toBeLessThan(resistance.upper);
    expect(["closed-form", "quadrature", "field"]).toContain(method);
    for (const check of checks ?? []) {
      if (check.applies) expect(check.passed).toBe(true);
      else expect(check.reason?.length).toBeGreaterThan(10);
    }
  });

  it("draws itself with finite points and known dimensions", () => {
    const dimensions = resolveDimensions(shape, shape.example.dimensions);
    const { views, description } = shape.drawing(dimensions);
    expect(description.length).toBeGreaterThan(20);
    expect(views.length).toBeGreaterThan(0);
    for (const view of views) {
      // Thin electrodes are lines in the soil.
      expect(view.conductor.length + (view.lines?.length ?? 0)).toBeGreaterThan(0);
      for (const path of [...view.conductor, ...view.high, ...view.low]) {
        for (const [x, y] of [path.from, ...path.steps.map(({ to }) => to)]) {
          expect(Number.isFinite(x) && Number.isFinite(y)).toBe(true);
        }
      }
      for (const { name } of view.dimensions) expect(Object.keys(shape.dimensions)).toContain(name);
    }
    expect(views.some(({ high }) => high.length > 0)).toBe(true);
  });

  it("names an unknown dimension and suggests the nearest", () => {
    const [first] = Object.keys(shape.dimensions);
    expect(() => resolveDimensions(shape, { [`${first}x`]: 1 })).toThrow(`is no dimension of ${id}`);
  });
});

describe("nearest names", () => {
  const ids = ["bar", "round-wire", "cylindrical-shell", "spherical-shell", "cone-frustum"];

  it.each([
    ["cylinder-shell", "cylindrical-shell"],
    ["roundwire", "round-wire"],
    ["Bar", "bar"],
    ["brа", undefined],
    ["shell", "cylindrical-shell"],
    ["cone_frustum", "cone-frustum"],
    ["xyz", undefined],
    ["", undefined],
  ])("of %s: %s", (name, nearest) => {
    expect(nearestNames(name, ids)[0]).toBe(nearest);
  });

  it("stay cheap for a very long name", () => {
    expect(nearestNames("x".repeat(1_000_000), ids)).toEqual([]);
  });
});

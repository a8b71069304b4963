import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { arcOf, insideOf } from "@/app/_ui/drawing/geometry";
import { layoutSheet } from "@/app/_ui/drawing/sheet";
import { stretch } from "@/app/_ui/drawing/stretch";
import { catalogue } from "@/lib/engine/shape/catalogue";
import { resolveDimensions } from "@/lib/engine/shape/resolve-dimensions";
import { circle, rectangle } from "@/lib/engine/shape/drawing";

describe("stretch", () => {
  it("keeps the uniform scale where every need is met", () => {
    const { map, distorted } = stretch(0, 10, 20, 200, [{ from: 0, to: 5, pixels: 50 }]);
    expect(distorted).toBe(false);
    expect(map(0)).toBe(0);
    expect(map(10)).toBeCloseTo(200, 9);
  });

  it("widens a wall of 1e-12 of the radius", () => {
    const { map, distorted } = stretch(0, 1 + 1e-12, 200, 200, [{ from: 1, to: 1 + 1e-12, pixels: 20 }]);
    expect(distorted).toBe(true);
    expect(map(1 + 1e-12) - map(1)).toBeCloseTo(20, 6);
    expect(map(1)).toBeLessThan(185);
  });

  it("is monotone", () => {
    const value = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(fc.record({ from: value, to: value, pixels: fc.integer({ min: 1, max: 60 }) }), {
          maxLength: 6,
        }),
        fc.array(value, { minLength: 2, maxLength: 20 }),
        (needs, places) => {
          const { map } = stretch(-1, 1, 100, 200, needs);
          const mapped = [...places].sort((a, b) => a - b).map(map);
          for (let index = 1; index < mapped.length; index += 1) {
            expect(mapped[index]).toBeGreaterThanOrEqual(mapped[index - 1]);
          }
        },
      ),
      { seed: 5, numRuns: 300 },
    );
  });
});

describe("geometry", () => {
  it("finds the circle of a bulge", () => {
    const arc = arcOf([1, 0], { to: [0, 1], bulge: Math.PI / 2 });
    expect(arc?.radius).toBeCloseTo(1, 12);
    expect(arc?.center[0]).toBeCloseTo(0, 12);
    expect(arc?.center[1]).toBeCloseTo(0, 12);
  });

  it("tells a hole from the body", () => {
    const inside = insideOf([rectangle(-2, -2, 4, 4), circle([0, 0], 1)]);
    expect(inside(0, 0)).toBe(false);
    expect(inside(1.5, 1.5)).toBe(true);
    expect(inside(3, 0)).toBe(false);
  });
});

describe.each(catalogue.map((shape) => [shape.id, shape] as const))("the drawing of %s", (_id, shape) => {
  const labels = Object.fromEntries(
    Object.entries(shape.dimensions).map(([name, { symbol }]) => [name, { symbol, value: "12.5 mm" }]),
  );
  const drawing = shape.drawing(resolveDimensions(shape, shape.example.dimensions));

  it.each([320, 560])("has finite coordinates and stays on a sheet of %i px", (width) => {
    const sheet = layoutSheet(drawing, labels, width);
    expect(JSON.stringify(sheet)).not.toMatch(/null|NaN|Infinity/);
    for (const { view, x } of sheet.views) {
      expect(view.bodySize).toBeGreaterThan(40);
      for (const { box } of view.dimensions) {
        expect(x + view.shift[0] + box.x).toBeGreaterThanOrEqual(-1);
        expect(x + view.shift[0] + box.x + box.width).toBeLessThanOrEqual(width + 1);
      }
    }
  });

  it("dimensions only what the shape has", () => {
    for (const { name } of drawing.views.flatMap((view) => view.dimensions))
      expect(shape.dimensions).toHaveProperty(name);
  });

  it("says what it shows", () => {
    expect(drawing.description.length).toBeGreaterThan(20);
  });
});

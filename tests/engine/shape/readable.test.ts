import { describe, expect, it } from "vitest";
import { catalogue, findShape, readableDrawing, resolveDimensions } from "@/lib/engine";

function draw(id: string, given: Record<string, number | string>) {
  const shape = findShape(id);
  if (!shape) throw new Error(id);
  const dimensions = resolveDimensions(shape, given);
  return { ...readableDrawing(shape, dimensions), dimensions, shape };
}

describe("a readable drawing", () => {
  it("is to scale where the proportions are ordinary", () => {
    const { toScale, drawn, dimensions } = draw("bar", {
      length: "100 mm",
      width: "20 mm",
      thickness: "5 mm",
    });
    expect(toScale).toBe(true);
    expect(drawn).toBe(dimensions);
  });

  it("brings sizes closer that lie decades apart, in order, and says so", () => {
    const { toScale, drawn } = draw("bar", { length: "100 m", width: "20 mm", thickness: "0.1 mm" });
    expect(toScale).toBe(false);
    const [length, width, thickness] = [drawn.length, drawn.width, drawn.thickness].map(Number);
    expect(length).toBeGreaterThan(width);
    expect(width).toBeGreaterThan(thickness);
    expect(length / thickness).toBeLessThan(100);
  });

  it("keeps moderate ratios as they are", () => {
    const { drawn } = draw("bar", { length: "100 m", width: "20 mm", thickness: "10 mm" });
    expect(Number(drawn.width) / Number(drawn.thickness)).toBeCloseTo(2, 12);
  });

  it("shows a wall of 1e-12 of the radius", () => {
    const { drawn, toScale } = draw("cylindrical-shell", { innerRadius: 1, wall: 1e-12, length: 1 });
    expect(toScale).toBe(false);
    expect(Number(drawn.wall) / Number(drawn.innerRadius)).toBeGreaterThan(0.03);
    expect(Number(drawn.outerRadius)).toBeCloseTo(Number(drawn.innerRadius) + Number(drawn.wall), 12);
  });

  it("opens an angle that is too small to see", () => {
    const { drawn, toScale } = draw("arc-bar", { innerRadius: 1, width: 1, thickness: 1, angle: "1e-9 rad" });
    expect(toScale).toBe(false);
    expect(Number(drawn.angle)).toBeGreaterThan(0.2);
    expect(drawn.innerRadius).toBe(1);
  });

  it("never breaks a constraint: a wall stays less than half the diameter", () => {
    const { drawn } = draw("tube", { length: 1000, outerDiameter: 1, wall: 0.49 });
    expect(2 * Number(drawn.wall)).toBeLessThan(Number(drawn.outerDiameter));
  });

  it.each(catalogue.map(({ id }) => id))("%s draws its example", (id) => {
    const shape = findShape(id);
    if (!shape) throw new Error(id);
    const { drawing, drawn } = readableDrawing(shape, resolveDimensions(shape, shape.example.dimensions));
    expect(drawing.views.length).toBeGreaterThan(0);
    for (const { holds } of shape.constraints) expect(holds(drawn)).toBe(true);
  });
});

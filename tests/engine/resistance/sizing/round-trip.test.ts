import { describe, expect, it } from "vitest";
import {
  catalogue,
  computeSizing,
  exampleRequest,
  libraryMaterial,
  resolveDimensions,
  shapeEntry,
} from "@/lib/engine";
import { compute } from "../../../support/compute";

const context = { material: libraryMaterial };

interface Body {
  readonly shape: string;
  readonly dimensions: Readonly<Record<string, unknown>>;
  readonly [member: string]: unknown;
}

/** Every dimension of every shape's example that can be found, defaults included. */
const cases = catalogue.flatMap((shape) => {
  const { dimensions } = shape.example;
  const { alternatives } = shapeEntry(shape);
  return Object.keys(shape.dimensions)
    .filter((name) => shape.dimensions[name].type !== "choice")
    .filter((name) => {
      // Of alternatives the one that the example gives.
      const group = alternatives.find((names) => names.includes(name));
      return !group || name in dimensions || !group.some((other) => other in dimensions);
    })
    .map((name) => [shape.id, name] as const);
});

/** Dimensions without influence, which is told and not guessed at: a disc's squares, and an arm that floats. */
const MUTE = [
  ["sheet-tee", "rightLength"],
  ["sheet-disc", "diameter"],
];

describe("sizing gives back", () => {
  it.each(cases)("%s: %s", (id, name) => {
    const shape = catalogue.find((entry) => entry.id === id);
    if (!shape) throw new Error(id);
    const body = exampleRequest(shape) as unknown as Body;
    const before = compute({ ...body, include: [] }).resistance;
    const { [name]: given, ...others } = body.dimensions;
    const request = { ...body, dimensions: others, include: [], solveFor: name, target: before.value };
    let found;
    try {
      found = computeSizing(request, context);
    } catch (error) {
      expect(String(error)).toMatch(/does not change the resistance/);
      expect(MUTE).toContainEqual([id, name]);
      return;
    }
    expect(MUTE).not.toContainEqual([id, name]);
    const { solutions } = found;
    for (const solution of solutions) {
      const back = compute({
        ...body,
        dimensions: { ...others, [name]: solution.dimension.value },
        include: [],
      }).resistance;
      expect(back).toEqual(solution.resistance);
      // The text goes back as well, and gives the same resistance to what it promises.
      const typed = compute({
        ...body,
        dimensions: { ...others, [name]: solution.dimension.text },
        include: [],
      }).resistance;
      expect(Math.abs(typed.value / back.value - 1)).toBeLessThan(
        solution.method === "field" ? 2e-5 : 1.001e-5,
      );
      if (!solution.exact) continue;
      expect(solution.resistance.lower).toBeLessThanOrEqual(before.value);
      expect(solution.resistance.upper).toBeGreaterThanOrEqual(before.value);
      // A field solution's mesh jumps a little with the dimensions; the target then lies between its bounds.
      if (solution.method === "field") {
        expect(solution.resistance.lower).toBeLessThanOrEqual(before.value * (1 + 1e-9));
        expect(solution.resistance.upper).toBeGreaterThanOrEqual(before.value * (1 - 1e-9));
      } else
        expect(Math.abs(back.value / before.value - 1)).toBeLessThan(
          solution.method === "quadrature" ? 1e-9 : 1e-11,
        );
    }
    expect(solutions.some(({ exact }) => exact)).toBe(true);
    // One of the solutions is where we came from.
    const came = Number(resolveDimensions(shape, body.dimensions)[name]);
    const arrived = solutions.map(({ dimension }) =>
      Number(resolveDimensions(shape, { ...others, [name]: dimension.value })[name]),
    );
    expect(Math.min(...arrived.map((x) => Math.abs(x / came - 1)))).toBeLessThan(1e-4);
    if (shape.dimensions[name].type === "integer") expect(arrived).toContain(came);
    expect(given === undefined || arrived.length > 0).toBe(true);
  });
});

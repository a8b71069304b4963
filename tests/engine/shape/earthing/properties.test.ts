/** Properties that every earthing shape must have over its whole admitted range, by random dimensions. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Dimensions, Factor, Resolved } from "@/lib/engine/shape/define-shape";
import { shapeOf } from "../../../support/shape-law";

type Values = Record<string, number | string>;

/** Ten to a power between two limits. */
const power = (from: number, to: number) =>
  fc.double({ min: from, max: to, noNaN: true }).map((x) => 10 ** x);

/** Random dimensions of each shape: a size, and ratios that reach far beyond any practice. */
const cases: Readonly<Record<string, fc.Arbitrary<Values>>> = {
  "earth-hemisphere": power(-9, 9).map((diameter) => ({ diameter })),
  "earth-rod": fc.tuple(power(-6, 6), power(-3, 8)).map(([length, ratio]) => ({
    length,
    diameter: length / ratio,
  })),
  "earth-rod-pair": fc.tuple(power(-6, 6), power(-3, 8), power(0, 9)).map(([length, ratio, apart]) => ({
    length,
    diameter: length / ratio,
    spacing: (length / ratio) * apart,
  })),
  "earth-rod-group": fc
    .tuple(
      power(-3, 3),
      power(-2, 6),
      power(0, 7),
      fc.integer({ min: 1, max: 6 }),
      fc.constantFrom("line", "ring", "square"),
    )
    .map(([length, ratio, apart, root, arrangement]) => ({
      length,
      diameter: length / ratio,
      spacing: (length / ratio) * apart,
      count: arrangement === "square" ? root * root : root * 3,
      arrangement,
    })),
  "earth-wire": fc.tuple(power(-6, 6), power(-3, 8), power(0.01, 9)).map(([length, ratio, deep]) => ({
    length,
    diameter: length / ratio,
    depth: (length / ratio) * 0.5 * deep,
  })),
  "earth-ring": fc.tuple(power(-6, 6), power(0.01, 8), power(0.01, 9)).map(([ringDiameter, ratio, deep]) => ({
    ringDiameter,
    wireDiameter: ringDiameter / ratio,
    depth: (ringDiameter / ratio) * 0.5 * deep,
  })),
  "earth-plate": fc.tuple(power(-6, 6), power(-4, 9)).map(([diameter, deep]) => ({
    diameter,
    depth: diameter * deep,
  })),
  "earth-star": fc
    .tuple(power(-6, 6), power(-2, 8), power(0.01, 9), fc.constantFrom(2, 3, 4, 6, 8))
    .map(([armLength, ratio, deep, arms]) => ({
      arms,
      armLength,
      wireDiameter: armLength / ratio,
      depth: (armLength / ratio) * 0.5 * deep,
    })),
  "earth-rod-layered": fc
    .tuple(power(-3, 3), power(-1, 6), power(0.01, 8), power(-4, 4))
    .map(([length, ratio, deep, contrast]) => ({
      length,
      diameter: length / ratio,
      upperDepth: (length / ratio) * 0.5 * deep,
      contrast,
    })),
  "earth-grid": fc.tuple(power(-2, 10), power(0, 3), power(-4, 4)).map(([area, density, deep]) => ({
    area,
    conductorLength: density * Math.sqrt(area),
    depth: deep * Math.sqrt(area),
  })),
};

function evaluate(id: string, values: Values): Factor {
  const { answer } = shapeOf(id);
  const { contrast, ...dimensions } = values;
  const d = dimensions as Resolved<Dimensions>;
  if (answer.kind === "factor") return answer.factor(d);
  if (answer.kind !== "media") throw new Error(`${id} has a flow`);
  return answer.resistance(d, { upper: 1, lower: contrast as number });
}

function secondRoute(id: string, values: Values): { value: number; tolerance: number } | null {
  const { answer } = shapeOf(id);
  const { contrast, ...dimensions } = values;
  const d = dimensions as Resolved<Dimensions>;
  if (answer.kind === "factor") return answer.secondRoute?.(d) ?? null;
  if (answer.kind !== "media") throw new Error(`${id} has a flow`);
  return answer.secondRoute?.(d, { upper: 1, lower: contrast as number }) ?? null;
}

/** Every length times a factor, the area times its square. */
function scaled(id: string, values: Values, factor: number): Values {
  const { dimensions } = shapeOf(id);
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => {
      const dimension = dimensions[name];
      if (typeof value !== "number" || dimension?.type !== "quantity") return [name, value];
      return [name, value * (dimension.kind === "area" ? factor * factor : factor)];
    }),
  );
}

const holds = (id: string, values: Values) =>
  shapeOf(id).constraints.every(({ holds: fits }) => fits(values as Resolved<Dimensions>));

/** The layered rod solves a system of many segments each time. */
const runs = (id: string) => (id === "earth-rod-layered" || id === "earth-plate" ? 60 : 400);

describe.each(Object.entries(cases))("%s", (id, arbitrary) => {
  it("is positive and finite, inside its bounds", () => {
    fc.assert(
      fc.property(arbitrary, (values) => {
        fc.pre(holds(id, values));
        const { value, lower, upper, relativeError } = evaluate(id, values);
        expect(Number.isFinite(value) && value > 0).toBe(true);
        expect(relativeError).toBeGreaterThan(0);
        if (lower !== undefined) expect(lower).toBeLessThanOrEqual(value);
        if (upper !== undefined) expect(upper).toBeGreaterThanOrEqual(value);
        if (lower !== undefined) expect(lower).toBeGreaterThan(0.3 * value);
        if (upper !== undefined) expect(upper).toBeLessThan(2.6 * value);
      }),
      { seed: 20240517, numRuns: runs(id) },
    );
  });

  it("agrees with its second route wherever that answers", () => {
    fc.assert(
      fc.property(arbitrary, (values) => {
        fc.pre(holds(id, values));
        const second = secondRoute(id, values);
        if (second === null) return;
        const { value } = evaluate(id, values);
        expect(Math.abs(second.value / value - 1)).toBeLessThanOrEqual(second.tolerance);
      }),
      { seed: 20240518, numRuns: 5 * runs(id) },
    );
  });

  it("scales with the reciprocal of all lengths, by 10^±9", () => {
    fc.assert(
      fc.property(arbitrary, fc.constantFrom(-9, 9), (values, exponent) => {
        fc.pre(holds(id, values));
        const factor = 10 ** exponent;
        const { value } = evaluate(id, values);
        const other = evaluate(id, scaled(id, values, factor)).value;
        expect(Math.abs((other * factor) / value - 1)).toBeLessThan(1e-11);
      }),
      { seed: 20240519, numRuns: runs(id) / 4 },
    );
  });
});

/** The resistance falls when an electrode grows or lies deeper: the sign of each dimension. */
const falling: Readonly<Record<string, readonly string[]>> = {
  "earth-hemisphere": ["diameter"],
  "earth-rod": ["length", "diameter"],
  "earth-rod-pair": ["length", "spacing"],
  "earth-rod-group": ["length", "spacing"],
  "earth-wire": ["length", "depth"],
  "earth-ring": ["ringDiameter", "depth"],
  "earth-plate": ["diameter", "depth"],
  "earth-star": ["armLength", "depth"],
  "earth-grid": ["area", "conductorLength", "depth"],
};

describe.each(Object.entries(falling))("%s", (id, names) => {
  it.each(names)("falls as %s grows", (name) => {
    fc.assert(
      fc.property(cases[id], power(-2, 1), (values, step) => {
        const grown = { ...values, [name]: (values[name] as number) * (1 + step) };
        fc.pre(holds(id, values) && holds(id, grown));
        expect(evaluate(id, grown).value).toBeLessThanOrEqual(evaluate(id, values).value * (1 + 1e-12));
      }),
      { seed: 20240520, numRuns: runs(id) / 2 },
    );
  });
});

/** What a resistance must do: limits, symmetry, scaling, monotonicity, one against the other. */
import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { findShape } from "@/lib/engine";
import { compute, deviation, graded, unitResistance } from "../../support/compute";

const size = fc.double({ min: -4, max: 4, noNaN: true }).map((exponent) => 10 ** exponent);
const random: Readonly<Record<string, fc.Arbitrary<Record<string, number>>>> = {
  bar: fc.record({ length: size, width: size, thickness: size }),
  "round-wire": fc.record({ length: size, diameter: size }),
  tube: fc
    .tuple(size, size, fc.double({ min: 0.001, max: 0.499, noNaN: true }))
    .map(([length, outerDiameter, share]) => ({
      length,
      outerDiameter,
      wall: outerDiameter * share,
    })),
  prism: fc.record({ length: size, area: size }),
  "parallel-plates": fc.record({ gap: size, area: size }),
  "cylindrical-shell": fc.record({
    innerRadius: size,
    wall: size,
    length: size,
    angle: fc.integer({ min: 1, max: 360 }),
  }),
  "spherical-shell": fc.record({
    innerRadius: size,
    wall: size,
    halfAngle: fc.integer({ min: 1, max: 180 }),
  }),
  "arc-bar": fc.record({
    innerRadius: size,
    width: size,
    thickness: size,
    angle: fc.integer({ min: 1, max: 360 }),
  }),
  "cone-frustum": fc.record({ length: size, startDiameter: size, endDiameter: size }),
  "tapered-strip": fc.record({ length: size, startWidth: size, endWidth: size, thickness: size }),
};
const ids = Object.keys(random);

/** R/ρ is a length to the power −1: all lengths times k divide it by k, areas count twice. */
function scaled(id: string, dimensions: Record<string, number>, factor: number): Record<string, number> {
  const shape = findShape(id);
  return Object.fromEntries(
    Object.entries(dimensions).map(([name, value]) => {
      const dimension = shape?.dimensions[name];
      const kind = dimension?.type === "quantity" ? dimension.kind : "number";
      return [name, kind === "length" ? value * factor : kind === "area" ? value * factor * factor : value];
    }),
  );
}

describe.each(ids)("%s", (id) => {
  it("has bounds around its value and passes every check", () => {
    fc.assert(
      fc.property(random[id], (dimensions) => {
        const { resistance, conductance, checks } = unitResistance(id, dimensions);
        expect(resistance.lower).toBeLessThan(resistance.value);
        expect(resistance.value).toBeLessThan(resistance.upper);
        expect(conductance.value).toBe(1 / resistance.value);
        for (const { applies, passed, deviation: off } of checks ?? []) {
          expect(applies).toBe(true);
          expect(passed).toBe(true);
          expect(off).toBeLessThan(1e-8);
        }
      }),
      { seed: 21, numRuns: 60 },
    );
  });

  it("scales as a length to the power −1, by 10^±9", () => {
    fc.assert(
      fc.property(random[id], fc.constantFrom(1e-9, 1e9), (dimensions, factor) => {
        const one = unitResistance(id, dimensions).resistance;
        const other = unitResistance(id, scaled(id, dimensions, factor)).resistance;
        expect(deviation(other.value * factor, one.value)).toBeLessThan(1e-12);
        expect(deviation(other.upper * factor, one.upper)).toBeLessThan(1e-12);
      }),
      { seed: 22, numRuns: 40 },
    );
  });

  it("is proportional to the resistivity", () => {
    fc.assert(
      fc.property(random[id], fc.double({ min: -12, max: 14, noNaN: true }), (dimensions, exponent) => {
        const resistivity = 10 ** exponent;
        const one = unitResistance(id, dimensions).resistance.value;
        const other = compute({ shape: id, dimensions, medium: { resistivity } }).resistance.value;
        expect(deviation(other / resistivity, one)).toBeLessThan(1e-14);
        const inverse = compute({ shape: id, dimensions, medium: { conductivity: 1 / resistivity } });
        expect(deviation(inverse.resistance.value, other)).toBeLessThan(1e-14);
      }),
      { seed: 23, numRuns: 40 },
    );
  });

  it("gives the same for a constant profile along every coordinate", () => {
    const coordinates = findShape(id)?.coordinates ?? [];
    fc.assert(
      fc.property(random[id], fc.constantFrom(...coordinates), (dimensions, { name }) => {
        const closed = unitResistance(id, dimensions).resistance;
        const profile = { kind: "constant", value: 1 };
        const { resistance } = graded(id, dimensions, name, "conductivity", profile);
        expect(deviation(resistance.lower, closed.lower)).toBeLessThan(1e-10);
        expect(deviation(resistance.value, closed.value)).toBeLessThan(1e-10);
        expect(deviation(resistance.upper, closed.upper)).toBeLessThan(1e-10);
      }),
      { seed: 24, numRuns: 60 },
    );
  });

  it("never falls where the resistivity rises somewhere", () => {
    const coordinates = findShape(id)?.coordinates ?? [];
    const values = fc.array(fc.double({ min: 0.1, max: 10, noNaN: true }), { minLength: 5, maxLength: 5 });
    const form = fc.constantFrom(...coordinates);
    fc.assert(
      fc.property(
        random[id],
        form,
        values,
        fc.integer({ min: 0, max: 4 }),
        (dimensions, { name }, before, at) => {
          const after = before.map((value, i) => (i === at ? value * 1.5 : value));
          const step = (list: readonly number[]): string =>
            list.reduceRight(
              (rest, value, i) => (rest === "" ? `${value}` : `if(u<${(i + 1) / 5},${value},${rest})`),
              "",
            );
          const low = graded(id, dimensions, name, "resistivity", {
            kind: "expression",
            value: step(before),
          });
          const high = graded(id, dimensions, name, "resistivity", {
            kind: "expression",
            value: step(after),
          });
          expect(high.resistance.value).toBeGreaterThan(low.resistance.value);
        },
      ),
      { seed: 25, numRuns: 30 },
    );
  });
});

describe("limits", () => {
  const bar = (length: number, width: number, thickness: number): number =>
    unitResistance("bar", { length, width, thickness }).resistance.value;

  it("a thin cylindrical shell is a flat plate: its relative excess is −t/2a", () => {
    const shell = unitResistance("cylindrical-shell", { innerRadius: 1, wall: 1e-6, length: 1 }).resistance
      .value;
    const plate = unitResistance("parallel-plates", { gap: 1e-6, area: 2 * Math.PI }).resistance.value;
    expect(shell / plate - 1).toBeCloseTo(-0.5e-6, 11);
  });

  it("a thin spherical shell is a flat plate", () => {
    const shell = unitResistance("spherical-shell", { innerRadius: 1, wall: 1e-7 }).resistance.value;
    const plate = unitResistance("parallel-plates", { gap: 1e-7, area: 4 * Math.PI }).resistance.value;
    expect(shell / plate - 1).toBeCloseTo(-1e-7, 12);
  });

  it("a large spherical shell is ρ/(4πa) to infinity", () => {
    const shell = unitResistance("spherical-shell", { innerRadius: 1, wall: 1e12 }).resistance.value;
    expect(deviation(shell, 1 / (4 * Math.PI))).toBeLessThan(2e-12);
  });

  it("a gently bent bar is a straight one of its mean length", () => {
    const bent = unitResistance("arc-bar", { innerRadius: 1000, width: 0.01, thickness: 0.002, angle: 1 });
    const straight = bar(((1000.005 * Math.PI) / 180) as number, 0.01, 0.002);
    expect(deviation(bent.resistance.value, straight)).toBeLessThan(1e-11);
  });

  it("a taper without taper is a bar, a cone without taper a wire; the bracket closes", () => {
    const strip = unitResistance("tapered-strip", {
      length: 2,
      startWidth: 0.1,
      endWidth: 0.1,
      thickness: 0.01,
    }).resistance;
    expect(deviation(strip.value, bar(2, 0.1, 0.01))).toBeLessThan(1e-15);
    expect(strip.upper / strip.lower - 1).toBeLessThan(3e-13);
    const cone = unitResistance("cone-frustum", {
      length: 2,
      startDiameter: 0.1,
      endDiameter: 0.1,
    }).resistance;
    const wire = unitResistance("round-wire", { length: 2, diameter: 0.1 }).resistance.value;
    expect(deviation(cone.value, wire)).toBeLessThan(1e-15);
  });

  it("a tube whose wall reaches its axis is a wire", () => {
    const tube = unitResistance("tube", { length: 1, outerDiameter: 1, wall: 0.5 * (1 - 1e-9) }).resistance
      .value;
    const wire = unitResistance("round-wire", { length: 1, diameter: 1 }).resistance.value;
    expect(deviation(tube, wire)).toBeLessThan(1e-15);
  });
});

describe("symmetry", () => {
  it("width and thickness of a bar change places", () => {
    const one = unitResistance("bar", { length: 1, width: 0.3, thickness: 0.007 }).resistance.value;
    const other = unitResistance("bar", { length: 1, width: 0.007, thickness: 0.3 }).resistance.value;
    expect(deviation(one, other)).toBeLessThan(1e-15);
  });

  it("the ends of a taper change places", () => {
    const strip = (startWidth: number, endWidth: number): number =>
      unitResistance("tapered-strip", { length: 1, startWidth, endWidth, thickness: 0.01 }).resistance.value;
    expect(strip(0.1, 0.4)).toBe(strip(0.4, 0.1));
    const cone = (startDiameter: number, endDiameter: number): number =>
      unitResistance("cone-frustum", { length: 1, startDiameter, endDiameter }).resistance.value;
    expect(deviation(cone(0.1, 0.4), cone(0.4, 0.1))).toBeLessThan(1e-15);
  });

  it("a mirrored profile gives the same", () => {
    const dimensions = { length: 1, width: 0.1, thickness: 0.1 };
    const up = graded("bar", dimensions, "length", "resistivity", { kind: "exponential", from: 1, to: 50 });
    const down = graded("bar", dimensions, "length", "resistivity", { kind: "exponential", from: 50, to: 1 });
    expect(deviation(up.resistance.value, down.resistance.value)).toBeLessThan(1e-14);
  });

  it("two sectors in parallel are the whole shell", () => {
    const shell = (angle: number): number =>
      unitResistance("cylindrical-shell", { innerRadius: 0.01, outerRadius: 0.03, length: 1, angle })
        .resistance.value;
    expect(deviation(1 / (1 / shell(100) + 1 / shell(260)), shell(360))).toBeLessThan(1e-15);
  });

  it("two shells in series are the whole", () => {
    const shell = (innerRadius: number, wall: number): number =>
      unitResistance("spherical-shell", { innerRadius, wall }).resistance.value;
    expect(deviation(shell(0.01, 0.02) + shell(0.03, 0.05), shell(0.01, 0.07))).toBeLessThan(1e-14);
  });
});

describe("diameters and radii, walls and outer radii", () => {
  it("say the same", () => {
    const ohms = (dimensions: Record<string, number | string>): number =>
      unitResistance("cylindrical-shell", { length: 1, ...dimensions }).resistance.value;
    const expected = ohms({ innerRadius: "2 mm", outerRadius: "5 mm" });
    expect(ohms({ innerDiameter: "4 mm", outerDiameter: "10 mm" })).toBe(expected);
    expect(deviation(ohms({ innerRadius: "2 mm", wall: "3 mm" }), expected)).toBeLessThan(1e-15);
    const wire = unitResistance("round-wire", { length: 1, radius: "1 mm" }).resistance.value;
    expect(wire).toBe(unitResistance("round-wire", { length: 1, diameter: "2 mm" }).resistance.value);
  });
});

describe("what a double cannot hold", () => {
  it("is refused with a sentence, not answered with 0 or infinity", () => {
    const request = (length: number, width: number) => ({
      shape: "bar",
      dimensions: { length, width, thickness: width },
      medium: { resistivity: 1e90 },
    });
    expect(() => compute(request(1e90, 1e-90))).toThrow(/too large/);
    expect(() => compute({ ...request(1e-90, 1e99), medium: { resistivity: 1e-90 } })).toThrow(/too small/);
  });
});

/**
 * Radial, spreading and sheet shapes with random dimensions over many decades: positive and finite, the engine's own
 * checks pass, the scale drops out as it must, and the resistance moves the way it has to with each dimension.
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { findShape } from "@/lib/engine/shape/catalogue";
import { compute } from "../../support/compute";
import { factor, type Given } from "../../support/shape-law";

const SEED = 20260713;
const RUNS = 60;

/** A number over `decades` decades, centred on 1. */
const size = (decades: number) =>
  fc.double({ min: -decades / 2, max: decades / 2, noNaN: true }).map((e) => 10 ** e);
/** A part of 1, over many decades near 0 and near 1. */
const part = fc.oneof(
  fc.double({ min: -12, max: -0.3, noNaN: true }).map((e) => 10 ** e),
  fc.double({ min: -10, max: -0.3, noNaN: true }).map((e) => 1 - 10 ** e),
);
const angle = fc.double({ min: -6, max: Math.log10(360), noNaN: true }).map((e) => 10 ** e);
const sides = fc.constantFrom(1, 2);

interface Case {
  readonly id: string;
  readonly dimensions: fc.Arbitrary<Record<string, number | string>>;
  /** Lengths, which scale together; R goes like scale^power. */
  readonly lengths: readonly string[];
  readonly power: number;
  /** Dimensions that raise or lower R when they alone grow a little; `null` where growing may leave the domain. */
  readonly rises: readonly string[];
  readonly falls: readonly string[];
}

const cases: readonly Case[] = [
  {
    id: "confocal-shell",
    dimensions: fc
      .record({ innerMajor: size(6), flatness: part, wall: size(16), length: size(6) })
      .map(({ innerMajor, flatness, wall, length }) => ({
        innerMajor,
        innerMinor: innerMajor * flatness,
        wall,
        length,
      })),
    lengths: ["innerMajor", "innerMinor", "wall", "length"],
    power: -1,
    rises: ["wall"],
    falls: ["length"],
  },
  {
    id: "conical-shell",
    dimensions: fc
      .record({ innerRadius: size(6), wall: size(16), outerHalfAngle: angle.map((a) => a / 2), inner: part })
      .map(({ inner, ...rest }) => ({ ...rest, innerHalfAngle: inner * rest.outerHalfAngle })),
    lengths: ["innerRadius", "wall"],
    power: -1,
    rises: ["wall"],
    falls: [],
  },
  {
    id: "bent-tube",
    dimensions: fc
      .record({ bendRadius: size(6), section: part, thin: part, angle })
      .map(({ bendRadius, section, thin, angle: bend }) => ({
        bendRadius,
        outerDiameter: 2 * bendRadius * section,
        wall: bendRadius * section * thin,
        angle: bend,
      })),
    lengths: ["bendRadius", "outerDiameter", "wall"],
    power: -1,
    rises: ["bendRadius"],
    falls: [],
  },
  {
    id: "torus-arc",
    dimensions: fc
      .record({ bendRadius: size(6), section: part, angle })
      .map(({ bendRadius, section, angle: bend }) => ({
        bendRadius,
        diameter: 2 * bendRadius * section,
        angle: bend,
      })),
    lengths: ["bendRadius", "diameter"],
    power: -1,
    rises: ["bendRadius"],
    falls: [],
  },
  {
    id: "hyperbolic-neck",
    dimensions: fc.record({
      throatRadius: size(8),
      openingAngle: angle.map((a) => a / 4),
      length: size(12),
      sides,
    }),
    lengths: ["throatRadius", "length"],
    power: -1,
    rises: ["length"],
    falls: [],
  },
  {
    id: "cylinder-in-square",
    dimensions: fc
      .record({ side: size(6), filling: part, length: size(6) })
      .map(({ side, filling, length }) => ({ side, diameter: side * filling, length })),
    lengths: ["side", "diameter", "length"],
    power: -1,
    rises: ["side"],
    falls: ["length"],
  },
  {
    id: "eccentric-cylinders",
    dimensions: fc
      .record({ outerRadius: size(6), inner: part, near: part, length: size(6) })
      .map(({ outerRadius, inner, near, length }) => {
        const innerRadius = outerRadius * inner;
        return { outerRadius, innerRadius, gap: (outerRadius - innerRadius) * near, length };
      }),
    lengths: ["outerRadius", "innerRadius", "gap", "length"],
    power: -1,
    rises: [],
    falls: ["length"],
  },
  {
    id: "parallel-cylinders",
    dimensions: fc.record({ diameter1: size(8), diameter2: size(8), gap: size(24), length: size(6) }),
    lengths: ["diameter1", "diameter2", "gap", "length"],
    power: -1,
    rises: ["gap"],
    falls: ["length"],
  },
  {
    id: "cylinder-plane",
    dimensions: fc.record({ diameter: size(8), gap: size(24), length: size(6) }),
    lengths: ["diameter", "gap", "length"],
    power: -1,
    rises: ["gap"],
    falls: ["length"],
  },
  {
    id: "sphere-plane",
    dimensions: fc.record({ diameter: size(8), gap: size(24) }),
    lengths: ["diameter", "gap"],
    power: -1,
    rises: ["gap"],
    falls: [],
  },
  {
    id: "sphere-buried",
    dimensions: fc.record({ diameter: size(8), cover: size(24) }),
    lengths: ["diameter", "cover"],
    power: -1,
    rises: [],
    falls: ["cover"],
  },
  {
    id: "sphere-pair",
    dimensions: fc.record({ diameter1: size(8), diameter2: size(8), gap: size(24) }),
    lengths: ["diameter1", "diameter2", "gap"],
    power: -1,
    rises: ["gap"],
    falls: [],
  },
  {
    id: "spheroid",
    dimensions: fc.record({
      polarDiameter: size(16),
      equatorialDiameter: size(16),
      space: fc.constantFrom("full", "half"),
    }),
    lengths: ["polarDiameter", "equatorialDiameter"],
    power: -1,
    rises: [],
    falls: ["polarDiameter", "equatorialDiameter"],
  },
  {
    id: "contact-spot",
    dimensions: fc.record({ spotDiameter: size(16), sides }),
    lengths: ["spotDiameter"],
    power: -1,
    rises: [],
    falls: ["spotDiameter"],
  },
  {
    id: "elliptic-contact-spot",
    dimensions: fc
      .record({ majorDiameter: size(8), flatness: part, sides })
      .map(({ majorDiameter, flatness, sides: n }) => ({
        majorDiameter,
        minorDiameter: majorDiameter * flatness,
        sides: n,
      })),
    lengths: ["majorDiameter", "minorDiameter"],
    power: -1,
    rises: [],
    falls: ["majorDiameter"],
  },
  {
    id: "spot-in-cylinder",
    dimensions: fc
      .record({ cylinderDiameter: size(8), filling: part, sides })
      .map(({ cylinderDiameter, filling, sides: n }) => ({
        cylinderDiameter,
        spotDiameter: cylinderDiameter * filling,
        sides: n,
      })),
    lengths: ["cylinderDiameter", "spotDiameter"],
    power: -1,
    rises: ["cylinderDiameter"],
    falls: [],
  },
  {
    id: "sheet-strip",
    dimensions: fc.record({ length: size(16), width: size(16) }),
    lengths: ["length", "width"],
    power: 0,
    rises: ["length"],
    falls: ["width"],
  },
  {
    id: "sheet-bend",
    dimensions: fc.record({ legLength1: size(10), legLength2: size(10), width1: size(8), width2: size(8) }),
    lengths: ["legLength1", "legLength2", "width1", "width2"],
    power: 0,
    rises: ["legLength1", "legLength2"],
    falls: [],
  },
  {
    id: "sheet-step",
    dimensions: fc.record({
      length1: size(10),
      length2: size(10),
      width1: size(8),
      width2: size(8),
      alignment: fc.constantFrom("edge", "centre"),
    }),
    lengths: ["length1", "length2", "width1", "width2"],
    power: 0,
    rises: ["length1", "length2"],
    falls: [],
  },
  {
    id: "sheet-meander",
    dimensions: fc.record({
      legs: fc.integer({ min: 1, max: 1000 }),
      legLength: size(10),
      width: size(8),
      gap: size(10),
    }),
    lengths: ["legLength", "width", "gap"],
    power: 0,
    rises: ["legLength"],
    falls: [],
  },
  {
    id: "sheet-end-terminal",
    dimensions: fc
      .record({
        length: size(16),
        width: size(8),
        covered: part,
        position: fc.constantFrom("edge", "centre"),
      })
      .map(({ length, width, covered, position }) => ({
        length,
        width,
        terminalWidth: width * covered,
        position,
      })),
    lengths: ["length", "width", "terminalWidth"],
    power: 0,
    rises: ["length"],
    falls: [],
  },
  {
    id: "sheet-tee",
    dimensions: fc.record({
      barWidth: size(8),
      stubWidth: size(8),
      leftLength: size(10),
      rightLength: size(10),
      stubLength: size(10),
      path: fc.constantFrom("through", "branch", "both"),
    }),
    lengths: ["barWidth", "stubWidth", "leftLength", "rightLength", "stubLength"],
    power: 0,
    rises: ["leftLength"],
    falls: [],
  },
  {
    id: "sheet-slit",
    dimensions: fc
      .record({
        length: size(16),
        width: size(8),
        open: part,
        kind: fc.constantFrom("edge", "centre", "iris"),
      })
      .map(({ length, width, open, kind }) => ({ length, width, opening: width * open, kind })),
    lengths: ["length", "width", "opening"],
    power: 0,
    rises: ["length"],
    falls: [],
  },
  {
    id: "sheet-disc",
    dimensions: fc
      .record({ diameter: size(8), together: part, first: part })
      .map(({ diameter, together, first }) => ({
        diameter,
        terminalAngle1: 359.999 * together * first,
        terminalAngle2: 359.999 * together * (1 - first),
      })),
    lengths: ["diameter"],
    power: 0,
    rises: [],
    falls: [],
  },
];

const scaled = (given: Given, names: readonly string[], by: number): Record<string, number | string> =>
  Object.fromEntries(
    Object.entries(given).map(([name, value]) => [
      name,
      names.includes(name) && typeof value === "number" ? value * by : value,
    ]),
  );

describe.each(cases)("$id", ({ id, dimensions, lengths, power, rises, falls }) => {
  const medium = findShape(id)?.family === "sheet" ? { sheetResistance: 1 } : { resistivity: 1 };

  it("is positive and finite within its bounds, and passes the engine's checks", () => {
    fc.assert(
      fc.property(dimensions, (given) => {
        const result = compute({
          shape: id,
          dimensions: given,
          medium,
          include: ["checks", "peak", "profile", "steps"],
        });
        const { value, lower, upper } = result.resistance;
        expect(Number.isFinite(upper)).toBe(true);
        expect(lower).toBeGreaterThan(0);
        expect(lower).toBeLessThan(value);
        expect(upper).toBeGreaterThan(value);
        const field = result.peak?.field.value ?? 1;
        expect(Number.isFinite(field) && field > 0).toBe(true);
        expect(JSON.stringify(result.profile ?? {})).not.toContain("null");
      }),
      { seed: SEED, numRuns: RUNS },
    );
  });

  it("scales with its size", () => {
    fc.assert(
      fc.property(dimensions, fc.constantFrom(1e-9, 1e9, 3), (given, by) => {
        const ratio = factor(id, scaled(given, lengths, by)).value / factor(id, given).value;
        // Scaling by a decimal rounds each length; nearly equal ones remember it.
        expect(Math.abs(ratio / by ** power - 1)).toBeLessThan(2e-5);
      }),
      { seed: SEED, numRuns: RUNS },
    );
    fc.assert(
      fc.property(dimensions, fc.integer({ min: -40, max: 40 }), (given, exponent) => {
        const by = 2 ** exponent;
        const ratio = factor(id, scaled(given, lengths, by)).value / factor(id, given).value;
        expect(Math.abs(ratio / by ** power - 1)).toBeLessThan(3e-15);
      }),
      { seed: SEED, numRuns: RUNS },
    );
  });

  it("moves the right way with its dimensions", () => {
    fc.assert(
      fc.property(dimensions, fc.double({ min: 1.001, max: 10, noNaN: true }), (given, by) => {
        const before = factor(id, given).value;
        for (const name of rises) {
          const after = factor(id, scaled(given, [name], by)).value;
          expect(after, `${name} ×${by}`).toBeGreaterThanOrEqual(before * (1 - 1e-14));
        }
        for (const name of falls) {
          const after = factor(id, scaled(given, [name], by)).value;
          expect(after, `${name} ×${by}`).toBeLessThanOrEqual(before * (1 + 1e-14));
        }
      }),
      { seed: SEED, numRuns: RUNS },
    );
  });
});

describe("symmetry", () => {
  it("exchanging the two electrodes changes nothing", () => {
    fc.assert(
      fc.property(size(8), size(8), size(24), (a, b, gap) => {
        for (const id of ["sphere-pair", "parallel-cylinders"]) {
          const more: Record<string, number> = id === "parallel-cylinders" ? { length: 1 } : {};
          const one = factor(id, { diameter1: a, diameter2: b, gap, ...more }).value;
          const other = factor(id, { diameter1: b, diameter2: a, gap, ...more }).value;
          expect(Math.abs(one / other - 1)).toBeLessThan(3e-15);
        }
      }),
      { seed: SEED },
    );
  });

  it("the arms of a T junction may be exchanged", () => {
    fc.assert(
      fc.property(
        size(6),
        size(6),
        size(6),
        size(6),
        fc.constantFrom("through", "both"),
        (w, l, r, s, path) => {
          const tee = (leftLength: number, rightLength: number) =>
            factor("sheet-tee", { barWidth: 1, stubWidth: w, leftLength, rightLength, stubLength: s, path });
          const [one, other] = [tee(l, r), tee(r, l)];
          expect(Math.abs(one.value / other.value - 1)).toBeLessThan(3e-15);
          expect(Math.abs((one.lower ?? 1) / (other.lower ?? 1) - 1)).toBeLessThan(1e-9);
        },
      ),
      { seed: SEED },
    );
  });
});

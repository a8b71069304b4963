/** Whatever arrives is refused or answered: no other exception, no NaN, no hang. */
import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { CheckFailure, computeResistance, InputError, libraryMaterial } from "@/lib/engine";

const good = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
};
const bar = { shape: "bar", dimensions: { length: 1, width: 0.01, thickness: 0.001 } };
const inBar = (graded: Record<string, unknown>): Record<string, unknown> => ({ ...bar, medium: { graded } });
describe("whatever arrives", () => {
  const anything = fc.anything({ maxDepth: 3, withBigInt: true, withDate: true, withNullPrototype: true });
  const context = { material: libraryMaterial };

  function mustRefuseOrAnswer(request: unknown): void {
    try {
      const { resistance } = computeResistance(request, context);
      expect(resistance.lower).toBeLessThan(resistance.upper);
      expect(Number.isFinite(resistance.value)).toBe(true);
    } catch (error) {
      expect(error).toBeInstanceOf(InputError);
      expect(error).not.toBeInstanceOf(CheckFailure);
      for (const { pointer, detail } of (error as InputError).errors) {
        expect(pointer.startsWith("#")).toBe(true);
        expect(detail.length).toBeGreaterThan(5);
      }
    }
  }

  it("random bodies are refused", () => {
    fc.assert(fc.property(anything, mustRefuseOrAnswer), { seed: 11, numRuns: 500 });
  });

  it("random members in a good body are refused or answered", () => {
    const path = fc.constantFrom(
      "shape",
      "dimensions",
      "medium",
      "operating",
      "include",
      "requirement",
      "record",
      "media",
    );
    fc.assert(
      fc.property(path, anything, (name, value) => mustRefuseOrAnswer({ ...good, [name]: value })),
      { seed: 12, numRuns: 500 },
    );
  });

  it("random profiles are refused or answered", () => {
    const number = fc.oneof(
      fc.double({ noNaN: false }),
      fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
      fc.constantFrom<unknown>(0, -1, "1 mm", "5 kg", null, 1e300),
    );
    const kind = fc.constantFrom(
      "constant",
      "linear",
      "exponential",
      "power",
      "gaussian",
      "complementary-error",
      "table",
      "dopant",
    );
    const profile = fc.record(
      {
        kind,
        value: number,
        from: fc.oneof(number, fc.constantFrom("start", "end")),
        to: number,
        reference: number,
        at: number,
        exponent: number,
        peak: number,
        center: number,
        spread: number,
        surface: number,
        length: number,
        background: number,
        positions: fc.array(number, { maxLength: 5 }),
        values: fc.array(number, { maxLength: 5 }),
        type: fc.constantFrom("n", "p"),
        profile: fc.record({ kind: fc.constant("constant"), value: number }),
      },
      { requiredKeys: ["kind"] },
    );
    const members: Record<string, readonly string[]> = {
      constant: ["value"],
      linear: ["from", "to"],
      exponential: ["from", "to"],
      power: ["reference", "at", "exponent"],
      gaussian: ["peak", "center", "spread", "background"],
      "complementary-error": ["surface", "length", "background", "from"],
      table: ["positions", "values"],
      dopant: ["type", "profile"],
    };
    fc.assert(
      fc.property(profile, fc.constantFrom("length", "thickness"), (raw, coordinate) => {
        const source = raw as Record<string, unknown>;
        const kept = Object.fromEntries(["kind", ...members[raw.kind]].map((name) => [name, source[name]]));
        mustRefuseOrAnswer(inBar({ coordinate, quantity: "conductivity", profile: kept }));
      }),
      { seed: 13, numRuns: 600 },
    );
  });
});

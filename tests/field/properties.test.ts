import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { solveField, type BoundedValue } from "@/lib/engine/field/solve-field";
import { conductanceOf, conjugate, randomOutline, type RandomOutline } from "./random-outlines";
import { accept, check } from "./support/outlines";

const ACCURACY = 1e-4;

/** The resistance between the first two terminals (others floating), or null for an outline that is refused. */
function resistanceOf(random: RandomOutline, accuracy = ACCURACY): BoundedValue | null {
  if (random.terminals.some((parts) => parts.length === 0)) return null;
  const checked = check(
    {
      unit: "m",
      outer: random.outer,
      holes: random.holes,
      symmetry: random.axisymmetric ? "axisymmetric" : "plan",
    },
    random.terminals.map((parts, k) => ({ name: `t${k}`, parts })),
    random.regions,
  );
  if (!checked.ok) return null;
  const solution = solveField(
    { outline: checked.outline, conductance: conductanceOf(random) },
    { accuracy, maximumUnknowns: 40_000 },
  );
  expect(solution.checks.filter((c) => !c.passed)).toEqual([]);
  return solution.resistance ?? solution.pairs?.[0].floating ?? null;
}

const seeds = fc.integer({ min: 1, max: 1_000_000 });
const settings = { seed: 20_240_501, numRuns: 40, endOnFailure: true };

describe("random outlines", () => {
  it("swapping terminals and insulation gives the reciprocal (holes become floating terminals)", () => {
    let tried = 0;
    fc.assert(
      fc.property(seeds, (seed) => {
        const random = randomOutline(seed, { conjugable: true });
        const own = resistanceOf(random);
        const swapped = own && resistanceOf(conjugate(random));
        if (!own || !swapped) return;
        tried++;
        expect(own.lower * swapped.lower).toBeLessThanOrEqual(1 + 1e-14);
        expect(own.upper * swapped.upper).toBeGreaterThanOrEqual(1 - 1e-14);
      }),
      settings,
    );
    expect(tried).toBeGreaterThan(10);
  });

  it("brackets of different accuracies overlap, whatever the terminals", () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const random = randomOutline(seed);
        const coarse = resistanceOf(random, 1e-2);
        const fine = coarse && resistanceOf(random, 1e-4);
        if (!coarse || !fine) return;
        expect(coarse.lower).toBeLessThanOrEqual(fine.upper);
        expect(fine.lower).toBeLessThanOrEqual(coarse.upper);
      }),
      settings,
    );
  });

  it("a hole never lowers the resistance", () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const random = randomOutline(seed, { conjugable: true });
        if (random.holes.length === 0) return;
        const plain = { ...random, regions: [], conductance: [1] };
        const holed = resistanceOf(plain);
        const whole = holed && resistanceOf({ ...plain, holes: [] });
        if (!holed || !whole) return;
        expect(holed.upper).toBeGreaterThanOrEqual(whole.lower);
      }),
      settings,
    );
  });

  it("rotation, mirror image, scale and renumbering do not matter", () => {
    fc.assert(
      fc.property(
        seeds,
        fc.double({ min: 0, max: 6.28, noNaN: true }),
        fc.integer({ min: -9, max: 9 }),
        (seed, turn, size) => {
          const random = { ...randomOutline(seed, { conjugable: true }), slope: null };
          const own = resistanceOf(random, 1e-3);
          if (!own) return;
          const scale = 10 ** size;
          const moved =
            (mirror: boolean) =>
            (ring: [number, number][]): [number, number][] =>
              ring.map(([x, y]) => {
                const z = mirror ? -y : y;
                return [
                  scale * (x * Math.cos(turn) - z * Math.sin(turn)),
                  scale * (x * Math.sin(turn) + z * Math.cos(turn)),
                ];
              });
          for (const map of [moved(false), moved(true)]) {
            const image = resistanceOf(
              {
                ...random,
                outer: map(random.outer),
                holes: random.holes.map(map),
                regions: random.regions.map(map),
              },
              1e-3,
            );
            // Turning rounds the coordinates: an outline that only just passed may fail then.
            if (!image) continue;
            expect(image.lower).toBeLessThanOrEqual(own.upper * (1 + 1e-9));
            expect(image.upper).toBeGreaterThanOrEqual(own.lower * (1 - 1e-9));
          }
          const n = random.outer.length;
          const shift = 1 + (seed % (n - 1 || 1));
          const renumbered = resistanceOf(
            {
              ...random,
              outer: [...random.outer.slice(shift), ...random.outer.slice(0, shift)],
              terminals: random.terminals.map((parts) =>
                parts.map((part) => ({ ...part, edge: (part.edge - shift + n) % n })),
              ),
            },
            1e-3,
          );
          if (!renumbered) throw new Error("refused after renumbering");
          expect(renumbered.lower).toBeLessThanOrEqual(own.upper);
          expect(renumbered.upper).toBeGreaterThanOrEqual(own.lower);
        },
      ),
      { ...settings, numRuns: 20 },
    );
  });
});

describe("joined outlines", () => {
  it("that share an equipotential add up", () => {
    // Two mirror-symmetric tapers with straight ends, joined at an end where a terminal would sit.
    const outline = (outer: [number, number][], a: [number, number][], b: [number, number][]) =>
      accept({ unit: "mm", outer, holes: [] }, [
        { name: "a", segments: [[a[0], a[1]]] },
        { name: "b", segments: [[b[0], b[1]]] },
      ]);
    const solve = (o: ReturnType<typeof outline>): BoundedValue => {
      const { resistance } = solveField({ outline: o, conductance: [1] }, { accuracy: 1e-6 });
      if (!resistance) throw new Error("no resistance");
      return resistance;
    };
    const half = solve(
      outline(
        [
          [0, 0],
          [3, 0],
          [3, 2],
          [2, 2.5],
          [0, 1],
        ],
        [
          [0, 0],
          [0, 1],
        ],
        [
          [3, 0],
          [3, 2],
        ],
      ),
    );
    const both = solve(
      outline(
        [
          [0, 0],
          [6, 0],
          [6, 1],
          [4, 2.5],
          [3, 2],
          [2, 2.5],
          [0, 1],
        ],
        [
          [0, 0],
          [0, 1],
        ],
        [
          [6, 0],
          [6, 1],
        ],
      ),
    );
    expect(both.lower).toBeLessThanOrEqual(2 * half.upper);
    expect(both.upper).toBeGreaterThanOrEqual(2 * half.lower);
  });

  it("an offset of a million widths does not matter", () => {
    const at = (offset: number): BoundedValue => {
      const move = (ring: [number, number][]): [number, number][] =>
        ring.map(([x, y]) => [x + offset, y - 2 * offset]);
      const outer = move([
        [0, 0],
        [4, 0],
        [4, 1],
        [1, 1],
        [1, 4],
        [0, 4],
      ]);
      const o = accept({ unit: "mm", outer, holes: [] }, [
        { name: "a", parts: [{ ring: 0, edge: 1 }] },
        { name: "b", parts: [{ ring: 0, edge: 4 }] },
      ]);
      const { resistance } = solveField({ outline: o, conductance: [1] }, { accuracy: 1e-6 });
      if (!resistance) throw new Error("no resistance");
      return resistance;
    };
    const here = at(0);
    for (const offset of [1e3, 1e6, -4e6]) {
      const there = at(offset);
      expect(there.lower).toBeLessThanOrEqual(here.upper);
      expect(there.upper).toBeGreaterThanOrEqual(here.lower);
    }
  });
});

import { describe, expect, it } from "vitest";
import { solveField, type SheetConductance } from "@/lib/engine/field/solve-field";
import { expectBracketed, rectangle, reference, type Sheet } from "./support/exact-sheets";
import { accept } from "./support/outlines";

describe("arcs", () => {
  /** A sector of an annulus; terminals on the arcs (radial) or on the straight ends. */
  function sector(a: number, w: number, phi: number, radial: boolean, conductance: SheetConductance = 1) {
    const at = (r: number, t: number): [number, number] => [r * Math.cos(t), r * Math.sin(t)];
    const b = a + w;
    const outline = accept(
      {
        unit: "m",
        outer: [
          at(a, 0),
          at(b, 0),
          { arcTo: at(b, phi), center: [0, 0] },
          at(a, phi),
          { arcTo: at(a, 0), center: [0, 0], clockwise: true },
        ],
      },
      radial
        ? [
            { name: "a", parts: [{ ring: 0, edge: 1 }] },
            { name: "b", parts: [{ ring: 0, edge: 3 }] },
          ]
        : [
            { name: "a", parts: [{ ring: 0, edge: 0 }] },
            { name: "b", parts: [{ ring: 0, edge: 2 }] },
          ],
    );
    return { outline, conductance: [conductance] };
  }

  it("F-annulusradial and F-annulusazimuthal", () => {
    for (const [id, radial] of [
      ["F-annulusradial-1", true],
      ["F-annulusazimuthal-1", false],
    ] as const) {
      const { value, inputs } = reference(id);
      for (const accuracy of [1e-3, 1e-5]) {
        const solution = solveField(sector(inputs.a, inputs.w, inputs.phi, radial), { accuracy });
        if (!solution.resistance) throw new Error("no resistance");
        expect(solution.status).toBe("done");
        expect(solution.resistance.lower).toBeLessThanOrEqual(value);
        expect(solution.resistance.upper).toBeGreaterThanOrEqual(value);
      }
    }
  });

  it("keeps a close bracket where a cap leaves no unknowns between the chords that were asked for", () => {
    const circle = (r: number) =>
      [-r, r].map((x) => ({ arcTo: [x, 0] as [number, number], center: [0, 0] as [number, number] }));
    const outline = accept({ unit: "mm", outer: circle(20), holes: [circle(5)] }, [
      {
        name: "in",
        parts: [
          { ring: 1, edge: 0 },
          { ring: 1, edge: 1 },
        ],
      },
      {
        name: "out",
        parts: [
          { ring: 0, edge: 0 },
          { ring: 0, edge: 1 },
        ],
      },
    ]);
    const { status, limit, resistance } = solveField(
      { outline, conductance: [1] },
      { accuracy: 1e-6, maximumUnknowns: 20_000 },
    );
    if (!resistance) throw new Error("no resistance");
    // ln(b/a)/2π of a ring between its two circles.
    const exact = Math.log(4) / (2 * Math.PI);
    expect([status, limit]).toEqual(["limited", "unknowns"]);
    expect(resistance.lower).toBeLessThanOrEqual(exact);
    expect(resistance.upper).toBeGreaterThanOrEqual(exact);
    expect((resistance.upper - resistance.lower) / exact).toBeLessThan(1e-4);
  });

  it("G-sep-polar: graded, radial flow", () => {
    const { value, inputs } = reference("G-sep-polar-1");
    const { a, w, phi, n, k } = inputs;
    const conductance = (x: number, y: number): number =>
      (Math.hypot(x, y) / a) ** n * Math.exp(k * Math.atan2(y, x));
    const solution = solveField(sector(a, w, phi, true, conductance), { accuracy: 1e-4 });
    if (!solution.resistance) throw new Error("no resistance");
    expect(solution.resistance.lower).toBeLessThanOrEqual(value);
    expect(solution.resistance.upper).toBeGreaterThanOrEqual(value);
  });

  it("F-sqhole: a square with a round hole", () => {
    const { value, inputs } = reference("F-sqhole-1");
    const { a } = inputs;
    const sheet: Sheet = {
      outer: rectangle(1, 1),
      holes: [
        [
          { arcTo: [0.5 - a, 0.5], center: [0.5, 0.5] },
          { arcTo: [0.5 + a, 0.5], center: [0.5, 0.5] },
        ],
      ],
      a: [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      b: [
        [
          [1, 0],
          [1, 1],
        ],
      ],
    };
    expectBracketed(sheet, value, [1e-3, 1e-5]);
  });

  it("F-notch: a semicircular notch in a long strip", () => {
    const { value, inputs } = reference("F-notch-1");
    const { a2 } = inputs;
    const sheet: Sheet = {
      outer: [
        [0, 0],
        [10, 0],
        [10, 1],
        [5 + a2, 1],
        { arcTo: [5 - a2, 1], center: [5, 1], clockwise: true },
        [0, 1],
      ],
      a: [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      b: [
        [
          [10, 0],
          [10, 1],
        ],
      ],
    };
    expectBracketed(sheet, 10 + value, [1e-4, 1e-6], 1e-9, 1e-9);
  });

  it("F-discarcs: a disc with two arcs of its rim as terminals", () => {
    const { value, inputs } = reference("F-discarcs-1");
    const at = (t: number): [number, number] => [Math.cos(t), Math.sin(t)];
    const { t1, t2, t3, t4 } = inputs;
    const outline = accept(
      {
        unit: "m",
        outer: [t1, t2, t3, t4].map((t) => ({ arcTo: at(t), center: [0, 0] as [number, number] })),
      },
      [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 2 }] },
      ],
    );
    for (const accuracy of [1e-3, 1e-5]) {
      const solution = solveField({ outline, conductance: [1] }, { accuracy });
      if (!solution.resistance) throw new Error("no resistance");
      expect(solution.status).toBe("done");
      expect(solution.resistance.lower).toBeLessThanOrEqual(value);
      expect(solution.resistance.upper).toBeGreaterThanOrEqual(value);
    }
  });
});

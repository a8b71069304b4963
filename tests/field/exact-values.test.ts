import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { solveField, type SheetConductance } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

/**
 * Exact answers by conformal mapping and by flow tubes. Values and their sources: tests/fixtures/values.json (50 digits,
 * two routes) and the closed forms beside each check.
 */
interface ReferenceValue {
  id: string;
  inputs: Record<string, number>;
  value: string;
  uncertainty: number;
}

const values = JSON.parse(
  readFileSync(new URL("../fixtures/values.json", import.meta.url), "utf8"),
) as ReferenceValue[];

function reference(id: string): { value: number; inputs: Record<string, number> } {
  const entry = values.find((v) => v.id === id);
  if (!entry) throw new Error(`no reference value ${id}`);
  return { value: Number(entry.value), inputs: entry.inputs };
}

type Points = [number, number][];
type Arc = { arcTo: [number, number]; center: [number, number]; clockwise?: boolean };
type Segment = [[number, number], [number, number]];

interface Sheet {
  outer: (Points[number] | Arc)[];
  holes?: (Points[number] | Arc)[][];
  a: Segment[];
  b: Segment[];
  conductance?: SheetConductance;
}

/** Brackets at rising accuracy must hold the exact value; `slack` allows for what a finite outline leaves out. */
function expectBracketed(sheet: Sheet, exact: number, accuracies: number[], below = 0, above = 0): void {
  const outline = accept({ unit: "m", outer: sheet.outer, holes: sheet.holes ?? [] }, [
    { name: "a", segments: sheet.a },
    { name: "b", segments: sheet.b },
  ]);
  for (const accuracy of accuracies) {
    const solution = solveField({ outline, conductance: [sheet.conductance ?? 1] }, { accuracy });
    const { resistance } = solution;
    if (!resistance) throw new Error("no resistance");
    expect(solution.status).toBe("done");
    expect(resistance.lower).toBeLessThanOrEqual(exact + above);
    expect(resistance.upper).toBeGreaterThanOrEqual(exact - below);
    expect(resistance.upper - resistance.lower).toBeLessThanOrEqual(accuracy * resistance.value);
  }
}

const rectangle = (l: number, w: number): Points => [
  [0, 0],
  [l, 0],
  [l, w],
  [0, w],
];

describe("rectangles with partial terminals (elliptic integrals)", () => {
  it("F-rect: whole ends", () => {
    const { value, inputs } = reference("F-rect-1");
    const { L, W } = inputs;
    const sheet = {
      outer: rectangle(L, W),
      a: [
        [
          [0, 0],
          [0, W],
        ],
      ] as Segment[],
      b: [
        [
          [L, 0],
          [L, W],
        ],
      ] as Segment[],
    };
    expectBracketed(sheet, value, [1e-4, 1e-8]);
  });

  it("F-partial: parts of opposite sides", () => {
    const { value, inputs } = reference("F-partial-1");
    const { L, W, y1, y2, y3, y4 } = inputs;
    const sheet: Sheet = {
      outer: rectangle(L, W),
      a: [
        [
          [L, y1],
          [L, y2],
        ],
      ],
      b: [
        [
          [0, y3],
          [0, y4],
        ],
      ],
    };
    expectBracketed(sheet, value, [1e-3, 1e-5, 1e-8]);
  });

  it("F-sameside: two parts of one side", () => {
    const { value, inputs } = reference("F-sameside-1");
    const { L, W, x1, x2, x3, x4 } = inputs;
    const sheet: Sheet = {
      outer: rectangle(L, W),
      a: [
        [
          [x1, 0],
          [x2, 0],
        ],
      ],
      b: [
        [
          [x3, 0],
          [x4, 0],
        ],
      ],
    };
    expectBracketed(sheet, value, [1e-3, 1e-5, 1e-8]);
  });

  it("F-adjacent: parts of neighbouring sides that nearly touch", () => {
    const { value, inputs } = reference("F-adjacent-1");
    const { L, W, x1, x2, y3, y4 } = inputs;
    const sheet: Sheet = {
      outer: rectangle(L, W),
      a: [
        [
          [x1, 0],
          [x2, 0],
        ],
      ],
      b: [
        [
          [L, y3],
          [L, y4],
        ],
      ],
    };
    expectBracketed(sheet, value, [1e-3, 1e-5, 1e-8]);
  });

  it("an end terminal at one edge and centred (closed forms of the catalogue's sheet-end-terminal)", () => {
    // L=1.3, W=1, c=0.3: by theta functions, two routes.
    const edge: Sheet = {
      outer: rectangle(1.3, 1),
      a: [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      b: [
        [
          [1.3, 0],
          [1.3, 0.3],
        ],
      ],
    };
    expectBracketed(edge, 1.80249778527133294, [1e-4, 1e-8]);
    const centred: Sheet = {
      outer: rectangle(1.3, 1),
      a: [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      b: [
        [
          [1.3, 0.35],
          [1.3, 0.65],
        ],
      ],
    };
    expectBracketed(centred, 1.55136260253142005, [1e-4, 1e-8]);
  });

  it("a slit at mid-length is twice an end terminal: L=1.6, W=1, opening 0.3 at the edge and centred", () => {
    const edge: Sheet = {
      outer: rectangle(0.8, 1),
      a: [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      b: [
        [
          [0.8, 0],
          [0.8, 0.3],
        ],
      ],
    };
    expectBracketed(edge, 2.59497749848337285 / 2, [1e-4, 1e-8]);
    const centred: Sheet = {
      outer: rectangle(0.8, 1),
      a: [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      b: [
        [
          [0.8, 0.35],
          [0.8, 0.65],
        ],
      ],
    };
    expectBracketed(centred, 2.10269072232276755 / 2, [1e-4, 1e-8]);
  });
});

describe("polygons", () => {
  it("F-kite: one square, by symmetry", () => {
    const sheet: Sheet = {
      outer: [
        [0, 0],
        [1.3, -0.9],
        [4, 0],
        [1.3, 0.9],
      ],
      a: [
        [
          [0, 0],
          [1.3, -0.9],
        ],
      ],
      b: [
        [
          [4, 0],
          [1.3, 0.9],
        ],
      ],
    };
    expectBracketed(sheet, reference("F-kite-1").value, [1e-3, 1e-5, 1e-8]);
  });

  it("D-trapezoidflat: straight ends on a taper", () => {
    const { value, inputs } = reference("D-trapezoidflat-1");
    const { L, w1, w2 } = inputs;
    const sheet: Sheet = {
      outer: [
        [0, -w1 / 2],
        [L, -w2 / 2],
        [L, w2 / 2],
        [0, w1 / 2],
      ],
      a: [
        [
          [0, -w1 / 2],
          [0, w1 / 2],
        ],
      ],
      b: [
        [
          [L, -w2 / 2],
          [L, w2 / 2],
        ],
      ],
    };
    expectBracketed(sheet, value, [1e-3, 1e-5, 1e-8], 1e-12, 1e-12);
  });

  it("F-bend90: equal bend with long legs, 1 - (2/π)ln2; short legs lie below by about 0.11e^(-2π leg/width)", () => {
    const { value } = reference("F-bend90-1");
    const legs = 5;
    const sheet: Sheet = {
      outer: [
        [0, 0],
        [1 + legs, 0],
        [1 + legs, 1],
        [1, 1],
        [1, 1 + legs],
        [0, 1 + legs],
      ],
      a: [
        [
          [1 + legs, 0],
          [1 + legs, 1],
        ],
      ],
      b: [
        [
          [0, 1 + legs],
          [1, 1 + legs],
        ],
      ],
    };
    expectBracketed(sheet, 2 * legs + value, [1e-4, 1e-6, 1e-9], 1e-12);
  });

  it("unequal bend w1/w2 = 1/2: 0.643537249489 (closed form of the catalogue)", () => {
    const legs = 5;
    const sheet: Sheet = {
      outer: [
        [0, 0],
        [1 + 2 * legs, 0],
        [1 + 2 * legs, 2],
        [1, 2],
        [1, 2 + legs],
        [0, 2 + legs],
      ],
      a: [
        [
          [1 + 2 * legs, 0],
          [1 + 2 * legs, 2],
        ],
      ],
      b: [
        [
          [0, 2 + legs],
          [1, 2 + legs],
        ],
      ],
    };
    expectBracketed(sheet, 2 * legs + 0.643537249489, [1e-4, 1e-6, 1e-8], 1e-11, 1e-11);
  });

  it("F-bend: a turn by 45 degrees", () => {
    const { value, inputs } = reference("F-bend-1");
    const { theta } = inputs;
    const legs = 5;
    // Inner corner at the origin; one leg along -x, one turned left by theta; conductor to the right of the inner edge.
    const [c, s] = [Math.cos(theta), Math.sin(theta)];
    const outerCorner: [number, number] = [Math.tan(theta / 2), -1];
    const end: [number, number] = [legs * c, legs * s];
    const sheet: Sheet = {
      outer: [[-legs, 0], [-legs, -1], outerCorner, [end[0] + s, end[1] - c], end, [0, 0]],
      a: [
        [
          [-legs, 0],
          [-legs, -1],
        ],
      ],
      b: [[[end[0] + s, end[1] - c], end]],
    };
    expectBracketed(sheet, 2 * legs + value, [1e-4, 1e-6, 1e-8], 1e-9, 1e-9);
  });

  it("F-step1 and F-step2: a step on one side and on both", () => {
    const one = reference("F-step1-1");
    const { a, b } = one.inputs;
    const legs = 5;
    const l1 = legs * a;
    const l2 = legs * b;
    const sheet: Sheet = {
      outer: [
        [0, 0],
        [l1 + l2, 0],
        [l1 + l2, b],
        [l1, b],
        [l1, a],
        [0, a],
      ],
      a: [
        [
          [0, 0],
          [0, a],
        ],
      ],
      b: [
        [
          [l1 + l2, 0],
          [l1 + l2, b],
        ],
      ],
    };
    expectBracketed(sheet, 2 * legs + one.value, [1e-4, 1e-6, 1e-8], 1e-9, 1e-9);
    const two = reference("F-step2-1");
    const centred: Sheet = {
      outer: [
        [0, -a / 2],
        [l1, -a / 2],
        [l1, -b / 2],
        [l1 + l2, -b / 2],
        [l1 + l2, b / 2],
        [l1, b / 2],
        [l1, a / 2],
        [0, a / 2],
      ],
      a: [
        [
          [0, -a / 2],
          [0, a / 2],
        ],
      ],
      b: [
        [
          [l1 + l2, -b / 2],
          [l1 + l2, b / 2],
        ],
      ],
    };
    expectBracketed(centred, 2 * legs + two.value, [1e-4, 1e-6, 1e-8], 1e-9, 1e-9);
  });

  it("F-dogbone: two symmetric steps", () => {
    const { value, inputs } = reference("F-dogbone-1");
    const { w, W, ln, lh } = inputs;
    const sheet: Sheet = {
      outer: [
        [0, -W / 2],
        [lh, -W / 2],
        [lh, -w / 2],
        [lh + ln, -w / 2],
        [lh + ln, -W / 2],
        [2 * lh + ln, -W / 2],
        [2 * lh + ln, W / 2],
        [lh + ln, W / 2],
        [lh + ln, w / 2],
        [lh, w / 2],
        [lh, W / 2],
        [0, W / 2],
      ],
      a: [
        [
          [0, -W / 2],
          [0, W / 2],
        ],
      ],
      b: [
        [
          [2 * lh + ln, -W / 2],
          [2 * lh + ln, W / 2],
        ],
      ],
    };
    expectBracketed(sheet, value, [1e-4, 1e-6], 2e-8, 2e-8);
  });

  it("F-Tboth: a tee with both bar arms joined", () => {
    const { value } = reference("F-Tboth-1");
    const legs = 5;
    const sheet: Sheet = {
      outer: [
        [-0.5 - legs, 0],
        [0.5 + legs, 0],
        [0.5 + legs, 1],
        [0.5, 1],
        [0.5, 1 + legs],
        [-0.5, 1 + legs],
        [-0.5, 1],
        [-0.5 - legs, 1],
      ],
      a: [
        [
          [-0.5 - legs, 0],
          [-0.5 - legs, 1],
        ],
        [
          [0.5 + legs, 0],
          [0.5 + legs, 1],
        ],
      ],
      b: [
        [
          [0.5, 1 + legs],
          [-0.5, 1 + legs],
        ],
      ],
    };
    expectBracketed(sheet, legs + legs / 2 + value, [1e-4, 1e-6, 1e-8], 1e-9, 1e-9);
  });
});

describe("graded sheets", () => {
  const strip = (l: number, w: number, conductance: SheetConductance): Sheet => ({
    outer: rectangle(l, w),
    a: [
      [
        [0, 0],
        [0, w],
      ],
    ],
    b: [
      [
        [l, 0],
        [l, w],
      ],
    ],
    conductance,
  });

  it("G-sep-exp and G-sep-mixed: separable conductance", () => {
    const exp = reference("G-sep-exp-1");
    const { L, W, a, b } = exp.inputs;
    expectBracketed(
      strip(L, W, (x, y) => Math.exp(a * x + b * y)),
      exp.value,
      [1e-4, 1e-8],
    );
    const mixed = reference("G-sep-mixed-1");
    expectBracketed(
      strip(mixed.inputs.L, mixed.inputs.W, (x, y) => (1 + x) ** 2 * Math.cosh(y)),
      mixed.value,
      [1e-4, 1e-8],
    );
  });

  it("G-nonsep: 1 + xy/2", () => {
    expectBracketed(
      strip(2, 2, (x, y) => 1 + 0.5 * x * y),
      reference("G-nonsep-1").value,
      [1e-4, 1e-8],
      1e-12,
      1e-12,
    );
  });
});

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

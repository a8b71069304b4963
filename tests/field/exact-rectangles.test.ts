import { describe, it } from "vitest";
import { expectBracketed, rectangle, reference, type Segment, type Sheet } from "./support/exact-sheets";
import type { SheetConductance } from "@/lib/engine/field/solve-field";

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

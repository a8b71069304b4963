import { describe, it } from "vitest";
import { expectBracketed, reference, type Sheet } from "./support/exact-sheets";

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

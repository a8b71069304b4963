import { describe, expect, it } from "vitest";
import { carlsonRC, carlsonRF } from "@/lib/engine/numeric/carlson";

/** Recomputed with 40-digit arithmetic (mpmath); R_C(2.25, 2) = ln 2 and R_F(1, 2, 4) also stand in Carlson 1995. */
const rc: readonly (readonly [number, number, number])[] = [
  [0, 1, Math.PI / 2],
  [2.25, 2, Math.LN2],
  [1e-24, 1, 1.5707963267938966192],
  [1, 1e-24, 28.324168296488493556],
  [1, 1.0001, 0.9999666686665238243],
  [1e300, 1e-300, 6.9146867507877363238e-148],
];

const rf: readonly (readonly [number, number, number, number])[] = [
  [0, 1, 2, 1.3110287771460599052],
  [1, 2, 4, 0.68508581663343597397],
  [1e-20, 1, 1, 1.5707963266948966192],
  [0, 1e-24, 1, 29.017315477048438865],
  [3, 3, 3, 0.57735026918962576451],
];

describe("Carlson's integrals", () => {
  it.each(rc)("R_C(%d, %d)", (x, y, value) => {
    expect(Math.abs(carlsonRC(x, y) / value - 1)).toBeLessThan(2e-15);
  });

  it.each(rf)("R_F(%d, %d, %d)", (x, y, z, value) => {
    expect(Math.abs(carlsonRF(x, y, z) / value - 1)).toBeLessThan(2e-15);
    expect(Math.abs(carlsonRF(z, x, y) / value - 1)).toBeLessThan(2e-15);
  });
});

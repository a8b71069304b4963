import { describe, expect, it } from "vitest";
import { digamma, EULER_GAMMA } from "@/lib/engine/numeric/digamma";

/** Recomputed with 40-digit arithmetic (mpmath). */
const values: readonly (readonly [number, number])[] = [
  [1e-10, -10000000000.5772153],
  [0.01, -100.56088545786867242],
  [0.5, -1.9635100260214234794],
  [1, -EULER_GAMMA],
  [1.4616321449683623, 0],
  [7.25, 1.9104535268837360284],
  [1e8, 18.420680738952365464],
];

describe("digamma", () => {
  it.each(values)("ψ(%d)", (x, value) => {
    expect(Math.abs(digamma(x) - value)).toBeLessThan(1e-15 * Math.max(1, Math.abs(value)));
  });

  it("satisfies the reflection formula", () => {
    for (const x of [0.1, 0.3, 0.45]) {
      const cotangent = Math.PI / Math.tan(Math.PI * x);
      expect(Math.abs(digamma(1 - x) - digamma(x) - cotangent)).toBeLessThan(1e-14 * cotangent + 2e-15);
    }
  });
});

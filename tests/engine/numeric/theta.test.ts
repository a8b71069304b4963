import { describe, expect, it } from "vitest";
import { theta } from "@/lib/engine/numeric/theta";

/** Recomputed with 40-digit arithmetic (mpmath), θ₁ and θ₂ over 2q^(1/4). */
const values: readonly (readonly [number, number, number, number, number, number])[] = [
  [0.3, 0.04, 0.29426688769167504171, 0.9563310653645786557, 1.0660287044643580674, 0.93397500607904777374],
  [1.5, 0.04, 0.99905903863436650592, 0.070399929808431916419, 0.92080551634335431698, 1.0792043158003809828],
  [1e-9, 1e-30, 1.0000000000000000621e-9, 1, 1, 1],
  [0.7, 0.3, 0.56627364538249161407, 0.71872346010064937234, 1.0866969908910608074, 0.88277501862550187038],
];

describe("theta", () => {
  it.each(values)("at v=%d, q=%d", (v, q, first, second, third, fourth) => {
    const found = theta(v, q);
    expect(Math.abs(found.first / first - 1)).toBeLessThan(1e-15);
    expect(Math.abs(found.second / second - 1)).toBeLessThan(2e-15);
    expect(Math.abs(found.third / third - 1)).toBeLessThan(1e-15);
    expect(Math.abs(found.fourth / fourth - 1)).toBeLessThan(1e-15);
  });

  it("satisfies Jacobi's θ₂⁴ + θ₄⁴ = θ₃⁴ at v = 0", () => {
    for (const q of [1e-5, 0.01, 0.2, 0.6]) {
      const { second, third, fourth } = theta(0, q);
      expect((16 * q * second ** 4 + fourth ** 4) / third ** 4).toBeCloseTo(1, 14);
    }
  });
});

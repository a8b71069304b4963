import { describe, expect, it } from "vitest";
import {
  bernoulliAtHalf,
  bernoulliNumber,
  bernoulliPolynomial,
  LARGEST_BERNOULLI,
} from "@/lib/engine/numeric/bernoulli";

describe("Bernoulli numbers", () => {
  it("satisfy Σ C(n+1, j)·Bⱼ = 0", () => {
    for (let k = 1; k <= LARGEST_BERNOULLI; k++) {
      const n = 2 * k;
      let binomial = 1;
      let sum = 0;
      let scale = 0;
      for (let j = 0; j <= n; j++) {
        const number = j === 1 ? -0.5 : j % 2 === 1 ? 0 : bernoulliNumber(j / 2);
        sum += binomial * number;
        scale = Math.max(scale, Math.abs(binomial * number));
        binomial *= (n + 1 - j) / (j + 1);
      }
      expect(Math.abs(sum)).toBeLessThan(1e-14 * scale);
    }
  });
});

describe("Bernoulli polynomials", () => {
  it("B₂(t) = t² − t + 1/6", () => {
    for (const t of [0, 0.25, 0.5, 0.9, 1])
      expect(bernoulliPolynomial(1, t)).toBeCloseTo(t * t - t + 1 / 6, 15);
  });

  it("agree with 40-digit values (mpmath)", () => {
    expect(bernoulliPolynomial(4, 0.1) / -0.026895723333332644).toBeCloseTo(1, 11);
    expect(bernoulliPolynomial(8, 0.9) / -5.7376211337389065).toBeCloseTo(1, 13);
    expect(bernoulliPolynomial(14, 0.3) / 8435617.3671749216).toBeCloseTo(1, 13);
  });

  it("end in the Bernoulli numbers and take their middle value at ½", () => {
    for (let k = 1; k <= LARGEST_BERNOULLI; k++) {
      const scale = Math.abs(bernoulliNumber(k));
      expect(Math.abs(bernoulliPolynomial(k, 0) - bernoulliNumber(k))).toBeLessThan(
        1e-12 * Math.max(scale, 1),
      );
      expect(bernoulliPolynomial(k, 1)).toBe(bernoulliPolynomial(k, 0));
      expect(Math.abs(bernoulliPolynomial(k, 0.5) / bernoulliAtHalf(k) - 1)).toBeLessThan(2e-15);
    }
  });
});

/** How an input is spread over its tolerance (JCGM 101, 6.4): moments, samples, and the variance of a function of it. */
import { gaussLegendre } from "../../numeric/gauss-legendre";
import type { Random } from "../../numeric/random";
import type { UncertainInput } from "./input";

type Spread = Pick<UncertainInput, "nominal" | "minus" | "plus" | "distribution">;

/** For a normal distribution the tolerance is two standard deviations. */
const NORMAL_DEVIATIONS = 2;

/** Expectation less the nominal value; 0 for a symmetric tolerance. */
export function shiftOf({ minus, plus, distribution }: Spread): number {
  if (distribution === "normal") return 0;
  // A triangle has its peak at the nominal value.
  return distribution === "triangular" ? (plus - minus) / 3 : (plus - minus) / 2;
}

/** Standard uncertainty of the input (JCGM 100, 4.3.7 and 4.3.9; the asymmetric triangle by its second moment). */
export function standardOf({ minus, plus, distribution }: Spread): number {
  if (distribution === "normal") return plus / NORMAL_DEVIATIONS;
  if (distribution === "triangular") return Math.sqrt((minus * minus + plus * plus + minus * plus) / 18);
  return (minus + plus) / Math.sqrt(12);
}

/** A sampler of the input's values. */
export function samplerOf(spread: Spread, random: Random): () => number {
  const { nominal, minus, plus, distribution } = spread;
  const width = minus + plus;
  if (width === 0) return () => nominal;
  if (distribution === "normal") {
    const standard = standardOf(spread);
    return () => nominal + standard * random.normal();
  }
  if (distribution === "triangular") {
    const peak = minus / width;
    return () => {
      const u = random.uniform();
      return u < peak
        ? nominal - minus + Math.sqrt(u * width * minus)
        : nominal + plus - Math.sqrt((1 - u) * width * plus);
    };
  }
  return () => nominal - minus + width * random.uniform();
}

/**
 * Variance of f(X) by Gauss–Legendre quadrature over the distribution; a normal one is cut at ±5 standard deviations.
 * The nodes that f is not defined at count as absent.
 */
export function varianceOf(spread: Spread, f: (x: number) => number): number {
  const { nominal, minus, plus, distribution } = spread;
  if (minus + plus === 0) return 0;
  const half = distribution === "normal" ? 5 * standardOf(spread) : 0;
  const pieces: [number, number][] =
    distribution === "normal"
      ? [
          [-half, 0],
          [0, half],
        ]
      : distribution === "triangular"
        ? [
            [-minus, 0],
            [0, plus],
          ]
        : [[-minus, plus]];
  const values: number[] = [];
  const weights: number[] = [];
  const rule = gaussLegendre(24);
  for (const [from, to] of pieces) {
    for (let k = 0; k < rule.nodes.length; k++) {
      const d = from + (to - from) * rule.nodes[k];
      const value = f(nominal + d);
      if (Number.isNaN(value)) continue;
      values.push(value);
      weights.push(rule.weights[k] * (to - from) * density(spread, d));
    }
  }
  const whole = weights.reduce((sum, w) => sum + w, 0);
  const mean = values.reduce((sum, value, k) => sum + weights[k] * value, 0) / whole;
  return values.reduce((sum, value, k) => sum + weights[k] * (value - mean) ** 2, 0) / whole;
}

/** Density at a distance from the nominal value, up to a factor. */
function density(spread: Spread, d: number): number {
  if (spread.distribution === "uniform") return 1;
  if (spread.distribution === "normal") return Math.exp(-0.5 * (d / standardOf(spread)) ** 2);
  return d < 0 ? 1 + d / spread.minus : 1 - d / spread.plus;
}

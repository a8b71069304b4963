/**
 * Bispherical sums of a sphere near a plane and of two spheres, right from touching (the gap in doubles) to any
 * distance. Far apart the sums run term by term; near touching they go over to their Euler–Maclaurin expansions, whose
 * logarithm carries the divergence.
 *
 * W. R. Smythe, Static and Dynamic Electricity, and E. W. Hobson's bispherical functions are the classical source (from
 * memory); the expansions are derived here and agree with 40-digit sums.
 */
import { acosh1p, sinhOfAcosh1p } from "../../numeric/acosh1p";
import { bernoulliAtHalf, bernoulliNumber, bernoulliPolynomial } from "../../numeric/bernoulli";
import { digamma, EULER_GAMMA } from "../../numeric/digamma";

/** Below this the expansions are good to rounding, above it at most 270 terms are. */
const SWITCH = 0.3;
/** The alternating sum's expansion has coefficients 4ᵏ times as large. */
const SWITCH_ALTERNATING = 0.15;
const TERMS = 8;
/** exp(−x) of this is below rounding. */
const NEGLIGIBLE = 40;

/** (2k)! */
function evenFactorial(k: number): number {
  let product = 1;
  for (let n = 2; n <= 2 * k; n++) product *= n;
  return product;
}

/** s_k = (2^(2k−1) − 1)·B₂ₖ²/(k·(2k)!), the coefficients of Σ1/sinh nμ beyond its logarithm. */
const PLANE = Array.from({ length: TERMS }, (_, i) => {
  const k = i + 1;
  return ((2 ** (2 * k - 1) - 1) * bernoulliNumber(k) ** 2) / k / evenFactorial(k);
});

/** sinh μ/sinh nμ without overflow. */
function ratio(mu: number, n: number): number {
  return n === 1 ? 1 : (Math.exp(-(n - 1) * mu) * Math.expm1(-2 * mu)) / Math.expm1(-2 * n * mu);
}

/**
 * sinh μ·Σ_{n≥1} 1/sinh nμ, with cosh μ = 1 + x: the charge of a sphere of unit radius at one volt, its centre 1 + x
 * above an earthed plane (in units of 4πε). 1 far away, ½·ln(2/x)-like near touching.
 */
export function sphereAbovePlane(x: number): number {
  const mu = acosh1p(x);
  if (mu < SWITCH) {
    const square = mu * mu;
    let series = 0;
    for (let k = TERMS - 1; k >= 0; k--) series = series * square + PLANE[k];
    return (sinhOfAcosh1p(x) / mu) * (Math.log(2 / mu) + EULER_GAMMA + series * square);
  }
  let sum = 0;
  for (let n = 1; (n - 1) * mu < NEGLIGIBLE; n++) sum += ratio(mu, n);
  return sum;
}

/** sinh μ·Σ_{n≥1} (−1)^(n+1)/sinh nμ: the same below an insulating plane, or of each of two equal spheres at one volt. */
export function sphereBelowSurface(x: number): number {
  const mu = acosh1p(x);
  if (mu < SWITCH_ALTERNATING) {
    const square = mu * mu;
    let series = 0;
    for (let k = TERMS - 1; k >= 0; k--) series = series * square + PLANE[k] * (1 - 4 ** (k + 1));
    return (sinhOfAcosh1p(x) / mu) * (Math.LN2 + series * square);
  }
  let sum = 0;
  for (let n = 1; (n - 1) * mu < NEGLIGIBLE; n++) sum += (n % 2 === 1 ? 1 : -1) * ratio(mu, n);
  return sum;
}

export interface PairCharges {
  /** Charge of the smaller sphere at one volt with the other at zero, 4πε·m. */
  readonly self: number;
  /** Charges of the smaller and the larger sphere with both at one volt. */
  readonly smaller: number;
  readonly larger: number;
}

/** Charges of two spheres of radii a ≤ b whose surfaces are `gap` apart, in units of 4πε (so in metres at one volt). */
export function spherePair(a: number, b: number, gap: number): PairCharges {
  const spacing = gap + a + b;
  const c =
    0.5 *
    Math.sqrt((gap / spacing) * ((gap + 2 * a + 2 * b) / spacing)) *
    Math.sqrt(gap + 2 * a) *
    Math.sqrt(gap + 2 * b);
  const first = Math.asinh(c / a);
  const second = Math.asinh(c / b);
  const span = first + second;
  return span < SWITCH ? expandedPair(c, first, second) : summedPair(a, b, c, first, second);
}

function summedPair(a: number, b: number, c: number, first: number, second: number): PairCharges {
  const span = first + second;
  const sum = (p: number) => {
    let total = 0;
    for (let k = 1; (k - 2) * span < NEGLIGIBLE; k += 2) {
      total += (2 * Math.exp(-k * p)) / -Math.expm1(-k * span);
    }
    return total;
  };
  const mutual = c * sum(span);
  const self = a + c * sum(first + span);
  return { self, smaller: self - mutual, larger: b + c * sum(second + span) - mutual };
}

function expandedPair(c: number, first: number, second: number): PairCharges {
  const span = first + second;
  const tail = (t: number) => {
    let sum = 0;
    for (let k = TERMS; k >= 1; k--) {
      const coefficient =
        (4 ** k * bernoulliPolynomial(k, t) * bernoulliAtHalf(k)) / (2 * k) / evenFactorial(k);
      sum = sum * span * span + coefficient;
    }
    return sum * span;
  };
  const [t1, t2] = [first / span, second / span];
  const [z0, z1, z2] = [tail(0), tail(t1), tail(t2)];
  return {
    self: c * ((Math.log(2 / span) - digamma(t1)) / span - z2),
    smaller: c * ((-digamma(t1) - EULER_GAMMA) / span - z2 + z0),
    larger: c * ((-digamma(t2) - EULER_GAMMA) / span - z1 + z0),
  };
}

/** 4πσ times the resistance between the two spheres (1/m). */
export function pairResistance({ self, smaller, larger }: PairCharges): number {
  // (x₁+x₂)/(c₁₁(x₁+x₂) − x₁²), divided through so that very unequal spheres lose nothing.
  return 1 / (self - smaller * (smaller / (smaller + larger)));
}

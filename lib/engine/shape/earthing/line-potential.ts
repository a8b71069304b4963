/**
 * Mean of 1/distance between straight line sources, the kernel of the average-potential method (Howe 1914; Dwight 1936):
 * a current spread evenly over a wire, its potential averaged over the wire's surface. Lengths in metres, results in
 * 1/m; the mutual resistance of two conductors in a soil of resistivity ρ is ρ/4π times the sum over the images.
 *
 * Every form is free of cancellation: nothing is lost when a segment is short, thin or far away.
 */
import { gaussLegendre } from "../../numeric/gauss-legendre";

/**
 * M(l, d): mean of 1/√((z−b)²+d²) over two equal parallel segments of length l side by side at distance d (the wire's
 * own radius for its own mean potential): (2/l)·(asinh x − x/(1+√(1+x²))), x = l/d.
 */
export function parallelMean(length: number, distance: number): number {
  const x = length / distance;
  return (2 * (Math.asinh(x) - x / (1 + Math.hypot(1, x)))) / length;
}

/** asinh(q + step) − asinh q for q, step ≥ 0, to full relative precision however small the step is. */
export function asinhIncrease(q: number, step: number): number {
  const p = q + step;
  const rootP = Math.hypot(1, p);
  const rootQ = Math.hypot(1, q);
  return Math.log1p((step + (step * (p + q)) / (rootP + rootQ)) / (q + rootQ));
}

/** ∫ of asinh(x/d) from x to x+step, that is Φ(x+step) − Φ(x) with Φ(x) = x·asinh(x/d) − √(x²+d²). */
function integralOfAsinh(x: number, step: number, distance: number): number {
  const end = x + step;
  return (
    step * Math.asinh(end / distance) +
    x * asinhIncrease(x / distance, step / distance) -
    step * ((x + end) / (Math.hypot(end, distance) + Math.hypot(x, distance)))
  );
}

const OUTER = gaussLegendre(16);

/**
 * Mean of 1/√(t²+d²) between two segments on one line (t along it) or on two parallel lines at distance d, their facing
 * ends a `gap` ≥ 0 apart along it.
 */
export function inlineMean(gap: number, first: number, second: number, distance: number): number {
  const long = Math.max(first, second);
  const short = Math.min(first, second);
  if (short <= 0.5 * Math.max(distance, gap)) {
    let sum = 0;
    for (let i = 0; i < 16; i++) {
      const x = gap + short * OUTER.nodes[i];
      sum += OUTER.weights[i] * asinhIncrease(x / distance, long / distance);
    }
    return sum / long;
  }
  return (
    (integralOfAsinh(gap + long, short, distance) - integralOfAsinh(gap, short, distance)) / long / short
  );
}

/**
 * Mean of 1/distance between two segments of equal length that leave one axis at an angle (0 < angle ≤ π) and lie in
 * parallel planes `distance` > 0 apart, both beginning on the axis.
 *
 * Near: the closed form of the double integral (Campbell's mutual inductance of inclined filaments over cos(angle)).
 * Far: Gauss–Legendre over the one of the exact integral over the other, where the closed form would cancel.
 */
export function inclinedMean(length: number, angle: number, distance: number): number {
  const d = distance / length;
  const cosine = Math.cos(angle);
  // The two arms in one line; sin π is not 0 in floating point.
  if (angle > Math.PI - 1e-9) return inlineMean(0, length, length, distance);
  const sine = Math.sin(angle);
  if (d >= 0.75) {
    let sum = 0;
    for (let i = 0; i < FAR.nodes.length; i++) {
      const x = FAR.nodes[i];
      const reach = Math.hypot(x * sine, d);
      const start = (-x * cosine) / reach;
      const end = (1 - x * cosine) / reach;
      sum +=
        FAR.weights[i] *
        (start >= 0 ? asinhIncrease(start, 1 / reach) : Math.asinh(end) + Math.asinh(-start));
    }
    return sum / length;
  }
  const ends = Math.hypot(2 * Math.sin(angle / 2), d);
  const side = Math.hypot(1, d);
  const logarithms = 2 * Math.log1p(2 / (ends + side - 1));
  const dihedral =
    Math.atan((d * d * cosine + sine * sine) / (d * ends * sine)) -
    2 * Math.atan((d * cosine) / (side * sine)) +
    Math.atan(cosine / sine);
  return (logarithms - (dihedral * d) / sine) / length;
}

const FAR = gaussLegendre(20);

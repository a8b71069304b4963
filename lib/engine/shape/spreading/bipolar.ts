/**
 * Two circular cylinders, one beside or inside the other, in bipolar coordinates: each cylinder is a surface τ = const
 * round one of two foci, and 2πRL/ρ is the difference of the two τ.
 */
import { acosh1p } from "../../numeric/acosh1p";

/** 2πRL/ρ = acosh(1 + x) for x ≥ 0; a double keeps x however near the cylinders are. */
export function bipolarSpan(x: number): number {
  return acosh1p(x);
}

/** x of two cylinders of radii a and b beside each other, g apart: g(g+2a+2b)/(2ab). */
export function besideEachOther(a: number, b: number, g: number): number {
  return (g / a / 2) * ((g + 2 * a + 2 * b) / b);
}

/** x of a cylinder of radius a inside one of radius b, smallest gap g, axes `offset` apart: g(b−a+offset)/(2ab). */
export function insideEachOther(a: number, b: number, g: number, offset: number): number {
  return (g / a / 2) * ((b - a + offset) / b);
}

/**
 * Field at one volt where the gap is narrowest, on a cylinder of radius a: coth(τ/2)/(a·span), given coth²(τ/2).
 */
export function narrowestField(a: number, span: number, cothSquared: number): number {
  return Math.sqrt(cothSquared) / a / span;
}

/**
 * The same span from the half distance c of the foci: asinh(c/a) ± asinh(c/b). An independent route where the two terms
 * do not cancel.
 */
export function spanFromFoci(c: number, a: number, b: number, sign: 1 | -1): number {
  return Math.asinh(c / a) + sign * Math.asinh(c / b);
}

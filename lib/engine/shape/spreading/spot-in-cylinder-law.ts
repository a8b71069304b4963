/**
 * Constriction at a round spot at the end of a semi-infinite cylinder, its side and the face round the spot insulated:
 * ψ(ε) = 4a·R/ρ over what the cylinder itself has, ε = spot/cylinder diameter.
 *
 * The dual Dini series reduces to the Fredholm equation h(s) + (2ε/π²)·∫₀¹h(t)[F(ε(s+t)) + F(ε(s−t))]dt = 1,
 * ψ = 1/∫₀¹h, with F(x) the finite part of ∫₀^∞ K₁(y)/I₁(y)·cosh(xy) dy. It was solved by Gauss–Legendre quadrature
 * with 33 digits at 130 values of ε; ψ/(1−ε)² was then expanded in Chebyshev polynomials for ε ≤ 0.92, and in powers and
 * logarithms of D = 1−ε above, where it starts with 2 − 2D − (3/8)D²·ln D. Derived here; the expansions keep 2e-15, and
 * tests solve the equation anew.
 */
import { sumChebyshev, type ChebyshevSeries } from "../../numeric/chebyshev";

const SMALL: ChebyshevSeries = {
  from: 0,
  to: 0.7,
  coefficients: [
    1.2566383265720753, 0.27667355894250827, 0.022409777610957108, 0.0026522811421434409,
    0.00031660819458221998, 4.4190287178128825e-5, 6.1445684802246293e-6, 9.5799294201633012e-7,
    1.5431421260401594e-7, 2.705705637047617e-8, 4.9695673797875167e-9, 9.7148959996549802e-10,
    1.9800709657578253e-10, 4.210711177763044e-11, 9.2379612877633534e-12, 2.0844374588347641e-12,
    4.8081605570905444e-13, 1.1304892347513767e-13, 2.7003258907609651e-14, 6.5390473081701369e-15,
    1.6022063786446305e-15, 3.9665036841666266e-16, 9.909382495229819e-17,
  ],
};

const MIDDLE: ChebyshevSeries = {
  from: 0.7,
  to: 0.92,
  coefficients: [
    1.7006808990402211, 0.1483051837442828, 0.0067690386803042268, 0.00043442967185237171,
    3.4916758816330879e-5, 3.6232704018758945e-6, 4.8080670365266976e-7, 7.7725801111092128e-8,
    1.4414572859273916e-8, 2.931632352991341e-9, 6.356259325726188e-10, 1.4441870861731093e-10,
    3.4014676374014868e-11, 8.2446195516431014e-12, 2.0459480509774645e-12, 5.1781696942122933e-13,
    1.3327277686180443e-13, 3.4800678627984286e-14, 9.2025932629123205e-15, 2.4606614513859057e-15,
    6.6445954217807246e-16, 1.810107353080092e-16, 4.9701921701734183e-17,
  ],
};

/** Coefficients of D², D³, … without a logarithm, with ln D, and (from D⁴ on) with ln²D. */
const PLAIN = [
  1.781868954252985, -1.781869105497664, 1.768072373629572, -1.840558109440966, -1.896113204093732,
  2.991192361107212,
];
const LOGARITHM = [
  -0.375, 0.375, -0.7897978957849687, 0.7314277281789325, -2.885676975493463, -1.121145441552799,
];
const SQUARE = [0, 0, 0.07041053029171679, -0.0843012451177035];

/** Relative error of the expansions and of their evaluation. */
export const SPOT_ACCURACY = 1e-13;

export interface SpotInCylinder {
  readonly spotDiameter: number;
  readonly cylinderDiameter: number;
}

/** ψ for spotDiameter < cylinderDiameter: 1 for a vanishing spot, 2ε(1−ε)² for a vanishing ring. */
export function spotConstriction({ spotDiameter, cylinderDiameter }: SpotInCylinder): number {
  const ratio = spotDiameter / cylinderDiameter;
  const ring = (cylinderDiameter - spotDiameter) / cylinderDiameter;
  return ring * ring * constrictionOverRingSquared(ratio, ring);
}

function constrictionOverRingSquared(ratio: number, ring: number): number {
  if (ratio <= SMALL.to) return sumChebyshev(SMALL, ratio);
  if (ratio <= MIDDLE.to) return sumChebyshev(MIDDLE, ratio);
  const logarithm = Math.log(ring);
  let sum = 0;
  for (let k = PLAIN.length - 1; k >= 0; k--) {
    sum = sum * ring + PLAIN[k] + logarithm * (LOGARITHM[k] + logarithm * (SQUARE[k] ?? 0));
  }
  return 2 - 2 * ring + ring * ring * sum;
}

/**
 * Another expansion of the same ψ, D²·{Σpₖεᵏ + ln D·(l₀D² + l₁D³ + l₂D⁴)}, of relative error 2.3e-9 for
 * 0.0005 ≤ ε ≤ 0.994: an independent route.
 */
export function spotConstrictionByPolynomial(ratio: number): number {
  const ring = 1 - ratio;
  const powers = [
    1, -1.12583446, 5.788258677, -6.69936917, 3.440922208, -0.32857198, -0.064534126, -0.00075806,
    -0.010113122,
  ];
  const logarithms = [-0.37455839, 0.347851053, -1.689874918];
  const plain = powers.reduceRight((sum, p) => sum * ratio + p, 0);
  const rest = logarithms.reduceRight((sum, l) => sum * ring + l, 0);
  return ring * ring * (plain + Math.log(ring) * ring * ring * rest);
}

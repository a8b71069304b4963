/**
 * Silicon at room temperature from its dopant density.
 *
 * `f723`: the fits of resistivity against density of ASTM F723 (23 °C; boron and phosphorus).
 * `masetti`: carriers times the mobilities of Masetti, Severi and Solmi, IEEE Trans. Electron Devices ED-30 (1983) 764,
 * at the total density, for layers compensated by a background of the other type.
 * Densities in 1/cm³, conductivities in S/m.
 */

export type DopantType = "n" | "p";
export type DopantModel = "f723" | "masetti";
export type Dopant = "boron" | "phosphorus" | "arsenic";

/** Elementary charge in coulombs, exact by the SI of 2019. */
const CHARGE = 1.602176634e-19;

/** Largest density, 1/cm³, for which the fits are used. */
export const LARGEST_DENSITY = 1e21;
/** Smallest density, 1/cm³, that the fits cover; below it the mobility stays that of light doping. */
export const SMALLEST_DENSITY = 1e12;

/** Conductivity in S/m of silicon of one dopant by ASTM F723: p is boron, n is phosphorus; 0 where the density is 0. */
export function siliconConductivity(type: DopantType, density: number): number {
  if (!(density > 0)) return density === 0 ? 0 : Number.NaN;
  return type === "p" ? boronConductivity(density) : phosphorusConductivity(density);
}

function boronConductivity(density: number): number {
  const resistivity = (1.305e16 + 1.133e17 / (1 + Math.pow(2.58e-19 * density, -0.737))) / density;
  return 100 / resistivity;
}

function phosphorusConductivity(density: number): number {
  // Below the fitted range the exponent would leave the light-doping limit; the mobility there is constant.
  const x = Math.log10(Math.max(density, SMALLEST_DENSITY)) - 16;
  const z =
    (-3.0769 + x * (2.2108 + x * (-0.62272 + x * 0.057501))) /
    (1 + x * (-0.68157 + x * (0.19833 + x * -0.018376)));
  return (100 * density) / (6.242e18 * Math.pow(10, z));
}

interface MasettiParameters {
  readonly mu0: number;
  readonly muMax: number;
  readonly cr: number;
  readonly alpha: number;
  readonly mu1: number;
  readonly cs: number;
  readonly beta: number;
  readonly pc: number;
}

/** Table I of Masetti 1983; mobilities in cm²/(V·s), densities in 1/cm³ (the boron values pc, μ1, Cs, β from memory). */
const MASETTI: Readonly<Record<Dopant, MasettiParameters>> = {
  arsenic: { mu0: 52.2, muMax: 1417, cr: 9.68e16, alpha: 0.68, mu1: 43.4, cs: 3.43e20, beta: 2, pc: 0 },
  phosphorus: { mu0: 68.5, muMax: 1414, cr: 9.2e16, alpha: 0.711, mu1: 56.1, cs: 3.41e20, beta: 1.98, pc: 0 },
  boron: { mu0: 44.9, muMax: 470.5, cr: 2.23e17, alpha: 0.719, mu1: 29, cs: 6.1e20, beta: 2, pc: 9.23e16 },
};

/** Mobility in cm²/(V·s) of the majority carriers at a total density. */
export function masettiMobility(dopant: Dopant, density: number): number {
  const p = MASETTI[dopant];
  // For boron the first term of the paper carries exp(−pc/N); pc is 0 for the donors. At no doping it is 1 or 0.
  const lowest = p.pc === 0 ? p.mu0 : density > 0 ? p.mu0 * Math.exp(-p.pc / density) : 0;
  const span = p.pc === 0 ? p.muMax - p.mu0 : p.muMax;
  return (
    lowest +
    span / (1 + Math.pow(density / p.cr, p.alpha)) -
    p.mu1 / (1 + Math.pow(p.cs / Math.max(density, 1e-300), p.beta))
  );
}

/** Conductivity in S/m of a layer with that dopant in a background of the other type; 0 where it does not outweigh it. */
export function compensatedConductivity(dopant: Dopant, density: number, background: number): number {
  const carriers = density - background;
  if (!(carriers > 0)) return Number.isNaN(carriers) ? Number.NaN : 0;
  return 100 * CHARGE * carriers * masettiMobility(dopant, density + background);
}

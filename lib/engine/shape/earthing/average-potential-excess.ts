/**
 * How far the average-potential value of an electrode of wires lies above the resistance of the true, equipotential
 * one: value/true − 1.
 *
 * The figures for a rod come from a comparison inside the project (kept as a test): a boundary element solution of the
 * whole surface of the cylinder, its end face included, with its image in the ground surface; converged to 1e-6. Between
 * the figures the excess is taken straight over the logarithm of length/radius, and a margin of 3 % of itself plus
 * 0.0005 covers what the chord cuts off. Below L/a = 1.2 the rod is a disc rather than a rod, and the value lies below
 * the true one.
 */

/** Rod length over radius, and value/true − 1. */
const ROD: readonly (readonly [number, number])[] = [
  [0.05, -0.3111],
  [0.1, -0.273],
  [0.2, -0.21271],
  [0.3, -0.16597],
  [0.5, -0.09937],
  [0.7, -0.05616],
  [1, -0.0163],
  [1.2, 0.00056],
  [1.5, 0.01751],
  [2, 0.03344],
  [2.5, 0.04162],
  [3, 0.04597],
  [4, 0.04941],
  [5, 0.04984],
  [7, 0.04798],
  [10, 0.04404],
  [15, 0.03849],
  [20, 0.03443],
  [30, 0.029],
  [50, 0.02303],
  [100, 0.01669],
  [200, 0.01215],
  [375, 0.00922],
  [1000, 0.00621],
  [3000, 0.00422],
  [10_000, 0.00294],
  [100_000, 0.00171],
];

/** Limit of a rod without length, a disc on the ground: (1/2π)/(1/4) − 1. */
const DISC = 2 / Math.PI - 1;

/** Largest of the rod's figures. */
const LARGEST = 0.0504;

export interface Excess {
  /** Smallest and largest value/true − 1 that the comparison leaves open. */
  readonly least: number;
  readonly most: number;
}

/** For one vertical rod from the surface, or a straight wire in free soil of half that length; slenderness = length/radius. */
export function rodExcess(slenderness: number): Excess {
  const middle = interpolated(ROD, slenderness);
  if (middle === null) {
    if (slenderness < ROD[0][0]) return { least: DISC, most: ROD[0][1] };
    // Beyond the last figure the excess falls like 1/ln², which the last figure continues from above.
    const last = ROD[ROD.length - 1];
    const fall = (Math.log(4 * last[0]) - 1) / (Math.log(4 * slenderness) - 1);
    return { least: 0, most: last[1] * fall * fall * 1.03 };
  }
  const margin = 0.03 * Math.abs(middle) + 0.0005;
  return { least: middle - margin, most: middle + margin };
}

/**
 * For n equal parallel rods (or a wire with its image) of that length and radius: `spacing` between neighbours,
 * `meanDistance` the geometric mean of all distances with the radius as a rod's own. Safe rules, checked by a comparison
 * with rods of many segments (kept as a test): far apart each rod is nearly on its own; close together the group is a
 * rod as thick as its mean distance.
 */
export function parallelRodsExcess(
  length: number,
  radius: number,
  spacing: number,
  meanDistance: number,
  pair: boolean,
): number {
  const single = rodExcess(length / radius).most;
  const together = 1.25 * largestExcess(length / meanDistance);
  if (spacing >= length) return Math.min(together, 1.25 * Math.max(single, 0));
  return pair && spacing >= 0.6 * length ? Math.min(together, 2 * Math.max(single, 0)) : together;
}

/** The rod's largest excess, never less for a stouter rod. */
function largestExcess(slenderness: number): number {
  return slenderness <= 7 ? LARGEST : rodExcess(slenderness).most;
}

/** Arm length over wire radius of a star, and the largest value/true − 1 at any depth, by the number of its arms. */
const STAR_SLENDERNESS = [5, 10, 20, 50, 100, 300, 1000, 3000, 10_000, 100_000, 1_000_000];
const STAR: Readonly<Record<number, readonly number[]>> = {
  2: [0.0621, 0.0609, 0.0493, 0.0348, 0.0265, 0.0177, 0.012, 0.0089, 0.0068, 0.0045, 0.0032],
  3: [0.1182, 0.1053, 0.0836, 0.0601, 0.0472, 0.0332, 0.0237, 0.0183, 0.0145, 0.01, 0.0073],
  4: [0.1685, 0.1549, 0.1269, 0.0954, 0.0774, 0.0572, 0.0428, 0.0344, 0.028, 0.0201, 0.0152],
  6: [0.2351, 0.2301, 0.1998, 0.1593, 0.1349, 0.1058, 0.0835, 0.0702, 0.0592, 0.0448, 0.0351],
  8: [0.2801, 0.2793, 0.2529, 0.2094, 0.1818, 0.148, 0.1211, 0.1041, 0.0897, 0.0701, 0.0566],
};

/**
 * Largest value/true − 1 of a star of buried wires at any depth, by a comparison with arms of many segments (kept as a
 * test), whose own error at stout wires (up to 2 % at 10 radii) the margin covers.
 */
export function starExcess(arms: number, slenderness: number): number {
  const figures = STAR[arms].map((excess, i) => [STAR_SLENDERNESS[i], excess] as const);
  const inside = interpolated(figures, slenderness);
  const excess =
    inside ?? (slenderness < figures[0][0] ? figures[0][1] + 0.1 : figures[figures.length - 1][1]);
  return 1.05 * excess + (slenderness < 20 ? 0.03 : 0.005);
}

/** Straight between the figures over ln x; null outside of them. */
function interpolated(figures: readonly (readonly [number, number])[], x: number): number | null {
  const last = figures.length - 1;
  if (!(x >= figures[0][0]) || x > figures[last][0]) return null;
  let i = 0;
  while (i < last - 1 && x > figures[i + 1][0]) i++;
  const [x0, y0] = figures[i];
  const [x1, y1] = figures[i + 1];
  return y0 + ((y1 - y0) * Math.log(x / x0)) / Math.log(x1 / x0);
}

/**
 * Part of ρ/2πL by which two or more round conductors side by side lie below the value of thin ones, because the charge
 * moves away from the neighbours: Σ (a·field of the neighbours)², field Σ 1/s; for a pair at most (a/s)² each.
 */
export function proximityShift(radius: number, neighbourField: number): number {
  return (radius * neighbourField) ** 2;
}

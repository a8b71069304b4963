/**
 * Image charges of two spheres (Thomson's method, from memory): an independent route to their charges, and the field
 * where they come nearest to each other.
 */

/** Images are followed until they fall below this share of the first, or to the cap. */
const SMALLEST = 1e-17;
const MOST_IMAGES = 4000;

export interface Image {
  /** Distance from the centre of the first sphere towards the second, m. */
  readonly place: number;
  /** Charge in units of 4πε·V·m. */
  readonly charge: number;
}

export interface Images {
  readonly first: readonly Image[];
  readonly second: readonly Image[];
  /** False where the cap was met, so near touching that the charges fall off too slowly. */
  readonly complete: boolean;
}

/**
 * Images of spheres of radii a and b, surfaces `gap` apart, at potentials u and v volts, sphere by sphere.
 * Places are measured as depth below the pole that faces the other sphere, so that a small gap keeps its digits.
 */
export function sphereImages(a: number, b: number, gap: number, u: number, v: number): Images {
  const first: Image[] = [];
  const second: Image[] = [];
  let complete = true;
  const follow = (radius: number, other: number, potential: number, own: Image[], others: Image[]) => {
    let depth = radius;
    let charge = potential * radius;
    let reference = Math.abs(charge);
    let [mine, theirs, here, there] = [own, others, radius, other];
    for (let n = 0; reference > 0 && n < MOST_IMAGES; n++) {
      mine.push({ place: depth, charge });
      if (Math.abs(charge) < SMALLEST * reference) return;
      // Seen from the other sphere's centre the charge is at distance `there` + gap + depth; its image lies at
      // there²/distance, so at depth there − there²/distance = there·(gap + depth)/distance below the facing pole.
      const distance = there + gap + depth;
      charge *= -there / distance;
      depth = (there / distance) * (gap + depth);
      [mine, theirs, here, there] = [theirs, mine, there, here];
      reference = Math.max(reference, Math.abs(charge));
    }
    if (reference > 0) complete = false;
  };
  follow(a, b, u, first, second);
  follow(b, a, v, second, first);
  return { first, second, complete };
}

/** Total charge of a sphere's images. */
export function totalCharge(images: readonly Image[]): number {
  let sum = 0;
  for (let n = images.length - 1; n >= 0; n--) sum += images[n].charge;
  return sum;
}

/** Field at the facing pole of the first sphere, towards the second, V/m. */
export function poleField({ first, second }: Images, gap: number): number {
  let field = 0;
  for (const { place, charge } of first) field += charge / place / place;
  for (const { place, charge } of second) field -= charge / (gap + place) / (gap + place);
  return field;
}

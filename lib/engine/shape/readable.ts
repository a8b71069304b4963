/**
 * A drawing that can be read whatever the proportions: where the sizes of a shape span decades, those far apart are
 * brought closer, in order and without touching the ratios that are already readable, before the shape draws itself.
 */
import type { Dimensions, Resolved, Shape } from "./define-shape";
import type { Drawing } from "./drawing";

export interface ReadableDrawing {
  readonly drawing: Drawing;
  /** Whether the drawing has the true proportions. */
  readonly toScale: boolean;
  /** The dimensions that were drawn, SI and radians. */
  readonly drawn: Resolved<Dimensions>;
}

/** Ratio of the largest to the smallest size that a drawing of a few hundred pixels still shows. */
const READABLE_SPAN = 30;
/** Largest ratios of neighbouring sizes tried, mildest change last: a constraint of the shape may need more room. */
const GAPS = [3, 4.5, 7, 12, 20, 40, 100, 1000] as const;
/** Smallest angle that can be told from a line, radians. */
const SMALLEST_ANGLE = Math.PI / 12;

/**
 * Draws a shape readably.
 * @param dimensions resolved dimensions (SI, radians), as `resolveDimensions` gives them
 */
export function readableDrawing(shape: Shape, dimensions: Resolved<Dimensions>): ReadableDrawing {
  const drawn = readableDimensions(shape, dimensions);
  return { drawing: shape.drawing(drawn), toScale: drawn === dimensions, drawn };
}

/** The dimensions to draw: the very same object where they are readable as they are. */
export function readableDimensions(shape: Shape, dimensions: Resolved<Dimensions>): Resolved<Dimensions> {
  const basis = independent(shape, dimensions);
  const sizes = new Map<string, number>();
  const angles = new Map<string, number>();
  for (const name of basis) {
    const dimension = shape.dimensions[name];
    const value = dimensions[name];
    if (dimension.type !== "quantity" || typeof value !== "number" || !(value > 0)) continue;
    if (dimension.kind === "angle") angles.set(name, value);
    else sizes.set(name, dimension.kind === "area" ? Math.sqrt(value) : value);
  }
  const smallAngles = [...angles].filter(([, value]) => value < SMALLEST_ANGLE);
  const all = [...sizes.values()];
  const spread = all.length > 1 ? Math.max(...all) / Math.min(...all) : 1;
  if (spread <= READABLE_SPAN && smallAngles.length === 0) return dimensions;
  for (const gap of GAPS) {
    const changed: Record<string, number | string> = { ...dimensions };
    for (const [name, size] of spread <= READABLE_SPAN ? [] : compress(sizes, gap)) {
      changed[name] = isArea(shape, name) ? size * size : size;
    }
    for (const [name] of smallAngles) changed[name] = SMALLEST_ANGLE;
    const candidate = rederive(shape, changed, basis);
    if (shape.constraints.every((constraint) => constraint.holds(candidate))) return candidate;
  }
  return dimensions;
}

/**
 * One member of each group of alternatives stands for it, the smallest: a thin wall is what must stay visible, and the
 * outer radius follows from it.
 */
function independent(shape: Shape, dimensions: Resolved<Dimensions>): readonly string[] {
  const dropped = new Set<string>();
  for (const { names } of shape.alternatives) {
    const sized = names.filter((name) => typeof dimensions[name] === "number");
    const smallest = sized.reduce(
      (best, name) => (Number(dimensions[name]) < Number(dimensions[best]) ? name : best),
      sized[0],
    );
    for (const name of names) if (name !== smallest) dropped.add(name);
  }
  return Object.keys(shape.dimensions).filter((name) => !dropped.has(name));
}

/** Sizes in order, each at most `gap` times the one before. */
function compress(sizes: ReadonlyMap<string, number>, gap: number): Map<string, number> {
  const ordered = [...sizes].sort((a, b) => a[1] - b[1]);
  const compressed = new Map<string, number>();
  let before = 0;
  let shown = 1;
  for (const [name, size] of ordered) {
    if (before > 0) shown *= Math.min(size / before, gap);
    before = size;
    compressed.set(name, shown);
  }
  return compressed;
}

function isArea(shape: Shape, name: string): boolean {
  const dimension = shape.dimensions[name];
  return dimension.type === "quantity" && dimension.kind === "area";
}

/** The other members of each group of alternatives, from the changed ones. */
function rederive(
  shape: Shape,
  changed: Record<string, number | string>,
  basis: readonly string[],
): Resolved<Dimensions> {
  const resolved = changed as Resolved<Dimensions>;
  for (const { names, derive } of shape.alternatives) {
    for (const name of names) {
      const compute = (derive as Readonly<Record<string, ((d: Resolved<Dimensions>) => number) | undefined>>)[
        name
      ];
      if (!basis.includes(name) && compute) changed[name] = compute(resolved);
    }
  }
  return resolved;
}

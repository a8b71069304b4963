/**
 * Electrodes of thin wires cut into many segments, each with its own current and all at one potential: the comparison
 * for the average-potential values, whose current is even. Resistances over resistivity, 1/m. The shortest segments are
 * 1.25 radii: against a solution of the whole surface of a rod the result is then good to 0.1 % at 20 radii and better
 * for thinner ones.
 */
import { gaussLegendre } from "@/lib/engine/numeric/gauss-legendre";
import { solveInPlace } from "@/lib/engine/numeric/lu-solve";

const FINEST = 1.25;
type Borders = readonly number[];

/** Φ(x) with ∂²Φ/∂x² = 1/√(x²+d²): its second differences are the means over pairs of segments. */
const phi = (x: number, d: number) => x * Math.asinh(x / d) - Math.hypot(x, d);

/** Mean of 1/√((z−b)²+d²) over two segments on parallel lines at distance d. */
function pairMean(p0: number, p1: number, q0: number, q1: number, d: number): number {
  const sum = phi(p1 - q0, d) - phi(p1 - q1, d) - phi(p0 - q0, d) + phi(p0 - q1, d);
  return sum / (p1 - p0) / (q1 - q0);
}

/** Borders from 0 to length, growing away from the end at `length`. */
export function gradedToEnd(length: number, finest: number, growth = 1.6): Borders {
  const distances = [0];
  for (let step = finest; distances[distances.length - 1] + 1.5 * step < length; step *= growth) {
    distances.push(distances[distances.length - 1] + step);
  }
  distances.push(length);
  return distances.map((d) => length - d).reverse();
}

const bothEnds = (half: number, finest: number): Borders => {
  const right = gradedToEnd(half, finest);
  return [
    ...right
      .slice(1)
      .map((x) => -x)
      .reverse(),
    ...right,
  ];
};

function resistance(size: number, mean: (i: number, j: number) => number): number {
  const matrix = new Float64Array(size * size);
  for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) matrix[i * size + j] = mean(i, j);
  const currents = solveInPlace(matrix, new Float64Array(size).fill(1));
  return 1 / (4 * Math.PI * currents.reduce((sum, current) => sum + current, 0));
}

/** Equal rods from the surface at given places. */
export function rods(length: number, radius: number, places: readonly (readonly [number, number])[]): number {
  const z = gradedToEnd(length, FINEST * radius, places.length > 4 ? 2.2 : 1.6);
  const m = z.length - 1;
  const tables = new Map<string, Float64Array>();
  const table = (d: number): Float64Array => {
    const key = d.toPrecision(10);
    const known = tables.get(key);
    if (known) return known;
    const made = new Float64Array(m * m);
    for (let i = 0; i < m; i++) {
      for (let j = 0; j < m; j++) {
        made[i * m + j] =
          pairMean(z[i], z[i + 1], z[j], z[j + 1], d) + pairMean(z[i], z[i + 1], -z[j + 1], -z[j], d);
      }
    }
    tables.set(key, made);
    return made;
  };
  return resistance(places.length * m, (i, j) => {
    const [a, b] = [places[Math.floor(i / m)], places[Math.floor(j / m)]];
    const d = Math.hypot(a[0] - b[0], a[1] - b[1]);
    return table(d === 0 ? radius : d)[(i % m) * m + (j % m)];
  });
}

/** A straight horizontal wire of the given half length. */
export function wire(half: number, radius: number, depth: number): number {
  const x = bothEnds(half, FINEST * radius);
  return resistance(
    x.length - 1,
    (i, j) =>
      pairMean(x[i], x[i + 1], x[j], x[j + 1], radius) + pairMean(x[i], x[i + 1], x[j], x[j + 1], 2 * depth),
  );
}

const RULE = gaussLegendre(20);

/** Mean of 1/distance between [p0, p1] and [q0, q1] on two arms that leave one axis at an angle, planes d apart. */
export function armMean(p0: number, p1: number, q0: number, q1: number, angle: number, d: number): number {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  let sum = 0;
  // Towards the common point the inner integral changes over ever shorter distances.
  const ends = p0 === 0 ? Array.from({ length: 27 }, (_, k) => (k === 0 ? 0 : p1 * 2 ** (k - 26))) : [p0, p1];
  for (let piece = 1; piece < ends.length; piece++) {
    const [from, to] = [ends[piece - 1], ends[piece]];
    for (let k = 0; k < RULE.nodes.length; k++) {
      const x = from + (to - from) * RULE.nodes[k];
      const reach = Math.hypot(x * s, d);
      sum +=
        (to - from) * RULE.weights[k] * (Math.asinh((q1 - x * c) / reach) - Math.asinh((q0 - x * c) / reach));
    }
  }
  return sum / (p1 - p0) / (q1 - q0);
}

/** A star of equal arms at these angles, the first 0; all arms alike. */
export function star(angles: readonly number[], length: number, radius: number, depth: number): number {
  const half = gradedToEnd(length / 2, FINEST * radius, 2);
  const x = [...half.map((t) => length / 2 - t).reverse(), ...half.slice(1).map((t) => length / 2 + t)];
  return (
    resistance(x.length - 1, (i, j) => {
      let sum = 0;
      for (const d of [radius, 2 * depth]) {
        sum += pairMean(x[i], x[i + 1], x[j], x[j + 1], d);
        for (const angle of angles.slice(1)) sum += armMean(x[i], x[i + 1], x[j], x[j + 1], angle, d);
      }
      return sum;
    }) / angles.length
  );
}

/** A square grid of `meshes` by `meshes`, each side cut into `cuts`; potentials at the middles of the segments. */
export function grid(side: number, meshes: number, depth: number, radius: number, cuts: number): number {
  const segments: { x: number; y: number; along: boolean }[] = [];
  const step = side / meshes / cuts;
  for (let line = 0; line <= meshes; line++) {
    for (let k = 0; k < meshes * cuts; k++) {
      segments.push({ x: k * step, y: (side * line) / meshes, along: true });
      segments.push({ x: (side * line) / meshes, y: k * step, along: false });
    }
  }
  return resistance(segments.length, (i, j) => {
    const [field, source] = [segments[i], segments[j]];
    const mx = field.x + (field.along ? step / 2 : 0);
    const my = field.y + (field.along ? 0 : step / 2);
    const t = source.along ? mx - source.x : my - source.y;
    const beside = source.along ? my - source.y : mx - source.x;
    return [radius, 2 * depth].reduce((sum, off) => {
      const d = Math.hypot(beside, off);
      return sum + (Math.asinh(t / d) - Math.asinh((t - step) / d)) / step;
    }, 0);
  });
}

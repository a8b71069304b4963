import type { FieldMesh } from "@/lib/engine/field/mesh/mesh";

/** Terminal of a boundary edge by its midpoint, or -1. */
export type TerminalAt = (x: number, y: number) => number;

/** A structured mesh of square cells, each cut in two, over the cells that `inside` selects. */
export function cellMesh(
  columns: number,
  rows: number,
  size: number,
  inside: (i: number, j: number) => boolean,
  terminal: TerminalAt,
): FieldMesh {
  const number = new Map<string, number>();
  const xy: number[] = [];
  const vertex = (i: number, j: number): number => {
    const key = `${i},${j}`;
    const known = number.get(key);
    if (known !== undefined) return known;
    number.set(key, xy.length / 2);
    xy.push(i * size, j * size);
    return xy.length / 2 - 1;
  };
  const triangles: number[] = [];
  for (let j = 0; j < rows; j++) {
    for (let i = 0; i < columns; i++) {
      if (!inside(i, j)) continue;
      const [a, b, c, d] = [vertex(i, j), vertex(i + 1, j), vertex(i + 1, j + 1), vertex(i, j + 1)];
      if ((i + j) % 2 === 0) triangles.push(b, c, a, d, a, c);
      else triangles.push(a, b, d, c, d, b);
    }
  }
  return withBoundary(Float64Array.from(xy), Int32Array.from(triangles), terminal);
}

/** Finds the boundary of a list of triangles and its sides. */
export function withBoundary(xy: Float64Array, triangles: Int32Array, terminal: TerminalAt): FieldMesh {
  const edges = new Map<string, [number, number]>();
  for (let h = 0; h < triangles.length; h++) {
    const base = h - (h % 3);
    const a = triangles[h];
    const b = triangles[base + ((h + 1) % 3)];
    if (!edges.delete(`${b},${a}`)) edges.set(`${a},${b}`, [a, b]);
  }
  const next = new Map([...edges.values()]);
  const boundary: number[] = [];
  const sides: { ring: number; terminal: number }[] = [];
  const seen = new Set<number>();
  let ring = 0;
  for (const start of [...next.keys()].sort((p, q) => p - q)) {
    if (seen.has(start)) continue;
    let last = NaN;
    let a = start;
    do {
      seen.add(a);
      const b = next.get(a);
      if (b === undefined) throw new Error("boundary is not closed");
      const t = terminal((xy[2 * a] + xy[2 * b]) / 2, (xy[2 * a + 1] + xy[2 * b + 1]) / 2);
      if (t !== last) sides.push({ ring, terminal: t });
      last = t;
      boundary.push(a, b, sides.length - 1);
      a = b;
    } while (a !== start);
    ring++;
  }
  return {
    xy,
    triangles,
    region: new Int32Array(triangles.length / 3),
    boundary: Int32Array.from(boundary),
    sides,
  };
}

const near = (a: number, b: number): boolean => Math.abs(a - b) < 1e-9;

/** The unit square, terminals 0 and 1 on its left and right side. */
export function squareMesh(n: number): FieldMesh {
  return cellMesh(
    n,
    n,
    1 / n,
    () => true,
    (x) => (near(x, 0) ? 0 : near(x, 1) ? 1 : -1),
  );
}

/** An L of width 1 and outer length 3 in cells of 1/n (domain scaled by 1/3), terminals at both ends. */
export function bendMesh(n: number): FieldMesh {
  const size = 1 / (3 * n);
  const width = 1 / 3;
  return cellMesh(
    3 * n,
    3 * n,
    size,
    (i, j) => i < n || j < n,
    (x, y) => (near(x, 1) && y < width ? 0 : near(y, 1) && x < width ? 1 : -1),
  );
}

/** The unit square with a square hole from 0.4 to 0.6 in cells of 1/n, n a multiple of 5. */
export function holedMesh(n: number, terminal: TerminalAt): FieldMesh {
  const cut = (k: number): boolean => k >= 0.4 * n - 1e-9 && k < 0.6 * n - 1e-9;
  return cellMesh(n, n, 1 / n, (i, j) => !(cut(i) && cut(j)), terminal);
}

export function onHole(x: number, y: number): boolean {
  return x > 0.39 && x < 0.61 && y > 0.39 && y < 0.61;
}

import type { FieldMesh } from "./mesh";
import { edgeTable } from "./bisect";
import { orient } from "./predicates";

export interface MeshReport {
  /** Empty for a sound mesh; otherwise sentences. */
  readonly faults: readonly string[];
  readonly area: number;
  /** Smallest angle of all triangles, in degrees. */
  readonly minimumAngleDeg: number;
  /** The same among triangles with an angle above 100°, which alone harm a solution; 180 if there are none. */
  readonly minimumObtuseDeg: number;
  readonly triangles: number;
  readonly vertices: number;
}

/**
 * Checks what every mesh must keep: counter-clockwise triangles, every edge shared by two triangles or a boundary edge,
 * Euler's characteristic, closed boundary loops with the conductor on their left, area enclosed by the boundary equal to
 * the area of the triangles, each side one run of one ring, every vertex in use. For tests.
 */
export function validateMesh(mesh: FieldMesh): MeshReport {
  const faults: string[] = [];
  const { xy, triangles, boundary } = mesh;
  const vertices = xy.length / 2;
  const count = triangles.length / 3;
  if (mesh.region.length !== count) faults.push("the media do not match the triangles");
  let area = 0;
  let smallest = 180;
  let obtuse = 180;
  for (let t = 0; t < count; t++) {
    const twice = orientOf(xy, triangles, t);
    if (!(twice > 0)) faults.push(`triangle ${t} is not counter-clockwise`);
    area += twice / 2;
    const [least, greatest] = angleRangeDeg(xy, triangles, t);
    smallest = Math.min(smallest, least);
    if (greatest > 100) obtuse = Math.min(obtuse, least);
  }
  for (let i = 0; i < xy.length; i++)
    if (!Number.isFinite(xy[i])) faults.push(`coordinate ${i} is not finite`);
  checkEdges(mesh, faults);
  checkVertices(mesh, faults);
  checkSides(mesh, faults);
  const enclosed = shoelace(mesh);
  if (Math.abs(enclosed - area) > 1e-13 * (1 + boundary.length / 100)) {
    faults.push(`the boundary encloses ${enclosed}, the triangles ${area}`);
  }
  return { faults, area, minimumAngleDeg: smallest, minimumObtuseDeg: obtuse, triangles: count, vertices };
}

function orientOf(xy: Float64Array, triangles: Int32Array, t: number): number {
  const a = triangles[3 * t];
  const b = triangles[3 * t + 1];
  const c = triangles[3 * t + 2];
  return orient(xy[2 * a], xy[2 * a + 1], xy[2 * b], xy[2 * b + 1], xy[2 * c], xy[2 * c + 1]);
}

/** Smallest and largest angle of triangle t in degrees. */
function angleRangeDeg(xy: Float64Array, triangles: Int32Array, t: number): [number, number] {
  let smallest = Math.PI;
  let largest = 0;
  for (let i = 0; i < 3; i++) {
    const a = triangles[3 * t + i];
    const b = triangles[3 * t + ((i + 1) % 3)];
    const c = triangles[3 * t + ((i + 2) % 3)];
    const px = xy[2 * b] - xy[2 * a];
    const py = xy[2 * b + 1] - xy[2 * a + 1];
    const qx = xy[2 * c] - xy[2 * a];
    const qy = xy[2 * c + 1] - xy[2 * a + 1];
    const angle = Math.abs(Math.atan2(px * qy - py * qx, px * qx + py * qy));
    smallest = Math.min(smallest, angle);
    largest = Math.max(largest, angle);
  }
  return [(smallest * 180) / Math.PI, (largest * 180) / Math.PI];
}

function checkEdges(mesh: FieldMesh, faults: string[]): void {
  const { triangles, boundary } = mesh;
  const seen = new Map<number, number>();
  const vertices = mesh.xy.length / 2;
  for (let h = 0; h < triangles.length; h++) {
    const base = h - (h % 3);
    const key = triangles[base + ((h + 1) % 3)] * vertices + triangles[base + ((h + 2) % 3)];
    if (seen.has(key)) faults.push(`two triangles lie on the same side of edge ${key}`);
    seen.set(key, h);
  }
  let single = 0;
  for (const key of seen.keys()) {
    const a = Math.floor(key / vertices);
    if (!seen.has((key - a * vertices) * vertices + a)) single++;
  }
  if (single !== boundary.length / 3)
    faults.push(`${single} open edges, ${boundary.length / 3} in the boundary`);
  for (let i = 0; i < boundary.length; i += 3) {
    const forward = seen.has(boundary[i] * vertices + boundary[i + 1]);
    const back = seen.has(boundary[i + 1] * vertices + boundary[i]);
    if (!forward || back) faults.push(`boundary edge ${i / 3} has not the conductor on its left alone`);
  }
}

function checkVertices(mesh: FieldMesh, faults: string[]): void {
  const { triangles, boundary } = mesh;
  const vertices = mesh.xy.length / 2;
  const used = new Uint8Array(vertices);
  for (const v of triangles) used[v] = 1;
  if (used.includes(0)) faults.push("a vertex belongs to no triangle");
  const next = new Map<number, number>();
  const arrivals = new Set<number>();
  for (let i = 0; i < boundary.length; i += 3) {
    if (next.has(boundary[i]) || arrivals.has(boundary[i + 1]))
      faults.push("two boundaries meet in a vertex");
    next.set(boundary[i], boundary[i + 1]);
    arrivals.add(boundary[i + 1]);
  }
  let loops = 0;
  const visited = new Set<number>();
  for (const start of next.keys()) {
    if (visited.has(start)) continue;
    loops++;
    let v: number | undefined = start;
    while (v !== undefined && !visited.has(v)) {
      visited.add(v);
      v = next.get(v);
    }
    if (v !== start) faults.push("a boundary loop does not close");
  }
  const rings = new Set(mesh.sides.map((side) => side.ring)).size;
  if (loops !== rings) faults.push(`${loops} boundary loops, ${rings} rings`);
  const edges = edgeTable(triangles, vertices).count;
  const euler = vertices - edges + triangles.length / 3;
  // A disc with n holes has characteristic 1 − n.
  if (euler !== 2 - rings) faults.push(`Euler's characteristic is ${euler}, should be ${2 - rings}`);
}

function checkSides(mesh: FieldMesh, faults: string[]): void {
  const { boundary, sides } = mesh;
  const covered = new Set<number>();
  for (let i = 0; i < boundary.length; i += 3) {
    const s = boundary[i + 2];
    const continues = i > 0 && boundary[i - 1] === s;
    if (continues && boundary[i - 2] !== boundary[i]) faults.push(`side ${s} is not one run`);
    if (!continues && covered.has(s)) faults.push(`side ${s} comes twice`);
    if (s < 0 || s >= sides.length) faults.push(`there is no side ${s}`);
    covered.add(s);
  }
  if (covered.size !== sides.length) faults.push("a side has no edge");
}

/** Area to the left of the boundary. */
function shoelace(mesh: FieldMesh): number {
  const { xy, boundary } = mesh;
  let twice = 0;
  for (let i = 0; i < boundary.length; i += 3) {
    const a = boundary[i];
    const b = boundary[i + 1];
    twice += xy[2 * a] * xy[2 * b + 1] - xy[2 * b] * xy[2 * a + 1];
  }
  return twice / 2;
}

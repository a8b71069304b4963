import type { Domain } from "../outline/domain";
import { constrain } from "./constrain";
import { insertionOrder } from "./insertion-order";
import { nextEdge, Triangulation } from "./triangulation";

/** The first four vertices of a triangulation are the far corners around it. */
export const FAR_VERTICES = 4;

/** Vertices 4… of the answer are the domain's points in their order, joined by all its segments; nothing is removed. */
export function triangulateGraph(domain: Domain): Triangulation {
  const count = domain.xy.length / 2;
  const mesh = new Triangulation(count);
  insertPoints(mesh, domain.xy);
  const { segments } = domain;
  for (let s = 0; s < segments.length / 2; s++) {
    constrainThrough(mesh, segments[2 * s] + FAR_VERTICES, segments[2 * s + 1] + FAR_VERTICES, s + 1);
  }
  return mesh;
}

/**
 * Inserts points as vertices 4…. Answers the pairs (point, earlier point) that coincide; the later one of a pair is
 * stored, but not connected.
 */
export function insertPoints(mesh: Triangulation, xy: Float64Array): Array<[number, number]> {
  const count = xy.length / 2;
  for (let i = 0; i < count; i++) mesh.addVertex(xy[2 * i], xy[2 * i + 1]);
  const order = insertionOrder(xy, count);
  const coincident: Array<[number, number]> = [];
  let hint = 0;
  for (let k = 0; k < count; k++) {
    const i = order[k];
    const x = xy[2 * i];
    const y = xy[2 * i + 1];
    const t = mesh.locate(x, y, hint, false);
    if (t < 0) throw new Error("point outside the frame");
    const twinVertex = vertexAt(mesh, t, x, y);
    if (twinVertex >= 0) {
      coincident.push([i, twinVertex - FAR_VERTICES]);
      continue;
    }
    mesh.openCavity(x, y, t, -1);
    mesh.fill(i + FAR_VERTICES, -1, -1, 0);
    hint = mesh.created[0];
  }
  return coincident;
}

function vertexAt(mesh: Triangulation, t: number, x: number, y: number): number {
  for (let h = 3 * t; h < 3 * t + 3; h++) {
    const v = mesh.corner[h];
    if (mesh.xy[2 * v] === x && mesh.xy[2 * v + 1] === y) return v;
  }
  return -1;
}

/** Constrains a–b piece by piece through the vertices that lie on it. */
function constrainThrough(mesh: Triangulation, a: number, b: number, mark: number): void {
  let from = a;
  let to = b;
  const waiting: number[] = [];
  for (;;) {
    const obstacle = constrain(mesh, from, to, mark);
    if (obstacle === null) {
      from = to;
      const next = waiting.pop();
      if (next === undefined) return;
      to = next;
    } else if (obstacle.kind === "vertex") {
      waiting.push(to);
      to = obstacle.vertex;
    } else {
      throw new Error("segments of the domain cross");
    }
  }
}

/** A region that covers part of another one, or, where `other` is -1, something outside the conductor. */
export interface RegionFault {
  readonly region: number;
  readonly other: number;
}

/**
 * Removes everything outside the conductor and labels each triangle with its medium: 0, or the number of the region.
 * Answers what is wrong with the regions; nothing, for a checked domain.
 */
export function carveDomain(mesh: Triangulation, domain: Domain): RegionFault[] {
  const { segmentSide, segmentRegion } = domain;
  const { label } = mesh;
  label.fill(-1);
  const inside: number[] = [];
  const byRegion = new Map<number, number[]>();
  for (let h = 0; h < 3 * mesh.triangleSlots; h++) {
    if (mesh.corner[h] < 0 || mesh.mark[h] === 0) continue;
    const s = mesh.mark[h] - 1;
    const along = runsAlong(mesh, domain, h, s);
    if (segmentSide[s] >= 0 && along) inside.push((h / 3) | 0);
    const region = segmentRegion[2 * s + (along ? 0 : 1)];
    if (region === 0) continue;
    const list = byRegion.get(region);
    if (list) list.push((h / 3) | 0);
    else byRegion.set(region, [(h / 3) | 0]);
  }
  flood(mesh, inside, 0, (s) => segmentSide[s] >= 0);
  const faults: RegionFault[] = [];
  for (const [region, seeds] of byRegion) {
    const isOwnBorder = (s: number): boolean =>
      segmentSide[s] >= 0 || segmentRegion[2 * s] === region || segmentRegion[2 * s + 1] === region;
    const other = flood(mesh, seeds, region, isOwnBorder);
    if (other !== 0) faults.push({ region, other });
  }
  mesh.carve();
  return faults;
}

/** Whether half-edge h, a piece of segment s, has the segment's direction. */
function runsAlong(mesh: Triangulation, domain: Domain, h: number, s: number): boolean {
  const { xy } = mesh;
  const a = mesh.corner[h];
  const b = mesh.corner[nextEdge(h)];
  const p = domain.segments[2 * s] + FAR_VERTICES;
  const q = domain.segments[2 * s + 1] + FAR_VERTICES;
  const dx = xy[2 * q] - xy[2 * p];
  const dy = xy[2 * q + 1] - xy[2 * p + 1];
  return (xy[2 * b] - xy[2 * a]) * dx + (xy[2 * b + 1] - xy[2 * a + 1]) * dy > 0;
}

/**
 * Gives a label to all triangles that can be reached from the seeds without crossing a wall (a segment). Answers a
 * label other than 0 that was there before, or 0.
 */
function flood(mesh: Triangulation, seeds: number[], value: number, isWall: (s: number) => boolean): number {
  const { label, twin, mark } = mesh;
  const stack: number[] = [];
  let other = 0;
  const visit = (t: number): void => {
    if (label[t] === value) return;
    if (label[t] !== 0) other = label[t];
    label[t] = value;
    stack.push(t);
  };
  for (const t of seeds) visit(t);
  while (stack.length > 0) {
    const t = stack.pop() as number;
    for (let h = 3 * t; h < 3 * t + 3; h++) {
      if (twin[h] < 0 || (mark[h] !== 0 && isWall(mark[h] - 1))) continue;
      visit((twin[h] / 3) | 0);
    }
  }
  return other;
}

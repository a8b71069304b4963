import { constrain } from "./constrain";
import { FAR_VERTICES } from "./planar-graph";
import { nextEdge, previousEdge, type Triangulation } from "./triangulation";

/** Added to the label of a triangle that spans a channel: refinement for quality leaves it alone. */
export const FROZEN = 1 << 24;

/** Widths left free at each end of a channel: there the field settles, by a factor e^-π for each width. */
const MARGIN = 4;
/** Least length of what remains, in widths. */
const LEAST_LENGTH = 6;
/** Width times radius at the two ends of a cell differ by no more than this ratio: in a taper the potential goes like a logarithm. */
const TAPER = 1.4;
const MOST_CELLS = 64;
const MOST_PASSES = 40;
/** Triangles that may lie between the two borders before; more are not looked through. */
const MOST_BETWEEN = 256;

/**
 * Long straight stretches between two nearly parallel borders would take triangles in proportion to length over width, for
 * a field that is almost linear there. So they are closed off by cuts across, some widths from either end, and spanned
 * by pairs of long right-angled triangles: few, with no obtuse angle, and never refined for their small ones.
 *
 * Expects a carved triangulation. Answers the cuts as pairs of points (vertex less FAR_VERTICES); cut k is marked as
 * constraint `firstMark + k`.
 */
export function spanChannels(mesh: Triangulation, firstMark: number, axisymmetric: boolean): number[] {
  const builder = new ChannelBuilder(mesh, firstMark, axisymmetric);
  for (let pass = 0; pass < MOST_PASSES; pass++) if (!builder.sweep()) break;
  return builder.cuts;
}

/** Two facing border edges: p→q below, and r→s above, which runs the other way; all as positions along p→q. */
interface Facing {
  readonly p: number;
  readonly q: number;
  readonly r: number;
  readonly s: number;
  /** Positions of the cuts along p→q, at least two. */
  readonly stations: number[];
}

class ChannelBuilder {
  readonly cuts: number[] = [];

  constructor(
    private readonly mesh: Triangulation,
    private readonly firstMark: number,
    private readonly axisymmetric: boolean,
  ) {}

  /** One look at every border edge; true when some channel was found. */
  sweep(): boolean {
    const { mesh } = this;
    let found = false;
    for (let h = 0; h < 3 * mesh.triangleSlots; h++) {
      if (mesh.corner[h] < 0 || mesh.twin[h] >= 0 || mesh.label[(h / 3) | 0] >= FROZEN) continue;
      if (mesh.twin[previousEdge(h)] < 0) found = this.closeTip(h) || found;
      else found = this.spanFrom(h) || found;
    }
    return found;
  }

  /** Looks for a channel between border edge h and one of the two border edges at the apex of its triangle. */
  private spanFrom(h: number): boolean {
    const { mesh } = this;
    const { corner, xy, twin } = mesh;
    const [p, q, v] = [corner[h], corner[nextEdge(h)], corner[previousEdge(h)]];
    const [ux, uy] = [xy[2 * q] - xy[2 * p], xy[2 * q + 1] - xy[2 * p + 1]];
    const height = ux * (xy[2 * v + 1] - xy[2 * p + 1]) - uy * (xy[2 * v] - xy[2 * p]);
    if (height * LEAST_LENGTH > ux * ux + uy * uy) return false;
    // Round the apex to its border, both ways.
    const first = nextEdge(nextEdge(h));
    let out = first;
    while (twin[out] >= 0) {
      out = nextEdge(twin[out]);
      // An apex inside the conductor (a corner of a region) has no border.
      if (out === first) return false;
    }
    let into = nextEdge(h);
    while (twin[into] >= 0) into = previousEdge(twin[into]);
    for (const other of [out, into]) {
      const channel = this.facing(h, other);
      if (channel !== null && this.isClear(h, other, channel) && this.build(channel)) return true;
    }
    return false;
  }

  /** Whether nothing lies between the two border edges of a channel, from its first cut to its last. */
  private isClear(e: number, f: number, { p, q, stations }: Facing): boolean {
    const { corner, mark, twin, xy } = this.mesh;
    const [ux, uy] = [xy[2 * q] - xy[2 * p], xy[2 * q + 1] - xy[2 * p + 1]];
    const squared = ux * ux + uy * uy;
    const along = (v: number): number =>
      ((xy[2 * v] - xy[2 * p]) * ux + (xy[2 * v + 1] - xy[2 * p + 1]) * uy) / squared;
    const [from, to] = [stations[0], stations[stations.length - 1]];
    const stack = [(e / 3) | 0];
    const seen = new Set(stack);
    while (stack.length > 0) {
      const t = stack.pop() as number;
      for (let h = 3 * t; h < 3 * t + 3; h++) {
        const [a, b] = [along(corner[h]), along(corner[nextEdge(h)])];
        if (a > from && a < to) return false;
        if (h === e || h === f || Math.min(a, b) >= to || Math.max(a, b) <= from) continue;
        if (mark[h] !== 0 || twin[h] < 0) return false;
        const n = (twin[h] / 3) | 0;
        if (seen.has(n)) continue;
        if (seen.size >= MOST_BETWEEN) return false;
        seen.add(n);
        stack.push(n);
      }
    }
    return true;
  }

  /**
   * Cuts a sharp tip off where its two sides, border both, have run on for some widths: whatever comes from outside has died
   * away there. Half-edge h starts at the tip.
   */
  private closeTip(h: number): boolean {
    const { mesh } = this;
    const { corner, xy } = mesh;
    const tip = corner[h];
    const q = corner[nextEdge(h)];
    const r = corner[previousEdge(h)];
    const [x, y] = [xy[2 * tip], xy[2 * tip + 1]];
    const [ux, uy] = [xy[2 * q] - x, xy[2 * q + 1] - y];
    const [vx, vy] = [xy[2 * r] - x, xy[2 * r + 1] - y];
    const [lower, upper] = [Math.hypot(ux, uy), Math.hypot(vx, vy)];
    const reach = Math.min(lower, upper);
    const width = (reach * (ux * vy - uy * vx)) / (lower * upper);
    const rest = reach - MARGIN * width;
    if (!(width > 0) || !(ux * vx + uy * vy > 0) || !(rest >= LEAST_LENGTH * width)) return false;
    const below = this.split(tip, q, x + (rest / lower) * ux, y + (rest / lower) * uy);
    const above = below < 0 ? -1 : this.split(r, tip, x + (rest / upper) * vx, y + (rest / upper) * vy);
    if (above < 0 || !this.cut(below, above)) return false;
    this.freeze(tip, below);
    return true;
  }

  /** The channel between two border edges that face each other, if it is long enough. */
  private facing(e: number, f: number): Facing | null {
    const { corner, xy } = this.mesh;
    const p = corner[e];
    const q = corner[nextEdge(e)];
    const r = corner[f];
    const s = corner[nextEdge(f)];
    if (r === q || s === p) return null;
    const length = Math.hypot(xy[2 * q] - xy[2 * p], xy[2 * q + 1] - xy[2 * p + 1]);
    const ux = (xy[2 * q] - xy[2 * p]) / length;
    const uy = (xy[2 * q + 1] - xy[2 * p + 1]) / length;
    const along = (v: number): number => (xy[2 * v] - xy[2 * p]) * ux + (xy[2 * v + 1] - xy[2 * p + 1]) * uy;
    const above = (v: number): number => (xy[2 * v + 1] - xy[2 * p + 1]) * ux - (xy[2 * v] - xy[2 * p]) * uy;
    const [tr, ts, wr, ws] = [along(r), along(s), above(r), above(s)];
    if (!(tr > ts) || !(wr > 0) || !(ws > 0)) return null;
    const slope = (wr - ws) / (tr - ts);
    const width = (t: number): number => ws + slope * (t - ts);
    const low = Math.max(0, ts);
    const high = Math.min(length, tr);
    if (!(high > low) || !(width(low) > 0) || !(width(high) > 0)) return null;
    const from = low + MARGIN * width(low);
    const to = high - MARGIN * width(high);
    if (!(to - from >= LEAST_LENGTH * Math.max(width(low), width(high)))) return null;
    const radius = (t: number): number => (this.axisymmetric ? xy[2 * p] + t * ux : 1);
    const stations = evenStations(from, to, (t) => {
      return Math.abs(Math.log(width(t) / width(from))) + Math.abs(Math.log(radius(t) / radius(from)));
    });
    return stations === null ? null : { p, q, r, s, stations: stations.map((t) => t / length) };
  }

  private build({ p, q, r, s, stations }: Facing): boolean {
    const { mesh } = this;
    const { xy } = mesh;
    const [px, py, qx, qy] = [xy[2 * p], xy[2 * p + 1], xy[2 * q], xy[2 * q + 1]];
    const [rx, ry, sx, sy] = [xy[2 * r], xy[2 * r + 1], xy[2 * s], xy[2 * s + 1]];
    const [ux, uy] = [qx - px, qy - py];
    const below: number[] = [];
    const top: number[] = [];
    for (const t of stations) {
      const lastBelow = below.at(-1) ?? p;
      const lastTop = top.at(-1) ?? s;
      const x = px + t * ux;
      const y = py + t * uy;
      // Straight across from (x, y): where the other edge has the same position along p→q.
      const share = ((x - rx) * ux + (y - ry) * uy) / ((sx - rx) * ux + (sy - ry) * uy);
      const v = this.split(lastBelow, q, x, y);
      const w = this.split(r, lastTop, rx + share * (sx - rx), ry + share * (sy - ry));
      if (v < 0 || w < 0) return false;
      below.push(v);
      top.push(w);
    }
    for (let k = 0; k < stations.length; k++) {
      if (!this.cut(below[k], top[k])) return false;
    }
    for (let k = 0; k + 1 < stations.length; k++) this.freeze(below[k], below[k + 1]);
    return true;
  }

  private cut(a: number, b: number): boolean {
    if (constrain(this.mesh, a, b, this.firstMark + this.cuts.length / 2) !== null) return false;
    this.cuts.push(a - FAR_VERTICES, b - FAR_VERTICES);
    return true;
  }

  /** Puts a vertex on the border edge a→b. */
  private split(a: number, b: number, x: number, y: number): number {
    const { mesh } = this;
    const h = mesh.findEdge(a, b);
    if (h < 0 || !mesh.openCavity(x, y, (h / 3) | 0, h)) return -1;
    const mark = mesh.mark[h];
    const v = mesh.addVertex(x, y);
    mesh.fill(v, a, b, mark);
    return v;
  }

  /** Freezes the triangles between two cuts, on the left of the border edge a→b. */
  private freeze(a: number, b: number): void {
    const { mesh } = this;
    const h = mesh.findEdge(a, b);
    if (h < 0) return;
    const stack = [(h / 3) | 0];
    while (stack.length > 0) {
      const t = stack.pop() as number;
      if ((mesh.label[t] & FROZEN) !== 0) continue;
      mesh.label[t] |= FROZEN;
      for (let g = 3 * t; g < 3 * t + 3; g++) {
        if (mesh.mark[g] === 0 && mesh.twin[g] >= 0) stack.push((mesh.twin[g] / 3) | 0);
      }
    }
  }
}

/**
 * Positions from `from` to `to` between which a growing function rises in equal steps of at most ln TAPER; null if that takes
 * too many.
 */
function evenStations(from: number, to: number, rise: (t: number) => number): number[] | null {
  const total = rise(to);
  const cells = Math.max(1, Math.ceil(total / Math.log(TAPER)));
  if (!(cells <= MOST_CELLS)) return null;
  const stations = [from];
  for (let k = 1; k < cells; k++) {
    let low = from;
    let high = to;
    for (let i = 0; i < 50; i++) {
      const middle = low + (high - low) / 2;
      if (rise(middle) < (k / cells) * total) low = middle;
      else high = middle;
    }
    stations.push(low);
  }
  stations.push(to);
  return stations;
}

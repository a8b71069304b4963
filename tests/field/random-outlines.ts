/** Random outlines for property tests and the long run: a seed gives the same outline for ever. */

import type { SheetConductance } from "@/lib/engine/field/solve-field";

export type Ring = [number, number][];

export interface Part {
  ring: number;
  edge: number;
  from: number;
  to: number;
}

export interface RandomOutline {
  seed: number;
  kind: string;
  outer: Ring;
  holes: Ring[];
  /** Parts of each terminal. */
  terminals: Part[][];
  regions: Ring[];
  /** Background, then regions. */
  conductance: number[];
  /** All conductances are multiplied by e^(ax+by), x and y in the outline's unit; null for constant ones. */
  slope: [number, number] | null;
  axisymmetric: boolean;
}

export interface RandomOptions {
  /** Terminals and holes such that swapping terminals and insulation is a problem of the same kind. */
  conjugable: boolean;
}

/** A small generator of good quality (sfc32, public domain), in [0, 1). */
export function seededRandom(seed: number): () => number {
  let a = seed | 0;
  let b = 0x9e3779b9;
  let c = 0x243f6a88;
  let d = 1;
  const next = (): number => {
    const t = (((a + b) | 0) + d) | 0;
    d = (d + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (c << 21) | (c >>> 11);
    c = (c + t) | 0;
    return (t >>> 0) / 4294967296;
  };
  for (let i = 0; i < 20; i++) next();
  return next;
}

/** An outline that may or may not pass the checks (features can touch); the caller skips those that do not. */
export function randomOutline(seed: number, options: RandomOptions = { conjugable: false }): RandomOutline {
  const random = seededRandom(seed);
  const between = (low: number, high: number): number => low + (high - low) * random();
  const integer = (low: number, high: number): number => Math.floor(between(low, high + 1));
  const kinds = [star, rectangle, comb, staircase, bend] as const;
  const make = kinds[integer(0, kinds.length - 1)];
  let outer = make(between, integer);
  let holes = random() < 0.5 ? [] : makeHoles(outer, between, integer);
  let regions = random() < 0.7 ? [] : makeRegions(outer, between, integer);
  if (random() < 0.25) {
    // A sliver: squeezed by up to 1:1000 along a random direction.
    const squeeze = 10 ** between(-3, 0);
    const turn = random() < 0.5 ? 0 : between(0, 2 * Math.PI);
    const map = ([x, y]: [number, number]): [number, number] => {
      const u = x * Math.cos(turn) + y * Math.sin(turn);
      const v = (-x * Math.sin(turn) + y * Math.cos(turn)) * squeeze;
      return [u, v];
    };
    outer = outer.map(map);
    holes = holes.map((ring) => ring.map(map));
    regions = regions.map((ring) => ring.map(map));
  }
  const terminals = options.conjugable
    ? arcsOf(fourPositions(outer.length, between, integer, random), outer.length)
    : anyTerminals(outer, holes, between, integer, random);
  const strongest = random() < 0.5 ? 8 : 2;
  const conductance = [1, ...regions.map(() => 10 ** between(-strongest, strongest))];
  const slope: [number, number] | null = random() < 0.15 ? [between(-2, 2), between(-2, 2)] : null;
  const axisymmetric = !options.conjugable && slope === null && random() < 0.2;
  if (axisymmetric) {
    // Against the axis, or away from it.
    const left = Math.min(...outer.map(([x]) => x)) - (random() < 0.6 ? 0 : between(0.01, 1));
    const move = ([x, y]: [number, number]): [number, number] => [x - left, y];
    [outer, holes, regions] = [
      outer.map(move),
      holes.map((r) => r.map(move)),
      regions.map((r) => r.map(move)),
    ];
  }
  return { seed, kind: make.name, outer, holes, terminals, regions, conductance, slope, axisymmetric };
}

type Between = (low: number, high: number) => number;

function star(between: Between, integer: Between): Ring {
  const n = integer(3, 14);
  const spread = between(0.02, 0.95);
  const angles = Array.from({ length: n }, () => between(0, 2 * Math.PI)).sort((a, b) => a - b);
  return angles.map((angle) => {
    const r = 1 - spread * between(0, 1);
    return [r * Math.cos(angle), r * Math.sin(angle)];
  });
}

function rectangle(between: Between): Ring {
  const w = between(0.2, 3);
  const h = between(0.2, 3);
  return [
    [0, 0],
    [w, 0],
    [w, h],
    [0, h],
  ];
}

function comb(between: Between, integer: Between): Ring {
  const teeth = integer(1, 5);
  const base = between(0.1, 1);
  const top: Ring = [];
  let x = 0;
  for (let k = 0; k < teeth; k++) {
    const w = between(0.1, 0.5);
    const height = base + between(0.1, 2);
    top.push([x, height], [x + w, height]);
    x += w;
    if (k < teeth - 1) {
      const gap = between(0.02, 0.4);
      top.push([x, base], [x + gap, base]);
      x += gap;
    }
  }
  return [[0, 0], [x, 0], ...top.reverse()];
}

function staircase(between: Between, integer: Between): Ring {
  const steps = integer(1, 5);
  const ring: Ring = [[0, 0]];
  const total = Array.from({ length: steps }, () => between(0.1, 1));
  const width = total.reduce((a, b) => a + b, 0);
  ring.push([width, 0]);
  let x = width;
  let y = between(0.05, 0.5);
  for (let k = 0; k < steps; k++) {
    ring.push([x, y]);
    x -= total[k];
    ring.push([Math.max(0, k === steps - 1 ? 0 : x), y]);
    y += between(0.05, 0.6);
  }
  return ring.filter((p, i) => i === 0 || p[0] !== ring[i - 1][0] || p[1] !== ring[i - 1][1]);
}

function bend(between: Between): Ring {
  const a = between(0.1, 1);
  const b = between(0.1, 1);
  const l = between(0.2, 4);
  const m = between(0.2, 4);
  return [
    [0, 0],
    [b + l, 0],
    [b + l, a],
    [b, a],
    [b, a + m],
    [0, a + m],
  ];
}

function centre(ring: Ring): [number, number] {
  const x = ring.reduce((sum, p) => sum + p[0], 0) / ring.length;
  const y = ring.reduce((sum, p) => sum + p[1], 0) / ring.length;
  return [x, y];
}

function polygonAround(x: number, y: number, r: number, between: Between, integer: Between): Ring {
  const n = integer(3, 8);
  const phase = between(0, 6);
  return Array.from({ length: n }, (_, k) => {
    const angle = phase + (2 * Math.PI * (k + between(0, 0.6))) / n;
    return [x + r * Math.cos(angle), y + r * Math.sin(angle)];
  });
}

function makeHoles(outer: Ring, between: Between, integer: Between): Ring[] {
  const [cx, cy] = centre(outer);
  return Array.from({ length: integer(1, 3) }, () => {
    const p = outer[integer(0, outer.length - 1)];
    const t = between(-0.2, 0.7);
    const r = 10 ** between(-3, -0.6);
    return polygonAround(cx + t * (p[0] - cx), cy + t * (p[1] - cy), r, between, integer);
  });
}

function makeRegions(outer: Ring, between: Between, integer: Between): Ring[] {
  const [cx, cy] = centre(outer);
  return Array.from({ length: integer(1, 2) }, () => {
    const p = outer[integer(0, outer.length - 1)];
    const t = between(-0.2, 0.8);
    return polygonAround(
      cx + t * (p[0] - cx),
      cy + t * (p[1] - cy),
      10 ** between(-2, -0.3),
      between,
      integer,
    );
  });
}

/** Ends of two terminals of one piece each on the outer ring: edge numbers with a fraction. */
function fourPositions(n: number, between: Between, integer: Between, random: () => number): number[] {
  return Array.from({ length: 4 }, () => (random() < 0.4 ? integer(0, n - 1) : between(0, n))).sort(
    (a, b) => a - b,
  );
}

function arcsOf(at: readonly number[], n: number): Part[][] {
  return [partsOf(at[0], at[1], n), partsOf(at[2], at[3], n)];
}

/**
 * The conjugate of an outline whose two terminals are one piece each on the outer ring: the insulated arcs become the
 * terminals, every hole a further terminal without current, and conductances their reciprocals. Its resistance is
 * the reciprocal of the other's.
 */
export function conjugate(outline: RandomOutline): RandomOutline {
  const n = outline.outer.length;
  const start = (parts: Part[]): number => parts[0].edge + parts[0].from;
  const end = (parts: Part[]): number => parts[parts.length - 1].edge + parts[parts.length - 1].to;
  const [a, b] = outline.terminals;
  const holes = outline.holes.map((ring, k) => partsOf(0, ring.length, ring.length, k + 1));
  return {
    ...outline,
    terminals: [partsOf(end(a), start(b), n), partsOf(end(b), start(a) + n, n), ...holes],
    conductance: outline.conductance.map((c) => 1 / c),
    slope: outline.slope && [-outline.slope[0], -outline.slope[1]],
  };
}

/** The parts of ring 0 from one position to another, forwards. */
export function partsOf(from: number, to: number, n: number, ring = 0): Part[] {
  const parts: Part[] = [];
  for (let edge = Math.floor(from); edge < to; edge++) {
    const a = Math.max(from, edge) - edge;
    const b = Math.min(to, edge + 1) - edge;
    if (b > a) parts.push({ ring, edge: edge % n, from: a, to: b });
  }
  return parts;
}

function anyTerminals(
  outer: Ring,
  holes: Ring[],
  between: Between,
  integer: Between,
  random: () => number,
): Part[][] {
  const rings = [outer, ...holes];
  const count = random() < 0.75 ? 2 : integer(3, 4);
  const terminals: Part[][] = Array.from({ length: count }, () => []);
  let next = 0;
  rings.forEach((ring, r) => {
    const kind = random();
    if (r > 0 && kind < 0.35) return;
    if ((r > 0 && kind < 0.65) || (r === 0 && holes.length > 1 && kind < 0.1)) {
      // The whole ring.
      terminals[next++ % count].push(...partsOf(0, ring.length, ring.length, r));
      return;
    }
    const pieces = r === 0 ? integer(2, 5) : integer(1, 2);
    const n = ring.length;
    const at = Array.from({ length: 2 * pieces }, () =>
      random() < 0.4 ? integer(0, n - 1) : between(0, n),
    ).sort((a, b) => a - b);
    for (let k = 0; k < pieces; k++) {
      const parts = partsOf(at[2 * k], at[2 * k + 1], n, r);
      if (parts.length > 0) terminals[next++ % count].push(...parts);
    }
  });
  return terminals;
}

/** The conductances with their common slope, if there is one. */
export function conductanceOf({ conductance, slope }: RandomOutline): SheetConductance[] {
  if (!slope) return conductance;
  const [a, b] = slope;
  return conductance.map((c) => (x: number, y: number) => c * Math.exp(a * x + b * y));
}

/** A seeded generator of numbers in [0, 1) (mulberry32). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

export type Polygon = Array<[number, number]>;

export interface UglyOutline {
  readonly name: string;
  readonly outer: Polygon;
  readonly holes: Polygon[];
}

/** Star-shaped with spikes; angles down to a fraction of a degree. */
function spiky(random: () => number): UglyOutline {
  const n = 3 + Math.floor(random() * 40);
  const depth = random() * 0.98;
  const outer: Polygon = [];
  for (let i = 0; i < n; i++) {
    const angle = ((i + 0.8 * random()) * 2 * Math.PI) / n;
    const radius = i % 2 === 0 ? 1 : 1 - depth * random();
    outer.push([radius * Math.cos(angle), radius * Math.sin(angle)]);
  }
  return { name: "spiky", outer, holes: [] };
}

/** A back with teeth whose widths and gaps range over decades. */
function comb(random: () => number): UglyOutline {
  const teeth = 1 + Math.floor(random() * 12);
  const outer: Polygon = [];
  let x = 0;
  for (let i = 0; i < teeth; i++) {
    const width = 10 ** (-4 * random());
    const gap = 10 ** (-5 * random());
    const height = 0.2 + random();
    outer.push([x, 0], [x, height], [x + width, height], [x + width, 0]);
    x += width + gap;
  }
  outer.push([x, 0], [x, -0.3], [0, -0.3]);
  return { name: "comb", outer, holes: [] };
}

/** A rectangle with many holes of all sizes, some of them a hair's breadth apart. */
function sieve(random: () => number): UglyOutline {
  const outer: Polygon = [
    [0, 0],
    [2, 0],
    [2, 1],
    [0, 1],
  ];
  const holes: Polygon[] = [];
  const placed: Array<[number, number, number]> = [];
  for (let tries = 0; tries < 40; tries++) {
    let radius = 0.2 * 10 ** (-5 * random());
    let cx = 2 * random();
    let cy = random();
    if (placed.length > 0 && random() < 0.5) {
      // Next to an earlier one, with a tiny gap.
      const [px, py, pr] = placed[Math.floor(random() * placed.length)];
      const gap = pr * 10 ** (-1 - 4 * random());
      const angle = 2 * Math.PI * random();
      radius = Math.min(radius, 0.2);
      cx = px + (pr + radius + gap) * Math.cos(angle);
      cy = py + (pr + radius + gap) * Math.sin(angle);
    }
    const border = Math.min(cx, 2 - cx, cy, 1 - cy);
    if (border <= radius * 1.0001) continue;
    if (placed.some(([px, py, pr]) => Math.hypot(px - cx, py - cy) <= (pr + radius) * (1 + 1e-9))) continue;
    placed.push([cx, cy, radius]);
    const n = 3 + Math.floor(random() * 30);
    const turn = random() * Math.PI;
    holes.push(
      Array.from({ length: n }, (_, i): [number, number] => {
        const angle = turn + (2 * Math.PI * i) / n;
        return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)];
      }),
    );
  }
  return { name: "sieve", outer, holes };
}

/** A staircase walk on a coarse grid, widened: right angles, dead ends, equal coordinates everywhere. */
function maze(random: () => number): UglyOutline {
  const size = 4 + Math.floor(random() * 6);
  const inside = new Set<number>();
  const key = (i: number, j: number): number => i * 64 + j;
  const steps: Array<[number, number]> = [
    [1, 0],
    [-1, 0],
    [0, 1],
    [0, -1],
  ];
  inside.add(key(1, 1));
  for (let tries = 0; tries < size * size * 3; tries++) {
    const i = 1 + Math.floor(random() * size);
    const j = 1 + Math.floor(random() * size);
    if (inside.has(key(i, j))) continue;
    const direct = steps.filter(([di, dj]) => inside.has(key(i + di, j + dj)));
    if (direct.length !== 1) continue;
    const [di, dj] = direct[0];
    // Cells that would touch the rest in more than this one edge are left out, so that the border stays one ring.
    const others = [-1, 0, 1].flatMap((a) => [-1, 0, 1].map((b): [number, number] => [a, b]));
    const touching = others.filter(([a, b]) => (a !== 0 || b !== 0) && inside.has(key(i + a, j + b)));
    if (touching.some(([a, b]) => a * di + b * dj <= 0)) continue;
    inside.add(key(i, j));
  }
  const next = new Map<number, number>();
  for (const cell of inside) {
    const i = Math.floor(cell / 64);
    const j = cell % 64;
    if (!inside.has(key(i, j - 1))) next.set(key(i, j), key(i + 1, j));
    if (!inside.has(key(i + 1, j))) next.set(key(i + 1, j), key(i + 1, j + 1));
    if (!inside.has(key(i, j + 1))) next.set(key(i + 1, j + 1), key(i, j + 1));
    if (!inside.has(key(i - 1, j))) next.set(key(i, j + 1), key(i, j));
  }
  const outer: Polygon = [];
  const start = next.keys().next().value ?? 0;
  let at = start;
  do {
    outer.push([Math.floor(at / 64), at % 64]);
    at = next.get(at) ?? start;
  } while (at !== start);
  return { name: "maze", outer, holes: [] };
}

/** A ribbon around a random smooth curve, its thickness from thick to thread. */
function ribbon(random: () => number): UglyOutline {
  const n = 5 + Math.floor(random() * 60);
  const half = 10 ** (-1.5 - 3 * random());
  const wave = 0.3 * random();
  const left: Polygon = [];
  const right: Polygon = [];
  for (let i = 0; i <= n; i++) {
    const x = (3 * i) / n;
    const y = wave * Math.sin(3 * x) + 0.02 * half * random();
    left.push([x, y + half]);
    right.push([x, y - half]);
  }
  return { name: "ribbon", outer: [...right, ...left.reverse()], holes: [] };
}

/** Two long edges that meet at a tiny angle, with a notch. */
function needle(random: () => number): UglyOutline {
  const angle = (10 ** (-2 * random()) * 10 * Math.PI) / 180;
  const y = Math.tan(angle);
  const cut = 0.3 + 0.5 * random();
  const outer: Polygon = [
    [0, 0],
    [1, 0],
    [1, y],
    [cut + 0.02, y * (cut + 0.02)],
    [cut, y * cut * (0.2 + 0.6 * random())],
    [cut - 0.02, y * (cut - 0.02)],
  ];
  return { name: "needle", outer, holes: [] };
}

/** Random points, many of them in tight clusters, joined in any order and then uncrossed: sharp and narrow everywhere. */
function tangle(random: () => number): UglyOutline {
  const n = 5 + Math.floor(random() * 30);
  const outer: Polygon = [];
  for (let i = 0; i < n; i++) {
    if (outer.length > 0 && random() < 0.4) {
      const [x, y] = outer[Math.floor(random() * outer.length)];
      const near = 10 ** (-1 - 4 * random());
      outer.push([x + near * (random() - 0.5), y + near * (random() - 0.5)]);
    } else outer.push([random(), random()]);
  }
  const crosses = (a: number, b: number, c: number, d: number): boolean => {
    const side = (p: number, q: number, r: number): number =>
      (outer[q][0] - outer[p][0]) * (outer[r][1] - outer[p][1]) -
      (outer[q][1] - outer[p][1]) * (outer[r][0] - outer[p][0]);
    return side(a, b, c) > 0 !== side(a, b, d) > 0 && side(c, d, a) > 0 !== side(c, d, b) > 0;
  };
  // Each reversal shortens the ring, so it ends; the limit is for points that are almost in line.
  for (let round = 0, again = true; again && round < 500; round++) {
    again = false;
    for (let i = 0; i < n && !again; i++) {
      for (let j = i + 2; j < n && !again; j++) {
        if ((j + 1) % n === i || !crosses(i, i + 1, j, (j + 1) % n)) continue;
        outer.splice(i + 1, j - i, ...outer.slice(i + 1, j + 1).reverse());
        again = true;
      }
    }
  }
  return { name: "tangle", outer, holes: [] };
}

const KINDS = [spiky, comb, sieve, maze, ribbon, needle, tangle];

/** One ugly outline for a seed, scaled, turned and moved. */
export function uglyOutline(seed: number): UglyOutline {
  const random = seeded(seed);
  const made = KINDS[seed % KINDS.length](random);
  const scale = random() < 0.3 ? 10 ** (18 * random() - 9) : 1;
  const angle = random() < 0.6 ? 2 * Math.PI * random() : 0;
  const offset = random() < 0.2 ? 1e6 * scale : 0;
  const c = scale * Math.cos(angle);
  const s = scale * Math.sin(angle);
  const move = ([x, y]: [number, number]): [number, number] => [
    c * x - s * y + offset,
    s * x + c * y - offset / 3,
  ];
  const turn = random() < 0.5 ? (p: Polygon) => p : (p: Polygon) => [...p].reverse();
  return {
    name: made.name,
    outer: turn(made.outer.map(move)),
    holes: made.holes.map((h) => turn(h.map(move))),
  };
}

/**
 * Elimination of nodes from a network of conductances without a single subtraction.
 *
 * A node k with the conductances g to its neighbours is replaced by conductances g_i·g_j/Σg between each two of them
 * (the star–mesh transformation; it is Gaussian elimination on a weighted Laplacian, arranged as by Grassmann, Taksar
 * and Heyman, Operations Research 33 (1985) 1107). Sums, products and quotients of positive numbers keep their
 * relative accuracy, so that conductances of any ratio keep their digits. The order is by least degree; a rest that
 * has grown dense is left to DenseRest.
 */

/** Undirected pairs of nodes with one or more conductances each (for the nominal, lowest and highest resistances). */
export interface Links {
  readonly nodes: number;
  readonly a: Int32Array;
  readonly b: Int32Array;
  readonly conductance: readonly Float64Array[];
}

/** Smallest conductance that keeps full precision, where the largest one is 1. */
const SMALLEST = 1e-280;
/** Operations after which the work pauses: a few hundredths of a second. */
export const OPERATIONS_A_STRETCH = 1_000_000;
/** A rest is dense where its least degree is this part of it; and it must fit into memory. */
const DENSE_PART = 1 / 6;
const LARGEST_DENSE = 2_500;

/** Conductances are too far apart for doubles. */
export class RatioError extends Error {}

/** A node as it was when it was eliminated. */
export interface Star {
  readonly node: number;
  /** Its neighbours, and the link to each. */
  readonly around: readonly number[];
  readonly links: readonly number[];
  /** Links between the neighbours: that of i and j < i at i(i-1)/2 + j. */
  readonly mesh: Int32Array;
}

export class SparseElimination {
  /** Neighbours of each node when it was eliminated, with the link to each; links to earlier ones are gone. */
  readonly neighbours: Map<number, number>[];
  /** Place in the order of elimination; nodes of the rest have none yet. */
  readonly order: Int32Array;
  readonly eliminated: Star[] = [];
  /** Conductances of the links, own and new ones, one list a set. */
  readonly conductance: number[][];
  /** Roundings that the total conductance may have suffered; see `relativeError`. */
  roundings = 1;
  private readonly byDegree: Set<number>[] = [];
  private least = 0;

  constructor(
    links: Links,
    private readonly kept: ReadonlySet<number>,
  ) {
    this.neighbours = Array.from({ length: links.nodes }, () => new Map<number, number>());
    this.order = new Int32Array(links.nodes).fill(-1);
    this.conductance = links.conductance.map(() => []);
    const parallel: number[] = [];
    for (let e = 0; e < links.a.length; e++) {
      const id = this.link(links.a[e], links.b[e]);
      parallel[id] = (parallel[id] ?? 0) + 1;
      for (const [set, values] of links.conductance.entries()) this.conductance[set][id] += values[e];
    }
    this.roundings += parallel.reduce((most, count) => Math.max(most, count), 1);
    for (let n = 0; n < links.nodes; n++) if (!kept.has(n)) this.place(n);
  }

  /** Eliminates nodes until none is left beside the kept ones or the rest is dense; pauses now and then. */
  *run(): Generator<void, readonly number[]> {
    let rest = this.neighbours.length;
    let operations = 0;
    for (;;) {
      const node = this.next();
      if (node === undefined) break;
      const degree = this.neighbours[node].size;
      if (degree > 12 && degree > DENSE_PART * rest && rest <= LARGEST_DENSE) {
        this.byDegree[degree].add(node);
        break;
      }
      this.eliminate(node);
      rest--;
      operations += degree * degree;
      if (operations > OPERATIONS_A_STRETCH) {
        operations = 0;
        yield;
      }
    }
    const remaining: number[] = [];
    for (let n = 0; n < this.order.length; n++) if (this.order[n] < 0) remaining.push(n);
    return remaining;
  }

  /** The link between two nodes of which neither was eliminated, or the earlier one still knew the other. */
  linkBetween(a: number, b: number): number | undefined {
    const [one, other] = [this.order[a], this.order[b]];
    return one >= 0 && (other < 0 || one < other) ? this.neighbours[a].get(b) : this.neighbours[b].get(a);
  }

  private link(a: number, b: number): number {
    const known = this.neighbours[a].get(b);
    if (known !== undefined) return known;
    const id = this.conductance[0].length;
    for (const values of this.conductance) values.push(0);
    this.neighbours[a].set(b, id);
    this.neighbours[b].set(a, id);
    return id;
  }

  private place(node: number): void {
    const degree = this.neighbours[node].size;
    (this.byDegree[degree] ??= new Set()).add(node);
    this.least = Math.min(this.least, degree);
  }

  private next(): number | undefined {
    for (; this.least < this.byDegree.length; this.least++) {
      const set = this.byDegree[this.least];
      if (!set) continue;
      for (const node of set) {
        set.delete(node);
        return node;
      }
    }
    return undefined;
  }

  private eliminate(node: number): void {
    const around = [...this.neighbours[node].keys()];
    const links = [...this.neighbours[node].values()];
    for (const other of around) {
      if (!this.kept.has(other)) this.byDegree[this.neighbours[other].size].delete(other);
      this.neighbours[other].delete(node);
    }
    const sums = this.conductance.map((values) => links.reduce((sum, id) => sum + values[id], 0));
    const mesh = new Int32Array((around.length * (around.length - 1)) / 2);
    for (let i = 1, pair = 0; i < around.length; i++) {
      for (let j = 0; j < i; j++) {
        const id = this.link(around[i], around[j]);
        mesh[pair++] = id;
        for (let set = 0; set < sums.length; set++) {
          const values = this.conductance[set];
          const through = values[links[i]] * (values[links[j]] / sums[set]);
          if (!(through > SMALLEST)) throw new RatioError();
          values[id] += through;
        }
      }
    }
    this.roundings += around.length + 2;
    this.order[node] = this.eliminated.length;
    this.eliminated.push({ node, around, links, mesh });
    for (const other of around) if (!this.kept.has(other)) this.place(other);
  }
}

/**
 * Bound of the relative error of a conductance between the ports. Each step of the elimination is exact for
 * conductances that are off by at most (degree + 2) roundings of 2^-53; and a conductance between two nodes changes by
 * at most the factor by which all conductances change (it rises with each of them, and in proportion to all).
 */
export function relativeError(roundings: number): number {
  const part = roundings * 2 ** -53;
  return part / (1 - part);
}

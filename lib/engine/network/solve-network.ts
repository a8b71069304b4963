/**
 * Potentials and currents of a network between two ports. Differences of potential come from the elimination run
 * backwards: across the star of a node k they are weighted means of those across the mesh that took its place, so that
 * a large conductance beside a small one keeps the digits of its voltage and current.
 */
import { DenseRest } from "./dense-rest";
import { type Links, OPERATIONS_A_STRETCH, relativeError, SparseElimination } from "./sparse-elimination";

export interface NetworkSolution {
  /** Conductance between the ports for each set of conductances. */
  readonly conductance: readonly number[];
  /** Bound of its relative rounding error. */
  readonly error: number;
  /** Potential of each node, for the first set, with the high port at 1 and the low one at 0. */
  readonly potential: Float64Array;
  /** Potential of link e's node a above its node b, the same way. */
  readonly difference: Float64Array;
}

/**
 * Solves a network of which every element can carry current. Runs in stretches: each `next` does a part.
 * @throws RatioError where conductances are too far apart for doubles. They should be scaled to a largest one of 1.
 */
export function* solveLinks(links: Links, high: number, low: number): Generator<void, NetworkSolution> {
  const sparse = new SparseElimination(links, new Set([high, low]));
  const remaining = yield* sparse.run();
  const inner = remaining.filter((node) => node !== high && node !== low);
  const rest = [...inner, high, low];
  const conductance: number[] = [];
  let dense: DenseRest | undefined;
  for (let set = 0; set < links.conductance.length; set++) {
    const part = new DenseRest(rest.length, set === 0);
    fillDense(part, rest, sparse, set);
    conductance.push(yield* part.reduce());
    dense ??= part;
  }
  if (!dense) throw new Error("a network without conductances");
  const roundings = sparse.roundings + dense.roundings + 2;
  yield* dense.differences();

  const back = new Backward(sparse, links.nodes);
  back.take(dense, rest);
  yield* back.run();
  const difference = new Float64Array(links.a.length);
  for (let e = 0; e < links.a.length; e++) difference[e] = back.between(links.a[e], links.b[e]);
  return { conductance, error: relativeError(roundings), potential: back.potential, difference };
}

function fillDense(part: DenseRest, rest: readonly number[], sparse: SparseElimination, set: number): void {
  const place = new Map(rest.map((node, i) => [node, i]));
  for (const [i, node] of rest.entries()) {
    for (const [other, link] of sparse.neighbours[node]) {
      const j = place.get(other);
      if (j !== undefined && j > i) part.matrix[i * part.size + j] = sparse.conductance[set][link];
    }
  }
}

class Backward {
  readonly potential: Float64Array;
  /** By link: potential of its node of the smaller number above the other one. */
  private readonly rise: Float64Array;

  constructor(
    private readonly sparse: SparseElimination,
    nodes: number,
  ) {
    this.potential = new Float64Array(nodes);
    this.rise = new Float64Array(sparse.conductance[0].length);
  }

  /** Takes over what the dense rest has found. */
  take({ size, matrix, difference }: DenseRest, rest: readonly number[]): void {
    const { potential, sparse } = this;
    potential[rest[size - 2]] = 1;
    for (let i = size - 3; i >= 0; i--) {
      const row = i * size;
      let sum = 0;
      let total = 0;
      for (let j = i + 1; j < size; j++) {
        sum += matrix[row + j] * potential[rest[j]];
        total += matrix[row + j];
      }
      potential[rest[i]] = sum / total;
    }
    const place = new Map(rest.map((node, i) => [node, i]));
    for (let i = 0; i < size; i++) {
      for (const [other, link] of sparse.neighbours[rest[i]]) {
        const j = place.get(other) ?? -1;
        if (j > i) this.set(rest[i], other, link, difference[i * size + j]);
      }
    }
  }

  *run(): Generator<void, void> {
    const { sparse, potential } = this;
    const [values] = sparse.conductance;
    let operations = 0;
    for (let k = sparse.eliminated.length - 1; k >= 0; k--) {
      const { node, around, links, mesh } = sparse.eliminated[k];
      let total = 0;
      let level = 0;
      for (let i = 0; i < links.length; i++) {
        total += values[links[i]];
        level += values[links[i]] * potential[around[i]];
      }
      potential[node] = level / total;
      const sums = new Float64Array(around.length);
      for (let i = 1, pair = 0; i < around.length; i++) {
        for (let j = 0; j < i; j++) {
          const rise = this.rise[mesh[pair++]];
          const above = around[i] < around[j] ? rise : -rise;
          sums[j] += values[links[i]] * above;
          sums[i] -= values[links[j]] * above;
        }
      }
      for (let j = 0; j < around.length; j++) this.set(node, around[j], links[j], sums[j] / total);
      operations += around.length ** 2;
      if (operations > OPERATIONS_A_STRETCH) {
        operations = 0;
        yield;
      }
    }
  }

  /** Potential of one node above another to which it is linked. */
  between(a: number, b: number): number {
    const link = this.sparse.linkBetween(a, b);
    if (link === undefined) throw new Error("nodes without a link were compared");
    return a < b ? this.rise[link] : -this.rise[link];
  }

  private set(a: number, b: number, link: number, difference: number): void {
    this.rise[link] = a < b ? difference : -difference;
  }
}

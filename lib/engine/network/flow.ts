/** What passes through each element, and whether it agrees with the laws of circuits. */
import type { Incidence } from "./branches";
import type { NamedNodes, NetworkElement } from "./read-elements";
import type { NetworkCheck } from "./result-schema";
import type { Active } from "./solve-carrying";
import type { NetworkSolution } from "./solve-network";

/** Largest deviation from a law of circuits that passes, relative to the values at the ports. */
const TOLERANCE = 1e-9;

export interface Flow {
  /** Part of the ports' voltage across each element, first node above second. */
  readonly difference: Float64Array;
  /** Part of the ports' current, from the first node to the second. */
  readonly current: Float64Array;
  /** Part of the whole power. */
  readonly share: Float64Array;
}

/** Potentials of all nodes, of one volt between the ports; what hangs on by one node is at that node's. */
export function spreadPotential(
  { names, from, to }: NamedNodes,
  { start, list }: Incidence,
  { node }: Active,
  solution: NetworkSolution,
): Float64Array {
  const potential = new Float64Array(names.length);
  const known = new Uint8Array(names.length);
  for (const [k, n] of node.entries()) {
    potential[n] = solution.potential[k];
    known[n] = 1;
  }
  const queue = [...node];
  for (let k = 0; k < queue.length; k++) {
    const n = queue[k];
    for (let i = start[n]; i < start[n + 1]; i++) {
      const other = from[list[i]] + to[list[i]] - n;
      if (known[other]) continue;
      known[other] = 1;
      potential[other] = potential[n];
      queue.push(other);
    }
  }
  return potential;
}

export function flowOf(
  { from }: NamedNodes,
  elements: readonly NetworkElement[],
  { link }: Active,
  { conductance, difference }: NetworkSolution,
): Flow {
  const whole = 1 / conductance[0];
  const flow = {
    difference: new Float64Array(from.length),
    current: new Float64Array(from.length),
    share: new Float64Array(from.length),
  };
  for (const [e, { ohm }] of elements.entries()) {
    if (link[e] < 0) continue;
    const across = difference[link[e]];
    flow.difference[e] = across;
    flow.current[e] = across * (whole / ohm);
    flow.share[e] = flow.current[e] * across;
  }
  return flow;
}

/** Kirchhoff's laws and the balance of power. */
export function checkFlow(
  { names, from, to, high, low }: NamedNodes,
  flow: Flow,
  potential: Float64Array,
): NetworkCheck[] {
  const sum = new Float64Array(names.length);
  let apart = 0;
  let power = 0;
  for (let e = 0; e < from.length; e++) {
    sum[from[e]] += flow.current[e];
    sum[to[e]] -= flow.current[e];
    apart = Math.max(apart, Math.abs(potential[from[e]] - potential[to[e]] - flow.difference[e]));
    power += flow.share[e];
  }
  sum[high] -= 1;
  sum[low] += 1;
  const left = sum.reduce((worst, value) => Math.max(worst, Math.abs(value)), 0);
  return [
    outcome("current-law", left),
    outcome("voltage-law", apart),
    outcome("power-balance", Math.abs(power - 1)),
  ];
}

function outcome(name: NetworkCheck["name"], deviation: number): NetworkCheck {
  return { name, applies: true, passed: deviation <= TOLERANCE, deviation, tolerance: TOLERANCE };
}

/** The part of a network that can carry current, scaled, numbered by itself and solved. */
import { InputError, type Problems } from "../failure";
import type { Corner } from "./network-uncertainty";
import type { NamedNodes, NetworkElement } from "./read-elements";
import { type NetworkSolution, solveLinks } from "./solve-network";
import { RatioError } from "./sparse-elimination";

/** Smallest conductance that is taken, where the largest is 1: products of two must still keep their digits. */
const SMALLEST = 1e-140;

/** The elements that can carry current, as links of a network of their own. */
export interface Active {
  /** Number of each element among the links, or -1. */
  readonly link: Int32Array;
  /** Node of the network of each node of the links. */
  readonly node: readonly number[];
}

/**
 * Solves the carrying part. Where all elements are exact there is one set of conductances; else the nominal, the
 * smallest and the largest, in this order. The resistances at `corners`, in ohms, come beside them.
 * @throws InputError where resistances are too far apart for doubles.
 */
export function* solveCarrying(
  { names, from, to, high, low }: NamedNodes,
  elements: readonly NetworkElement[],
  carrying: Uint8Array,
  corners: readonly Corner[],
  problems: Problems,
): Generator<void, { solution: NetworkSolution; active: Active; corners: readonly number[] }> {
  const number = new Int32Array(names.length).fill(-1);
  const node: number[] = [];
  const numberOf = (n: number): number => {
    if (number[n] < 0) {
      number[n] = node.length;
      node.push(n);
    }
    return number[n];
  };
  const link = new Int32Array(elements.length).fill(-1);
  const a: number[] = [];
  const b: number[] = [];
  const chosen: NetworkElement[] = [];
  for (const [e, element] of elements.entries()) {
    if (!carrying[e]) continue;
    link[e] = chosen.length;
    a.push(numberOf(from[e]));
    b.push(numberOf(to[e]));
    chosen.push(element);
  }
  // A power of two: dividing by it rounds nothing.
  const smallest = chosen.reduce(
    (least, element, k) => Math.min(least, element.lower, ...corners.map((corner) => corner(element, k))),
    Infinity,
  );
  const unitSiemens = 2 ** -Math.floor(Math.log2(smallest));
  const exact = chosen.every(({ lower, upper }) => lower === upper);
  const sets = exact
    ? [ohmOf]
    : [ohmOf, ({ upper }: NetworkElement) => upper, ({ lower }: NetworkElement) => lower];
  const links = {
    nodes: node.length,
    a: Int32Array.from(a),
    b: Int32Array.from(b),
    conductance: [...sets, ...corners].map((ohm) =>
      Float64Array.from(chosen, (element, k) => 1 / (ohm(element, k) * unitSiemens)),
    ),
  };
  try {
    if (links.conductance.some((values) => values.some((value) => value < SMALLEST))) throw new RatioError();
    const solution = yield* solveLinks(links, number[high], number[low]);
    const conductance = solution.conductance.map((value) => value * unitSiemens);
    return {
      solution: { ...solution, conductance: conductance.slice(0, sets.length) },
      active: { link, node },
      corners: conductance.slice(sets.length).map((siemens) => 1 / siemens),
    };
  } catch (error) {
    if (!(error instanceof RatioError)) throw error;
    problems.add(
      "#/elements",
      "have resistances too far apart for double precision (more than about 1e140).",
    );
    throw new InputError(problems.list);
  }
}

function ohmOf({ ohm }: NetworkElement): number {
  return ohm;
}

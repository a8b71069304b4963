/**
 * Which elements of a network can carry current between two of its nodes. An element does so exactly if it lies on a
 * path between them that visits no node twice, that is, in the block (biconnected component) of an imagined element
 * between the two (Tarjan 1972). Everything else hangs on by a single node and stays at that node's potential.
 */

/** A network: element e joins from[e] and to[e], which differ. */
export interface Graph {
  readonly nodes: number;
  readonly from: Int32Array;
  readonly to: Int32Array;
}

/** The elements at each node: list[start[n]] … list[start[n+1]-1]. */
export interface Incidence {
  readonly start: Int32Array;
  readonly list: Int32Array;
}

export function incidenceOf({ nodes, from, to }: Graph): Incidence {
  const start = new Int32Array(nodes + 1);
  for (let e = 0; e < from.length; e++) {
    start[from[e] + 1]++;
    start[to[e] + 1]++;
  }
  for (let n = 0; n < nodes; n++) start[n + 1] += start[n];
  const next = start.slice();
  const list = new Int32Array(2 * from.length);
  for (let e = 0; e < from.length; e++) {
    list[next[from[e]]++] = e;
    list[next[to[e]]++] = e;
  }
  return { start, list };
}

/** Nodes that elements join to `start`, directly or by others: 1 for each of them. */
export function reachedFrom(graph: Graph, { start, list }: Incidence, node: number): Uint8Array {
  const reached = new Uint8Array(graph.nodes);
  reached[node] = 1;
  const queue = [node];
  for (let k = 0; k < queue.length; k++) {
    const n = queue[k];
    for (let i = start[n]; i < start[n + 1]; i++) {
      const other = graph.from[list[i]] + graph.to[list[i]] - n;
      if (reached[other]) continue;
      reached[other] = 1;
      queue.push(other);
    }
  }
  return reached;
}

/** 1 for each element that can carry current between the ports, which must be joined. */
export function carryingElements(
  graph: Graph,
  { start, list }: Incidence,
  high: number,
  low: number,
): Uint8Array {
  const { from, to, nodes } = graph;
  const imagined = from.length;
  const found = new Int32Array(nodes);
  const lowest = new Int32Array(nodes);
  const next = start.slice(0, nodes);
  const arrivedBy = new Int32Array(nodes).fill(-1);
  const carrying = new Uint8Array(from.length);
  // The imagined element comes first: the walk goes from the high port to the low one and on from there.
  const edges: number[] = [imagined];
  const path = [high, low];
  let count = 0;
  found[high] = lowest[high] = ++count;
  found[low] = lowest[low] = ++count;
  arrivedBy[low] = imagined;
  while (path.length > 0) {
    const n = path[path.length - 1];
    if (next[n] < start[n + 1]) {
      const e = list[next[n]++];
      if (e === arrivedBy[n]) continue;
      const other = from[e] + to[e] - n;
      if (found[other] === 0) {
        edges.push(e);
        found[other] = lowest[other] = ++count;
        arrivedBy[other] = e;
        path.push(other);
      } else if (found[other] < found[n]) {
        edges.push(e);
        lowest[n] = Math.min(lowest[n], found[other]);
      }
      continue;
    }
    path.pop();
    const parent = path[path.length - 1];
    if (parent === undefined) break;
    lowest[parent] = Math.min(lowest[parent], lowest[n]);
    if (lowest[n] < found[parent]) continue;
    // A block ends here; the one with the imagined element is the one that carries.
    const block: number[] = [];
    for (let e = edges.pop(); e !== undefined; e = edges.pop()) {
      block.push(e);
      if (e === arrivedBy[n]) break;
    }
    if (block.includes(imagined)) for (const e of block) if (e !== imagined) carrying[e] = 1;
  }
  return carrying;
}

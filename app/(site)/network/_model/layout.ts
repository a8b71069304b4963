/**
 * Where the nodes of a network stand in its drawing: from left to right by their steps from the first port and to the
 * second, in each column in an order that keeps neighbours together.
 */
import type { Network } from "./network";
import { nodeNames } from "./network";

export interface PlacedNode {
  readonly name: string;
  readonly x: number;
  readonly y: number;
}

export interface PlacedElement {
  readonly id: number;
  readonly index: number;
  readonly from: PlacedNode;
  readonly to: PlacedNode;
  /** How far the middle of the element stands off the straight line, in drawing units. */
  readonly bend: number;
}

export interface Layout {
  readonly width: number;
  readonly height: number;
  readonly nodes: readonly PlacedNode[];
  readonly elements: readonly PlacedElement[];
}

const COLUMN = 230;
const LINE = 104;
const MARGIN_X = 70;
const MARGIN_Y = 56;
const SWEEPS = 8;

export function layOut(network: Network): Layout {
  const names = nodeNames(network);
  const number = new Map(names.map((name, k) => [name, k]));
  const joined = network.elements.flatMap((element, index) => {
    const [a, b] = [number.get(element.from.trim()), number.get(element.to.trim())];
    return a === undefined || b === undefined || a === b ? [] : [{ element, index, a, b }];
  });
  const neighbours: number[][] = names.map(() => []);
  for (const { a, b } of joined) {
    neighbours[a].push(b);
    neighbours[b].push(a);
  }
  const columns = inColumns(
    names,
    neighbours,
    number.get(network.ports[0].trim()),
    number.get(network.ports[1].trim()),
  );
  const tallest = Math.max(1, ...columns.map((column) => column.length));
  const nodes: PlacedNode[] = names.map((name) => ({ name, x: 0, y: 0 }));
  for (const [k, column] of columns.entries()) {
    for (const [place, n] of column.entries()) {
      const y = MARGIN_Y + LINE * (place + (tallest - column.length) / 2);
      nodes[n] = { name: names[n], x: MARGIN_X + COLUMN * k, y };
    }
  }
  const pairs = new Map<string, typeof joined>();
  for (const entry of joined) {
    const key = [entry.a, entry.b].sort((one, other) => one - other).join(" ");
    pairs.set(key, [...(pairs.get(key) ?? []), entry]);
  }
  const elements = [...pairs.values()].flatMap((group) =>
    group.map(({ element, index, a, b }, k) => {
      const offset = (k - (group.length - 1) / 2) * 84;
      const through = crossesNode(nodes, a, b) ? LINE * 0.55 : 0;
      return {
        id: element.id,
        index,
        from: nodes[a],
        to: nodes[b],
        bend: (leftToRight(nodes[a], nodes[b]) ? 1 : -1) * (offset + through),
      };
    }),
  );
  const reach = Math.max(0, ...elements.map(({ bend }) => Math.abs(bend)));
  const extra = Math.max(0, reach + 46 - MARGIN_Y);
  return {
    width: 2 * MARGIN_X + COLUMN * Math.max(1, columns.length - 1),
    height: 2 * MARGIN_Y + LINE * (tallest - 1) + 2 * extra,
    nodes: nodes.map((node) => ({ ...node, y: node.y + extra })),
    elements: elements.map((entry) => ({
      ...entry,
      from: { ...entry.from, y: entry.from.y + extra },
      to: { ...entry.to, y: entry.to.y + extra },
    })),
  };
}

function leftToRight(from: PlacedNode, to: PlacedNode): boolean {
  return from.x === to.x ? from.y < to.y : from.x < to.x;
}

/** Whether a straight line would run through a third node. */
function crossesNode(nodes: readonly PlacedNode[], a: number, b: number): boolean {
  const [p, q] = [nodes[a], nodes[b]];
  return nodes.some((node, k) => {
    if (k === a || k === b) return false;
    const along =
      ((node.x - p.x) * (q.x - p.x) + (node.y - p.y) * (q.y - p.y)) /
      ((q.x - p.x) ** 2 + (q.y - p.y) ** 2 || 1);
    if (along <= 0.02 || along >= 0.98) return false;
    const off = Math.hypot(p.x + along * (q.x - p.x) - node.x, p.y + along * (q.y - p.y) - node.y);
    return off < 24;
  });
}

function inColumns(
  names: readonly string[],
  neighbours: readonly (readonly number[])[],
  high: number | undefined,
  low: number | undefined,
): number[][] {
  const fromHigh = stepsFrom(neighbours, high ?? 0);
  const fromLow = stepsFrom(neighbours, low ?? names.length - 1);
  const span = Math.max(1, fromHigh[low ?? names.length - 1] ?? 1);
  const groups = new Map<number, number[]>();
  for (let n = 0; n < names.length; n++) {
    const [a, b] = [fromHigh[n], fromLow[n]];
    const place =
      n === high ? 0 : n === low ? 1 : a === undefined || b === undefined ? 0.5 : a / Math.max(1, a + b);
    const column =
      n === high || n === low
        ? place * span
        : Math.min(Math.max(Math.round(place * span * 2) / 2, 0.5), span - 0.5);
    groups.set(column, [...(groups.get(column) ?? []), n]);
  }
  const columns = [...groups].sort(([one], [other]) => one - other).map(([, nodes]) => nodes);
  const row = new Float64Array(names.length);
  for (const column of columns) column.forEach((n, k) => (row[n] = k - (column.length - 1) / 2));
  for (let sweep = 0; sweep < SWEEPS; sweep++) {
    for (const column of sweep % 2 ? columns.toReversed() : columns) {
      const pull = new Map(
        column.map((n) => {
          const around = neighbours[n];
          return [
            n,
            around.length === 0 ? row[n] : around.reduce((sum, m) => sum + row[m], 0) / around.length,
          ];
        }),
      );
      column.sort((a, b) => (pull.get(a) ?? 0) - (pull.get(b) ?? 0) || a - b);
      column.forEach((n, k) => (row[n] = k - (column.length - 1) / 2));
    }
  }
  return columns;
}

function stepsFrom(neighbours: readonly (readonly number[])[], start: number): (number | undefined)[] {
  const steps: (number | undefined)[] = neighbours.map(() => undefined);
  if (start < 0 || start >= neighbours.length) return steps;
  steps[start] = 0;
  const queue = [start];
  for (let k = 0; k < queue.length; k++) {
    for (const other of neighbours[queue[k]]) {
      if (steps[other] !== undefined) continue;
      steps[other] = (steps[queue[k]] ?? 0) + 1;
      queue.push(other);
    }
  }
  return steps;
}

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
/** So near a line covers what is written at a node. */
const NEAR = 40;
/** Small parts stand side by side up to this width. */
const ROW_WIDTH = 3 * COLUMN + 2 * MARGIN_X;

/** An element with the places of its two nodes among the names. */
interface Joint {
  readonly id: number;
  readonly index: number;
  readonly a: number;
  readonly b: number;
}

/** What no chain of elements joins stands apart: the ports' part first, the others below it, side by side. */
export function layOut(network: Pick<Network, "elements" | "ports">): Layout {
  const names = nodeNames(network);
  const number = new Map(names.map((name, k) => [name, k]));
  const joints = network.elements.flatMap(({ id, from, to }, index): Joint[] => {
    const [a, b] = [number.get(from.trim()), number.get(to.trim())];
    return a === undefined || b === undefined || a === b ? [] : [{ id, index, a, b }];
  });
  const ports = network.ports.map((name) => number.get(name.trim()));
  const parts = partsOf(names.length, joints).map((part) => layOutPart(names, joints, part, ports));
  const widest = Math.max(ROW_WIDTH, ...parts.map(({ width }) => width));
  let [x, y, height, width] = [0, 0, 0, 0];
  const nodes: PlacedNode[] = names.map((name) => ({ name, x: 0, y: 0 }));
  const bends: number[] = [];
  for (const part of parts) {
    if (x > 0 && x + part.width > widest) [x, y, height] = [0, y + height, 0];
    for (const [n, place] of part.places) nodes[n] = { name: names[n], x: x + place.x, y: y + place.y };
    for (const [index, bend] of part.bends) bends[index] = bend;
    x += part.width;
    width = Math.max(width, x);
    height = Math.max(height, part.height);
  }
  return {
    width,
    height: y + height,
    nodes,
    elements: joints.map(({ id, index, a, b }) => ({
      id,
      index,
      from: nodes[a],
      to: nodes[b],
      bend: bends[index],
    })),
  };
}

/** Nodes that chains of elements join, as lists; those of the first nodes, which are the ports, come first. */
function partsOf(count: number, joints: readonly Joint[]): readonly (readonly number[])[] {
  const neighbours = neighboursOf(count, joints);
  const seen = new Set<number>();
  const parts: number[][] = [];
  for (let n = 0; n < count; n++) {
    if (seen.has(n)) continue;
    const steps = stepsFrom(neighbours, n);
    const part = steps.flatMap((step, k) => (step === undefined ? [] : [k]));
    part.forEach((k) => seen.add(k));
    parts.push(part);
  }
  return parts;
}

function neighboursOf(count: number, joints: readonly Joint[]): readonly number[][] {
  const neighbours = Array.from({ length: count }, (): number[] => []);
  for (const { a, b } of joints) {
    neighbours[a].push(b);
    neighbours[b].push(a);
  }
  return neighbours;
}

interface PlacedPart {
  readonly width: number;
  readonly height: number;
  /** By the nodes' numbers. */
  readonly places: ReadonlyMap<number, { readonly x: number; readonly y: number }>;
  /** By the elements' places in the network. */
  readonly bends: ReadonlyMap<number, number>;
}

function layOutPart(
  names: readonly string[],
  all: readonly Joint[],
  part: readonly number[],
  ports: readonly (number | undefined)[],
): PlacedPart {
  const own = new Map(part.map((n, k) => [n, k]));
  const joints = all.flatMap((joint): Joint[] => {
    const [a, b] = [own.get(joint.a), own.get(joint.b)];
    return a === undefined || b === undefined ? [] : [{ ...joint, a, b }];
  });
  const neighbours = neighboursOf(part.length, joints);
  const [high, low] = endsOf(neighbours, ...ports.map((n) => (n === undefined ? undefined : own.get(n))));
  const columns = inColumns(part.length, neighbours, high, low);
  const tallest = Math.max(1, ...columns.map((column) => column.length));
  const nodes: PlacedNode[] = part.map((n) => ({ name: names[n], x: 0, y: 0 }));
  for (const [k, column] of columns.entries()) {
    for (const [place, n] of column.entries()) {
      const y = MARGIN_Y + LINE * (place + (tallest - column.length) / 2);
      nodes[n] = { ...nodes[n], x: MARGIN_X + COLUMN * k, y };
    }
  }
  const pairs = new Map<string, Joint[]>();
  for (const joint of joints) {
    const key = [joint.a, joint.b].sort((one, other) => one - other).join(" ");
    pairs.set(key, [...(pairs.get(key) ?? []), joint]);
  }
  const bends = new Map<number, number>();
  for (const group of pairs.values()) {
    for (const [k, { index, a, b }] of group.entries()) {
      const offset = (k - (group.length - 1) / 2) * 84;
      const side = leftToRight(nodes[a], nodes[b]) ? 1 : -1;
      bends.set(index, side * offset + LINE * 0.6 * awayFromNode(nodes, a, b, side));
    }
  }
  const reach = Math.max(0, ...[...bends.values()].map(Math.abs));
  const extra = Math.max(0, reach + 46 - MARGIN_Y);
  return {
    width: 2 * MARGIN_X + COLUMN * Math.max(part.length === 1 ? 0 : 1, columns.length - 1),
    height: 2 * MARGIN_Y + LINE * (tallest - 1) + 2 * extra,
    places: new Map(part.map((n, k) => [n, { x: nodes[k].x, y: nodes[k].y + extra }])),
    bends,
  };
}

/** Between which nodes a part runs: from port to another port, or from one end to the one farthest from it. */
function endsOf(
  neighbours: readonly (readonly number[])[],
  first?: number,
  second?: number,
): readonly [number, number] {
  const farthest = (from: number): number => {
    const steps = stepsFrom(neighbours, from);
    return steps.reduce((best: number, step, k) => ((step ?? 0) > (steps[best] ?? 0) ? k : best), from);
  };
  if (first !== undefined && first === second) return [first, farthest(first)];
  if (first !== undefined) return [first, second ?? farthest(first)];
  if (second !== undefined) return [farthest(second), second];
  return [0, farthest(0)];
}

function leftToRight(from: PlacedNode, to: PlacedNode): boolean {
  return from.x === to.x ? from.y < to.y : from.x < to.x;
}

/**
 * To which side a straight line must bend so that it keeps off a third node and what is written there: 1, -1, or 0 where
 * none is near. `side` decides for a node right on the line.
 */
function awayFromNode(nodes: readonly PlacedNode[], a: number, b: number, side: number): number {
  const [p, q] = [nodes[a], nodes[b]];
  const [dx, dy] = [q.x - p.x, q.y - p.y];
  const length = Math.hypot(dx, dy) || 1;
  let nearest = NEAR;
  let away = 0;
  for (const [k, node] of nodes.entries()) {
    if (k === a || k === b) continue;
    const along = ((node.x - p.x) * dx + (node.y - p.y) * dy) / length ** 2;
    if (along <= 0.02 || along >= 0.98) continue;
    const off = ((node.y - p.y) * dx - (node.x - p.x) * dy) / length;
    if (Math.abs(off) >= nearest) continue;
    nearest = Math.abs(off);
    away = nearest < 1 ? side : -Math.sign(off);
  }
  return away;
}

function inColumns(
  count: number,
  neighbours: readonly (readonly number[])[],
  high: number,
  low: number,
): number[][] {
  const fromHigh = stepsFrom(neighbours, high);
  const fromLow = stepsFrom(neighbours, low);
  const span = Math.max(1, fromHigh[low] ?? 1);
  const groups = new Map<number, number[]>();
  for (let n = 0; n < count; n++) {
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
  const row = new Float64Array(count);
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

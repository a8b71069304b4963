/** The lines of a plan drawing with its terminals: for records, widgets and lists of outlines. */
import type { OutlineInput, TerminalInput } from "@/lib/engine/field/outline/schema";

export type PlanPoint = readonly [number, number];

export interface OutlinePlan {
  readonly width: number;
  readonly height: number;
  /** The conductor, to be filled by the even-odd rule. */
  readonly path: string;
  readonly terminals: readonly {
    readonly name: string;
    readonly path: string;
    /** Middle of its first piece, for a label. */
    readonly at: PlanPoint;
  }[];
  /** "40 × 25 mm" */
  readonly size: string;
}

interface Sheet {
  readonly width: number;
  /** Highest that the drawing may be, without its margins. */
  readonly tallest: number;
  readonly margin: number;
}

type Ring = OutlineInput["outer"];
type Vertex = Ring[number];
type Arc = Exclude<Vertex, readonly unknown[]>;
type Place = (point: PlanPoint) => PlanPoint;

/** Lays an outline out on a sheet, as large as it fits; y points up in the outline and down here. */
export function outlinePlan(
  outline: OutlineInput,
  terminals: readonly TerminalInput[],
  { width, tallest, margin }: Sheet,
): OutlinePlan {
  const rings = [outline.outer, ...outline.holes];
  const points = rings.flatMap((ring) =>
    ring.flatMap((vertex, index) =>
      isPoint(vertex) ? [vertex] : arcExtent(endOf(ring.at(index - 1) ?? vertex), vertex),
    ),
  );
  const [minX, maxX] = extent(points.map(([x]) => x));
  const [minY, maxY] = extent(points.map(([, y]) => y));
  const scale = Math.min((width - 2 * margin) / (maxX - minX || 1), tallest / (maxY - minY || 1));
  const left = (width - (maxX - minX) * scale) / 2;
  const place: Place = ([x, y]) => [left + (x - minX) * scale, margin + (maxY - y) * scale];
  return {
    width,
    height: (maxY - minY) * scale + 2 * margin,
    path: rings.map((ring) => ringPath(ring, place, scale)).join(""),
    terminals: terminals.map(({ name, segments = [], parts = [] }) => {
      const pieces = [
        ...segments.map(([a, b]) => straight(place(a), place(b))),
        ...parts.flatMap((part) => partPiece(rings[part.ring] ?? [], part, place, scale)),
      ];
      return {
        name,
        path: pieces.map(({ path }) => path).join(""),
        at: pieces[0]?.at ?? place([minX, minY]),
      };
    }),
    size: `${shown(maxX - minX)} × ${shown(maxY - minY)} ${outline.unit}`,
  };
}

interface Piece {
  readonly path: string;
  readonly at: PlanPoint;
}

function isPoint(vertex: Vertex): vertex is Extract<Vertex, readonly unknown[]> {
  return Array.isArray(vertex);
}

function endOf(vertex: Vertex): PlanPoint {
  return isPoint(vertex) ? vertex : vertex.arcTo;
}

/** Angle through which an arc turns, in the direction in which it runs, rad: 0 to 2π. */
function sweep(from: PlanPoint, { arcTo, center, clockwise }: Arc): number {
  const angle = ([x, y]: PlanPoint) => Math.atan2(y - center[1], x - center[0]);
  const turn = (clockwise ? -1 : 1) * (angle(arcTo) - angle(from));
  return ((turn % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI);
}

/** The end of an arc and where it lies farthest out on the way. */
function arcExtent(from: PlanPoint, arc: Arc): PlanPoint[] {
  const { arcTo, center } = arc;
  const radius = Math.hypot(arcTo[0] - center[0], arcTo[1] - center[1]);
  const whole = sweep(from, arc);
  const corners: readonly PlanPoint[] = [
    [center[0] + radius, center[1]],
    [center[0], center[1] + radius],
    [center[0] - radius, center[1]],
    [center[0], center[1] - radius],
  ];
  return [arcTo, ...corners.filter((corner) => sweep(from, { ...arc, arcTo: [...corner] }) <= whole)];
}

function ringPath(ring: Ring, place: Place, scale: number): string {
  if (ring.length === 0) return "";
  const start = endOf(ring[ring.length - 1]);
  const edges = ring.map((vertex, index) => edge(endOf(ring.at(index - 1) ?? vertex), vertex, place, scale));
  return `M${xy(place(start))}${edges.join("")}Z`;
}

function edge(from: PlanPoint, vertex: Vertex, place: Place, scale: number): string {
  if (isPoint(vertex)) return `L${xy(place(vertex))}`;
  const { arcTo, center, clockwise } = vertex;
  const radius = Math.hypot(arcTo[0] - center[0], arcTo[1] - center[1]) * scale;
  // Paper has y down, so what runs anticlockwise on the drawing has the flag 0 here.
  const large = sweep(from, vertex) > Math.PI ? 1 : 0;
  return `A${n(radius)} ${n(radius)} 0 ${large} ${clockwise ? 1 : 0} ${xy(place(arcTo))}`;
}

function partPiece(
  ring: Ring,
  { edge: index, from, to }: { readonly edge: number; readonly from: number; readonly to: number },
  place: Place,
  scale: number,
): Piece[] {
  const [start, target] = [ring[index], ring[(index + 1) % ring.length]];
  if (start === undefined || target === undefined) return [];
  const a = endOf(start);
  const b = endOf(target);
  // An arc counts as one edge; a part of it is marked whole, the table says which part.
  if (!isPoint(target)) {
    const half = (target.clockwise ? -1 : 1) * (sweep(a, target) / 2);
    const [dx, dy] = [a[0] - target.center[0], a[1] - target.center[1]];
    const middle: PlanPoint = [
      target.center[0] + dx * Math.cos(half) - dy * Math.sin(half),
      target.center[1] + dx * Math.sin(half) + dy * Math.cos(half),
    ];
    return [{ path: `M${xy(place(a))}${edge(a, target, place, scale)}`, at: place(middle) }];
  }
  const on = (share: number): PlanPoint => [a[0] + share * (b[0] - a[0]), a[1] + share * (b[1] - a[1])];
  return [straight(place(on(from)), place(on(to)))];
}

function straight(a: PlanPoint, b: PlanPoint): Piece {
  return { path: `M${xy(a)}L${xy(b)}`, at: [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2] };
}

function extent(values: readonly number[]): readonly [number, number] {
  return values.reduce<[number, number]>(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [Infinity, -Infinity],
  );
}

function shown(length: number): string {
  return String(Number(length.toPrecision(4)));
}

function n(value: number): string {
  return String(Math.round(value * 100) / 100);
}

function xy([x, y]: PlanPoint): string {
  return `${n(x)} ${n(y)}`;
}

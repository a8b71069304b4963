/** An outline with its terminals as a picture, for records whose field picture is no longer kept. */
import { outlineSchema, terminalSchema, type OutlineInput, type TerminalInput } from "@/lib/engine";

type Point = readonly [number, number];

export const storedOutline = outlineSchema;
export const storedTerminals = terminalSchema.array();

const WIDTH = 560;
const MARGIN = 30;
const TALLEST = 420;
const COLOURS = ["#9C4A1F", "#1F6F62", "#566067"];

export function outlineSvg(outline: OutlineInput, terminals: readonly TerminalInput[]): string {
  const rings = [outline.outer, ...outline.holes];
  const points = rings.flatMap((ring) =>
    ring.flatMap((vertex) => (isPoint(vertex) ? [vertex] : arcExtent(vertex))),
  );
  const [minX, maxX] = extent(points.map(([x]) => x));
  const [minY, maxY] = extent(points.map(([, y]) => y));
  const scale = Math.min((WIDTH - 2 * MARGIN) / (maxX - minX || 1), TALLEST / (maxY - minY || 1));
  const height = (maxY - minY) * scale + 2 * MARGIN + 24;
  const left = (WIDTH - (maxX - minX) * scale) / 2;
  const place = ([x, y]: Point): string =>
    `${n(left + (x - minX) * scale)} ${n(MARGIN + (maxY - y) * scale)}`;
  const path = rings.map((ring) => ringPath(ring, place, scale)).join("");
  const marks = terminals.map(({ segments = [], parts = [] }, index) => {
    const lines = [
      ...segments.map(([a, b]) => `M${place(a)}L${place(b)}`),
      ...parts.map((part) => partPath(rings[part.ring] ?? [], part, place, scale)),
    ];
    return `<path d="${lines.join("")}" fill="none" stroke="${COLOURS[Math.min(index, 2)]}" stroke-width="5"/>`;
  });
  const names = terminals.map(
    ({ name }, index) =>
      `<tspan fill="${COLOURS[Math.min(index, 2)]}">${escape(name)}${index < terminals.length - 1 ? ", " : ""}</tspan>`,
  );
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${WIDTH} ${n(height)}" width="${WIDTH}" height="${n(height)}">`,
    `<rect width="${WIDTH}" height="${n(height)}" fill="#faf8f3"/>`,
    `<path d="${path}" fill="#9C4A1F" fill-opacity="0.12" fill-rule="evenodd" stroke="#1B2226" stroke-width="1.2"/>`,
    ...marks,
    `<text x="${WIDTH / 2}" y="${n(height - 10)}" text-anchor="middle" font-family="Spline Sans, system-ui, sans-serif" font-size="13">${names.join("")}</text>`,
    `</svg>`,
  ].join("\n");
}

type Ring = OutlineInput["outer"];
type Vertex = Ring[number];

function isPoint(vertex: Vertex): vertex is Extract<Vertex, readonly unknown[]> {
  return Array.isArray(vertex);
}

function endOf(vertex: Vertex): Point {
  return isPoint(vertex) ? vertex : vertex.arcTo;
}

/** All that an arc can reach; a little room to spare does no harm. */
function arcExtent({ arcTo, center }: Exclude<Vertex, readonly unknown[]>): Point[] {
  const radius = Math.hypot(arcTo[0] - center[0], arcTo[1] - center[1]);
  return [arcTo, [center[0] - radius, center[1] - radius], [center[0] + radius, center[1] + radius]];
}

function ringPath(ring: Ring, place: (point: Point) => string, scale: number): string {
  if (ring.length === 0) return "";
  const start = endOf(ring[ring.length - 1]);
  return `M${place(start)}${ring.map((vertex, index) => edge(endOf(ring.at(index - 1) ?? vertex), vertex, place, scale)).join("")}Z`;
}

function edge(from: Point, vertex: Vertex, place: (point: Point) => string, scale: number): string {
  if (isPoint(vertex)) return `L${place(vertex)}`;
  const { arcTo, center, clockwise } = vertex;
  const radius = Math.hypot(arcTo[0] - center[0], arcTo[1] - center[1]) * scale;
  const angle = (point: Point) => Math.atan2(point[1] - center[1], point[0] - center[0]);
  const turn = (clockwise ? -1 : 1) * (angle(arcTo) - angle(from));
  const swept = ((turn % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI);
  // Paper has y down, so what runs anticlockwise on the drawing has the flag 0 here.
  return `A${n(radius)} ${n(radius)} 0 ${swept > Math.PI ? 1 : 0} ${clockwise ? 1 : 0} ${place(arcTo)}`;
}

function partPath(
  ring: Ring,
  { edge: index, from, to }: { readonly edge: number; readonly from: number; readonly to: number },
  place: (point: Point) => string,
  scale: number,
): string {
  const [start, target] = [ring[index], ring[(index + 1) % ring.length]];
  if (start === undefined || target === undefined) return "";
  const a = endOf(start);
  const b = endOf(target);
  // An arc counts as one edge; a part of it is marked whole, the table says which part.
  if (!isPoint(target)) return `M${place(a)}${edge(a, target, place, scale)}`;
  const at = (share: number): Point => [a[0] + share * (b[0] - a[0]), a[1] + share * (b[1] - a[1])];
  return `M${place(at(from))}L${place(at(to))}`;
}

function extent(values: readonly number[]): readonly [number, number] {
  return values.reduce<[number, number]>(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [Infinity, -Infinity],
  );
}

function n(value: number): string {
  return String(Math.round(value * 100) / 100);
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);
}

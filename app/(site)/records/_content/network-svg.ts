/** A network as a picture: its nodes from one port to the other, each element with its name and resistance. */
import type { PlotLook } from "@/lib/engine";
import { layOut, type PlacedElement } from "../../network/_model/layout";
import { newElement } from "../../network/_model/network";

/** Beyond so many elements their names would cover each other. */
export const MOST_DRAWN = 40;
const BODY = { length: 46, width: 15 };
/** Room above and below for names, px. */
const MARGIN = 44;
/** Largest width of one unit of the layout, px. */
const LARGEST = 1.25;
/** Least height of that unit, px: closer lines would cover each other's names. */
const LEAST_HEIGHT = 0.7;

export interface DrawnElement {
  readonly name: string;
  readonly from: string;
  readonly to: string;
  /** "42 µΩ" */
  readonly resistance: string;
}

export function networkSvg(
  elements: readonly DrawnElement[],
  ports: readonly [string, string],
  { width, colours }: PlotLook,
): string {
  const layout = layOut({
    elements: elements.map(({ name, from, to, resistance }) =>
      newElement({ name, from, to, value: { kind: "resistance", text: resistance } }),
    ),
    ports,
  });
  const scale = Math.min(LARGEST, width / layout.width);
  const tall = Math.max(scale, LEAST_HEIGHT);
  const left = (width - scale * layout.width) / 2;
  const heights = [...layout.nodes.map(({ y }) => y), ...layout.elements.map((each) => bowOf(each)[0][1])];
  const [highest, lowest] = [Math.min(...heights), Math.max(...heights)];
  const height = n(tall * (lowest - highest) + 2 * MARGIN);
  const spot = ([x, y]: readonly [number, number]) =>
    [n(left + scale * x), n(tall * (y - highest) + MARGIN)] as const;
  const branches = layout.elements.map((placed) => {
    const { from, to } = placed;
    const { name, resistance } = elements[placed.index];
    const [middle, control] = bowOf(placed);
    const [a, b, m, c] = [[from.x, from.y] as const, [to.x, to.y] as const, middle, control].map(spot);
    const angle = (Math.atan2(b[1] - a[1], b[0] - a[0]) * 180) / Math.PI;
    const steep = Math.abs(Math.abs(angle) - 90) < 30;
    const at = steep ? [m[0] + 14, m[1] - 4] : [m[0], m[1] - 14];
    const anchor = steep ? "start" : "middle";
    return [
      `<path d="M${a.join(" ")}Q${c.join(" ")} ${b.join(" ")}" fill="none" stroke="${colours.ink}" stroke-width="1.4"/>`,
      `<rect x="${n(m[0] - BODY.length / 2)}" y="${n(m[1] - BODY.width / 2)}" width="${BODY.length}" height="${BODY.width}" transform="rotate(${n(angle)} ${m.join(" ")})" fill="${colours.sheet}" stroke="${colours.high}" stroke-width="1.4"/>`,
      text(at[0], at[1], name, colours.ink, anchor),
      text(at[0], steep ? m[1] + 14 : m[1] + 24, resistance, colours.soft, anchor),
    ].join("\n");
  });
  const nodes = layout.nodes.map(({ name, x, y }) => {
    const [cx, cy] = spot([x, y]);
    const port = ports.indexOf(name);
    const colour = [colours.high, colours.low][port] ?? colours.ink;
    return `<circle cx="${cx}" cy="${cy}" r="${port < 0 ? 4.5 : 7}" fill="${colour}"/>${text(cx, cy - 13, name, colour, "middle", true)}`;
  });
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" font-family="'Spline Sans', system-ui, sans-serif" font-size="14">`,
    ...branches,
    ...nodes,
    `</svg>`,
  ].join("\n");
}

/** Middle of an element that stands off the straight line, and the control point of the bow through it. */
function bowOf({
  from,
  to,
  bend,
}: PlacedElement): readonly [readonly [number, number], readonly [number, number]] {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  const length = Math.hypot(dx, dy) || 1;
  const off = (by: number) =>
    [(from.x + to.x) / 2 - (dy / length) * by, (from.y + to.y) / 2 + (dx / length) * by] as const;
  return [off(bend), off(2 * bend)];
}

/** A name that is too long for its place is cut; the table below has it whole. */
const LONGEST = 18;

function text(x: number, y: number, words: string, fill: string, anchor: string, strong = false): string {
  const shown = words.length > LONGEST ? `${words.slice(0, LONGEST - 1)}…` : words;
  return `<text x="${n(x)}" y="${n(y)}" text-anchor="${anchor}"${strong ? ` font-weight="600"` : ""} fill="${fill}">${escape(shown)}</text>`;
}

function n(value: number): number {
  return Math.round(value * 100) / 100;
}

function escape(words: string): string {
  return words.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);
}

/** An outline with its terminals as a picture, for records whose field picture is no longer kept. */
import { outlinePlan } from "@/app/_ui/drawing/outline-plan";
import {
  outlineSchema,
  type PlotLook,
  terminalSchema,
  type OutlineInput,
  type TerminalInput,
} from "@/lib/engine";

export const storedOutline = outlineSchema;
export const storedTerminals = terminalSchema.array();

const MARGIN = 30;
/** Below the drawing, for the names of the terminals. */
const FOOT = 24;

export function outlineSvg(
  outline: OutlineInput,
  terminals: readonly TerminalInput[],
  { width, tallest, colours }: PlotLook,
): string {
  const sheet = { width, tallest, margin: MARGIN };
  const { height: drawn, path, terminals: marks } = outlinePlan(outline, terminals, sheet);
  const colour = (index: number): string => [colours.high, colours.low][index] ?? colours.open;
  const height = Math.round((drawn + FOOT) * 100) / 100;
  const lines = marks.map(
    (mark, index) => `<path d="${mark.path}" fill="none" stroke="${colour(index)}" stroke-width="5"/>`,
  );
  const names = marks.map(
    ({ name }, index) =>
      `<tspan fill="${colour(index)}">${escape(name)}${index < marks.length - 1 ? ", " : ""}</tspan>`,
  );
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" font-family="'Spline Sans', system-ui, sans-serif" font-size="14">`,
    `<path d="${path}" fill="${colours.high}" fill-opacity="0.12" fill-rule="evenodd" stroke="${colours.ink}" stroke-width="1.2"/>`,
    ...lines,
    `<text x="${width / 2}" y="${height - 10}" text-anchor="middle">${names.join("")}</text>`,
    `</svg>`,
  ].join("\n");
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);
}

/** The finished picture of a field solution: legible alone, with scale bar, terminals and legend. */
import { contours } from "d3-contour";
import { formatQuantity } from "../../quantity/format-quantity";
import { boundaryRings } from "./boundary-rings";
import { densityRamp } from "./color-ramp";
import { fieldLines } from "./contours";
import type { FieldMap } from "./field-map";
import { regionBorders } from "./region-borders";
import { densityRaster, type DensityRaster } from "./raster";
import { plotFoot, footHeight } from "./plot-foot";
import { FILE_LOOK, FONT, MARGIN, NARROW, type PlotLook } from "./plot-look";
import { namedPieces, padsFor, plotTerminals } from "./plot-terminals";
import { escapeText, px } from "./plot-text";

export interface PlotText {
  /** First line, such as "R = 327.94 Ω". */
  readonly title: string;
  /** Second line: bounds and their basis. */
  readonly subtitle: string;
  readonly terminalNames: readonly string[];
  /** The outline's unit. */
  readonly unit: string;
}

/** Room above the conductor for result and bounds, px. */
const HEAD = 72;
/** A conductor of any proportions is drawn at least so high, px. */
const LOWEST = 8;
const BANDS = 9;
const LINES = 20;
/** Shares of voltage and current that lines may cut, and how near they may come to each other on average, px. */
const SHARES = [LINES, 10, 5, 4, 2];
const LEAST_APART = 4;
/** Densities above this share of the raster's cells are one colour: a corner would swallow the scale. */
const TOP_SHARE = 0.985;
/** An axis that is farther from the conductor than this share of its width is told and not drawn. */
const AXIS_NEAR = 0.6;

/** SVG text of the picture. It has attributes and no rules of style, so that it can stand inside a page. */
export function plotSvg(map: FieldMap, text: PlotText, look: PlotLook = FILE_LOOK): string {
  const { width, colours } = look;
  const { rings, pieces } = boundaryRings(map);
  const body = boxOf(rings);
  const axisShown = map.axisymmetric && body.minX < AXIS_NEAR * (body.maxX - body.minX);
  const box = axisShown ? { ...body, minX: Math.min(0, body.minX) } : body;
  const named = namedPieces(pieces, text.terminalNames);
  const pads = padsFor(named, width);
  const inner = width - 2 * MARGIN - pads.left - pads.right;
  const scale = Math.min(inner / (box.maxX - box.minX), look.tallest / (box.maxY - box.minY));
  const height = Math.max(LOWEST, scale * (box.maxY - box.minY));
  const left = MARGIN + pads.left + (inner - scale * (box.maxX - box.minX)) / 2;
  const head = look.titled ? HEAD : 0;
  const top = head + pads.top + (height - scale * (box.maxY - box.minY)) / 2;
  const bottom = head + pads.top + height + pads.bottom;
  const x = (value: number): number => left + scale * (value - box.minX);
  const y = (value: number): number => top + scale * (box.maxY - value);
  const shown = (line: readonly number[]): number[] =>
    line.map((value, k) => (k % 2 === 0 ? x(value) : y(value)));
  const path = (line: readonly number[], closed = false): string => {
    let d = "";
    for (let k = 0; k < line.length; k += 2)
      d += `${k === 0 ? "M" : "L"}${px(x(line[k]))} ${px(y(line[k + 1]))}`;
    return closed ? `${d}Z` : d;
  };
  const outline = rings.map((ring) => path(ring, true)).join("");
  const raster = densityRaster(map, 200);
  const bands = densityBands(raster);
  const { lines, voltages, currents } = legibleLines(map, scale ** 2 * areaOf(rings), scale);
  const equipotentials = lines.equipotentials
    .flatMap((level) => level.lines.map((line) => path(line)))
    .join("");
  const streamlines = lines.streamlines.map((line) => path(line)).join("");
  const borders = regionBorders(map)
    .map((segment) => path(segment))
    .join("");
  const notes = notesOf({ look, voltages, currents, axisApart: map.axisymmetric && !axisShown });
  const total = bottom + footHeight(look, notes.length);
  const terminals = plotTerminals({
    map,
    pieces: pieces.map(({ terminal, line }) => ({ terminal, line: shown(line) })),
    named: named.map((piece) => ({ ...piece, line: shown(piece.line) })),
    rings: rings.map(shown),
    frame: { x: 4, y: head + 2, width: width - 8, height: bottom - head - 4 },
    colours,
  });
  const id = (name: string): string => `${look.id}-${name}`;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${px(total)}" width="${width}" height="${px(total)}" role="img" aria-labelledby="${id("title")} ${id("text")}" font-family="'Spline Sans', system-ui, sans-serif" font-size="${FONT}">`,
    `<title id="${id("title")}">${escapeText(text.title)}</title>`,
    `<desc id="${id("text")}">${escapeText(text.subtitle)} ${voltages - 1} equipotentials and ${currents} equal shares of the current over the current density.</desc>`,
    look.ground ? `<rect width="${width}" height="${px(total)}" fill="${colours.sheet}"/>` : "",
    look.titled
      ? `<text x="${MARGIN}" y="34" font-size="22" font-weight="600" fill="${colours.ink}">${escapeText(text.title)}</text>` +
        `<text x="${MARGIN}" y="57" fill="${colours.soft}">${escapeText(text.subtitle)}</text>`
      : "",
    `<clipPath id="${id("conductor")}"><path d="${outline}" clip-rule="evenodd"/></clipPath>`,
    `<g clip-path="url(#${id("conductor")})">`,
    `<path d="${outline}" fill="${bands.colours[0]}"/>`,
    ...bands.levels.map(
      ({ colour, polygons }) =>
        `<path d="${bandPath(polygons, raster, path)}" fill="${colour}" fill-rule="evenodd"/>`,
    ),
    `<path d="${equipotentials}" fill="none" stroke="#1b2226" stroke-width="0.8"/>`,
    `<path d="${streamlines}" fill="none" stroke="#1f6f62" stroke-width="0.8" stroke-dasharray="6 3"/>`,
    borders === ""
      ? ""
      : `<path d="${borders}" fill="none" stroke="#1b2226" stroke-width="2" stroke-linecap="round"/>`,
    `</g>`,
    `<path d="${outline}" fill="none" stroke="${colours.ink}" stroke-width="1.5" stroke-linejoin="round"/>`,
    axisShown
      ? `<path d="M${px(x(0))} ${px(y(box.maxY) - 12)}V${px(y(box.minY) + 12)}" stroke="${colours.soft}" stroke-dasharray="14 4 3 4"/>`
      : "",
    ...terminals,
    plotFoot({
      look,
      y: bottom,
      scale,
      unit: text.unit,
      colours: bands.colours,
      top: formatQuantity(bands.limits[BANDS - 1], map.axisymmetric ? "A/m^2" : "A/m", { digits: 3 }),
      notes,
    }),
    `</svg>`,
  ].join("\n");
}

/** What the lines are, in as many lines of text as the width asks for. */
function notesOf({
  look,
  voltages,
  currents,
  axisApart,
}: {
  readonly look: PlotLook;
  readonly voltages: number;
  readonly currents: number;
  readonly axisApart: boolean;
}): string[] {
  const lines = [
    `solid: equipotentials, ${100 / voltages} % of the voltage apart`,
    `dashed: stream lines, ${100 / currents} % of the current apart`,
  ];
  return [
    ...(look.width < NARROW ? lines : [lines.join(" · ")]),
    ...(axisApart ? ["The axis x = 0 lies to the left of the picture."] : []),
  ];
}

/** As many lines as keep apart from each other: in a long narrow conductor twenty stream lines are one stripe. */
function legibleLines(map: FieldMap, areaPx: number, scale: number) {
  const lines = fieldLines(map, LINES, LINES);
  const lengthOf = (all: readonly (readonly number[])[]): number => {
    let sum = 0;
    for (const line of all)
      for (let k = 2; k < line.length; k += 2)
        sum += Math.hypot(line[k] - line[k - 2], line[k + 1] - line[k - 1]);
    return sum * scale;
  };
  const allowed = (length: number): number =>
    SHARES.find((shares) => (areaPx / length) * (LINES / shares) >= LEAST_APART) ?? 2;
  const voltages = allowed(lengthOf(lines.equipotentials.flatMap(({ lines: parts }) => parts)));
  const currents = allowed(lengthOf(lines.streamlines));
  const enough = voltages === LINES && currents === LINES;
  return { lines: enough ? lines : fieldLines(map, voltages, currents), voltages, currents };
}

/** Area of the conductor: the rings run with it on their left. */
function areaOf(rings: readonly number[][]): number {
  let twice = 0;
  for (const ring of rings) {
    for (let k = 0; k < ring.length; k += 2) {
      const next = (k + 2) % ring.length;
      twice += ring[k] * ring[next + 1] - ring[next] * ring[k + 1];
    }
  }
  return Math.abs(twice) / 2;
}

interface Box {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
}

function boxOf(rings: readonly number[][]): Box {
  const box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity };
  for (const ring of rings) {
    for (let k = 0; k < ring.length; k += 2) {
      box.minX = Math.min(box.minX, ring[k]);
      box.maxX = Math.max(box.maxX, ring[k]);
      box.minY = Math.min(box.minY, ring[k + 1]);
      box.maxY = Math.max(box.maxY, ring[k + 1]);
    }
  }
  return box;
}

interface Bands {
  readonly colours: readonly string[];
  /** Lower limits of the bands, for one volt. */
  readonly limits: readonly number[];
  readonly levels: readonly { readonly colour: string; readonly polygons: number[][][][] }[];
}

function densityBands(raster: DensityRaster): Bands {
  const { columns, rows } = raster;
  const known = raster.density.filter((value) => value !== null).sort((a, b) => a - b);
  const most = known[Math.min(known.length - 1, Math.floor(TOP_SHARE * known.length))] ?? 1;
  const colours = densityRamp(BANDS);
  const limits = colours.map((_, k) => (k / BANDS) * most);
  const values = filled(raster);
  const make = contours().size([columns, rows]).smooth(true);
  const levels = colours.slice(1).map((colour, k) => ({
    colour,
    polygons: make.contour(values, limits[k + 1]).coordinates,
  }));
  return { colours, limits, levels };
}

/** Cells outside the conductor take the value of a neighbour inside, so that bands run on to its edge. */
function filled({ columns, rows, density }: DensityRaster): number[] {
  const values = density.slice();
  for (let round = 0; round < 3; round++) {
    const before = values.slice();
    for (let j = 0; j < rows; j++) {
      for (let i = 0; i < columns; i++) {
        if (before[j * columns + i] !== null) continue;
        let sum = 0;
        let count = 0;
        for (const [di, dj] of [
          [1, 0],
          [-1, 0],
          [0, 1],
          [0, -1],
          [1, 1],
          [-1, -1],
          [1, -1],
          [-1, 1],
        ]) {
          const [a, b] = [i + di, j + dj];
          const value = a < 0 || b < 0 || a >= columns || b >= rows ? null : before[b * columns + a];
          if (value === null) continue;
          sum += value;
          count++;
        }
        if (count > 0) values[j * columns + i] = sum / count;
      }
    }
  }
  return values.map((value) => value ?? 0);
}

/** Grid coordinates of d3-contour have cell k between k and k + 1. */
function bandPath(
  polygons: number[][][][],
  { origin, cell }: DensityRaster,
  path: (line: readonly number[], closed: boolean) => string,
): string {
  const place = ([x, y]: number[]): number[] => [origin[0] + (x - 0.5) * cell, origin[1] + (y - 0.5) * cell];
  return polygons.flatMap((rings) => rings.map((ring) => path(ring.flatMap(place), true))).join("");
}

/** The finished picture of a field solution: legible alone, with scale bar, terminals and legend. */
import { contours } from "d3-contour";
import { formatQuantity } from "../../quantity/format-quantity";
import { boundaryRings } from "./boundary-rings";
import { densityRamp } from "./color-ramp";
import { fieldLines } from "./contours";
import type { FieldMap } from "./field-map";
import { regionBorders } from "./region-borders";
import { densityRaster, type DensityRaster } from "./raster";
import { placeLabel, TERMINAL_COLOURS } from "./terminal-label";

export interface PlotText {
  /** First line, such as "R = 327.94 Ω". */
  readonly title: string;
  /** Second line: bounds and their basis. */
  readonly subtitle: string;
  readonly terminalNames: readonly string[];
  /** The outline's unit. */
  readonly unit: string;
}

const WIDTH = 960;
const MARGIN = 56;
const HEAD = 100;
const FOOT = 124;
/** Tallest and flattest drawing, as height over width; longer ones are fitted into the frame. */
const TALLEST = 1;
const FLATTEST = 0.22;
const BANDS = 9;
const LINES = 20;
/** Shares of voltage and current that lines may cut, and how near they may come to each other on average, px. */
const SHARES = [LINES, 10, 5, 4, 2];
const LEAST_APART = 4;
/** Densities above this share of the raster's cells are one colour: a corner would swallow the scale. */
const TOP_SHARE = 0.985;

/** SVG text of the picture. */
export function plotSvg(map: FieldMap, text: PlotText): string {
  const { rings, pieces } = boundaryRings(map);
  const box = boxOf(rings);
  const inner = WIDTH - 2 * MARGIN;
  const shape = (box.maxY - box.minY) / (box.maxX - box.minX);
  const height = inner * Math.min(TALLEST, Math.max(FLATTEST, shape));
  const scale = Math.min(inner / (box.maxX - box.minX), height / (box.maxY - box.minY));
  const left = MARGIN + (inner - scale * (box.maxX - box.minX)) / 2;
  const top = HEAD + (height - scale * (box.maxY - box.minY)) / 2;
  const px = (x: number): number => left + scale * (x - box.minX);
  const py = (y: number): number => top + scale * (box.maxY - y);
  const path = (line: readonly number[], closed = false): string => {
    let d = "";
    for (let k = 0; k < line.length; k += 2)
      d += `${k === 0 ? "M" : "L"}${n(px(line[k]))} ${n(py(line[k + 1]))}`;
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
  const total = HEAD + height + FOOT;
  const frame = { left: MARGIN, right: WIDTH - MARGIN };
  const terminals = pieces.map(({ terminal, line }) => {
    const role = ["high", "low"][map.between.indexOf(terminal)] as "high" | "low" | undefined;
    const colour = TERMINAL_COLOURS[role ?? "open"];
    const [x, y] = middleOf(line);
    const shown = line.map((value, k) => (k % 2 === 0 ? px(value) : py(value)));
    const label = placeLabel(shown, [px(x), py(y)], text.terminalNames[terminal] ?? "", frame);
    return {
      bar: `<path d="${path(line)}" fill="none" stroke="${colour}" stroke-width="6" stroke-linecap="round"/>`,
      name: `<text x="${n(label.x)}" y="${n(label.y)}" text-anchor="${label.anchor}" class="name" style="fill:${colour}">${escape(label.text)}</text>`,
    };
  });
  const axis = map.axisymmetric
    ? `<path d="M${n(px(0))} ${n(top)}V${n(top + scale * (box.maxY - box.minY))}" stroke="#566067" stroke-dasharray="14 4 3 4"/>`
    : "";
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${WIDTH} ${n(total)}" width="${WIDTH}" height="${n(total)}" role="img" aria-labelledby="t d">`,
    `<title id="t">${escape(text.title)}</title>`,
    `<desc id="d">${escape(text.subtitle)} ${voltages - 1} equipotentials and ${currents} equal shares of the current over the current density.</desc>`,
    `<style>text{font:14px "Spline Sans",system-ui,sans-serif;fill:#1b2226}.title{font-size:22px;font-weight:600}.soft{fill:#566067}.name{font-weight:600;paint-order:stroke;stroke:#faf8f3;stroke-width:5px}</style>`,
    `<rect width="${WIDTH}" height="${n(total)}" fill="#faf8f3"/>`,
    `<text x="${MARGIN}" y="34" class="title">${escape(text.title)}</text>`,
    `<text x="${MARGIN}" y="57" class="soft">${escape(text.subtitle)}</text>`,
    `<clipPath id="c"><path d="${outline}" clip-rule="evenodd"/></clipPath>`,
    `<g clip-path="url(#c)">`,
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
    `<path d="${outline}" fill="none" stroke="#1b2226" stroke-width="1.5" stroke-linejoin="round"/>`,
    axis,
    ...terminals.map(({ bar }) => bar),
    ...terminals.map(({ name }) => name),
    scaleBar(scale, total, text.unit),
    legend(
      bands,
      total,
      map,
      `solid: equipotentials, ${100 / voltages} % of the voltage apart · dashed: stream lines, ${100 / currents} % of the current apart`,
    ),
    `</svg>`,
  ].join("\n");
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

/** The point half way along a line. */
function middleOf(line: readonly number[]): [number, number] {
  const lengths: number[] = [];
  for (let k = 2; k < line.length; k += 2)
    lengths.push(Math.hypot(line[k] - line[k - 2], line[k + 1] - line[k - 1]));
  let rest = lengths.reduce((a, b) => a + b, 0) / 2;
  for (let k = 0; k < lengths.length; k++) {
    if (rest <= lengths[k] && lengths[k] > 0) {
      const t = rest / lengths[k];
      return [
        line[2 * k] + t * (line[2 * k + 2] - line[2 * k]),
        line[2 * k + 1] + t * (line[2 * k + 3] - line[2 * k + 1]),
      ];
    }
    rest -= lengths[k];
  }
  return [line[0], line[1]];
}

function scaleBar(scale: number, total: number, unit: string): string {
  const wanted = 180 / scale;
  const power = 10 ** Math.floor(Math.log10(wanted));
  const length = [5, 2, 1].map((f) => f * power).find((l) => l <= wanted) ?? power;
  const y = total - 64;
  const width = length * scale;
  return (
    `<path d="M${MARGIN} ${n(y - 5)}v10m0 -5h${n(width)}m0 -5v10" stroke="#1b2226" fill="none"/>` +
    `<text x="${MARGIN}" y="${n(y + 24)}">${plain(length)}\u2009${escape(unit.replace(/^u/, "µ"))}</text>`
  );
}

/** 1, 2 or 5 times a power of ten, without rows of zeros. */
function plain(length: number): string {
  const power = Math.floor(Math.log10(length) + 1e-9);
  if (power >= -3 && power < 5) return String(Number(length.toPrecision(3)));
  const digits = [...String(Math.abs(power))].map((digit) => "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(digit)]).join("");
  return `${Math.round(length / 10 ** power)}×10${power < 0 ? "⁻" : ""}${digits}`;
}

function legend(bands: Bands, total: number, map: FieldMap, lines: string): string {
  const x = WIDTH - MARGIN - 360;
  const y = total - 76;
  const width = 360 / BANDS;
  const unit = map.axisymmetric ? "A/m^2" : "A/m";
  const boxes = bands.colours.map(
    (colour, k) =>
      `<rect x="${n(x + k * width)}" y="${n(y)}" width="${n(width)}" height="14" fill="${colour}"/>`,
  );
  const top = bands.limits[BANDS - 1];
  return [
    ...boxes,
    `<rect x="${n(x)}" y="${n(y)}" width="360" height="14" fill="none" stroke="#857f73"/>`,
    `<text x="${n(x)}" y="${n(y + 32)}">0</text>`,
    `<text x="${n(x + 360)}" y="${n(y + 32)}" text-anchor="end">${escape(formatQuantity(top, unit, { digits: 3 }))} and more, at one volt</text>`,
    `<text x="${n(x + 360)}" y="${n(y + 54)}" text-anchor="end" class="soft">${lines}</text>`,
  ].join("\n");
}

function n(value: number): string {
  return String(Math.round(value * 100) / 100);
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);
}

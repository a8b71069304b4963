import svgToPdf from "svg-to-pdfkit";
import { FONT_SIZE } from "../../../_ui/drawing/label";
import { type Arrowhead, type PlacedDimension } from "../../../_ui/drawing/dimension-line";
import { layoutSheet } from "../../../_ui/drawing/sheet";
import type { ViewLayout } from "../../../_ui/drawing/view-layout";
import { symbolParts } from "../../../_ui/symbol-text";
import { PAPER_COLOURS } from "@/lib/engine";
import type { Draw, Picture } from "../_content/content";
import { INK, type Pen, SOFT } from "./pen";

const COPPER = "#9C4A1F";
const VERDIGRIS = "#1F6F62";
const PAPER = "#FFFFFF";

/** Layout width of a shape's drawing, as in wide places of a page. */
const LAYOUT = 560;
/** Tallest picture on paper, points. */
const TALLEST = 300;

/** Draws the picture of a record as vectors, centred, and moves on below it. */
export function drawPicture(pen: Pen, picture: Picture): void {
  if (picture.kind === "shape") drawShape(pen, picture);
  else drawSvg(pen, picture.draw);
}

function drawShape(pen: Pen, picture: Extract<Picture, { kind: "shape" }>): void {
  const { doc } = pen;
  const sheet = layoutSheet(picture.drawing, picture.labels, LAYOUT);
  const scale = Math.min(pen.width / sheet.width, TALLEST / sheet.height, 0.72);
  const height = sheet.height * scale;
  pen.keep(height + 40);
  doc.save();
  doc.translate(pen.left + (pen.width - sheet.width * scale) / 2, pen.y).scale(scale);
  for (const { view, x, y, title, titleY } of sheet.views) {
    doc.save();
    doc.translate(x + view.shift[0], y + view.shift[1]);
    drawBody(pen, view);
    for (const dimension of view.dimensions) drawDimension(pen, dimension);
    doc.restore();
    if (title) {
      const style = { face: "text", size: FONT_SIZE, colour: SOFT } as const;
      pen.line(title, x + (view.width - pen.widthOf(title, style)) / 2, titleY, style);
    }
  }
  doc.restore();
  pen.y += height + 8;
  const { high, low } = picture.terminals;
  const exact = picture.toScale && !sheet.distorted;
  drawLegend(pen, [
    { text: `high terminal: ${high}`, colour: COPPER },
    { text: `low terminal: ${low}`, colour: VERDIGRIS },
    ...(exact ? [] : [{ text: "not to scale", colour: null }]),
  ]);
}

function drawLegend(
  pen: Pen,
  entries: readonly { readonly text: string; readonly colour: string | null }[],
): void {
  const style = { face: "text", size: 8, colour: SOFT } as const;
  const widths = entries.map(({ text, colour }) => pen.widthOf(text, style) + (colour ? 20 : 0) + 14);
  const total = widths.reduce((sum, width) => sum + width, 0);
  const together = total <= pen.width;
  let x = pen.left + (together ? (pen.width - total) / 2 : 0);
  entries.forEach(({ text, colour }, index) => {
    if (colour) pen.doc.rect(x, pen.y + 2.2, 15, 3.6).fill(colour);
    pen.line(text, x + (colour ? 20 : 0), pen.y + 7, style);
    if (together) x += widths[index];
    else pen.y += 11;
  });
  if (together) pen.y += 11;
}

const LINES = {
  axis: { colour: SOFT, width: 0.8, dash: [10, 3, 2, 3] },
  hidden: { colour: INK, width: 0.9, dash: [5, 3] },
  thin: { colour: INK, width: 0.8, dash: null },
  ground: { colour: INK, width: 1.6, dash: null },
} as const;

function drawBody(pen: Pen, view: ViewLayout): void {
  const { doc } = pen;
  if (view.second) {
    hatch(pen, view.second, view, { step: 7, angle: -45, colour: SOFT, width: 0.7, dash: [4, 3] });
    doc.path(view.second).lineWidth(1).strokeColor(INK).stroke();
  }
  if (view.conductor) {
    doc.save().path(view.conductor).fillOpacity(0.1).fill(COPPER, "even-odd").restore();
    hatch(pen, view.conductor, view, { step: 5, angle: 45, colour: COPPER, width: 0.9, dash: null });
    doc.path(view.conductor).lineJoin("round").lineWidth(1.1).strokeColor(INK).stroke();
  }
  for (const { path, style } of view.lines) {
    const { colour, width, dash } = LINES[style];
    doc.save().path(path).lineWidth(width).strokeColor(colour);
    if (dash) doc.dash(dash[0], { space: dash[1] });
    doc.stroke().restore();
  }
  for (const path of view.soil) doc.path(path).lineWidth(0.8).strokeColor(INK).stroke();
  for (const path of view.high) doc.path(path).lineWidth(4.5).strokeColor(COPPER).stroke();
  for (const path of view.low) {
    doc.path(path).lineWidth(5).strokeColor(VERDIGRIS).stroke();
    doc.path(path).lineWidth(1.2).strokeColor(PAPER).stroke();
  }
  for (const { from, to } of view.flow) {
    const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
    const barb = (turn: number) =>
      `${to[0] - 7 * Math.cos(angle + turn)} ${to[1] - 7 * Math.sin(angle + turn)}`;
    const arrow = `M${from[0]} ${from[1]}L${to[0]} ${to[1]}M${barb(0.45)}L${to[0]} ${to[1]}L${barb(-0.45)}`;
    doc.save().lineCap("round").lineJoin("round");
    doc.path(arrow).lineWidth(4.5).strokeColor(PAPER).stroke();
    doc.path(arrow).lineWidth(1.5).strokeColor(INK).stroke();
    doc.restore();
  }
}

interface Hatch {
  readonly step: number;
  /** Degrees. */
  readonly angle: number;
  readonly colour: string;
  readonly width: number;
  readonly dash: readonly [number, number] | null;
}

/** Lines at an angle over a region, cut at its border. */
function hatch(
  pen: Pen,
  region: string,
  view: ViewLayout,
  { step, angle, colour, width, dash }: Hatch,
): void {
  const { doc } = pen;
  const reach = view.width + view.height + Math.abs(view.shift[0]) + Math.abs(view.shift[1]);
  doc.save().path(region).clip("even-odd");
  const turn = (angle * Math.PI) / 180;
  const along = [-Math.sin(turn), Math.cos(turn)];
  const across = [Math.cos(turn), Math.sin(turn)];
  for (let offset = -reach; offset <= reach; offset += step) {
    const [x, y] = [offset * across[0], offset * across[1]];
    doc.moveTo(x - reach * along[0], y - reach * along[1]).lineTo(x + reach * along[0], y + reach * along[1]);
  }
  if (dash) doc.dash(dash[0], { space: dash[1] });
  doc.lineWidth(width).strokeColor(colour).stroke();
  doc.restore();
}

function drawDimension(pen: Pen, { lines, arc, arrows, label, box }: PlacedDimension): void {
  const { doc } = pen;
  for (const { from, to } of lines) doc.moveTo(from[0], from[1]).lineTo(to[0], to[1]);
  if (lines.length > 0) doc.lineWidth(0.8).strokeColor(INK).stroke();
  if (arc) doc.path(arc).lineWidth(0.8).strokeColor(INK).stroke();
  for (const arrow of arrows) doc.path(arrowPath(arrow)).fill(INK);
  doc.rect(box.x, box.y, box.width, box.height).fill(PAPER);
  const letters = symbolParts(label.symbol).map(({ text, sub }) => ({
    text,
    sub,
    style: { face: "mathItalic", size: sub ? 0.75 * FONT_SIZE : 1.08 * FONT_SIZE } as const,
  }));
  const value = label.value ? ` = ${label.value}` : "";
  const plain = { face: "text", size: FONT_SIZE } as const;
  const total =
    letters.reduce((sum, { text, style }) => sum + pen.widthOf(text, style), 0) + pen.widthOf(value, plain);
  const base = box.y + box.height / 2 + 0.35 * FONT_SIZE;
  let x = box.x + (box.width - total) / 2;
  for (const { text, sub, style } of letters) x = pen.line(text, x, base + (sub ? 3 : 0), style);
  pen.line(value, x, base, plain);
}

function arrowPath({ tip, angle }: Arrowhead): string {
  const back = (turn: number) =>
    `${tip[0] - 9.2 * Math.cos(angle + turn)} ${tip[1] - 9.2 * Math.sin(angle + turn)}`;
  return `M${tip[0]} ${tip[1]}L${back(0.18)}L${back(-0.18)}Z`;
}

/** Points for a unit of a picture's layout: its texts, 14 units high, are printed at 8.4 points. */
const POINTS = 0.6;
/** Tallest conductor on paper, points: with scale and legend below it stays on the first page. */
const TALLEST_FIELD = 340;

function drawSvg(pen: Pen, draw: Draw): void {
  const look = {
    width: Math.floor(pen.width / POINTS),
    tallest: TALLEST_FIELD / POINTS,
    titled: false,
    ground: false,
    colours: PAPER_COLOURS,
    id: "sheet",
  };
  const drawn = draw(look);
  const height = Number(/viewBox="0 0 [\d.]+ ([\d.]+)"/.exec(drawn)?.[1] ?? look.width) * POINTS;
  // Title and description are for screens, and its own size would outrank the one on paper.
  const svg = withSymbols(drawn.replace(/<title[^>]*>.*?<\/title>|<desc[^>]*>.*?<\/desc>/gs, "")).replace(
    /(<svg[^>]*?) width="[^"]*" height="[^"]*"/,
    "$1",
  );
  pen.keep(height + 10);
  svgToPdf(pen.doc, svg, pen.left, pen.y, {
    width: look.width * POINTS,
    height,
    assumePt: true,
    fontCallback: (family: string, bold: boolean) =>
      family.includes("symbol") ? "symbol" : bold ? "strong" : "text",
  });
  pen.y += height + 8;
}

/** Characters that the text face lacks, in texts of a picture, get the face that has them. */
function withSymbols(svg: string): string {
  return svg.replace(/>([^<>]*[^\u0000-\u00ff\u2009\u2026\u2013][^<>]*)</g, (_, text: string) => {
    const marked = text.replace(
      /[^\u0000-\u00ff\u2009\u2026\u2013]+/g,
      (run) => `<tspan font-family="symbol">${run}</tspan>`,
    );
    return `>${marked}<`;
  });
}

/** Below the picture of a field solution: a scale, the densities by colour, and what the lines are. */
import { FONT, MARGIN, NARROW, type PlotLook } from "./plot-look";
import { escapeText, px } from "./plot-text";

interface Foot {
  readonly look: PlotLook;
  /** Upper edge, px. */
  readonly y: number;
  /** px for one unit of the outline, and that unit. */
  readonly scale: number;
  readonly unit: string;
  readonly colours: readonly string[];
  /** Density from which on the last colour stands. */
  readonly top: string;
  /** What else there is to say, one line each. */
  readonly notes: readonly string[];
}

const LINE = 20;
const RAMP = 360;
/** Longest scale, px. */
const BAR = 180;

/** Height that the foot takes, px. */
export function footHeight({ width }: PlotLook, notes: number): number {
  return (width < NARROW ? 112 : 70) + notes * LINE + 8;
}

export function plotFoot({ look, y, scale, unit, colours, top, notes }: Foot): string {
  const { colours: paint, width } = look;
  const narrow = width < NARROW;
  const x = narrow ? MARGIN : width - MARGIN - RAMP;
  const ramp = narrow ? width - 2 * MARGIN : RAMP;
  const rampY = narrow ? y + 62 : y + 18;
  const step = ramp / colours.length;
  const text = (at: number, line: number, words: string, end: boolean, fill: string) =>
    `<text x="${px(at)}" y="${px(line)}"${end ? ` text-anchor="end"` : ""} fill="${fill}">${escapeText(words)}</text>`;
  return [
    scaleBar(scale, y + 18, unit, paint.ink),
    ...colours.map(
      (colour, k) =>
        `<rect x="${px(x + k * step)}" y="${px(rampY)}" width="${px(step)}" height="14" fill="${colour}"/>`,
    ),
    `<rect x="${px(x)}" y="${px(rampY)}" width="${px(ramp)}" height="14" fill="none" stroke="${paint.edge}"/>`,
    text(x, rampY + 32, "0", false, paint.ink),
    text(x + ramp, rampY + 32, `${top} and more, at one volt`, true, paint.ink),
    ...notes.map((note, k) =>
      text(narrow ? MARGIN : width - MARGIN, rampY + 34 + (k + 1) * LINE, note, !narrow, paint.soft),
    ),
  ].join("\n");
}

function scaleBar(scale: number, y: number, unit: string, ink: string): string {
  const wanted = BAR / scale;
  const power = 10 ** Math.floor(Math.log10(wanted));
  const length = [5, 2, 1].map((f) => f * power).find((l) => l <= wanted) ?? power;
  return (
    `<path d="M${MARGIN} ${px(y)}v10m0 -5h${px(length * scale)}m0 -5v10" stroke="${ink}" fill="none"/>` +
    `<text x="${MARGIN}" y="${px(y + 14 + FONT)}" fill="${ink}">${plain(length)}\u2009${escapeText(unit.replace(/^u/, "µ"))}</text>`
  );
}

/** 1, 2 or 5 times a power of ten, without rows of zeros. */
function plain(length: number): string {
  const power = Math.floor(Math.log10(length) + 1e-9);
  if (power >= -3 && power < 5) return String(Number(length.toPrecision(3)));
  const digits = [...String(Math.abs(power))].map((digit) => "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(digit)]).join("");
  return `${Math.round(length / 10 ** power)}×10${power < 0 ? "⁻" : ""}${digits}`;
}

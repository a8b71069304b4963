import "server-only";
import { readFileSync } from "node:fs";
import { join } from "node:path";

/**
 * Typefaces of the printed sheet. A PDF takes TrueType outlines, which the WOFF2 files of the pages are not; these are
 * the same cuts unpacked. What they lack (Greek, operators, small digits) comes from DejaVu Sans.
 */
const FILES = {
  text: "fonts/pdf/spline-sans-400.ttf",
  strong: "fonts/pdf/spline-sans-600.ttf",
  number: "fonts/pdf/spline-sans-mono-400.ttf",
  figure: "fonts/pdf/spline-sans-mono-600.ttf",
  extended: "fonts/pdf/spline-sans-ext-400.ttf",
  symbol: "fonts/pdf/dejavu-sans.ttf",
  mathItalic: "node_modules/katex/dist/fonts/KaTeX_Math-Italic.ttf",
  math: "node_modules/katex/dist/fonts/KaTeX_Main-Regular.ttf",
} as const;

export type Face = keyof typeof FILES;

export const FACES = Object.keys(FILES) as readonly Face[];

const loaded = new Map<Face, Buffer>();

/** The file of a typeface, read once a process. */
export function faceFile(face: Face): Buffer {
  let file = loaded.get(face);
  if (!file) loaded.set(face, (file = readFileSync(join(process.cwd(), FILES[face]))));
  return file;
}

/** Where a character is looked for, in this order. */
export function fallbacks(face: Face): readonly Face[] {
  return face === "math" || face === "mathItalic"
    ? [face, "math", "mathItalic", "symbol"]
    : [face, "extended", "symbol"];
}

import PDFDocument from "pdfkit";
import { FACES, type Face, faceFile, fallbacks } from "./sheet-fonts";

export const INK = "#1B2226";
export const SOFT = "#566067";
export const RULE = "#D9D3C6";

export type Paper = "a4" | "letter";

/** Width and height, points. */
const PAPERS: Readonly<Record<Paper, readonly [number, number]>> = {
  a4: [595.28, 841.89],
  letter: [612, 792],
};

export const MARGIN = { side: 46, top: 58, bottom: 62 };

export interface TextStyle {
  readonly face: Face;
  /** Points. */
  readonly size: number;
  readonly colour?: string;
}

interface Run {
  readonly face: Face;
  readonly text: string;
  readonly width: number;
}

/** What a typeface of pdfkit knows of itself; its typings leave it out. */
interface LoadedFont {
  readonly _font: { readonly font: { hasGlyphForCodePoint(codePoint: number): boolean } };
}

/** Writes onto the pages of a document from top to bottom, with a typeface for each character that has one. */
export class Pen {
  readonly doc: PDFKit.PDFDocument;
  readonly width: number;
  readonly left = MARGIN.side;
  /** Next free place, points from the top. */
  y = MARGIN.top;
  private readonly bottom: number;
  private readonly known = new Map<string, Face>();

  constructor(paper: Paper, info: Readonly<Record<string, string>>) {
    const [width, height] = PAPERS[paper];
    this.doc = new PDFDocument({
      size: [width, height],
      margin: 0,
      bufferPages: true,
      pdfVersion: "1.7",
      lang: "en",
      displayTitle: true,
      info,
    });
    for (const face of FACES) this.doc.registerFont(face, faceFile(face));
    this.width = width - 2 * MARGIN.side;
    this.bottom = height - MARGIN.bottom;
  }

  /** Height that is left on this page, points. */
  get room(): number {
    return this.bottom - this.y;
  }

  /** Height of an empty page, points. */
  get pageRoom(): number {
    return this.bottom - MARGIN.top;
  }

  /** Starts a new page where less than this height is left. */
  keep(height: number): void {
    if (this.room >= Math.min(height, this.pageRoom)) return;
    this.doc.addPage();
    this.y = MARGIN.top;
  }

  /** The typeface in which a character can be shown. */
  private faceFor(face: Face, character: string): Face {
    const key = face + character;
    let found = this.known.get(key);
    if (found === undefined) {
      const codePoint = character.codePointAt(0) ?? 0;
      found = fallbacks(face).find((candidate) => this.covers(candidate, codePoint)) ?? "symbol";
      this.known.set(key, found);
    }
    return found;
  }

  private covers(face: Face, codePoint: number): boolean {
    this.doc.font(face);
    return (this.doc as unknown as LoadedFont)._font.font.hasGlyphForCodePoint(codePoint);
  }

  /** A text cut where the typeface changes. */
  runs(text: string, { face, size }: TextStyle): Run[] {
    const runs: { face: Face; text: string }[] = [];
    // The face of numbers has one width for all; a thin space of another face would hardly show in it.
    const spaced = face === "number" || face === "figure" ? text.replaceAll("\u2009", "\u00a0") : text;
    for (const character of spaced) {
      const own = this.faceFor(face, character);
      const last = runs.at(-1);
      if (last?.face === own) last.text += character;
      else runs.push({ face: own, text: character });
    }
    return runs.map((run) => ({ ...run, width: this.measure(run.text, run.face, size) }));
  }

  private measure(text: string, face: Face, size: number): number {
    return this.doc.font(face).fontSize(size).widthOfString(text);
  }

  widthOf(text: string, style: TextStyle): number {
    return this.runs(text, style).reduce((sum, run) => sum + run.width, 0);
  }

  /** Writes one line with its baseline at `y`; returns where it ends. */
  line(text: string, x: number, y: number, style: TextStyle): number {
    let at = x;
    for (const run of this.runs(text, style)) {
      this.doc
        .font(run.face)
        .fontSize(style.size)
        .fillColor(style.colour ?? INK)
        .text(run.text, at, y, { lineBreak: false, baseline: "alphabetic" });
      at += run.width;
    }
    return at;
  }

  /** Lines into which a text falls in that width; a word that is too long is cut. */
  lines(text: string, width: number, style: TextStyle): string[] {
    const lines: string[] = [];
    for (const paragraph of text.split("\n")) {
      let line = "";
      for (const word of paragraph.split(" ")) {
        const longer = line === "" ? word : `${line} ${word}`;
        if (this.widthOf(longer, style) <= width) {
          line = longer;
          continue;
        }
        if (line !== "") lines.push(line);
        line = word;
        while (this.widthOf(line, style) > width && line.length > 1) {
          const fits = this.fitting(line, width, style);
          lines.push(line.slice(0, fits));
          line = line.slice(fits);
        }
      }
      lines.push(line);
    }
    return lines;
  }

  /** How many characters of a text fit a width, at least one. */
  private fitting(text: string, width: number, style: TextStyle): number {
    let low = 1;
    let high = text.length;
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if (this.widthOf(text.slice(0, middle), style) <= width) low = middle;
      else high = middle - 1;
    }
    return low;
  }

  /** Writes a text from `y` on, over pages where it must; moves on below it. */
  paragraph(text: string, style: TextStyle, x = this.left, width = this.width): void {
    const step = lineStep(style);
    for (const line of this.lines(text, width, style)) {
      this.keep(step);
      this.line(line, x, this.y + step * 0.76, style);
      this.y += step;
    }
  }

  rule(colour = RULE): void {
    this.doc
      .moveTo(this.left, this.y)
      .lineTo(this.left + this.width, this.y)
      .lineWidth(0.6)
      .strokeColor(colour)
      .stroke();
  }
}

/** Distance of two lines, points. */
export function lineStep({ size }: TextStyle): number {
  return size * 1.38;
}

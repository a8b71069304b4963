/** The terminals of a picture: their pieces of the boundary, drawn heavy, each named once where it stands together. */
import type { TerminalPiece } from "./boundary-rings";
import type { FieldMap } from "./field-map";
import type { PlotColours } from "./plot-look";
import { escapeText, px } from "./plot-text";
import { type Box, middleOf, type Named, nameWidth, placeNames, shortName } from "./terminal-label";

/** A terminal of more separate pieces has its largest ones named. */
const MOST_NAMES = 4;

interface NamedPiece extends Named {
  readonly terminal: number;
}

/** The pieces that are named: of those that follow each other the longest, of a terminal the longest four. */
export function namedPieces(pieces: readonly TerminalPiece[], names: readonly string[]): NamedPiece[] {
  const terminals = [...new Set(pieces.map(({ terminal }) => terminal))];
  return terminals.flatMap((terminal) =>
    together(pieces.filter((piece) => piece.terminal === terminal))
      .map((group) => group.reduce((a, b) => (lengthOf(b) > lengthOf(a) ? b : a)))
      .sort((a, b) => lengthOf(b) - lengthOf(a))
      .slice(0, MOST_NAMES)
      .map(({ line }) => ({ terminal, line, text: shortName(names[terminal] ?? "") })),
  );
}

/** Pieces of one terminal, those that touch each other in one group. */
function together(pieces: readonly TerminalPiece[]): TerminalPiece[][] {
  const groups: TerminalPiece[][] = [];
  const ends = new Map<string, TerminalPiece[]>();
  for (const piece of pieces) {
    const { line } = piece;
    const [first, last] = [`${line[0]} ${line[1]}`, `${line.at(-2)} ${line.at(-1)}`];
    const found = [...new Set([ends.get(first), ends.get(last)])].filter((group) => group !== undefined);
    const group = [piece, ...found.flat()];
    for (const old of found) groups.splice(groups.indexOf(old), 1);
    groups.push(group);
    for (const each of group) {
      ends.set(`${each.line[0]} ${each.line[1]}`, group);
      ends.set(`${each.line.at(-2)} ${each.line.at(-1)}`, group);
    }
  }
  return groups;
}

function lengthOf({ line }: TerminalPiece): number {
  let sum = 0;
  for (let k = 2; k < line.length; k += 2)
    sum += Math.hypot(line[k] - line[k - 2], line[k + 1] - line[k - 1]);
  return sum;
}

export interface Pads {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** Largest share of the picture's width that a name takes beside the conductor. */
const BESIDE_SHARE = 0.2;
/** Room without names, and for each row of names above or below, px. */
const BARE = 16;
const ROW = 22;
/** How much of a row names fill: they stand near their terminals and not one after the other. */
const FILLED = 0.7;

/** Room for the names around the conductor, px. `named` in the outline's unit, y upwards. */
export function padsFor(named: readonly Named[], width: number): Pads {
  const beside = { left: 0, right: 0 };
  const lengths = { top: 0, bottom: 0 };
  for (const { text, line } of named) {
    // The way out turns over with the axis.
    const [x, y] = middleOf(line).out.map((value) => 0 - value);
    const wide = nameWidth(text) + 14;
    const upright = Math.abs(x) > 0.7;
    if (upright && wide <= BESIDE_SHARE * width) {
      const side = x < 0 ? "left" : "right";
      beside[side] = Math.max(beside[side], wide);
    } else lengths[!upright && y < 0 ? "bottom" : "top"] += wide;
  }
  const rows = (length: number) => (length === 0 ? BARE : 14 + ROW * Math.ceil(length / (FILLED * width)));
  return {
    left: Math.max(BARE, beside.left),
    right: Math.max(BARE, beside.right),
    top: rows(lengths.top),
    bottom: rows(lengths.bottom),
  };
}

interface Drawn {
  readonly map: FieldMap;
  /** In px, y downwards. */
  readonly pieces: readonly TerminalPiece[];
  readonly named: readonly NamedPiece[];
  readonly rings: readonly (readonly number[])[];
  /** Where names may stand. */
  readonly frame: Box;
  readonly colours: PlotColours;
}

export function plotTerminals({ map, pieces, named, rings, frame, colours }: Drawn): string[] {
  const colourOf = (terminal: number): string =>
    [colours.high, colours.low][map.between.indexOf(terminal)] ?? colours.open;
  const bars = pieces.map(
    ({ terminal, line }) =>
      `<path d="${lineOf(line)}" fill="none" stroke="${colourOf(terminal)}" stroke-width="6" stroke-linecap="round"/>`,
  );
  const names = placeNames(named, rings, frame).map(({ text, box, leader }, k) => {
    const colour = colourOf(named[k].terminal);
    const line = leader
      ? `<path d="${lineOf(leader.flat())}" fill="none" stroke="${colour}" stroke-width="1"/>`
      : "";
    return `${line}<text x="${px(box.x + box.width / 2)}" y="${px(box.y + box.height / 2 + 5)}" text-anchor="middle" font-weight="600" fill="${colour}">${escapeText(text)}</text>`;
  });
  return [...bars, ...names];
}

function lineOf(line: readonly number[]): string {
  let d = "";
  for (let k = 0; k < line.length; k += 2) d += `${k === 0 ? "M" : "L"}${px(line[k])} ${px(line[k + 1])}`;
  return d;
}

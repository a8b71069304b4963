/** Two columns of measured points from a file or a pasted text, each cell as a quantity that the API reads. */
import { joinQuantity } from "../../../../_ui/quantity/quantity-text";
import { readTyped } from "../../../../_ui/quantity/read-typed";
import { findUnit, UNITS } from "../../../../_ui/quantity/units";
import { readFile } from "../../table/_model/read-file";

export interface PointsReading {
  readonly rows: readonly (readonly [string, string])[];
  /** What could not be read, with its line. */
  readonly problems: readonly string[];
  /** What was understood of the head, for people. */
  readonly note?: string;
}

const MOST_POINTS = 100_000;
/** Characters that all rows may have together: a request of the API has at most a million. */
const MOST_CHARACTERS = 950_000;
/** Quotes and commas around the two cells of a row in a request. */
const AROUND = 6;

/**
 * Reads text with a point a line. Columns are parted by a tab, a semicolon, a comma or spaces; a head may name units
 * ("radius/mm", "conductivity (S/m)"); with tabs or semicolons the decimal mark may be a comma.
 */
export async function readPoints(text: string): Promise<PointsReading> {
  const { default: papa } = await import("papaparse");
  const delimiter = delimiterOf(text);
  const parsed = papa.parse<string[]>(text.trim(), { delimiter, skipEmptyLines: "greedy" });
  const lines = parsed.data.map((cells) => cells.map((cell) => cell.trim()).filter((cell) => cell !== ""));
  const commas = delimiter !== ",";
  const numeric = (cell: string | undefined) =>
    cell !== undefined && readTyped(cell, commas).kind === "quantity";
  const hasHead = lines.length > 0 && !lines[0].some(numeric);
  const units = hasHead ? lines[0].map(unitOf) : [];
  const body = lines.slice(hasHead ? 1 : 0);
  const refuse = (problem: string): PointsReading => ({ rows: [], problems: [problem] });
  if (body.length > MOST_POINTS) {
    return refuse(`${body.length} points are more than the ${MOST_POINTS} a table may have.`);
  }
  const rows: (readonly [string, string])[] = [];
  const problems: string[] = [];
  let characters = 0;
  for (const [index, cells] of body.entries()) {
    const line = index + (hasHead ? 2 : 1);
    if (cells.length < 2) {
      problems.push(
        `Line ${line} has ${cells.length === 1 ? "one column" : "no column"}; a point needs two.`,
      );
      continue;
    }
    const [place, value] = cells
      .slice(0, 2)
      .map((cell, column) => quantityOf(cell, units[column] ?? "", commas));
    if (place === null || value === null) {
      const bad = place === null ? 0 : 1;
      problems.push(`Line ${line}, column ${bad + 1}: "${cells[bad].slice(0, 30)}" is no number.`);
      continue;
    }
    rows.push([place, value]);
    characters += place.length + value.length + AROUND;
    if (characters > MOST_CHARACTERS) {
      const fit = Math.floor(rows.length / 1000) * 1000;
      return refuse(
        `${body.length} points with so many digits are longer than a request may be; about ${fit} of them fit.`,
      );
    }
  }
  if (rows.length === 0 && problems.length === 0) problems.push("There is no line with two numbers.");
  const note = hasHead ? `Columns taken: ${lines[0].slice(0, 2).join(" and ")}.` : undefined;
  return { rows, problems, ...(note ? { note } : {}) };
}

/** Reads a file whole or not at all: who uploads one does not see which of its lines are missing. */
export async function readPointsFile(file: File): Promise<PointsReading> {
  const content = await readFile(file);
  if (!content.ok) return { rows: [], problems: [content.reason] };
  const reading = await readPoints(content.text);
  if (reading.problems.length > 0) {
    return { rows: [], problems: reading.problems, note: `Nothing of “${file.name}” was taken.` };
  }
  const note = [reading.note, content.note].filter(Boolean).join(" ");
  return { ...reading, note: note === "" ? undefined : note };
}

/** What parts the columns in most of the first lines; one bad line must not decide. */
function delimiterOf(text: string): string {
  const sample = text.trim().split(/\r?\n/).slice(0, 20);
  const most = (pattern: RegExp) =>
    2 * sample.filter((line) => pattern.test(line.trim())).length > sample.length;
  for (const delimiter of ["\t", ";", ","]) if (most(new RegExp(delimiter))) return delimiter;
  return most(/\S\s+\S/) ? " " : ",";
}

const HEAD_UNITS = [
  ...UNITS.length,
  ...UNITS.angle,
  ...UNITS.conductivity,
  ...UNITS.resistivity,
  ...UNITS.density,
];

/**
 * The unit in a head such as "radius/mm", "radius (mm)", "radius [mm]" or "radius mm", or that is nothing but a unit;
 * empty where there is none.
 */
function unitOf(head: string): string {
  const lastWord = /\s(\S+)$/.exec(head)?.[1];
  for (const part of [head, lastWord]) if (part && findUnit(part, HEAD_UNITS)) return part;
  const inBrackets = /[([]([^)\]]+)[)\]]\s*$/.exec(head);
  if (inBrackets) return inBrackets[1].trim();
  const behind = /^[^/]*\/\s*(.+)$/.exec(head);
  return behind ? behind[1].trim() : "";
}

function quantityOf(cell: string, unit: string, decimalComma: boolean): string | null {
  const typed = readTyped(cell, decimalComma);
  if (typed.kind !== "quantity") return null;
  return joinQuantity(typed.number, typed.unit === "" ? unit : typed.unit);
}

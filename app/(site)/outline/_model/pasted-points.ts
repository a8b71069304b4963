import type { LengthUnit } from "@/lib/engine/field/outline/length-units";
import { readPoints } from "../../calculate/_calculator/graded/read-points";
import { readLength } from "./read-length";
import type { Point } from "./sketch";

/** Whether a pasted text is rows of coordinates rather than one number for one cell. */
export function isTable(text: string): boolean {
  return /\t|\n\s*\S/.test(text.trim());
}

/** What a paste brought: points in the drawing's unit, or why there are none; never some of them. */
export type PastedPoints =
  { readonly ok: true; readonly points: readonly Point[] } | { readonly ok: false; readonly problem: string };

/** Reads rows of x and y, as a spreadsheet or a CSV file has them; a head may name units. */
export async function readPastedPoints(text: string, unit: LengthUnit): Promise<PastedPoints> {
  const { rows, problems } = await readPoints(text);
  if (problems.length > 0) return { ok: false, problem: problems[0] };
  const points: Point[] = [];
  for (const [k, row] of rows.entries()) {
    const [x, y] = row.map((cell) => readLength(cell, unit, false));
    if (x === null || y === null) {
      return {
        ok: false,
        problem: `Point ${k + 1}: "${row[x === null ? 0 : 1].slice(0, 30)}" is no length.`,
      };
    }
    points.push([x, y]);
  }
  return { ok: true, points };
}

/**
 * Deviations that tests measure, for the accuracy table of the docs. `npm run accuracy` runs the tests with a folder
 * named in RHOFORM_ACCURACY and makes the table from what they wrote there; otherwise a deviation that is worse than
 * the table says fails its test, so that the table stays true.
 */
import { appendFileSync, existsSync, readFileSync } from "node:fs";
import { join, relative } from "node:path";
import { expect } from "vitest";
import { z } from "zod";

export const ACCURACY_TABLE = "app/(site)/docs/accuracy/table.json";

export const accuracyTable = z.array(
  z.object({
    file: z.string(),
    group: z.string(),
    cases: z.int(),
    worst: z.number(),
    worstCase: z.string(),
    /** The same by shape, for the comparisons in which one was computed. */
    shapes: z.record(z.string(), z.object({ cases: z.int(), worst: z.number() })),
  }),
);

/** Other processors may round the last digit of a logarithm another way. */
const MARGIN = 2;
const ROUNDING = 1e-15;

let known: Map<string, number> | undefined;

function worstOf(file: string, group: string): number | undefined {
  if (!known) {
    const text = existsSync(ACCURACY_TABLE) ? readFileSync(ACCURACY_TABLE, "utf8") : "[]";
    known = new Map(
      accuracyTable.parse(JSON.parse(text)).map((row) => [`${row.file}\n${row.group}`, row.worst]),
    );
  }
  return known.get(`${file}\n${group}`);
}

/** What was computed since the last comparison of a test: the next one is about these shapes. */
const involved = { test: "", compared: false, shapes: new Set<string>() };

/** Says that the running test computed a shape. */
export function involve(shape: string): void {
  const test = expect.getState().currentTestName ?? "";
  if (involved.compared || involved.test !== test) involved.shapes.clear();
  involved.test = test;
  involved.compared = false;
  involved.shapes.add(shape);
}

/** Notes a relative deviation of the running test and gives it back. */
export function note(deviation: number): number {
  const { currentTestName, testPath } = expect.getState();
  if (currentTestName === undefined || testPath === undefined || !Number.isFinite(deviation))
    return deviation;
  const [group, ...test] = currentTestName.split(" > ");
  const file = relative(process.cwd(), testPath);
  const folder = process.env.RHOFORM_ACCURACY;
  if (folder) {
    const shapes = involved.test === currentTestName ? [...involved.shapes] : [];
    involved.compared = true;
    const line = JSON.stringify({ file, group, test: test.join(", "), deviation, shapes });
    appendFileSync(join(folder, `${process.pid}.jsonl`), `${line}\n`);
    return deviation;
  }
  const worst = worstOf(file, group);
  if (worst !== undefined && deviation > MARGIN * worst + ROUNDING) {
    throw new Error(`${deviation} is worse than the ${worst} of the accuracy table; see npm run accuracy.`);
  }
  return deviation;
}

/**
 * Tries random outlines by the thousands: `npx tsx tests/field/long-run.ts [outlines] [first seed]`.
 *
 * A bracket is wrong if it does not hold the truth. The truth is not known, but all true brackets of one resistance
 * overlap, and for an outline and its conjugate (terminals and insulation swapped, reciprocal medium) the product of
 * the two resistances is one. The current must also be the same by two routes, which fails if a stream function
 * is let free where it must not be.
 */

import { checkOutline } from "@/lib/engine/field/outline/check-outline";
import { outlineSchema, terminalSchema } from "@/lib/engine/field/outline/schema";
import { solveField, type FieldSolution } from "@/lib/engine/field/solve-field";
import { conductanceOf, conjugate, randomOutline, type RandomOutline } from "./random-outlines";

interface Tally {
  outlines: number;
  refused: number;
  solutions: number;
  limited: number;
  conjugates: number;
  misses: number;
  failedChecks: number;
  errors: number;
  worstWidth: number;
  seconds: number;
}

/** Solves a random outline, or null where the outline is refused (features touch or cross). */
export function solveRandom(random: RandomOutline, accuracy: number): FieldSolution | null {
  const symmetry = random.axisymmetric ? "axisymmetric" : "plan";
  const outline = outlineSchema.parse({ unit: "m", outer: random.outer, holes: random.holes, symmetry });
  if (random.terminals.some((parts) => parts.length === 0)) return null;
  const terminals = random.terminals.map((parts, k) => terminalSchema.parse({ name: `t${k}`, parts }));
  const checked = checkOutline({ outline, terminals, regions: random.regions });
  if (!checked.ok) return null;
  return solveField(
    { outline: checked.outline, conductance: conductanceOf(random) },
    { accuracy, maximumUnknowns: 20_000 },
  );
}

/** The resistance of the first pair: of two terminals, or with the others floating. */
function bracketOf(solution: FieldSolution): { lower: number; upper: number } {
  if (solution.resistance) return solution.resistance;
  if (!solution.pairs) throw new Error("neither a resistance nor pairs");
  return solution.pairs[0].floating;
}

const COARSE = 1e-2;
/** Every tenth outline is solved more narrowly. */
const FINE = 3e-4;
const FINEST = 1e-6;

function tryOutline(seed: number, tally: Tally): void {
  const conjugable = seed % 2 === 0;
  const random = randomOutline(seed, { conjugable });
  const report = (what: string, detail: unknown): void => {
    console.log(`seed ${seed} (${random.kind}): ${what} ${JSON.stringify(detail)}`);
  };
  const accuracy = seed % 20 < 2 ? FINEST : FINE;
  const fine = solveRandom(random, accuracy);
  if (!fine) {
    tally.refused++;
    return;
  }
  tally.outlines++;
  const brackets = [fine];
  const coarse = solveRandom(random, COARSE);
  if (coarse) brackets.push(coarse);
  for (const solution of brackets) {
    tally.solutions++;
    if (solution.status === "limited") {
      tally.limited++;
      const { lower, upper } = bracketOf(solution);
      if (upper / lower > 1 + COARSE) report("limited", { by: solution.limit, lower, upper });
    }
    const failed = solution.checks.filter((check) => !check.passed);
    if (failed.length > 0) {
      tally.failedChecks++;
      report("check failed", failed);
    }
    const { lower, upper } = bracketOf(solution);
    if (!(lower > 0 && lower <= upper)) {
      tally.misses++;
      report("bracket upside down", { lower, upper });
    }
    for (const other of brackets) compareAll(solution, other, tally, report);
  }
  const narrow = bracketOf(fine);
  if (fine.status === "done") tally.worstWidth = Math.max(tally.worstWidth, narrow.upper / narrow.lower - 1);
  if (conjugable) {
    const swapped = solveRandom(conjugate(random), accuracy);
    if (!swapped) return;
    tally.conjugates++;
    const other = bracketOf(swapped);
    const low = narrow.lower * other.lower;
    const high = narrow.upper * other.upper;
    if (!(low <= 1 + 1e-15 && high >= 1 - 1e-15)) {
      tally.misses++;
      report("product with the conjugate", { low, high, narrow, other });
    }
  }
}

/** All brackets of the same quantity must overlap. */
function compareAll(
  a: FieldSolution,
  b: FieldSolution,
  tally: Tally,
  report: (what: string, detail: unknown) => void,
): void {
  const lists = [a, b].map((solution) => {
    if (solution.resistance) return [solution.resistance];
    const pairs = (solution.pairs ?? []).flatMap(({ floating, grounded }) => [floating, grounded]);
    return [...pairs, ...(solution.conductance ?? []).flat()];
  });
  lists[0].forEach((x, i) => {
    const y = lists[1][i];
    if (x.lower <= y.upper && y.lower <= x.upper) return;
    tally.misses++;
    report("brackets apart", { x, y, i });
  });
}

function main(): void {
  const wanted = Number(process.argv[2] ?? 200);
  const first = Number(process.argv[3] ?? 1);
  const tally: Tally = {
    outlines: 0,
    refused: 0,
    solutions: 0,
    limited: 0,
    conjugates: 0,
    misses: 0,
    failedChecks: 0,
    errors: 0,
    worstWidth: 0,
    seconds: 0,
  };
  const start = process.hrtime.bigint();
  for (let seed = first; tally.outlines < wanted; seed++) {
    try {
      tryOutline(seed, tally);
    } catch (error) {
      tally.errors++;
      console.log(`seed ${seed}: ${error instanceof Error ? error.stack : String(error)}`);
    }
    if (seed % 500 === 0) console.log(`seed ${seed}: ${JSON.stringify(tally)}`);
  }
  tally.seconds = Number(process.hrtime.bigint() - start) / 1e9;
  console.log(JSON.stringify(tally, null, 1));
}

main();

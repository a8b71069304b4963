/**
 * `npm run accuracy`: runs the tests that compare the engine with references and writes the worst deviation of each
 * group to the docs' accuracy table.
 */
import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";

const TABLE = "app/(site)/docs/accuracy/table.json";
const TESTS = ["tests/reference", "tests/engine/shape"];

interface Row {
  readonly file: string;
  readonly group: string;
  cases: number;
  worst: number;
  worstCase: string;
  readonly shapes: Record<string, { cases: number; worst: number }>;
}

/** One line that a test wrote; see tests/support/accuracy.ts. */
interface Noted {
  readonly file: string;
  readonly group: string;
  readonly test: string;
  readonly deviation: number;
  readonly shapes: readonly string[];
}

const folder = mkdtempSync(join(tmpdir(), "rhoform-accuracy-"));
try {
  const { status } = spawnSync(
    join("node_modules", ".bin", "vitest"),
    ["run", "--project", "engine", ...TESTS],
    { stdio: ["ignore", "inherit", "inherit"], env: { ...process.env, RHOFORM_ACCURACY: folder } },
  );
  if (status !== 0) throw new Error("The tests failed; the table was left as it was.");
  const rows = new Map<string, Row>();
  for (const file of readdirSync(folder)) {
    for (const line of readFileSync(join(folder, file), "utf8").trim().split("\n")) {
      const noted = JSON.parse(line) as Noted;
      const key = `${noted.file}\n${noted.group}`;
      const row = rows.get(key) ?? {
        file: noted.file,
        group: noted.group,
        cases: 0,
        worst: -1,
        worstCase: "",
        shapes: {},
      };
      row.cases += 1;
      if (noted.deviation > row.worst) {
        row.worst = noted.deviation;
        row.worstCase = noted.test;
      }
      for (const shape of noted.shapes) {
        const own = (row.shapes[shape] ??= { cases: 0, worst: 0 });
        own.cases += 1;
        own.worst = Math.max(own.worst, noted.deviation);
      }
      rows.set(key, row);
    }
  }
  const table = [...rows.values()]
    .sort((a, b) => a.file.localeCompare(b.file) || a.group.localeCompare(b.group))
    // Two digits, rounded up: what the docs say is never less than what was found.
    .map((row) => ({ ...row, worst: roundedUp(row.worst), shapes: inOrder(row.shapes) }));
  mkdirSync(dirname(TABLE), { recursive: true });
  writeFileSync(TABLE, `${JSON.stringify(table, null, 2)}\n`);
  console.log(`${table.length} groups written to ${TABLE}.`);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  rmSync(folder, { recursive: true, force: true });
}

function inOrder(shapes: Row["shapes"]): Row["shapes"] {
  const entries = Object.entries(shapes).sort(([a], [b]) => a.localeCompare(b));
  return Object.fromEntries(
    entries.map(([id, { cases, worst }]) => [id, { cases, worst: roundedUp(worst) }]),
  );
}

function roundedUp(value: number): number {
  if (value === 0) return 0;
  const unit = 10 ** (Math.floor(Math.log10(value)) - 1);
  return Number((Math.ceil(value / unit) * unit).toPrecision(2));
}

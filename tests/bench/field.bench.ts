/**
 * What a field solution costs in a warmed worker thread, mesh and bracket included: the median of several runs, in
 * milliseconds (a target, since machines differ) and as a multiple of a yardstick timed in the same run. The yardstick is
 * the Cholesky factorisation of a fixed dense matrix of order 600 in plain loops over a Float64Array, in this thread.
 * `npx tsx tests/bench/field.bench.ts` prints it; `npm run bench` collects it.
 */
import { spawnSync } from "node:child_process";
import { WorkerPool } from "@/lib/jobs/worker-pool";
import type { FieldResult } from "@/lib/engine";
import { accept, gon, meshOf } from "../field/support/outlines";
import { bend, type FieldBody, gradedBend, meander, plate, sieve } from "./field-outlines";

export interface FieldMeasurement {
  readonly name: string;
  readonly value: number;
  readonly unit: "ms" | "MB" | "";
  /** What the project set out to reach, in the same unit. */
  readonly target: number;
  /** Multiple of the yardstick where time is measured. */
  readonly ratio: number | null;
  /** What the ratio (or the value where there is none) must stay under. */
  readonly limit: number;
  readonly passed: boolean;
  readonly note: string;
}

/** Time of the yardstick on the machine whose times the targets were written down for, ms. */
const YARDSTICK_MS = 60;
const ORDER = 600;

/** Factorises the yardstick's matrix; answers with a number so that nothing is optimised away. */
function factoriseDense(): number {
  const n = ORDER;
  const a = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) a[i * n + j] = i === j ? n : 1 / (1 + i - j);
  }
  for (let j = 0; j < n; j++) {
    for (let i = j; i < n; i++) {
      let sum = a[i * n + j];
      for (let k = 0; k < j; k++) sum -= a[i * n + k] * a[j * n + k];
      a[i * n + j] = i === j ? Math.sqrt(sum) : sum / a[j * n + j];
    }
  }
  return a[n * n - 1];
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)];
}

async function milliseconds(work: () => unknown): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

async function solve(pool: WorkerPool, body: FieldBody, accuracy: number): Promise<FieldResult> {
  const outcome = await pool.run({
    body: { ...body, accuracy },
    materials: [],
    secondsAllowed: 600,
    maximumUnknowns: 500_000,
    onProgress: () => {},
  }).outcome;
  if (outcome.kind !== "answered" || outcome.status !== "done")
    throw new Error("The bracket was not closed.");
  return outcome.result;
}

interface Case {
  readonly name: string;
  readonly body: FieldBody;
  readonly accuracy: number;
  readonly target: number;
  readonly runs: number;
}

const CASES: readonly Case[] = [
  { name: "bend", body: bend(), accuracy: 1e-4, target: 10, runs: 21 },
  { name: "bend", body: bend(), accuracy: 1e-6, target: 15, runs: 21 },
  { name: "bend", body: bend(), accuracy: 1e-8, target: 60, runs: 15 },
  { name: "plate with three holes", body: plate(), accuracy: 1e-4, target: 150, runs: 9 },
  { name: "plate with three holes", body: plate(), accuracy: 1e-6, target: 1200, runs: 5 },
  { name: "plate with three holes", body: plate(), accuracy: 1e-8, target: 8000, runs: 3 },
  { name: "meander", body: meander(), accuracy: 1e-4, target: 120, runs: 9 },
  { name: "meander", body: meander(), accuracy: 1e-6, target: 400, runs: 7 },
  { name: "meander", body: meander(), accuracy: 1e-8, target: 3000, runs: 3 },
  { name: "graded bend", body: gradedBend(), accuracy: 1e-4, target: 20, runs: 15 },
  { name: "graded bend", body: gradedBend(), accuracy: 1e-6, target: 40, runs: 15 },
  { name: "graded bend", body: gradedBend(), accuracy: 1e-8, target: 80, runs: 9 },
  { name: "plate with 100 holes", body: sieve(), accuracy: 1e-4, target: 2000, runs: 5 },
];

async function timeCase(
  pool: WorkerPool,
  { name, body, accuracy, target, runs }: Case,
): Promise<FieldMeasurement> {
  const result = await solve(pool, body, accuracy);
  const times: number[] = [];
  const yardsticks: number[] = [];
  for (let run = 0; run < runs; run++) {
    times.push(await milliseconds(() => solve(pool, body, accuracy)));
    yardsticks.push(await milliseconds(factoriseDense));
  }
  const value = median(times);
  const ratio = value / median(yardsticks);
  const limit = target / YARDSTICK_MS;
  return {
    name: `${name} to ${accuracy.toExponential()}`,
    value,
    unit: "ms",
    target,
    ratio,
    limit,
    passed: ratio < limit,
    note: `${result.mesh.unknowns} unknowns`,
  };
}

/** The first answer after the start of the threads against later ones. */
async function firstAnswer(): Promise<FieldMeasurement> {
  const ratios: number[] = [];
  for (let turn = 0; turn < 3; turn++) {
    const pool = new WorkerPool(1);
    await pool.start();
    const first = await milliseconds(() => solve(pool, plate(), 1e-4));
    const later: number[] = [];
    for (let run = 0; run < 7; run++) later.push(await milliseconds(() => solve(pool, plate(), 1e-4)));
    ratios.push(first / median(later));
    await pool.close();
  }
  const value = median(ratios);
  return {
    name: "first answer after start over a warm one",
    value,
    unit: "",
    target: 2,
    ratio: null,
    limit: 2,
    passed: value < 2,
    note: "plate with three holes to 1e-4",
  };
}

/** Growth of time with unknowns, from the plate solved ever more closely, and the memory of the largest solution. */
async function growth(pool: WorkerPool): Promise<FieldMeasurement> {
  const points: Array<[number, number]> = [];
  for (const accuracy of [1e-2, 1e-3, 1e-4, 1e-5]) {
    const { mesh } = await solve(pool, sieve(), accuracy);
    points.push([
      Math.log(mesh.unknowns),
      Math.log(await milliseconds(() => solve(pool, sieve(), accuracy))),
    ]);
    if (mesh.unknowns > 250_000) break;
  }
  const meanX = points.reduce((sum, [x]) => sum + x, 0) / points.length;
  const meanY = points.reduce((sum, [, y]) => sum + y, 0) / points.length;
  const value =
    points.reduce((sum, [x, y]) => sum + (x - meanX) * (y - meanY), 0) /
    points.reduce((sum, [x]) => sum + (x - meanX) ** 2, 0);
  return {
    name: "time grows like unknowns to the power",
    value,
    unit: "",
    target: 1.4,
    ratio: null,
    limit: 1.4,
    passed: value < 1.4,
    note: `plate with 100 holes, ${points.map(([x]) => Math.round(Math.exp(x))).join(", ")} unknowns`,
  };
}

/** Growth of the mesher's time with the vertices of a polygon: n·log n gives 12 for ten times as many. */
async function meshGrowth(): Promise<FieldMeasurement> {
  const times: number[] = [];
  for (const count of [5_000, 50_000]) {
    const ends = [0, count / 2].map((edge, i) => ({ name: "ab"[i], parts: [{ ring: 0, edge }] }));
    const runs: number[] = [];
    for (let run = 0; run < 3; run++)
      runs.push(await milliseconds(() => meshOf(accept({ outer: gon(0, 0, 1, count) }, ends))));
    times.push(median(runs));
  }
  const value = times[1] / times[0];
  return {
    name: "mesh of 50,000 vertices over one of 5,000",
    value,
    unit: "",
    target: 20,
    ratio: null,
    limit: 20,
    passed: value < 20,
    note: times.map((time) => `${Math.round(time)} ms`).join(" and "),
  };
}

export async function benchField(): Promise<FieldMeasurement[]> {
  for (let round = 0; round < 3; round++) factoriseDense();
  const first = await firstAnswer();
  const pool = new WorkerPool(1);
  await pool.start();
  try {
    const timed: FieldMeasurement[] = [];
    for (const one of CASES) timed.push(await timeCase(pool, one));
    return [...timed, first, await growth(pool), await meshGrowth(), memoryOfLargest()];
  } finally {
    await pool.close();
  }
}

/** Peak resident memory of a process of its own that solves up to the cap of 500,000 unknowns. */
function memoryOfLargest(): FieldMeasurement {
  const { stdout, stderr, status } = spawnSync("node_modules/.bin/tsx", ["tests/bench/largest-field.ts"], {
    encoding: "utf8",
  });
  if (status !== 0) throw new Error(stderr);
  const { megabytes, unknowns } = JSON.parse(stdout) as { megabytes: number; unknowns: number };
  return {
    name: "memory of the largest solution",
    value: megabytes,
    unit: "MB",
    target: 1000,
    ratio: null,
    limit: 1000,
    passed: megabytes < 1000,
    note: `${unknowns} unknowns`,
  };
}

/** The measurements as a table for a terminal. */
export function printFieldMeasurements(measurements: readonly FieldMeasurement[]): string {
  return measurements
    .map(({ name, value, unit, target, ratio, limit, passed, note }) => {
      const figure = `${value.toPrecision(3)} ${unit}`.trim();
      const times = ratio === null ? "" : `${ratio.toFixed(2)} × yardstick (under ${limit.toFixed(2)})`;
      return `${passed ? "ok  " : "over"} ${name.padEnd(42)} ${figure.padStart(10)} (target ${target}) ${times} ${note}`;
    })
    .join("\n");
}

if (process.argv[1]?.endsWith("field.bench.ts")) {
  void benchField().then((measurements) => {
    process.stdout.write(`${printFieldMeasurements(measurements)}\n`);
    if (measurements.some(({ passed }) => !passed)) process.exitCode = 1;
  });
}

/**
 * What the engine costs in process: microseconds a call (best of several rounds, so that other work on the machine
 * counts little) and as a ratio to a yardstick measured in the same run, one JSON round trip of the same request.
 * `npx tsx tests/bench/engine.bench.ts` prints it; `npm run bench` collects it.
 */
import { setFlagsFromString } from "node:v8";
import { runInNewContext } from "node:vm";
import { computeResistance, libraryMaterial } from "@/lib/engine";

export interface Measurement {
  readonly name: string;
  readonly value: number;
  readonly unit: "µs" | "ms" | "MB";
  /** Multiple of the yardstick, where time is measured. */
  readonly ratio: number | null;
  /** What it must stay under, in the same unit. */
  readonly limit: number;
  readonly passed: boolean;
}

const context = { material: libraryMaterial };
const sleeve = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
  operating: { temperature: "75 degC", voltage: "500 V" },
};

/** Least processor time of one call in microseconds over several rounds: waiting for the processor does not count. */
function fastest(call: () => unknown, calls: number, rounds = 30): number {
  let best = Infinity;
  for (let round = 0; round < rounds; round++) {
    const start = process.cpuUsage();
    for (let i = 0; i < calls; i++) call();
    const { user, system } = process.cpuUsage(start);
    best = Math.min(best, (user + system) / calls);
  }
  return best;
}

function table(interpolation: string): Record<string, unknown> {
  const points = 10_000;
  const positions = Array.from({ length: points }, (_, i) => 0.002 + (0.003 * i) / (points - 1));
  const values = positions.map(
    (r, i) => 1e-12 * (1 + 0.3 * Math.sin(r * 3000) + 0.01 * Math.sin(i * 12.9898)),
  );
  const profile = { kind: "table", positions, values, interpolation };
  return { ...sleeve, medium: { graded: { coordinate: "radius", quantity: "conductivity", profile } } };
}

/** Runs every measurement; takes a few seconds. */
export function benchEngine(): Measurement[] {
  const yardstick = fastest(() => JSON.parse(JSON.stringify(sleeve)), 5000);
  const timed = (
    name: string,
    unit: "µs" | "ms",
    limit: number,
    call: () => unknown,
    calls: number,
  ): Measurement => {
    const microseconds = fastest(call, calls);
    const value = unit === "ms" ? microseconds / 1000 : microseconds;
    return { name, value, unit, ratio: microseconds / yardstick, limit, passed: value < limit };
  };
  const bare = { ...sleeve, include: [] };
  return [
    timed("closed form without checks", "µs", 10, () => computeResistance(bare, context), 2000),
    timed("closed form with checks", "µs", 60, () => computeResistance(sleeve, context), 1500),
    ...["linear", "log", "monotone-cubic"].map((interpolation) => {
      const request = table(interpolation);
      return timed(
        `table of 10,000 points, ${interpolation}`,
        "ms",
        5,
        () => computeResistance(request, context),
        4,
      );
    }),
    memory(),
  ];
}

/** Growth of the heap over 100,000 calls after a warm-up, in megabytes. */
function memory(): Measurement {
  setFlagsFromString("--expose-gc");
  const collect = runInNewContext("gc") as () => void;
  const used = (): number => {
    collect();
    return process.memoryUsage().heapUsed / 1e6;
  };
  const calls = (count: number): void => {
    for (let i = 0; i < count; i++) {
      const dimensions = { ...sleeve.dimensions, length: `${1 + (i % 977)} mm` };
      computeResistance({ ...sleeve, dimensions }, context);
    }
  };
  calls(20_000);
  const before = used();
  calls(100_000);
  const value = used() - before;
  return {
    name: "heap growth over 100,000 calls",
    value,
    unit: "MB",
    ratio: null,
    limit: 1,
    passed: value < 1,
  };
}

/** The measurements as a table for a terminal. */
export function printMeasurements(measurements: readonly Measurement[]): string {
  return measurements
    .map(({ name, value, unit, ratio, limit, passed }) => {
      const times = ratio === null ? "" : `${ratio.toFixed(1)} × yardstick`;
      const figure = `${value.toFixed(2)} ${unit}`;
      return `${passed ? "ok  " : "over"} ${name.padEnd(40)} ${figure.padStart(12)} (under ${limit} ${unit}) ${times}`;
    })
    .join("\n");
}

if (process.argv[1]?.endsWith("engine.bench.ts")) {
  const measurements = benchEngine();
  process.stdout.write(`${printMeasurements(measurements)}\n`);
  if (measurements.some(({ passed }) => !passed)) process.exitCode = 1;
}

/** What tolerances and sizing cost in process: processor time of one call, best of several. */
import { computeResistance, computeSizing, libraryMaterial } from "@/lib/engine";
import type { Measurement } from "./engine.bench";

const context = { material: libraryMaterial };
const busbar = {
  shape: "bar",
  dimensions: {
    length: { value: "1.2 m", tolerance: "2 mm" },
    width: { value: "50 mm", tolerance: "0.4 mm", distribution: "normal" },
    thickness: { value: "10 mm", tolerance: "0.1 mm" },
  },
  medium: { material: "copper-annealed" },
  operating: { temperature: { value: 65, tolerance: "5 K" } },
  include: [],
};
const width = {
  ...busbar,
  dimensions: { length: "1.2 m", thickness: "10 mm" },
  operating: { temperature: 65 },
  solveFor: "width",
  target: "50 uohm",
};

/** Least processor time in milliseconds: waiting for the processor does not count. */
function fastestMs(call: () => unknown, rounds = 6): number {
  let best = Infinity;
  for (let round = 0; round < rounds; round++) {
    const start = process.cpuUsage();
    call();
    const { user, system } = process.cpuUsage(start);
    best = Math.min(best, (user + system) / 1000);
  }
  return best;
}

function timed(name: string, limit: number, call: () => unknown): Measurement {
  const value = fastestMs(call);
  return { name, value, unit: "ms", ratio: null, limit, passed: value < limit };
}

/** Runs every measurement; takes a few seconds. */
export function benchUncertainty(): Measurement[] {
  const stray = (uncertainty: object) => (): unknown =>
    computeResistance({ ...busbar, uncertainty }, context);
  return [
    timed(
      "Monte Carlo, 100,000 trials of a closed form",
      500,
      stray({ method: "monte-carlo", trials: 100_000 }),
    ),
    timed("worst case of five inputs", 50, stray({ method: "worst-case" })),
    timed("propagation of five inputs", 5, stray({ method: "propagation" })),
    timed("sizing of a closed form", 20, () => computeSizing(width, context)),
  ];
}

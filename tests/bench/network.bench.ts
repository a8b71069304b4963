/** What a network of 10,000 elements costs in process: a square grid. */
import { computeNetwork, libraryMaterial } from "@/lib/engine";
import type { Measurement } from "./engine.bench";

const SIZE = 71;

/** A grid with resistances from 1 to 9 ohm, made up to 10,000 elements along one side. */
function grid(): object {
  const elements: object[] = [];
  const add = (from: string, to: string) => {
    const resistance = 1 + ((elements.length * 7_919) % 9);
    elements.push({ name: `e${elements.length}`, between: [from, to], resistance });
  };
  for (let i = 0; i < SIZE; i++) {
    for (let j = 0; j < SIZE; j++) {
      if (i + 1 < SIZE) add(`${i} ${j}`, `${i + 1} ${j}`);
      if (j + 1 < SIZE) add(`${i} ${j}`, `${i} ${j + 1}`);
    }
  }
  for (let i = 0; elements.length < 10_000; i++) add(`${i} 0`, `${i + 1} 0`);
  return { elements, ports: ["0 0", `${SIZE - 1} ${SIZE - 1}`] };
}

export function benchNetwork(): Measurement[] {
  const request = grid();
  let best = Infinity;
  for (let round = 0; round < 5; round++) {
    // Processor time: waiting for the processor does not count.
    const start = process.cpuUsage();
    computeNetwork(request, { material: libraryMaterial });
    const { user, system } = process.cpuUsage(start);
    best = Math.min(best, (user + system) / 1000);
  }
  return [
    {
      name: "network of 10,000 elements, grid",
      value: best,
      unit: "ms",
      ratio: null,
      limit: 1000,
      passed: best < 1000,
    },
  ];
}

/** Entry of a worker thread: bundled to dist/workers/field-worker.mjs, started by piscina. */
import { type FieldOutcome, type FieldTask, runFieldTask } from "./field-task";
import { WARMING_BEND, WARMING_PLATE } from "./warming-body";

/** Solves until the code is compiled, so that the first caller does not wait for that. */
function warmUp(): void {
  const bends = [1e-2, 1e-4, 1e-4, 1e-6, 1e-6, 1e-8].map((accuracy) => ({ ...WARMING_BEND, accuracy }));
  const plates = [1e-3, 1e-4, 1e-4, 1e-5].map((accuracy) => ({ ...WARMING_PLATE, accuracy }));
  for (const body of [...bends, ...plates]) {
    runFieldTask({
      body,
      materials: [],
      cancel: new Int32Array(1),
      secondsAllowed: 5,
      maximumUnknowns: 20_000,
    });
  }
}

warmUp();

export default function run(task: FieldTask): FieldOutcome {
  return runFieldTask(task);
}

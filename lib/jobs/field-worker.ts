/** Entry of a worker thread: bundled to dist/workers/field-worker.mjs, started by piscina. */
import { type FieldOutcome, type FieldTask, runFieldTask } from "./field-task";
import { WARMING_BODY } from "./warming-body";

/** A small bend, solved until the code is compiled, so that the first caller does not wait for that. */
function warmUp(): void {
  for (const accuracy of [1e-2, 1e-4, 1e-4, 1e-6, 1e-6, 1e-8]) {
    runFieldTask({
      body: { ...WARMING_BODY, accuracy },
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

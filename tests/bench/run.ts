/** `npm run bench`: every measured promise, each against its limit; fails if one is missed. */
import { benchBatch, printBatch } from "./batch.bench";
import { benchConsole, printSections } from "./console.bench";
import { benchEngine, printMeasurements } from "./engine.bench";
import { benchField, printFieldMeasurements } from "./field.bench";
import { benchNetwork } from "./network.bench";
import { benchServer } from "./server.bench";
import { benchUncertainty } from "./uncertainty.bench";

async function main(): Promise<void> {
  const measurements = [...benchEngine(), ...benchUncertainty(), ...benchNetwork()];
  console.log(printMeasurements(measurements));
  const fields = await benchField();
  console.log(printFieldMeasurements(fields));
  const batch = await benchBatch();
  console.log(printBatch(batch));
  const sections = benchConsole();
  console.log(printSections(sections));
  const { empty, resistance, share, limit, passed } = await benchServer();
  console.log(
    `${passed ? "ok  " : "over"} POST /resistance ${resistance.toFixed(0)} calls/s, an empty route ${empty.toFixed(0)} calls/s: ` +
      `${(100 * share).toFixed(0)} % (at least ${100 * limit} %)`,
  );
  if (!passed || !batch.passed || [...measurements, ...fields, ...sections].some((each) => !each.passed))
    process.exitCode = 1;
}

main().catch((error: unknown) => {
  console.error(error);
  process.exitCode = 1;
});

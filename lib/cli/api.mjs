/**
 * `npm run api`: bundles what worker threads load unless that is done, then serves the API alone in this process, which
 * gets the signals.
 */
import { register } from "tsx/esm/api";
import { followParent } from "./follow-parent.mjs";
import { SetupError, buildWorkers, checkNode, isBuilt } from "./setup.mjs";

try {
  checkNode();
  if (!isBuilt()) buildWorkers();
} catch (error) {
  console.error(error instanceof SetupError ? error.message : error);
  process.exit(1);
}
if (process.env.npm_lifecycle_event) followParent(() => process.kill(process.pid, "SIGTERM"));
register();
await import("./api-process.ts");

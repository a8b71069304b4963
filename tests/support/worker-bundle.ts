import { execFileSync } from "node:child_process";

/** Global set-up of the `api` tests: the bundle that the worker threads of field solutions load, as it is now. */
export default function setup(): void {
  execFileSync(process.execPath, ["lib/cli/build-workers.mjs"], { stdio: "inherit" });
}

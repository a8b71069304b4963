/** The client's public surface. */
export * from "./generated/types.gen.js";
export * from "./generated/sdk.gen.js";
export type { Client } from "./generated/client/index.js";
export { rhoform, type RhoformOptions } from "./rhoform.js";
export { RhoformProblem, RhoformTimeout, RhoformUnreachable } from "./failure.js";

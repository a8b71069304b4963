/** The client's public surface. */
export * from "./generated/types.gen.js";
export * from "./generated/sdk.gen.js";
export type { Client } from "./generated/client/index.js";
export { rhoform, type RhoformOptions } from "./rhoform.js";
export { RhoformProblem, RhoformTimeout, RhoformUnreachable } from "./failure.js";
export type { DimensionsOf, RequestOf, ShapeId } from "./request-types.js";
export { computeAll, type ComputeAllOptions } from "./batch.js";
export { cancelField, type FieldProgress, hasEnded, runField, type RunFieldOptions } from "./field.js";
// In place of the generated one, whose query does not know the dimensions.
export { readResistance, type ReadResistanceOptions, type ResistanceQuery } from "./by-address.js";

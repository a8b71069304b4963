/** The engine's public surface: from a shape, a medium and two terminals to a resistance with bounds. Pure. */
export { CATALOGUE_VERSION, ENGINE_VERSION } from "./version";
export { CheckFailure, InputError, pointerTo, Problems, type Problem } from "./failure";

export {
  parseQuantity,
  readQuantity,
  type QuantityOptions,
  type QuantityReading,
} from "./quantity/parse-quantity";
export { formatQuantity, type FormatOptions, type TextUnit } from "./quantity/format-quantity";
export { QUANTITY_KINDS, type QuantityKindName } from "./quantity/quantity-kind";
export { anyQuantitySchema, quantitySchema } from "./quantity/quantity-schema";

export type { Dimension, Dimensions, Family, Resolved, Shape } from "./shape/define-shape";
export type { Drawing } from "./shape/drawing";
export { catalogue, findShape } from "./shape/catalogue";
export { nearestNames } from "./shape/nearest-names";
export { resolveDimensions } from "./shape/resolve-dimensions";
export { readableDrawing, type ReadableDrawing } from "./shape/readable";
export {
  dimensionEntrySchema,
  exampleRequest,
  shapeEntry,
  shapeEntrySchema,
  shapeMedia,
  type DimensionEntry,
  type ShapeEntry,
} from "./shape/shape-entry";

export {
  conductivityAt,
  coversTemperature,
  materialSchema,
  resistivityAt,
  resistivityModelSchema,
  type Material,
  type ResistivityModel,
} from "./medium/material";
export { libraryMaterial, libraryMaterials } from "./medium/library/materials";
export { gradedSchema, mediumSchema, type GradedInput, type MediumInput } from "./medium/medium-schema";
export { profileKinds, profileSchema } from "./medium/profiles/profile-kinds";
export type { ProfileKind } from "./medium/profile";
export {
  compileExpression,
  type CompiledExpression,
  type ExpressionReading,
} from "./medium/expression/compile-expression";

export { schemaComplaints, unknownMember } from "./schema-complaints";
export {
  dimensionsSchema,
  includeSchema,
  mediaSchema,
  operatingSchema,
  recordRequestSchema,
  requirementSchema,
  resistanceRequestSchema,
  type ResistanceRequest,
} from "./resistance/request-schema";
export {
  boundedResistanceSchema,
  boundsBasisSchema,
  checkSchema,
  conductanceSchema,
  methodSchema,
  operatingPointSchema,
  peakSchema,
  profileResultSchema,
  resistanceResultSchema,
  sourceSchema,
  stepSchema,
  usedMaterialSchema,
  verdictSchema,
  type Check,
  type Peak,
  type ProfileResult,
  type ResistanceResult,
  type Step,
  type UsedMaterial,
} from "./resistance/result-schema";
export {
  distributionSchema,
  FEWEST_TRIALS,
  tolerancedQuantitySchema,
  tolerancedSchema,
  uncertaintyRequestSchema,
  type TolerancedInput,
  type UncertaintyRequest,
} from "./resistance/uncertainty/tolerance-schema";
export { uncertaintySchema, type Uncertainty } from "./resistance/uncertainty/result-schema";
export {
  sizingFields,
  sizingRequestSchema,
  sizingResultSchema,
  sizingSolutionSchema,
  type SizingResult,
  type SizingSolution,
} from "./resistance/sizing/sizing-schema";
export { computeSizing } from "./resistance/sizing/compute-sizing";
export type { ComputeContext } from "./resistance/compute-context";
export { computeResistance } from "./resistance/compute-resistance";

export { checkOutline, type OutlineCheck } from "./field/outline/check-outline";
export {
  outlineSchema,
  terminalSchema,
  type OutlineInput,
  type OutlineRequest,
  type TerminalInput,
} from "./field/outline/schema";
export {
  fieldMediumSchema,
  fieldRequestSchema,
  type FieldRequest,
} from "./field/request/field-request-schema";
export { fieldPeakSchema, fieldResultSchema, type FieldResult } from "./field/request/field-result-schema";
export { FIELD_CAUTION, presentField, presentProgress } from "./field/request/field-result";
export {
  prepareField,
  type FieldContext,
  type PreparedField,
  type StoredOutline,
} from "./field/request/prepare-field";
export { cleanOutline, outlineRequestSchema, type CleanedOutline } from "./field/request/store-outline";
export {
  FieldMediumError,
  solveField,
  type FieldOptions,
  type FieldProgress,
  type FieldSolution,
} from "./field/solve-field";
export { fieldSources } from "./field/sources";
export { findScale, MOST_FIELD_SOLUTIONS } from "./field/sizing/find-scale";
export { readFieldSizing } from "./field/sizing/read-field-sizing";
export type { FieldBody } from "./field/sizing/scale-body";
export { boundaryFlux } from "./field/picture/boundary-flux";
export { fieldLines } from "./field/picture/contours";
export type { FieldMap } from "./field/picture/field-map";
export { sampleLine } from "./field/picture/line";
export { PAPER_COLOURS, type PlotColours, type PlotLook } from "./field/picture/plot-look";
export { plotSvg, type PlotText } from "./field/picture/plot-svg";
export { densityPeak } from "./field/picture/peak";
export { densityRaster } from "./field/picture/raster";

export { computeNetwork, networkInStretches } from "./network/compute-network";
export { MOST_ELEMENTS, networkElementSchema, networkRequestSchema } from "./network/request-schema";
export { networkResultSchema, type NetworkResult } from "./network/result-schema";

/** Reads the body of a sizing: what is to be found, what it is to give, where to look, and everything else. */
import { pointerTo, Problems } from "../../failure";
import { Collected } from "../../medium/collected";
import { readQuantity } from "../../quantity/parse-quantity";
import { catalogue, findShape } from "../../shape/catalogue";
import type { Shape } from "../../shape/define-shape";
import { suggestion } from "../../shape/nearest-names";
import {
  readDimensions,
  readerOf,
  type DimensionInput,
  type DimensionReader,
} from "../../shape/resolve-dimensions";
import type { ComputeContext } from "../compute-context";
import type { EvaluatorSource } from "../evaluator";
import { readOperating } from "../operating-point";
import { readMedia } from "../read-media";
import { unknownShape } from "../request-schema";
import { readRequirement } from "../requirement";
import { separateTolerances } from "../uncertainty/separate-tolerances";
import { addSchemaComplaints } from "../../schema-complaints";
import { readRange, type FindableDimension, type SearchRange } from "./search-range";
import { sizingRequestSchema } from "./sizing-schema";

export interface ReadSizing {
  readonly solveFor: string;
  readonly dimension: FindableDimension;
  readonly reader: DimensionReader;
  readonly range: SearchRange;
  /** Whether the request gives the range itself. */
  readonly givenWithin: boolean;
  /** Ohms. */
  readonly target: number;
  /** The nominal request without the dimension, for the search. */
  readonly source: EvaluatorSource;
  /** The resistance request as it arrived, tolerances and all, without the dimension. */
  readonly body: Readonly<Record<string, unknown>>;
}

/** Null after complaints. */
export function readSizing(request: unknown, context: ComputeContext, problems: Problems): ReadSizing | null {
  const { plain } = separateTolerances(request, problems);
  const parsed = sizingRequestSchema.safeParse(plain, { reportInput: true });
  if (!parsed.success) {
    addSchemaComplaints(sizingRequestSchema, parsed.error.issues, "#", problems);
    return null;
  }
  const body = parsed.data;
  const shape = findShape(body.shape);
  if (!shape) {
    const ids = catalogue.map(({ id }) => id);
    problems.add("#/shape", unknownShape(body.shape, ids));
    return null;
  }
  const reader = readerOf(shape);
  const findable = readSolveFor(body.solveFor, shape, reader, body.dimensions, problems);
  const target = readTarget(body.target, problems);
  const range = findable && readRange(body.within, findable.dimension, findable.input, problems);
  const { temperatureC } = readOperating(body.operating, problems);
  readRequirement(body.requirement, problems);
  if (findable) readOthers(shape, body.dimensions, findable.input, problems);
  // Without the dimensions a grading cannot be built yet; what else is wrong with a medium shows already.
  readMedia(shape, body, null, temperatureC, context, new Collected(), problems);
  if (problems.any || !findable || !range || target === null) return null;
  const { solveFor: _solveFor, target: _target, within, ...rest } = request as Record<string, unknown>;
  return {
    solveFor: body.solveFor,
    dimension: findable.dimension,
    reader,
    range,
    givenWithin: within !== undefined,
    target,
    source: { shape, body, temperatureC },
    body: rest,
  };
}

function readTarget(given: unknown, problems: Problems): number | null {
  const reading = readQuantity(given, "resistance");
  if (!reading.ok) problems.add("#/target", reading.detail);
  else if (!(reading.value >= 1e-300 && reading.value <= 1e300))
    problems.add("#/target", "must be greater than 0, between 1e-300 and 1e300 ohm.");
  else return reading.value;
  return null;
}

interface Findable {
  readonly input: DimensionInput;
  readonly dimension: FindableDimension;
}

function readSolveFor(
  solveFor: string,
  shape: Shape,
  reader: DimensionReader,
  given: Readonly<Record<string, unknown>>,
  problems: Problems,
): Findable | null {
  const input = reader.inputs.get(solveFor);
  if (!input) {
    problems.add(
      "#/solveFor",
      `is no dimension of ${shape.id}; its dimensions are ${reader.names.join(", ")}.${suggestion(solveFor, reader.names)}`,
    );
    return null;
  }
  const dimension = shape.dimensions[input.dimension];
  if (dimension.type === "choice") {
    problems.add("#/solveFor", "is a choice, which is not searched: give each of its values and compare.");
    return null;
  }
  for (const name of input.group.names) {
    if (given[name] === undefined) continue;
    problems.add(
      pointerTo("#/dimensions", name),
      name === solveFor
        ? "is to be found, so it must be left out."
        : `fixes ${solveFor}, which is to be found: leave it out.`,
    );
    return null;
  }
  return { input, dimension };
}

/** The dimensions that are given, without what only the missing one brings about. */
function readOthers(
  shape: Shape,
  given: Readonly<Record<string, unknown>>,
  input: DimensionInput,
  problems: Problems,
): void {
  const own = new Problems();
  readDimensions(shape, given, "#/dimensions", own);
  const missing = input.group.names.map((name) => pointerTo("#/dimensions", name));
  for (const { pointer, detail } of own.list) {
    const dependent = detail.startsWith("must satisfy: ") || /^makes \w+ /.test(detail);
    if (!dependent && !missing.includes(pointer)) problems.add(pointer, detail);
  }
}

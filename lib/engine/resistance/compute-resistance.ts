/** A request to a resistance with its bounds: reads everything, refuses with every complaint, then evaluates. */
import { InputError, pointerTo, Problems } from "../failure";
import type { Material } from "../medium/material";
import { Collected } from "../medium/collected";
import {
  resolveMedium,
  type CoordinateRange,
  type MediumSite,
  type ResolvedMedium,
} from "../medium/resolve-medium";
import { formatQuantity } from "../quantity/format-quantity";
import { catalogue, findShape } from "../shape/catalogue";
import type { Dimensions, Resolved, Shape } from "../shape/define-shape";
import { readDimensions } from "../shape/resolve-dimensions";
import { shapeMedia } from "../shape/shape-entry";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "../version";
import { isRepresentable } from "./bounds";
import { runChecks } from "./checks";
import { operatingPoint, readOperating } from "./operating-point";
import { findPeak } from "./peak";
import { sampleProfile } from "./profile-arrays";
import {
  addZodIssues,
  resistanceRequestSchema,
  unknownShape,
  type ResistanceRequest,
} from "./request-schema";
import { readRequirement, verdictOf } from "./requirement";
import type { ResistanceResult } from "./result-schema";
import type { Solution } from "./solution";
import { solveFactor } from "./solve-factor";
import { solveFlow } from "./solve-flow";
import { solveMedia } from "./solve-media";
import { listSteps } from "./steps";

/** What a computation may ask of the world outside the engine. */
export interface ComputeContext {
  /** The material of that id which the caller may use, or undefined. */
  readonly material: (id: string) => Material | undefined;
}

/**
 * Computes one resistance.
 * @param request the body of `POST /resistance` as it arrived; it is validated here.
 * @throws InputError for everything that the caller can get wrong; CheckFailure where a check of the engine fails.
 */
export function computeResistance(request: unknown, context: ComputeContext): ResistanceResult {
  const problems = new Problems();
  const body = parseRequest(request, problems);
  const shape = findShape(body.shape);
  if (!shape) {
    const ids = catalogue.map(({ id }) => id);
    throw new InputError([...problems.list, { pointer: "#/shape", detail: unknownShape(body.shape, ids) }]);
  }
  const operatingInput = readOperating(body.operating, problems);
  const requirement = readRequirement(body.requirement, problems);
  const dimensions = readDimensions(shape, body.dimensions, "#/dimensions", problems);
  const collected = new Collected();
  const media = readMedia(shape, body, dimensions, operatingInput.temperatureC, context, collected, problems);
  if (problems.any || !dimensions || !media) throw new InputError(problems.list);

  const solution = solve(shape, dimensions, media);
  const { value, lower, upper } = solution;
  if (!isRepresentable(value) || !isRepresentable(lower) || !isRepresentable(upper)) {
    const size = Number.isNaN(value)
      ? "is not a number a double can hold"
      : value > 1
        ? "is too large"
        : "is too small";
    problems.add(
      "#",
      `The resistance ${size} for these dimensions and this medium; it must lie between 1e-300 and 1e300 ohm.`,
    );
  }
  const operating = operatingPoint(operatingInput, value, problems);
  problems.throwIfAny();

  const include = body.include ?? ["checks"];
  const voltage = operating.voltage ?? 1;
  const per = operating.voltage === undefined ? "volt" : "operating-point";
  const result: ResistanceResult = {
    shape: shape.id,
    resistance: {
      value,
      unit: "ohm",
      text: formatQuantity(value, "ohm", { lower, upper }),
      lower,
      upper,
      boundsBasis: solution.boundsBasis,
      proved: solution.proved,
    },
    conductance: {
      value: 1 / value,
      unit: "siemens",
      text: formatQuantity(1 / value, "siemens", { lower: 1 / upper, upper: 1 / lower }),
    },
    method: solution.method,
    operating,
    cautions: [...shape.cautions, ...solution.cautions, ...collected.cautions],
    assumptions: [...shape.assumptions, ...solution.assumptions, ...collected.assumptions],
    sources: [...shape.sources],
    materials: collected.used,
    engine: ENGINE_VERSION,
    catalogue: CATALOGUE_VERSION,
  };
  if (solution.integral) {
    const { status, evaluations, error, value: whole } = solution.integral;
    result.quadrature = { status, evaluations, relativeError: error / whole };
  }
  if (requirement) result.verdict = verdictOf(requirement, solution);
  if (include.includes("checks")) result.checks = runChecks(solution);
  if (include.includes("peak")) result.peak = findPeak(solution, voltage, per);
  if (include.includes("profile")) result.profile = sampleProfile(solution, shape, voltage, per);
  if (include.includes("steps")) result.steps = listSteps(solution, shape, operating);
  return result;
}

/** The body by its schema. What can still be read after a complaint is checked as well, so that all complaints show. */
function parseRequest(request: unknown, problems: Problems): ResistanceRequest {
  const parsed = resistanceRequestSchema.safeParse(request);
  if (parsed.success) return parsed.data;
  addZodIssues(parsed.error.issues, "#", problems);
  const shape =
    typeof request === "object" && request !== null ? (request as { shape?: unknown }).shape : undefined;
  const dimensions =
    typeof request === "object" && request !== null
      ? (request as { dimensions?: unknown }).dimensions
      : undefined;
  const dimensionsRead = problems.list.some(({ pointer }) => pointer.startsWith("#/dimensions"));
  if (typeof shape === "string" && !problems.list.some(({ pointer }) => pointer === "#/shape")) {
    const found = findShape(shape);
    if (!found)
      problems.add(
        "#/shape",
        unknownShape(
          shape,
          catalogue.map(({ id }) => id),
        ),
      );
    else if (!dimensionsRead && typeof dimensions === "object" && dimensions !== null) {
      readDimensions(found, dimensions as Record<string, unknown>, "#/dimensions", problems);
    }
  }
  throw new InputError(problems.list);
}

type Media =
  { readonly single: ResolvedMedium } | { readonly named: Readonly<Record<string, ResolvedMedium>> };

function readMedia(
  shape: Shape,
  body: ResistanceRequest,
  dimensions: Resolved<Dimensions> | null,
  temperatureC: number,
  context: ComputeContext,
  collected: Collected,
  problems: Problems,
): Media | null {
  const takes = shapeMedia(shape);
  const site: MediumSite = {
    pointer: "#/medium",
    shape,
    subject: shape.id,
    temperatureC,
    sheet: takes.kind === "sheet",
    gradable: takes.gradable,
    range: (coordinate) => (dimensions ? rangeOf(shape, dimensions, coordinate) : null),
    problems,
    material: context.material,
    use: (material) => collected.use(material),
    caution: (sentence) => collected.caution(sentence),
  };
  if (takes.kind !== "two") {
    if (body.media) problems.add("#/media", `is for shapes of two media; ${shape.id} takes one medium.`);
    if (!body.medium) {
      if (!body.media) problems.add("#/medium", `is required: what fills ${shape.id}.`);
      return null;
    }
    const single = resolveMedium(body.medium, site);
    return single && { single };
  }
  const names = takes.names.map(({ name }) => name);
  if (body.medium)
    problems.add(
      "#/medium",
      `is for shapes of one medium; ${shape.id} has the media ${names.join(" and ")}.`,
    );
  if (!body.media) {
    if (!body.medium)
      problems.add("#/media", `is required: ${shape.id} has the media ${names.join(" and ")}.`);
    return null;
  }
  const named: Record<string, ResolvedMedium> = {};
  for (const name of Object.keys(body.media)) {
    if (!names.includes(name)) {
      problems.add(
        pointerTo("#/media", name),
        `is no medium of ${shape.id}, which has ${names.join(" and ")}.`,
      );
    }
  }
  for (const name of names) {
    const given = body.media[name];
    if (!given) problems.add(pointerTo("#/media", name), "is required.");
    else {
      const medium = resolveMedium(given, { ...site, pointer: pointerTo("#/media", name) });
      if (medium) named[name] = medium;
    }
  }
  return Object.keys(named).length === names.length ? { named } : null;
}

function rangeOf(shape: Shape, dimensions: Resolved<Dimensions>, coordinate: string): CoordinateRange | null {
  const { answer } = shape;
  if (answer.kind === "flow") {
    const { along, across } = answer.flow(dimensions);
    return [along, ...across].find((flow) => flow.coordinate === coordinate) ?? null;
  }
  if (answer.kind === "media" && answer.parallel) {
    const { along } = answer.parallel(dimensions);
    return along.coordinate === coordinate ? along : null;
  }
  return null;
}

function solve(shape: Shape, dimensions: Resolved<Dimensions>, media: Media): Solution {
  const { answer } = shape;
  if ("named" in media) {
    if (answer.kind !== "media") throw new Error(`${shape.id} was given media but takes one medium`);
    return solveMedia(answer, dimensions, media.named);
  }
  if (answer.kind === "flow") return solveFlow(answer, dimensions, media.single);
  if (answer.kind === "factor" && media.single.kind === "uniform") {
    return solveFactor(shape, answer, dimensions, media.single, shape.family === "sheet");
  }
  throw new Error(`${shape.id} cannot be solved with this medium`);
}

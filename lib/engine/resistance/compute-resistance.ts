/** A request to a resistance with its bounds: reads everything, refuses with every complaint, then evaluates. */
import { InputError, Problems } from "../failure";
import { Collected } from "../medium/collected";
import { formatQuantity } from "../quantity/format-quantity";
import { catalogue, findShape } from "../shape/catalogue";
import { readDimensions } from "../shape/resolve-dimensions";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "../version";
import { isRepresentable } from "./bounds";
import { runChecks } from "./checks";
import type { ComputeContext } from "./compute-context";
import { coverInputRounding } from "./input-rounding";
import { operatingPoint, readOperating } from "./operating-point";
import { findPeak } from "./peak";
import { sampleProfile } from "./profile-arrays";
import { readMedia } from "./read-media";
import { resistanceRequestSchema, unknownShape, type ResistanceRequest } from "./request-schema";
import { readRequirement, verdictOf } from "./requirement";
import type { ResistanceResult } from "./result-schema";
import { solve } from "./solve";
import { listSteps } from "./steps";
import { findUncertainty } from "./uncertainty/find-uncertainty";
import { materialInputs, readTolerances } from "./uncertainty/input";
import { separateTolerances } from "./uncertainty/separate-tolerances";
import { addSchemaComplaints } from "../schema-complaints";

/**
 * Computes one resistance.
 * @param request the body of `POST /resistance` as it arrived; it is validated here.
 * @throws InputError for everything that the caller can get wrong; CheckFailure where a check of the engine fails.
 */
export function computeResistance(request: unknown, context: ComputeContext): ResistanceResult {
  const problems = new Problems();
  const { plain, found } = separateTolerances(request, problems);
  const body = parseRequest(plain, problems);
  const shape = findShape(body.shape);
  if (!shape) {
    const ids = catalogue.map(({ id }) => id);
    throw new InputError([...problems.list, { pointer: "#/shape", detail: unknownShape(body.shape, ids) }]);
  }
  const operatingInput = readOperating(body.operating, problems);
  const requirement = readRequirement(body.requirement, problems);
  const dimensions = readDimensions(shape, body.dimensions, "#/dimensions", problems);
  const tolerances = found.length > 0 ? readTolerances(found, shape, problems) : [];
  const collected = new Collected();
  const media = readMedia(shape, body, dimensions, operatingInput.temperatureC, context, collected, problems);
  if (problems.any || !dimensions || !media) throw new InputError(problems.list);

  const solution = coverInputRounding(solve(shape, dimensions, media), shape, body.dimensions, media);
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

  const strays =
    body.uncertainty &&
    findUncertainty(
      body.uncertainty,
      { shape, body, temperatureC: operatingInput.temperatureC },
      [...tolerances, ...materialInputs(body, context.material)],
      solution,
      context,
    );

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
    cautions: [...shape.cautions, ...solution.cautions, ...collected.cautions, ...(strays?.cautions ?? [])],
    assumptions: [
      ...shape.assumptions,
      ...solution.assumptions,
      ...collected.assumptions,
      ...(tolerances.length > 0 && !strays ? [UNUSED_TOLERANCES] : []),
    ],
    sources: [...shape.sources],
    materials: collected.used,
    engine: ENGINE_VERSION,
    catalogue: CATALOGUE_VERSION,
  };
  if (solution.integral) {
    const { status, evaluations, error, value: whole } = solution.integral;
    result.quadrature = { status, evaluations, relativeError: error / whole };
  }
  if (strays) result.uncertainty = strays.uncertainty;
  if (requirement) result.verdict = verdictOf(requirement, solution, strays?.uncertainty);
  if (include.includes("checks")) result.checks = runChecks(solution);
  if (include.includes("peak")) result.peak = findPeak(solution, voltage, per);
  if (include.includes("profile")) result.profile = sampleProfile(solution, shape, voltage, per);
  if (include.includes("steps")) result.steps = listSteps(solution, shape, operating);
  return result;
}

export const UNUSED_TOLERANCES =
  "The tolerances in the request are not used, since it asks for no uncertainty: the value is that of the nominal inputs.";

/** The body by its schema. What can still be read after a complaint is checked as well, so that all complaints show. */
function parseRequest(request: unknown, problems: Problems): ResistanceRequest {
  const parsed = resistanceRequestSchema.safeParse(request, { reportInput: true });
  if (parsed.success) return parsed.data;
  addSchemaComplaints(resistanceRequestSchema, parsed.error.issues, "#", problems);
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

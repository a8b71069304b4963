/** A request to a resistance with its bounds: reads everything, refuses with every complaint, then evaluates. */
import { InputError, pointerTo, Problems } from "../failure";
import { readQuantity } from "../quantity/parse-quantity";
import { formatQuantity } from "../quantity/format-quantity";
import type { Material } from "../medium/material";
import { resistivityAt } from "../medium/material";
import { catalogue, findShape } from "../shape/catalogue";
import { readDimensions } from "../shape/resolve-dimensions";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "../version";
import { addZodIssues, resistanceRequestSchema, unknownShape } from "./request-schema";
import type { ResistanceResult } from "./result-schema";

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
  const parsed = resistanceRequestSchema.safeParse(request);
  if (!parsed.success) {
    addZodIssues(parsed.error.issues, "#", problems);
    throw new InputError(problems.list);
  }
  const body = parsed.data;
  const shape = findShape(body.shape);
  if (!shape) {
    problems.add(
      "#/shape",
      unknownShape(
        body.shape,
        catalogue.map(({ id }) => id),
      ),
    );
    throw new InputError(problems.list);
  }
  const dimensions = readDimensions(shape, body.dimensions, "#/dimensions", problems);
  let resistivity = 0;
  const { medium } = body;
  if (medium?.resistivity !== undefined || medium?.conductivity !== undefined) {
    const name = medium.resistivity !== undefined ? "resistivity" : "conductivity";
    const reading = readQuantity(medium[name], name);
    if (!reading.ok) problems.add(`#/medium/${name}`, reading.detail);
    else if (reading.value <= 0) problems.add(`#/medium/${name}`, "must be greater than 0.");
    else resistivity = name === "resistivity" ? reading.value : 1 / reading.value;
  } else if (medium?.material !== undefined) {
    const material = context.material(medium.material);
    if (!material) problems.add(pointerTo("#/medium", "material"), "is no material known here.");
    else resistivity = resistivityAt(material, 20);
  } else problems.add("#/medium", "is required.");
  if (!dimensions || problems.any || shape.answer.kind !== "flow") throw new InputError(problems.list);
  const value = resistivity * shape.answer.uniform(dimensions);
  const lower = value * (1 - 1e-13);
  const upper = value * (1 + 1e-13);
  return {
    shape: shape.id,
    resistance: {
      value,
      unit: "ohm",
      text: formatQuantity(value, "ohm", { lower, upper }),
      lower,
      upper,
      boundsBasis: "rounding",
      proved: true,
    },
    conductance: { value: 1 / value, unit: "siemens", text: formatQuantity(1 / value, "siemens") },
    method: "closed-form",
    operating: { temperature: 20 },
    cautions: [...shape.cautions],
    assumptions: [...shape.assumptions],
    sources: shape.sources.map((source) => ({ ...source })),
    materials: [],
    engine: ENGINE_VERSION,
    catalogue: CATALOGUE_VERSION,
  };
}

/** Reads a sizing on an outline: a field request with the scale to find, and the resistance that it is to give. */
import { InputError, Problems } from "../../failure";
import { readQuantity } from "../../quantity/parse-quantity";
import { prepareField, type FieldContext, type PreparedField } from "../request/prepare-field";
import { hasArcs, SCALES, type ScaleName } from "./scale-body";

export interface FieldSizing {
  readonly solveFor: ScaleName;
  /** Ohms. */
  readonly target: number;
  readonly from: number;
  readonly to: number;
  readonly prepared: PreparedField;
  /** R(scale) = R(1)/scale, so that one solution is enough. */
  readonly inverse: boolean;
}

const WHOLE = [0.01, 100] as const;
const LEAST = 1e-6;
const MOST = 1e6;

/** @throws InputError with every complaint found. */
export function readFieldSizing(request: unknown, context: FieldContext): FieldSizing {
  const problems = new Problems();
  const { solveFor, target: given, within, ...body } = request as Record<string, unknown>;
  const name = SCALES.find((scale) => scale === solveFor);
  if (!name) problems.add("#/solveFor", `must be one of ${SCALES.map((scale) => `"${scale}"`).join(", ")}.`);
  const target = readTarget(given, problems);
  const range = readRange(within, problems);
  const prepared = prepare(body, context, problems);
  if (prepared && name) checkScale(name, prepared, problems);
  if (problems.any || !name || target === null || !range || !prepared) throw new InputError(problems.list);
  const [from, to] = range;
  const varies = prepared.body.medium.expression !== undefined;
  return {
    solveFor: name,
    target,
    from,
    to,
    prepared,
    inverse: name === "scale" && !varies && !sheets(prepared).some,
  };
}

function prepare(body: unknown, context: FieldContext, problems: Problems): PreparedField | null {
  try {
    return prepareField(body, context);
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    for (const { pointer, detail } of error.errors) problems.add(pointer, detail);
    return null;
  }
}

function readTarget(given: unknown, problems: Problems): number | null {
  const reading = given === undefined ? null : readQuantity(given, "resistance");
  if (!reading) problems.add("#/target", "is required.");
  else if (!reading.ok) problems.add("#/target", reading.detail);
  else if (!(reading.value >= 1e-300)) problems.add("#/target", "must be greater than 0.");
  else return reading.value;
  return null;
}

function readRange(within: unknown, problems: Problems): readonly [number, number] | null {
  if (within === undefined) return WHOLE;
  if (!Array.isArray(within) || within.length !== 2) {
    problems.add("#/within", "must be a list of the smallest and the largest scale.");
    return null;
  }
  const [from, to] = (within as readonly unknown[]).map((given, i) => {
    const reading = readQuantity(given, "number");
    if (!reading.ok) problems.add(`#/within/${i}`, reading.detail);
    else if (!(reading.value >= LEAST && reading.value <= MOST))
      problems.add(`#/within/${i}`, `must be between ${LEAST} and ${MOST}.`);
    else return reading.value;
    return null;
  });
  if (from === null || to === null) return null;
  if (from < to) return [from, to];
  problems.add("#/within/1", "must be greater than the first value.");
  return null;
}

/** Which media of a plan are given by their sheet resistance. */
function sheets({ body: { medium } }: PreparedField): { readonly all: boolean; readonly some: boolean } {
  const media = [medium, ...(medium.regions ?? []).map((region) => region.medium)];
  const given = media.filter(({ sheetResistance }) => sheetResistance !== undefined);
  return { all: given.length === media.length, some: given.length > 0 };
}

function checkScale(name: ScaleName, prepared: PreparedField, problems: Problems): void {
  const { body } = prepared;
  if ((body.terminals ?? []).length !== 2) {
    problems.add("#/terminals", "must be two: the resistance between them is what the scale is found for.");
  }
  if (name === "scale" && sheets(prepared).all) {
    problems.add(
      "#/solveFor",
      "changes nothing here: a plan sheet has the same resistance at every scale. Solve for scaleX or scaleY, or give the medium a thickness, which then scales too.",
    );
  }
  if (name !== "scale" && hasArcs(body)) {
    problems.add(
      "#/outline",
      "has arcs, which stretched one way are arcs no longer: draw them as short straight edges, or solve for scale.",
    );
  }
}

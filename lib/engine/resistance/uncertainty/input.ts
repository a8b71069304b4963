/** What is uncertain about a resistance: each input with its nominal value, its tolerance and its distribution. */
import { pointerTo, type Problems } from "../../failure";
import type { Material } from "../../medium/material";
import { radiansToDegrees, readQuantity } from "../../quantity/parse-quantity";
import type { QuantityKindName } from "../../quantity/quantity-kind";
import type { Shape } from "../../shape/define-shape";
import { readerOf } from "../../shape/resolve-dimensions";
import type { ResistanceRequest } from "../request-schema";
import type { FoundTolerance, Place } from "./separate-tolerances";
import type { TolerancedInput } from "./tolerance-schema";

export type Distribution = "uniform" | "normal" | "triangular";

/** One uncertain input in SI (radians, °C; 1 for a material's ratio of true to nominal resistivity). */
export interface UncertainInput {
  /** Its place in the request: "dimensions.innerRadius". */
  readonly name: string;
  /** Where complaints about its tolerance point. */
  readonly pointer: string;
  readonly nominal: number;
  /** How far it may lie below and above the nominal value, ≥ 0. */
  readonly minus: number;
  readonly plus: number;
  readonly distribution: Distribution;
  /** Unit for people, where it has one of these. */
  readonly unit?: "m" | "rad";
  readonly site: InputSite;
}

/** How the evaluator sets the input. */
export type InputSite =
  | { readonly kind: "dimension"; readonly name: string }
  | { readonly kind: "temperature" }
  /** A member of a medium, set as the bare number that means this value. */
  | {
      readonly kind: "member";
      readonly path: readonly (string | number)[];
      readonly bare: (value: number) => number;
    }
  /** Resistivity of a medium over the one that its material's law gives. */
  | { readonly kind: "material"; readonly medium: string | null };

/** More inputs than this make no budget that anybody reads. */
const MOST_INPUTS = 64;
const PERCENT = /^\s*(\d+\.?\d*(?:[eE][+-]?\d+)?|\.\d+(?:[eE][+-]?\d+)?)\s*%\s*$/;

/** Reads the tolerances that were found, telling `problems` what is wrong with them. */
export function readTolerances(
  found: readonly FoundTolerance[],
  shape: Shape,
  problems: Problems,
): UncertainInput[] {
  if (found.length > MOST_INPUTS) {
    problems.add(
      found[MOST_INPUTS].pointer,
      `is the tolerance number ${MOST_INPUTS + 1}; a request may have ${MOST_INPUTS}.`,
    );
    return [];
  }
  const inputs: UncertainInput[] = [];
  for (const tolerance of found) {
    const input = readTolerance(tolerance, shape, problems);
    if (input) inputs.push(input);
  }
  return inputs;
}

interface Measured {
  readonly kind: QuantityKindName;
  readonly gauge?: "wire" | "foil";
  /** Whether the value must stay above 0, or may be 0. */
  readonly positive: "yes" | "or-zero" | "no";
}

function readTolerance(found: FoundTolerance, shape: Shape, problems: Problems): UncertainInput | null {
  const { pointer, given, place, path } = found;
  const measured = measuredAt(place, shape, pointer, problems);
  if (!measured) return null;
  const { kind, gauge } = measured;
  const reading = readQuantity(given.value, kind, { gauge });
  // The request's own reading complains about the value itself.
  if (!reading.ok) return null;
  const nominal = reading.value;
  const spread = readSpread(given, nominal, measured, pointer, problems);
  if (!spread) return null;
  return {
    name: path.join("."),
    pointer,
    nominal,
    ...spread,
    unit: kind === "length" ? "m" : kind === "angle" ? "rad" : undefined,
    site: siteOf(place, path, kind),
  };
}

/** How far a value may lie from its nominal one; null after a complaint. */
export function readSpread(
  given: TolerancedInput,
  nominal: number,
  { kind, positive }: Measured,
  pointer: string,
  problems: Problems,
): Pick<UncertainInput, "minus" | "plus" | "distribution"> | null {
  const sides = readSides(given, nominal, kind, pointer, problems);
  if (!sides) return null;
  const { minus, plus } = sides;
  const distribution = given.distribution ?? "uniform";
  const lower = given.tolerance !== undefined ? "tolerance" : "minus";
  if (positive !== "no" && nominal > 0 && (positive === "yes" ? minus >= nominal : minus > nominal)) {
    problems.add(
      pointerTo(pointer, lower),
      `reaches down to ${positive === "yes" ? "0 or below" : "below 0"}: it must be smaller than the value.`,
    );
    return null;
  }
  if (positive === "or-zero" && nominal === 0 && minus > 0) {
    problems.add(
      pointerTo(pointer, lower),
      "reaches below 0, at which the value is already: give plus alone.",
    );
    return null;
  }
  if (kind === "temperature" && nominal - minus < -273.15) {
    problems.add(pointerTo(pointer, lower), "reaches below absolute zero (-273.15 °C).");
    return null;
  }
  if (distribution === "normal" && minus !== plus) {
    problems.add(
      pointerTo(pointer, "distribution"),
      "must be uniform or triangular where plus and minus differ: a normal distribution is symmetric.",
    );
    return null;
  }
  return { minus, plus, distribution };
}

function siteOf(place: Place, path: readonly (string | number)[], kind: QuantityKindName): InputSite {
  if (place.kind === "dimension") return { kind: "dimension", name: place.name };
  if (place.kind === "temperature") return { kind: "temperature" };
  return { kind: "member", path, bare: kind === "angle" ? radiansToDegrees : (value) => value };
}

/** What is measured at a place; null where it takes no tolerance, after a complaint if nobody else complains. */
function measuredAt(place: Place, shape: Shape, pointer: string, problems: Problems): Measured | null {
  if (place.kind === "temperature") return { kind: "temperature", positive: "no" };
  if (place.kind === "medium") {
    const { member } = place;
    if (member === "referenceTemperature") return { kind: "temperature", positive: "no" };
    if (member === "temperatureCoefficient") return { kind: "temperatureCoefficient", positive: "no" };
    if (member === "thickness") return { kind: "length", gauge: "foil", positive: "yes" };
    return { kind: member, positive: "yes" };
  }
  if (place.kind === "profile") {
    const { measures, graded } = place;
    if (measures === "temperature") return { kind: "temperature", positive: "no" };
    if (measures === "density") return { kind: "density", positive: "or-zero" };
    if (measures === "value") {
      const kind = graded.quantity === "resistivity" ? "resistivity" : "conductivity";
      return { kind, positive: "or-zero" };
    }
    const coordinate = shape.coordinates.find(({ name }) => name === graded.coordinate);
    return coordinate ? { kind: coordinate.unit === "rad" ? "angle" : "length", positive: "no" } : null;
  }
  const input = readerOf(shape).inputs.get(place.name);
  if (!input) return null;
  const dimension = shape.dimensions[input.dimension];
  if (dimension.type === "choice" || dimension.type === "integer") {
    const what = dimension.type === "choice" ? "a choice" : "a whole number";
    problems.add(pointer, `is ${what} and takes no tolerance; give the bare value.`);
    return null;
  }
  if (dimension.type === "number") return { kind: "number", positive: dimension.min >= 0 ? "or-zero" : "no" };
  return {
    kind: dimension.kind,
    gauge: input.options.gauge,
    positive: dimension.zero ? "or-zero" : "yes",
  };
}

function readSides(
  given: TolerancedInput,
  nominal: number,
  kind: QuantityKindName,
  pointer: string,
  problems: Problems,
): { readonly minus: number; readonly plus: number } | null {
  const side = (name: "tolerance" | "plus" | "minus"): number | null => {
    const raw = given[name];
    if (raw === undefined) return 0;
    const at = pointerTo(pointer, name);
    const share = typeof raw === "string" ? PERCENT.exec(raw) : null;
    if (share && kind === "temperature") {
      problems.add(
        at,
        'must be a temperature difference such as "2 K": a share of a temperature depends on its zero.',
      );
      return null;
    }
    if (share && nominal === 0 && Number(share[1]) > 0) {
      problems.add(
        at,
        "is a share of a value that is 0, which is nothing: give a quantity, as plus or minus where the value may stray to one side only.",
      );
      return null;
    }
    const difference = kind === "temperature" ? "temperatureDifference" : kind;
    const reading = share
      ? ({ ok: true, value: (Number(share[1]) / 100) * Math.abs(nominal) } as const)
      : readQuantity(raw, difference);
    if (!reading.ok) {
      problems.add(at, reading.detail);
      return null;
    }
    if (reading.value >= 0 && Number.isFinite(reading.value)) return reading.value;
    problems.add(at, "must be 0 or greater: it is a distance from the value.");
    return null;
  };
  if (given.tolerance !== undefined) {
    const both = side("tolerance");
    return both === null ? null : { minus: both, plus: both };
  }
  const plus = side("plus");
  const minus = side("minus");
  return plus === null || minus === null ? null : { minus, plus };
}

/** The materials of a request whose resistivity is stated with an uncertainty, one input for each medium. */
export function materialInputs(
  body: ResistanceRequest,
  material: (id: string) => Material | undefined,
): UncertainInput[] {
  const media: [string | null, NonNullable<ResistanceRequest["medium"]>][] = body.medium
    ? [[null, body.medium]]
    : Object.entries(body.media ?? {});
  return media.flatMap(([name, medium]): UncertainInput[] => {
    const base = name === null ? ["medium"] : ["media", name];
    const profile = medium.graded?.profile;
    const graded = profile?.kind === "temperature";
    const id = graded ? profile.material : medium.material;
    const found = id === undefined ? undefined : material(id);
    if (!found || (found.uncertainty.lower === 1 && found.uncertainty.upper === 1)) return [];
    const path = [...base, ...(graded ? ["graded", "profile"] : []), "material"];
    return [
      {
        name: path.join("."),
        pointer: pointerTo("#", ...path),
        nominal: 1,
        minus: 1 - found.uncertainty.lower,
        plus: found.uncertainty.upper - 1,
        distribution: "uniform",
        site: { kind: "material", medium: name },
      },
    ];
  });
}

/**
 * A request's dimensions (texts with units, twins, alternatives) to numbers in SI under the shape's own names, with a
 * complaint for each one that is unknown, missing, doubled, of the wrong kind or out of range.
 */
import { InputError, pointerTo, Problems } from "../failure";
import { radiansToDegrees, readQuantity, type QuantityOptions } from "../quantity/parse-quantity";
import type { Constraint, Dimension, Dimensions, QuantityDimension, Resolved, Shape } from "./define-shape";
import { suggestion } from "./nearest-names";

/** One name that a request may use for a dimension. */
export interface DimensionInput {
  readonly name: string;
  readonly dimension: string;
  /** Value of the dimension = value given·factor. */
  readonly factor: number;
  readonly options: QuantityOptions;
  readonly group: DimensionGroup;
}

/** Inputs of which exactly one is given; most have one member. */
export interface DimensionGroup {
  readonly names: string[];
  readonly dimensions: readonly string[];
  readonly defaulted: string | undefined;
  readonly derive: Readonly<Record<string, ((d: Resolved<Dimensions>) => number) | undefined>>;
}

/** Sizes beyond these (m, m², rad) leave no room in a double for their products and quotients. */
const SMALLEST = { length: 1e-100, area: 1e-200, angle: 1e-100 } as const;
const LARGEST = { length: 1e100, area: 1e200, angle: 1e100 } as const;

/** So many unknown names are told; whoever sends more has sent something else. */
const MOST_UNKNOWN = 50;

export interface DimensionReader {
  readonly inputs: ReadonlyMap<string, DimensionInput>;
  readonly groups: readonly DimensionGroup[];
  readonly names: readonly string[];
}

const readers = new WeakMap<Shape, DimensionReader>();

/** Every name a request may use for the shape's dimensions, twins included, grouped: exactly one of each group. */
export function dimensionGroups(shape: Shape): readonly (readonly string[])[] {
  return readerOf(shape).groups.map(({ names }) => names);
}

/**
 * Resolves the dimensions of a request against a shape.
 * @returns SI numbers, radians, choices as texts.
 * @throws InputError with every complaint, each with its pointer below `pointer`.
 */
export function resolveDimensions(
  shape: Shape,
  given: Readonly<Record<string, unknown>>,
  pointer = "#/dimensions",
): Resolved<Dimensions> {
  const problems = new Problems();
  const resolved = readDimensions(shape, given, pointer, problems);
  if (!resolved) throw new InputError(problems.list);
  return resolved;
}

/** The same, collecting complaints; null where there is any. */
export function readDimensions(
  shape: Shape,
  given: Readonly<Record<string, unknown>>,
  pointer: string,
  problems: Problems,
): Resolved<Dimensions> | null {
  const reader = readerOf(shape);
  const before = problems.list.length;
  const values: Record<string, number | string> = {};
  const used = new Map<DimensionGroup, string>();
  let unknown = 0;
  for (const name of Object.keys(given)) {
    const raw = given[name];
    if (raw === undefined) continue;
    const input = reader.inputs.get(name);
    if (!input) {
      if (++unknown > MOST_UNKNOWN) continue;
      problems.add(
        pointerTo(pointer, name),
        `is no dimension of ${shape.id}; its dimensions are ${reader.names.join(", ")}.${suggestion(name, reader.names)}`,
      );
      continue;
    }
    const other = used.get(input.group);
    if (other !== undefined) {
      problems.add(
        pointerTo(pointer, name),
        `is given together with ${other}; give exactly one of ${list(input.group.names)}.`,
      );
      continue;
    }
    used.set(input.group, name);
    const reading = readDimensionValue(shape.dimensions[input.dimension], input, raw);
    if ("value" in reading) values[input.dimension] = reading.value;
    else problems.add(pointerTo(pointer, name), reading.complaint);
  }
  for (const group of reader.groups) {
    if (used.has(group)) continue;
    const defaulted = group.defaulted;
    if (defaulted === undefined) {
      const detail =
        group.names.length === 1 ? "is required." : `is missing: give exactly one of ${list(group.names)}.`;
      problems.add(pointerTo(pointer, group.names[0]), detail);
    } else values[defaulted] = shape.dimensions[defaulted].default as number | string;
  }
  if (problems.list.length > before) return null;
  const resolved = values as Resolved<Dimensions>;
  for (const group of reader.groups) {
    for (const name of group.dimensions) {
      if (name in values) continue;
      const derive = group.derive[name];
      if (derive) values[name] = derive(resolved);
    }
  }
  for (const constraint of shape.constraints) {
    if (!constraint.holds(resolved)) {
      const blamed = blame(constraint, reader, used);
      problems.add(pointerTo(pointer, blamed), `must satisfy: ${constraint.text}.`);
    }
  }
  if (problems.list.length > before) return null;
  for (const group of reader.groups) checkDerived(shape, group, used, values, pointer, problems);
  return problems.list.length > before ? null : resolved;
}

/** A derived dimension that no constraint caught must still be a size that a double holds. */
function checkDerived(
  shape: Shape,
  group: DimensionGroup,
  used: ReadonlyMap<DimensionGroup, string>,
  values: Readonly<Record<string, number | string>>,
  pointer: string,
  problems: Problems,
): void {
  for (const name of group.dimensions) {
    const value = values[name];
    const dimension = shape.dimensions[name];
    if (typeof value !== "number" || dimension.type !== "quantity") continue;
    if (Number.isFinite(value) && (value > 0 || (dimension.zero && value === 0))) continue;
    const at = used.get(group) ?? group.names[0];
    problems.add(
      pointerTo(pointer, at),
      `makes ${name} ${value}, which must be a finite number greater than 0.`,
    );
  }
}

function blame(
  constraint: Constraint<Dimensions>,
  reader: DimensionReader,
  used: ReadonlyMap<DimensionGroup, string>,
): string {
  for (const name of constraint.names) {
    const input = reader.inputs.get(name);
    const given = input && used.get(input.group);
    if (given !== undefined && reader.inputs.get(given)?.dimension === name) return given;
  }
  for (const name of constraint.names) {
    const input = reader.inputs.get(name);
    const given = input && used.get(input.group);
    if (given !== undefined) return given;
  }
  return constraint.names[0];
}

type ValueReading = { readonly value: number | string } | { readonly complaint: string };

/** One given value against its dimension, SI (radians). */
export function readDimensionValue(dimension: Dimension, input: DimensionInput, raw: unknown): ValueReading {
  if (dimension.type === "choice") {
    const values = dimension.choices.map(({ value }) => value);
    if (typeof raw === "string" && values.includes(raw)) return { value: raw };
    return { complaint: `must be one of ${list(values.map((value) => `"${value}"`))}.` };
  }
  const kind = dimension.type === "quantity" ? dimension.kind : "number";
  const reading = readQuantity(raw, kind, input.options);
  if (!reading.ok) return { complaint: reading.detail };
  const value = reading.value * input.factor;
  const complaint = sizeComplaint(dimension, value, input.factor);
  return complaint === null ? { value } : { complaint };
}

/** Why a value (SI) is no value of that dimension; `factor` as of the name it was given by. */
export function sizeComplaint(
  dimension: Exclude<Dimension, { type: "choice" }>,
  value: number,
  factor: number,
): string | null {
  return dimension.type === "quantity"
    ? quantityComplaint(dimension, value, factor)
    : numberComplaint(dimension, value);
}

function quantityComplaint(dimension: QuantityDimension, value: number, factor: number): string | null {
  if (value < 0 || (value === 0 && !dimension.zero)) {
    return dimension.zero ? "must be 0 or greater." : "must be greater than 0.";
  }
  if (value !== 0 && !(value >= SMALLEST[dimension.kind] && value <= LARGEST[dimension.kind])) {
    const unit = dimension.kind === "angle" ? "rad" : dimension.kind === "area" ? "m^2" : "m";
    return `must be between ${SMALLEST[dimension.kind]} and ${LARGEST[dimension.kind]} ${unit}.`;
  }
  if (dimension.max !== undefined && value > dimension.max) {
    const most = dimension.max / factor;
    const text =
      dimension.kind === "angle"
        ? `${radiansToDegrees(most)} deg`
        : `${most} ${dimension.kind === "area" ? "m^2" : "m"}`;
    return `must be at most ${text}.`;
  }
  return null;
}

function numberComplaint(
  dimension: Extract<Dimension, { type: "integer" | "number" }>,
  value: number,
): string | null {
  if (dimension.type === "integer" && !Number.isInteger(value)) return "must be a whole number.";
  const exclusive = dimension.type === "number" && dimension.exclusiveMin === true;
  if (value < dimension.min || (exclusive && value === dimension.min) || value > dimension.max) {
    const least = exclusive ? `greater than ${dimension.min}` : `at least ${dimension.min}`;
    return `must be ${least} and at most ${dimension.max}.`;
  }
  return null;
}

/** Which dimensions may be written as a wire gauge or as a foil weight. */
function gaugeOf(name: string): "wire" | "foil" | undefined {
  if (/diameter\d?$/i.test(name)) return "wire";
  return /(thickness|plating)$/i.test(name) ? "foil" : undefined;
}

function list(names: readonly string[]): string {
  return names.length < 2 ? names.join("") : `${names.slice(0, -1).join(", ")} or ${names[names.length - 1]}`;
}

/** The names that a shape's dimensions may be given by, and their groups. */
export function readerOf(shape: Shape): DimensionReader {
  const known = readers.get(shape);
  if (known) return known;
  const reader = makeReader(shape);
  readers.set(shape, reader);
  return reader;
}

function makeReader(shape: Shape): DimensionReader {
  const inputs = new Map<string, DimensionInput>();
  const groups: DimensionGroup[] = [];
  const grouped = new Set<string>();
  const add = (dimensions: readonly string[], derive: DimensionGroup["derive"]): void => {
    const defaulted = dimensions.find((name) => shape.dimensions[name].default !== undefined);
    const group: DimensionGroup = { names: [], dimensions, defaulted, derive };
    for (const name of dimensions) {
      grouped.add(name);
      for (const [input, factor] of namesOf(name, shape.dimensions[name])) {
        group.names.push(input);
        inputs.set(input, {
          name: input,
          dimension: name,
          factor,
          options: { gauge: gaugeOf(input) },
          group,
        });
      }
    }
    groups.push(group);
  };
  for (const name of Object.keys(shape.dimensions)) {
    if (grouped.has(name)) continue;
    const alternative = shape.alternatives.find(({ names }) => names.includes(name));
    if (alternative) add(alternative.names, alternative.derive as DimensionGroup["derive"]);
    else add([name], {});
  }
  return { inputs, groups, names: [...inputs.keys()] };
}

/** A dimension's own name, and its radius or diameter twin. */
export function namesOf(name: string, dimension: Dimension): readonly (readonly [string, number])[] {
  const names: [string, number][] = [[name, 1]];
  if (dimension.type === "quantity" && dimension.diameter !== undefined)
    names.push([dimension.diameter, 0.5]);
  if (dimension.type === "quantity" && dimension.radius !== undefined) names.push([dimension.radius, 2]);
  return names;
}

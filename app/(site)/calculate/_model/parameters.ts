/**
 * The state of a calculation page: one flat list of names and texts, the same that stand in its address. The names are
 * those of the API's query form; graded media and requirements add their own.
 */
import { compactQuantity, spaceQuantity } from "../../../_ui/quantity/quantity-text";
import type { ShapeEntry } from "@/lib/engine";
import { PROFILE_FORMS } from "./profile-forms";
import { SIZING_NAMES, tolerancedName, UNCERTAINTY_NAMES } from "./tolerances";

export type Parameters = Readonly<Record<string, string>>;

/** Members of a medium of which exactly one is given, in the order in which a page looks for them. */
export const MEDIUM_KINDS = ["graded", "sheetResistance", "material", "resistivity", "conductivity"] as const;
export type MediumKind = (typeof MEDIUM_KINDS)[number];

export const DRIVES = ["voltage", "current", "power"] as const;
export type Drive = (typeof DRIVES)[number];

const OPERATING = ["temperature", ...DRIVES] as const;
const REQUIREMENT = ["min", "max"] as const;
const BESIDE = ["extrapolate", "temperatureCoefficient", "referenceTemperature", "thickness", "quantity"];

/** Prefixes of the parameters of each medium: "" for one medium, "core." and the like for two. */
export function mediumPrefixes(entry: Pick<ShapeEntry, "media">): readonly string[] {
  return entry.media.kind === "two" ? entry.media.names.map(({ name }) => `${name}.`) : [""];
}

/** Which kind of medium is chosen under a prefix. */
export function mediumKind(parameters: Parameters, prefix: string): MediumKind | undefined {
  return MEDIUM_KINDS.find((kind) => `${prefix}${kind}` in parameters);
}

/** Whether a name belongs to the medium under that prefix; a shape's own thickness does not. */
export function ofMedium(name: string, prefix: string, entry: Pick<ShapeEntry, "dimensions">): boolean {
  const own = tolerancedName(name);
  if (!own.startsWith(prefix) || entry.dimensions.some((dimension) => dimension.name === own)) return false;
  const rest = own.slice(prefix.length);
  return (
    (MEDIUM_KINDS as readonly string[]).includes(rest) ||
    BESIDE.includes(rest) ||
    rest === "profile" ||
    rest.startsWith("profile.")
  );
}

/** The members of each group of which exactly one is given; most have one. */
export function dimensionGroups(
  entry: Pick<ShapeEntry, "dimensions" | "alternatives">,
): readonly (readonly string[])[] {
  const groups: (readonly string[])[] = [];
  const seen = new Set<string>();
  for (const { name } of entry.dimensions) {
    if (seen.has(name)) continue;
    const group = entry.alternatives.find((names) => names.includes(name)) ?? [name];
    group.forEach((member) => seen.add(member));
    groups.push(group);
  }
  return groups;
}

/** The member of a group that is given; the first that is required, or the first, where none is. */
export function chosenMember(group: readonly string[], parameters: Parameters): string {
  return group.find((name) => name in parameters) ?? group[0];
}

/** What the page shows first: the shape's example. */
export function exampleParameters(entry: ShapeEntry): Parameters {
  const example = entry.example as {
    readonly dimensions?: Readonly<Record<string, string | number>>;
    readonly medium?: object;
    readonly media?: Readonly<Record<string, object>>;
  };
  const parameters: Record<string, string> = {};
  for (const [name, value] of Object.entries(example.dimensions ?? {})) {
    const unit = entry.dimensions.find((dimension) => dimension.name === name)?.unit;
    parameters[name] = withUnit(value, unit === "1" ? null : unit);
  }
  const put = (prefix: string, medium: object): void => {
    for (const [name, value] of Object.entries(medium)) {
      if (name === "graded") putGraded(parameters, prefix, value);
      else parameters[`${prefix}${name}`] = withUnit(value, BARE_UNITS[name]);
    }
  };
  if (example.medium) put("", example.medium);
  for (const [name, medium] of Object.entries(example.media ?? {})) put(`${name}.`, medium);
  return parameters;
}

/** Units of bare numbers in a medium. */
export const BARE_UNITS: Readonly<Record<string, string>> = {
  resistivity: "ohm m",
  conductivity: "S/m",
  sheetResistance: "ohm/sq",
  thickness: "m",
  temperatureCoefficient: "1/K",
  referenceTemperature: "degC",
};

function withUnit(value: unknown, unit: string | null | undefined): string {
  return typeof value === "number" && unit ? `${value} ${unit}` : String(value);
}

interface GradedExample {
  readonly coordinate: string;
  readonly quantity?: string;
  readonly profile: Readonly<Record<string, unknown>>;
}

function putGraded(parameters: Record<string, string>, prefix: string, graded: GradedExample): void {
  parameters[`${prefix}graded`] = graded.coordinate;
  if (graded.quantity !== undefined) parameters[`${prefix}quantity`] = graded.quantity;
  putProfile(parameters, `${prefix}profile`, graded.profile);
}

function putProfile(
  parameters: Record<string, string>,
  name: string,
  profile: Readonly<Record<string, unknown>>,
): void {
  const { kind, layers, positions, values, profile: inner, ...plain } = profile;
  parameters[name] = String(kind);
  for (const [field, value] of Object.entries(plain)) parameters[`${name}.${field}`] = String(value);
  if (Array.isArray(layers)) {
    const rows = layers as { thickness: unknown; value: unknown }[];
    parameters[`${name}.layers`] = rows.map((row) => `${row.thickness}:${row.value}`).join(",");
  }
  if (Array.isArray(positions) && Array.isArray(values)) {
    parameters[`${name}.table`] = positions.map((position, i) => `${position}:${values[i]}`).join(",");
  }
  if (typeof inner === "object" && inner !== null) {
    putProfile(parameters, `${name}.profile`, inner as Readonly<Record<string, unknown>>);
  }
}

/** Names that the page of this shape understands; others in an address are left alone and dropped. */
export function knownParameter(name: string, entry: ShapeEntry): boolean {
  return (
    entry.dimensions.some((dimension) => dimension.name === tolerancedName(name)) ||
    ([...OPERATING, ...REQUIREMENT] as readonly string[]).includes(name) ||
    tolerancedName(name) === "temperature" ||
    UNCERTAINTY_NAMES.includes(name) ||
    SIZING_NAMES.includes(name) ||
    mediumPrefixes(entry).some((prefix) => ofMedium(name, prefix, entry))
  );
}

/** Reads the plain parameters of an address (no variants); null where it has none, so that the example stands. */
export function readParameters(
  pairs: Iterable<readonly [string, string]>,
  entry: ShapeEntry,
): Parameters | null {
  const found: Record<string, string> = {};
  for (const [name, value] of pairs) {
    if (knownParameter(name, entry) && value.length <= LONGEST_VALUE) found[name] = spacedValue(value);
  }
  return Object.keys(found).length > 0 ? found : null;
}

const LONGEST_VALUE = 4_000_000;

/** One parameter as it stands in an address: quantities without their space. */
export function compactValue(name: string, value: string): string {
  const field = name.slice(name.lastIndexOf(".") + 1);
  if (field === "value" && !PLAIN_VALUE.test(value)) return value;
  return value.includes(":") ? value.split(",").map(compactRow).join(",") : compactQuantity(value);
}

/** An expression keeps its spaces; a constant's value is a quantity. */
const PLAIN_VALUE = /^[+-]?[\d.]+(?:[eE][+-]?\d+)?(?:\s*[A-Za-z%/1^23·]+)*$/;

/** The inverse: every quantity with the space that a page writes, so that texts can be compared. */
function spacedValue(value: string): string {
  if (!value.includes(":")) return spaceQuantity(value);
  return value
    .split(",")
    .map((row) =>
      row
        .split(":")
        .map((cell) => spaceQuantity(cell.trim()))
        .join(":"),
    )
    .join(",");
}

function compactRow(row: string): string {
  return row
    .split(":")
    .map((cell) => compactQuantity(cell.trim()))
    .join(":");
}

/** A query text that people can read: colons, commas and slashes stay as they are. */
export function queryText(pairs: readonly (readonly [string, string])[]): string {
  const encode = (text: string): string =>
    encodeURIComponent(text)
      .replace(/%20/g, "+")
      .replace(/%(?:3A|2C|2F|40|5E)/g, (code) => decodeURIComponent(code));
  return pairs.map(([name, value]) => `${encode(name)}=${encode(value)}`).join("&");
}

/** Parameters of an order that does not depend on which was typed first. */
export function orderedPairs(
  parameters: Parameters,
  entry: ShapeEntry,
): readonly (readonly [string, string])[] {
  const dimensions = entry.dimensions.map(({ name }) => name);
  const rank = (full: string): number => {
    const name = tolerancedName(full);
    const dimension = dimensions.indexOf(name);
    if (dimension >= 0) return dimension;
    if ((OPERATING as readonly string[]).includes(name)) return 2000;
    if ((REQUIREMENT as readonly string[]).includes(name)) return 3000;
    if (UNCERTAINTY_NAMES.includes(name) || SIZING_NAMES.includes(name)) return 4000;
    return 1000;
  };
  return Object.entries(parameters)
    .map((pair, place) => ({ pair, order: rank(pair[0]), place }))
    .sort((a, b) => a.order - b.order || a.place - b.place)
    .map(({ pair }) => pair);
}

/** Whether a profile's kind is one that the pages have a form for. */
export function knownProfile(kind: string): boolean {
  return kind in PROFILE_FORMS;
}

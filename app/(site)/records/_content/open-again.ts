/** The address of the page on which a record's calculation can be gone on with, its inputs in place. */
import { deflateRawSync } from "node:zlib";
import { findShape, type ShapeEntry, shapeEntry } from "@/lib/engine";
import { VALUE_UNITS } from "../../calculate/_calculator/graded/field-site";
import { splitAddress } from "../../calculate/_model/address";
import { BARE_UNITS, exampleParameters } from "../../calculate/_model/parameters";
import { PROFILE_FORMS } from "../../calculate/_model/profile-forms";
import type { ProfileValues } from "../../calculate/_model/profile-starts";
import { stateQuery } from "../../calculate/_model/variants";
import { networkHash } from "../../network/_model/network";
import { readBodyText } from "../../network/_model/read-body";
import { packedHash, plainHash } from "../../outline/_model/address";
import { fieldBody } from "../../outline/_model/field-body";
import { readBody } from "../../outline/_model/read-body";
import { EMPTY_SKETCH } from "../../outline/_model/start-outlines";
import type { OpenAgain } from "./content";

type Given = Readonly<Record<string, unknown>>;

interface Asked {
  readonly shape: string;
  readonly dimensions: Given;
  readonly medium?: Given;
  readonly media?: Readonly<Record<string, Given>>;
  readonly operating?: Given;
  readonly requirement?: Given;
  readonly uncertainty?: Given;
  /** Of a sizing: the dimension that was looked for, the resistance it was to give, and where it was sought. */
  readonly solveFor?: string;
  readonly target?: unknown;
  readonly within?: readonly unknown[];
}

/** Undefined where the calculator has no field for something that was asked. */
export function inCalculator(asked: Asked): OpenAgain | undefined {
  const shape = findShape(asked.shape);
  if (!shape) return undefined;
  const { dimensions, medium, media, operating = {}, requirement = {}, uncertainty = {} } = asked;
  const entry = shapeEntry(shape);
  const gradings = [medium, ...Object.values(media ?? {})].flatMap((one) => gradingOf(one) ?? []);
  if (gradings.some(({ profile }) => rowsVary(profile))) return undefined;
  const example = {
    dimensions: plain(dimensions),
    ...(medium ? { medium: plain(medium) } : {}),
    ...(media
      ? { media: Object.fromEntries(Object.entries(media).map(([name, one]) => [name, plain(one)])) }
      : {}),
  };
  const parameters: Record<string, string> = { ...exampleParameters({ ...entry, example }) };
  const { method, trials, seed } = uncertainty;
  const { solveFor, target, within: [from, to] = [] } = asked;
  const sought = { solveFor, target, from, to };
  const rest = { ...plain(operating), ...requirement, uncertainty: method, trials, seed, ...sought };
  for (const [name, value] of Object.entries(rest)) if (value !== undefined) parameters[name] = String(value);
  const put = { parameters, entry };
  tolerances("", dimensions, (name) => dimensionUnit(entry, name), put);
  tolerances("", operating, differenceUnit, put);
  if (medium) mediumTolerances("", medium, put);
  for (const [name, one] of Object.entries(media ?? {})) mediumTolerances(`${name}.`, one, put);
  const { query, behind } = splitAddress(stateQuery({ variants: [parameters], active: 0 }, entry));
  return { page: "Calculate", href: `/calculate/${entry.id}?${query}${behind === "" ? "" : `#${behind}`}` };
}

/**
 * `body` is the stored request of a field, its outline and terminals in it: a stored outline that was named by its id
 * has been put in its place. Undefined where the outline page has no field for something that was asked.
 */
export function inOutline(body: unknown): OpenAgain | undefined {
  const reading = readBody(body, EMPTY_SKETCH);
  if (!reading.ok) return undefined;
  const text = JSON.stringify(fieldBody(reading.sketch));
  return { page: "Outline", href: `/outline#${plainHash(text) ?? packedHash(deflateRawSync(text))}` };
}

/** Undefined where the network page has no field for something that was asked, or no address holds it. */
export function inNetwork(body: unknown): OpenAgain | undefined {
  const reading = readBodyText(JSON.stringify(body));
  const hash = reading.ok ? networkHash(reading.network) : null;
  return hash === null ? undefined : { page: "Network", href: `/network#${hash}` };
}

const SPREADS = ["tolerance", "plus", "minus"];
const MEMBERS = [...SPREADS, "distribution"];

/** A quantity with a tolerance; a layer or a constant profile has a value, but other members beside it. */
function toleranced(value: unknown): value is Given {
  if (value === null || typeof value !== "object" || !("value" in value)) return false;
  return Object.keys(value).every((member) => member === "value" || MEMBERS.includes(member));
}

/** The same without any tolerance, inside a graded medium as well. */
function plain(given: Given): Given {
  return Object.fromEntries(
    Object.entries(given).map(([name, value]) => {
      if (toleranced(value)) return [name, value.value];
      return [name, name === "graded" || name === "profile" ? plain(value as Given) : value];
    }),
  );
}

interface Grading {
  readonly coordinate: string;
  readonly quantity?: string;
  readonly profile: Given;
}

function gradingOf(medium: Given | undefined): Grading | undefined {
  return medium?.graded as Grading | undefined;
}

/** Whether a row of a table has a tolerance, for which the calculator's tables have no place. */
function rowsVary({ layers, positions, values, profile }: Given): boolean {
  const cells = [layers, positions, values].flatMap((rows) =>
    Array.isArray(rows) ? (rows as unknown[]) : [],
  );
  const inCell = (cell: unknown): boolean =>
    toleranced(cell) || (typeof cell === "object" && cell !== null && Object.values(cell).some(toleranced));
  return cells.some(inCell) || (profile !== undefined && rowsVary(profile as Given));
}

interface Put {
  readonly parameters: Record<string, string>;
  readonly entry: ShapeEntry;
}

/** @param unitOf In which unit the API takes a tolerance without one, by the name of its quantity. */
function tolerances(
  prefix: string,
  given: Given,
  unitOf: (name: string) => string | undefined,
  { parameters }: Put,
): void {
  for (const [name, value] of Object.entries(given)) {
    if (!toleranced(value)) continue;
    for (const [member, said] of Object.entries(value)) {
      if (member === "value") continue;
      const spread = SPREADS.includes(member) ? withUnit(said, unitOf(name)) : String(said);
      parameters[`${prefix}${name}.${member}`] = spread;
    }
  }
}

function mediumTolerances(prefix: string, medium: Given, put: Put): void {
  tolerances(prefix, medium, differenceUnit, put);
  const grading = gradingOf(medium);
  if (!grading) return;
  const { coordinate, quantity, profile } = grading;
  const angle = put.entry.coordinates.find(({ name }) => name === coordinate)?.unit === "rad";
  const values = quantity === "resistivity" ? "resistivity" : "conductivity";
  profileTolerances(`${prefix}profile`, profile, angle ? "deg" : "m", values, put);
}

function profileTolerances(
  name: string,
  profile: Given,
  place: string,
  values: ProfileValues,
  put: Put,
): void {
  const units = {
    value: VALUE_UNITS[values],
    position: place,
    temperature: "K",
    density: VALUE_UNITS.density,
  };
  const unitOf = (member: string) => {
    const type = PROFILE_FORMS[String(profile.kind)]?.find((field) => field.name === member)?.type;
    return type !== undefined && type in units ? units[type as keyof typeof units] : undefined;
  };
  tolerances(`${name}.`, profile, unitOf, put);
  if (profile.profile) profileTolerances(`${name}.profile`, profile.profile as Given, place, "density", put);
}

/**
 * The calculator reads a tolerance without a unit in the unit of its value, the API in SI: "12 mm" with 0.0005 is
 * "12 mm" with "0.0005 m" there.
 */
function withUnit(said: unknown, unit: string | undefined): string {
  const text = String(said).trim();
  return unit !== undefined && text !== "" && Number.isFinite(Number(text)) ? `${text} ${unit}` : text;
}

function dimensionUnit(entry: ShapeEntry, name: string): string | undefined {
  const unit = entry.dimensions.find((dimension) => dimension.name === name)?.unit;
  return unit === "1" || unit === null ? undefined : unit;
}

/** Of a member of a medium or an operating point; temperatures differ by kelvins. */
function differenceUnit(name: string): string | undefined {
  return /temperature$/i.test(name) ? "K" : BARE_UNITS[name];
}

/** The address of the page on which a record's calculation can be gone on with, its inputs in place. */
import { deflateRawSync } from "node:zlib";
import { findShape, shapeEntry } from "@/lib/engine";
import { splitAddress } from "../../calculate/_model/address";
import { exampleParameters } from "../../calculate/_model/parameters";
import { stateQuery } from "../../calculate/_model/variants";
import { packedHash, plainHash } from "../../outline/_model/address";
import { fieldBody } from "../../outline/_model/field-body";
import { readBody } from "../../outline/_model/read-body";
import { EMPTY_SKETCH } from "../../outline/_model/start-outlines";
import type { OpenAgain } from "./content";
import { nominal } from "./typed";

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
  const plain = (given: Given): Given =>
    Object.fromEntries(Object.entries(given).map(([name, value]) => [name, nominal(value)]));
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
  tolerances("", { ...dimensions, ...operating, ...medium }, parameters);
  for (const [name, one] of Object.entries(media ?? {})) tolerances(`${name}.`, one, parameters);
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

const MEMBERS = ["tolerance", "plus", "minus", "distribution"];

function tolerances(prefix: string, given: Given, parameters: Record<string, string>): void {
  for (const [name, value] of Object.entries(given)) {
    if (value === null || typeof value !== "object") continue;
    const members = Object.entries(value).filter(([member]) => MEMBERS.includes(member));
    for (const [member, said] of members) parameters[`${prefix}${name}.${member}`] = String(said);
  }
}

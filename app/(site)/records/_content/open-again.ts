/** The address of the calculator with the inputs of a record, to go on from there. */
import { findShape, shapeEntry } from "@/lib/engine";
import { splitAddress } from "../../calculate/_model/address";
import { exampleParameters } from "../../calculate/_model/parameters";
import { stateQuery } from "../../calculate/_model/variants";
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
}

/** Undefined where the calculator has no field for something that was asked. */
export function calculatorHref(asked: Asked): string | undefined {
  const shape = findShape(asked.shape);
  if (!shape) return undefined;
  const { dimensions, medium, media, operating = {}, requirement = {}, uncertainty = {} } = asked;
  const places = [dimensions, operating, ...(medium ? [medium] : []), ...Object.values(media ?? {})];
  if (places.some((place) => Object.values(place).some(hasUnevenTolerance))) return undefined;
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
  const rest = { ...plain(operating), ...requirement, uncertainty: method, trials, seed };
  for (const [name, value] of Object.entries(rest)) if (value !== undefined) parameters[name] = String(value);
  tolerances("", { ...dimensions, ...operating, ...medium }, parameters);
  for (const [name, one] of Object.entries(media ?? {})) tolerances(`${name}.`, one, parameters);
  const { query, behind } = splitAddress(stateQuery({ variants: [parameters], active: 0 }, entry));
  return `/calculate/${entry.id}?${query}${behind === "" ? "" : `#${behind}`}`;
}

function tolerances(prefix: string, given: Given, parameters: Record<string, string>): void {
  for (const [name, value] of Object.entries(given)) {
    if (value === null || typeof value !== "object" || !("tolerance" in value)) continue;
    parameters[`${prefix}${name}.tolerance`] = String(value.tolerance);
    if ("distribution" in value) parameters[`${prefix}${name}.distribution`] = String(value.distribution);
  }
}

function hasUnevenTolerance(value: unknown): boolean {
  return value !== null && typeof value === "object" && ("plus" in value || "minus" in value);
}

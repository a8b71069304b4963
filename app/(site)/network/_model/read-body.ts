/** The body of `POST /networks`, pasted or from a file, as the page keeps a network. */
import { DISTRIBUTIONS } from "../../calculate/_model/tolerances";
import {
  type DriveKind,
  type Element,
  methodOf,
  type Network,
  newElement,
  NO_REQUIREMENT,
  recordOf,
  UNCERTAINTY_METHODS,
  type Value,
} from "./network";

export interface BodyComplaint {
  readonly pointer: string;
  readonly detail: string;
}

export type BodyReading =
  | { readonly ok: true; readonly network: Network }
  | { readonly ok: false; readonly complaints: readonly BodyComplaint[] };

/** Most elements of one network, as the API takes them. */
const MOST_ELEMENTS = 10_000;
const DRIVES: readonly DriveKind[] = ["current", "voltage", "power"];
/** So many complaints are told. */
const TOLD = 20;

/** Everything in it has a place on the page, or is complained about: nothing is dropped. */
export function readBodyText(text: string): BodyReading {
  try {
    return readBody(JSON.parse(text));
  } catch (error) {
    return refused([{ pointer: "#", detail: `is no JSON: ${error instanceof Error ? error.message : ""}` }]);
  }
}

function readBody(body: unknown): BodyReading {
  const record = recordOf(body);
  if (!record) return refused([{ pointer: "#", detail: "must be an object with elements and ports." }]);
  const complaints: BodyComplaint[] = [];
  const complain = (pointer: string, detail: string) => complaints.push({ pointer, detail });
  unknown(record, ["elements", "ports", "operating", "requirement", "uncertainty", "record"], "#", complain);
  const list = Array.isArray(record.elements) ? record.elements : null;
  if (!list) complain("#/elements", "must be an array of elements.");
  else if (list.length > MOST_ELEMENTS) {
    complain("#/elements", `has ${list.length.toLocaleString("en")} entries; at most 10,000 are taken.`);
  }
  const elements = (list ?? [])
    .slice(0, MOST_ELEMENTS)
    .flatMap((entry, k): Element[] => readElement(entry, `#/elements/${k}`, complain));
  const ports = pairOf(record.ports);
  if (!ports) complain("#/ports", "must name two nodes.");
  const operating = quantities(record.operating, [...DRIVES, "temperature"], "#/operating", complain);
  const given = DRIVES.filter((kind) => operating[kind] !== undefined);
  if (given.length > 1) complain("#/operating", `has ${given.join(" and ")}; at most one is taken.`);
  const [kind = "none"] = given;
  const drive = { kind, text: operating[kind] ?? "" };
  const { temperature = "" } = operating;
  const limits = quantities(record.requirement, ["min", "max"], "#/requirement", complain);
  const requirement = { ...NO_REQUIREMENT, ...limits };
  const uncertainty = readMethod(record.uncertainty, complain);
  if (complaints.length > 0 || !ports) return refused(complaints);
  return {
    ok: true,
    network: { elements, ports, drive, temperature, requirement, uncertainty },
  };
}

type Complain = (pointer: string, detail: string) => void;

/** A group of quantities as the texts that their fields show. */
function quantities(
  given: unknown,
  known: readonly string[],
  pointer: string,
  complain: Complain,
): Readonly<Record<string, string | undefined>> {
  const group = given === undefined ? {} : recordOf(given);
  if (!group) {
    complain(pointer, "must be an object.");
    return {};
  }
  unknown(group, known, pointer, complain);
  const texts: Record<string, string> = {};
  for (const name of known) {
    const value = group[name];
    if (isQuantity(value)) texts[name] = String(value);
    else if (value !== undefined) complain(`${pointer}/${name}`, QUANTITY);
  }
  return texts;
}

function readMethod(given: unknown, complain: Complain): Network["uncertainty"] {
  if (given === undefined) return "";
  const record = recordOf(given);
  if (!record) {
    complain("#/uncertainty", "must be an object with a method.");
    return "";
  }
  unknown(record, ["method"], "#/uncertainty", complain);
  const method = methodOf(record.method);
  if (method === "") {
    const names = UNCERTAINTY_METHODS.map((name) => `"${name}"`).join(" or ");
    complain("#/uncertainty/method", `must be ${names}.`);
  }
  return method;
}

function readElement(entry: unknown, pointer: string, complain: Complain): Element[] {
  const record = recordOf(entry);
  if (!record) {
    complain(pointer, "must be an object.");
    return [];
  }
  unknown(record, ["name", "between", "resistance", "request"], pointer, complain);
  const { name } = record;
  const between = pairOf(record.between);
  const value = readGiven(record, pointer, complain);
  if (typeof name !== "string") complain(`${pointer}/name`, "must be a text.");
  if (!between) complain(`${pointer}/between`, "must name two nodes.");
  if (typeof name !== "string" || !between || !value) return [];
  return [newElement({ name, from: between[0], to: between[1], value })];
}

function readGiven(
  { resistance, request }: Readonly<Record<string, unknown>>,
  pointer: string,
  complain: Complain,
): Value | null {
  if ((resistance === undefined) === (request === undefined)) {
    complain(pointer, "must have exactly one of resistance and request.");
    return null;
  }
  if (request !== undefined) {
    const record = recordOf(request);
    if (!record) complain(`${pointer}/request`, "must be an object.");
    return record && { kind: "request", request: record };
  }
  if (isQuantity(resistance)) return { kind: "resistance", text: String(resistance) };
  const toleranced = recordOf(resistance);
  if (toleranced) return readToleranced(toleranced, `${pointer}/resistance`, complain);
  complain(`${pointer}/resistance`, `${QUANTITY.slice(0, -1)}, or an object with a tolerance.`);
  return null;
}

const QUANTITY = "must be a number or a text with a unit.";

function isQuantity(value: unknown): value is string | number {
  return typeof value === "string" || typeof value === "number";
}

function readToleranced(
  record: Readonly<Record<string, unknown>>,
  pointer: string,
  complain: Complain,
): Value | null {
  unknown(record, ["value", "tolerance", "plus", "minus", "distribution"], pointer, complain);
  const { value, distribution } = record;
  if (!isQuantity(value)) complain(`${pointer}/value`, QUANTITY);
  const tolerance: Record<string, string> = {};
  for (const side of ["tolerance", "plus", "minus"] as const) {
    const given = record[side];
    if (isQuantity(given)) tolerance[side] = inOhms(given);
    else if (given !== undefined) complain(`${pointer}/${side}`, QUANTITY);
  }
  if (record.tolerance !== undefined && (record.plus !== undefined || record.minus !== undefined)) {
    complain(pointer, "must have either tolerance, or plus and minus.");
  }
  const known = DISTRIBUTIONS.find((law) => law.value === distribution);
  if (known) tolerance.distribution = known.value;
  else if (distribution !== undefined) {
    complain(`${pointer}/distribution`, `must be ${DISTRIBUTIONS.map((law) => law.value).join(", ")}.`);
  }
  if (!isQuantity(value)) return null;
  return {
    kind: "resistance",
    text: String(value),
    ...(Object.keys(tolerance).length > 0 ? { tolerance } : {}),
  };
}

/** The page takes a bare tolerance in the unit of its value, the API in ohms. */
function inOhms(given: string | number): string {
  const text = String(given).trim();
  return text !== "" && Number.isFinite(Number(text)) ? `${text} ohm` : text;
}

function pairOf(value: unknown): readonly [string, string] | null {
  if (!Array.isArray(value) || value.length !== 2) return null;
  const [one, other] = value as readonly unknown[];
  return typeof one === "string" && typeof other === "string" ? [one, other] : null;
}

function unknown(
  record: Readonly<Record<string, unknown>>,
  known: readonly string[],
  pointer: string,
  complain: Complain,
): void {
  for (const name of Object.keys(record)) {
    if (!known.includes(name))
      complain(`${pointer}/${name}`, "has no field on this page; take it out first.");
  }
}

function refused(complaints: readonly BodyComplaint[]): BodyReading {
  const more = complaints.length - TOLD;
  return {
    ok: false,
    complaints:
      more > 0
        ? [...complaints.slice(0, TOLD), { pointer: "#", detail: `and ${more} more complaints.` }]
        : complaints,
  };
}

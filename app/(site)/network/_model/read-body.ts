/** The body of `POST /networks`, pasted or from a file, as the page keeps a network. */
import { type DriveKind, type Element, type Network, newElement, recordOf, type Value } from "./network";

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
  unknown(record, ["elements", "ports", "operating", "record"], "#", complain);
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
  const operating = record.operating === undefined ? {} : recordOf(record.operating);
  if (!operating) complain("#/operating", "must be an object.");
  else unknown(operating, [...DRIVES, "temperature"], "#/operating", complain);
  const given = DRIVES.filter((kind) => operating?.[kind] !== undefined);
  if (given.length > 1) complain("#/operating", `has ${given.join(" and ")}; at most one is taken.`);
  const text = (name: string): string => {
    const value = operating?.[name];
    if (typeof value === "string" || typeof value === "number") return String(value);
    if (value !== undefined) complain(`#/operating/${name}`, "must be a number or a text with a unit.");
    return "";
  };
  const [drive = "none"] = given;
  const driveText = drive === "none" ? "" : text(drive);
  const temperature = text("temperature");
  if (complaints.length > 0 || !ports) return refused(complaints);
  return { ok: true, network: { elements, ports, drive: { kind: drive, text: driveText }, temperature } };
}

type Complain = (pointer: string, detail: string) => void;

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
  if (typeof resistance === "string" || typeof resistance === "number") {
    return { kind: "resistance", text: String(resistance) };
  }
  complain(`${pointer}/resistance`, "must be a number or a text with a unit.");
  return null;
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

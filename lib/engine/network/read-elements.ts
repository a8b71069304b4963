/** Elements of a network as numbers: each one's resistance with its bounds, by text or by a request of its own. */
import { InputError, pointerTo, type Problems } from "../failure";
import { readQuantity } from "../quantity/parse-quantity";
import { computeResistance } from "../resistance/compute-resistance";
import type { ComputeContext } from "../resistance/compute-context";
import type { ResistanceResult } from "../resistance/result-schema";
import { tolerancedSchema } from "../resistance/uncertainty/tolerance-schema";
import { addSchemaComplaints } from "../schema-complaints";
import { suggestion } from "../shape/nearest-names";
import type { NetworkRequest } from "./request-schema";
import { type Stray, strayOfResult, strayOfTolerance } from "./stray";

/** Complaints beyond so many are not told; they are counted. */
export const MOST_COMPLAINTS = 100;

/** Members of a request that an element of a network does not take, and why. */
const UNFIT: Readonly<Record<string, string>> = {
  record: "is for the network as a whole.",
  requirement: "is for the network as a whole.",
  uncertainty: "is for the network as a whole.",
  include: "is not for elements of a network.",
};
const DRIVES = ["voltage", "current", "power"];

export interface NetworkElement {
  readonly ohm: number;
  readonly lower: number;
  readonly upper: number;
  /** The answer to its request, if it has one. */
  readonly result: ResistanceResult | null;
  /** How far it strays, where the network's uncertainty is asked for and something of it is uncertain. */
  readonly stray: Stray | null;
  /** Whether it has a tolerance of its own. */
  readonly toleranced: boolean;
}

type Element = NetworkRequest["elements"][number];

/** Reads every element; pauses after each that is computed. Elements with complaints come back as null. */
export function* readElements(
  { elements, operating, uncertainty }: NetworkRequest,
  context: ComputeContext,
  problems: Problems,
): Generator<void, (NetworkElement | null)[]> {
  const read: (NetworkElement | null)[] = [];
  for (const [index, element] of elements.entries()) {
    const pointer = pointerTo("#/elements", index);
    if (element.request !== undefined) {
      const more = { temperature: operating?.temperature, uncertainty };
      read.push(compute(element.request, `${pointer}/request`, more, context, problems));
      yield;
    } else read.push(plain(element, `${pointer}/resistance`, problems));
  }
  return read;
}

function plain({ resistance }: Element, pointer: string, problems: Problems): NetworkElement | null {
  const toleranced = typeof resistance === "object" && resistance !== null;
  const parsed = toleranced ? tolerancedSchema.safeParse(resistance, { reportInput: true }) : null;
  if (parsed && !parsed.success) {
    addSchemaComplaints(tolerancedSchema, parsed.error.issues, pointer, problems);
    return null;
  }
  const reading = readQuantity(parsed ? parsed.data.value : resistance, "resistance");
  if (!reading.ok) {
    problems.add(parsed ? pointerTo(pointer, "value") : pointer, reading.detail);
    return null;
  }
  const ohm = reading.value;
  if (ohm >= 1e-300 && ohm <= 1e300) {
    const stray = parsed ? strayOfTolerance(parsed.data, ohm, pointer, problems) : null;
    return { ohm, lower: ohm, upper: ohm, result: null, stray, toleranced };
  }
  problems.add(
    pointer,
    ohm === 0
      ? "must be greater than 0; nodes that nothing parts are one node: give them one name."
      : ohm < 0
        ? "must be greater than 0."
        : "must lie between 1e-300 and 1e300 ohm.",
  );
  return null;
}

function compute(
  request: Readonly<Record<string, unknown>>,
  pointer: string,
  {
    temperature,
    uncertainty,
  }: Readonly<Pick<NetworkRequest, "uncertainty">> & {
    readonly temperature: number | string | undefined;
  },
  context: ComputeContext,
  problems: Problems,
): NetworkElement | null {
  let fit = true;
  for (const [name, detail] of Object.entries(UNFIT)) {
    if (request[name] === undefined) continue;
    problems.add(pointerTo(pointer, name), detail);
    fit = false;
  }
  const { operating = {} } = request;
  const readable = typeof operating === "object" && operating !== null && !Array.isArray(operating);
  const own: object = readable ? operating : {};
  for (const name of DRIVES) {
    if (!(name in own)) continue;
    problems.add(pointerTo(pointer, "operating", name), "follows from the network; leave it out here.");
    fit = false;
  }
  if (!fit) return null;
  const inherits = temperature !== undefined && readable && !("temperature" in own);
  const whole = {
    ...request,
    ...(inherits ? { operating: { ...own, temperature } } : {}),
    ...(uncertainty ? { uncertainty } : {}),
  };
  try {
    const result = computeResistance(whole, context);
    const { value, lower, upper } = result.resistance;
    return { ohm: value, lower, upper, result, stray: strayOfResult(result, request), toleranced: false };
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    for (const { pointer: place, detail } of error.errors) {
      // The uncertainty is not a member of this request.
      problems.add(place.startsWith("#/uncertainty") ? pointer : pointer + place.slice(1), detail);
    }
    return null;
  }
}

/** Nodes by name, in the order in which the ports and elements name them. */
export interface NamedNodes {
  readonly names: readonly string[];
  /** Node numbers of element e: from[e], to[e]. */
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly high: number;
  readonly low: number;
}

/** Checks all names; null where something is wrong with them. */
export function nameNodes({ elements, ports }: NetworkRequest, problems: Problems): NamedNodes | null {
  const before = problems.list.length;
  const numbers = new Map<string, number>();
  const numberOf = (name: string): number => {
    const known = numbers.get(name);
    if (known !== undefined) return known;
    numbers.set(name, numbers.size);
    return numbers.size - 1;
  };
  const from = new Int32Array(elements.length);
  const to = new Int32Array(elements.length);
  const first = new Map<string, number>();
  for (const [e, { name, between }] of elements.entries()) {
    const pointer = pointerTo("#/elements", e);
    const other = first.get(name);
    if (other !== undefined) {
      problems.add(`${pointer}/name`, `"${name}" is the name of element ${other + 1} already.`);
    } else first.set(name, e);
    from[e] = numberOf(between[0]);
    to[e] = numberOf(between[1]);
    if (from[e] === to[e]) {
      problems.add(`${pointer}/between`, `begins and ends at "${between[0]}"; an element joins two nodes.`);
    }
  }
  const names = [...numbers.keys()];
  for (const [k, name] of ports.entries()) {
    if (numbers.has(name)) continue;
    problems.add(
      `#/ports/${k}`,
      `"${name}" is no node of an element.${suggestion(name, names.slice(0, 2_000))}`,
    );
  }
  if (ports[0] === ports[1]) {
    problems.add("#/ports/1", `is "${ports[0]}" like the first; a resistance is between two nodes.`);
  }
  if (problems.list.length > before) return null;
  return { names, from, to, high: numberOf(ports[0]), low: numberOf(ports[1]) };
}

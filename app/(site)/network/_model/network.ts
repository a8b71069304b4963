/** A network as the page keeps it: everything as it was typed. */
import { tolerancedName } from "../../calculate/_model/tolerances";

/** How far a resistance may be off, by the names that the API has for it: `tolerance`, or `plus` and `minus`. */
export type Tolerance = Readonly<Record<string, string>>;

/** What gives an element its resistance. */
export type Value =
  | { readonly kind: "resistance"; readonly text: string; readonly tolerance?: Tolerance }
  /** A shape with the state of its calculation page, behind `/calculate/`: `bar?length=1m&…`. */
  | { readonly kind: "shape"; readonly address: string }
  /** The body of a call that gives it, as it came with a network's JSON. */
  | { readonly kind: "request"; readonly request: Readonly<Record<string, unknown>> };

export interface Element {
  readonly id: number;
  readonly name: string;
  readonly from: string;
  readonly to: string;
  readonly value: Value;
}

export type DriveKind = "none" | "current" | "voltage" | "power";

export interface Network {
  readonly elements: readonly Element[];
  readonly ports: readonly [string, string];
  readonly drive: { readonly kind: DriveKind; readonly text: string };
  readonly temperature: string;
  /** Limits that the resistance is held against; "" where there is none. */
  readonly requirement: Requirement;
  /** How the tolerances are evaluated; "" where they are not. */
  readonly uncertainty: UncertaintyMethod | "";
}

export type Requirement = Readonly<Record<"min" | "max", string>>;

export const NO_REQUIREMENT: Requirement = { min: "", max: "" };

export const UNCERTAINTY_METHODS = ["propagation", "worst-case"] as const;
export type UncertaintyMethod = (typeof UNCERTAINTY_METHODS)[number];

/** The method of this name; "" for anything else. */
export function methodOf(name: unknown): Network["uncertainty"] {
  return UNCERTAINTY_METHODS.find((method) => method === name) ?? "";
}

let lastId = 0;

export function newElement(element: Omit<Element, "id">): Element {
  return { id: ++lastId, ...element };
}

const plain = (name: string, from: string, to: string, text: string) =>
  newElement({ name, from, to, value: { kind: "resistance", text } });

/** What the page starts with: a bolted busbar joint with a braid, at its rated current. */
export const START: Network = {
  elements: [
    plain("bar A", "in", "joint", "42 uohm"),
    newElement({
      name: "bar B",
      from: "in",
      to: "joint",
      value: {
        kind: "shape",
        address: "bar?length=1.2m&width=50mm&thickness=10mm&material=copper-annealed",
      },
    }),
    plain("bolts", "joint", "lug", "6 uohm"),
    plain("braid left", "lug", "out", "36 uohm"),
    plain("braid right", "lug", "out", "38 uohm"),
  ],
  ports: ["in", "out"],
  drive: { kind: "current", text: "630 A" },
  temperature: "65 degC",
  requirement: NO_REQUIREMENT,
  uncertainty: "",
};

/** Names of all nodes, ports first, in the order of the elements. */
export function nodeNames({ elements, ports }: Pick<Network, "elements" | "ports">): readonly string[] {
  const names = [...ports, ...elements.flatMap(({ from, to }) => [from, to])];
  return [...new Set(names.map((name) => name.trim()).filter((name) => name !== ""))];
}

/** A name that no element has yet. */
export function freeName({ elements }: Network): string {
  const taken = new Set(elements.map(({ name }) => name));
  for (let k = elements.length + 1; ; k++) if (!taken.has(`element ${k}`)) return `element ${k}`;
}

/** A pasted link to a calculation as the part behind `/calculate/`; null for anything else. */
export function addressOf(text: string): string | null {
  const match = /^(?:https?:\/\/[^/\s]+)?\/calculate\/([a-z0-9-]+(?:\?[^#\s]*)?)(?:#\S*)?$/.exec(text.trim());
  return match && !match[1].startsWith("table") ? match[1] : null;
}

/** Behind the "#" of the address and in this tab's store: JSON without the row ids. */
export function toText(network: Network): string {
  const { elements, ports, drive, temperature, requirement, uncertainty } = network;
  const rows = elements.map(({ name, from, to, value }) => {
    const tolerance = value.kind === "resistance" && value.tolerance;
    const row = [name, from, to, valueText(value)];
    return tolerance ? [...row, new URLSearchParams(tolerance).toString()] : row;
  });
  return JSON.stringify({
    elements: rows,
    ports,
    drive,
    temperature,
    ...(requirement.min === "" && requirement.max === "" ? {} : { requirement }),
    ...(uncertainty === "" ? {} : { uncertainty }),
  });
}

/** Longest network that stands in an address. */
const LONGEST_ADDRESS = 6_000;

/** What stands behind the "#" of the page's address; null where the network is too long for one. */
export function networkHash(network: Network): string | null {
  const hash = `network=${encodeURIComponent(toText(network))}`;
  return hash.length <= LONGEST_ADDRESS ? hash : null;
}

/** The network in a hash; null where it has none of ours. */
export function networkFromHash(hash: string): Network | null {
  if (!hash.startsWith("network=")) return null;
  try {
    return fromText(decodeURIComponent(hash.slice(8)));
  } catch {
    return null;
  }
}

/** The inverse of `toText`; null where the text is none of ours. */
export function fromText(text: string): Network | null {
  try {
    const { elements, ports, drive, temperature, requirement, uncertainty } = JSON.parse(text) as {
      elements: string[][];
      ports: [string, string];
      drive: Network["drive"];
      temperature: string;
      requirement?: Partial<Requirement>;
      uncertainty?: unknown;
    };
    const kinds: readonly DriveKind[] = ["none", "current", "voltage", "power"];
    const { min, max } = { ...NO_REQUIREMENT, ...requirement };
    const texts = [...elements.flat(), ...ports, drive.text, temperature, min, max];
    if (ports.length !== 2 || !kinds.includes(drive.kind)) return null;
    if (texts.some((entry) => typeof entry !== "string") || elements.length > 10_000) return null;
    return {
      elements: elements.map(([name = "", from = "", to = "", value = "", tolerance = ""]) =>
        newElement({ name, from, to, value: readValue(value, readTolerance(tolerance)) }),
      ),
      ports: [ports[0], ports[1]],
      drive: { kind: drive.kind, text: drive.text },
      temperature,
      requirement: { min, max },
      uncertainty: methodOf(uncertainty),
    };
  } catch {
    return null;
  }
}

function readTolerance(text: string): Tolerance | undefined {
  const members = [...new URLSearchParams(text)].filter(([name]) => tolerancedName(`.${name}`) === "");
  return members.length > 0 ? Object.fromEntries(members) : undefined;
}

/**
 * What is typed for a resistance: a quantity, the link of a calculation, or a call's body as JSON. A quantity has the
 * tolerance that stands beside it; the others bring theirs along.
 */
export function readValue(text: string, tolerance?: Tolerance): Value {
  const address = addressOf(text);
  if (address !== null) return { kind: "shape", address };
  const request = text.trim().startsWith("{") ? objectOf(text) : null;
  if (request !== null) return { kind: "request", request };
  return { kind: "resistance", text, ...(tolerance ? { tolerance } : {}) };
}

/** The inverse. */
export function valueText(value: Value): string {
  if (value.kind === "shape") return `/calculate/${value.address}`;
  return value.kind === "request" ? JSON.stringify(value.request) : value.text;
}

function objectOf(text: string): Readonly<Record<string, unknown>> | null {
  try {
    return recordOf(JSON.parse(text));
  } catch {
    return null;
  }
}

export function recordOf(value: unknown): Readonly<Record<string, unknown>> | null {
  return typeof value === "object" && value !== null && !Array.isArray(value) ? { ...value } : null;
}

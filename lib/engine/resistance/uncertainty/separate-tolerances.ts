/** Takes the tolerances out of a request, so that all the rest reads plain quantities. */
import { pointerTo, type Problems } from "../../failure";
import { addSchemaComplaints } from "../../schema-complaints";
import { tolerancedSchema, type TolerancedInput } from "./tolerance-schema";

/** Where a toleranced quantity may stand, and what it measures there. */
export type Place =
  | { readonly kind: "dimension"; readonly name: string }
  | { readonly kind: "temperature" }
  | { readonly kind: "medium"; readonly member: MediumMember }
  /** A value of the graded quantity, a dopant density, a position along the coordinate, or a temperature. */
  | {
      readonly kind: "profile";
      readonly measures: ProfileMeasure;
      readonly graded: Readonly<Record<string, unknown>>;
    };

type ProfileMeasure = "value" | "density" | "position" | "temperature";

const MEDIUM_MEMBERS = [
  "resistivity",
  "conductivity",
  "temperatureCoefficient",
  "referenceTemperature",
  "sheetResistance",
  "thickness",
] as const;
type MediumMember = (typeof MEDIUM_MEMBERS)[number];

/** Members of each kind of profile that take a tolerance; `*` stands for every entry of a list. */
const PROFILE_MEMBERS: Readonly<Record<string, readonly (readonly [string, ProfileMeasure])[]>> = {
  constant: [["value", "value"]],
  linear: [
    ["from", "value"],
    ["to", "value"],
  ],
  exponential: [
    ["from", "value"],
    ["to", "value"],
  ],
  power: [
    ["reference", "value"],
    ["at", "position"],
  ],
  gaussian: [
    ["peak", "value"],
    ["center", "position"],
    ["spread", "position"],
    ["background", "value"],
  ],
  "complementary-error": [
    ["surface", "value"],
    ["length", "position"],
    ["background", "value"],
  ],
  layers: [["layers/*/value", "value"]],
  table: [["values/*", "value"]],
  temperature: [
    ["from", "temperature"],
    ["to", "temperature"],
  ],
  dopant: [["background", "density"]],
};

/** One quantity with a tolerance, as it was found. */
export interface FoundTolerance {
  readonly path: readonly (string | number)[];
  readonly pointer: string;
  readonly place: Place;
  readonly given: TolerancedInput;
}

export interface Separated {
  /** The request with every toleranced quantity replaced by its value; the request itself where there is none. */
  readonly plain: unknown;
  readonly found: readonly FoundTolerance[];
}

type Members = Record<string, unknown>;

/** Finds every toleranced quantity of a body that no schema has read yet; complaints point into the quantity. */
export function separateTolerances(request: unknown, problems: Problems): Separated {
  const found: FoundTolerance[] = [];
  if (!isMembers(request)) return { plain: request, found };
  let plain: Members | null = null;

  const look = (value: unknown, path: readonly (string | number)[], place: () => Place): void => {
    if (!isMembers(value)) return;
    const pointer = pointerTo("#", ...path);
    const parsed = tolerancedSchema.safeParse(value, { reportInput: true });
    if (parsed.success) found.push({ path, pointer, place: place(), given: parsed.data });
    else if (!("value" in value)) return;
    else addSchemaComplaints(tolerancedSchema, parsed.error.issues, pointer, problems);
    plain ??= { ...request };
    put(plain, path, value.value);
  };

  if (isMembers(request.dimensions)) {
    for (const [name, value] of Object.entries(request.dimensions)) {
      look(value, ["dimensions", name], () => ({ kind: "dimension", name }));
    }
  }
  if (isMembers(request.operating)) {
    look(request.operating.temperature, ["operating", "temperature"], () => ({ kind: "temperature" }));
  }
  lookInMedium(request.medium, ["medium"], look);
  if (isMembers(request.media)) {
    for (const [name, medium] of Object.entries(request.media)) lookInMedium(medium, ["media", name], look);
  }
  return { plain: plain ?? request, found };
}

type Look = (value: unknown, path: readonly (string | number)[], place: () => Place) => void;

function lookInMedium(medium: unknown, path: readonly string[], look: Look): void {
  if (!isMembers(medium)) return;
  for (const member of MEDIUM_MEMBERS) {
    if (medium[member] !== undefined)
      look(medium[member], [...path, member], () => ({ kind: "medium", member }));
  }
  const { graded } = medium;
  if (!isMembers(graded)) return;
  lookInProfile(graded.profile, [...path, "graded", "profile"], graded, false, look);
}

function lookInProfile(
  profile: unknown,
  path: readonly (string | number)[],
  graded: Members,
  density: boolean,
  look: Look,
): void {
  if (!isMembers(profile) || typeof profile.kind !== "string") return;
  const members = Object.hasOwn(PROFILE_MEMBERS, profile.kind) ? PROFILE_MEMBERS[profile.kind] : [];
  for (const [member, what] of members) {
    const measures = density && what === "value" ? "density" : what;
    const place = (): Place => ({ kind: "profile", measures, graded });
    const [list, , inner] = member.split("/");
    if (list === member) look(profile[member], [...path, member], place);
    else if (Array.isArray(profile[list])) {
      for (const [i, entry] of (profile[list] as readonly unknown[]).entries()) {
        if (inner === undefined) look(entry, [...path, list, i], place);
        else if (isMembers(entry)) look(entry[inner], [...path, list, i, inner], place);
      }
    }
  }
  if (profile.kind === "dopant" && !density)
    lookInProfile(profile.profile, [...path, "profile"], graded, true, look);
}

function isMembers(value: unknown): value is Members {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

/** Puts a value at a path, copying what lies on the way once: the caller's request stays as it is. */
function put(root: Members, path: readonly (string | number)[], value: unknown): void {
  let here: Members | unknown[] = root;
  for (const [depth, part] of path.entries()) {
    const holder = here as Members;
    if (depth === path.length - 1) {
      holder[part] = value;
      return;
    }
    const next: unknown = holder[part];
    const copy = copied.has(next as object)
      ? next
      : Array.isArray(next)
        ? [...(next as unknown[])]
        : { ...(next as Members) };
    copied.add(copy as object);
    holder[part] = copy;
    here = copy as Members;
  }
}

/** Copies made here, which need not be made again. */
const copied = new WeakSet();

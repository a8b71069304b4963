/** The body of `POST /resistance` that a page's parameters stand for. */
import type { ShapeEntry } from "@/lib/engine";
import { DRIVES, type MediumKind, mediumKind, mediumPrefixes, type Parameters } from "./parameters";
import { PROFILE_FORMS, readRows, SELF_DESCRIBING } from "./profile-forms";
import { type Given, given, uncertaintyBody } from "./tolerances";

export interface RequestBody {
  readonly shape: string;
  readonly dimensions: Readonly<Record<string, Given>>;
  readonly medium?: Readonly<Record<string, unknown>>;
  readonly media?: Readonly<Record<string, Readonly<Record<string, unknown>>>>;
  readonly operating?: Readonly<Record<string, Given>>;
  readonly requirement?: Readonly<Record<string, Given>>;
  readonly uncertainty?: Readonly<Record<string, unknown>>;
}

/** The dimensions alone, without tolerances: what a drawing needs. */
export function plainDimensions(
  entry: ShapeEntry,
  parameters: Parameters,
): Readonly<Record<string, string | number>> {
  const dimensions: Record<string, string | number> = {};
  for (const { name, type } of entry.dimensions) {
    const text = parameters[name]?.trim();
    if (!text) continue;
    dimensions[name] = type === "integer" && /^\d{1,15}$/.test(text) ? Number(text) : text;
  }
  return dimensions;
}

/** Empty fields are left out, so that the API says what is missing. */
export function requestBody(entry: ShapeEntry, parameters: Parameters): RequestBody {
  const dimensions = Object.fromEntries(
    Object.entries(plainDimensions(entry, parameters)).map(([name, value]) => [
      name,
      typeof value === "number" ? value : given(parameters, name, value),
    ]),
  );
  const uncertainty = uncertaintyBody(parameters);
  const sheet = entry.media.kind === "sheet";
  const media = mediumPrefixes(entry).map(
    (prefix) => [prefix.slice(0, -1), mediumBody(parameters, prefix, sheet)] as const,
  );
  return {
    shape: entry.id,
    dimensions,
    ...(entry.media.kind === "two" ? { media: Object.fromEntries(media) } : { medium: media[0][1] }),
    ...group("operating", ["temperature", ...DRIVES], parameters),
    ...group("requirement", ["min", "max"], parameters),
    ...(uncertainty ? { uncertainty } : {}),
  };
}

function group(name: string, members: readonly string[], parameters: Parameters): object {
  const set = members.filter((member) => parameters[member]?.trim());
  if (set.length === 0) return {};
  const values = set.map((member) => [member, given(parameters, member, parameters[member].trim())]);
  return { [name]: Object.fromEntries(values) };
}

const COMPANIONS: Readonly<Record<MediumKind, readonly string[]>> = {
  graded: [],
  sheetResistance: [],
  material: [],
  resistivity: ["temperatureCoefficient", "referenceTemperature"],
  conductivity: ["temperatureCoefficient", "referenceTemperature"],
};

function mediumBody(
  parameters: Parameters,
  prefix: string,
  sheet: boolean,
): Readonly<Record<string, unknown>> {
  const kind = mediumKind(parameters, prefix);
  if (!kind) return {};
  if (kind === "graded") return { graded: gradedBody(parameters, prefix) };
  const medium: Record<string, unknown> = {};
  const thickness = sheet && kind !== "sheetResistance" ? ["thickness"] : [];
  for (const name of [kind, ...COMPANIONS[kind], ...thickness]) {
    const text = parameters[`${prefix}${name}`]?.trim();
    if (text) medium[name] = name === "material" ? text : given(parameters, `${prefix}${name}`, text);
  }
  // An emptied field is still the chosen one: the API then asks for a value rather than for a choice.
  if (!(kind in medium)) medium[kind] = "";
  if (kind === "material" && parameters[`${prefix}extrapolate`] === "true") medium.extrapolate = true;
  return medium;
}

function gradedBody(parameters: Parameters, prefix: string): object {
  const profile = profileBody(parameters, `${prefix}profile`);
  return {
    coordinate: parameters[`${prefix}graded`],
    ...(SELF_DESCRIBING.has(profile.kind)
      ? {}
      : { quantity: parameters[`${prefix}quantity`] ?? "conductivity" }),
    profile,
  };
}

function profileBody(parameters: Parameters, name: string): { readonly kind: string } {
  const kind = parameters[name] ?? "constant";
  const profile: Record<string, unknown> = {};
  for (const field of PROFILE_FORMS[kind] ?? []) {
    const key = `${name}.${field.name}`;
    const text = (parameters[key] ?? "").trim();
    if (field.type === "profile") profile.profile = profileBody(parameters, key);
    else if (field.type === "layers") {
      profile.layers = readRows(text).map(([thickness, value]) => ({ thickness, value }));
    } else if (field.type === "table") {
      const rows = readRows(text);
      profile.positions = rows.map(([position]) => position);
      profile.values = rows.map(([, value]) => value);
    } else if (field.type === "flag") {
      if (text === "true") profile[field.name] = true;
    } else if (field.type === "choice") profile[field.name] = text || field.choices[0].value;
    else if (text) profile[field.name] = given(parameters, key, text);
  }
  return { kind, ...profile };
}

/** Parts of the answer that a page shows. */
export const INCLUDE = ["steps", "profile", "checks", "peak"] as const;

/** The inputs of an uncertainty budget, in the words of the page. */
import type { ShapeEntry } from "@/lib/engine";
import { PROFILE_FORMS } from "./profile-forms";

const MEMBERS: Readonly<Record<string, readonly [string, string]>> = {
  temperature: ["Temperature", "K"],
  resistivity: ["Resistivity", "Ω·m"],
  conductivity: ["Conductivity", "S/m"],
  sheetResistance: ["Sheet resistance", "Ω"],
  thickness: ["Thickness of the sheet", "m"],
  temperatureCoefficient: ["Temperature coefficient", "1/K"],
  referenceTemperature: ["Reference temperature", "K"],
  material: ["Resistivity of the material, as stated", ""],
};
const UNITS: Readonly<Record<string, string>> = { m: "m", "m^2": "m²", deg: "rad", "1": "" };

/** What the fields of all laws are called; where two laws share a name, by the first. */
const FORM_WORDS = new Map(
  Object.values(PROFILE_FORMS)
    .flat()
    .reverse()
    .map(({ name, label }) => [name, label.toLowerCase()]),
);

/** An input's place in the request in the page's words, and its SI unit. */
export function inputWords(
  input: string,
  entry: Pick<ShapeEntry, "dimensions" | "media">,
): { readonly label: string; readonly unit: string } {
  const path = input.split(".");
  const last = path[path.length - 1];
  if (path[0] === "dimensions") {
    const dimension = entry.dimensions.find(({ name }) => name === last);
    return { label: dimension?.label ?? last, unit: UNITS[dimension?.unit ?? "1"] ?? "" };
  }
  const profile = path.indexOf("profile");
  const medium = path[0] === "media" ? entry.media.names.find(({ name }) => name === path[1]) : undefined;
  const [label, unit] =
    profile < 0 ? (MEMBERS[last] ?? [last, ""]) : [profileWords(path.slice(profile + 1)), ""];
  return { label: medium ? `${medium.label}: ${label.toLowerCase()}` : label, unit };
}

/** "layers.0.value" as "Profile: layer 1, value", "from" as "Profile: at the start". */
function profileWords(path: readonly string[]): string {
  const places: Readonly<Record<string, string>> = {
    layers: "layer",
    positions: "position",
    values: "value",
    table: "point",
  };
  const words: string[] = [];
  for (const part of path) {
    const number = /^\d+$/.test(part) ? Number(part) + 1 : null;
    if (number === null) words.push(places[part] ?? FORM_WORDS.get(part) ?? part);
    else words.push(`${words.pop() ?? ""} ${number}`.trim());
  }
  return `Profile: ${words.join(", ")}`;
}

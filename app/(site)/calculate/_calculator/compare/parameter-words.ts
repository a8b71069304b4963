/** Names and texts of parameters for people. */
import type { ShapeEntry } from "@/lib/engine";
import { PROFILE_FORMS, readRows } from "../../_model/profile-forms";
import { tolerancedName } from "../../_model/tolerances";
import type { MaterialChoice } from "../../_server/material-choices";
import type { FormDimension } from "../../_server/form-facts";

const WORDS: Readonly<Record<string, string>> = {
  material: "Material",
  extrapolate: "Outside the material's range",
  resistivity: "Resistivity",
  conductivity: "Conductivity",
  sheetResistance: "Sheet resistance",
  thickness: "Thickness of the sheet",
  temperatureCoefficient: "Temperature coefficient",
  referenceTemperature: "Reference temperature",
  graded: "Varies along",
  quantity: "What varies",
  profile: "Law",
  temperature: "Temperature",
  voltage: "Voltage",
  current: "Current",
  power: "Power",
  min: "At least",
  max: "At most",
  uncertainty: "Evaluation of tolerances",
  trials: "Trials",
  seed: "Seed",
  solveFor: "To find",
  target: "Target",
  from: "Search from",
  to: "Search to",
};

export function parameterLabel(
  name: string,
  entry: ShapeEntry,
  dimensions: readonly FormDimension[],
): { readonly label: string; readonly symbol?: string } {
  if (tolerancedName(name) !== name) {
    const of = parameterLabel(tolerancedName(name), entry, dimensions);
    return { label: `${of.label}: ${name.slice(name.lastIndexOf(".") + 1)}` };
  }
  const dimension = dimensions.find((own) => own.name === name);
  if (dimension) return { label: dimension.label, symbol: dimension.symbol };
  const medium = entry.media.names.find((own) => name.startsWith(`${own.name}.`));
  const plain = medium ? name.slice(medium.name.length + 1) : name;
  const label = WORDS[plain] ?? profileLabel(plain);
  return { label: medium ? `${medium.label}: ${label.toLowerCase()}` : label };
}

function profileLabel(name: string): string {
  const field = name.slice(name.lastIndexOf(".") + 1);
  for (const fields of Object.values(PROFILE_FORMS)) {
    const found = fields.find((own) => own.name === field);
    if (found) return `Law: ${found.label.toLowerCase()}`;
  }
  return name;
}

const SIGNS: readonly (readonly [RegExp, string])[] = [
  [/\^2\b/g, "²"],
  [/\^3\b/g, "³"],
  [/\bu(?=[mΩASVW]|ohm)/g, "µ"],
  [/ohm/g, "Ω"],
  [/\bdegC\b/g, "°C"],
  [/\bdegF\b/g, "°F"],
  [/ ?\bdeg\b/g, "°"],
  [/Ω (?=[a-z])/g, "Ω·"],
];

/** A parameter's text as people write it: units with their signs, choices by their labels. */
export function parameterText(
  name: string,
  value: string,
  entry: ShapeEntry,
  materials: readonly MaterialChoice[],
): string {
  if (/(?:^|\.)material$/.test(name)) return materials.find(({ id }) => id === value)?.name ?? value;
  const dimension = entry.dimensions.find((own) => own.name === name);
  const choice = dimension?.choices?.find((own) => own.value === value);
  if (choice) return choice.label;
  if (/\.(?:layers|table)$/.test(name)) {
    const rows = readRows(value);
    return `${rows.length} ${name.endsWith("layers") ? "layers" : "points"}`;
  }
  if (!/^[+-]?[\d.]/.test(value) || name.endsWith("expression")) return value;
  return SIGNS.reduce((text, [pattern, sign]) => text.replace(pattern, sign), value);
}

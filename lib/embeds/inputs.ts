import { findShape, type QuantityKindName, readQuantity, type Shape, shapeEntry } from "@/lib/engine";
import type { EmbedDefinition } from "./definition";

/** What an input of a widget is: the catalogue's words for it, and how its text is read. */
export interface InputFacts {
  readonly name: string;
  readonly label: string;
  readonly symbol: string;
  readonly place: "dimension" | "medium" | "operating";
  readonly type: "quantity" | "integer" | "choice" | "material" | "flag";
  readonly kind: QuantityKindName | null;
  readonly gauge?: "wire" | "foil";
  readonly choices: readonly { readonly value: string; readonly label: string }[];
  /** Where the value stands in a request, by names. */
  readonly path: readonly string[];
}

interface Member {
  readonly name: string;
  readonly label: string;
  readonly symbol: string;
  readonly type: "quantity" | "material" | "flag";
  readonly kind: QuantityKindName | null;
}

/** The members of which a medium has exactly one, then those that stand beside one. */
const MEDIUM: readonly Member[] = [
  { name: "material", label: "Material", symbol: "", type: "material", kind: null },
  { name: "resistivity", label: "Resistivity", symbol: "ρ", type: "quantity", kind: "resistivity" },
  { name: "conductivity", label: "Conductivity", symbol: "σ", type: "quantity", kind: "conductivity" },
  {
    name: "sheetResistance",
    label: "Sheet resistance",
    symbol: "R_s",
    type: "quantity",
    kind: "sheetResistance",
  },
  { name: "thickness", label: "Thickness", symbol: "t", type: "quantity", kind: "length" },
  {
    name: "temperatureCoefficient",
    label: "Temperature coefficient",
    symbol: "α",
    type: "quantity",
    kind: "temperatureCoefficient",
  },
  {
    name: "referenceTemperature",
    label: "Reference temperature",
    symbol: "T_0",
    type: "quantity",
    kind: "temperature",
  },
  { name: "extrapolate", label: "Beyond the material's range", symbol: "", type: "flag", kind: null },
];

const SHEET_ONLY: readonly string[] = ["sheetResistance", "thickness"];

const OPERATING: readonly Member[] = [
  { name: "temperature", label: "Temperature", symbol: "T", type: "quantity", kind: "temperature" },
  { name: "voltage", label: "Voltage", symbol: "U", type: "quantity", kind: "voltage" },
  { name: "current", label: "Current", symbol: "I", type: "quantity", kind: "current" },
  { name: "power", label: "Power", symbol: "P", type: "quantity", kind: "power" },
];

const DIMENSION_KINDS: Readonly<Record<string, QuantityKindName>> = {
  m: "length",
  "m^2": "area",
  deg: "angle",
};

/** Every input that a widget of the shape can have, by name, in the order in which a form shows them. */
export function inputsOf(shape: Shape): ReadonlyMap<string, InputFacts> {
  const entry = shapeEntry(shape);
  const facts: InputFacts[] = entry.dimensions.map((dimension) => {
    const { name, label, symbol, type, unit } = dimension;
    return {
      name,
      label,
      symbol,
      place: "dimension",
      type,
      kind: type === "quantity" ? (DIMENSION_KINDS[unit ?? ""] ?? "number") : null,
      ...gaugeOf(name),
      choices: dimension.choices ?? [],
      path: ["dimensions", name],
    };
  });
  const media =
    entry.media.kind === "two" ? entry.media.names.map(({ name, label }) => ({ name, label })) : [null];
  return byName([...facts, ...media.flatMap((medium) => mediumFacts(entry.media.kind === "sheet", medium))]);
}

/**
 * Every input that a widget of a stored outline can have.
 * @param axisymmetric A body about an axis takes neither a sheet resistance nor a thickness.
 */
export function outlineInputs(axisymmetric = false): ReadonlyMap<string, InputFacts> {
  return byName(mediumFacts(!axisymmetric, null));
}

/** The inputs that a definition may name; undefined where its shape is not in the catalogue. */
export function definitionInputs({
  shape: id,
  outlineId,
}: Pick<EmbedDefinition, "shape" | "outlineId">): ReadonlyMap<string, InputFacts> | undefined {
  if (outlineId !== undefined) return outlineInputs();
  const shape = findShape(id ?? "");
  return shape && inputsOf(shape);
}

function mediumFacts(
  sheet: boolean,
  medium: { readonly name: string; readonly label: string } | null,
): InputFacts[] {
  return MEDIUM.filter(({ name }) => sheet || !SHEET_ONLY.includes(name)).map((member) => ({
    ...member,
    name: medium ? `${medium.name}.${member.name}` : member.name,
    label: medium ? `${member.label}, ${medium.label.toLowerCase()}` : member.label,
    place: "medium",
    ...gaugeOf(member.name),
    choices: [],
    path: medium ? ["media", medium.name, member.name] : ["medium", member.name],
  }));
}

/** With the operating point behind; a dimension goes before a member of the medium of the same name. */
function byName(facts: readonly InputFacts[]): ReadonlyMap<string, InputFacts> {
  const found = new Map<string, InputFacts>();
  for (const fact of facts) if (!found.has(fact.name)) found.set(fact.name, fact);
  for (const member of OPERATING) {
    found.set(member.name, { ...member, place: "operating", choices: [], path: ["operating", member.name] });
  }
  return found;
}

/** A value in the base unit of its kind; undefined where it cannot be read. */
export function sizeOf(text: string, input: InputFacts): number | undefined {
  if (input.type === "integer") return /^[+-]?\d{1,15}$/.test(text) ? Number(text) : undefined;
  if (input.kind === null) return undefined;
  const reading = readQuantity(text, input.kind, input.gauge ? { gauge: input.gauge } : {});
  return reading.ok ? reading.value : undefined;
}

/** Which lengths may be written as a wire's gauge or a foil's weight, as the engine reads them. */
function gaugeOf(name: string): { readonly gauge?: "wire" | "foil" } {
  if (/diameter\d?$/i.test(name)) return { gauge: "wire" };
  return /(?:thickness|plating)$/i.test(name) ? { gauge: "foil" } : {};
}

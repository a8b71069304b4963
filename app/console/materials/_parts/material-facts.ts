import { formatQuantity, type TextUnit } from "@/lib/engine/quantity/format-quantity";
import type { Law, MaterialVersion } from "./material";

const DIGITS = 8;
/** Keeps a number and its unit on one line, where the engine's thin space would not. */
const NO_BREAK = "\u202f";

/** A resistivity in Ω·m as lists show it: 17.24 nΩ·m, 10 PΩ·m. */
export function resistivityText(ohmM: number): string {
  return formatQuantity(ohmM, "ohm m", { digits: 4 });
}

const unbroken = (text: string) => text.replaceAll("\u2009", NO_BREAK);

type Fact = readonly [title: string, text: string];

const number = (value: unknown, digits = DIGITS) =>
  typeof value === "number" ? formatQuantity(value, "1", { digits }) : String(value);

const withUnit = (unit: string) => (value: unknown) => `${number(value)}${NO_BREAK}${unit}`;

const quantity = (unit: TextUnit) => (value: unknown) =>
  typeof value === "number" ? unbroken(formatQuantity(value, unit, { digits: DIGITS })) : String(value);

const degrees = withUnit("°C");

/** Members of a law with their titles; units as the engine takes them (`resistivityModelSchema`). */
const MEMBERS: Readonly<Record<string, readonly [title: string, text: (value: unknown) => string]>> = {
  resistivity: ["Resistivity", quantity("ohm m")],
  coefficient: ["Temperature coefficient", withUnit("1/K")],
  reference: ["Reference temperature", degrees],
  density: ["Dopant density", withUnit("1/cm³")],
  type: ["Dopant", (value) => (value === "p" ? "p, boron" : "n, phosphorus")],
  salinity: ["Practical salinity", (value) => number(value)],
  interpolation: ["Between the values", (value) => String(value).replaceAll("-", " ")],
};

/** The law of resistivity, member by member. */
function lawFacts(law: Law): Fact[] {
  const unit = law.quantity === "conductivity" ? "S/m" : "ohm m";
  const value = quantity(unit);
  const titled = law.quantity === "conductivity" ? "Conductivity" : "Resistivity";
  return [
    ["Law", law.model.replaceAll("-", " ")],
    ...Object.entries(law).flatMap(([name, member]): Fact[] => {
      if (name === "model" || name === "quantity" || name === "temperatures") return [];
      if (name === "values" && Array.isArray(member)) {
        const at: readonly unknown[] = Array.isArray(law.temperatures) ? law.temperatures : [];
        return [[titled, listText(member, (each, index) => `${value(each)} at ${degrees(at[index])}`)]];
      }
      if (name === "coefficients" && Array.isArray(member)) {
        const symbol = law.quantity === "conductivity" ? "S/m" : "Ω·m";
        const of = (each: unknown, power: number) =>
          `${number(each)}${NO_BREAK}${symbol}${["", "/K", "/K²", "/K³"][power] ?? `/K^${power}`}`;
        return [[`${titled}, powers of the temperature`, listText(member, of)]];
      }
      const known = MEMBERS[name];
      return [known ? [known[0], known[1](member)] : [name, String(member)]];
    }),
  ];
}

const SHOWN = 6;

function listText(values: readonly unknown[], text: (value: unknown, index: number) => string): string {
  const shown = values.slice(0, SHOWN).map(text).join(", ");
  return values.length > SHOWN ? `${shown} … (${values.length} in all)` : shown;
}

export type MaterialTold = Pick<
  MaterialVersion,
  "name" | "kind" | "resistivity" | "range" | "uncertainty" | "source" | "provenance" | "note"
>;

/** Each member of a version as a line of text, for what differs between two. */
export function factsOf(version: MaterialTold): readonly Fact[] {
  const { name, kind, resistivity, range, uncertainty, source, provenance, note = "" } = version;
  const factor = (value: number) => number(value, 4);
  return [
    ["Name", name],
    ["Kind", kind],
    ...lawFacts(resistivity),
    ["Holds", `${degrees(range.from)} to ${degrees(range.to)}`],
    [
      "Uncertainty",
      `${factor(uncertainty.lower)} to ${factor(uncertainty.upper)} times the nominal value; ${uncertainty.note}`,
    ],
    ["Source", source],
    ["Provenance", provenance],
    ["Note", note],
  ];
}

/**
 * The units that a field offers and knows, by what it measures. `id` is the spelling that the API reads; values in the
 * base unit are number·scale (+ offset), exactly, but for the few units that a circle brings in.
 */
import { type Rational, rational, scaled } from "./rational";

export interface Unit {
  readonly id: string;
  /** As it is shown. */
  readonly label: string;
  readonly scale: Rational | number;
  /** Added after scaling; only temperatures have one. */
  readonly offset?: Rational;
  /** Known when typed, but not offered in the menu. */
  readonly hidden?: boolean;
}

export type UnitKind =
  | "length"
  | "area"
  | "angle"
  | "temperature"
  | "temperatureCoefficient"
  | "resistivity"
  | "conductivity"
  | "sheetResistance"
  | "resistance"
  | "voltage"
  | "current"
  | "power"
  | "density"
  | "number";

const PREFIXES = {
  f: -15,
  p: -12,
  n: -9,
  u: -6,
  m: -3,
  c: -2,
  "": 0,
  k: 3,
  M: 6,
  G: 9,
  T: 12,
} as const;

type Prefix = keyof typeof PREFIXES;

/** One unit with the SI prefixes in `shown` offered and the others known; `power` raises the prefix too. */
function prefixed(
  id: string,
  label: string,
  shown: readonly Prefix[],
  shift = 0,
  power = 1,
): readonly Unit[] {
  return (Object.keys(PREFIXES) as Prefix[]).map((prefix) => ({
    id: `${prefix}${id}`,
    label: `${prefix === "u" ? "µ" : prefix}${label}`,
    scale: scaled(1n, PREFIXES[prefix] * power + shift),
    ...(shown.includes(prefix) ? {} : { hidden: true }),
  }));
}

function unit(id: string, label: string, scale: string | number, more: Partial<Unit> = {}): Unit {
  return { id, label, scale: typeof scale === "number" ? scale : (rational(scale) ?? 1), ...more };
}

/** A circular mil is the area of a circle one mil across. */
const CIRCULAR_MIL = (Math.PI / 4) * 6.4516e-10;

/** Nominal copper of IPC-6012: 34.3 µm for one ounce a square foot. */
const FOIL = unit("oz/ft^2", "oz/ft²", "34.3e-6");

export const UNITS: Readonly<Record<UnitKind, readonly Unit[]>> = {
  length: [
    ...prefixed("m", "m", ["n", "u", "m", "c", "", "k"]),
    unit("mil", "mil", "25.4e-6"),
    unit("in", "in", "0.0254"),
    unit("ft", "ft", "0.3048"),
    unit("angstrom", "Å", "1e-10", { hidden: true }),
  ],
  area: [
    ...prefixed("m^2", "m²", ["u", "m", "c", ""], 0, 2),
    unit("in^2", "in²", "0.00064516"),
    unit("ft^2", "ft²", "0.09290304", { hidden: true }),
    unit("mil^2", "mil²", "6.4516e-10", { hidden: true }),
    unit("cmil", "cmil", CIRCULAR_MIL, { hidden: true }),
    unit("kcmil", "kcmil", 1000 * CIRCULAR_MIL),
  ],
  angle: [
    unit("deg", "°", "1"),
    unit("rad", "rad", 180 / Math.PI),
    unit("mrad", "mrad", 0.18 / Math.PI, { hidden: true }),
    unit("turn", "turn", "360", { hidden: true }),
  ],
  temperature: [
    unit("degC", "°C", "1", { offset: scaled(0n, 0) }),
    unit("K", "K", "1", { offset: scaled(-27315n, -2) }),
    unit("degF", "°F", 1, { scale: { top: 5n, bottom: 9n }, offset: { top: -160n, bottom: 9n } }),
  ],
  temperatureCoefficient: [
    unit("1/K", "1/K", "1"),
    unit("%/K", "%/K", "0.01"),
    unit("ppm/K", "ppm/K", "1e-6"),
  ],
  resistivity: [
    ...prefixed("ohm m", "Ω·m", ["n", "u", "m", "", "k", "M", "G", "T"]),
    ...prefixed("ohm cm", "Ω·cm", ["u", ""], -2),
    unit("ohm mm^2/m", "Ω·mm²/m", "1e-6"),
  ],
  conductivity: [
    ...prefixed("S/m", "S/m", ["p", "n", "u", "m", "", "k", "M"]),
    ...prefixed("S/cm", "S/cm", ["u", "m", ""], 2),
    unit("%IACS", "% IACS", "0.58e6"),
  ],
  sheetResistance: prefixed("ohm/sq", "Ω/□", ["u", "m", "", "k", "M"]),
  resistance: prefixed("ohm", "Ω", ["n", "u", "m", "", "k", "M", "G", "T"]),
  voltage: prefixed("V", "V", ["u", "m", "", "k"]),
  current: prefixed("A", "A", ["n", "u", "m", "", "k"]),
  power: prefixed("W", "W", ["n", "u", "m", "", "k"]),
  density: [unit("1/cm^3", "1/cm³", "1"), unit("1/m^3", "1/m³", "1e-6")],
  number: [],
};

/** What a number without unit means to the API. */
const BARE = {
  length: "m",
  area: "m^2",
  angle: "deg",
  temperature: "degC",
  temperatureCoefficient: "1/K",
  resistivity: "ohm m",
  conductivity: "S/m",
  sheetResistance: "ohm/sq",
  resistance: "ohm",
  voltage: "V",
  current: "A",
  power: "W",
  density: "1/cm^3",
} as const;
export const BASE_UNITS: Partial<Record<UnitKind, string>> = BARE;

/** What the menu starts with where nothing says otherwise. */
export const FIRST_UNIT: Readonly<Record<UnitKind, string>> = {
  ...BARE,
  length: "mm",
  area: "mm^2",
  number: "",
};

/** Units of a field; a foil's thickness may also be given by weight. */
export function unitsOf(kind: UnitKind, foil = false): readonly Unit[] {
  return foil ? [...UNITS[kind], FOIL] : UNITS[kind];
}

const SPELLINGS: Readonly<Record<string, string>> = {
  inch: "in",
  inches: "in",
  '"': "in",
  "″": "in",
  "''": "in",
  thou: "mil",
  mils: "mil",
  feet: "ft",
  foot: "ft",
  "'": "ft",
  "′": "ft",
  Å: "angstrom",
  degrees: "deg",
  "°": "deg",
  degK: "K",
  C: "degC",
  F: "degF",
  celsius: "degC",
  "/K": "1/K",
  "K^-1": "1/K",
  "/cm^3": "1/cm^3",
  "cm^-3": "1/cm^3",
  "/m^3": "1/m^3",
  "m^-3": "1/m^3",
  sqmm: "mm^2",
  MCM: "kcmil",
};

/** The unit of that spelling, also "µm", "mm²", "Ω·m", "Ohm cm" or "°C"; undefined where the field knows none such. */
export function findUnit(spelling: string, units: readonly Unit[]): Unit | undefined {
  const plain = plainSpelling(spelling);
  const named = SPELLINGS[plain] ?? plain;
  return units.find(({ id }) => id === named || id.replaceAll(" ", "") === named.replaceAll(" ", ""));
}

function plainSpelling(text: string): string {
  return text
    .replace(
      /[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+/g,
      (run) => `^${run.replace(/./g, (c) => (c === "⁻" ? "-" : String("⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(c))))}`,
    )
    .replace(/[µμ]/g, "u")
    .replace(/Ω|Ω|ohms?\b/gi, "ohm")
    .replace(/[·⋅*]/g, " ")
    .replace(/□|\bsquare\b/g, "sq")
    .replace(/°\s*C\b/g, "degC")
    .replace(/°\s*F\b/g, "degF")
    .replace(/%\s*IACS/i, "%IACS")
    .replace(/\s+/g, " ")
    .trim();
}

/**
 * Numbers for people: engineering prefixes, a thin space before the unit, and as many digits as the bounds carry
 * (JCGM 100, 7.2.6: two significant digits of the uncertainty), at most five unless more are asked for.
 */

const THIN_SPACE = "\u2009";

const PREFIX: Readonly<Record<number, string>> = {
  [-18]: "a",
  [-15]: "f",
  [-12]: "p",
  [-9]: "n",
  [-6]: "µ",
  [-3]: "m",
  0: "",
  3: "k",
  6: "M",
  9: "G",
  12: "T",
  15: "P",
  18: "E",
};

/** Symbols of the units that texts are written in, and the smallest and largest prefix each takes. */
const SYMBOLS = {
  ohm: { symbol: "Ω", least: -12, most: 18 },
  siemens: { symbol: "S", least: -18, most: 18 },
  volt: { symbol: "V", least: -18, most: 18 },
  ampere: { symbol: "A", least: -18, most: 18 },
  watt: { symbol: "W", least: -18, most: 18 },
  metre: { symbol: "m", least: -15, most: 3 },
  "V/m": { symbol: "V/m", least: -18, most: 18 },
  "A/m": { symbol: "A/m", least: -18, most: 18 },
  "S/m": { symbol: "S/m", least: -18, most: 18 },
  "ohm/sq": { symbol: "Ω/□", least: -12, most: 18 },
  "ohm m": { symbol: "Ω·m", least: -18, most: 18 },
  // A prefix on an area would be squared with it.
  "A/m^2": { symbol: "A/m²", least: 0, most: 0 },
  "m^2": { symbol: "m²", least: 0, most: 0 },
  degree: { symbol: "°", least: 0, most: 0 },
  degC: { symbol: "°C", least: 0, most: 0 },
  "1": { symbol: "", least: 0, most: 0 },
} as const;

export type TextUnit = keyof typeof SYMBOLS;

export interface FormatOptions {
  /** Bounds of the value; the digits shown end with the second significant digit of their half-width. */
  readonly lower?: number;
  readonly upper?: number;
  /** Largest number of significant digits, 5 by default. */
  readonly digits?: number;
}

/**
 * A value with its unit for people, such as "1.2345 mΩ" (with a thin space). Zeros that only fill up the largest number
 * of digits are left away; zeros that the bounds make significant stay.
 */
export function formatQuantity(value: number, unit: TextUnit, options: FormatOptions = {}): string {
  const { symbol, least, most } = SYMBOLS[unit];
  const space = symbol === "" || symbol === "°" ? "" : THIN_SPACE;
  if (value === 0) return `0${space}${symbol}`;
  if (!Number.isFinite(value)) return `${value > 0 ? "" : "−"}∞${space}${symbol}`;
  const { digits, limited } = significantDigits(value, options);
  const rounded = roundTo(value, digits);
  const exponent = exponentOf(rounded);
  const thousand = Math.floor(exponent / 3) * 3;
  const usesPrefix = thousand >= least && thousand <= most && PREFIX[thousand] !== undefined;
  if (usesPrefix || (exponent >= -3 && exponent < 6 && least === 0)) {
    const shift = usesPrefix ? thousand : 0;
    const text = decimalText(rounded, shift, digits - 1 - (exponent - shift), limited);
    return `${text}${space}${usesPrefix ? PREFIX[thousand] : ""}${symbol}`;
  }
  const mantissa = decimalText(rounded, exponent, digits - 1, limited);
  return `${mantissa}×10${superscript(exponent)}${space}${symbol}`;
}

/** A coordinate for people: metres with a prefix, or degrees. */
export function siText(value: number, unit: "m" | "rad", digits = 12): string {
  return unit === "rad"
    ? formatQuantity((value / Math.PI) * 180, "degree", { digits })
    : formatQuantity(value, "metre", { digits });
}

/** A number as TeX with up to six significant digits and a power of ten where it is far from 1. */
export function texNumber(value: number, digits = 6): string {
  if (value === 0) return "0";
  const rounded = roundTo(value, digits);
  const exponent = exponentOf(rounded);
  if (exponent >= -3 && exponent < 6)
    return decimalText(rounded, 0, digits - 1 - exponent, false).replace("−", "-");
  const mantissa = decimalText(rounded, exponent, digits - 1, false).replace("−", "-");
  return mantissa === "1" ? `10^{${exponent}}` : `${mantissa}\\cdot 10^{${exponent}}`;
}

function significantDigits(value: number, options: FormatOptions): { digits: number; limited: boolean } {
  const cap = options.digits ?? 5;
  const { lower, upper } = options;
  if (lower === undefined || upper === undefined) return { digits: cap, limited: false };
  const halfWidth = Math.max(value - lower, upper - value);
  if (!(halfWidth > 0)) return { digits: cap, limited: false };
  const last = exponentOf(roundTo(halfWidth, 2)) - 1;
  const wanted = exponentOf(value) - last + 1;
  return wanted >= cap ? { digits: cap, limited: false } : { digits: Math.max(1, wanted), limited: true };
}

/** Decimal exponent of the leading digit. */
function exponentOf(value: number): number {
  const text = value.toExponential();
  return Number(text.slice(text.indexOf("e") + 1));
}

function roundTo(value: number, digits: number): number {
  return Number(value.toPrecision(Math.min(100, Math.max(1, digits))));
}

function decimalText(value: number, shift: number, decimals: number, keepZeros: boolean): string {
  // Shifting the decimal point in the text avoids a second rounding.
  const [mantissa, exponent] = value.toExponential().split("e");
  const shifted = Number(`${mantissa}e${Number(exponent) - shift}`);
  const text = shifted.toFixed(Math.min(100, Math.max(0, decimals)));
  const trimmed = keepZeros || !text.includes(".") ? text : text.replace(/\.?0+$/, "");
  return trimmed.replace("-", "−");
}

function superscript(exponent: number): string {
  return [...String(exponent)].map((c) => (c === "-" ? "⁻" : "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(c)])).join("");
}

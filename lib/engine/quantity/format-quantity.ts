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
  const cap = options.digits ?? 5;
  const limit = significantDigits(value, options);
  const { negative, digits, exponent } = roundedDigits(value, Math.min(cap, limit));
  const kept = limit < cap ? digits : digits.replace(/0+$/, "");
  const sign = negative ? "−" : "";
  const thousand = Math.floor(exponent / 3) * 3;
  if (thousand >= least && thousand <= most) {
    return `${sign}${placePoint(kept, exponent - thousand)}${space}${PREFIX[thousand]}${symbol}`;
  }
  if (exponent >= -3 && exponent < 6 && least === 0)
    return `${sign}${placePoint(kept, exponent)}${space}${symbol}`;
  return `${sign}${placePoint(kept, 0)}×10${superscript(exponent)}${space}${symbol}`;
}

/** A coordinate for people: metres with a prefix, or degrees. */
export function siText(value: number, unit: "m" | "rad", digits = 12): string {
  return unit === "rad"
    ? formatQuantity((value / Math.PI) * 180, "degree", { digits })
    : formatQuantity(value, "metre", { digits });
}

/** A number as TeX with up to six significant digits and a power of ten where it is far from 1. */
export function texNumber(value: number, most = 6): string {
  if (value === 0) return "0";
  const { negative, digits, exponent } = roundedDigits(value, most);
  const kept = digits.replace(/0+$/, "");
  const sign = negative ? "-" : "";
  if (exponent >= -3 && exponent < 6) return sign + placePoint(kept, exponent);
  const mantissa = placePoint(kept, 0);
  return mantissa === "1" ? `${sign}10^{${exponent}}` : `${sign}${mantissa}\\cdot 10^{${exponent}}`;
}

/** Digits that the bounds leave: down to the second significant digit of their half-width; at least one. */
function significantDigits(value: number, { lower, upper }: FormatOptions): number {
  if (lower === undefined || upper === undefined) return Infinity;
  const halfWidth = Math.max(value - lower, upper - value);
  // Rounded to two digits first, since 0.0996 is one of the tenths. Far below the value it does not matter.
  if (!(halfWidth > 1e-9 * Math.abs(value))) return Infinity;
  const last = roundedDigits(halfWidth, 2).exponent - 1;
  return Math.max(1, roundedDigits(value, 17).exponent - last + 1);
}

/** The value rounded to so many digits, as a row of digits and the decimal exponent of the first. */
function roundedDigits(
  value: number,
  count: number,
): { negative: boolean; digits: string; exponent: number } {
  const text = Math.abs(value).toExponential(Math.min(100, Math.max(0, count - 1)));
  const at = text.indexOf("e");
  const digits = count > 1 ? text[0] + text.slice(2, at) : text[0];
  return { negative: value < 0, digits, exponent: Number(text.slice(at + 1)) };
}

/** The digits with a decimal point so that the first stands at 10^exponent. */
function placePoint(digits: string, exponent: number): string {
  if (exponent < 0) return `0.${"0".repeat(-exponent - 1)}${digits}`;
  if (digits.length <= exponent + 1) return digits + "0".repeat(exponent + 1 - digits.length);
  return `${digits.slice(0, exponent + 1)}.${digits.slice(exponent + 1)}`;
}

function superscript(exponent: number): string {
  return [...String(exponent)].map((c) => (c === "-" ? "⁻" : "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(c)])).join("");
}

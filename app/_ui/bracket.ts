/** A bracket for people: both bounds in the unit of the value, rounded outwards, just long enough to differ. */

const PREFIXES: Readonly<Record<number, string>> = {
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

const THIN_SPACE = "\u2009";

export interface BracketText {
  readonly lower: string;
  readonly upper: string;
  /** Unit of both, with its prefix or power of ten. */
  readonly unit: string;
}

/**
 * @param value Positive; decides the prefix, as in the value's own text.
 * @param lower At most the value.
 * @param upper At least the value.
 * @param symbol Symbol of the unit, without prefix; "" for a bare number.
 */
export function bracketText(value: number, lower: number, upper: number, symbol: string): BracketText {
  const exponent = exponentOf(Number(value.toPrecision(5)));
  // A bare number takes no prefix: "220 m" would be read as metres.
  const thousand = symbol === "" && exponent >= -4 && exponent < 6 ? 0 : Math.floor(exponent / 3) * 3;
  const prefix = symbol === "" && thousand !== 0 ? undefined : PREFIXES[thousand];
  const shift = prefix === undefined ? exponent : thousand;
  const unit =
    prefix === undefined
      ? `×10${superscript(exponent)}${symbol === "" ? "" : `${THIN_SPACE}${symbol}`}`
      : `${prefix}${symbol}`;
  // Two digits of the width, and never more than a double holds.
  const width = (upper - lower) / value;
  const digits = Math.min(17, Math.max(4, 2 - Math.floor(Math.log10(width > 0 ? width : 1e-17))));
  return {
    lower: directed(lower, digits, shift, "down"),
    upper: directed(upper, digits, shift, "up"),
    unit,
  };
}

/** A positive number over 10^shift with that many significant digits, rounded in one direction. */
function directed(value: number, digits: number, shift: number, direction: "down" | "up"): string {
  if (!(value > 0) || !Number.isFinite(value)) return String(value);
  const [mantissa, power] = value.toExponential(16).split("e");
  const all = BigInt(mantissa.replace(".", ""));
  const cut = BigInt(10) ** BigInt(17 - digits);
  const kept = all / cut + (direction === "up" && all % cut > BigInt(0) ? BigInt(1) : BigInt(0));
  // kept·10^(power − digits + 1) over 10^shift.
  const decimals = digits - 1 - (Number(power) - shift);
  const text = kept.toString();
  if (decimals <= 0) return text + "0".repeat(-decimals);
  const padded = text.padStart(decimals + 1, "0");
  return `${padded.slice(0, -decimals)}.${padded.slice(-decimals)}`;
}

function exponentOf(value: number): number {
  return Number(value.toExponential().split("e")[1]);
}

function superscript(exponent: number): string {
  return [...String(exponent)].map((c) => (c === "-" ? "⁻" : "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(c)])).join("");
}

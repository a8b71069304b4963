/** Exact arithmetic on decimal texts, so that changing a unit never changes the size of what was typed. */

export interface Rational {
  readonly top: bigint;
  /** Greater than 0. */
  readonly bottom: bigint;
}

const NUMBER = /^([+-]?)(\d*)\.?(\d*)(?:[eE]([+-]?\d+))?$/;
/** Beyond these powers of ten no double exists, and the integers would grow without need. */
const FARTHEST = 400;

/** A decimal text such as "-1.72e-8"; null where it is none, or too large or small for any double. */
export function rational(text: string): Rational | null {
  const match = NUMBER.exec(text);
  if (!match) return null;
  const [, sign, whole, fraction, power] = match;
  if (whole === "" && fraction === "") return null;
  const exponent = Number(power ?? "0") - fraction.length;
  if (Math.abs(exponent) > FARTHEST || whole.length + fraction.length > FARTHEST) return null;
  const digits = BigInt(whole + fraction) * (sign === "-" ? -1n : 1n);
  return scaled(digits, exponent);
}

/** digits·10^exponent. */
export function scaled(digits: bigint, exponent: number): Rational {
  const power = 10n ** BigInt(Math.abs(exponent));
  return exponent >= 0 ? { top: digits * power, bottom: 1n } : { top: digits, bottom: power };
}

export function multiply(a: Rational, b: Rational): Rational {
  return { top: a.top * b.top, bottom: a.bottom * b.bottom };
}

/** a/b; b must not be 0. */
export function divide(a: Rational, b: Rational): Rational {
  const sign = b.top < 0n ? -1n : 1n;
  return { top: a.top * b.bottom * sign, bottom: a.bottom * b.top * sign };
}

export function add(a: Rational, b: Rational): Rational {
  return { top: a.top * b.bottom + b.top * a.bottom, bottom: a.bottom * b.bottom };
}

export function subtract(a: Rational, b: Rational): Rational {
  return add(a, { top: -b.top, bottom: b.bottom });
}

/** The number as a double. */
export function toNumber(value: Rational): number {
  return Number(decimalText(value, 20));
}

/** Decimal text with at most `digits` significant digits, exact where fewer suffice. */
export function decimalText({ top, bottom }: Rational, digits = 15): string {
  if (top === 0n) return "0";
  const negative = top < 0n;
  const size = negative ? -top : top;
  // Scale so that the quotient has `digits` digits or one more.
  let exponent = size.toString().length - bottom.toString().length - digits;
  let quotient = quotientOf(size, bottom, exponent);
  if (quotient.toString().length > digits) {
    exponent += 1;
    quotient = quotientOf(size, bottom, exponent);
  }
  const text = plainText(quotient.toString(), exponent);
  return negative ? `-${text}` : text;
}

/** size/bottom·10^−exponent, rounded to the nearest whole number. */
function quotientOf(size: bigint, bottom: bigint, exponent: number): bigint {
  const power = 10n ** BigInt(Math.abs(exponent));
  const [top, under] = exponent >= 0 ? [size, bottom * power] : [size * power, bottom];
  return (2n * top + under) / (2n * under);
}

function plainText(digits: string, exponent: number): string {
  const kept = digits.replace(/0+$/, "");
  const shift = exponent + (digits.length - kept.length);
  const leading = kept.length - 1 + shift;
  if (leading < -6 || leading > 14) {
    const mantissa = kept.length > 1 ? `${kept[0]}.${kept.slice(1)}` : kept;
    return `${mantissa}e${leading}`;
  }
  if (shift >= 0) return kept + "0".repeat(shift);
  const padded = kept.padStart(1 - shift, "0");
  return `${padded.slice(0, shift)}.${padded.slice(shift)}`;
}

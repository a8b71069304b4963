/**
 * Decimal text to double without a second rounding: "0.25 mm" is the double nearest to 0.00025, because the unit's
 * power of ten is folded into the exponent before the one conversion, and other exact ratios are applied to integers.
 */

/** sign·digits·10^exponent, as written. */
export interface Decimal {
  readonly negative: boolean;
  readonly digits: string;
  readonly exponent: number;
}

const NUMBER = /^([+-]?)(\d*)\.?(\d*)(?:[eE]([+-]?\d+))?$/;

/** Reads a plain decimal number such as "-1.72e-8"; null where the text is none. */
export function readDecimal(text: string): Decimal | null {
  const match = NUMBER.exec(text);
  if (!match) return null;
  const [, sign, whole, fraction, exponent] = match;
  if (whole === "" && fraction === "") return null;
  return {
    negative: sign === "-",
    digits: whole + fraction,
    // Beyond a million nothing changes any more, and an exponent that needs one itself could not be written out again.
    exponent: Math.max(-1e6, Math.min(1e6, Number(exponent ?? "0"))) - fraction.length,
  };
}

/** decimal·10^shift, correctly rounded; ±Infinity where it is too large. */
export function scaleByPowerOfTen(decimal: Decimal, shift: number): number {
  const size = Number(`${decimal.digits}e${decimal.exponent + shift}`);
  return decimal.negative ? -size : size;
}

/** decimal·(numerator/denominator)·10^shift + (offsetNumerator/denominator), correctly rounded. */
export function scaleByRatio(
  decimal: Decimal,
  ratio: {
    readonly numerator: bigint;
    readonly denominator: bigint;
    readonly shift: number;
    readonly offset?: bigint;
  },
): number {
  const exponent = decimal.exponent + ratio.shift;
  const size = BigInt(decimal.digits) * ratio.numerator;
  let numerator = decimal.negative ? -size : size;
  if (ratio.offset === undefined && ratio.denominator === 1n) {
    return Number(`${numerator}e${exponent}`);
  }
  // Beyond these a double has long overflowed or vanished, and the integers below would grow without need.
  if (exponent > 400) return numerator === 0n ? 0 : numerator > 0n ? Infinity : -Infinity;
  let denominator = ratio.denominator;
  if (exponent < -2000) numerator = 0n;
  else if (exponent >= 0) numerator *= 10n ** BigInt(exponent);
  else denominator *= 10n ** BigInt(-exponent);
  if (ratio.offset !== undefined) numerator += (ratio.offset * denominator) / ratio.denominator;
  return divide(numerator, denominator);
}

/** The double nearest to numerator/denominator: a long quotient with a sticky last digit, then one rounding. */
function divide(numerator: bigint, denominator: bigint): number {
  const negative = numerator < 0n;
  const size = negative ? -numerator : numerator;
  const lead = size.toString().length - denominator.toString().length;
  const shift = Math.max(0, 40 - lead);
  const scaled = size * 10n ** BigInt(shift);
  const quotient = scaled / denominator;
  const sticky = scaled % denominator === 0n ? "0" : "1";
  const value = Number(`${quotient}${sticky}e${-shift - 1}`);
  return negative ? -value : value;
}

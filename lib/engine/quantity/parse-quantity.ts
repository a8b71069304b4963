/**
 * A quantity as a caller writes it (a bare number, or a text with a unit) to a double.
 *
 * Values come back in SI, except temperatures in °C and dopant densities in 1/cm³; angles come back in radians.
 */
import { InputError } from "../failure";
import { readDecimal, scaleByPowerOfTen, scaleByRatio, type Decimal } from "./decimal";
import { QUANTITY_KINDS, type QuantityKind, type QuantityKindName } from "./quantity-kind";
import { describeUnit, readUnit, type UnitScale } from "./unit";

export type QuantityReading =
  { readonly ok: true; readonly value: number } | { readonly ok: false; readonly detail: string };

/** Special spellings a length may have, by what it measures. */
export interface QuantityOptions {
  /** "AWG 24" is a wire's diameter, "1 oz/ft^2" a foil's thickness. */
  readonly gauge?: "wire" | "foil";
}

const LONGEST_TEXT = 120;
const ABSOLUTE_ZERO_C = -273.15;
const TEXT = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)\s*(.*)$/s;
const AWG = /^(?:AWG\s*#?(\d{1,2}|0{3,4}|[1-4]\/0)|#?(\d{1,2}|0{3,4}|[1-4]\/0)\s*AWG)$/i;
const MEANT_AS_AWG = /^AWG\b|\bAWG$/i;
const FOIL = /^oz\s*\/\s*ft\s*(?:\^\s*)?2$/;
const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** How to turn a decimal in some unit into the kind's value: by a power of ten alone, by a function, or why not. */
type Conversion = number | ((decimal: Decimal) => number) | string;
/** Kept per kind and unit text, since callers repeat them. */
const conversions = new Map<QuantityKindName, Map<string, Conversion>>();
const MOST_CONVERSIONS = 500;

/** The commonest spelling, plain digits and a unit already met, goes without any normalising. */
const COMMON = /^(\d+(?:\.\d*)?) ?([A-Za-z^/%*][ -~]*)$/;

/**
 * Reads one quantity.
 * @throws InputError at `pointer` (default `#`) with what was wrong and what is allowed.
 */
export function parseQuantity(
  input: unknown,
  kind: QuantityKindName,
  options: QuantityOptions & { readonly pointer?: string } = {},
): number {
  const reading = readQuantity(input, kind, options);
  if (!reading.ok) throw new InputError([{ pointer: options.pointer ?? "#", detail: reading.detail }]);
  return reading.value;
}

/** Reads one quantity without throwing. The value is finite; its sign and size are the caller's business. */
export function readQuantity(
  input: unknown,
  name: QuantityKindName,
  options: QuantityOptions = {},
): QuantityReading {
  const kind: QuantityKind = QUANTITY_KINDS[name];
  if (typeof input === "number") {
    if (!Number.isFinite(input)) return refuse(`must be finite, but is ${describeNonFinite(input)}.`);
    return finish(kind.degrees ? degreesToRadians(input) : input, input === 0, kind);
  }
  if (typeof input !== "string") return refuse(`must be ${expected(kind)}; got ${describeType(input)}.`);
  if (input.length > LONGEST_TEXT)
    return refuse(`is longer than the ${LONGEST_TEXT} characters a quantity may have.`);
  const common = COMMON.exec(input);
  if (common) {
    const shift = conversions.get(name)?.get(common[2]);
    if (typeof shift === "number")
      return finish(Number(`${common[1]}e${shift}`), !/[1-9]/.test(common[1]), kind);
  }
  const text = normalise(input);
  if (text === "") return refuse(`is empty; give ${expected(kind)}.`);
  const match = TEXT.exec(text);
  if (!match) return readWithoutNumber(text, kind, options);
  const decimal = readDecimal(match[1]);
  // "0.00393/K" is "0.00393 1/K".
  const unit = match[2].startsWith("/") ? `1${match[2]}` : match[2];
  if (!decimal || (/^(?:[\d.,]|['_]\d)/.test(unit) && !/^1\s*\//.test(unit)))
    return refuse(misspeltNumber(text));
  let value: number;
  if (unit === "") {
    value = scaleByPowerOfTen(decimal, 0);
    if (kind.degrees) value = degreesToRadians(value);
  } else {
    const gauge = readGauge(text, unit, decimal, kind, options);
    if (gauge) return gauge;
    const conversion = conversionFor(name, kind, unit);
    if (typeof conversion === "string") return refuse(conversion);
    value = typeof conversion === "number" ? scaleByPowerOfTen(decimal, conversion) : conversion(decimal);
  }
  return finish(value, /^0*$/.test(decimal.digits), kind);
}

/** Degrees to radians so that 360 gives exactly 2π. */
export function degreesToRadians(degrees: number): number {
  return (degrees / 180) * Math.PI;
}

/** Radians to degrees so that 2π gives exactly 360. */
export function radiansToDegrees(radians: number): number {
  return (radians / Math.PI) * 180;
}

function finish(value: number, zero: boolean, kind: QuantityKind): QuantityReading {
  if (!Number.isFinite(value)) return refuse("is too large for a double (at most about 1.8e308).");
  if (value === 0 && !zero && kind.temperature !== "absolute") {
    return refuse("is too small for a double (at least about 5e-324).");
  }
  if (kind.temperature === "absolute" && value < ABSOLUTE_ZERO_C)
    return refuse("is below absolute zero (-273.15 °C).");
  return { ok: true, value: value === 0 ? 0 : value };
}

function refuse(detail: string): QuantityReading {
  return { ok: false, detail };
}

function expected(kind: QuantityKind): string {
  return `${kind.noun}, such as ${kind.examples}`;
}

function normalise(input: string): string {
  // Plain ASCII is the common case and needs no normalisation.
  if (/^[\x20-\x7e]*$/.test(input)) return spellPowerOfTen(input.trim());
  const raised = input.replace(/[⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+/g, (run) => {
    const plain = [...run].map((c) => (c === "⁻" ? "-" : c === "⁺" ? "+" : String(SUPERSCRIPTS.indexOf(c))));
    return `^${plain.join("")}`;
  });
  return spellPowerOfTen(raised.normalize("NFKC").replaceAll("−", "-").trim());
}

/** "1.72×10^-8" to "1.72e-8". */
function spellPowerOfTen(text: string): string {
  return text.replace(/^([+-]?[\d.]+)\s*[x×*·⋅]\s*10\s*(?:\^|\*\*)\s*([+-]?\d+)/, "$1e$2");
}

function readWithoutNumber(text: string, kind: QuantityKind, options: QuantityOptions): QuantityReading {
  const gauge = AWG.exec(text);
  if (gauge) return wireGauge(gauge[1] ?? gauge[2], kind, options);
  if (MEANT_AS_AWG.test(text)) {
    return refuse(
      `"${shorten(text)}" is no wire gauge: a whole number to 56, or 1/0 to 4/0, such as "AWG 24".`,
    );
  }
  if (/^[+-]?(nan|inf|infinity|∞)\b/i.test(text) || text === "∞")
    return refuse(`must be finite, but is "${text}".`);
  if (/^[+-]?\.?[,'_\d]/.test(text)) return refuse(misspeltNumber(text));
  return refuse(`has no number in front: "${shorten(text)}"; give ${expected(kind)}.`);
}

function readGauge(
  text: string,
  unit: string,
  decimal: Decimal,
  kind: QuantityKind,
  options: QuantityOptions,
): QuantityReading | null {
  const gauge = AWG.exec(text);
  if (gauge) return wireGauge(gauge[1] ?? gauge[2], kind, options);
  if (kind.noun !== "a length" || !FOIL.test(unit)) return null;
  if (options.gauge !== "foil") {
    return refuse(
      `"${shorten(text)}" is a foil's thickness (34.3 µm an ounce a square foot), which this is not.`,
    );
  }
  // IPC-6012 nominal copper: 34.3 µm for one ounce a square foot.
  return finish(scaleByRatio(decimal, { numerator: 343n, denominator: 1n, shift: -7 }), false, kind);
}

/** ASTM B258: d = 0.005 in · 92^((36 − n)/39); 1/0 to 4/0, or 0 to 0000, are n = 0 to −3. */
function wireGauge(text: string, kind: QuantityKind, options: QuantityOptions): QuantityReading {
  if (kind.noun !== "a length" || options.gauge !== "wire") {
    return refuse(`"AWG ${text}" is the diameter of a wire, which this is not; give ${expected(kind)}.`);
  }
  const zeros = text.endsWith("/0") ? Number(text[0]) : /^0+$/.test(text) ? text.length : 0;
  const number = zeros > 0 ? 1 - zeros : Number(text);
  if (number > 56) return refuse(`"AWG ${text}" is beyond the gauges 4/0 to 56.`);
  return { ok: true, value: 0.000127 * Math.pow(92, (36 - number) / 39) };
}

function misspeltNumber(text: string): string {
  if (/^[+-]?\d+(?:[,'_ ]\d{3})+(?!\d)/.test(text) || /^[+-]?\d*(?:\.\d{3})*,\d+/.test(text)) {
    return `"${shorten(text)}" has a thousands separator or a decimal comma; write digits with a decimal point, such as 1234.5.`;
  }
  return `"${shorten(text)}" does not begin with a number such as 1.5 or 1.5e-3.`;
}

function conversionFor(name: QuantityKindName, kind: QuantityKind, unit: string): Conversion {
  let known = conversions.get(name);
  if (!known) {
    known = new Map();
    conversions.set(name, known);
  }
  const found = known.get(unit);
  if (found !== undefined) return found;
  const conversion = makeConversion(kind, unit);
  // Callers' texts must not grow the table without bound.
  if (known.size >= MOST_CONVERSIONS) known.clear();
  known.set(unit, conversion);
  return conversion;
}

function makeConversion(kind: QuantityKind, unit: string): Conversion {
  const reading = readUnit(unit);
  if ("complaint" in reading) return `${reading.complaint}; give ${expected(kind)}.`;
  const { scale } = reading;
  if (
    ![kind.exponents, ...(kind.also ?? [])].some((wanted) => wanted.every((e, i) => e === scale.exponents[i]))
  ) {
    return `must be ${kind.noun}, but "${unit}" measures ${describeUnit(scale)}; give ${expected(kind)}.`;
  }
  if (kind.temperature === "absolute" && scale.offset === undefined) {
    return `must be a temperature, but "${unit}" is a difference; give ${expected(kind)}.`;
  }
  return scaling(kind, scale);
}

function scaling(kind: QuantityKind, scale: UnitScale): Conversion {
  const shift = scale.shift + (kind.shift ?? 0);
  if (kind.degrees && scale.factor === Math.PI / 180) {
    return (decimal) => degreesToRadians(scaleByPowerOfTen(decimal, shift));
  }
  const offset = kind.temperature === "absolute" && scale.offset !== 0n ? scale.offset : undefined;
  if (scale.numerator === scale.denominator && offset === undefined) {
    if (scale.factor === 1) return shift;
    return (decimal) => scaleByPowerOfTen(decimal, shift) * scale.factor;
  }
  const ratio = { numerator: scale.numerator, denominator: scale.denominator, shift, offset };
  return (decimal) => scaleByRatio(decimal, ratio) * scale.factor;
}

function shorten(text: string): string {
  return text.length > 40 ? `${text.slice(0, 40)}…` : text;
}

function describeNonFinite(value: number): string {
  return Number.isNaN(value) ? "not a number (NaN)" : "infinite (a number beyond 1.8e308 reads as infinity)";
}

function describeType(input: unknown): string {
  if (input === null) return "null";
  if (Array.isArray(input)) return "an array";
  if (typeof input === "object" && ("tolerance" in input || "plus" in input || "minus" in input)) {
    return "an object with a tolerance, which this call does not take";
  }
  if (input === undefined) return "nothing";
  return typeof input === "object" ? "an object" : `a ${typeof input}`;
}

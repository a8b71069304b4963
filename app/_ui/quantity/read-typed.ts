/**
 * What a person types or pastes into a field: "12,5 mm", "1/2 in", "1 234.5", "5½\"". The API takes decimal points only,
 * so the number is rewritten here, and never guessed at: what can be read in two ways is left as it stands.
 */
import { decimalText, divide, rational, add } from "./rational";

export type Typed =
  | { readonly kind: "empty" }
  /** `number` is a decimal with a point; `unit` is as typed, empty where there is none. */
  | { readonly kind: "quantity"; readonly number: string; readonly unit: string }
  /** A wire gauge, "AWG 24" or "4/0 AWG". */
  | { readonly kind: "gauge"; readonly text: string }
  /** No quantity, or one that can be read in two ways; passed on as it is, for the API to say what is wrong. */
  | { readonly kind: "unclear"; readonly text: string };

const GAUGE = /^(?:AWG\s*(?:\d{1,2}|[1-4]\/0)|(?:\d{1,2}|[1-4]\/0)\s*AWG)$/i;
const VULGAR: Readonly<Record<string, string>> = {
  "½": "1/2",
  "¼": "1/4",
  "¾": "3/4",
  "⅓": "1/3",
  "⅔": "2/3",
  "⅛": "1/8",
  "⅜": "3/8",
  "⅝": "5/8",
  "⅞": "7/8",
};
/** A whole number and a fraction, or a fraction alone; the divisor must not be the "1" of a unit such as 1/K. */
const FRACTION = /^([+-]?)(?:(\d+)(?:\s+|\s*-\s*))?(\d+)\s*[/⁄]\s*(\d+)(?![\d.,/])\s*(.*)$/;
const SPACE = "[ '’\\u00a0\\u2009\\u202f]";
/** Digits in groups of three, or digits with points and commas; then a power of ten; then the unit. */
const NUMBER = new RegExp(
  `^([+-]?(?:\\d{1,3}(?:${SPACE}\\d{3})+(?!\\d)(?:[.,]\\d*)?|[\\d.,]*\\d[\\d.,]*))` +
    "(?:\\s*(?:[x×*·]\\s*10\\s*\\^?\\s*|[eE])([+-]?[\\d⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+))?\\s*(.*)$",
  "s",
);
const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/**
 * @param text as typed or pasted.
 * @param decimalComma Whether the reader's language writes a decimal comma; decides "1,234".
 */
export function readTyped(text: string, decimalComma: boolean): Typed {
  const trimmed = text.replace(/[−–]/g, "-").trim();
  if (trimmed === "") return { kind: "empty" };
  if (GAUGE.test(trimmed)) return { kind: "gauge", text: trimmed };
  const unclear: Typed = { kind: "unclear", text: trimmed };
  const spelled = trimmed.replace(/\s*([½¼¾⅓⅔⅛⅜⅝⅞])/g, (_, c: string) => ` ${VULGAR[c]}`).trim();
  const fraction = FRACTION.exec(spelled);
  if (fraction) return readFraction(fraction) ?? unclear;
  const match = NUMBER.exec(spelled);
  // A second number is no unit, but for the "1" of "1/K".
  if (!match || (/^[\d.,]/.test(match[3]) && !/^1\s*\//.test(match[3]))) return unclear;
  const mantissa = decimalPoint(match[1], decimalComma);
  if (mantissa === null) return unclear;
  const number = match[2] === undefined ? mantissa : `${mantissa}e${plainDigits(match[2])}`;
  return rational(number) ? { kind: "quantity", number, unit: match[3].trim() } : unclear;
}

function readFraction([, sign, whole = "0", top, bottom, unit]: RegExpExecArray): Typed | null {
  if (/^0+$/.test(bottom)) return null;
  const parts = [whole, top, bottom].map((digits) => rational(digits));
  const [a, b, c] = parts;
  if (!a || !b || !c) return null;
  const size = decimalText(add(a, divide(b, c)), 15);
  return { kind: "quantity", number: sign === "-" ? `-${size}` : size, unit: unit.trim() };
}

function plainDigits(text: string): string {
  return [...text]
    .map((c) => (c === "⁻" ? "-" : SUPERSCRIPTS.includes(c) ? String(SUPERSCRIPTS.indexOf(c)) : c))
    .join("");
}

/** The number with a decimal point and no separators; null where it can be read in two ways. */
function decimalPoint(text: string, decimalComma: boolean): string | null {
  const commas = text.split(",").length - 1;
  const points = text.split(".").length - 1;
  const digits = text.replace(/[ '’\u00a0\u2009\u202f]/g, "");
  const grouped = digits !== text;
  if (commas === 0 && points <= 1) return digits;
  if (commas > 0 && points > 0) {
    // The mark that comes last is the decimal one; the other must group by threes.
    const comma = digits.lastIndexOf(",") > digits.lastIndexOf(".");
    const [group, mark] = comma ? [".", ","] : [",", "."];
    const [whole, fraction, ...rest] = digits.split(mark);
    if (rest.length > 0 || !threes(whole, group)) return null;
    return `${whole.replaceAll(group, "")}.${fraction}`;
  }
  if (commas > 1) return threes(digits, ",") ? digits.replaceAll(",", "") : null;
  if (points > 1) return threes(digits, ".") ? digits.replaceAll(".", "") : null;
  // One comma: a decimal mark, unless it could also be grouping and the reader's language does not settle it.
  const couldGroup = /^[+-]?[1-9]\d{0,2},\d{3}$/.test(digits) && !grouped;
  if (couldGroup && !decimalComma) return null;
  return digits.replace(",", ".");
}

function threes(text: string, group: string): boolean {
  const [first, ...rest] = text.replace(/^[+-]/, "").split(group);
  return /^\d{1,3}$/.test(first) && rest.length > 0 && rest.every((part) => /^\d{3}$/.test(part));
}

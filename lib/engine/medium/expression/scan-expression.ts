/** What can be said about an expression before it is parsed: its length, its characters, its nesting. */

export const LONGEST_EXPRESSION = 1000;
export const MOST_NODES = 200;
export const DEEPEST = 32;

const ALLOWED = /^[0-9A-Za-z_.+\-*/^(),<>=!\s]$/;
const EXPLAINED: readonly (readonly [RegExp, string])[] = [
  [/["'`]/, "texts are not allowed"],
  [/[[\]]/, "matrices and indices are not allowed"],
  [/[{}]/, "objects are not allowed"],
  [/;/, "only one expression is allowed"],
  [/[?:]/, "write if(condition, value, otherwise)"],
  [/%/, "percent and modulo are not allowed"],
  [/[&|~]/, "logical and bit operators are not allowed"],
  [/[#$@\\]/, "this character has no meaning here"],
];

/** A complaint with its place, or null. */
export function scanExpression(text: string): string | null {
  if (text.length > LONGEST_EXPRESSION) {
    return `has ${text.length} characters; at most ${LONGEST_EXPRESSION} are allowed.`;
  }
  if (text.trim() === "") return "is empty; write an expression such as 58e6/(1+3*u^2).";
  let nesting = 0;
  for (let i = 0; i < text.length; i++) {
    const character = text[i];
    if (!ALLOWED.test(character)) {
      const why =
        EXPLAINED.find(([pattern]) => pattern.test(character))?.[1] ?? "only plain arithmetic is allowed";
      return `has "${character}" at character ${i + 1}: ${why}.`;
    }
    if (character === "(" && ++nesting > DEEPEST) return tooDeep(i);
    if (character === ")") nesting--;
    const previous = text[i - 1];
    const next = text[i + 1];
    if (character === "=" && next !== "=" && !(previous !== undefined && "=<>!".includes(previous))) {
      return `has "=" at character ${i + 1}: assignments and function definitions are not allowed; compare with ==.`;
    }
    if (character === "!" && next !== "=")
      return `has "!" at character ${i + 1}: factorials are not allowed.`;
  }
  const property = /[A-Za-z_)]\s*\./.exec(
    text.replace(/\d[\d.]*(?:[eE][+-]?\d+)?/g, (number) => "0".repeat(number.length)),
  );
  if (property)
    return `has "." at character ${property.index + property[0].length}: property access is not allowed.`;
  const radix = /(?<![A-Za-z_\d.])0[xXoObB]/.exec(text);
  if (radix) return `has "${radix[0]}" at character ${radix.index + 1}: write numbers in decimal.`;
  return null;
}

/** The complaint about too deep a nesting, at a character (from 0) where it is known. */
export function tooDeep(index?: number): string {
  const where = index === undefined ? "" : ` at character ${index + 1}`;
  return `is nested more than ${DEEPEST} levels deep${where}.`;
}

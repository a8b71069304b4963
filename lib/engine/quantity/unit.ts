/** Reads a unit such as "ohm mm^2/m" into its exponents and its exact factor to SI. */
import { nearestNames } from "../shape/nearest-names";
import { BASE_NAMES, PREFIXES, UNITS, type Exponents, type Unit } from "./unit-table";

/** SI value = number·numerator/denominator·10^shift·factor, and (·) + offset/denominator for a lone temperature. */
export interface UnitScale {
  readonly exponents: Exponents;
  readonly numerator: bigint;
  readonly denominator: bigint;
  readonly shift: number;
  readonly factor: number;
  readonly offset?: bigint;
  /** "a length", where one unit of the table says it all. */
  readonly noun?: string;
}

export type UnitReading = { readonly scale: UnitScale } | { readonly complaint: string };

const ONE: UnitScale = {
  exponents: [0, 0, 0, 0, 0, 0, 0],
  numerator: 1n,
  denominator: 1n,
  shift: 0,
  factor: 1,
};

/** Every name with every prefix it may carry. */
const NAMED: ReadonlyMap<string, UnitScale> = (() => {
  const named = new Map<string, UnitScale>();
  const scaleOf = (unit: Unit, power: number): UnitScale => ({
    exponents: unit.exponents,
    numerator: unit.numerator ?? 1n,
    denominator: unit.denominator ?? 1n,
    shift: (unit.shift ?? 0) + power,
    factor: unit.factor ?? 1,
    offset: unit.offset,
    noun: unit.noun,
  });
  for (const unit of UNITS) for (const name of unit.names) named.set(name, scaleOf(unit, 0));
  for (const unit of UNITS) {
    if (!unit.prefixes) continue;
    for (const name of unit.names) {
      for (const [prefix, power] of PREFIXES) {
        // A name of the table wins over a prefixed one ("min", "ft", "cd" keep their meaning).
        if (!named.has(prefix + name)) named.set(prefix + name, scaleOf(unit, power));
      }
    }
  }
  return named;
})();

/** Names worth suggesting: the common prefixes only, so that a typo in "mm" does not bring up "Ym". */
const SUGGESTED = [...NAMED.keys()].filter(
  (name) => !/^[qryzafPEZYRQhd]/.test(name) || name.startsWith("deg"),
);

const TOKEN = /\s*(?:([A-Za-zμΩ°%□Å]+)|\^?\s*([+-]?\d+)|([*·⋅/()])|(-)(?=[A-Za-zμΩ]))/y;
const LONGEST_UNIT = 60;

/** Reads a NFKC-normalised, trimmed, non-empty unit. */
export function readUnit(text: string): UnitReading {
  if (text.length > LONGEST_UNIT) return { complaint: `the unit is longer than ${LONGEST_UNIT} characters` };
  const plain = NAMED.get(text);
  if (plain) return { scale: plain };
  const spelled = text.replace(/%\s*IACS/gi, "%IACS").replace(/Ω(?=[A-Za-z])/g, "Ω ");
  const stack: { scale: UnitScale; divide: boolean }[] = [];
  let scale = ONE;
  let divide = false;
  let last: UnitScale | null = null;
  let lastDivided = false;
  let expectsFactor = true;
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < spelled.length) {
    if (spelled.slice(TOKEN.lastIndex).trim() === "") break;
    const start = TOKEN.lastIndex;
    const match = TOKEN.exec(spelled);
    if (!match) return unreadable(text, spelled.slice(start).trim()[0]);
    const [, name, integer, sign] = match;
    if (name !== undefined) {
      const unit = NAMED.get(name);
      if (!unit) return { complaint: unknownUnit(name) };
      last = { ...unit, offset: undefined };
      lastDivided = divide;
      scale = multiply(scale, last, divide ? -1 : 1);
      divide = false;
      expectsFactor = false;
    } else if (integer !== undefined) {
      if (last) {
        const power = Number(integer);
        if (power === 0 || Math.abs(power) > 9)
          return { complaint: `the unit "${text}" has the power ${integer}` };
        scale = multiply(scale, last, (lastDivided ? -1 : 1) * (power - 1));
        last = null;
      } else if (integer === "1" && expectsFactor) {
        divide = false;
        expectsFactor = false;
      } else return unreadable(text, integer);
    } else if (sign === "(") {
      stack.push({ scale, divide });
      if (stack.length > 8) return unreadable(text, "(");
      scale = ONE;
      divide = false;
      expectsFactor = true;
      last = null;
    } else if (sign === ")") {
      const outer = stack.pop();
      if (!outer || expectsFactor) return unreadable(text, ")");
      last = scale;
      lastDivided = outer.divide;
      scale = multiply(outer.scale, scale, outer.divide ? -1 : 1);
      divide = false;
    } else {
      if (expectsFactor) return unreadable(text, sign ?? "-");
      divide = sign === "/";
      expectsFactor = true;
      last = null;
    }
  }
  if (expectsFactor || stack.length > 0) return { complaint: `the unit "${text}" is incomplete` };
  return { scale };
}

function unreadable(text: string, what: string): UnitReading {
  return { complaint: `the unit "${text}" cannot be read at "${what}"` };
}

function unknownUnit(name: string): string {
  const near = nearestNames(name, SUGGESTED);
  const hint = near.length > 0 ? ` (did you mean ${near.map((entry) => `"${entry}"`).join(" or ")}?)` : "";
  return `the unit "${name}" is not known${hint}`;
}

function multiply(a: UnitScale, b: UnitScale, power: number): UnitScale {
  const size = BigInt(Math.abs(power));
  const [top, bottom] = power >= 0 ? [b.numerator, b.denominator] : [b.denominator, b.numerator];
  return {
    exponents: a.exponents.map((exponent, i) => exponent + power * b.exponents[i]) as unknown as Exponents,
    numerator: a.numerator * top ** size,
    denominator: a.denominator * bottom ** size,
    shift: a.shift + power * b.shift,
    factor: a.factor * b.factor ** power,
  };
}

/** What the exponents measure, for complaints: the noun of a known unit, else the product of base units. */
export function describeUnit(scale: UnitScale): string {
  if (scale.noun) return scale.noun;
  const known = UNITS.find((unit) => unit.exponents.every((exponent, i) => exponent === scale.exponents[i]));
  if (known) return known.noun;
  const parts = scale.exponents.flatMap((exponent, i) =>
    exponent === 0 ? [] : [exponent === 1 ? BASE_NAMES[i] : `${BASE_NAMES[i]}^${exponent}`],
  );
  return `a quantity in ${parts.join(" ")}`;
}

/**
 * Tolerances among a page's parameters: "width.tolerance", or "width.plus" and "width.minus", and "width.distribution"
 * stand beside "width".
 */
import type { Parameters } from "./parameters";

export const DISTRIBUTIONS = [
  { value: "uniform", label: "anywhere within" },
  { value: "normal", label: "normal, 2 standard deviations" },
  { value: "triangular", label: "triangular" },
] as const;

export const UNCERTAINTY_METHODS = ["propagation", "worst-case", "monte-carlo"] as const;
export type UncertaintyMethod = (typeof UNCERTAINTY_METHODS)[number];

/** How the tolerances are evaluated: `uncertainty`, and for Monte Carlo `trials` and `seed`. */
export const UNCERTAINTY_NAMES: readonly string[] = ["uncertainty", "trials", "seed"];

/** What is looked for: a dimension, the resistance that it is to give, and where to look. */
export const SIZING_NAMES: readonly string[] = ["solveFor", "target", "from", "to"];

const MEMBERS = /\.(?:tolerance|plus|minus|distribution)$/;

/** The same without any tolerance. */
export function nominalParameters(parameters: Parameters): Parameters {
  return Object.fromEntries(Object.entries(parameters).filter(([name]) => tolerancedName(name) === name));
}

/** Whether a parameter has a tolerance. */
export function hasTolerance(parameters: Parameters, name: string): boolean {
  return ["tolerance", "plus", "minus"].some((member) => `${name}.${member}` in parameters);
}

/** The change that takes a parameter's tolerance away. */
export function noTolerance(name: string): Readonly<Record<string, undefined>> {
  return {
    [`${name}.tolerance`]: undefined,
    [`${name}.plus`]: undefined,
    [`${name}.minus`]: undefined,
    [`${name}.distribution`]: undefined,
  };
}

/** The parameter that a tolerance belongs to; the name itself where it is none. */
export function tolerancedName(name: string): string {
  return name.replace(MEMBERS, "");
}

/** A text of the page, or the object with its tolerance that the API takes. */
export type Given =
  | string
  | number
  | {
      readonly value: string;
      readonly tolerance?: string;
      readonly plus?: string;
      readonly minus?: string;
      readonly distribution?: string;
    };

/** The value of a parameter with its tolerance, where it has one. */
export function given(parameters: Parameters, name: string, text: string): Given {
  const members = (["tolerance", "plus", "minus"] as const).flatMap((member) => {
    const typed = toleranceText(parameters[`${name}.${member}`] ?? "", text);
    return typed === "" ? [] : [[member, typed] as const];
  });
  if (members.length === 0) return text;
  const distribution = parameters[`${name}.distribution`];
  return { value: text, ...Object.fromEntries(members), ...(distribution ? { distribution } : {}) };
}

const DECIMAL_COMMA = /^(\d+),(\d+)(?=[^\d,]|$)/;
const BARE = /^\d+\.?\d*(?:[eE][+-]?\d+)?$/;
const UNIT = /^[+-]?[\d.]+(?:[eE][+-]?\d+)?\s*([A-Za-zµμΩ°%].*)$/;

/** A tolerance as the API takes it: people write decimal commas, and mean the value's unit where they name none. */
export function toleranceText(typed: string, value: string): string {
  const text = typed.trim().replace(DECIMAL_COMMA, "$1.$2");
  const unit = UNIT.exec(value.trim())?.[1];
  // A bare difference of temperatures is in kelvins, which is what °C means here.
  return BARE.test(text) && unit && !/^(?:deg|°)C$/.test(unit) ? `${text} ${unit}` : text;
}

/** The member `uncertainty` of a request. */
export function uncertaintyBody(parameters: Parameters): Readonly<Record<string, unknown>> | undefined {
  const { uncertainty: method } = parameters;
  if (!method) return undefined;
  const numbers = method === "monte-carlo" ? (["trials", "seed"] as const) : [];
  const set = numbers.flatMap((name) => {
    const text = parameters[name]?.trim();
    return text ? [[name, /^\d{1,15}$/.test(text) ? Number(text) : text] as const] : [];
  });
  return { method, ...Object.fromEntries(set) };
}

/** The functions and constants that an expression may use, and nothing else. */
import { erf, erfc } from "../../numeric/error-function";

export interface ExpressionFunction {
  /** Smallest and largest number of arguments. */
  readonly least: number;
  readonly most: number;
  readonly one?: (a: number) => number;
  readonly fold?: (a: number, b: number) => number;
}

const one = (f: (a: number) => number): ExpressionFunction => ({ least: 1, most: 1, one: f });
const fold = (f: (a: number, b: number) => number): ExpressionFunction => ({ least: 1, most: 20, fold: f });

export const EXPRESSION_FUNCTIONS: ReadonlyMap<string, ExpressionFunction> = new Map([
  ["abs", one(Math.abs)],
  ["sqrt", one(Math.sqrt)],
  ["cbrt", one(Math.cbrt)],
  ["exp", one(Math.exp)],
  ["log", one(Math.log)],
  ["log10", one(Math.log10)],
  ["sin", one(Math.sin)],
  ["cos", one(Math.cos)],
  ["tan", one(Math.tan)],
  ["asin", one(Math.asin)],
  ["acos", one(Math.acos)],
  ["atan", one(Math.atan)],
  ["sinh", one(Math.sinh)],
  ["cosh", one(Math.cosh)],
  ["tanh", one(Math.tanh)],
  ["erf", one(erf)],
  ["erfc", one(erfc)],
  ["min", fold(Math.min)],
  ["max", fold(Math.max)],
  // if(c, a, b) is compiled on its own: only there a comparison may stand.
  ["if", { least: 3, most: 3 }],
]);

export const EXPRESSION_CONSTANTS: ReadonlyMap<string, number> = new Map([
  ["pi", Math.PI],
  ["e", Math.E],
]);

export type Comparison = (a: number, b: number) => boolean;

export const COMPARISONS: ReadonlyMap<string, Comparison> = new Map<string, Comparison>([
  ["<", (a, b) => a < b],
  [">", (a, b) => a > b],
  ["<=", (a, b) => a <= b],
  [">=", (a, b) => a >= b],
  ["==", (a, b) => a === b],
  ["!=", (a, b) => a !== b],
]);

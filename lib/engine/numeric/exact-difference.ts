/** Differences of sizes that nearly cancel. */
import { CompensatedSum } from "./compensated-sum";

/**
 * first − rest₁ − rest₂ − …, with one rounding in all: what remains of a spacing after two radii keeps every digit that
 * the numbers given have.
 */
export function exactDifference(first: number, ...rest: readonly number[]): number {
  const sum = new CompensatedSum();
  sum.add(first);
  for (const part of rest) sum.add(-part);
  return sum.value;
}

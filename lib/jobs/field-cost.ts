/** What a field solution counts against the month, by its unknowns. The docs show this very table. */
export const FIELD_COSTS = [
  { upToUnknowns: 20_000, computations: 1 },
  { upToUnknowns: 100_000, computations: 5 },
  { upToUnknowns: 500_000, computations: 20 },
] as const;

/** Most unknowns that a solution may have. */
export const MOST_UNKNOWNS = FIELD_COSTS[FIELD_COSTS.length - 1].upToUnknowns;

/** Most unknowns of a solution that a page asks for while nobody is signed in. */
export const SIGNED_OUT_UNKNOWNS = FIELD_COSTS[0].upToUnknowns;

/** The most that a solution can cost: reserved before it starts, the rest given back at its end. */
export const MOST_COMPUTATIONS = FIELD_COSTS[FIELD_COSTS.length - 1].computations;

/** Computations of a solution with that many unknowns. */
export function fieldCost(unknowns: number): number {
  return FIELD_COSTS.find(({ upToUnknowns }) => unknowns <= upToUnknowns)?.computations ?? MOST_COMPUTATIONS;
}

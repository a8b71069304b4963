import "server-only";
import { type OutlinePlan, outlinePlan } from "@/app/_ui/drawing/outline-plan";
import type { CleanedOutline } from "@/lib/engine";

/** A stored outline as the builder shows it. */
export interface OutlineChoice {
  readonly id: string;
  /** Empty where it was stored without one. */
  readonly name: string;
  readonly plan: OutlinePlan;
  readonly axisymmetric: boolean;
}

/** A sheet of a size at which the names of the terminals can be read in a narrow place. */
export const PLAN_SHEET = { width: 300, tallest: 220, margin: 14 };

export function outlineChoice(id: string, { name, outline, terminals }: CleanedOutline): OutlineChoice {
  return {
    id,
    name,
    plan: outlinePlan(outline, terminals, PLAN_SHEET),
    axisymmetric: outline.symmetry === "axisymmetric",
  };
}

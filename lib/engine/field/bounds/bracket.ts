/**
 * The bracket of a resistance between two terminals from the energies of one discrete solution.
 *
 * Dirichlet: any V with the right terminal values has ∫σ|∇V|² ≥ G. Thomson: any ψ with current I has
 * ∫ρ|rot ψ|² ≥ I²·R. So 1/Gh ≤ R ≤ E/I², whatever the residual of the linear systems; all that is left is to round
 * outwards.
 */

import type { CurrentForm } from "../assembly/stream";
import type { LinearSystem } from "../solve/system";
import type { DiscreteField } from "../solve/pair";
import { ROUNDING, down, up, type Approximate } from "./interval";

export interface Bracket {
  readonly lower: number;
  readonly upper: number;
}

/**
 * A bracket the right way round. Where it rests on estimated integrals its sides can change places; they are then off by
 * at least their distance, and are moved apart by as much again.
 */
export function ordered({ lower, upper }: Bracket): Bracket {
  if (!(lower > upper)) return { lower, upper };
  const off = lower - upper;
  return { lower: upper - off, upper: lower + off };
}

/** The current of a stream function out of a terminal, and its rounding error. */
export function currentOf(system: LinearSystem, field: DiscreteField, form: CurrentForm): Approximate {
  let value = 0;
  let magnitude = 0;
  for (let k = 0; k < form.entity.length; k++) {
    const term = form.coefficient[k] * field.x[system.structure.entityFirst[form.entity[k]]];
    value += term;
    magnitude += Math.abs(term);
  }
  return { value, error: form.entity.length > 1 ? form.entity.length * 2 * ROUNDING * magnitude : 0 };
}

/** 1/(G rounded up). */
export function lowerBound(energy: Approximate): number {
  return down(1 / up(energy.value + energy.error));
}

/** E/I² rounded up. */
export function upperBound(energy: Approximate, current: Approximate): number {
  const least = down(Math.abs(current.value) - current.error);
  if (!(least > 0)) return Infinity;
  return up(up(energy.value + energy.error) / down(least * least));
}

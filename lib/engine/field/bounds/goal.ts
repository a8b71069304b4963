/**
 * What is wanted of a solution and how near it has come: the resistance between two terminals, or the conductance
 * matrix and all pairs of three and more. The best bounds of all steps are kept, so both sides are monotone; where
 * they rest on estimated integrals only the last ones count, since they rest on the best estimates.
 */

import type { SolvedPair } from "../solve/pair";
import { currentOf, lowerBound, ordered, upperBound, type Bracket } from "./bracket";
import type { FieldEnergies } from "./energies";
import { PowerBounds, terminalBounds, type TerminalBounds, type TerminalPair } from "./terminals";

/** Couplings weaker than this part of √(G_aa·G_bb) do not hold the refinement up. */
const WEAKEST_COUPLING = 1e-4;

export interface ReachedBounds {
  /** The resistance between two terminals; between the first two, others floating, if there are more. */
  readonly resistance: Bracket;
  /** Only for three terminals and more. */
  readonly terminals: TerminalBounds | null;
}

export class Goal {
  private resistance: Bracket = { lower: 0, upper: Infinity };
  private terminals: TerminalBounds | null = null;

  /** Takes in the bounds of one more solution. */
  update(pair: SolvedPair, energies: FieldEnergies): void {
    const merge = pair.potentialSystem.sampled ? latest : tighter;
    if (pair.currents.length === 2) {
      const current = currentOf(pair.streamSystem, pair.streams[0], pair.currents[0]);
      this.resistance = merge(this.resistance, {
        lower: lowerBound(energies.potential[0]),
        upper: upperBound(energies.stream[0], current),
      });
      return;
    }
    const power = new PowerBounds(pair, energies);
    const fresh = terminalBounds(power, power);
    this.terminals = mergeTerminals(this.terminals ?? fresh, fresh, merge);
    this.resistance = this.terminals.pairs[0].floating;
  }

  get reached(): ReachedBounds {
    return { resistance: this.resistance, terminals: this.terminals };
  }
}

/** The largest relative width of all that is wanted. */
export function widthOf({ resistance, terminals }: ReachedBounds): number {
  if (!terminals) return relativeWidth(resistance);
  const { conductance, pairs } = terminals;
  const n = Math.round(Math.sqrt(conductance.length));
  let worst = 0;
  for (const { floating, between } of pairs) {
    worst = Math.max(worst, relativeWidth(floating));
    const [a, b] = between;
    const entry = conductance[a * n + b];
    const scale = Math.sqrt(conductance[a * n + a].lower * conductance[b * n + b].lower);
    const size = Math.max(Math.min(-entry.upper, -entry.lower), WEAKEST_COUPLING * scale);
    worst = Math.max(worst, (entry.upper - entry.lower) / size);
  }
  for (let a = 0; a < n; a++) worst = Math.max(worst, relativeWidth(conductance[a * n + a]));
  return worst;
}

function relativeWidth({ lower, upper }: Bracket): number {
  return lower > 0 ? (upper - lower) / lower : Infinity;
}

function tighter(a: Bracket, b: Bracket): Bracket {
  return { lower: Math.max(a.lower, b.lower), upper: Math.min(a.upper, b.upper) };
}

function latest(_: Bracket, fresh: Bracket): Bracket {
  return ordered(fresh);
}

function mergeTerminals(
  a: TerminalBounds,
  b: TerminalBounds,
  merge: (known: Bracket, fresh: Bracket) => Bracket,
): TerminalBounds {
  return {
    conductance: a.conductance.map((entry, i) => merge(entry, b.conductance[i])),
    pairs: a.pairs.map((pair: TerminalPair, i) => ({
      between: pair.between,
      floating: merge(pair.floating, b.pairs[i].floating),
      grounded: merge(pair.grounded, b.pairs[i].grounded),
    })),
  };
}

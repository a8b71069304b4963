/**
 * Outlines with arcs, by monotonicity (Rayleigh): one polygon whose resistance is no more than that of the outline and
 * one whose resistance is no less are solved, and the bracket is taken from the lower bound of the first and the upper
 * bound of the second. The chords are made so fine that what they add to the bracket is a part of the accuracy.
 */

import { buildDomain, type Role } from "../outline/build-domain";
import type { CheckedOutline } from "../outline/check-outline";
import type { AdaptiveLimits, AdaptiveProgress, AdaptiveResult } from "./adaptive";
import { ordered, type Bracket } from "./bracket";
import type { MediumList } from "../assembly/medium";
import { InterruptedError } from "../solve/interruption";
import { solveDomain } from "./domain-run";
import { widthOf, type ReachedBounds } from "./goal";
import { PowerBounds, terminalBounds } from "./terminals";

export interface CurvedRun {
  readonly outline: CheckedOutline;
  readonly medium: MediumList;
  readonly terminalCount: number;
  readonly accuracy: number;
  readonly limits: AdaptiveLimits;
  readonly onProgress?: (progress: AdaptiveProgress) => void;
}

/** Sagitta of the trial chords, in units of the domain. */
const TRIAL_CHORDS = 1e-3;
const FINEST_CHORDS = 1e-11;

/** Accuracy that suffices to see what the trial chords do. */
const TRIAL_ACCURACY = 3e-4;

/** Shares of the accuracy for the chords and for the solution of each polygon. */
const SHARE_OF_CHORDS = 0.35;
const SHARE_OF_SOLUTION = 0.55;

/** Attempts to find chords that are fine enough. */
const ATTEMPTS = 4;

/** Unknowns a triangle that leave room for orders up to four, where chords have to be made coarser for a cap. */
const UNKNOWNS_A_TRIANGLE = 6;

export function solveCurved(run: CurvedRun): AdaptiveResult {
  const best = new CurvedBounds();
  let chords = TRIAL_CHORDS;
  let accuracy = Math.max(run.accuracy * SHARE_OF_SOLUTION, TRIAL_ACCURACY);
  let last: AdaptiveResult | null = null;
  /** What chords add to the bracket, by their sagitta. */
  let effect = 0;
  let coarser = false;
  for (let attempt = 0; ; attempt++) {
    const both = solveRoles(run, chords, accuracy, best, last);
    // Stopped on the way: the bracket of the attempt before stands.
    if ("stopped" in both) return { ...both.stopped, status: "limited", limit: "stopped" };
    const { low, high } = both;
    const bounds = best.combine(low, high);
    const larger = low.unknowns > high.unknowns ? low : high;
    const { unknowns, triangles, refinements } = larger;
    const narrower: ReachedBounds = last && widthOf(last.bounds) < widthOf(bounds) ? last.bounds : bounds;
    const result: AdaptiveResult = { ...high, bounds: narrower, unknowns, triangles, refinements };
    last = result;
    if (widthOf(bounds) <= run.accuracy) return { ...result, status: "done", limit: "none" };
    const limited = low.status === "limited" ? low : high;
    if (coarser) return { ...result, status: "limited", limit: "unknowns" };
    if (limited.limit === "unknowns" && effect > 0) {
      // So fine chords leave no unknowns for the field between them; triangles go with one over the root of the sagitta.
      const roomy = chords * ((UNKNOWNS_A_TRIANGLE * triangles) / run.limits.unknowns) ** 2;
      if (roomy > 2 * chords && !run.limits.shouldStop()) {
        coarser = true;
        chords = Math.min(roomy, TRIAL_CHORDS);
        accuracy = SHARE_OF_SOLUTION * Math.max(run.accuracy, effect * chords);
        continue;
      }
    }
    if (limited.status === "limited") return { ...result, status: "limited", limit: limited.limit };
    if (run.limits.shouldStop()) return { ...result, status: "limited", limit: "stopped" };
    if (attempt === ATTEMPTS || chords <= FINEST_CHORDS)
      return { ...result, status: "limited", limit: "rounding" };
    // What the chords themselves do, as well as the brackets tell; it is proportional to their sagitta.
    const own = relativeDistance(low.bounds.resistance, high.bounds.resistance);
    effect = own / chords;
    accuracy = run.accuracy * SHARE_OF_SOLUTION;
    chords = Math.max(FINEST_CHORDS, chords * Math.min(1, (SHARE_OF_CHORDS * run.accuracy) / own));
  }
}

interface BothRoles {
  readonly low: AdaptiveResult;
  readonly high: AdaptiveResult;
}

/** Both polygons, or the earlier result to fall back on if the work was stopped within. */
function solveRoles(
  run: CurvedRun,
  chords: number,
  accuracy: number,
  best: CurvedBounds,
  last: AdaptiveResult | null,
): BothRoles | { readonly stopped: AdaptiveResult } {
  try {
    return {
      low: solveRole(run, "lower", chords, accuracy, best),
      high: solveRole(run, "upper", chords, accuracy, best),
    };
  } catch (error) {
    if (error instanceof InterruptedError && last) return { stopped: last };
    throw error;
  }
}

/** The least distance of the chords' effect that the brackets allow, or half the width if they overlap. */
function relativeDistance(low: Bracket, high: Bracket): number {
  const middle = (high.lower + high.upper - low.lower - low.upper) / 2;
  const blur = (high.upper - high.lower + low.upper - low.lower) / 2;
  return Math.max(middle, 0.25 * blur) / low.lower;
}

function solveRole(
  run: CurvedRun,
  role: Role,
  chords: number,
  accuracy: number,
  best: CurvedBounds,
): AdaptiveResult {
  const { outline, medium, terminalCount, limits } = run;
  const onProgress = (progress: AdaptiveProgress): void => {
    best.narrow(role, progress);
    // Until both polygons have been solved once there is only one side.
    if (best.bracket.lower > 0 && best.bracket.upper < Infinity)
      run.onProgress?.({ ...progress, ...best.bracket });
  };
  const domain = buildDomain(outline, role, chords);
  return solveDomain({ domain, medium, terminalCount, accuracy, limits, onProgress });
}

/** The best bounds so far: lower ones from domains of lower resistance, upper ones from those of higher. */
class CurvedBounds {
  private lower = 0;
  private upper = Infinity;

  narrow(role: Role, bracket: Bracket): void {
    if (role === "lower") this.lower = Math.max(this.lower, bracket.lower);
    else this.upper = Math.min(this.upper, bracket.upper);
  }

  get bracket(): Bracket {
    return ordered({ lower: this.lower, upper: this.upper });
  }

  combine(low: AdaptiveResult, high: AdaptiveResult): ReachedBounds {
    if (low.bounds.terminals === null) return { resistance: this.bracket, terminals: null };
    const terminals = terminalBounds(
      new PowerBounds(low.pair, low.energies),
      new PowerBounds(high.pair, high.energies),
    );
    return { resistance: terminals.pairs[0].floating, terminals };
  }
}

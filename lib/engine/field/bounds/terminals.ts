/**
 * Bounds for any number of terminals.
 *
 * For potentials φ on the terminals let Q(φ) = φᵀGφ be the power. A discrete potential bounds it from above by φᵀGhφ, a
 * discrete stream function with currents I and energy E from below by (φ·I)²/E. Everything else is derived from such
 * bounds of Q: the entries of G by polarisation, and the resistance between two terminals with the others floating as
 * 1/min Q (potentials may be any that differ by one volt) and as the least energy for one ampere.
 */

import type { CurrentForm } from "../assembly/stream";
import type { SolvedPair } from "../solve/pair";
import { currentOf, type Bracket } from "./bracket";
import type { FieldEnergies } from "./energies";
import { ROUNDING, down, up, type Approximate } from "./interval";

export interface TerminalPair {
  readonly between: readonly [number, number];
  /** Resistance with all other terminals carrying no current. */
  readonly floating: Bracket;
  /** -1/G_ab: volts on a for one ampere out of b while b and all other terminals are at zero. */
  readonly grounded: Bracket;
}

export interface TerminalBounds {
  /** Conductance matrix, row-major: current into terminal a for one volt on b, the others at zero. */
  readonly conductance: readonly Bracket[];
  readonly pairs: readonly TerminalPair[];
}

/**
 * Bounds of all entries and pairs, in units of 1/(σ·squares). The two solutions may be of different domains: the first
 * of one whose power is nowhere less than that of the outline, the second of one whose power is nowhere more.
 */
export function terminalBounds(above: PowerBounds, below: PowerBounds): TerminalBounds {
  const n = above.terminals;
  const forms = new TerminalForms(above, below);
  const diagonal = Array.from({ length: n }, (_, a) => forms.power(unit(n, a)));
  const conductance = new Array<Bracket>(n * n);
  const pairs: TerminalPair[] = [];
  for (let a = 0; a < n; a++) {
    conductance[a * n + a] = diagonal[a];
    for (let b = a + 1; b < n; b++) {
      const entry = forms.entry(a, b, diagonal[a], diagonal[b]);
      conductance[a * n + b] = entry;
      conductance[b * n + a] = entry;
      const grounded: Bracket = {
        lower: entry.lower < 0 ? down(-1 / entry.lower) : 0,
        upper: entry.upper < 0 ? up(-1 / entry.upper) : Infinity,
      };
      const floating = { lower: above.floatingLower(a, b), upper: below.floatingUpper(a, b) };
      pairs.push({ between: [a, b], floating, grounded });
    }
  }
  return { conductance, pairs };
}

function unit(n: number, a: number): number[] {
  return Array.from({ length: n }, (_, b) => (a === b ? 1 : 0));
}

/** Both sides of the power, and the entries of the conductance matrix. */
class TerminalForms {
  constructor(
    private readonly above: PowerBounds,
    private readonly below: PowerBounds,
  ) {}

  power(phi: readonly number[]): Bracket {
    return { lower: this.below.powerLower(phi), upper: this.above.powerUpper(phi) };
  }

  entry(a: number, b: number, powerA: Bracket, powerB: Bracket): Bracket {
    const n = this.above.terminals;
    const widthA = Math.max(powerA.upper - powerA.lower, Number.MIN_VALUE);
    const widthB = Math.max(powerB.upper - powerB.lower, Number.MIN_VALUE);
    // The scale makes the width √(Δaa Δbb); a power of two keeps the potentials exact.
    const t = 2 ** Math.max(-25, Math.min(25, Math.round(Math.log2(widthB / widthA) / 4)));
    const phi = (sign: number): number[] => {
      const list = new Array<number>(n).fill(0);
      list[a] = t;
      list[b] = sign / t;
      return list;
    };
    const sum = this.power(phi(1));
    const difference = this.power(phi(-1));
    return {
      lower: down(sum.lower - difference.upper) / 4,
      upper: up(sum.upper - difference.lower) / 4,
    };
  }
}

/** Bounds of the power Q(φ) from one solution. The last terminal is the reference: only differences count. */
export class PowerBounds {
  readonly terminals: number;
  private readonly fields: number;
  private readonly potential: readonly Approximate[];
  private readonly stream: readonly Approximate[];
  /** Current out of terminal b in stream field a: [b * fields + a]. */
  private readonly current: readonly Approximate[];

  constructor(pair: SolvedPair, energies: FieldEnergies) {
    this.fields = pair.potentials.length;
    this.terminals = this.fields + 1;
    this.potential = energies.potential;
    this.stream = energies.stream;
    this.current = pair.currents
      .slice(0, this.fields)
      .flatMap((form: CurrentForm) => pair.streams.map((field) => currentOf(pair.streamSystem, field, form)));
  }

  powerUpper(phi: readonly number[]): number {
    const high = quadratic(this.potential, this.reduce(phi));
    return up(high.value + high.error);
  }

  powerLower(phi: readonly number[]): number {
    const reduced = this.reduce(phi);
    const energy = quadratic(this.stream, reduced);
    let work = 0;
    let workError = 0;
    for (let b = 0; b < this.fields; b++) {
      for (let a = 0; a < this.fields; a++) {
        const { value, error } = this.current[b * this.fields + a];
        const size = Math.abs(reduced[a] * reduced[b]);
        work += reduced[a] * reduced[b] * value;
        workError += size * (error + (this.fields ** 2 + 4) * 2 * ROUNDING * Math.abs(value));
      }
    }
    const least = Math.max(0, down(work - workError));
    // Potentials that are all the same spend nothing; then both energies are zero.
    return least > 0 ? down(down(least * least) / up(energy.value + energy.error)) : 0;
  }

  private reduce(phi: readonly number[]): number[] {
    return phi.slice(0, this.fields).map((value) => value - phi[this.fields]);
  }

  /**
   * Potentials of all terminals but the last (zero) at which one ampere passes from a to b and none elsewhere, in the
   * discrete solution; null if they cannot be found.
   */
  floatingPotentials(a: number, b: number): number[] | null {
    const current = Array.from({ length: this.fields }, (_, i) => (i === a ? 1 : i === b ? -1 : 0));
    return solveDense(
      this.potential.map((g) => g.value),
      current,
    );
  }

  /** (φa-φb)²/Q for the discrete potentials at which the other terminals carry no current. */
  floatingLower(a: number, b: number): number {
    const m = this.fields;
    const phi = this.floatingPotentials(a, b);
    if (!phi) return 0;
    const high = quadratic(this.potential, phi);
    const drop = Math.abs((a < m ? phi[a] : 0) - (b < m ? phi[b] : 0));
    const least = down(down(drop) ** 2);
    return Math.max(0, down(down(least) / up(high.value + high.error)));
  }

  /**
   * Energy of stream functions with current one from a to b. The combination found in floating point has the currents
   * d - r with a tiny remainder r; √E is a norm of the currents, so √E(d) ≤ √E(d-r) + Σ|r_t|·√E(unit current of t).
   */
  floatingUpper(a: number, b: number): number {
    const m = this.fields;
    const found = this.forCurrents(Array.from({ length: m }, (_, i) => (i === a ? 1 : i === b ? -1 : 0)));
    if (!found) return Infinity;
    let largest = 0;
    let remainder = 0;
    for (let t = 0; t < m; t++) {
      const one = this.forCurrents(unit(m, t));
      if (!one || !(one.remainder < 0.5)) return Infinity;
      // For each t, √E_t ≤ √E(found) + remainder·max√E: solved for the maximum.
      largest = Math.max(largest, one.root / (1 - one.remainder));
      remainder = Math.max(remainder, one.remainder);
    }
    const root = up(found.root + found.remainder * (largest / (1 - remainder)));
    return up(up(root * root));
  }

  /** A combination of the stream fields with (nearly) the given currents: √E and the sum of the remainders. */
  private forCurrents(target: readonly number[]): { root: number; remainder: number } | null {
    const m = this.fields;
    const y = solveDense(
      this.current.map((c) => c.value),
      target,
    );
    if (!y) return null;
    let remainder = 0;
    for (let t = 0; t < m; t++) {
      let sum = target[t];
      let error = Math.abs(target[t]);
      for (let k = 0; k < m; k++) {
        const c = this.current[t * m + k];
        sum -= c.value * y[k];
        error += Math.abs(c.value * y[k]) + (c.error * Math.abs(y[k])) / (4 * ROUNDING * (m + 2));
      }
      remainder += Math.abs(sum) + 4 * ROUNDING * (m + 2) * error;
    }
    const energy = quadratic(this.stream, y);
    return { root: up(Math.sqrt(Math.max(0, up(energy.value + energy.error)))), remainder: up(remainder) };
  }
}

function quadratic(matrix: readonly Approximate[], x: readonly number[]): Approximate {
  const m = x.length;
  let value = 0;
  let error = 0;
  for (let a = 0; a < m; a++) {
    for (let b = 0; b < m; b++) {
      const entry = matrix[a * m + b];
      const size = Math.abs(x[a] * x[b]);
      value += x[a] * x[b] * entry.value;
      error += size * (entry.error + (m * m + 4) * 2 * ROUNDING * Math.abs(entry.value));
    }
  }
  return { value, error };
}

/** Gaussian elimination with partial pivoting; null if the matrix is singular. */
function solveDense(matrix: readonly number[], rhs: readonly number[]): number[] | null {
  const n = rhs.length;
  const a = Array.from(matrix);
  const x = Array.from(rhs);
  for (let k = 0; k < n; k++) {
    let pivot = k;
    for (let i = k + 1; i < n; i++) if (Math.abs(a[i * n + k]) > Math.abs(a[pivot * n + k])) pivot = i;
    if (!(Math.abs(a[pivot * n + k]) > 0)) return null;
    if (pivot !== k) {
      for (let j = 0; j < n; j++) [a[k * n + j], a[pivot * n + j]] = [a[pivot * n + j], a[k * n + j]];
      [x[k], x[pivot]] = [x[pivot], x[k]];
    }
    for (let i = k + 1; i < n; i++) {
      const f = a[i * n + k] / a[k * n + k];
      if (f === 0) continue;
      for (let j = k; j < n; j++) a[i * n + j] -= f * a[k * n + j];
      x[i] -= f * x[k];
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    for (let j = k + 1; j < n; j++) x[k] -= a[k * n + j] * x[j];
    x[k] /= a[k * n + k];
  }
  return x.every(Number.isFinite) ? x : null;
}

/**
 * Field solution on an outline: a resistance with a two-sided bracket (3-engine, "Field solution on an outline").
 *
 * Two independent solutions on the same mesh, the potential and the stream function, bound the resistance from below
 * and above by Dirichlet's and Thomson's principles, whatever the mesh and however exactly the linear systems were
 * solved. The mesh is refined where the two differ until the bracket is as narrow as asked, or a cap is met.
 */

import { ConductivityError, type MediumList } from "./assembly/medium";
import type { AdaptiveProgress, AdaptiveResult } from "./bounds/adaptive";
import type { Bracket } from "./bounds/bracket";
import { solveCurved } from "./bounds/curved";
import { solveDomain } from "./bounds/domain-run";
import { down, up } from "./bounds/interval";
import { PowerBounds } from "./bounds/terminals";
import { fieldChecks, type FieldCheck } from "./checks";
import { buildDomain } from "./outline/build-domain";
import type { CheckedOutline } from "./outline/check-outline";
import type { Frame } from "./outline/frame";
import { partChordCorners } from "./picture/chord-corners";
import { makeFieldMap, type FieldMap } from "./picture/field-map";

/**
 * Conductance of the sheet in siemens per square (plan) or conductivity in S/m (axisymmetric): a number, or a function
 * of x and y in metres.
 */
export type SheetConductance = number | ((xM: number, yM: number) => number);

export interface FieldProblem {
  readonly outline: CheckedOutline;
  /** The background first, then the outline's regions in their order. */
  readonly conductance: readonly SheetConductance[];
}

export interface FieldOptions {
  /** (upper - lower)/value that is wanted, 1e-10 … 0.5. */
  readonly accuracy: number;
  /** Most unknowns of one of the two problems; default 500,000. */
  readonly maximumUnknowns?: number;
  /** Most refinements; default 40. */
  readonly maximumRefinements?: number;
  /** Asked between steps and within long ones; true ends the work with the bracket reached. */
  readonly shouldStop?: () => boolean;
  readonly onProgress?: (progress: FieldProgress) => void;
}

/** The state of the work; the resistances are in ohms and only ever come closer to each other. */
export interface FieldProgress {
  readonly lower: number;
  readonly upper: number;
  readonly unknowns: number;
  readonly refinements: number;
}

export interface BoundedValue extends Bracket {
  readonly value: number;
}

export interface FieldPair {
  readonly between: readonly [number, number];
  readonly floating: BoundedValue;
  /** Upper bound and value are Infinity where the coupling could not be told from none. */
  readonly grounded: BoundedValue;
}

export interface FieldSolution {
  readonly status: "done" | "limited";
  readonly limit: AdaptiveResult["limit"];
  /** Resistance between two terminals, in ohms; null for three and more. */
  readonly resistance: BoundedValue | null;
  /** The same in squares, for two terminals on a uniform sheet. */
  readonly squares: BoundedValue | null;
  /** Conductance matrix in siemens, row by row, others at zero; for three terminals and more. */
  readonly conductance: ReadonlyArray<readonly BoundedValue[]> | null;
  readonly pairs: readonly FieldPair[] | null;
  readonly boundsBasis: "energy" | "energy-quadrature";
  readonly proved: boolean;
  /** Unknowns of one problem, interior functions included. */
  readonly unknowns: number;
  readonly triangles: number;
  readonly refinements: number;
  readonly checks: readonly FieldCheck[];
  readonly map: FieldMap;
}

/** Raised where a conductance is not a positive number; the place in metres, NaN for a medium given as a number. */
export class FieldMediumError extends Error {
  override readonly name = "FieldMediumError";
  constructor(
    readonly xM: number,
    readonly yM: number,
    readonly value: number,
  ) {
    const place = Number.isNaN(xM) ? "" : ` at x = ${xM} m, y = ${yM} m`;
    super(`The conductance is ${value}${place}; it must be a positive number.`);
  }
}

const DEFAULT_UNKNOWNS = 500_000;
const DEFAULT_REFINEMENTS = 40;

export { InterruptedError } from "./solve/interruption";

/**
 * Solves a checked outline. Throws `FieldMediumError` if a conductance is not a positive number, and `InterruptedError`
 * if it is stopped before there is any bracket.
 */
export function solveField(problem: FieldProblem, options: FieldOptions): FieldSolution {
  const { outline } = problem;
  const medium = scaleMedium(problem);
  const terminalCount = outline.terminalNames.length;
  const limits = {
    unknowns: options.maximumUnknowns ?? DEFAULT_UNKNOWNS,
    refinements: options.maximumRefinements ?? DEFAULT_REFINEMENTS,
    shouldStop: options.shouldStop ?? (() => false),
  };
  const onProgress = (progress: AdaptiveProgress): void => {
    const { lower, upper, unknowns, refinements } = progress;
    const ohms = inOhms({ lower, upper }, medium.unit);
    options.onProgress?.({ lower: ohms.lower, upper: ohms.upper, unknowns, refinements });
  };
  const run = { medium: medium.list, terminalCount, accuracy: options.accuracy, limits, onProgress };
  try {
    const result = outline.curved
      ? solveCurved({ ...run, outline })
      : solveDomain({ ...run, domain: buildDomain(outline, "nominal") });
    return presentSolution(problem, medium, result);
  } catch (error) {
    if (!(error instanceof ConductivityError)) throw error;
    const [xM, yM] = toMetres(outline.frame, error.x, error.y);
    throw new FieldMediumError(xM, yM, error.value * medium.unit);
  }
}

interface ScaledMedium {
  /** Conductances relative to `unit`, in the domain's coordinates. */
  readonly list: MediumList;
  /** Siemens per square (plan) of conductance 1; resistances are divided by it. */
  readonly unit: number;
  readonly uniform: boolean;
}

/** Brings the conductances to a size near one; by a power of two, so that nothing is rounded, or exactly if uniform. */
function scaleMedium({ outline, conductance }: FieldProblem): ScaledMedium {
  const { frame, axisymmetric } = outline;
  // The resistance of a body goes with 1/length, that of a sheet does not depend on it.
  const length = axisymmetric ? frame.unitM : 1;
  const [first] = conductance;
  for (const c of conductance) {
    if (typeof c === "number" && !(c > 0 && c < Infinity)) throw new FieldMediumError(NaN, NaN, c);
  }
  if (conductance.length === 1 && typeof first === "number") {
    return { list: revolved([1], axisymmetric), unit: first * length, uniform: true };
  }
  const sizes = conductance.map((c) => {
    if (typeof c === "number") return c;
    const [x, y] = outline.rings[0].xy;
    return c(...toMetres(frame, x, y));
  });
  const logarithms = sizes.filter((size) => size > 0 && size < Infinity).map(Math.log2);
  const unit = 2 ** Math.round(logarithms.reduce((a, b) => a + b, 0) / Math.max(1, logarithms.length));
  const list: MediumList = conductance.map((c) => {
    if (typeof c === "number") return c / unit;
    return (x: number, y: number) => c(...toMetres(frame, x, y)) / unit;
  });
  return { list: revolved(list, axisymmetric), unit: unit * length, uniform: false };
}

/** The half section of a body of revolution is a sheet of conductance 2πr·σ. */
function revolved(list: MediumList, axisymmetric: boolean): MediumList {
  if (!axisymmetric) return list;
  return list.map((m) =>
    typeof m === "number"
      ? (x: number) => 2 * Math.PI * x * m
      : (x: number, y: number) => 2 * Math.PI * x * m(x, y),
  );
}

function toMetres(frame: Frame, x: number, y: number): [number, number] {
  const perUnit = frame.unitM / frame.scale;
  return [(x * frame.scale + frame.originX) * perUnit, (y * frame.scale + frame.originY) * perUnit];
}

function inOhms({ lower, upper }: Bracket, unit: number): BoundedValue {
  return bounded({ lower: down(lower / unit), upper: up(upper / unit) });
}

function inSiemens({ lower, upper }: Bracket, unit: number): BoundedValue {
  return bounded({ lower: down(lower * unit), upper: up(upper * unit) });
}

function bounded({ lower, upper }: Bracket): BoundedValue {
  return { lower, upper, value: lower + (upper - lower) / 2 };
}

function presentSolution(
  { outline, conductance }: FieldProblem,
  medium: ScaledMedium,
  result: AdaptiveResult,
): FieldSolution {
  const { bounds, pair, energies } = result;
  const { frame, axisymmetric } = outline;
  const { unit } = medium;
  const proved = !axisymmetric && conductance.every((c) => typeof c === "number");
  const { terminals } = bounds;
  const count = outline.terminalNames.length;
  const frameOfMap = {
    origin: [frame.originX, frame.originY] as const,
    scale: frame.scale,
    unitM: frame.unitM,
    axisymmetric,
    between: [0, 1] as const,
  };
  const drive = pictureDrive(result);
  const singular = partChordCorners(result.singular, pair.set.mesh.xy, outline.rings);
  return {
    status: result.status,
    limit: result.limit,
    resistance: terminals ? null : inOhms(bounds.resistance, unit),
    squares: terminals || !medium.uniform || axisymmetric ? null : bounded(bounds.resistance),
    conductance: terminals
      ? Array.from({ length: count }, (_, a) =>
          terminals.conductance.slice(a * count, (a + 1) * count).map((entry) => inSiemens(entry, unit)),
        )
      : null,
    pairs: terminals
      ? terminals.pairs.map(({ between, floating, grounded }) => ({
          between,
          floating: inOhms(floating, unit),
          grounded: inOhms(grounded, unit),
        }))
      : null,
    boundsBasis: proved ? "energy" : "energy-quadrature",
    proved,
    unknowns: result.unknowns,
    triangles: result.triangles,
    refinements: result.refinements,
    checks: fieldChecks(pair, energies, bounds),
    map: makeFieldMap(pair, drive.combination, drive.shift, unit, singular, frameOfMap),
  };
}

interface PictureDrive {
  readonly combination: readonly number[];
  readonly shift: number;
}

/** Fields of the picture: the first terminal at one volt, the second at zero, all others without current. */
function pictureDrive({ pair, energies }: AdaptiveResult): PictureDrive {
  const phi = new PowerBounds(pair, energies).floatingPotentials(0, 1);
  if (!phi) return { combination: pair.potentials.map((_, a) => (a === 0 ? 1 : 0)), shift: 0 };
  // The last terminal is at zero here; it is the second one if there are only two.
  const low = phi.length > 1 ? phi[1] : 0;
  const drop = phi[0] - low;
  return { combination: phi.map((value) => value / drop), shift: -low / drop };
}

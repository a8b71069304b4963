/**
 * A shape of the catalogue, declared in one place. Pages, widget, docs, OpenAPI, CSV columns and clients are made from
 * these declarations; no other code branches on a shape's id.
 *
 * Inside a shape all numbers are SI and angles are radians; a request's degrees are converted before.
 */
import type { Drawing } from "./drawing";

export type Family = "axial" | "tapered" | "radial" | "spreading" | "sheet" | "earthing";

export type DimensionKind = "length" | "area" | "angle";

interface DimensionBase {
  readonly label: string;
  /** Symbol as in the formula, plain text with Unicode subscripts. */
  readonly symbol: string;
  readonly help: string;
}

export interface QuantityDimension extends DimensionBase {
  readonly type: "quantity";
  readonly kind: DimensionKind;
  /** Value taken when the request leaves it out, SI (radians for angles); without it the dimension is required. */
  readonly default?: number;
  /** Largest admitted value, SI (radians); every quantity is greater than 0 unless `zero` says 0 is allowed. */
  readonly max?: number;
  readonly zero?: boolean;
  /** Name under which the matching diameter is accepted too (the value is halved). */
  readonly diameter?: string;
  /** Name under which the matching radius is accepted too (the value is doubled). */
  readonly radius?: string;
}

export interface IntegerDimension extends DimensionBase {
  readonly type: "integer";
  readonly default?: number;
  readonly min: number;
  readonly max: number;
}

/** A plain number without unit, such as a lay factor or a count of turns that need not be whole. */
export interface NumberDimension extends DimensionBase {
  readonly type: "number";
  readonly default?: number;
  readonly min: number;
  readonly exclusiveMin?: boolean;
  readonly max: number;
}

export interface ChoiceDimension extends DimensionBase {
  readonly type: "choice";
  readonly default?: string;
  readonly choices: readonly { readonly value: string; readonly label: string }[];
}

export type Dimension = QuantityDimension | IntegerDimension | NumberDimension | ChoiceDimension;
export type Dimensions = Readonly<Record<string, Dimension>>;

/** Every dimension of a shape as a number in SI (choices as strings), alternatives filled in. */
export type Resolved<D extends Dimensions> = {
  readonly [K in keyof D]: D[K] extends ChoiceDimension ? D[K]["choices"][number]["value"] : number;
};

/**
 * A group of which exactly one is given. For each member, `derive` computes it from the others once one is known;
 * a small difference that was given keeps its digits, since nothing recomputes it.
 */
export interface Alternative<D extends Dimensions> {
  readonly names: readonly (keyof D & string)[];
  readonly derive: { readonly [K in keyof D]?: (d: Resolved<D>) => number };
}

export interface Constraint<D extends Dimensions> {
  /** Dimensions it speaks of; the complaint points at the first of them that the request gave. */
  readonly names: readonly (keyof D & string)[];
  /** For people: "outer radius greater than inner radius". */
  readonly text: string;
  readonly holds: (d: Resolved<D>) => boolean;
}

export interface Coordinate {
  readonly name: string;
  readonly role: "along" | "across";
  readonly unit: "m" | "rad";
  readonly label: string;
  /** Where it starts and ends, in the words of the shape's dimensions: "innerRadius", "0", "angle". */
  readonly start: string;
  readonly end: string;
}

/** Flow along one orthogonal coordinate s = start + x, 0 ≤ x ≤ extent; x is used so that thin walls keep their digits. */
export interface AlongFlow {
  readonly coordinate: string;
  /** Value of the coordinate at the start, m or rad. */
  readonly start: number;
  /** Range of the coordinate, m or rad. */
  readonly extent: number;
  /** ∬h₂h₃/h₁ over the surface at x: R = ∫ρ dx/section. */
  readonly section: (x: number) => number;
  /** h₁ on the line where the field is largest (1 where the coordinate is a length): E = −(dV/dx)/scale. */
  readonly scale?: (x: number) => number;
  /** Places x where section has a kink or changes fast. */
  readonly breaks?: readonly number[];
  /** Position of that line, for people: "at the inner radius". */
  readonly line?: string;
  /** Where the field grows without bound, for people; `scale` then tells another line, where it stays finite. */
  readonly unboundedAt?: string;
}

/** Flow in parallel tubes labelled by a coordinate across it: G = ∫σ·tube dx. */
export interface AcrossFlow {
  readonly coordinate: string;
  readonly start: number;
  readonly extent: number;
  /** w/l of the tubes per unit of the coordinate: dG = σ·tube(x)·dx. */
  readonly tube: (x: number) => number;
  /** Largest field in that tube at one volt, 1/m. */
  readonly fieldPerVolt: (x: number) => number;
}

export interface FlowTubes {
  readonly along: AlongFlow;
  readonly across: readonly AcrossFlow[];
}

export type BoundsBasis =
  "rounding" | "quadrature" | "rayleigh" | "formula-accuracy" | "energy" | "energy-quadrature";

/** A resistance over its resistivity (1/m), in squares (sheet), or in ohms (two media), with how sure it is. */
export interface Factor {
  readonly value: number;
  /** Relative rounding error of `value`; bounds are value·(1 ∓ relativeError) where lower and upper are not given. */
  readonly relativeError: number;
  readonly lower?: number;
  readonly upper?: number;
  readonly boundsBasis: BoundsBasis;
  readonly proved: boolean;
  readonly method: "closed-form" | "quadrature" | "field";
  /** Where a stated accuracy comes from, one sentence. */
  readonly accuracy?: string;
  /** Cautions that depend on these dimensions: a validity that is left. */
  readonly cautions?: readonly string[];
}

/** Largest field at one volt across the terminals; null where it is unbounded. */
export interface FactorPeak {
  readonly fieldPerVolt: number | null;
  readonly position: string;
}

/** Exact by flow tubes; any profile along or across the flow. */
export interface FlowAnswer<D extends Dimensions> {
  readonly kind: "flow";
  readonly flow: (d: Resolved<D>) => FlowTubes;
  /** Closed form of R/ρ for a uniform medium, 1/m, at most 1e-13 off over the whole domain. */
  readonly uniform: (d: Resolved<D>) => number;
  /** For flat ends that are no coordinate surfaces: upper (walls) over lower (sheets) value, ≥ 1. */
  readonly wallRatio?: (d: Resolved<D>) => number;
  /** For formulas along a centre line: a stated accuracy in place of rounding. */
  readonly accuracy?: (d: Resolved<D>) => Pick<Factor, "accuracy" | "cautions"> & {
    readonly lowerRatio: number;
    readonly upperRatio: number;
  };
  /** Cautions that depend on these dimensions. */
  readonly cautions?: (d: Resolved<D>) => readonly string[];
}

/** Known by potential theory for a uniform medium only. */
export interface FactorAnswer<D extends Dimensions> {
  readonly kind: "factor";
  /** How many times a plain closed form's work one value takes, where that is a lot: fewer trials by default and at most. */
  readonly work?: number;
  readonly factor: (d: Resolved<D>) => Factor;
  readonly peak?: (d: Resolved<D>) => FactorPeak;
  /**
   * For a sheet: whether the plan that the shape draws with these dimensions is the whole conductor, so that a field
   * solution on it takes the formula's place where that is no longer close. Left out where the formula always is.
   */
  readonly planIsWhole?: (d: Resolved<D>) => boolean;
  /** The same number by another route, for the `second-route` check; null where it does not reach. */
  readonly secondRoute?: (d: Resolved<D>) => { readonly value: number; readonly tolerance: number } | null;
}

/** Two media of uniform resistivity (ohm metres each). */
export interface MediaAnswer<D extends Dimensions> {
  readonly kind: "media";
  /** How many times a plain closed form's work one value takes, where that is a lot: fewer trials by default and at most. */
  readonly work?: number;
  readonly media: readonly { readonly name: string; readonly label: string }[];
  /** Resistance in ohms. */
  readonly resistance: (d: Resolved<D>, resistivity: Readonly<Record<string, number>>) => Factor;
  readonly secondRoute?: (
    d: Resolved<D>,
    resistivity: Readonly<Record<string, number>>,
  ) => { readonly value: number; readonly tolerance: number } | null;
  /**
   * For conductors side by side along one coordinate: R/ρ of each medium (1/m) and the common flow, so that each
   * medium may be graded along it. Left out where the media do not conduct in parallel tubes.
   */
  readonly parallel?: (d: Resolved<D>) => {
    readonly along: AlongFlow;
    readonly shares: Readonly<Record<string, number>>;
  };
}

export type ShapeAnswer<D extends Dimensions> = FlowAnswer<D> | FactorAnswer<D> | MediaAnswer<D>;

export interface Source {
  readonly title: string;
  readonly detail?: string;
  readonly provenance: "source at hand" | "from memory" | "derived here";
}

export interface ShapeDefinition<D extends Dimensions> {
  readonly id: string;
  readonly title: string;
  readonly family: Family;
  /** One or two sentences: what it is, where the current enters and leaves. */
  readonly summary: string;
  readonly dimensions: D;
  readonly alternatives?: readonly Alternative<D>[];
  readonly constraints?: readonly Constraint<D>[];
  readonly coordinates: readonly Coordinate[];
  readonly terminals: { readonly high: string; readonly low: string };
  readonly answer: ShapeAnswer<D>;
  /** TeX of the law for a uniform medium. */
  readonly formula: string;
  readonly boundsBasis: BoundsBasis;
  /** Sentences: where the law holds. */
  readonly validity: readonly string[];
  readonly cautions: readonly string[];
  readonly assumptions: readonly string[];
  readonly sources: readonly Source[];
  /** A request body that works and means something: dimensions as an engineer writes them, and a medium. */
  readonly example: {
    readonly dimensions: Readonly<Record<string, string | number>>;
    readonly medium?: Readonly<Record<string, unknown>>;
    readonly media?: Readonly<Record<string, Readonly<Record<string, unknown>>>>;
  };
  readonly drawing: (d: Resolved<D>) => Drawing;
}

/** A shape with its type parameter forgotten, as the catalogue keeps it. */
export interface Shape extends Omit<
  ShapeDefinition<Dimensions>,
  "answer" | "drawing" | "alternatives" | "constraints"
> {
  readonly alternatives: readonly Alternative<Dimensions>[];
  readonly constraints: readonly Constraint<Dimensions>[];
  readonly answer: ShapeAnswer<Dimensions>;
  readonly drawing: (d: Resolved<Dimensions>) => Drawing;
}

/** Declares a shape; the literal types of its dimensions flow into its functions. */
export function defineShape<const D extends Dimensions>(definition: ShapeDefinition<D>): Shape {
  const { alternatives = [], constraints = [] } = definition;
  // The one place where a shape's own dimension names are forgotten: its functions are only ever called with
  // dimensions resolved against this same definition.
  return { ...definition, alternatives, constraints } as unknown as Shape;
}

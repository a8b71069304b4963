/**
 * A solved resistance before it is dressed as a result: the number with its bounds, and a view of the conductor from
 * which peak, profile, steps and checks are made when they are asked for.
 */
import type { GradedMedium, UniformMedium } from "../medium/resolve-medium";
import type { Integral } from "../numeric/gauss-kronrod";
import type {
  AlongFlow,
  BoundsBasis,
  Dimensions,
  FactorAnswer,
  Factor,
  FlowAnswer,
  FlowTubes,
  MediaAnswer,
  Resolved,
} from "../shape/define-shape";
import type { AcrossConductor } from "./across-conductor";
import type { AlongConductor } from "./along-conductor";
import type { Bounds } from "./bounds";

/** Uniform, or graded along the flow: everything follows from ∫ρ dx/section. */
export interface AlongView {
  readonly kind: "along";
  /** Made when first needed; a bare closed form needs neither. */
  readonly tubes: () => FlowTubes;
  readonly conductor: () => AlongConductor;
  /** ∫ρ dx/section as the value rests on it: the closed form, or the integral. */
  readonly integralOhm: number;
  readonly medium: UniformMedium | GradedMedium;
  readonly answer: FlowAnswer<Dimensions>;
}

/** Graded across the flow: parallel tubes, G = ∫σ·tube dx. */
export interface AcrossView {
  readonly kind: "across";
  readonly tubes: FlowTubes;
  readonly conductor: AcrossConductor;
  readonly medium: GradedMedium;
  readonly answer: FlowAnswer<Dimensions>;
}

/** Known by its total only. */
export interface FactorView {
  readonly kind: "factor";
  readonly answer: FactorAnswer<Dimensions>;
  /** What the shape's formula gives. */
  readonly law: Factor;
  /** What the answer rests on: the formula, or a field solution where that has lost its accuracy. */
  readonly factor: Factor;
  readonly medium: UniformMedium;
  readonly sheet: boolean;
}

/** Two media. */
export interface MediaView {
  readonly kind: "media";
  readonly answer: MediaAnswer<Dimensions>;
  /** Resistivity of each medium, ohm m, where all are uniform. */
  readonly resistivities: Readonly<Record<string, number>> | null;
  readonly parallel: { readonly along: AlongFlow; readonly shares: Readonly<Record<string, number>> } | null;
}

export interface Solution extends Bounds {
  readonly boundsBasis: BoundsBasis;
  readonly proved: boolean;
  readonly method: "closed-form" | "quadrature" | "field";
  readonly integral?: Integral;
  /** The same integral by its second route, where that was needed to trust the first. */
  readonly secondIntegral?: Integral;
  readonly cautions: readonly string[];
  readonly assumptions: readonly string[];
  readonly dimensions: Resolved<Dimensions>;
  readonly view: AlongView | AcrossView | FactorView | MediaView;
}

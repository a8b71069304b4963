/** What a graded medium's profile is to the engine: pieces along one coordinate, each with its own law. */
import type { z } from "zod";
import type { Problems } from "../failure";
import type { Smoothness } from "../numeric/piecewise-integral";
import type { QuantityKindName } from "../quantity/quantity-kind";
import type { Material } from "./material";

/** Where and for what a profile is used. */
export interface ProfileSite {
  /** Name of the coordinate, its unit, and its range: start … start + extent, in SI (radians). */
  readonly coordinate: string;
  readonly unit: "m" | "rad";
  readonly start: number;
  readonly extent: number;
  /** Whether a conductivity of zero is allowed somewhere (across the flow) or nowhere (along it). */
  readonly zeroAllowed: boolean;
  /** What the profile's values measure. */
  readonly values: Extract<QuantityKindName, "conductivity" | "resistivity" | "density">;
  readonly pointer: string;
  readonly problems: Problems;
  readonly material: (id: string) => Material | undefined;
  /** Told of every material that the profile uses. */
  readonly use: (material: Material) => void;
  readonly caution: (sentence: string) => void;
}

/** What the values of a law are; a law may know better than its site (a temperature profile gives resistivities). */
export type LawQuantity = "conductivity" | "resistivity" | "density";

/**
 * A law along the coordinate. Piece i covers start + from[i] … start + from[i] + width[i]; inside a piece the law is
 * smooth, and each piece is measured from its own start so that thin layers keep their digits.
 */
export interface ProfileLaw {
  readonly count: number;
  readonly from: ArrayLike<number>;
  readonly width: ArrayLike<number>;
  /** Value at t past the start of piece i. */
  readonly at: (piece: number, t: number) => number;
  readonly quantity: LawQuantity;
  /** Largest over smallest value in a piece, where that is known: tells how fine a rule must be. */
  readonly spread?: (piece: number) => number;
  /** What kind of function the law is inside a piece; `reciprocal` where nothing is said. */
  readonly smoothness?: Smoothness;
  /** The law is one constant in each piece. */
  readonly stepwise?: boolean;
  /** Inside a piece the law may have kinks or jumps (an expression). */
  readonly rough?: boolean;
  /** Cost of one value compared with a simple law; caps the number of evaluations. */
  readonly cost?: number;
  /** Places x (from the coordinate's start) where a piece changes fast. */
  readonly hints?: readonly number[];
  /** TeX of the law in the coordinate s. */
  readonly tex: string;
}

/** One kind of profile: its schema, its documentation and its law. */
export interface ProfileKind<S extends z.ZodObject = z.ZodObject> {
  readonly kind: string;
  readonly title: string;
  /** One or two sentences for people. */
  readonly summary: string;
  /** TeX of the law in general. */
  readonly tex: string;
  readonly schema: S;
  /** Builds the law, or returns null after telling `site.problems` why not. */
  readonly build: (profile: z.infer<S>, site: ProfileSite) => ProfileLaw | null;
}

/** Declares a kind of profile; the type of its schema flows into `build`. */
export function defineProfile<S extends z.ZodObject>(kind: ProfileKind<S>): ProfileKind<S> {
  return kind;
}

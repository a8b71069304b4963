/**
 * A conductor whose resistivity varies along the flow only (or not at all): R = ∫ρ dx/section. Everything about it, the
 * total, the potential, the field, comes from integrals of ρ/section over parts of the range.
 */
import type { ProfileLaw } from "../medium/profile";
import type { IntegrateOptions, Integral } from "../numeric/gauss-kronrod";
import type { AlongFlow } from "../shape/define-shape";
import { LawIntegral, pieceAt, UnfitValue } from "./law-integral";

/** A medium of one resistivity as a law of one piece. */
export function uniformLaw(resistivity: number, extent: number): ProfileLaw {
  return {
    count: 1,
    from: [0],
    width: [extent],
    at: () => resistivity,
    quantity: "resistivity",
    spread: () => 1,
    stepwise: true,
    tex: "",
  };
}

export class AlongConductor {
  private readonly integral: LawIntegral;
  private readonly resistivity: (piece: number, t: number) => number;

  constructor(
    readonly flow: AlongFlow,
    readonly law: ProfileLaw,
  ) {
    const { from, at } = law;
    const { section } = flow;
    const inverse = law.quantity !== "resistivity";
    this.resistivity = (piece, t) => {
      const value = at(piece, t);
      if (!(value > 0 && value < Infinity)) throw new UnfitValue(from[piece] + t, value);
      return inverse ? 1 / value : value;
    };
    this.integral = new LawIntegral({
      law,
      extent: flow.extent,
      // Written out rather than by `resistivity`: a table asks for it tens of thousands of times.
      density: (piece, t) => {
        const x = from[piece] + t;
        const value = at(piece, t);
        if (!(value > 0 && value < Infinity)) throw new UnfitValue(x, value);
        return inverse ? 1 / (value * section(x)) : value / section(x);
      },
      weight: section,
      breaks: flow.breaks,
    });
  }

  /** Resistivity at x past the start, ohm m. @throws UnfitValue */
  resistivityAt(x: number): number {
    const piece = pieceAt(this.law, x);
    return this.resistivity(piece, x - this.law.from[piece]);
  }

  /** dR/dx at x: resistance per unit of the coordinate. @throws UnfitValue */
  densityAt(x: number): number {
    return this.resistivityAt(x) / this.flow.section(x);
  }

  /** Resistance of the whole, ohms. @throws UnfitValue where the law leaves what a medium can have. */
  total(options: IntegrateOptions = {}): Integral {
    return this.doubted(this.integral.total(options));
  }

  /** The same with other nodes, given the first. */
  secondTotal(first: Integral): Integral {
    return this.doubted(this.integral.secondTotal(first));
  }

  /** Resistance between two places of the range, ohms. */
  between(x0: number, x1: number, options: IntegrateOptions = {}): Integral {
    return this.integral.between(x0, x1, options);
  }

  /**
   * Adds to the error what the last digit of x does: a place near the far end is known to an ulp of the whole extent,
   * and where the section narrows to almost nothing there, that is seen.
   */
  private doubted(integral: Integral): Integral {
    const { extent } = this.flow;
    const steepness = Math.log(this.densityAt(extent) / this.densityAt(extent * (1 - NEAR_END))) / NEAR_END;
    if (!(steepness > STEEP)) return integral;
    return { ...integral, error: integral.error + 4 * Number.EPSILON * steepness * integral.value };
  }
}

/** Distance from the far end over which the density is compared, as a part of the extent. */
const NEAR_END = 1e-12;
/** Below this relative steepness rounding of x is lost in the other roundings. */
const STEEP = 100;

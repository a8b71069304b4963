/** A conductor of parallel flow tubes whose conductivity varies across them: G = ∫σ·tube dx. */
import type { ProfileLaw } from "../medium/profile";
import type { Integral } from "../numeric/gauss-kronrod";
import type { AcrossFlow } from "../shape/define-shape";
import { LawIntegral, pieceAt, UnfitValue } from "./law-integral";

export class AcrossConductor {
  private readonly integral: LawIntegral;
  private readonly conductivity: (piece: number, t: number) => number;

  constructor(
    readonly flow: AcrossFlow,
    readonly law: ProfileLaw,
  ) {
    const { from, at } = law;
    const { tube } = flow;
    const sigma: (piece: number, t: number) => number =
      law.quantity === "resistivity"
        ? (piece, t) => {
            const value = at(piece, t);
            if (value > 0 && value < Infinity) return 1 / value;
            throw new UnfitValue(from[piece] + t, value);
          }
        : (piece, t) => {
            const value = at(piece, t);
            if (value >= 0 && value < Infinity) return value;
            throw new UnfitValue(from[piece] + t, value);
          };
    this.conductivity = sigma;
    this.integral = new LawIntegral({
      law,
      extent: flow.extent,
      density: (piece, t) => sigma(piece, t) * tube(from[piece] + t),
      weight: tube,
    });
  }

  /** Conductivity at x past the start, S/m, 0 where nothing conducts. @throws UnfitValue */
  conductivityAt(x: number): number {
    const piece = pieceAt(this.law, x);
    return this.conductivity(piece, x - this.law.from[piece]);
  }

  /** Conductance of the whole, siemens. @throws UnfitValue where the law leaves what a medium can have. */
  total(): Integral {
    return this.integral.total();
  }

  /** The same with other nodes, given the first. */
  secondTotal(first: Integral): Integral {
    return this.integral.secondTotal(first);
  }
}

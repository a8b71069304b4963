/** A long-leg formula in squares with the bounds that its short legs leave. */
import type { Factor } from "../define-shape";
import { exactFactor, ROUNDING } from "../exact-factor";

export interface LongLegs {
  /** Squares with endless legs. */
  readonly squares: number;
  /** Length over width of the shortest leg that matters. */
  readonly shortest: number;
  /** Asked only where a leg is short. */
  readonly change: () => {
    /** Most by which ending the current-carrying legs with terminals lowers the squares. */
    readonly lowered: number;
    /** Most by which ending floating legs with edges, or squeezing the flow into nearness, raises them. */
    readonly raised?: number;
  };
  /** What conducting sheets across the legs leave: nothing can be lower. */
  readonly least: number;
  /** What insulating walls across floating legs leave: nothing can be higher. */
  readonly most?: number;
}

/** What the entries of these shapes say of short legs. */
export const FIELD_TAKES_OVER =
  "Where the legs are so short that the formula's bounds are wider than 1e-4 of the value, the answer is a field solution on the plan with a proved bracket, as long as no edge is shorter than a thirtieth of the longest and there are at most twelve corners; else the wider bounds stand.";

/** From this length over width on, exp(−2πL/w) times any excess is below rounding. */
const ENDLESS = 7;
/** Below this share of the value the legs are long to rounding. */
const NEGLIGIBLE = 1e-15;
/** From this share on a caution says that the legs are short. */
const NOTEWORTHY = 1e-3;

export function longLegFactor(legs: LongLegs): Factor {
  const { squares, least, most = Infinity } = legs;
  if (legs.shortest >= ENDLESS) return exactFactor(squares);
  const { lowered, raised = 0 } = legs.change();
  if (lowered + raised <= NEGLIGIBLE * squares) return exactFactor(squares);
  // Dirichlet's principle gives R²/(R+Δ), a little more than R − Δ.
  const lower = Math.min(squares, Math.max(least, squares * (squares / (squares + lowered))));
  const upper = Math.max(squares, Math.min(most, squares + raised));
  const share = (upper - lower) / squares;
  return {
    value: squares,
    relativeError: ROUNDING,
    lower,
    upper,
    boundsBasis: "formula-accuracy",
    proved: false,
    method: "closed-form",
    accuracy:
      "The value is exact for endless legs; the bounds hold what legs of this length can change, by Rayleigh's theorem and trial flows made from the modes of the junction.",
    ...(share > NOTEWORTHY
      ? {
          cautions: [
            `The legs are short against their width: the long-leg formula may be off by up to ${(100 * share).toPrecision(2)} %.`,
          ],
        }
      : {}),
  };
}

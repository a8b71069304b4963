/** First-order propagation of variances: JCGM 100 (GUM), clause 5.1.2, for independent inputs. */
import { InputError } from "../../failure";
import { derivative } from "../../numeric/derivative";
import { shiftOf, standardOf } from "./distribution";
import type { UncertainInput } from "./input";
import type { UncertainResistance } from "./problem-box";

export interface Contribution {
  readonly input: UncertainInput;
  /** Ohms per SI unit. */
  readonly sensitivity: number;
  /** Standard uncertainty of the input. */
  readonly standard: number;
}

export interface Propagated {
  /** Standard uncertainty of the resistance, ohms. */
  readonly standard: number;
  /** Expectation less the value, ohms, from tolerances that are not symmetric. */
  readonly shift: number;
  readonly contributions: readonly Contribution[];
  /** Largest curvature of one input over its tolerance, against its slope: what the first order leaves out. */
  readonly curvature: number;
}

/** Step of the first difference against the size of the input, between these shares of it. */
const LARGEST_STEP = 0.02;
const SMALLEST_STEP = 1e-4;

/** Sensitivities and the combined standard uncertainty. @throws InputError where a double cannot hold one. */
export function propagate(resistance: UncertainResistance): Propagated {
  const { inputs, nominal, at } = resistance;
  const scale = calibration(resistance);
  const values = nominal.slice();
  let variance = 0;
  let shift = 0;
  let curvature = 0;
  const contributions = inputs.map((input, i): Contribution => {
    const f = (x: number): number => {
      values[i] = x;
      const value = at(values);
      values[i] = nominal[i];
      return value;
    };
    const sensitivity = scale * derivative(f, input.nominal, firstStep(input)).value;
    const standard = standardOf(input);
    if (!Number.isFinite(sensitivity) || !Number.isFinite(sensitivity * standard)) {
      throw new InputError([
        {
          pointer: input.pointer,
          detail: "has a sensitivity that a double cannot hold, or none at its value.",
        },
      ]);
    }
    variance += (sensitivity * standard) ** 2;
    shift += sensitivity * shiftOf(input);
    curvature = Math.max(curvature, bend(f, input, resistance));
    return { input, sensitivity, standard };
  });
  return { standard: Math.sqrt(variance), shift, contributions, curvature };
}

/** The answer's value over the formula's: the same but where a field solution took the formula's place. */
export function calibration({ value, at, nominal }: UncertainResistance): number {
  const own = at(nominal);
  return own > 0 ? value / own : 1;
}

function firstStep({ nominal, minus, plus, site }: UncertainInput): number {
  const reach = Math.max(minus, plus) / 2;
  // A temperature's zero means nothing, so its size is that of the range materials are used in.
  const size = site.kind === "temperature" ? 100 : Math.abs(nominal);
  if (size === 0) return reach > 0 ? reach : 1e-6;
  return Math.min(LARGEST_STEP * size, Math.max(SMALLEST_STEP * size, reach));
}

/** Second difference over the tolerance against what the first order gives the whole resistance. */
function bend(
  f: (x: number) => number,
  { nominal, minus, plus }: UncertainInput,
  { at, nominal: all }: UncertainResistance,
): number {
  const reach = Math.min(minus, plus);
  if (reach === 0) return 0;
  const up = f(nominal + reach);
  const down = f(nominal - reach);
  if (Number.isNaN(up) || Number.isNaN(down)) return 0;
  const here = at(all);
  const second = Math.abs(up + down - 2 * here);
  // Rounding of three values is no curvature.
  if (second <= 1e-9 * here) return 0;
  return second / Math.max(Math.abs(up - down), Number.MIN_VALUE);
}

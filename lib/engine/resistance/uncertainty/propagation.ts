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
  /** Whether the first order leaves out too much: the resistance is bent over the tolerances, or does not move first. */
  readonly bent: boolean;
  /** Lowest and highest resistance seen at the ends of the tolerances, ohms. */
  readonly low: number;
  readonly high: number;
}

/** Part of what the first order gives that one input's curvature may be, and what all inputs together may differ by. */
const BENT = 0.1;
const BENT_TOGETHER = 0.5;

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
  let bent = false;
  const seen: number[] = [];
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
    seen.push(f(input.nominal + input.plus), f(input.nominal - input.minus));
    bent ||= bend(f, input, sensitivity / scale, resistance) > BENT;
    return { input, sensitivity, standard };
  });
  const slopes = contributions.map((entry) => entry.sensitivity / scale);
  const together = bendTogether(resistance, slopes);
  bent ||= together.bend > BENT_TOGETHER;
  const found = [at(nominal), ...seen, ...together.seen].filter((value) => !Number.isNaN(value));
  return {
    standard: Math.sqrt(variance),
    shift,
    contributions,
    bent,
    low: scale * Math.min(...found),
    high: scale * Math.max(...found),
  };
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

/** Second difference over the tolerance, or what a one-sided one leaves of the slope, against the first order's part. */
function bend(
  f: (x: number) => number,
  { nominal, minus, plus }: UncertainInput,
  slope: number,
  { at, nominal: all }: UncertainResistance,
): number {
  const here = at(all);
  const reach = Math.min(minus, plus);
  if (reach === 0) {
    const move = plus > 0 ? plus : -minus;
    return move === 0 ? 0 : beyond(f(nominal + move) - here - slope * move, slope * move, here);
  }
  const up = f(nominal + reach);
  const down = f(nominal - reach);
  return beyond(up + down - 2 * here, up - down, here);
}

/** What all inputs at their ends together give beyond the first order: two that do nothing alone may do much together. */
function bendTogether(
  { inputs, nominal, at }: UncertainResistance,
  slopes: readonly number[],
): { bend: number; seen: readonly number[] } {
  const here = at(nominal);
  let bend = 0;
  const seen = CORNERS.map((side) => {
    const moves = inputs.map(({ minus, plus }, i) => (side(i) > 0 ? plus : -minus));
    const value = at(nominal.map((x, i) => x + moves[i]));
    const straight = moves.reduce((sum, move, i) => sum + slopes[i] * move, 0);
    const spread = moves.reduce((sum, move, i) => sum + Math.abs(slopes[i] * move), 0);
    bend = Math.max(bend, beyond(value - here - straight, spread, here));
    return value;
  });
  return { bend, seen };
}

/** All up, all down, and in turns both ways. */
const CORNERS: ReadonlyArray<(index: number) => number> = [
  () => 1,
  () => -1,
  (index) => (index % 2 === 0 ? 1 : -1),
  (index) => (index % 2 === 0 ? -1 : 1),
];

function beyond(rest: number, straight: number, here: number): number {
  // Rounding of three values is no curvature.
  if (Number.isNaN(rest) || Math.abs(rest) <= 1e-9 * here) return 0;
  return Math.abs(rest) / Math.max(Math.abs(straight), Number.MIN_VALUE);
}

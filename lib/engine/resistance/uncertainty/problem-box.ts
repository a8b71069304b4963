/** The function and the inputs that every method works on, and how a point that cannot be is told. */
import { InputError, pointerTo, type Problem } from "../../failure";
import { siText } from "../../quantity/format-quantity";
import type { Evaluator } from "../evaluator";
import type { UncertainInput } from "./input";
import { FEWEST_TRIALS } from "./tolerance-schema";

/** Resistance in ohms as a function of the uncertain inputs. */
export interface UncertainResistance {
  readonly inputs: readonly UncertainInput[];
  readonly nominal: Float64Array;
  /** Ohms at these values of the inputs; NaN where the request would be refused. */
  readonly at: (values: ArrayLike<number>) => number;
  /** The answer's own value in ohms at the nominal inputs. */
  readonly value: number;
  /** Relative rounding or quadrature error of one evaluation, generously. */
  readonly noise: number;
  /** Evaluations of a medium's law that one value costs; 0 for a closed form. */
  readonly cost: number;
  readonly evaluator: Evaluator;
  readonly overdue: () => boolean;
}

/** Refuses a point of the tolerances at which the request itself would be refused. @throws InputError always. */
export function refusePoint(
  { evaluator, inputs, nominal }: UncertainResistance,
  values: ArrayLike<number>,
  pointer: string,
  who: string,
): never {
  const why = evaluator.refusal(values);
  const places = inputs
    .flatMap((input, i) => (values[i] === nominal[i] ? [] : [`${input.name} = ${shown(input, values[i])}`]))
    .slice(0, 6)
    .join(", ");
  throw new InputError([
    {
      pointer,
      detail: `${who} ${places}, where the request is refused: ${why ? complaint(why) : "it has no value."}`,
    },
  ]);
}

/** Holds every input's own ends against the request's rules. @throws InputError with a complaint for each that is refused. */
export function checkEnds(resistance: UncertainResistance): void {
  const { inputs, nominal, at, evaluator } = resistance;
  const problems: Problem[] = [];
  for (const [i, input] of inputs.entries()) {
    for (const [side, distance] of [
      ["minus", -input.minus],
      ["plus", input.plus],
    ] as const) {
      const values = nominal.slice();
      values[i] = input.nominal + distance;
      if (distance === 0 || !Number.isNaN(at(values))) continue;
      const why = evaluator.refusal(values);
      problems.push({
        pointer: input.pointer,
        detail: `reaches ${shown(input, values[i])} (${side === "plus" ? "above" : "below"} its value), where the request is refused: ${why ? complaint(why) : "it has no value."}`,
      });
      break;
    }
  }
  if (problems.length > 0) throw new InputError(problems);
}

/** Part of the trials that were made in time which another call is likely to make. */
const LIKELY = 0.8;

/** Refuses trials that take longer than a call may, naming a number that fits. @throws InputError always. */
export function refuseTrials(done: number, asked: number, cost: number): never {
  const size = 10 ** Math.max(0, Math.floor(Math.log10(Math.max(1, LIKELY * done))) - 1);
  const fitting = Math.floor((LIKELY * done) / size) * size;
  const advice =
    fitting < FEWEST_TRIALS ? "Ask for propagation." : `Ask for ${fitting.toLocaleString("en")} at most.`;
  throw new InputError([
    {
      pointer: pointerTo("#/uncertainty", "trials"),
      detail: `are too many for the time a call may take: ${done.toLocaleString("en")} of ${asked.toLocaleString("en")} were made.${priceOf(cost)} ${advice}`,
    },
  ]);
}

/** Refuses a search that takes longer than a call may. @throws InputError always. */
export function refuseTime(done: number, cost: number): never {
  throw new InputError([
    {
      pointer: "#/uncertainty",
      detail: `takes longer than a call may: ${done.toLocaleString("en")} evaluations were made.${priceOf(cost)} Give fewer tolerances, or ask for propagation.`,
    },
  ]);
}

function priceOf(cost: number): string {
  return cost > 0 ? ` Each takes about ${cost} evaluations of the medium's law.` : "";
}

function complaint({ pointer, detail }: Problem): string {
  return `${pointer === "#" ? "it" : pointer.slice(2).replaceAll("/", ".")} ${detail}`;
}

function shown(input: UncertainInput, value: number): string {
  const { site } = input;
  if (site.kind === "temperature") return `${Number(value.toPrecision(6))} °C`;
  if (site.kind === "material") return `${Number(value.toPrecision(4))} times the nominal resistivity`;
  if (input.unit) return siText(value, input.unit);
  return String(Number(value.toPrecision(6)));
}

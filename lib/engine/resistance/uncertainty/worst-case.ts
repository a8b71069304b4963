/** The smallest and the largest resistance over the box of all tolerances. */
import { boxExtremes, NoValue } from "../../numeric/box-extremes";
import { refusePoint, refuseTime, type UncertainResistance } from "./problem-box";
import { calibration } from "./propagation";

export interface WorstCase {
  readonly low: number;
  readonly high: number;
  /** What each input spans alone, the others at their nominal values, ohms. */
  readonly spans: readonly number[];
  readonly basis: string;
}

/** Of lines and points for closed forms and for integrals, which cost a hundred times as much. */
const CLOSED = { lines: 40, points: 4096 };
const INTEGRAL = { lines: 6, points: 512 };
const BETWEEN_LOOKS = 64;

/** @throws InputError where the box holds a point at which the request is refused, or the search takes too long. */
export function worstCase(resistance: UncertainResistance): WorstCase {
  const { inputs, nominal, at, noise, cost, overdue } = resistance;
  const moving = [...inputs.entries()].filter(([, { minus, plus }]) => minus + plus > 0).map(([i]) => i);
  const values = nominal.slice();
  let evaluations = 0;
  const step = (): void => {
    if (++evaluations % BETWEEN_LOOKS === 0 && overdue()) refuseTime(evaluations, cost);
  };
  const over = (indices: readonly number[], effort: { readonly lines: number; readonly points: number }) => {
    const put = (point: ArrayLike<number>): Float64Array => {
      values.set(nominal);
      for (let k = 0; k < indices.length; k++) values[indices[k]] = point[k];
      return values;
    };
    try {
      return boxExtremes(
        (point) => at(put(point)),
        indices.map((i) => nominal[i] - inputs[i].minus),
        indices.map((i) => nominal[i] + inputs[i].plus),
        { noise, step, ...effort },
      );
    } catch (error) {
      if (error instanceof NoValue) refusePoint(resistance, put(error.point), "#/uncertainty", "reaches");
      throw error;
    }
  };

  const scale = calibration(resistance);
  if (moving.length === 0) {
    return {
      low: resistance.value,
      high: resistance.value,
      spans: inputs.map(() => 0),
      basis: "No input may stray.",
    };
  }
  const whole = over(moving, cost > 0 ? INTEGRAL : CLOSED);
  const spans = inputs.map((_, i) => {
    if (!moving.includes(i)) return 0;
    const alone = moving.length === 1 ? whole : over([i], { lines: 0, points: 65 });
    return scale * (alone.high - alone.low);
  });
  const searched = moving.filter((_, k) => !whole.monotone[k]).map((i) => inputs[i].name);
  return {
    low: Math.min(scale * whole.low, resistance.value),
    high: Math.max(scale * whole.high, resistance.value),
    spans,
    basis:
      searched.length === 0
        ? `The resistance rises or falls throughout with each input (seen along ${whole.lines} lines of the box for each), so its extremes lie at corners of the box.`
        : `The resistance both rises and falls with ${searched.join(" and ")}, so its extremes were searched over the box on a grid and polished; a search is no proof.`,
  };
}

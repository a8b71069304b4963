/**
 * The two scales of line plots, with round ends and round ticks. A library's general scales bring dates, colours and
 * formats along, which is more script than a widget in another team's page may load.
 */

export interface Scale {
  /** Place along the axis, px; not finite where the scale has none for the value. */
  (value: number): number;
  readonly domain: readonly [number, number];
}

type Pair = readonly [number, number];

export function scaleOf(log: boolean, [from, to]: Pair, [start, end]: Pair): Scale {
  const share = log
    ? (value: number) => Math.log(value / from) / Math.log(to / from)
    : (value: number) => (value - from) / (to - from);
  // Ends that are one number, as of values beyond 2^53, leave everything in the middle.
  const place = (value: number) => start + (end - start) * (from === to ? 0.5 : share(value));
  return Object.assign(place, { domain: [from, to] as const });
}

/** A power of ten to the last digit, which `**` does not promise. */
function tenTo(power: number): number {
  return Number.isInteger(power) ? Number(`1e${power}`) : 10 ** power;
}

/** Distance of round ticks: `mantissa`·10^`power` with 1, 2 or 5 as mantissa. */
interface Step {
  readonly mantissa: number;
  readonly power: number;
}

function stepOf(from: number, to: number, count: number): Step {
  const wanted = (to - from) / count;
  const power = Math.floor(Math.log10(wanted));
  const over = wanted / tenTo(power);
  // Nearest by ratio.
  if (over >= Math.sqrt(50)) return { mantissa: 1, power: power + 1 };
  const mantissa = over >= Math.sqrt(10) ? 5 : over >= Math.sqrt(2) ? 2 : 1;
  return { mantissa, power };
}

/** The multiple `index` of a step, rounded once. */
function multiple({ mantissa, power }: Step, index: number): number {
  return power < 0 ? (index * mantissa) / tenTo(-power) : index * mantissa * tenTo(power);
}

/** How many steps a value is, not whole. */
function inSteps({ mantissa, power }: Step, value: number): number {
  return power < 0 ? (value * tenTo(-power)) / mantissa : value / (mantissa * tenTo(power));
}

/** Round numbers between the ends, about as many as wanted. */
export function roundTicks([from, to]: Pair, count: number): readonly number[] {
  if (!(to > from)) return [from];
  const step = stepOf(from, to, count);
  // Rounding inwards, so that an end which is a tick but for rounding stays one.
  let [first, last] = [Math.round(inSteps(step, from)), Math.round(inSteps(step, to))];
  if (multiple(step, first) < from) first += 1;
  if (multiple(step, last) > to) last -= 1;
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => multiple(step, first + index));
}

/** Label of a round tick, with as many decimals as the distance of the ticks has. */
export function roundLabels([from, to]: Pair, count: number): (value: number) => string {
  const decimals = to > from ? Math.min(20, Math.max(0, -stepOf(from, to, count).power)) : 0;
  const format = new Intl.NumberFormat("en", {
    minimumFractionDigits: decimals,
    maximumFractionDigits: decimals,
  });
  return (value) => format.format(value === 0 ? 0 : value).replace("-", "−");
}

/** The domain out to the next round numbers, of which about ten lie in it, or to whole powers of ten. */
export function roundDomain(log: boolean, domain: Pair): Pair {
  let [from, to] = domain;
  if (log) return [tenTo(Math.floor(Math.log10(from))), tenTo(Math.ceil(Math.log10(to)))];
  if (!(to > from)) return domain;
  // A wider domain can have a wider step, which soon comes to rest.
  let before: Step | undefined;
  for (let round = 0; round < 10; round++) {
    const step = stepOf(from, to, 10);
    if (step.mantissa === before?.mantissa && step.power === before.power) break;
    from = multiple(step, Math.floor(inSteps(step, from)));
    to = multiple(step, Math.ceil(inSteps(step, to)));
    before = step;
  }
  return [from, to];
}

/** One to nine times each power of ten between the ends; over ten decades the powers alone. */
export function decadeTicks([from, to]: Pair): readonly number[] {
  const [low, high] = [Math.log10(from), Math.log10(to)];
  if (high - low >= 10) return roundTicks([low, high], 10).map(tenTo);
  const ticks: number[] = [];
  for (let power = Math.floor(low); power <= Math.ceil(high); power++) {
    for (let digit = 1; digit < 10; digit++) {
      const tick = power < 0 ? digit / tenTo(-power) : digit * tenTo(power);
      if (tick >= from && tick <= to) ticks.push(tick);
    }
  }
  return ticks.length < 5 ? roundTicks([from, to], 10) : ticks;
}

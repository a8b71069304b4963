/** Where field and current density are largest, at the operating point or at one volt. */
import { formatQuantity, siText } from "../quantity/format-quantity";
import type { AlongConductor } from "./along-conductor";
import type { Peak, PeakPosition } from "./result-schema";
import type { AcrossView, AlongView, FactorView, MediaView, Solution } from "./solution";

/** Largest values and where: x past the coordinate's start, or null where the value is the same everywhere. */
interface Extreme {
  readonly value: number;
  readonly x: number | null;
}

/** A relative spread below this counts as the same everywhere. */
const FLAT = 1e-9;
const GRID = 100;

/** The peak, or null where the shape tells nothing about the field inside. */
export function findPeak(solution: Solution, voltage: number, per: Peak["per"]): Peak | null {
  const { view } = solution;
  switch (view.kind) {
    case "along":
      return alongPeak(solution, view, voltage, per);
    case "across":
      return acrossPeak(view, voltage, per);
    case "factor":
      return factorPeak(solution, view, voltage, per);
    case "media":
      return mediaPeak(view, voltage, per);
  }
}

function alongPeak(solution: Solution, view: AlongView, voltage: number, per: Peak["per"]): Peak {
  const conductor = view.conductor();
  const { flow } = conductor;
  if (flow.unboundedAt !== undefined) return unboundedPeak(flow.unboundedAt, per);
  const current = voltage / solution.value;
  const density = (x: number): number => current / (flow.section(x) * (flow.scale?.(x) ?? 1));
  const field = (x: number): number => density(x) * conductor.resistivityAt(x);
  const places = placesOf(conductor);
  const largestField = largest(field, places);
  const largestDensity = view.medium.kind === "uniform" ? { ...largestField } : largest(density, places);
  const densityValue =
    view.medium.kind === "uniform" ? largestField.value / view.medium.value : largestDensity.value;
  const { unit } = coordinateUnit(view.tubes().along.coordinate, view);
  const position = ({ x }: Extreme): PeakPosition =>
    positionAt(
      flow.coordinate,
      flow.start,
      x,
      unit,
      flow.line,
      view.answer.wallRatio ? "mean over the section" : undefined,
    );
  return {
    field: fieldQuantity(largestField.value),
    currentDensity: densityQuantity(densityValue, false),
    position: position(largestField),
    currentDensityPosition: position(largestDensity),
    per,
  };
}

function unboundedPeak(text: string, per: Peak["per"]): Peak {
  const position: PeakPosition = { coordinate: null, value: null, unit: null, text };
  return {
    field: fieldQuantity(null),
    currentDensity: densityQuantity(null, false),
    position,
    currentDensityPosition: position,
    per,
  };
}

function acrossPeak(view: AcrossView, voltage: number, per: Peak["per"]): Peak {
  const { conductor, medium } = view;
  const { flow } = conductor;
  const field = (x: number): number => voltage * flow.fieldPerVolt(x);
  const places = placesOf(conductor);
  const largestField = largest(field, places);
  const largestDensity = largest((x) => conductor.conductivityAt(x) * field(x), places);
  const position = ({ x }: Extreme): PeakPosition =>
    positionAt(flow.coordinate, flow.start, x, medium.coordinate.unit);
  return {
    field: fieldQuantity(largestField.value),
    currentDensity: densityQuantity(largestDensity.value, false),
    position: position(largestField),
    currentDensityPosition: position(largestDensity),
    per,
  };
}

function factorPeak(solution: Solution, view: FactorView, voltage: number, per: Peak["per"]): Peak | null {
  const peak = view.answer.peak?.(solution.dimensions);
  if (!peak) return null;
  const field = peak.fieldPerVolt === null ? null : peak.fieldPerVolt * voltage;
  const position: PeakPosition = { coordinate: null, value: null, unit: null, text: peak.position };
  return {
    field: fieldQuantity(field),
    currentDensity: densityQuantity(field === null ? null : field / view.medium.value, view.sheet),
    position,
    currentDensityPosition: position,
    per,
  };
}

function mediaPeak(view: MediaView, voltage: number, per: Peak["per"]): Peak | null {
  const { parallel, resistivities } = view;
  if (!parallel || !resistivities) return null;
  const { along } = parallel;
  // Both media share the field of the common flow; the better conductor carries the larger density.
  let total = 0;
  const parts = Array.from({ length: GRID }, (_, i) => along.extent * ((i + 0.5) / GRID));
  for (const x of parts) total += along.extent / GRID / along.section(x);
  const field = (x: number): number => voltage / (total * along.section(x) * (along.scale?.(x) ?? 1));
  const extreme = largest(field, [0, ...parts, along.extent]);
  const least = Object.entries(resistivities).reduce((best, entry) => (entry[1] < best[1] ? entry : best));
  const position = positionAt(along.coordinate, along.start, extreme.x, "m", along.line);
  return {
    field: fieldQuantity(extreme.value),
    currentDensity: densityQuantity(extreme.value / least[1], false),
    position,
    currentDensityPosition: { ...position, text: `${position.text}, in the ${least[0]}` },
    per,
  };
}

/** Places to look at: an even grid, and both ends of every piece of the law just inside it. */
function placesOf(
  conductor: Pick<AlongConductor, "law" | "flow"> | Pick<AcrossView["conductor"], "law" | "flow">,
): number[] {
  const { law, flow } = conductor;
  const places: number[] = [];
  for (let i = 0; i <= GRID; i++) places.push(i === GRID ? flow.extent : (flow.extent * i) / GRID);
  if (law.count > 1) {
    for (let piece = 0; piece < law.count; piece++) {
      const from = law.from[piece];
      places.push(from + law.width[piece] * 1e-9, from + law.width[piece] * (1 - 1e-9));
    }
  }
  for (const hint of law.hints ?? []) places.push(hint);
  const breaks = "breaks" in flow ? (flow.breaks ?? []) : [];
  places.push(...breaks);
  return places.filter((x) => x >= 0 && x <= flow.extent).sort((a, b) => a - b);
}

/** The largest value over the places, refined between the neighbours of the best one. */
function largest(f: (x: number) => number, places: readonly number[]): Extreme {
  let best = 0;
  let least = Infinity;
  const values = places.map(f);
  for (let i = 0; i < values.length; i++) {
    if (values[i] > values[best]) best = i;
    least = Math.min(least, values[i]);
  }
  if (values[best] - least <= FLAT * values[best]) return { value: values[best], x: null };
  let value = values[best];
  let x = places[best];
  let low = places[Math.max(0, best - 1)];
  let high = places[Math.min(places.length - 1, best + 1)];
  // A few golden sections; at an end or a jump they change nothing.
  const golden = (Math.sqrt(5) - 1) / 2;
  for (let i = 0; i < 40 && high > low; i++) {
    const left = high - golden * (high - low);
    const right = low + golden * (high - low);
    const atLeft = f(left);
    const atRight = f(right);
    if (atLeft > value) [value, x] = [atLeft, left];
    if (atRight > value) [value, x] = [atRight, right];
    if (atLeft >= atRight) high = right;
    else low = left;
  }
  return { value, x };
}

function coordinateUnit(name: string, view: AlongView): { unit: "m" | "rad" } {
  const { medium } = view;
  if (medium.kind === "graded" && medium.coordinate.name === name) return { unit: medium.coordinate.unit };
  return { unit: name.toLowerCase().includes("angle") ? "rad" : "m" };
}

function positionAt(
  coordinate: string,
  start: number,
  x: number | null,
  unit: "m" | "rad",
  line?: string,
  note?: string,
): PeakPosition {
  const where = line === undefined ? [] : [line];
  const notes = note === undefined ? [] : [note];
  if (x === null) {
    return { coordinate: null, value: null, unit: null, text: [line ?? "everywhere", ...notes].join(", ") };
  }
  const value = start + x;
  const text = [`${coordinate} = ${siText(value, unit, 6)}`, ...where, ...notes].join(", ");
  return { coordinate, value, unit, text };
}

function fieldQuantity(value: number | null): Peak["field"] {
  return { value, unit: "V/m", text: value === null ? "unbounded" : formatQuantity(value, "V/m") };
}

function densityQuantity(value: number | null, sheet: boolean): Peak["currentDensity"] {
  if (sheet) return { value, unit: "A/m", text: value === null ? "unbounded" : formatQuantity(value, "A/m") };
  return { value, unit: "A/m^2", text: value === null ? "unbounded" : formatQuantity(value, "A/m^2") };
}

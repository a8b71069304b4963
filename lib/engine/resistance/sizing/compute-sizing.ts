/** The dimension that gives a resistance: every solution in a range, each computed as any other request. */
import { InputError, pointerTo, Problems } from "../../failure";
import { Collected } from "../../medium/collected";
import { derivative } from "../../numeric/derivative";
import { brent, findRoots } from "../../numeric/find-roots";
import { formatQuantity } from "../../quantity/format-quantity";
import type { Dimensions, Resolved } from "../../shape/define-shape";
import { VaryingDimensions } from "../../shape/vary-dimensions";
import type { ComputeContext } from "../compute-context";
import { computeResistance } from "../compute-resistance";
import { Evaluator } from "../evaluator";
import { readMedia } from "../read-media";
import { solve } from "../solve";
import type { ResistanceResult } from "../result-schema";
import { readSizing, type ReadSizing } from "./read-sizing";
import { bare, searchGrid, TEXT_UNITS, unitOf } from "./search-range";
import type { SizingResult, SizingSolution } from "./sizing-schema";
import { endsByResolution, exactness, nearestDouble, roundTripText } from "./settle-solution";
import { findWholeNumbers } from "./whole-numbers";

/** A whole number meets the target where they differ by no more than a closed form's rounding. */
const MEETS = 1e-13;
/** The value of a search and of the finished answer differ by no more than this, unless a field solution steps in. */
const SAME = 1e-11;
const BETWEEN_LOOKS = 32;
const MOST_SOLUTIONS = 50;

interface Place {
  readonly x: number;
  /** ln(R/target) */
  readonly value: number;
}

/**
 * Finds the dimension.
 * @param request the body of `POST /sizing` as it arrived, without `record`.
 * @throws InputError for everything that the caller can get wrong, and where no value gives the target.
 */
export function computeSizing(request: unknown, context: ComputeContext): SizingResult {
  const problems = new Problems();
  const read = readSizing(request, context, problems);
  if (!read) throw new InputError(problems.list);
  const { dimension, range, target } = read;
  const evaluator = new Evaluator(read.source, [{ kind: "dimension", name: read.solveFor }], context);
  const overdue = context.overdue ?? (() => false);
  let looked = 0;
  const f = (x: number): number => {
    if (++looked % BETWEEN_LOOKS === 0 && overdue()) {
      throw new InputError([
        {
          pointer: "#/within",
          detail: `is too wide for the time a call may take: ${looked} values were tried.`,
        },
      ]);
    }
    return Math.log(evaluator.at([x]) / target);
  };
  const found =
    dimension.type === "integer" ? wholeNumbers(f, read, evaluator) : realNumbers(f, read, evaluator);
  const solutions: SizingSolution[] = [];
  let first: ResistanceResult | undefined;
  for (const { x, exact } of found) {
    const whole = dimension.type === "integer";
    const place = whole ? x : nearestDouble(f, sharpened(x, read, context), read);
    const value = bare(place, dimension);
    const dimensions = { ...(read.body.dimensions as Record<string, unknown>), [read.solveFor]: value };
    const result = computeResistance({ ...read.body, dimensions }, context);
    first ??= result;
    const settled = whole
      ? { exact, cautions: [] }
      : exactness(result.resistance, result.method === "field", f, place, read);
    solutions.push(solution(result, place, value, settled, read, evaluator));
  }
  if (!first) throw new Error("a search without solutions was not refused");
  return {
    shape: first.shape,
    solveFor: read.solveFor,
    target: { value: target, unit: "ohm", text: formatQuantity(target, "ohm") },
    within: [range.from, range.to].map((x) => shown(x, read)),
    solutions,
    assumptions: first.assumptions,
    sources: first.sources,
    materials: first.materials,
    engine: first.engine,
    catalogue: first.catalogue,
  };
}

function realNumbers(
  f: (x: number) => number,
  read: ReadSizing,
  evaluator: Evaluator,
): { x: number; exact: boolean }[] {
  const grid = searchGrid(read.range, read.source.shape, read.reader, read.source.body.dimensions);
  const { roots, low, high, ends } = findRoots(f, grid);
  if (!ends) throw refuseRange(read, evaluator, grid[Math.floor(grid.length / 2)]);
  if (high.value - low.value <= 1e-12) {
    throw new InputError([
      {
        pointer: "#/solveFor",
        detail: `does not change the resistance, which is ${ohms(low, read)} for every ${read.solveFor}.`,
      },
    ]);
  }
  if (roots.length === 0) throw refuseTarget(read, f, evaluator, ends, [low, high]);
  return roots.slice(0, MOST_SOLUTIONS).map((x) => ({ x, exact: true }));
}

function wholeNumbers(
  f: (x: number) => number,
  read: ReadSizing,
  evaluator: Evaluator,
): { x: number; exact: boolean }[] {
  const { from, to } = read.range;
  const { found, ends, low, high } = findWholeNumbers(
    f,
    Math.ceil(from),
    Math.floor(to),
    (_, value) => Math.abs(value) <= MEETS,
  );
  if (!ends) throw refuseRange(read, evaluator, Math.ceil(from));
  if (found.length === 0) throw refuseTarget(read, f, evaluator, ends, [low, high]);
  return found.slice(0, MOST_SOLUTIONS).map(({ n, exact }) => ({ x: n, exact }));
}

/**
 * Where a field solution takes the formula's place in the finished answer the root moves a little: it is found again on
 * the answer itself, as far as its mesh lets it be smooth.
 */
function sharpened(
  x: number,
  { source, solveFor, target, range }: ReadSizing,
  context: ComputeContext,
): number {
  const { shape, body, temperatureC } = source;
  if (shape.answer.kind !== "factor" || !shape.answer.planIsWhole) return x;
  const varying = new VaryingDimensions(shape, body.dimensions, [solveFor]);
  const value = (at: number): number => {
    const dimensions: Resolved<Dimensions> | null = varying.at([at]);
    if (!dimensions) return Number.NaN;
    const media = readMedia(shape, body, dimensions, temperatureC, context, new Collected(), new Problems());
    return media ? Math.log(solve(shape, dimensions, media).value / target) : Number.NaN;
  };
  const here = { x, value: value(x) };
  if (!(Math.abs(here.value) > SAME)) return x;
  for (let reach = 4 * Math.abs(here.value); reach < 0.5; reach *= 4) {
    for (const side of [1 + reach, 1 / (1 + reach)]) {
      const at = x * side;
      if (at < range.from || at > range.to) continue;
      const there = { x: at, value: value(at) };
      if (there.value * here.value < 0) return brent(value, here, there);
    }
  }
  return x;
}

function solution(
  result: ResistanceResult,
  x: number,
  value: number,
  settled: { readonly exact: boolean; readonly cautions: readonly string[] },
  read: ReadSizing,
  evaluator: Evaluator,
): SizingSolution {
  const { dimension } = read;
  const slope =
    dimension.type === "integer"
      ? nextDifference(evaluator, x)
      : derivative((at) => evaluator.at([at]), x, 0.01 * Math.abs(x)).value;
  const sensitivity = unitOf(dimension) === "deg" ? (slope * Math.PI) / 180 : slope;
  if (!Number.isFinite(sensitivity)) {
    throw new InputError([
      { pointer: "#/solveFor", detail: "has a sensitivity there that a double cannot hold." },
    ]);
  }
  const { resistance, conductance, method, operating, quadrature, uncertainty, verdict, cautions } = result;
  const { peak, steps, profile, checks } = result;
  return {
    dimension: { value, unit: unitOf(dimension), text: roundTripText(value, x, evaluator, read) },
    resistance,
    sensitivity,
    exact: settled.exact,
    conductance,
    method,
    operating,
    quadrature,
    uncertainty,
    verdict,
    peak,
    steps,
    profile,
    checks,
    cautions: [...cautions, ...settled.cautions],
  };
}

/** What one more changes, or the last one did; 0 where no other whole number is admitted. */
function nextDifference(evaluator: Evaluator, n: number): number {
  const here = evaluator.at([n]);
  const after = evaluator.at([n + 1]) - here;
  if (Number.isFinite(after)) return after;
  const before = here - evaluator.at([n - 1]);
  return Number.isNaN(before) ? 0 : before;
}

function shown(x: number, read: ReadSizing): SizingResult["within"][number] {
  const unit = unitOf(read.dimension);
  const value = bare(x, read.dimension);
  return { value, unit, text: formatQuantity(value, TEXT_UNITS[unit], { digits: 6 }) };
}

function ohms(place: Place, { target }: ReadSizing): string {
  return formatQuantity(target * Math.exp(place.value), "ohm");
}

/** Nothing gives the target: the resistances at both ends, and between them where they are not the extremes. */
function refuseTarget(
  read: ReadSizing,
  f: (x: number) => number,
  evaluator: Evaluator,
  ends: readonly [Place, Place],
  [low, high]: readonly [Place, Place],
): InputError {
  const at = (place: Place): string =>
    `${ohms(place, read)} at ${read.solveFor} = ${roundTripText(bare(place.x, read.dimension), place.x, evaluator, read)}`;
  const inner = (place: Place): boolean => ends.every((end) => Math.abs(end.value - place.value) > 1e-9);
  // Only the extreme towards the target has been searched for closely.
  const between = [
    ...(!(high.value < 0) && inner(low) ? [`a minimum of ${at(low)}`] : []),
    ...(!(low.value > 0) && inner(high) ? [`a maximum of ${at(high)}`] : []),
  ];
  const nearest = Math.abs(ends[0].value) < Math.abs(ends[1].value) ? ends[0] : ends[1];
  const finer = read.dimension.type === "integer" ? "" : endsByResolution(f, nearest.x, read);
  return new InputError([
    {
      pointer: "#/target",
      detail: `is not reached: the resistance is ${at(ends[0])} and ${at(ends[1])}${between.length === 0 ? "" : `, and between them ${between.join(" and ")}`}.${finer}`,
    },
  ]);
}

/** No value in the range is admitted at all. */
function refuseRange(read: ReadSizing, evaluator: Evaluator, x: number): InputError {
  const why = evaluator.refusal([x]);
  const own = pointerTo("#/dimensions", read.solveFor);
  if (why && why.pointer !== own && !why.pointer.startsWith("#/dimensions")) return new InputError([why]);
  const reason = why ? ` ${why.pointer.slice(2).replaceAll("/", ".")} ${why.detail}` : "";
  return new InputError([
    {
      pointer: read.givenWithin ? "#/within" : "#/solveFor",
      detail: `has no value that the shape admits with the other dimensions: at ${read.solveFor} = ${shown(x, read).text}${reason}`,
    },
  ]);
}

/**
 * Globally adaptive quadrature with the 10-point Gauss and 21-point Kronrod rules and the error estimate of QUADPACK
 * (Piessens, de Doncker-Kapenga, Überhuber, Kahaner 1983). The worst segment is halved until the estimated error is
 * at most relative·|value| or the evaluations run out; running out is a status, never a silent number.
 */
import { CompensatedSum } from "./compensated-sum";

/** |true − value| ≤ error as far as the estimate can tell, where status is `converged` error ≤ the tolerance asked for. */
export interface Integral {
  readonly value: number;
  readonly error: number;
  readonly evaluations: number;
  readonly status: "converged" | "limit";
}

export interface IntegrateOptions {
  /** Relative tolerance, 1e-12 by default; not below 5e-14, the rounding of the rule itself. */
  readonly relative?: number;
  /** Absolute tolerance, 0 by default; the larger of the two counts. */
  readonly absolute?: number;
  /** Cap on evaluations beyond the first pass over all segments, 20,000 by default. */
  readonly evaluations?: number;
  /**
   * Places where the integrand jumps, has a kink or changes fast. A jump must be given: one that lies within 0.2 % of a
   * segment's end is beyond the outermost node and cannot be seen.
   */
  readonly breaks?: readonly number[];
}

/** Segments of pieces of a function f(piece, t): each runs from t = start over its width, so that thin ones keep digits. */
export interface Segments {
  readonly piece: number[];
  readonly start: number[];
  readonly width: number[];
}

const NODES = [
  0.995657163025808080735527280689003, 0.973906528517171720077964012084452,
  0.930157491355708226001207180059508, 0.865063366688984510732096688423493,
  0.780817726586416897063717578345042, 0.679409568299024406234327365114874,
  0.562757134668604683339000099272694, 0.433395394129247190799265943165784,
  0.294392862701460198131126603103866, 0.14887433898163121088482600112972, 0,
];
const KRONROD = [
  0.011694638867371874278064396062192, 0.03255816230796472747881897245939, 0.05475589657435199603138130024458,
  0.07503967481091995276704314091619, 0.093125454583697605535065465083366,
  0.109387158802297641899210590325805, 0.123491976262065851077958109585166,
  0.134709217311473325928054001771707, 0.142775938577060080797094273138717,
  0.147739104901338491374841515972068, 0.149445554002916905664936468389821,
];
const GAUSS = [
  0.066671344308688137593568809893332, 0.149451349150580593145863396957698,
  0.219086362515982043995534934228163, 0.269266719309996355091226921569469,
  0.295524224714752870173815619188769,
];

const EPSILON = Number.EPSILON;
/** Scratch for the values of one rule at each depth of nesting: an integrand may itself be an integral. */
const scratch: Float64Array[] = [];
let nesting = 0;

interface RuleResult {
  value: number;
  error: number;
}

/** One 21-point rule with its error estimate. */
function kronrod21(
  f: (piece: number, t: number) => number,
  piece: number,
  start: number,
  width: number,
): RuleResult {
  const values = (scratch[nesting] ??= new Float64Array(20));
  nesting++;
  try {
    return applyRule(f, piece, start, width, values);
  } finally {
    nesting--;
  }
}

function applyRule(
  f: (piece: number, t: number) => number,
  piece: number,
  start: number,
  width: number,
  values: Float64Array,
): RuleResult {
  const half = width / 2;
  const center = start + half;
  const middle = f(piece, center);
  let kronrod = middle * KRONROD[10];
  let gauss = 0;
  let absolute = Math.abs(kronrod);
  for (let j = 0; j < 10; j++) {
    // Measured from the start, so that a segment at 0 sees its first nodes without cancellation.
    const low = f(piece, start + half * (1 - NODES[j]));
    const high = f(piece, center + half * NODES[j]);
    values[2 * j] = low;
    values[2 * j + 1] = high;
    kronrod += KRONROD[j] * (low + high);
    absolute += KRONROD[j] * (Math.abs(low) + Math.abs(high));
    if (j % 2 === 1) gauss += GAUSS[(j - 1) / 2] * (low + high);
  }
  const mean = kronrod / 2;
  let spread = KRONROD[10] * Math.abs(middle - mean);
  for (let j = 0; j < 10; j++) {
    spread += KRONROD[j] * (Math.abs(values[2 * j] - mean) + Math.abs(values[2 * j + 1] - mean));
  }
  absolute *= half;
  spread *= half;
  let error = Math.abs((kronrod - gauss) * half);
  if (spread !== 0 && error !== 0) error = spread * Math.min(1, Math.pow((200 * error) / spread, 1.5));
  error = Math.max(error, 50 * EPSILON * absolute);
  return { value: kronrod * half, error };
}

/** Integrates f over segments of its pieces. Throws whatever f throws. */
export function integrateSegments(
  f: (piece: number, t: number) => number,
  segments: Segments,
  options: IntegrateOptions = {},
): Integral {
  const relative = Math.max(options.relative ?? 1e-12, 5e-14);
  const cap = options.evaluations ?? 20_000;
  const piece = [...segments.piece];
  const start = [...segments.start];
  const width = [...segments.width];
  const value: number[] = [];
  const error: number[] = [];
  let evaluations = 0;
  for (let i = 0; i < piece.length; i++) {
    const result = kronrod21(f, piece[i], start[i], width[i]);
    value.push(result.value);
    error.push(result.error);
    evaluations += 21;
  }
  const most = evaluations + cap;
  for (;;) {
    const total = sum(value);
    const doubt = sum(error);
    const tolerance = Math.max(options.absolute ?? 0, relative * Math.abs(total));
    if (doubt <= tolerance) return { value: total, error: doubt, evaluations, status: "converged" };
    if (!Number.isFinite(total)) return { value: total, error: Infinity, evaluations, status: "limit" };
    const worst = worstSegment(start, width, value, error);
    // What is left is rounding: halving the worst segments further cannot help.
    if (worst < 0) return { value: total, error: doubt, evaluations, status: "limit" };
    if (evaluations + 42 > most) return { value: total, error: doubt, evaluations, status: "limit" };
    const half = width[worst] / 2;
    const left = kronrod21(f, piece[worst], start[worst], half);
    const right = kronrod21(f, piece[worst], start[worst] + half, half);
    evaluations += 42;
    piece.push(piece[worst]);
    start.push(start[worst] + half);
    width.push(half);
    value.push(right.value);
    error.push(right.error);
    width[worst] = half;
    value[worst] = left.value;
    error[worst] = left.error;
  }
}

/**
 * Integrates f from a to b (a ≤ b).
 * @returns value and error estimate; `limit` where the tolerance was not reached within the cap.
 */
export function integrate(
  f: (x: number) => number,
  a: number,
  b: number,
  options: IntegrateOptions = {},
): Integral {
  const cuts = [...new Set([...(options.breaks ?? []).filter((x) => x > a && x < b), b])].sort(
    (x, y) => x - y,
  );
  const segments: Segments = { piece: [], start: [], width: [] };
  let from = a;
  for (const cut of cuts) {
    segments.piece.push(0);
    segments.start.push(from);
    segments.width.push(cut - from);
    from = cut;
  }
  return integrateSegments((_, t) => f(t), segments, options);
}

function sum(terms: readonly number[]): number {
  const total = new CompensatedSum();
  for (const term of terms) total.add(term);
  return total.value;
}

/** The segment of largest error that is not yet at the rounding floor and can still be halved; -1 if there is none. */
function worstSegment(
  start: readonly number[],
  width: readonly number[],
  value: readonly number[],
  error: readonly number[],
): number {
  let worst = -1;
  for (let i = 0; i < error.length; i++) {
    if (worst >= 0 && error[i] <= error[worst]) continue;
    if (error[i] <= 60 * EPSILON * Math.abs(value[i])) continue;
    if (width[i] <= 4 * EPSILON * Math.abs(start[i] + width[i])) continue;
    worst = i;
  }
  return worst;
}

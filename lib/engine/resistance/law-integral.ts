/**
 * Integrals of a graded medium's law times a weight of the shape, over all or part of the coordinate's range, piece by
 * piece of the law.
 */
import { integratePieces, MANY, type PieceHints } from "../numeric/piecewise-integral";
import type { IntegrateOptions, Integral, Segments } from "../numeric/gauss-kronrod";
import { findInterval } from "../medium/interpolation";
import type { ProfileLaw } from "../medium/profile";

/** A law gave a value that no medium can have, at x past the coordinate's start. */
export class UnfitValue extends Error {
  constructor(
    readonly x: number,
    readonly value: number,
  ) {
    super(`The medium has the value ${value} at ${x}.`);
    this.name = "UnfitValue";
  }
}

/** Evaluations that an integral may spend: fewer where one value is costly, so that no request blocks for long. */
export function evaluationCap(law: ProfileLaw): number {
  return Math.round(20_000 / Math.max(1, (law.cost ?? 1) / 5));
}

/**
 * The pieces of a law cut at the hints and breaks, between two places x0 < x1 of the range. Thin pieces keep their own
 * widths: nothing is subtracted that was given.
 */
export function segmentsOf(
  law: ProfileLaw,
  cuts: readonly number[],
  x0: number,
  x1: number,
  extent: number,
): Segments {
  const segments: Segments = { piece: [], start: [], width: [] };
  const whole = x0 <= 0 && x1 >= extent;
  const first = whole ? 0 : pieceAt(law, x0);
  const last = whole ? law.count - 1 : pieceAt(law, x1);
  for (let piece = first; piece <= last; piece++) {
    const origin = law.from[piece];
    const size = law.width[piece];
    let from = !whole && piece === first ? Math.max(0, x0 - origin) : 0;
    const end = !whole && piece === last ? Math.min(size, x1 - origin) : size;
    for (const cut of cuts) {
      const t = cut - origin;
      if (t <= from || t >= end) continue;
      segments.piece.push(piece);
      segments.start.push(from);
      segments.width.push(t - from);
      from = t;
    }
    if (end > from) {
      segments.piece.push(piece);
      segments.start.push(from);
      segments.width.push(end - from);
    }
  }
  return segments;
}

/** Index of the piece that holds x. */
export function pieceAt(law: ProfileLaw, x: number): number {
  if (law.count === 1) return 0;
  const i = findInterval(law.from, x);
  return i === law.count - 2 && x >= law.from[law.count - 1] ? law.count - 1 : i;
}

/** Relative error estimate up to which an integral counts as converged; it aims at a hundredth of it. */
export const PROMISED_ACCURACY = 1e-10;

/** Of so many pieces of a very long law one is integrated again. */
const SAMPLING = 8;

export interface LawIntegralParts {
  readonly law: ProfileLaw;
  readonly extent: number;
  /** The integrand at t past the start of a piece. */
  readonly density: (piece: number, t: number) => number;
  /** The shape's factor in it at x, for how much it varies inside a piece. */
  readonly weight: (x: number) => number;
  /** Places where the weight has a kink or changes fast. */
  readonly breaks?: readonly number[];
}

export class LawIntegral {
  /** Places where the law or the weight changes fast, increasing. */
  private readonly cuts: readonly number[];

  constructor(private readonly parts: LawIntegralParts) {
    const hints = parts.law.hints ?? [];
    const breaks = parts.breaks ?? [];
    this.cuts = hints.length + breaks.length === 0 ? [] : [...hints, ...breaks].sort((a, b) => a - b);
  }

  /** The integral over the whole range. @throws UnfitValue where the law leaves what a medium can have. */
  total(options: IntegrateOptions = {}): Integral {
    return this.between(0, this.parts.extent, options);
  }

  /** The integral between two places of the range. */
  between(x0: number, x1: number, options: IntegrateOptions = {}): Integral {
    const { law, density, extent } = this.parts;
    const segments = segmentsOf(law, this.cuts, x0, x1, extent);
    const cap = { evaluations: evaluationCap(law), ...options };
    return settled(integratePieces(density, segments, this.hints(0), cap));
  }

  /**
   * The total by another route: inside each piece t = width·(3v² − 2v³), which moves every node. For laws of very many
   * pieces every eighth one is integrated with other nodes, and the total taken in that proportion.
   */
  secondTotal(first: Integral): Integral {
    const { law, density } = this.parts;
    if (law.count > MANY * SAMPLING) return this.sampledTotal(first);
    let value = 0;
    let error = 0;
    let evaluations = 0;
    let status: Integral["status"] = "converged";
    for (let piece = 0; piece < law.count; piece++) {
      const width = law.width[piece];
      const cuts = this.cuts.map((cut) => inverseBlend((cut - law.from[piece]) / width));
      const part = integratePieces(
        (index, v) => density(index, width * blend(v)) * width * 6 * v * (1 - v),
        cutUnit(piece, cuts),
        {},
        { evaluations: evaluationCap(law), relative: 1e-11 },
      );
      value += part.value;
      error += part.error;
      evaluations += part.evaluations;
      if (part.status === "limit") status = "limit";
    }
    return { value, error, evaluations, status };
  }

  private sampledTotal(first: Integral): Integral {
    const { law, density, extent } = this.parts;
    const all = segmentsOf(law, this.cuts, 0, extent, extent);
    const sample: Segments = { piece: [], start: [], width: [] };
    for (let i = 0; i < all.piece.length; i += SAMPLING) {
      sample.piece.push(all.piece[i]);
      sample.start.push(all.start[i]);
      sample.width.push(all.width[i]);
    }
    const cap = { evaluations: evaluationCap(law) };
    const same = integratePieces(density, sample, this.hints(0), cap);
    const other = integratePieces(density, sample, this.hints(1), cap);
    const scale = first.value / same.value;
    return { ...other, value: other.value * scale, error: other.error * scale };
  }

  private hints(extraPoints: number): PieceHints {
    const { law, weight } = this.parts;
    const { spread } = law;
    if (!spread) return { extraPoints };
    return {
      extraPoints,
      smoothness: law.smoothness,
      spread: (piece, start, width) => {
        const a = weight(law.from[piece] + start);
        const b = weight(law.from[piece] + start + width);
        return spread(piece) * (a > b ? a / b : b / a);
      },
    };
  }
}

/** An integral that missed its own goal but reached the accuracy promised has converged all the same. */
function settled(integral: Integral): Integral {
  const good = integral.error <= PROMISED_ACCURACY * Math.abs(integral.value);
  return good && integral.status === "limit" ? { ...integral, status: "converged" } : integral;
}

function cutUnit(piece: number, cuts: readonly number[]): Segments {
  const segments: Segments = { piece: [], start: [], width: [] };
  let from = 0;
  for (const cut of [...cuts, 1]) {
    if (cut <= from || cut > 1) continue;
    segments.piece.push(piece);
    segments.start.push(from);
    segments.width.push(cut - from);
    from = cut;
  }
  return segments;
}

function blend(v: number): number {
  return v * v * (3 - 2 * v);
}

/** The v with blend(v) = u, near enough for a cut. */
function inverseBlend(u: number): number {
  return u <= 0 ? 0 : u >= 1 ? 1 : 0.5 - Math.sin(Math.asin(1 - 2 * u) / 3);
}

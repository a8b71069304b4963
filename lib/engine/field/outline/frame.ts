import { LENGTH_UNITS_M, type LengthUnit } from "./length-units";

/**
 * The domain's frame: x' = (x − origin) / scale with a power of two as scale, so that the largest extent lies in
 * (0.5, 1]. The division is exact; the subtraction rounds a coordinate by at most 2^-53 of the larger of itself and the
 * difference, that is, by no more than 1.2e-16 of the extent, and not at all where both are short binary fractions of
 * the extent. Everything is checked after this step, on the very numbers that are meshed.
 */
export interface Frame {
  readonly originX: number;
  readonly originY: number;
  /** Outline units in one unit of the domain. */
  readonly scale: number;
  readonly unit: LengthUnit;
  /** Metres in one unit of the domain. */
  readonly unitM: number;
  /** Largest extent in units of the domain. */
  readonly extent: number;
  /** Rounding of the coordinates as submitted, in units of the domain: nothing smaller means anything. */
  readonly grain: number;
  /** Features nearer than this touch, in units of the domain. */
  readonly touch: number;
  /** How far off the boundary a point given as lying on it may be, in units of the domain. */
  readonly snap: number;
}

export interface Box {
  minX: number;
  minY: number;
  maxX: number;
  maxY: number;
}

/** Relative distance below which two features touch, and within which a terminal must follow the boundary (2-api). */
const TOUCH = 1e-12;
const SNAP = 1e-9;

/** Frame for an outline within a box. For axisymmetric outlines the axis x = 0 stays where it is. */
export function frameFor(box: Box, unit: LengthUnit, axisymmetric: boolean): Frame {
  const width = axisymmetric ? box.maxX : box.maxX - box.minX;
  const extent = Math.max(width, box.maxY - box.minY);
  const scale = powerOfTwoAtLeast(extent);
  const grid = scale / 8;
  const originX = axisymmetric ? 0 : grid * Math.round((0.5 * box.minX + 0.5 * box.maxX) / grid);
  const originY = grid * Math.round((0.5 * box.minY + 0.5 * box.maxY) / grid);
  const largest = Math.max(Math.abs(box.minX), Math.abs(box.maxX), Math.abs(box.minY), Math.abs(box.maxY));
  const grain = (4 * 2 ** -53 * Math.max(largest, extent)) / scale;
  const relative = extent / scale;
  const touch = Math.max(TOUCH * relative, 8 * grain);
  return {
    originX,
    originY,
    scale,
    unit,
    unitM: scale * LENGTH_UNITS_M[unit],
    extent: relative,
    grain,
    touch,
    snap: Math.max(SNAP * relative, touch),
  };
}

function powerOfTwoAtLeast(x: number): number {
  let p = 2 ** Math.ceil(Math.log2(x));
  while (p < x) p *= 2;
  while (p / 2 >= x) p /= 2;
  return p;
}

export function toDomainX(frame: Frame, x: number): number {
  return (x - frame.originX) / frame.scale;
}

export function toDomainY(frame: Frame, y: number): number {
  return (y - frame.originY) / frame.scale;
}

/** A number for people: nine significant digits at most. */
export function showNumber(x: number): string {
  return String(Number(x.toPrecision(9)));
}

/** A point of the outline as submitted, for people: "(10, 2.5)" in the outline's unit. */
export function showPoint(x: number, y: number): string {
  return `(${showNumber(x)}, ${showNumber(y)})`;
}

/** A point of the domain in the outline's unit, rounded to what the frame can tell, so that a zero is one. */
export function submittedPoint(frame: Frame, x: number, y: number): [number, number] {
  const digit = frame.scale * 1e-11;
  const rounded = (z: number) => Number((Math.round(z / digit) * digit).toPrecision(12));
  return [rounded(x * frame.scale + frame.originX), rounded(y * frame.scale + frame.originY)];
}

/** A point of the domain, for people, in the outline's unit. */
export function showDomainPoint(frame: Frame, x: number, y: number): string {
  return showPoint(...submittedPoint(frame, x, y));
}

/** A length of the domain, for people: "0.3 mm". */
export function showLength(frame: Frame, length: number): string {
  return `${Number((length * frame.scale).toPrecision(3))} ${frame.unit}`;
}

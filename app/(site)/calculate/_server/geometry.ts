import "server-only";
import {
  InputError,
  readableDrawing,
  resolveDimensions,
  shapeEntry,
  type Drawing,
  type Problem,
  type Shape,
} from "@/lib/engine";
import { dimensionTexts } from "./dimension-texts";

/** What a page needs of a shape's dimensions beside the answer: its drawing, every member's value, the ranges. */
export interface Geometry {
  readonly drawing: Drawing;
  /** Whether the drawing has the proportions of the dimensions. */
  readonly toScale: boolean;
  /** Symbol and value for each dimension line. */
  readonly labels: Readonly<Record<string, { readonly symbol: string; readonly value: string }>>;
  /** Value of every name that the request may use, in the entry's unit; choices are left out. */
  readonly values: Readonly<Record<string, number>>;
  /** Where each coordinate starts and ends, m or degrees. */
  readonly ranges: Readonly<Record<string, CoordinateSpan>>;
}

export interface CoordinateSpan {
  readonly unit: "m" | "deg";
  readonly start: number;
  readonly extent: number;
}

export type GeometryReading =
  | { readonly ok: true; readonly geometry: Geometry }
  | { readonly ok: false; readonly errors: readonly Problem[] };

/** Draws a shape with the dimensions of a request. */
export function readGeometry(shape: Shape, dimensions: Readonly<Record<string, unknown>>): GeometryReading {
  try {
    const resolved = resolveDimensions(shape, dimensions);
    const spans = coordinateSpans(shape, resolved);
    const { labels, values } = dimensionTexts(shape, shapeEntry(shape), resolved, dimensions);
    const { drawing, toScale } = readableDrawing(shape, resolved);
    return { ok: true, geometry: { drawing, toScale, labels, values, ranges: spans } };
  } catch (error) {
    if (error instanceof InputError) return { ok: false, errors: error.errors };
    throw error;
  }
}

type ResolvedDimensions = ReturnType<typeof resolveDimensions>;

function coordinateSpans(shape: Shape, resolved: ResolvedDimensions): Record<string, CoordinateSpan> {
  const spans: Record<string, CoordinateSpan> = {};
  for (const flow of flowsOf(shape, resolved)) {
    const coordinate = shape.coordinates.find(({ name }) => name === flow.coordinate);
    const factor = coordinate?.unit === "rad" ? 180 / Math.PI : 1;
    spans[flow.coordinate] = {
      unit: coordinate?.unit === "rad" ? "deg" : "m",
      start: flow.start * factor,
      extent: flow.extent * factor,
    };
  }
  return spans;
}

/** Coordinates of a shape with these dimensions, SI; none where no medium can vary in it. */
export function flowsOf(
  shape: Shape,
  resolved: ResolvedDimensions,
): readonly { readonly coordinate: string; readonly start: number; readonly extent: number }[] {
  const { answer } = shape;
  if (answer.kind === "flow") {
    const { along, across } = answer.flow(resolved);
    return [along, ...across];
  }
  if (answer.kind === "media" && answer.parallel) return [answer.parallel(resolved).along];
  return [];
}

/** The window onto the drawing plane: y points up in the plane, down on the screen. */
import type { Box } from "./edges";
import { type Point, tidy } from "./sketch";

export interface View {
  /** Point of the plane in the middle of the window, in the outline's unit. */
  readonly x: number;
  readonly y: number;
  /** Pixels for one unit. */
  readonly scale: number;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

const LEAST_SCALE = 1e-15;
const MOST_SCALE = 1e15;

export function toScreen(view: View, size: Size, [x, y]: Point): Point {
  return [size.width / 2 + (x - view.x) * view.scale, size.height / 2 - (y - view.y) * view.scale];
}

export function toPlane(view: View, size: Size, [px, py]: Point): Point {
  return [view.x + (px - size.width / 2) / view.scale, view.y - (py - size.height / 2) / view.scale];
}

/** The view that shows a box with a margin in pixels around it. */
export function fitView(box: Box | null, size: Size, margin: number): View {
  if (!box) return { x: 20, y: 20, scale: Math.min(size.width, size.height) / 60 };
  const [width, height] = [box.maxX - box.minX, box.maxY - box.minY];
  const inner = (length: number) => Math.max(40, length - 2 * margin);
  const scale = Math.min(
    inner(size.width) / Math.max(width, height * 1e-9, Number.MIN_VALUE),
    inner(size.height) / Math.max(height, width * 1e-9, Number.MIN_VALUE),
  );
  return {
    x: (box.minX + box.maxX) / 2,
    y: (box.minY + box.maxY) / 2,
    scale: Number.isFinite(scale) && scale > 0 ? scale : 10,
  };
}

/** Zooms so that the point under the pointer stays there. */
export function zoomAt(view: View, size: Size, at: Point, factor: number): View {
  const scale = Math.min(MOST_SCALE, Math.max(LEAST_SCALE, view.scale * factor));
  const [x, y] = toPlane(view, size, at);
  const ratio = view.scale / scale;
  return { x: x + (view.x - x) * ratio, y: y + (view.y - y) * ratio, scale };
}

export function panBy(view: View, dx: number, dy: number): View {
  return { ...view, x: view.x - dx / view.scale, y: view.y + dy / view.scale };
}

/** Step of the grid lines that are drawn: the grid's own, or so many times it that lines keep apart. */
export function shownStep(step: number, scale: number, apart = 9): number {
  let shown = step;
  for (let k = 0; shown * scale < apart && k < 60; k++) shown *= k % 3 === 1 ? 2.5 : 2;
  return shown;
}

/** The nearest point of the grid. */
export function snapTo(step: number, [x, y]: Point): Point {
  return [tidy(Math.round(x / step) * step), tidy(Math.round(y / step) * step)];
}

/** A round length, 1, 2 or 5 times a power of ten, that takes at most so many pixels. */
export function roundLength(scale: number, most: number): number {
  const length = most / scale;
  const power = 10 ** Math.floor(Math.log10(length));
  const digit = [5, 2, 1].find((d) => d * power <= length) ?? 1;
  return tidy(digit * power);
}

/** Length in drawing units of the board's scale bar. */
export function scaleBarLength(view: View, size: Size): number {
  return roundLength(view.scale, Math.min(160, size.width / 3));
}

/** Where the scale bar and its words begin, in pixels from the left; they stand at the right, on the lower edge. */
export function scaleBarStart(view: View, size: Size): number {
  return size.width - scaleBarLength(view, size) * view.scale - 80;
}

/** A grid step that suits a drawing: a round number near a fortieth of its extent. */
export function stepFor(box: Box | null): number {
  if (!box) return 1;
  const extent = Math.max(box.maxX - box.minX, box.maxY - box.minY);
  return extent > 0 ? roundLength(1, extent / 25) : 1;
}

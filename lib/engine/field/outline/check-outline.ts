import { arcBox, makeArc } from "./arc";
import { drawClear } from "./clearance";
import type { DrawnOutline } from "./draw";
import { EdgeIndex } from "./edge-index";
import { frameFor, showNumber, showPoint, type Box, type Frame } from "./frame";
import { mergeStretches } from "./merge-runs";
import { checkArcs, elementPoint, growBox, readRing } from "./read-ring";
import { edgeCount, type Ring } from "./ring";
import { readRegions } from "./region-net";
import { LENGTH_UNITS_M } from "./length-units";
import type { OutlineError, OutlineRequest, RingElement } from "./schema";
import { readStretches, type Stretch } from "./terminal-runs";
import { checkTerminalList } from "./terminal-list";

/** Most vertices of all rings together, those of regions included. */
export const MOST_VERTICES = 50_000;
const SMALLEST_EXTENT_M = 1e-12;
const LARGEST_M = 1e12;
/** The rounding of the coordinates may be this share of the extent at most. */
const COARSEST_GRAIN = 1e-6;
/** Complaints that are answered at most; a drawing that is wrong throughout needs no list of all its edges. */
const MOST_ERRORS = 50;
/** Chords of the check, in units of the domain; conflicts make them finer. */
export const CHECK_CHORDS = 1e-3;

/** An outline that has passed every check, with its terminals resolved. Give it to `buildDomain`. */
export interface CheckedOutline extends DrawnOutline {
  readonly terminalNames: readonly string[];
  /** What was put right without changing the shape, as sentences. */
  readonly repairs: readonly string[];
  /** Some edge is an arc, so that roles differ. */
  readonly curved: boolean;
}

export type OutlineCheck =
  | { readonly ok: true; readonly outline: CheckedOutline }
  | { readonly ok: false; readonly errors: readonly OutlineError[] };

/**
 * Checks an outline with its terminals, repairs what is harmless and refuses the rest with pointers into the request.
 * The request must have passed `outlineSchema` and `terminalSchema`. Takes n log n time; at most 50 complaints. An
 * outline that is only stored needs no terminals yet.
 */
export function checkOutline(
  request: OutlineRequest,
  { leastTerminals = 2 }: { readonly leastTerminals?: number } = {},
): OutlineCheck {
  const result = checkStepwise(request, leastTerminals);
  return result.ok ? result : { ok: false, errors: result.errors.slice(0, MOST_ERRORS) };
}

/** Later checks rest on earlier ones, so that a failed step may end the list. */
function checkStepwise(request: OutlineRequest, leastTerminals: number): OutlineCheck {
  const { outline, terminals } = request;
  const rings = [outline.outer, ...outline.holes];
  const pointers = rings.map((_, r) => ringPointer(r));
  const axisymmetric = outline.symmetry === "axisymmetric";
  const errors: OutlineError[] = [
    ...checkSize(request, rings),
    ...checkTerminalList(terminals, leastTerminals),
  ];
  if (errors.some((e) => e.pointer === "#/outline")) return { ok: false, errors };
  rings.forEach((ring, r) => errors.push(...checkCoordinates(ring, pointers[r], outline.unit)));
  if (errors.some((e) => e.pointer.startsWith("#/outline"))) return { ok: false, errors };
  const box: Box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity };
  for (const ring of rings) growBox(box, ring);
  if (axisymmetric) errors.push(...rings.flatMap((ring, r) => checkRadii(ring, pointers[r], box)));
  if (box.maxX === box.minX && box.maxY === box.minY) {
    errors.push({ pointer: pointers[0], detail: "The outline is a single point; it must enclose an area." });
    return { ok: false, errors };
  }
  const frame = frameFor(box, outline.unit, axisymmetric);
  errors.push(...checkExtent(frame));
  if (errors.some((e) => e.pointer.startsWith("#/outline"))) return { ok: false, errors };
  const repairs: string[] = [];
  const read: Ring[] = [];
  rings.forEach((ring, r) => {
    const clean = readRing(ring, r, pointers[r], frame, axisymmetric, errors, repairs);
    if (clean !== null) read.push(clean);
  });
  if (read.length < rings.length) return { ok: false, errors };
  return checkDrawing(read, frame, axisymmetric, request, errors, repairs);
}

function checkDrawing(
  rings: Ring[],
  frame: Frame,
  axisymmetric: boolean,
  request: OutlineRequest,
  errors: OutlineError[],
  repairs: string[],
): OutlineCheck {
  const names = request.terminals.map((terminal) => terminal.name);
  const index = new EdgeIndex(rings);
  const stretches = readStretches(request.terminals, rings, index, frame, errors);
  if (axisymmetric) errors.push(...stretches.flatMap((stretch) => checkAxis(stretch, rings[stretch.ring])));
  const runs = mergeStretches(stretches, rings, names, frame, errors);
  const curved = rings.some((ring) => ring.arcs.some((arc) => arc !== null));
  const leastChords = rings.map((ring) => new Int32Array(edgeCount(ring)));
  const outline: CheckedOutline = {
    frame,
    axisymmetric,
    rings,
    runs,
    regions: readRegions(request.regions ?? [], rings, runs, index, frame, errors),
    leastChords,
    terminalNames: names,
    repairs,
    curved,
  };
  const nominal = drawClear(outline, "nominal", CHECK_CHORDS);
  errors.push(...nominal.errors);
  if (curved && nominal.errors.length === 0) {
    const upper = drawClear(outline, "upper", CHECK_CHORDS);
    errors.push(
      ...(upper.errors.length > 0 ? upper.errors : drawClear(outline, "lower", CHECK_CHORDS).errors),
    );
  }
  return errors.length > 0 ? { ok: false, errors } : { ok: true, outline };
}

function ringPointer(r: number): string {
  return r === 0 ? "#/outline/outer" : `#/outline/holes/${r - 1}`;
}

function checkSize(request: OutlineRequest, rings: ReadonlyArray<readonly RingElement[]>): OutlineError[] {
  const errors: OutlineError[] = [];
  let vertices = 0;
  rings.forEach((ring, r) => {
    vertices += ring.length;
    if (ring.length >= 3 || ring.some((element) => !Array.isArray(element))) return;
    const title = r === 0 ? "outer ring" : `hole ${r - 1}`;
    errors.push({
      pointer: ringPointer(r),
      detail: `The ${title} has ${ring.length} ${ring.length === 1 ? "point" : "points"}; a ring needs at least three, or an arc.`,
    });
  });
  for (const region of request.regions ?? []) vertices += region.length;
  if (vertices > MOST_VERTICES) {
    errors.push({
      pointer: "#/outline",
      detail: `The outline has ${vertices} vertices, regions included; at most ${MOST_VERTICES} are allowed.`,
    });
  }
  return errors;
}

function checkCoordinates(
  ring: readonly RingElement[],
  pointer: string,
  unit: OutlineRequest["outline"]["unit"],
): OutlineError[] {
  const errors: OutlineError[] = [];
  const limit = LARGEST_M / LENGTH_UNITS_M[unit];
  ring.forEach((element, i) => {
    const points = Array.isArray(element) ? [element] : [element.arcTo, element.center];
    const far = points.find(([x, y]) => !(Math.abs(x) <= limit && Math.abs(y) <= limit));
    if (far === undefined || errors.length >= 20) return;
    errors.push({
      pointer: `${pointer}/${i}`,
      detail: `The point ${showPoint(...far)} lies too far out; coordinates go up to 1e12 m (${showNumber(limit)} ${unit}).`,
    });
  });
  return errors.length > 0 ? errors : checkArcs(ring, pointer);
}

function checkExtent(frame: Frame): OutlineError[] {
  const extentM = frame.extent * frame.unitM;
  const pointer = "#/outline/outer";
  if (!(extentM >= SMALLEST_EXTENT_M && extentM <= LARGEST_M)) {
    const detail = `The outline's largest extent is ${showNumber(extentM)} m; allowed are 1e-12 m to 1e12 m.`;
    return [{ pointer, detail }];
  }
  if (frame.grain <= COARSEST_GRAIN * frame.extent) return [];
  const detail =
    `The outline lies so far from the origin, for its size, that its coordinates cannot tell its features apart. ` +
    `Move it nearer to the origin.`;
  return [{ pointer, detail }];
}

/** Axisymmetric: no point of the outline has a negative radius. */
function checkRadii(ring: readonly RingElement[], pointer: string, box: Box): OutlineError[] {
  const errors: OutlineError[] = [];
  const slack = 1e-12 * Math.max(Math.abs(box.maxX), box.maxY - box.minY);
  ring.forEach((element, i) => {
    const [x, y] = elementPoint(element);
    let least = x;
    if (!Array.isArray(element)) {
      const [px, py] = elementPoint(ring[(i + ring.length - 1) % ring.length]);
      least = Math.min(x, arcBox(makeArc(px, py, x, y, ...element.center, element.clockwise)).minX);
    }
    if (least >= -slack || errors.length >= 20) return;
    const what = Array.isArray(element)
      ? `The point ${showPoint(x, y)} has`
      : `The arc to ${showPoint(x, y)} reaches`;
    errors.push({
      pointer: `${pointer}/${i}`,
      detail: `${what} the radius ${showNumber(least)}; in an axisymmetric outline x is the radius and may not be negative.`,
    });
  });
  return errors;
}

/** A terminal on the axis has no area: no current can enter there. */
function checkAxis(stretch: Stretch, ring: Ring): OutlineError[] {
  const n = edgeCount(ring);
  for (let edge = Math.floor(stretch.start); edge < stretch.end; edge++) {
    const a = edge % n;
    const b = (a + 1) % n;
    if (ring.arcs[a] !== null || ring.xy[2 * a] !== 0 || ring.xy[2 * b] !== 0 || stretch.start >= edge + 1)
      continue;
    const detail =
      "This stretch lies on the axis x = 0, where it has no area; a terminal must have a radius somewhere.";
    return [{ pointer: stretch.pointer, detail }];
  }
  return [];
}

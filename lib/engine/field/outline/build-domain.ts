import type { CheckedOutline } from "./check-outline";
import { drawClear } from "./clearance";
import type { Domain } from "./domain";
import type { Role } from "./draw";

export type { Role } from "./draw";

/** Sagitta of the chords, in units of the domain, unless the caller says otherwise. */
const DEFAULT_CHORDS = 1e-4;

const straight = new WeakMap<CheckedOutline, Domain>();

/**
 * The outline as straight segments in the domain's frame. Without arcs every role gives the same object. With arcs, "upper"
 * and "lower" give domains whose exact resistances are no smaller and no larger than that of the outline;
 * `chordTolerance` (units of the domain, 1e-12 … 0.1) says how far chords or tangents may stray from
 * an arc; it is taken coarser where the drawing would have more than 400,000 points.
 */
export function buildDomain(outline: CheckedOutline, role: Role, chordTolerance = DEFAULT_CHORDS): Domain {
  const known = straight.get(outline);
  if (known !== undefined) return known;
  const { drawing, errors } = drawClear(outline, outline.curved ? role : "nominal", chordTolerance);
  if (errors.length > 0) throw new Error(`a checked outline does not draw: ${errors[0].detail}`);
  if (!outline.curved) straight.set(outline, drawing.domain);
  return drawing.domain;
}

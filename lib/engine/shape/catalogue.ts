/** Every shape, family by family: the one list that pages, API, documents and clients are made from. */
import type { Shape } from "./define-shape";

// axial
import { bar } from "./axial/bar";

// tapered

// radial
import { cylindricalShell } from "./radial/cylindrical-shell";

// spreading

// sheet

// earthing

const axial: readonly Shape[] = [bar];
const tapered: readonly Shape[] = [];
const radial: readonly Shape[] = [cylindricalShell];
const spreading: readonly Shape[] = [];
const sheet: readonly Shape[] = [];
const earthing: readonly Shape[] = [];

export const catalogue: readonly Shape[] = [
  ...axial,
  ...tapered,
  ...radial,
  ...spreading,
  ...sheet,
  ...earthing,
];

const byId = new Map(catalogue.map((shape) => [shape.id, shape]));

/** The shape of that id, or undefined. */
export function findShape(id: string): Shape | undefined {
  return byId.get(id);
}

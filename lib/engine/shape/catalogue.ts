/** Every shape, family by family: the one list that pages, API, documents and clients are made from. */
import type { Shape } from "./define-shape";

// axial
import { bar } from "./axial/bar";
import { boxTube } from "./axial/box-tube";
import { cladWire } from "./axial/clad-wire";
import { etchedTrace } from "./axial/etched-trace";
import { flatSpiral } from "./axial/flat-spiral";
import { helicalWinding } from "./axial/helical-winding";
import { parallelPlates } from "./axial/parallel-plates";
import { prism } from "./axial/prism";
import { roundWire } from "./axial/round-wire";
import { strandedConductor } from "./axial/stranded-conductor";
import { tube } from "./axial/tube";
import { viaBarrel } from "./axial/via-barrel";

// tapered
import { coneFrustum } from "./tapered/cone-frustum";
import { taperedStrip } from "./tapered/tapered-strip";

// radial
import { arcBar } from "./radial/arc-bar";
import { bentTube } from "./radial/bent-tube";
import { confocalShell } from "./radial/confocal-shell";
import { conicalShell } from "./radial/conical-shell";
import { cylindricalShell } from "./radial/cylindrical-shell";
import { hyperbolicNeck } from "./radial/hyperbolic-neck";
import { sphericalShell } from "./radial/spherical-shell";
import { torusArc } from "./radial/torus-arc";

// spreading
import { contactSpot } from "./spreading/contact-spot";
import { cylinderInSquare } from "./spreading/cylinder-in-square";
import { cylinderPlane } from "./spreading/cylinder-plane";
import { eccentricCylinders } from "./spreading/eccentric-cylinders";
import { ellipticContactSpot } from "./spreading/elliptic-contact-spot";
import { parallelCylinders } from "./spreading/parallel-cylinders";
import { sphereBuried } from "./spreading/sphere-buried";
import { spherePair } from "./spreading/sphere-pair";
import { spherePlane } from "./spreading/sphere-plane";
import { spheroid } from "./spreading/spheroid";
import { spotInCylinder } from "./spreading/spot-in-cylinder";

// sheet
import { sheetBend } from "./sheet/sheet-bend";
import { sheetDisc } from "./sheet/sheet-disc";
import { sheetEndTerminal } from "./sheet/sheet-end-terminal";
import { sheetMeander } from "./sheet/sheet-meander";
import { sheetSlit } from "./sheet/sheet-slit";
import { sheetStep } from "./sheet/sheet-step";
import { sheetStrip } from "./sheet/sheet-strip";
import { sheetTee } from "./sheet/sheet-tee";

// earthing
import { earthGrid } from "./earthing/earth-grid";
import { earthHemisphere } from "./earthing/earth-hemisphere";
import { earthPlate } from "./earthing/earth-plate";
import { earthRing } from "./earthing/earth-ring";
import { earthRod } from "./earthing/earth-rod";
import { earthRodGroup } from "./earthing/earth-rod-group";
import { earthRodLayered } from "./earthing/earth-rod-layered";
import { earthRodPair } from "./earthing/earth-rod-pair";
import { earthStar } from "./earthing/earth-star";
import { earthWire } from "./earthing/earth-wire";

const axial: readonly Shape[] = [
  bar,
  roundWire,
  tube,
  prism,
  etchedTrace,
  viaBarrel,
  strandedConductor,
  parallelPlates,
  boxTube,
  cladWire,
  helicalWinding,
  flatSpiral,
];

const tapered: readonly Shape[] = [taperedStrip, coneFrustum];

const radial: readonly Shape[] = [
  cylindricalShell,
  sphericalShell,
  confocalShell,
  arcBar,
  conicalShell,
  bentTube,
  hyperbolicNeck,
  torusArc,
];

const spreading: readonly Shape[] = [
  cylinderInSquare,
  eccentricCylinders,
  parallelCylinders,
  cylinderPlane,
  spherePlane,
  sphereBuried,
  spherePair,
  spheroid,
  contactSpot,
  ellipticContactSpot,
  spotInCylinder,
];

const sheet: readonly Shape[] = [
  sheetStrip,
  sheetBend,
  sheetStep,
  sheetMeander,
  sheetEndTerminal,
  sheetTee,
  sheetSlit,
  sheetDisc,
];

const earthing: readonly Shape[] = [
  earthHemisphere,
  earthRod,
  earthRodPair,
  earthRodGroup,
  earthWire,
  earthRing,
  earthPlate,
  earthStar,
  earthRodLayered,
  earthGrid,
];

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

import type { ShapeEntry } from "@/lib/engine";

type Family = ShapeEntry["family"];

/** Families in the order of the catalogue. */
export const FAMILIES: readonly Family[] = ["axial", "tapered", "radial", "spreading", "sheet", "earthing"];

export const FAMILY_TITLES: Readonly<Record<Family, string>> = {
  axial: "Along a constant section",
  tapered: "Along a tapering section",
  radial: "Radial and around a bend",
  spreading: "Spreading and leakage",
  sheet: "Sheet patterns",
  earthing: "Earthing",
};

export const FAMILY_NOTES: Readonly<Record<Family, string>> = {
  axial: "The current keeps its section from end to end: bars, wires, tubes, traces, windings.",
  tapered: "The section changes along the current; flat ends give a proved bracket.",
  radial: "Between nested surfaces, or around a bend.",
  spreading: "The current spreads from one electrode to another, or into a large medium.",
  sheet: "Plan shapes in a thin layer, counted in squares.",
  earthing: "Electrodes in the ground, by the soil's resistivity.",
};

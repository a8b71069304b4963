/** The ways in which a medium of an outline is given. */
import type { Parameters } from "./sketch";

export const MEDIUM_KINDS = [
  "sheetResistance",
  "material",
  "resistivity",
  "conductivity",
  "expression",
] as const;
export type OutlineMediumKind = (typeof MEDIUM_KINDS)[number];

/** Every member of a medium that the page has a field for, regions apart. */
export const MEDIUM_MEMBERS = [
  ...MEDIUM_KINDS,
  "extrapolate",
  "temperatureCoefficient",
  "referenceTemperature",
  "thickness",
  "quantity",
] as const;

export function mediumKindOf(medium: Parameters): OutlineMediumKind | undefined {
  return MEDIUM_KINDS.find((kind) => kind in medium);
}

const STARTS: Readonly<Record<OutlineMediumKind, Parameters>> = {
  sheetResistance: { sheetResistance: "50 ohm/sq" },
  material: { material: "copper-annealed" },
  resistivity: { resistivity: "17.2 nohm m" },
  conductivity: { conductivity: "58 MS/m" },
  expression: { expression: "5e7*exp(-x/0.01)", quantity: "conductivity" },
};

/** The medium given in another way; what was typed before in that way comes back from `remembered`. */
export function switchMedium(
  medium: Parameters,
  kind: OutlineMediumKind,
  remembered: Parameters | undefined,
  axisymmetric: boolean,
): Parameters {
  const thickness: Parameters =
    kind === "sheetResistance" || axisymmetric
      ? {}
      : { thickness: medium.thickness ?? remembered?.thickness ?? "35 um" };
  return { ...(remembered ?? STARTS[kind]), ...thickness };
}

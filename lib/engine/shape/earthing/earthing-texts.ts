/** What every shape of the earthing family says: the cautions of safety, the model's assumptions. */
import { ELECTRODE_CAUTION } from "../caution";

/** Safety first, then what the soil does. */
export const EARTHING_CAUTIONS: readonly string[] = [
  ELECTRODE_CAUTION,
  "The resistivity of soil changes with moisture, temperature, season and depth, often by more than a factor of two: measure it at the site, and measure the electrode once it is built.",
];

export const REMOTE_EARTH = "the far soil, at an infinite distance";

export const SOIL_ASSUMPTION =
  "The soil is uniform from its flat, insulating surface to any depth; the other terminal is infinitely far away.";

export const CONTACT_ASSUMPTION =
  "The metal is one equipotential and touches the soil everywhere; its own resistance and that of the leads are not included.";

/** The method behind the values of rods and wires, for the shapes' sources. */
export const AVERAGE_POTENTIAL_SOURCE = {
  title: "Average-potential method",
  detail:
    "the current leaves evenly along the wire; the potential averaged over its surface is the value (G. W. O. Howe 1914)",
  provenance: "from memory",
} as const;

export const DWIGHT_SOURCE = {
  title: "H. B. Dwight, Calculation of resistances to ground, AIEE Transactions 55 (1936) 1319",
  detail: "the published formulas, used for comparison",
  provenance: "from memory",
} as const;

/** Soft solders. */
import type { Material } from "../material";
import { libraryEntry, within } from "./library-entry";

export const solders: readonly Material[] = [
  libraryEntry({
    id: "solder-sn63pb37",
    name: "Solder, tin–lead 63/37",
    kind: "solder",
    resistivity: { model: "linear", resistivity: 1.45e-7, coefficient: 0.004, reference: 20 },
    range: { from: -40, to: 125 },
    uncertainty: within(
      7,
      "Data sheets give 11.5 to 12 % IACS for the bulk alloy; voids in a joint raise it.",
    ),
    source: "About 11.9 % IACS, common data-sheet value; temperature coefficient near that of tin and lead",
    provenance: "from memory",
  }),
  libraryEntry({
    id: "solder-sac305",
    name: "Solder, tin–silver–copper 96.5/3/0.5",
    kind: "solder",
    resistivity: { model: "linear", resistivity: 1.32e-7, coefficient: 0.004, reference: 20 },
    range: { from: -40, to: 125 },
    uncertainty: within(
      12,
      "Published values for the bulk alloy run from 0.12 to 0.145 µΩ·m; voids in a joint raise it.",
    ),
    source: "About 13 % IACS, common data-sheet value; temperature coefficient near that of tin",
    provenance: "from memory",
  }),
];

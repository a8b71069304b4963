/** Carbon and conducting oxides: wide ranges by make. */
import type { Material } from "../material";
import { libraryEntry } from "./library-entry";

export const carbonAndOxides: readonly Material[] = [
  libraryEntry({
    id: "graphite",
    name: "Graphite, polycrystalline",
    kind: "carbon",
    resistivity: { model: "constant", resistivity: 1e-5 },
    range: { from: 0, to: 60 },
    uncertainty: {
      lower: 0.6,
      upper: 1.7,
      note: "Extruded and moulded grades run from 6 to 17 µΩ·m, and depend on the direction (common practice, no source).",
    },
    source: "Common data-sheet values of electrode and moulded graphite",
    provenance: "from memory",
    note: "Falls by about 0.05 % per kelvin at room temperature; the range covers that.",
  }),
  libraryEntry({
    id: "indium-tin-oxide",
    name: "Indium tin oxide (ITO), sputtered film",
    kind: "oxide",
    resistivity: { model: "constant", resistivity: 2e-6 },
    range: { from: 0, to: 60 },
    uncertainty: {
      lower: 0.5,
      upper: 5,
      note: "Sputtered films run from 1 µΩ·m (hot, annealed) to 10 µΩ·m (cold, on plastic) (common practice, no source).",
    },
    source: "Common practice: 2e-4 Ω·cm for good films",
    provenance: "from memory",
    note: "Measure the sheet resistance of your own film and use it where you can.",
  }),
];

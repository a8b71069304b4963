/** Insulators: what data sheets promise, orders of magnitude only. */
import type { Material } from "../material";
import { libraryEntry } from "./library-entry";

const insulator = (id: string, name: string, resistivity: number): Material =>
  libraryEntry({
    id,
    name,
    kind: "polymer",
    resistivity: { model: "constant", resistivity },
    range: { from: 15, to: 30 },
    uncertainty: {
      lower: 0.1,
      upper: 100,
      note: "An order of magnitude: dry material, after a minute under voltage; heat, moisture and fillers lower it much.",
    },
    source: "Common data-sheet values of volume resistivity",
    provenance: "from memory",
    note: "No proof of insulation: surface leakage and ageing usually decide.",
  });

export const polymers: readonly Material[] = [
  insulator("ptfe", "Polytetrafluoroethylene (PTFE)", 1e16),
  insulator("polyethylene", "Polyethylene (PE)", 1e14),
  insulator("pvc-insulation", "Polyvinyl chloride (PVC), cable insulation", 1e11),
];

import type { Material } from "../material";

/** IEC 60028: 1/58 Ω·mm²/m at 20 °C and 0.00393 1/K define the International Annealed Copper Standard. */
export const copperAnnealed: Material = {
  id: "copper-annealed",
  version: 1,
  name: "Copper, annealed (IACS)",
  kind: "metal",
  resistivity: { model: "linear", resistivity: 1e-6 / 58, coefficient: 0.00393, reference: 20 },
  range: { from: -60, to: 200 },
  uncertainty: {
    lower: 0.98,
    upper: 1.02,
    note: "Commercial annealed copper lies within about two per cent of the standard (common practice, no source).",
  },
  source: "IEC 60028, resistance of copper: 1/58 Ω·mm²/m and 0.00393 1/K at 20 °C",
  provenance: "from memory",
  owner: "library",
};

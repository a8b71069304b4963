/** Metals of one element, and plain steel. */
import type { Material } from "../material";
import {
  CRC_AT_HAND,
  CRC_PURE_METALS,
  handbookTable,
  KELVIN_TABLE,
  libraryEntry,
  TABLE_AT_HAND,
  within,
} from "./library-entry";

const PURE_NOTE =
  "For pure, annealed metal; traces of other elements, cold work and films thinner than about a micrometre raise it.";

const pureAtHand = (id: string, name: string, values: readonly number[]): Material =>
  libraryEntry({
    id,
    name,
    kind: "metal",
    resistivity: handbookTable(TABLE_AT_HAND, values),
    range: { from: 0, to: 100 },
    uncertainty: within(2, "Purity and anneal of commercial metal (common practice, no source)."),
    source: CRC_AT_HAND,
    provenance: "source at hand",
    note: PURE_NOTE,
  });

const pureFromMemory = (id: string, name: string, values: readonly number[]): Material =>
  libraryEntry({
    id,
    name,
    kind: "metal",
    resistivity: handbookTable(KELVIN_TABLE, values),
    range: { from: -0.15, to: 126.85 },
    uncertainty: within(3, "Purity and anneal of commercial metal (common practice, no source)."),
    source: CRC_PURE_METALS,
    provenance: "from memory",
    note: PURE_NOTE,
  });

export const metals: readonly Material[] = [
  libraryEntry({
    id: "copper-hard-drawn",
    name: "Copper, hard-drawn (97 % IACS)",
    kind: "metal",
    resistivity: { model: "linear", resistivity: 1e-6 / 58 / 0.97, coefficient: 0.00381, reference: 20 },
    range: { from: -60, to: 150 },
    uncertainty: within(
      2,
      "Between about 96 and 98.5 % IACS, by diameter and drawing (common practice, no source).",
    ),
    source:
      "Hard-drawn copper wire: 97 % of the conductivity of IEC 60028 annealed copper, 0.00381 1/K at 20 °C",
    provenance: "from memory",
    note: "Above about 150 °C hard-drawn copper anneals and its resistivity falls for good.",
  }),
  pureAtHand("copper-pure", "Copper, pure", [1.543, 1.678, 1.712, 2.22]),
  libraryEntry({
    id: "aluminium-electrical",
    name: "Aluminium, electrical grade (61 % IACS)",
    kind: "metal",
    resistivity: { model: "linear", resistivity: 2.8264e-8, coefficient: 0.00403, reference: 20 },
    range: { from: -60, to: 150 },
    uncertainty: within(
      2,
      "The value is a maximum for hard-drawn wire; bar and annealed metal lie up to 2 % below.",
    ),
    source: "IEC 60889, hard-drawn aluminium wire: 0.028264 Ω·mm²/m at 20 °C; 0.00403 1/K as in IEC 60287",
    provenance: "from memory",
  }),
  pureAtHand("aluminium-pure", "Aluminium, pure", [2.417, 2.65, 2.709, 3.56]),
  pureAtHand("silver", "Silver", [1.467, 1.587, 1.617, 2.07]),
  pureFromMemory("gold", "Gold", [2.051, 2.214, 2.255, 2.271, 3.107]),
  pureFromMemory("nickel", "Nickel", [6.16, 6.93, 7.12, 7.2, 11.8]),
  pureAtHand("platinum", "Platinum", [9.6, 10.5, 10.7, 13.6]),
  pureAtHand("tungsten", "Tungsten", [4.82, 5.28, 5.39, 7.18]),
  pureFromMemory("iron", "Iron, pure", [8.57, 9.61, 9.87, 9.98, 16.1]),
  pureFromMemory("zinc", "Zinc", [5.46, 5.9, 6.01, 6.06, 8.37]),
  pureFromMemory("molybdenum", "Molybdenum", [4.85, 5.34, 5.47, 5.52, 8.02]),
  pureFromMemory("tantalum", "Tantalum", [12.2, 13.1, 13.4, 13.5, 18.2]),
  pureFromMemory("lead", "Lead", [19.2, 20.8, 21.1, 21.3, 29.6]),
  libraryEntry({
    id: "steel-mild",
    name: "Steel, mild",
    kind: "metal",
    resistivity: { model: "linear", resistivity: 1.43e-7, coefficient: 0.0045, reference: 20 },
    range: { from: -20, to: 150 },
    uncertainty: {
      lower: 0.8,
      upper: 1.3,
      note: "By carbon, manganese and silicon content (common practice, no source).",
    },
    source: "Common handbook value for low-carbon steel, about 0.14 µΩ·m at 20 °C",
    provenance: "from memory",
    note: "Magnetic: a DC value only; at mains frequency the skin effect already matters for thick bars.",
  }),
];

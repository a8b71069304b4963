/** Alloys: conductors, resistance alloys, stainless steel. */
import type { Material } from "../material";
import { CRC_AT_HAND, handbookTable, libraryEntry, TABLE_AT_HAND, within } from "./library-entry";

export const alloys: readonly Material[] = [
  libraryEntry({
    id: "brass-70-30",
    name: "Brass, 70 % copper, 30 % zinc",
    kind: "alloy",
    resistivity: handbookTable(TABLE_AT_HAND, [5.87, 6.08, 6.13, 6.91]),
    range: { from: 0, to: 100 },
    uncertainty: within(5, "Composition and temper (common practice, no source)."),
    source: CRC_AT_HAND,
    provenance: "source at hand",
  }),
  libraryEntry({
    id: "bronze-phosphor",
    name: "Bronze, phosphor, 5 % tin",
    kind: "alloy",
    resistivity: { model: "linear", resistivity: 1.15e-7, coefficient: 0.0006, reference: 20 },
    range: { from: -20, to: 150 },
    uncertainty: within(15, "By tin and phosphorus content; bronzes in general run from 13 to 20 % IACS."),
    source:
      "About 15 % IACS for C51000; its temperature coefficient by Matthiessen's rule from that of copper",
    provenance: "from memory",
  }),
  libraryEntry({
    id: "constantan",
    name: "Constantan, 55 % copper, 45 % nickel",
    kind: "alloy",
    resistivity: handbookTable(TABLE_AT_HAND, [45.43, 45.38, 45.35, 45.11]),
    range: { from: 0, to: 100 },
    uncertainty: within(
      8,
      "Makers' alloys of this kind run from 0.45 to 0.50 µΩ·m (common practice, no source).",
    ),
    source: CRC_AT_HAND,
    provenance: "source at hand",
  }),
  libraryEntry({
    id: "manganin",
    name: "Manganin, 86 % copper, 12 % manganese, 2 % nickel",
    kind: "alloy",
    resistivity: { model: "constant", resistivity: 4.5e-7 },
    range: { from: 10, to: 60 },
    uncertainty: within(8, "Handbooks give 0.43 to 0.48 µΩ·m by make and anneal."),
    source: "Common handbook values, 0.43 to 0.48 µΩ·m, within about 1e-5 1/K flat from 10 to 60 °C",
    provenance: "from memory",
  }),
  libraryEntry({
    id: "nichrome",
    name: "Nichrome, 80 % nickel, 20 % chromium",
    kind: "alloy",
    resistivity: handbookTable(TABLE_AT_HAND, [107.3, 107.5, 107.6, 108.3]),
    range: { from: 0, to: 100 },
    uncertainty: within(5, "Makers' tolerance of resistance wire (common practice, no source)."),
    source: CRC_AT_HAND,
    provenance: "source at hand",
    note: "For heaters at glowing temperatures see nichrome-heater.",
  }),
  libraryEntry({
    id: "nichrome-heater",
    name: "Nichrome, 80 % nickel, 20 % chromium, heater temperatures",
    kind: "alloy",
    resistivity: handbookTable(
      [20, 100, 200, 300, 400, 500, 600, 700, 800, 900, 1000, 1100, 1200],
      [1, 1.01, 1.02, 1.03, 1.04, 1.05, 1.04, 1.04, 1.04, 1.04, 1.05, 1.06, 1.07].map(
        (factor) => 109 * factor,
      ),
    ),
    range: { from: 20, to: 1200 },
    uncertainty: within(
      5,
      "Makers' tolerance of resistance wire; the first heating changes it by up to 2 %.",
    ),
    source: "Handbooks of heating alloys: 1.09 µΩ·m at 20 °C and its temperature factor",
    provenance: "from memory",
  }),
  libraryEntry({
    id: "iron-chromium-aluminium",
    name: "Iron–chromium–aluminium heating alloy, 22 % chromium, 5 % aluminium",
    kind: "alloy",
    resistivity: handbookTable(
      [20, 500, 1000, 1300],
      [1, 1.01, 1.04, 1.04].map((factor) => 139 * factor),
    ),
    range: { from: 20, to: 1300 },
    uncertainty: within(5, "Makers' tolerance of resistance wire (common practice, no source)."),
    source: "Handbooks of heating alloys: 1.39 µΩ·m at 20 °C, 4 % more at 1000 °C",
    provenance: "from memory",
  }),
  libraryEntry({
    id: "stainless-304",
    name: "Stainless steel 304",
    kind: "alloy",
    resistivity: handbookTable([20, 100, 650], [72, 78, 116]),
    range: { from: 20, to: 650 },
    uncertainty: within(5, "Heat and cold work (common practice, no source)."),
    source: "Common data-sheet values: 0.72 µΩ·m at 20 °C, 0.78 at 100 °C, 1.16 at 650 °C",
    provenance: "from memory",
  }),
];

/** Water and solutions. */
import type { Material } from "../material";
import { libraryEntry, within } from "./library-entry";

/** Temperatures of the table of KCl standards, °C. */
const KCL_TEMPERATURES = [0, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50];

const kcl = (id: string, molality: string, microsiemensPerCm: readonly number[]): Material =>
  libraryEntry({
    id,
    name: `Potassium chloride solution, ${molality} mol/kg`,
    kind: "liquid",
    resistivity: {
      model: "table",
      quantity: "conductivity",
      temperatures: [...KCL_TEMPERATURES],
      // From µS/cm to S/m, by a division so that the decimals stay those of the table.
      values: microsiemensPerCm.map((value) => value / 1e4),
      interpolation: "monotone-cubic",
    },
    range: { from: 0, to: 50 },
    uncertainty: within(
      0.1,
      "Of the standard itself 0.03 %; interpolation between the table's 5 K steps included.",
    ),
    source:
      "CRC Handbook of Chemistry and Physics, standard KCl solutions (Pratt, Koch, Wu, Berezansky 2001); 20 and 25 °C checked against the printed table, the other temperatures from memory",
    provenance: "from memory",
    note: "Conductivity of the salt and the water together, without dissolved carbon dioxide.",
  });

export const electrolytes: readonly Material[] = [
  kcl(
    "kcl-0-01",
    "0.01",
    [772.92, 890.96, 1013.95, 1141.45, 1273.03, 1408.23, 1546.63, 1687.79, 1831.27, 1976.62, 2123.43],
  ),
  kcl(
    "kcl-0-1",
    "0.1",
    [7116.85, 8183.7, 9291.72, 10437.1, 11615.9, 12824.6, 14059.2, 15316, 16591, 17880.6, 19180.9],
  ),
  kcl("kcl-1", "1", [63488, 72030, 80844, 89900, 99170, 108620, 118240, 127970, 137810, 147720, 157670]),
  libraryEntry({
    id: "sea-water",
    name: "Sea water, salinity 35",
    kind: "liquid",
    resistivity: { model: "sea-water", salinity: 35 },
    range: { from: -2, to: 35 },
    uncertainty: {
      lower: 0.93,
      upper: 1.08,
      note: "Open sea from about 33 to 37.5 in salinity; coasts, estuaries and inland seas lie outside.",
    },
    source:
      "Practical Salinity Scale 1978, Unesco technical papers in marine science 36 and 44; 42.914 mS/cm at salinity 35 and 15 °C",
    provenance: "from memory",
    note: "At atmospheric pressure. The scale's own values are good to 0.01 %.",
  }),
  libraryEntry({
    id: "sea-water-brackish",
    name: "Brackish water, salinity 10",
    kind: "liquid",
    resistivity: { model: "sea-water", salinity: 10 },
    range: { from: -0.5, to: 35 },
    uncertainty: { lower: 0.6, upper: 1.9, note: "Salinities from about 5 to 18." },
    source: "Practical Salinity Scale 1978, Unesco technical papers in marine science 36 and 44",
    provenance: "from memory",
    note: "At atmospheric pressure.",
  }),
  libraryEntry({
    id: "water-tap",
    name: "Tap water",
    kind: "liquid",
    resistivity: { model: "constant", resistivity: 20 },
    range: { from: 5, to: 30 },
    uncertainty: {
      lower: 0.3,
      upper: 5,
      note: "Drinking water runs from about 6 to 100 Ω·m by its minerals and temperature.",
    },
    source: "Common practice, no source",
    provenance: "from memory",
  }),
];

import type { Material } from "../material";

/** What an entry of the shared library says of itself; version and owner are the same for all. */
export type LibraryEntry = Omit<Material, "version" | "owner">;

/** An entry of the shared library, its first version. */
export function libraryEntry(entry: LibraryEntry): Material {
  return { ...entry, version: 1, owner: "library" };
}

/** The commonest uncertainty: so many per cent to either side. */
export function within(percent: number, note: string): Material["uncertainty"] {
  return { lower: 1 - percent / 100, upper: 1 + percent / 100, note };
}

/** A table of resistivities in 1e-8 Ω·m, as handbooks print them. */
export function handbookTable(
  temperatures: readonly number[],
  values: readonly number[],
): Material["resistivity"] {
  return {
    model: "table",
    quantity: "resistivity",
    temperatures: [...temperatures],
    // Divided by 1e8, so that 1.587 becomes the double nearest to 1.587e-8.
    values: values.map((value) => value / 1e8),
    interpolation: "linear",
  };
}

/** Temperatures of the table that was at hand, °C. */
export const TABLE_AT_HAND = [0, 20, 25, 100];

/** 273, 293, 298, 300 and 400 K in °C. */
export const KELVIN_TABLE = [-0.15, 19.85, 24.85, 26.85, 126.85];

export const CRC_AT_HAND =
  "CRC Handbook of Chemistry and Physics, resistivity in 1e-8 Ω·m at 0, 20, 25 and 100 °C";
export const CRC_PURE_METALS =
  "CRC Handbook of Chemistry and Physics, Electrical Resistivity of Pure Metals, at 273, 293, 298, 300 and 400 K";

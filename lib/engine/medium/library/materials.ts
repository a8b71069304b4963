/** The shared library: one file a material (or a family of them), listed here. */
import type { Material } from "../material";
import { alloys } from "./alloys";
import { carbonAndOxides } from "./carbon-and-oxides";
import { copperAnnealed } from "./copper-annealed";
import { electrolytes } from "./electrolytes";
import { metals } from "./metals";
import { polymers } from "./polymers";
import { silicon } from "./silicon";
import { soilsAndConcrete } from "./soils-and-concrete";
import { solders } from "./solders";

export const libraryMaterials: readonly Material[] = [
  copperAnnealed,
  ...metals,
  ...alloys,
  ...solders,
  ...carbonAndOxides,
  ...electrolytes,
  ...soilsAndConcrete,
  ...silicon,
  ...polymers,
];

const byId = new Map(libraryMaterials.map((material) => [material.id, material]));

/** The library's material of that id, or undefined. */
export function libraryMaterial(id: string): Material | undefined {
  return byId.get(id);
}

/** The shared library: one file a material (or a family of them), listed here. */
import type { Material } from "../material";
import { copperAnnealed } from "./copper-annealed";

export const libraryMaterials: readonly Material[] = [copperAnnealed];

const byId = new Map(libraryMaterials.map((material) => [material.id, material]));

/** The library's material of that id, or undefined. */
export function libraryMaterial(id: string): Material | undefined {
  return byId.get(id);
}

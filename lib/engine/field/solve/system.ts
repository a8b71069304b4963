import type { CondensedMatrices, ElementSet } from "../assembly/elements";
import type { SampledElements } from "../assembly/medium";
import type { UnknownMap } from "../assembly/unknowns";
import type { FrontStructure } from "./symbolic";

/** One linear system on a mesh: structure, matrices and their weights (conductivity or resistivity of a triangle). */
export interface LinearSystem {
  readonly set: ElementSet;
  readonly map: UnknownMap;
  readonly structure: FrontStructure;
  readonly matrices: CondensedMatrices;
  readonly weight: Float64Array;
  /** Triangles whose weight varies and is part of their matrix (their entry of `weight` is one); null for none. */
  readonly sampled: SampledElements | null;
}

import type { MediumList } from "@/lib/engine/field/assembly/medium";
import { currentOf, lowerBound, upperBound } from "@/lib/engine/field/bounds/bracket";
import { fieldEnergies, type FieldEnergies } from "@/lib/engine/field/bounds/energies";
import type { FieldMesh } from "@/lib/engine/field/mesh/mesh";
import { solvePair, type SolvedPair } from "@/lib/engine/field/solve/pair";

export interface Solved {
  pair: SolvedPair;
  energies: FieldEnergies;
  lower: number;
  upper: number;
  /** Sum of the gaps of all triangles. */
  gap: number;
}

/** One solution at a uniform order on a mesh as it is. */
export function solveOn(mesh: FieldMesh, order: number, medium: MediumList = [1], terminalCount = 2): Solved {
  const pair = solvePair({
    mesh,
    order: new Uint8Array(mesh.triangles.length / 3).fill(order),
    medium,
    terminalCount,
    revolution: false,
    shouldStop: () => false,
  });
  const energies = fieldEnergies(
    pair,
    pair.potentials.map(() => 1),
    null,
  );
  const current = currentOf(pair.streamSystem, pair.streams[0], pair.currents[0]);
  return {
    pair,
    energies,
    lower: lowerBound(energies.potential[0]),
    upper: upperBound(energies.stream[0], current),
    gap: energies.gap.reduce((a, b) => a + b, 0),
  };
}

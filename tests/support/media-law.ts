/** Short ways to the laws of shapes of two media in tests: resistance in ohms for two resistivities. */
import type { Factor } from "@/lib/engine/shape/define-shape";
import { resolve, shapeOf, type Given } from "./shape-law";

export function mediaFactor(
  id: string,
  given: Given,
  resistivities: Readonly<Record<string, number>>,
): Factor & { readonly lower: number; readonly upper: number } {
  const { answer } = shapeOf(id);
  if (answer.kind !== "media") throw new Error(`${id} has one medium`);
  const found = answer.resistance(resolve(id, given), resistivities);
  const { value, relativeError } = found;
  return {
    ...found,
    lower: found.lower ?? value * (1 - relativeError),
    upper: found.upper ?? value * (1 + relativeError),
  };
}

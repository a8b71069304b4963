/** The one place where a shape's answer meets its media. */
import type { Dimensions, Resolved, Shape } from "../shape/define-shape";
import type { Media } from "./read-media";
import type { Solution } from "./solution";
import { solveFactor } from "./solve-factor";
import { solveFlow } from "./solve-flow";
import { solveMedia } from "./solve-media";

/**
 * Solves a shape.
 * @param sharpen whether a field solution may take the place of a formula that has lost its accuracy.
 * @throws InputError where a medium's law cannot be integrated.
 */
export function solve(
  shape: Shape,
  dimensions: Resolved<Dimensions>,
  media: Media,
  sharpen = true,
): Solution {
  const { answer } = shape;
  if ("named" in media) {
    if (answer.kind !== "media") throw new Error(`${shape.id} was given media but takes one medium`);
    return solveMedia(answer, dimensions, media.named);
  }
  if (answer.kind === "flow") return solveFlow(answer, dimensions, media.single);
  if (answer.kind === "factor" && media.single.kind === "uniform") {
    return solveFactor(shape, answer, dimensions, media.single, shape.family === "sheet", sharpen);
  }
  throw new Error(`${shape.id} cannot be solved with this medium`);
}

/** Shapes known by a potential-theory result for a uniform medium. */
import type { UniformMedium } from "../medium/resolve-medium";
import type { Dimensions, FactorAnswer, Resolved, Shape } from "../shape/define-shape";
import { around, between } from "./bounds";
import { sharpenedFactor } from "./field-factor";
import type { Solution } from "./solution";

/** R = ρ·factor (1/m), or sheet resistance times squares; without `sharpen` by the formula alone. */
export function solveFactor(
  shape: Shape,
  answer: FactorAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  medium: UniformMedium,
  sheet: boolean,
  sharpen = true,
): Solution {
  const law = answer.factor(dimensions);
  const factor = sharpen ? sharpenedFactor(shape, answer, dimensions, law) : law;
  const relative = factor.relativeError + medium.relativeError;
  const scale = medium.value;
  const bounds =
    factor.lower !== undefined && factor.upper !== undefined
      ? between(factor.value * scale, factor.lower * scale, factor.upper * scale, relative)
      : around(factor.value * scale, relative);
  return {
    ...bounds,
    boundsBasis: factor.boundsBasis,
    proved: factor.proved,
    method: factor.method,
    cautions: factor.cautions ?? [],
    assumptions: factor.accuracy ? [factor.accuracy] : [],
    dimensions,
    view: { kind: "factor", answer, law, factor, medium, sheet },
  };
}

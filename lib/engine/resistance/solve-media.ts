/** Shapes of two media: uniform ones by the shape's own law, graded ones in parallel by a bracket. */
import { InputError, type Problem } from "../failure";
import type { ResolvedMedium } from "../medium/resolve-medium";
import { integrate } from "../numeric/gauss-kronrod";
import type { Dimensions, MediaAnswer, Resolved } from "../shape/define-shape";
import { AlongConductor, uniformLaw } from "./along-conductor";
import { around, between, QUADRATURE_FLOOR } from "./bounds";
import { UnfitValue } from "./law-integral";
import type { Solution } from "./solution";

/** Solves a shape of two media. @throws InputError where a medium's law cannot be integrated. */
export function solveMedia(
  answer: MediaAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  media: Readonly<Record<string, ResolvedMedium>>,
): Solution {
  const entries = Object.entries(media);
  const uniform: Record<string, number> = {};
  let relativeError = 0;
  for (const [name, medium] of entries) {
    if (medium.kind !== "uniform") return solveGraded(answer, dimensions, media);
    uniform[name] = medium.value;
    relativeError = Math.max(relativeError, medium.relativeError);
  }
  const factor = answer.resistance(dimensions, uniform);
  const relative = factor.relativeError + relativeError;
  const bounds =
    factor.lower !== undefined && factor.upper !== undefined
      ? between(factor.value, factor.lower, factor.upper, relative)
      : around(factor.value, relative);
  return {
    ...bounds,
    boundsBasis: factor.boundsBasis,
    proved: factor.proved,
    method: factor.method,
    cautions: factor.cautions ?? [],
    assumptions: factor.accuracy ? [factor.accuracy] : [],
    dimensions,
    view: { kind: "media", answer, resistivities: uniform, parallel: answer.parallel?.(dimensions) ?? null },
  };
}

/**
 * Conductors side by side, each graded along the flow. Conducting sheets across both give the lower value
 * ∫dx/Σ(section/ρ), an insulating wall between them the upper one 1/Σ(1/R): they agree where both media vary alike.
 */
function solveGraded(
  answer: MediaAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  media: Readonly<Record<string, ResolvedMedium>>,
): Solution {
  const parallel = answer.parallel?.(dimensions);
  if (!parallel) throw new Error("a medium was graded in a shape whose media do not conduct in parallel");
  const { along, shares } = parallel;
  const geometry = integrate((x) => 1 / along.section(x), 0, along.extent, { breaks: along.breaks });
  const problems: Problem[] = [];
  const members = Object.entries(media).map(([name, medium]) => {
    // The part of the common section that this medium takes.
    const part = geometry.value / shares[name];
    const flow = { ...along, section: (x: number) => along.section(x) * part };
    const law = medium.kind === "graded" ? medium.law : uniformLaw(medium.value, along.extent);
    return { name, medium, conductor: new AlongConductor(flow, law) };
  });
  try {
    const walls = members.map(({ conductor }) => conductor.total());
    const upper = 1 / walls.reduce((sum, { value }) => sum + 1 / value, 0);
    const borders = members.flatMap(({ conductor: { law } }) =>
      law.count <= 200 ? Array.from(law.from) : [],
    );
    const sheets = integrate(
      (x) => 1 / members.reduce((sum, { conductor }) => sum + 1 / conductor.densityAt(x), 0),
      0,
      along.extent,
      { breaks: [...borders, ...(along.breaks ?? [])], relative: 1e-11 },
    );
    const lower = Math.min(sheets.value, upper);
    const doubt = Math.max(sheets.error / sheets.value, ...walls.map(({ error, value }) => error / value));
    const converged = sheets.status === "converged" && walls.every(({ status }) => status === "converged");
    return {
      ...between(lower + (upper - lower) / 2, lower, upper, doubt + QUADRATURE_FLOOR),
      boundsBasis: "rayleigh",
      proved: converged,
      method: "quadrature",
      integral: {
        value: sheets.value,
        error: sheets.error,
        evaluations: sheets.evaluations + walls.reduce((sum, { evaluations }) => sum + evaluations, 0),
        status: converged ? "converged" : "limit",
      },
      cautions: converged ? [] : ["An integral over the grading met its cap; the bounds are not proved."],
      assumptions: [
        "Graded media side by side: conducting sheets across both give the lower value, an insulating wall between them the upper one.",
      ],
      dimensions,
      view: { kind: "media", answer, resistivities: null, parallel },
    };
  } catch (error) {
    if (!(error instanceof UnfitValue)) throw error;
    for (const { medium } of members) {
      if (medium.kind !== "graded") continue;
      problems.push({
        pointer: medium.pointer,
        detail: `must be finite and greater than 0 everywhere along the flow; it reaches ${error.value}.`,
      });
    }
    throw new InputError(problems);
  }
}

/** What a record of `sizing` tells: the dimension that was looked for, its solutions, and the shape at the first. */
import { z } from "zod";
import { findShape, shapeEntry, sizingResultSchema } from "@/lib/engine";
import { bracketOf, verdictOf } from "./answer";
import type { Block, Told } from "./content";
import { shapePicture } from "./inputs";
import { INPUT_COLUMNS } from "./medium";
import { answerSections, inputSections, type LookUp, storedRequest } from "./of-resistance";
import { plainNumber, siText, typedText, words } from "./typed";

const sizingRequest = storedRequest.extend({
  solveFor: z.string(),
  target: z.unknown().optional(),
  within: z.array(z.unknown()).optional(),
});

/** Null where the record was stored in a form that today's service no longer reads. */
export function tellSizing(request: unknown, result: unknown, lookUp: LookUp): Told | null {
  const asked = sizingRequest.safeParse(request);
  const answer = sizingResultSchema.safeParse(result);
  const first = answer.data?.solutions[0];
  if (!asked.success || !answer.success || !first) return null;
  const { shape: shapeId, dimensions, solveFor, target } = asked.data;
  const { solutions, within, materials } = answer.data;
  const shape = findShape(shapeId);
  const dimension = shape && shapeEntry(shape).dimensions.find(({ name }) => name === solveFor);
  const label = dimension?.label ?? words(solveFor);
  const looked: Block = {
    kind: "table",
    label: "What was looked for",
    columns: INPUT_COLUMNS,
    rows: [
      ["Looked for", label, ""],
      ["Target", typedText(target, "resistance"), siText(target, "resistance")],
      ["Searched", `${within[0].text} to ${within[1].text}`, ""],
    ],
  };
  const unit = first.dimension.unit === "1" ? "unit" : first.dimension.unit.replace("m^2", "m²");
  const found: Block = {
    kind: "table",
    label: "Solutions",
    columns: [
      { title: label, numeric: true },
      { title: "Resistance", numeric: true },
      { title: "Bounds", numeric: true, weight: 2 },
      { title: `Change, Ω per ${unit}`, numeric: true },
    ],
    rows: solutions.map(({ dimension: at, resistance, sensitivity }) => [
      at.text,
      resistance.text,
      bracketOf(resistance),
      plainNumber(Number(sensitivity.toPrecision(4))),
    ]),
  };
  const [inputs, ...others] = inputSections(asked.data, materials, lookUp);
  const rest = { shape: shapeId, assumptions: answer.data.assumptions, sources: answer.data.sources };
  return {
    subject: `${shape?.title ?? words(shapeId)}: sizing`,
    headline: {
      title: `${label} for ${answer.data.target.text}`,
      text: solutions.map(({ dimension: at }) => at.text).join(" or "),
      bracket: null,
      statements: [
        `There the resistance is ${first.resistance.text} ${bracketOf(first.resistance)}.`,
        ...(solutions.length > 1
          ? [`${solutions.length} values lie in the range; the drawing has the first.`]
          : []),
        ...(first.exact ? [] : ["No whole number gives the target; these lie on either side of it."]),
      ],
      verdict: verdictOf(first.verdict),
    },
    picture: shapePicture(shapeId, { ...dimensions, [solveFor]: first.dimension.value }),
    cautions: [...new Set(solutions.flatMap(({ cautions }) => cautions))],
    sections: [
      { id: "solutions", title: "Solutions", blocks: [found] },
      { ...inputs, blocks: [looked, ...inputs.blocks] },
      ...others,
      ...answerSections(asked.data, { ...first, ...rest }).map((section) =>
        section.id === "answer" ? { ...section, title: `Answer at ${first.dimension.text}` } : section,
      ),
    ],
  };
}

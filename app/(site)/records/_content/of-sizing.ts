/** What a record of `sizing` tells: the dimension or scale that was looked for, its solutions, and what it rests on. */
import { z } from "zod";
import { fieldSources, findShape, shapeEntry, sizingResultSchema, type SizingResult } from "@/lib/engine";
import { checksSection, linesSection, operatingFacts, sourceLines } from "./answer";
import type { Told } from "./content";
import { shapePicture } from "./inputs";
import { outlineSections, storedFieldRequest } from "./of-field";
import { answerSections, inputSections, type LookUp, storedRequest } from "./of-resistance";
import { inCalculator } from "./open-again";
import { outlineSvg } from "./outline-svg";
import { allCautions, lookedFor, sizingHeadline, solutionsTable } from "./sizing-answer";
import { words } from "./typed";

const sought = {
  solveFor: z.string(),
  target: z.unknown().optional(),
  within: z.array(z.unknown()).optional(),
};
const onShape = storedRequest.extend(sought);
const onOutline = storedFieldRequest.extend(sought);

/** Null where the record was stored in a form that today's service no longer reads. */
export function tellSizing(request: unknown, result: unknown, lookUp: LookUp): Told | null {
  const answer = sizingResultSchema.safeParse(result);
  if (!answer.success || answer.data.solutions.length === 0) return null;
  const shape = onShape.safeParse(request);
  if (shape.success) return ofShape(shape.data, answer.data, lookUp);
  const outline = onOutline.safeParse(request);
  return outline.success ? ofOutline(outline.data, answer.data, lookUp) : null;
}

function ofShape(asked: z.infer<typeof onShape>, result: SizingResult, lookUp: LookUp): Told {
  const { shape: shapeId, dimensions, solveFor, target } = asked;
  const [first] = result.solutions;
  const shape = findShape(shapeId);
  const dimension = shape && shapeEntry(shape).dimensions.find(({ name }) => name === solveFor);
  const label = dimension?.label ?? words(solveFor);
  const [inputs, ...others] = inputSections(asked, result.materials, lookUp);
  const rest = { shape: shapeId, assumptions: result.assumptions, sources: result.sources };
  const found = { ...dimensions, [solveFor]: first.dimension.text };
  return {
    subject: `${shape?.title ?? words(shapeId)}: sizing`,
    headline: sizingHeadline(label, result),
    picture: shapePicture(shapeId, { ...dimensions, [solveFor]: first.dimension.value }),
    cautions: allCautions(result),
    openAgain: inCalculator({ ...asked, dimensions: found }),
    sections: [
      { id: "solutions", title: "Solutions", blocks: [solutionsTable(label, result)] },
      { ...inputs, blocks: [lookedFor(label, target, result), ...inputs.blocks] },
      ...others,
      ...answerSections(asked, { ...first, ...rest }).map((section) =>
        section.id === "answer" ? { ...section, title: `Answer at ${first.dimension.text}` } : section,
      ),
    ],
  };
}

const SCALES: Readonly<Record<string, string>> = {
  scale: "Scale",
  scaleX: "Scale in x",
  scaleY: "Scale in y",
};

function ofOutline(asked: z.infer<typeof onOutline>, result: SizingResult, lookUp: LookUp): Told {
  const { outline, terminals, solveFor, target } = asked;
  const [first] = result.solutions;
  const label = SCALES[solveFor] ?? words(solveFor);
  const [inputs, ...others] = outlineSections(asked, result.materials, lookUp);
  return {
    subject: "Outline: sizing",
    headline: sizingHeadline(label, result),
    picture: {
      kind: "svg",
      draw: (look) => outlineSvg(outline, terminals, look),
      description: "The outline with its terminals, before it is scaled.",
    },
    cautions: allCautions(result),
    sections: [
      { id: "solutions", title: "Solutions", blocks: [solutionsTable(label, result)] },
      { ...inputs, blocks: [lookedFor(label, target, result), ...inputs.blocks] },
      ...others,
      {
        id: "answer",
        title: `Answer at the scale ${first.dimension.text}`,
        blocks: [
          {
            kind: "facts",
            facts: [
              { name: "Conductance", value: first.conductance.text },
              ...operatingFacts(first.operating),
            ],
          },
        ],
      },
      ...checksSection(first.checks),
      ...linesSection("assumptions", "Assumptions", result.assumptions),
      ...linesSection("sources", "Sources", sourceLines([...fieldSources(outline), ...result.sources])),
    ],
  };
}

/** What a record of `sizing` tells: the dimension that was looked for, its solutions, and the shape at the first. */
import { z } from "zod";
import { boundedResistanceSchema, findShape, shapeEntry } from "@/lib/engine";
import { bracketOf, linesSection } from "./answer";
import type { Block, Told } from "./content";
import { shapePicture } from "./inputs";
import { INPUT_COLUMNS } from "./medium";
import { inputSections, type LookUp, storedRequest } from "./of-resistance";
import { plainNumber, siText, typedText, words } from "./typed";

const sizingRequest = storedRequest.extend({
  solveFor: z.string(),
  target: z.unknown(),
  within: z.array(z.unknown()).optional(),
});

const quantity = z.object({ value: z.number(), unit: z.string(), text: z.string() });
const sizingResult = z.object({
  solutions: z
    .array(
      z.object({
        dimension: quantity,
        resistance: boundedResistanceSchema,
        sensitivity: z.union([quantity, z.number()]).optional(),
      }),
    )
    .min(1),
  cautions: z.array(z.string()).default([]),
  assumptions: z.array(z.string()).default([]),
  materials: z
    .array(z.object({ id: z.string(), version: z.number(), name: z.string().optional() }))
    .default([]),
});

/** Null where the record was stored in a form that today's service no longer reads. */
export function tellSizing(request: unknown, result: unknown, lookUp: LookUp): Told | null {
  const asked = sizingRequest.safeParse(request);
  const answer = sizingResult.safeParse(result);
  if (!asked.success || !answer.success) return null;
  const { shape: shapeId, dimensions, solveFor, target, within } = asked.data;
  const { solutions, cautions, assumptions, materials } = answer.data;
  const shape = findShape(shapeId);
  const dimension = shape && shapeEntry(shape).dimensions.find(({ name }) => name === solveFor);
  const label = dimension?.label ?? words(solveFor);
  const rows = [
    ["Looked for", label, ""],
    ["Target", typedText(target, "resistance"), siText(target, "resistance")],
    ...(within ? [["Within", within.map((end) => typedText(end, "length")).join(" to "), ""]] : []),
  ];
  const [first] = solutions;
  const found: Block = {
    kind: "table",
    label: "Solutions",
    columns: [
      { title: label, numeric: true },
      { title: "Resistance", numeric: true },
      { title: "Bounds", numeric: true, weight: 1.8 },
      { title: "Change of resistance by the dimension", numeric: true, weight: 1.2 },
    ],
    rows: solutions.map(({ dimension: at, resistance, sensitivity }) => [
      at.text,
      resistance.text,
      bracketOf(resistance),
      sensitivity === undefined
        ? ""
        : typeof sensitivity === "number"
          ? plainNumber(sensitivity)
          : sensitivity.text,
    ]),
  };
  const [inputs, ...others] = inputSections(asked.data, materials, lookUp);
  const looked: Block = { kind: "table", label: "What was looked for", columns: INPUT_COLUMNS, rows };
  return {
    subject: `${shape?.title ?? words(shapeId)}: sizing`,
    headline: {
      title: `${label} for ${typedText(target, "resistance")}`,
      text: solutions.map(({ dimension: at }) => at.text).join(" or "),
      bracket: null,
      statements: [
        `There the resistance is ${first.resistance.text} ${bracketOf(first.resistance)}.`,
        ...(solutions.length > 1 ? [`${solutions.length} solutions lie in the range.`] : []),
      ],
      verdict: null,
    },
    picture: shapePicture(shapeId, { ...dimensions, [solveFor]: first.dimension.value }),
    cautions,
    sections: [
      { id: "solutions", title: "Solutions", blocks: [found] },
      { ...inputs, blocks: [looked, ...inputs.blocks] },
      ...others,
      ...linesSection("assumptions", "Assumptions", assumptions),
    ],
  };
}

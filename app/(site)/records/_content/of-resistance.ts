/** What a record of `resistance` tells: one shape, one medium, one number. */
import { z } from "zod";
import {
  findShape,
  type Material,
  type ResistanceResult,
  resistanceResultSchema,
  shapeEntry,
} from "@/lib/engine";
import { METHODS } from "../../calculate/_calculator/answer/words";
import {
  boundedHeadline,
  checksSection,
  linesSection,
  operatingFacts,
  sourceLines,
  uncertaintySection,
  verdictOf,
} from "./answer";
import type { Block, Fact, Section, Told } from "./content";
import { askedTable, dimensionsTable, shapePicture } from "./inputs";
import { materialBlocks, mediumBlocks } from "./medium";
import { inCalculator } from "./open-again";
import { words } from "./typed";

const given = z.record(z.string(), z.unknown());

/** The members of a request that a record tells; whatever else it has stays in the stored request. */
export const storedRequest = z.object({
  shape: z.string(),
  dimensions: given,
  medium: given.optional(),
  media: z.record(z.string(), given).optional(),
  operating: given.optional(),
  requirement: given.optional(),
  uncertainty: given.optional(),
});
export type StoredRequest = z.infer<typeof storedRequest>;

/** Finds a material at a version. */
export type LookUp = (id: string, version: number) => Material | undefined;

/** Null where the record was stored in a form that today's service no longer reads. */
export function tellResistance(request: unknown, result: unknown, lookUp: LookUp): Told | null {
  const asked = storedRequest.safeParse(request);
  const answer = resistanceResultSchema.safeParse(result);
  if (!asked.success || !answer.success) return null;
  const { resistance, method, verdict, cautions } = answer.data;
  return {
    subject: findShape(asked.data.shape)?.title ?? words(asked.data.shape),
    headline: {
      ...boundedHeadline("Resistance between the terminals", resistance, METHODS[method]),
      verdict: verdictOf(verdict),
    },
    picture: shapePicture(asked.data.shape, asked.data.dimensions),
    cautions,
    openAgain: inCalculator(asked.data),
    sections: [
      ...inputSections(asked.data, answer.data.materials, lookUp),
      ...answerSections(asked.data, answer.data),
    ],
  };
}

/** Dimensions, medium with its materials, operating point and requirement. */
export function inputSections(
  request: StoredRequest,
  materials: readonly { readonly id: string; readonly version: number; readonly name?: string }[],
  lookUp: LookUp,
): Section[] {
  const shape = findShape(request.shape);
  const entry = shape && shapeEntry(shape);
  const dimensions: Block = entry
    ? dimensionsTable(entry, request.dimensions)
    : { kind: "code", label: "dimensions", text: JSON.stringify(request.dimensions, null, 2) };
  const asked = askedTable(request.operating, request.requirement);
  return [
    { id: "inputs", title: "Inputs", blocks: [dimensions] },
    {
      id: "medium",
      title: "Medium",
      blocks: [...mediumBlocks(request.medium, request.media, entry), ...materialBlocks(materials, lookUp)],
    },
    ...(asked.length > 0 ? [{ id: "asked", title: "Asked for", blocks: asked }] : []),
  ];
}

/** What an answer has behind its number. */
export type AnswerParts = Pick<
  ResistanceResult,
  "shape" | "conductance" | "operating" | "peak" | "quadrature" | "uncertainty" | "steps" | "checks"
> &
  Pick<ResistanceResult, "assumptions" | "sources">;

/** Operating point, tolerances, steps, checks, and what the answer rests on. */
export function answerSections(request: StoredRequest, result: AnswerParts): Section[] {
  const shape = findShape(result.shape);
  const how: Block[] = [
    ...(shape && isGraded(request)
      ? [{ kind: "paragraph", text: "The law of a uniform medium, for comparison:" } as const]
      : []),
    ...(shape ? [{ kind: "law", tex: shape.formula } as const] : []),
    ...(result.steps ? [{ kind: "steps", steps: result.steps } as const] : []),
  ];
  return [
    {
      id: "answer",
      title: "Answer at the operating point",
      blocks: [{ kind: "facts", facts: pointFacts(result) }],
    },
    ...uncertaintySection(result.uncertainty, shape && shapeEntry(shape)),
    ...(how.length > 0 ? [{ id: "steps", title: "How the number came about", blocks: how }] : []),
    ...checksSection(result.checks),
    ...linesSection("assumptions", "Assumptions", result.assumptions),
    ...linesSection("validity", "Where the law holds", shape?.validity ?? []),
    ...linesSection("sources", "Sources", sourceLines(result.sources)),
  ];
}

function isGraded({ medium, media }: StoredRequest): boolean {
  return [medium, ...Object.values(media ?? {})].some((one) => one?.graded !== undefined);
}

function pointFacts({ conductance, operating, peak, quadrature }: AnswerParts): Fact[] {
  const per = peak?.per === "volt" ? " at 1\u2009V" : "";
  const peakFact = (
    name: string,
    quantity: { readonly value: number | null; readonly text: string },
    place: string,
  ): Fact =>
    quantity.value === null && place.startsWith(quantity.text)
      ? { name, value: place }
      : { name, value: `${quantity.text}${quantity.value === null ? "" : per}`, note: place };
  return [
    { name: "Conductance", value: conductance.text },
    ...operatingFacts(operating),
    ...(peak
      ? [
          peakFact("Peak field", peak.field, peak.position.text),
          peakFact("Peak density", peak.currentDensity, peak.currentDensityPosition.text),
        ]
      : []),
    ...(quadrature
      ? [
          {
            name: "Integral",
            value: quadrature.status === "converged" ? "converged" : "ended at its cap",
            note: `${quadrature.evaluations} evaluations`,
          },
        ]
      : []),
  ];
}

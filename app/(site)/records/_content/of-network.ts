/** What a record of `network` tells: elements between named nodes, and what each carries. */
import { z } from "zod";
import { findShape, networkResultSchema, type ShapeEntry, shapeEntry } from "@/lib/engine";
import type { NetworkResult } from "@/lib/engine/network/result-schema";
import { engineering } from "../../calculate/_calculator/answer/engineering";
import {
  bracketOf,
  checksSection,
  linesSection,
  operatingFacts,
  sourceLines,
  toleranceSection,
  verdictOf,
} from "./answer";
import type { Block, Picture, Section, Told } from "./content";
import { askedTable } from "./inputs";
import { materialBlocks } from "./medium";
import { MOST_DRAWN, networkSvg } from "./network-svg";
import type { LookUp } from "./of-resistance";
import { inNetwork } from "./open-again";
import { plainNumber, typedText, words } from "./typed";

const given = z.record(z.string(), z.unknown());

const networkRequest = z.object({
  elements: z.array(
    z.object({
      name: z.string(),
      between: z.array(z.string()),
      resistance: z.unknown().optional(),
      request: z
        .object({ shape: z.string(), dimensions: given.default({}), medium: given.optional() })
        .optional(),
    }),
  ),
  ports: z.array(z.string()),
  operating: given.optional(),
  requirement: given.optional(),
});
type Element = z.infer<typeof networkRequest>["elements"][number];

/** Members of a medium that a line of a table has no room for. */
const NOT_TOLD = new Set(["graded", "extrapolate"]);

/** A sheet of paper is not the place for ten thousand elements; the stored request has them all. */
const MOST_ROWS = 200;

/** Null where the record was stored in a form that today's service no longer reads. */
export function tellNetwork(request: unknown, result: unknown, lookUp: LookUp): Told | null {
  const asked = networkRequest.safeParse(request);
  const answer = networkResultSchema.safeParse(result);
  if (!asked.success || !answer.success) return null;
  const { ports, elements } = asked.data;
  const { resistance, verdict, cautions, assumptions, sources, materials, checks } = answer.data;
  const used = materialBlocks(materials, lookUp);
  const { proved, boundsBasis } = resistance;
  const basis =
    boundsBasis === "rounding"
      ? "The bounds hold the rounding of the computation."
      : "The bounds come from all elements at their lowest and all at their highest: a network\u2019s resistance never falls when an element\u2019s rises.";
  return {
    subject: "Network",
    openAgain: inNetwork(request),
    headline: {
      title: `Resistance from ${ports.join(" to ")}`,
      text: resistance.text,
      bracket: bracketOf(resistance),
      statements: [
        `Network of ${elements.length} elements, bounds ${proved ? "proved" : "not proved"}. ${basis}`,
      ],
      verdict: verdictOf(verdict),
    },
    picture: pictureOf(answer.data.elements, ports),
    cautions,
    sections: [
      {
        id: "inputs",
        title: "Inputs",
        blocks: [elementsAsked(elements), ...askedTable(asked.data.operating, asked.data.requirement)],
      },
      ...(used.length > 0 ? [{ id: "medium", title: "Materials", blocks: used }] : []),
      ...carriedSections(answer.data),
      ...straySection(answer.data),
      ...checksSection(checks),
      ...linesSection("assumptions", "Assumptions", assumptions),
      ...linesSection("sources", "Sources", sourceLines(sources)),
    ],
  };
}

/** What the tolerances of the elements do to the whole; materials that several share stand for themselves. */
function straySection({ uncertainty, materials }: NetworkResult): Section[] {
  if (!uncertainty) return [];
  const parts = shown(uncertainty.contributions).map(({ element, material = "", ...part }) => ({
    name: element ?? `${materials.find(({ id }) => id === material)?.name ?? material}, as stated`,
    ...part,
  }));
  return toleranceSection("Tolerances of the elements", "Element or material", uncertainty, parts);
}

function pictureOf(
  elements: z.infer<typeof networkResultSchema>["elements"],
  ports: readonly string[],
): Picture | null {
  const [first, second] = ports;
  if (elements.length > MOST_DRAWN || second === undefined) return null;
  const drawn = elements.map(({ name, between, resistance }) => {
    const [from, to] = between;
    return { name, from, to, resistance: engineering(resistance, "Ω") };
  });
  return {
    kind: "svg",
    draw: (look) => networkSvg(drawn, [first, second], look),
    description: `The network from ${first} to ${second}: ${elements.length} elements with their resistances.`,
  };
}

function elementsAsked(elements: readonly Element[]): Block {
  return {
    kind: "table",
    label: "Elements as asked",
    columns: [
      { title: "Element", weight: 1 },
      { title: "Between", weight: 1 },
      { title: "What it is", numeric: true, weight: 2.6 },
    ],
    rows: shown(elements).map((element) => [
      element.name,
      element.between.join(" and "),
      elementText(element),
    ]),
  };
}

function elementText({ resistance, request }: Element): string {
  if (!request) return typedText(resistance, "resistance");
  const shape = findShape(request.shape);
  const entry = shape && shapeEntry(shape);
  const parts = Object.entries(request.dimensions).map(
    ([name, value]) => `${symbolOf(entry, name)} ${typedText(value)}`,
  );
  const medium = Object.entries(request.medium ?? {}).flatMap(([name, value]) =>
    NOT_TOLD.has(name) ? [] : [value],
  );
  return [entry?.title ?? words(request.shape), ...parts, ...medium.map((value) => typedText(value))].join(
    ", ",
  );
}

function symbolOf(entry: ShapeEntry | undefined, name: string): string {
  return entry?.dimensions.find((dimension) => dimension.name === name)?.label.toLowerCase() ?? words(name);
}

function carriedSections({
  elements,
  nodes,
  operating,
  per,
}: z.infer<typeof networkResultSchema>): Section[] {
  const carried: Block = {
    kind: "table",
    label: "Elements",
    columns: [
      { title: "Element", weight: 1.2 },
      { title: "Resistance", numeric: true, weight: 1.1 },
      { title: "Voltage", numeric: true },
      { title: "Current", numeric: true },
      { title: "Power", numeric: true },
      { title: "Share of the power", numeric: true, weight: 0.8 },
    ],
    rows: shown(elements).map(({ name, resistance, voltage, current, power, share }) => [
      name,
      engineering(resistance, "Ω"),
      engineering(voltage, "V"),
      engineering(current, "A"),
      engineering(power, "W"),
      `${plainNumber(Number((share * 100).toPrecision(3)))} %`,
    ]),
  };
  const table: Block = {
    kind: "table",
    label: "Nodes",
    columns: [{ title: "Node" }, { title: "Voltage against the second port", numeric: true }],
    rows: shown(nodes).map(({ name, voltage }) => [name, engineering(voltage, "V")]),
  };
  const left = elements.length > MOST_ROWS ? `The first ${MOST_ROWS} of ${elements.length} elements. ` : "";
  return [
    {
      id: "answer",
      title:
        per === "volt"
          ? "What the elements carry, for 1\u2009V between the ports"
          : "What the elements carry",
      blocks: [
        { kind: "facts", facts: operatingFacts(operating) },
        ...(left === ""
          ? []
          : [{ kind: "paragraph", text: `${left}The stored result has them all.` } as const]),
        carried,
        table,
      ],
    },
  ];
}

function shown<Item>(items: readonly Item[]): readonly Item[] {
  return items.slice(0, MOST_ROWS);
}

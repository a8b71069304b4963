/** What a record of `networks` tells: elements between named nodes, and what each carries. */
import { z } from "zod";
import { boundedResistanceSchema, checkSchema, findShape } from "@/lib/engine";
import { engineering } from "../../calculate/_calculator/answer/engineering";
import { bracketOf, checksSection, linesSection } from "./answer";
import type { Block, Told } from "./content";
import { askedTable } from "./inputs";
import { type LookUp } from "./of-resistance";
import { materialBlocks } from "./medium";
import { typedText, words } from "./typed";

const given = z.record(z.string(), z.unknown());
const bounded = boundedResistanceSchema.partial({ boundsBasis: true, proved: true });
const reading = z.union([z.number(), z.object({ value: z.number(), text: z.string() })]);

const networkRequest = z.object({
  elements: z.array(
    z.object({
      name: z.string(),
      between: z.array(z.string()),
      resistance: z.unknown(),
      request: z.object({ shape: z.string(), dimensions: given.optional() }).optional(),
    }),
  ),
  ports: z.array(z.string()),
  operating: given.optional(),
  requirement: given.optional(),
});

const networkResult = z.object({
  resistance: bounded,
  nodes: z.array(z.object({ name: z.string(), voltage: reading.optional() })).default([]),
  elements: z
    .array(
      z.object({
        name: z.string(),
        resistance: bounded,
        current: reading.optional(),
        voltage: reading.optional(),
        power: reading.optional(),
        share: z.number().optional(),
      }),
    )
    .default([]),
  checks: z.array(checkSchema).optional(),
  cautions: z.array(z.string()).default([]),
  assumptions: z.array(z.string()).default([]),
  materials: z
    .array(z.object({ id: z.string(), version: z.number(), name: z.string().optional() }))
    .default([]),
});

/** Null where the record was stored in a form that today's service no longer reads. */
export function tellNetwork(request: unknown, result: unknown, lookUp: LookUp): Told | null {
  const asked = networkRequest.safeParse(request);
  const answer = networkResult.safeParse(result);
  if (!asked.success || !answer.success) return null;
  const { ports, elements } = asked.data;
  const { resistance, nodes, cautions, assumptions, materials, checks } = answer.data;
  const text = (value: z.infer<typeof reading> | undefined, unit: string) =>
    value === undefined ? "" : typeof value === "number" ? engineering(value, unit) : value.text;
  const carried: Block = {
    kind: "table",
    label: "Elements",
    columns: [
      { title: "Element", weight: 1.2 },
      { title: "Resistance", numeric: true },
      { title: "Bounds", numeric: true, weight: 1.6 },
      { title: "Voltage", numeric: true },
      { title: "Current", numeric: true },
      { title: "Power", numeric: true },
    ],
    rows: answer.data.elements.map((element) => [
      element.name,
      element.resistance.text,
      bracketOf(element.resistance),
      text(element.voltage, "V"),
      text(element.current, "A"),
      text(element.power, "W"),
    ]),
  };
  const made: Block = {
    kind: "table",
    label: "Elements as asked",
    columns: [
      { title: "Element", weight: 1 },
      { title: "Between", weight: 1 },
      { title: "What it is", numeric: true, weight: 2.4 },
    ],
    rows: elements.map(({ name, between, resistance: typed, request: part }) => [
      name,
      between.join(" and "),
      part
        ? `${findShape(part.shape)?.title ?? words(part.shape)}: ${dimensionsText(part.dimensions)}`
        : typedText(typed, "resistance"),
    ]),
  };
  const asks = askedTable(asked.data.operating, asked.data.requirement);
  const used = materialBlocks(materials, lookUp);
  return {
    subject: "Network",
    headline: {
      title: `Resistance from ${ports.join(" to ")}`,
      text: resistance.text,
      bracket: bracketOf(resistance),
      statements: ["The bounds come from all elements at their lower and all at their upper bounds."],
      verdict: null,
    },
    picture: null,
    cautions,
    sections: [
      { id: "elements", title: "What the elements carry", blocks: [carried, ...nodeTable(nodes, text)] },
      { id: "inputs", title: "Inputs", blocks: [made, ...asks] },
      ...(used.length > 0 ? [{ id: "medium", title: "Materials", blocks: used }] : []),
      ...checksSection(checks),
      ...linesSection("assumptions", "Assumptions", assumptions),
    ],
  };
}

function dimensionsText(dimensions: Readonly<Record<string, unknown>> = {}): string {
  return Object.entries(dimensions)
    .map(([name, value]) => `${words(name).toLowerCase()} ${typedText(value)}`)
    .join(", ");
}

function nodeTable(
  nodes: z.infer<typeof networkResult>["nodes"],
  text: (value: z.infer<typeof reading> | undefined, unit: string) => string,
): Block[] {
  if (nodes.every(({ voltage }) => voltage === undefined)) return [];
  return [
    {
      kind: "table",
      label: "Nodes",
      columns: [{ title: "Node" }, { title: "Voltage", numeric: true }],
      rows: nodes.map(({ name, voltage }) => [name, text(voltage, "V")]),
    },
  ];
}

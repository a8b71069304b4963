/** What a record of `field` tells: an outline, its terminals and medium, the bracket of two solutions. */
import { z } from "zod";
import { fieldResultSchema, fieldSources, type FieldResult } from "@/lib/engine";
import {
  bracketOf,
  boundedHeadline,
  checksSection,
  linesSection,
  operatingFacts,
  sourceLines,
  verdictOf,
} from "./answer";
import type { Block, Draw, Fact, Headline, Picture, Section, Told } from "./content";
import { askedTable } from "./inputs";
import { materialBlocks, mediumBlocks } from "./medium";
import type { LookUp } from "./of-resistance";
import { inOutline } from "./open-again";
import { outlineSvg, storedOutline, storedTerminals } from "./outline-svg";
import { plainNumber } from "./typed";

const given = z.record(z.string(), z.unknown());

/** The members of a field request that a record tells. */
export const storedFieldRequest = z.object({
  outline: storedOutline,
  terminals: storedTerminals,
  medium: given,
  accuracy: z.number().optional(),
  operating: given.optional(),
  requirement: given.optional(),
});
type StoredRequest = z.infer<typeof storedFieldRequest>;

/** `plot` draws the finished picture, where its map is still kept; without it the outline is drawn. */
export function tellField(request: unknown, result: unknown, lookUp: LookUp, plot: Draw | null): Told | null {
  const asked = storedFieldRequest.safeParse(request);
  const answer = fieldResultSchema.safeParse(result);
  if (!asked.success || !answer.success) return null;
  const picture: Picture = plot
    ? {
        kind: "svg",
        draw: plot,
        description: "Current density, equipotentials and stream lines on the outline.",
      }
    : {
        kind: "svg",
        draw: (look) => outlineSvg(asked.data.outline, asked.data.terminals, look),
        description: "The outline with its terminals.",
      };
  return {
    subject: asked.data.outline.symmetry === "axisymmetric" ? "Outline about an axis" : "Outline",
    headline: headlineOf(answer.data),
    picture,
    cautions: answer.data.cautions,
    sections: [
      ...outlineSections(asked.data, answer.data.materials, lookUp),
      ...answers(answer.data),
      ...linesSection("sources", "Sources", sourceLines(fieldSources(asked.data.outline))),
    ],
    openAgain: inOutline(request),
  };
}

function headlineOf(result: FieldResult): Headline {
  const { resistance, pairs, verdict, limit } = result;
  const stopped = limit ? [`The wanted accuracy was not reached: ${limit}`] : [];
  if (resistance) {
    const headline = boundedHeadline("Resistance between the terminals", resistance, "Field solution");
    return { ...headline, statements: [...headline.statements, ...stopped], verdict: verdictOf(verdict) };
  }
  const first = pairs?.[0];
  return {
    title: first ? `From ${first.between[0]} to ${first.between[1]}, the others open` : "Field solution",
    text: first?.floating.text ?? "",
    bracket: first ? pairBracket(first.floating) : null,
    statements: ["All pairs of terminals are listed below.", ...stopped],
    verdict: verdictOf(verdict),
  };
}

function pairBracket({
  value,
  lower,
  upper,
}: {
  value: number | null;
  lower: number;
  upper: number | null;
}): string {
  return value === null || upper === null
    ? `above ${plainNumber(lower)} Ω`
    : bracketOf({ value, lower, upper });
}

/** Longer outlines are in the stored request; a sheet of paper is not the place for ten thousand vertices. */
const MOST_VERTICES = 120;

/** Outline, terminals, medium with its materials, and what was asked for. */
export function outlineSections(
  request: StoredRequest,
  materials: FieldResult["materials"],
  lookUp: LookUp,
): Section[] {
  const { outline, terminals, accuracy } = request;
  const vertices = outline.outer.length + outline.holes.reduce((sum, ring) => sum + ring.length, 0);
  const facts: Fact[] = [
    { name: "Unit of the coordinates", value: outline.unit },
    { name: "Symmetry", value: outline.symmetry === "axisymmetric" ? "about the axis x = 0" : "plan sheet" },
    {
      name: "Rings",
      value: `one outer${outline.holes.length > 0 ? `, holes: ${outline.holes.length}` : ""}`,
    },
    { name: "Accuracy wanted", value: plainNumber(accuracy ?? 1e-4), note: "(upper − lower)/value" },
  ];
  const coordinates: Block =
    vertices > MOST_VERTICES
      ? { kind: "paragraph", text: `The ${vertices} vertices are in the stored request.` }
      : vertexTable(outline);
  const asked = askedTable(request.operating, request.requirement);
  return [
    {
      id: "inputs",
      title: "Outline and terminals",
      blocks: [{ kind: "facts", facts }, terminalTable(terminals), coordinates],
    },
    {
      id: "medium",
      title: "Medium",
      blocks: [...mediumBlocks(request.medium, undefined), ...materialBlocks(materials, lookUp)],
    },
    ...(asked.length > 0 ? [{ id: "asked", title: "Asked for", blocks: asked }] : []),
  ];
}

function vertexTable(outline: StoredRequest["outline"]): Block {
  const rings = [outline.outer, ...outline.holes];
  const curved = rings.some((ring) => ring.some((vertex) => !Array.isArray(vertex)));
  const pair = (point: readonly number[]) => point.map(plainNumber).join(", ");
  return {
    kind: "table",
    label: `Vertices, ${outline.unit}`,
    columns: [
      { title: "Ring", weight: 0.7 },
      { title: "Vertex", weight: 0.5 },
      { title: `x, y in ${outline.unit}`, numeric: true, weight: 1.4 },
      ...(curved ? [{ title: "Arrives by", numeric: true, weight: 2 }] : []),
    ],
    rows: rings.flatMap((ring, index) =>
      ring.map((vertex, place) => {
        const arc = Array.isArray(vertex) ? null : vertex;
        const way = arc ? `arc about ${pair(arc.center)}${arc.clockwise ? ", clockwise" : ""}` : "line";
        return [
          index === 0 ? "outer" : `hole ${index - 1}`,
          String(place),
          pair(Array.isArray(vertex) ? vertex : vertex.arcTo),
          ...(curved ? [way] : []),
        ];
      }),
    ),
  };
}

const MOST_PLACES = 20;

type Part = NonNullable<StoredRequest["terminals"][number]["parts"]>[number];

function partText({ ring, edge, from, to }: Part): string {
  const share = from === 0 && to === 1 ? "" : `, ${plainNumber(from)} to ${plainNumber(to)}`;
  return `${ring === 0 ? "outer ring" : `hole ${ring - 1}`}, edge ${edge}${share}`;
}

function terminalTable(terminals: StoredRequest["terminals"]): Block {
  const place = ([[ax, ay], [bx, by]]: readonly [readonly [number, number], readonly [number, number]]) =>
    `${plainNumber(ax)}, ${plainNumber(ay)} to ${plainNumber(bx)}, ${plainNumber(by)}`;
  return {
    kind: "table",
    label: "Terminals",
    columns: [{ title: "Terminal" }, { title: "Where on the boundary", numeric: true, weight: 2.5 }],
    rows: terminals.map(({ name, segments = [], parts = [] }) => {
      const places = [...segments.map(place), ...parts.map(partText)];
      const more = places.length > MOST_PLACES ? [`and ${places.length - MOST_PLACES} more`] : [];
      return [name, [...places.slice(0, MOST_PLACES), ...more].join("; ")];
    }),
  };
}

function answers(result: FieldResult): Section[] {
  const { squares, operating, peak, mesh, seconds, pairs } = result;
  const facts: Fact[] = [
    ...(squares
      ? [
          {
            name: "Squares",
            value: squares.text,
            note: `${plainNumber(squares.lower)} … ${plainNumber(squares.upper)}`,
          },
        ]
      : []),
    ...operatingFacts(operating),
    ...(peak ? [{ name: "Peak", value: peak.text }] : []),
    {
      name: "Mesh",
      value: `${mesh.triangles} triangles, ${mesh.unknowns} unknowns, ${mesh.refinements} refinements`,
    },
    { name: "Time", value: `${plainNumber(Number(seconds.toPrecision(3)))}\u2009s` },
  ];
  const blocks: Block[] = [{ kind: "facts", facts }];
  if (pairs) {
    blocks.push({
      kind: "table",
      label: "Pairs of terminals",
      columns: [
        { title: "Between", weight: 0.9 },
        { title: "Others open", numeric: true, weight: 1.6 },
        { title: "Others at zero", numeric: true, weight: 1.6 },
      ],
      rows: pairs.map(({ between, floating, grounded }) => [
        between.join(" and "),
        `${floating.text} ${pairBracket(floating)}`,
        `${grounded.text} ${pairBracket(grounded)}`,
      ]),
    });
  }
  return [
    { id: "answer", title: "Answer at the operating point", blocks },
    ...checksSection(result.checks),
    ...linesSection("repairs", "Put right on the outline", result.repairs),
    ...linesSection("assumptions", "Assumptions", result.assumptions),
  ];
}

/** A shape as it goes over the wire: everything that a form, a document or a client needs. */
import { z } from "zod";
import { radiansToDegrees } from "../quantity/parse-quantity";
import { boundsBasisSchema, sourceSchema } from "../resistance/result-schema";
import type { Dimension, Shape } from "./define-shape";
import { dimensionGroups, namesOf } from "./resolve-dimensions";

export const familySchema = z
  .enum(["axial", "tapered", "radial", "spreading", "sheet", "earthing"])
  .meta({ description: "Family of shapes." });

export const dimensionEntrySchema = z
  .object({
    name: z.string(),
    label: z.string(),
    symbol: z.string(),
    type: z.enum(["quantity", "integer", "choice"]),
    unit: z
      .string()
      .nullable()
      .meta({ description: "Unit of a bare number: m, m^2, deg or 1; null for a choice." }),
    required: z.boolean().meta({ description: "Whether it, or another of its alternatives, must be given." }),
    default: z
      .union([z.number(), z.string()])
      .nullable()
      .meta({ description: "Value when left out, in `unit`." }),
    range: z
      .object({
        min: z.number(),
        exclusiveMin: z.boolean().meta({ description: "Whether `min` itself is excluded." }),
        max: z.number().nullable(),
      })
      .nullable()
      .meta({ description: "Admitted values, in `unit`; null for a choice." }),
    choices: z.array(z.object({ value: z.string(), label: z.string() })).nullable(),
    help: z.string(),
  })
  .meta({ description: "A dimension as a request may give it." });

export const shapeEntrySchema = z
  .object({
    id: z.string(),
    title: z.string(),
    family: familySchema,
    summary: z.string(),
    dimensions: z.array(dimensionEntrySchema),
    alternatives: z
      .array(z.array(z.string()))
      .meta({ description: "Groups of dimensions of which exactly one is given." }),
    coordinates: z.array(
      z.object({
        name: z.string(),
        role: z.enum(["along", "across"]),
        unit: z.enum(["m", "rad"]),
        label: z.string(),
        start: z.string(),
        end: z.string(),
      }),
    ),
    media: z
      .object({
        kind: z.enum(["single", "sheet", "two"]),
        names: z.array(z.object({ name: z.string(), label: z.string() })),
        gradable: z.array(z.string()).meta({ description: "Coordinates along which the medium may vary." }),
      })
      .meta({
        description: "What the shape is filled with: `medium` (bulk or sheet), or `media` by these names.",
      }),
    terminals: z.object({ high: z.string(), low: z.string() }),
    constraints: z.array(z.object({ dimensions: z.array(z.string()), text: z.string() })),
    formula: z.string().meta({ description: "TeX of the law for a uniform medium." }),
    boundsBasis: boundsBasisSchema,
    validity: z.array(z.string()),
    cautions: z.array(z.string()),
    assumptions: z.array(z.string()),
    sources: z.array(sourceSchema),
    example: z.record(z.string(), z.unknown()).meta({ description: "A request body that works." }),
  })
  .meta({ description: "One entry of the catalogue." });

export type ShapeEntry = z.infer<typeof shapeEntrySchema>;
export type DimensionEntry = z.infer<typeof dimensionEntrySchema>;

/** The wire entry of a shape; the radius and diameter twins appear as dimensions of their own. */
export function shapeEntry(shape: Shape): ShapeEntry {
  const groups = dimensionGroups(shape);
  const grouped = new Set(groups.filter((names) => names.length > 1).flat());
  return {
    id: shape.id,
    title: shape.title,
    family: shape.family,
    summary: shape.summary,
    dimensions: Object.entries(shape.dimensions).flatMap(([name, dimension]) =>
      namesOf(name, dimension).map(([input, factor]) => dimensionEntry(input, dimension, factor)),
    ),
    alternatives: groups
      .filter((names) => names.some((name) => grouped.has(name)))
      .map((names) => [...names]),
    coordinates: shape.coordinates.map((coordinate) => ({ ...coordinate })),
    media: shapeMedia(shape),
    terminals: { ...shape.terminals },
    constraints: shape.constraints.map(({ names, text }) => ({ dimensions: [...names], text })),
    formula: shape.formula,
    boundsBasis: shape.boundsBasis,
    validity: [...shape.validity],
    cautions: [...shape.cautions],
    assumptions: [...shape.assumptions],
    sources: shape.sources.map((source) => ({ ...source })),
    example: exampleRequest(shape),
  };
}

/** The shape's example as a whole request body. */
export function exampleRequest(shape: Shape): Record<string, unknown> {
  const { dimensions, medium, media } = shape.example;
  return { shape: shape.id, dimensions: { ...dimensions }, ...(media ? { media } : { medium }) };
}

const media = new WeakMap<Shape, ShapeEntry["media"]>();

/** Whether the shape takes a bulk medium, a sheet's, or two media by name, and where it may be graded. */
export function shapeMedia(shape: Shape): ShapeEntry["media"] {
  const known = media.get(shape);
  if (known) return known;
  const made = makeShapeMedia(shape);
  media.set(shape, made);
  return made;
}

function makeShapeMedia(shape: Shape): ShapeEntry["media"] {
  const { answer } = shape;
  if (answer.kind === "media") {
    return {
      kind: "two",
      names: answer.media.map((entry) => ({ ...entry })),
      gradable: answer.parallel
        ? shape.coordinates.filter(({ role }) => role === "along").map(({ name }) => name)
        : [],
    };
  }
  return {
    kind: shape.family === "sheet" ? "sheet" : "single",
    names: [],
    gradable: answer.kind === "flow" ? shape.coordinates.map(({ name }) => name) : [],
  };
}

function dimensionEntry(name: string, dimension: Dimension, factor: number): DimensionEntry {
  const shared = {
    name,
    label: twinLabel(name, dimension.label, factor),
    symbol: factor === 1 ? dimension.symbol : twinSymbol(dimension.symbol, factor),
    help: factor === 1 ? dimension.help : twinWords(dimension.help, factor),
    required: dimension.default === undefined,
  };
  if (dimension.type === "choice") {
    return {
      ...shared,
      type: "choice",
      unit: null,
      default: dimension.default ?? null,
      range: null,
      choices: dimension.choices.map((choice) => ({ ...choice })),
    };
  }
  if (dimension.type !== "quantity") {
    return {
      ...shared,
      type: dimension.type === "integer" ? "integer" : "quantity",
      unit: "1",
      default: dimension.default ?? null,
      range: {
        min: dimension.min,
        exclusiveMin: dimension.type === "number" && dimension.exclusiveMin === true,
        max: dimension.max,
      },
      choices: null,
    };
  }
  const shown = (value: number): number =>
    (dimension.kind === "angle" ? radiansToDegrees(value) : value) / factor;
  return {
    ...shared,
    type: "quantity",
    unit: dimension.kind === "angle" ? "deg" : dimension.kind === "area" ? "m^2" : "m",
    default: dimension.default === undefined ? null : shown(dimension.default),
    range: {
      min: 0,
      exclusiveMin: dimension.zero !== true,
      max: dimension.max === undefined ? null : shown(dimension.max),
    },
    choices: null,
  };
}

function twinLabel(name: string, label: string, factor: number): string {
  if (factor === 1) return label;
  const swapped = twinWords(label, factor);
  if (swapped !== label) return swapped;
  // A label that does not name the radius: the twin's own name, spelled out.
  const words = name.replace(/([A-Z\d])/g, " $1").toLowerCase();
  return words[0].toUpperCase() + words.slice(1);
}

function twinWords(text: string, factor: number): string {
  return factor === 0.5
    ? text.replace(/radius/gi, match("diameter"))
    : text.replace(/diameter/gi, match("radius"));
}

function match(word: string): (found: string) => string {
  return (found) => (/^[A-Z]/.test(found) ? word[0].toUpperCase() + word.slice(1) : word);
}

function twinSymbol(symbol: string, factor: number): string {
  return factor === 0.5 ? `2${symbol}` : `${symbol}/2`;
}

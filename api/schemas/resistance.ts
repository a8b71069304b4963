import { z } from "zod";
import {
  boundedResistanceSchema,
  catalogue,
  fieldRequestSchema,
  includeSchema,
  operatingSchema,
  recordRequestSchema,
  requirementSchema,
  resistanceResultSchema,
  type Shape,
  shapeEntry,
  shapeEntrySchema,
  sizingFields,
  sizingSolutionSchema,
  tolerancedSchema,
  uncertaintyRequestSchema,
  uncertaintySchema,
} from "@/lib/engine";
import { documentedMedium, documentedOperating } from "./toleranced";

const optional = {
  operating: documentedOperating.optional(),
  include: includeSchema.optional(),
  record: recordRequestSchema.optional(),
  requirement: requirementSchema.optional(),
  uncertainty: uncertaintyRequestSchema.optional(),
};

type Entry = z.infer<typeof shapeEntrySchema>;
type Dimension = Entry["dimensions"][number];

/** The type of one dimension, with the words of the catalogue. */
function dimensionSchema(dimension: Dimension): z.ZodType {
  const { label, symbol, help, unit, type, choices, range } = dimension;
  const standard = dimension.default === null ? "" : ` Left out: ${dimension.default}${bareUnit(unit)}.`;
  const description = `${label} (${symbol}). ${help}${standard}`;
  if (type === "choice") {
    return z.enum((choices ?? []).map(({ value }) => value)).meta({ description });
  }
  if (type === "integer") {
    return z
      .int()
      .min(range?.min ?? 0)
      .max(range?.max ?? Number.MAX_SAFE_INTEGER)
      .meta({ description });
  }
  const bare = unit === "1" ? "" : ` A bare number is in ${unit}; a text carries its unit.`;
  return z.union([z.number(), z.string(), tolerancedSchema]).meta({ description: description + bare });
}

function bareUnit(unit: string | null): string {
  return unit === null || unit === "1" ? "" : ` ${unit}`;
}

/** `cylindrical-shell` as `CylindricalShell`. */
function pascal(id: string): string {
  return id.replace(/(?:^|-)(.)/g, (_, letter: string) => letter.toUpperCase());
}

/** The members of a resistance request for one shape, with its dimensions by name, all optional where one is to be found. */
function membersFor(shape: Shape, sizing: boolean) {
  const entry = shapeEntry(shape);
  const alternatives = new Set(entry.alternatives.flat());
  const dimensions = Object.fromEntries(
    entry.dimensions.map((dimension) => {
      const schema = dimensionSchema(dimension);
      const required = dimension.required && !alternatives.has(dimension.name) && !sizing;
      return [dimension.name, required ? schema : schema.optional()];
    }),
  );
  const groups = entry.alternatives.map((names) => `exactly one of ${names.join(", ")}`).join("; ");
  const medium =
    entry.media.kind === "two"
      ? {
          media: z
            .strictObject(Object.fromEntries(entry.media.names.map(({ name }) => [name, documentedMedium])))
            .meta({
              description: entry.media.names.map(({ name, label }) => `${name}: ${label}`).join("; "),
            }),
        }
      : { medium: documentedMedium };
  return {
    shape: z.literal(shape.id),
    dimensions: z.strictObject(dimensions).meta({
      description: `The shape's dimensions${sizing ? ", without the one to find" : ""}${groups === "" ? "" : `; ${groups}`}.`,
    }),
    ...medium,
    ...optional,
  };
}

function requestFor(shape: Shape) {
  return z
    .strictObject(membersFor(shape, false))
    .meta({ id: `${pascal(shape.id)}Request`, description: shape.summary });
}

/** The body of a sizing for one shape. */
function sizingFor(shape: Shape) {
  return z
    .strictObject({ ...membersFor(shape, true), ...sizingFields })
    .meta({ id: `${pascal(shape.id)}Sizing`, description: shape.summary });
}

const fieldSizing = z
  .strictObject({
    ...fieldRequestSchema.shape,
    solveFor: z.enum(["scale", "scaleX", "scaleY"]).meta({ description: "Which way the drawing is scaled." }),
    target: sizingFields.target,
    within: z
      .array(z.number())
      .length(2)
      .optional()
      .meta({
        description: "Smallest and largest scale to look at; 0.01 to 100 if left out.",
        example: [0.5, 2],
      }),
  })
  .meta({ id: "FieldSizingRequest", description: "A field request with the scale to find." });

/** Every shape's sizing, told apart by `shape`. Made when first asked for. */
export function documentedSizingRequest(): z.ZodType {
  const [first, ...rest] = catalogue.map(sizingFor);
  const onShape = z.discriminatedUnion("shape", [first, ...rest]).meta({
    id: "ShapeSizingRequest",
    description: "A resistance request with one dimension left out, and the resistance that it is to give.",
  });
  return z.union([onShape, fieldSizing]).meta({
    id: "SizingRequest",
    description: "What to find on a shape or on an outline, and the resistance that it is to give.",
  });
}

/** Every shape's request, told apart by `shape`: what clients get their types from. Made when first asked for. */
export function documentedResistanceRequest(): z.ZodType {
  const [first, ...rest] = catalogue.map(requestFor);
  return z.discriminatedUnion("shape", [first, ...rest]).meta({
    id: "ResistanceRequest",
    description: "A shape, its dimensions and medium, and what to answer.",
  });
}

export const resistanceResult = resistanceResultSchema.meta({
  id: "ResistanceResult",
  description: "A resistance, how sure it is and how it came about.",
});

/** The answer of `POST /resistance`: the result, and the record where one was asked for. */
export const answeredResistance = z
  .object({
    ...resistanceResultSchema.shape,
    record: z
      .object({ id: z.string(), url: z.string().meta({ description: "Path of the stored record." }) })
      .optional()
      .meta({ description: "Where the calculation was stored; only if `record` was in the request." }),
  })
  .meta({ id: "AnsweredResistance", description: "A resistance, how sure it is and how it came about." });

export const shapeSchema = shapeEntrySchema.meta({ id: "Shape", description: "One entry of the catalogue." });

/** Gives the engine's shared parts names of their own in the document, so that clients share the types. */
export function nameComponents(): void {
  const parts: readonly (readonly [z.ZodType, string])[] = [
    [documentedMedium, "Medium"],
    [operatingSchema, "Operating"],
    [documentedOperating, "TolerancedOperating"],
    [tolerancedSchema, "TolerancedQuantity"],
    [uncertaintyRequestSchema, "UncertaintyRequest"],
    [uncertaintySchema, "Uncertainty"],
    [sizingSolutionSchema, "SizingSolution"],
    [requirementSchema, "Requirement"],
    [boundedResistanceSchema, "BoundedResistance"],
  ];
  for (const [schema, id] of parts) z.globalRegistry.add(schema, { ...z.globalRegistry.get(schema), id });
}

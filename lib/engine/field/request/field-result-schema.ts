/** What a field solution answers, as zod schemas with descriptions and as types. */
import { z } from "zod";
import {
  boundedResistanceSchema,
  checkSchema,
  operatingPointSchema,
  usedMaterialSchema,
  verdictSchema,
} from "../../resistance/result-schema";

const plain = (description: string) => z.number().meta({ description });

const quantityOf = <Unit extends string>(unit: z.ZodType<Unit>, description: string) =>
  z
    .object({ value: z.number(), unit, text: z.string().meta({ description: "The value for people." }) })
    .meta({ description });

const fieldPointSchema = z
  .object({
    x: plain("In the outline's unit."),
    y: plain("In the outline's unit."),
    unit: z.string().meta({ description: "The outline's unit." }),
    text: z.string(),
  })
  .meta({ description: "A place on the outline." });

export const fieldPeakSchema = z
  .object({
    unbounded: z.boolean().meta({
      description:
        "Whether the density grows without limit towards the position, as it does at re-entrant corners and where a terminal ends on an edge.",
    }),
    position: fieldPointSchema,
    distance: quantityOf(
      z.literal("m"),
      "Distance from the position at which the values were read.",
    ).nullable(),
    field: quantityOf(z.literal("V/m"), "Field strength."),
    currentDensity: quantityOf(
      z.enum(["A/m", "A/m^2"]),
      "Current density: of the sheet in A/m, or in A/m² where the outline is axisymmetric.",
    ),
    per: z
      .enum(["operating-point", "volt"])
      .meta({ description: "Whether the values hold at the operating point or at one volt." }),
    text: z.string().meta({ description: "The peak in one sentence." }),
  })
  .meta({ description: "Where the current crowds." });

const squaresSchema = z
  .object({
    value: plain("Resistance in squares; lower ≤ value ≤ upper."),
    unit: z.literal("square"),
    text: z.string(),
    lower: z.number(),
    upper: z.number(),
  })
  .meta({ description: "The resistance over the sheet resistance, for a uniform sheet." });

const pairResistanceSchema = z.object({
  value: z.number().nullable().meta({
    description: "Resistance in ohms; null where the coupling could not be told from none.",
  }),
  unit: z.literal("ohm"),
  text: z.string(),
  lower: plain("Lower bound in ohms."),
  upper: z.number().nullable().meta({ description: "Upper bound in ohms; null where there is none." }),
  boundsBasis: z.enum(["energy", "energy-quadrature"]),
  proved: z.boolean(),
});

export const fieldResultSchema = z
  .object({
    resistance: boundedResistanceSchema
      .optional()
      .meta({ description: "Between the two terminals; left out for three and more." }),
    squares: squaresSchema.optional(),
    conductance: z.array(z.array(z.number())).optional().meta({
      description:
        "For three terminals and more: the current into terminal i in amperes for one volt at terminal j, all others at zero.",
    }),
    conductanceBounds: z
      .object({ lower: z.array(z.array(z.number())), upper: z.array(z.array(z.number())) })
      .optional()
      .meta({ description: "Bounds of each entry of `conductance`, in siemens." }),
    pairs: z
      .array(
        z.object({
          between: z.tuple([z.string(), z.string()]).meta({ description: "Names of two terminals." }),
          floating: pairResistanceSchema.meta({ description: "With the other terminals left open." }),
          grounded: pairResistanceSchema.meta({
            description: "One volt over the current that reaches the second, with all others at zero.",
          }),
        }),
      )
      .optional()
      .meta({ description: "For three terminals and more: each pair." }),
    method: z.literal("field"),
    operating: operatingPointSchema,
    peak: fieldPeakSchema.optional(),
    verdict: verdictSchema.optional(),
    mesh: z
      .object({
        triangles: z.number().int(),
        unknowns: z.number().int().meta({ description: "Unknowns of one of the two solutions." }),
        refinements: z.number().int(),
      })
      .meta({ description: "The mesh of the last refinement." }),
    limit: z
      .string()
      .optional()
      .meta({ description: "Which cap ended the work before the wanted accuracy, for a status `limited`." }),
    seconds: plain("Time the solution took, in seconds."),
    checks: z.array(checkSchema),
    repairs: z.array(z.string()).meta({ description: "What was put right on the outline, as sentences." }),
    cautions: z.array(z.string()),
    assumptions: z.array(z.string()),
    materials: z.array(usedMaterialSchema),
    engine: z.string(),
  })
  .meta({ description: "A field solution." });

export type FieldResult = z.infer<typeof fieldResultSchema>;

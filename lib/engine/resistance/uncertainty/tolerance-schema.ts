/** A quantity with a tolerance as it appears in a body, and what to do with tolerances. */
import { z } from "zod";
import { QUANTITY_KINDS, type QuantityKindName } from "../../quantity/quantity-kind";
import { anyQuantitySchema } from "../../quantity/quantity-schema";

export const distributionSchema = z.enum(["uniform", "normal", "triangular"]).meta({
  description:
    "How the true value is spread over the tolerance; `uniform` by default. For `normal` the tolerance is two standard deviations.",
});

const toleranceObject = z
  .strictObject({
    value: anyQuantitySchema.meta({ description: "The nominal value.", example: "10 mm" }),
    tolerance: anyQuantitySchema.optional().meta({
      description: "± about the value: a quantity, or a share of the value such as `1 %`.",
      example: "0.1 mm",
    }),
    plus: anyQuantitySchema
      .optional()
      .meta({ description: "How far above the value it may be; 0 if left out." }),
    minus: anyQuantitySchema
      .optional()
      .meta({ description: "How far below the value it may be; 0 if left out." }),
    distribution: distributionSchema.optional(),
  })
  .superRefine((given, context) => {
    const sides = (["plus", "minus"] as const).filter((name) => given[name] !== undefined);
    if (given.tolerance === undefined && sides.length === 0) {
      context.addIssue({
        code: "custom",
        path: ["tolerance"],
        message: "is required: give tolerance, or plus and minus.",
      });
    }
    if (given.tolerance !== undefined && sides.length > 0) {
      context.addIssue({
        code: "custom",
        path: [sides[0]],
        message: "is given together with tolerance; give tolerance, or plus and minus.",
      });
    }
  });

/** A quantity with its tolerance. */
export const tolerancedSchema = toleranceObject.meta({
  description:
    "A quantity with a tolerance: `value` with `tolerance`, or with `plus` and `minus`. A tolerance is in the unit of its text (a bare number in SI), or a share of the value such as `1 %`; on a temperature it is a difference.",
  example: { value: "10 mm", tolerance: "0.1 mm" },
});

export type TolerancedInput = z.infer<typeof tolerancedSchema>;

/** A quantity of one kind, with or without a tolerance: for the documented schema. */
export function tolerancedQuantitySchema(
  kind: QuantityKindName,
  description: string,
  example?: number | string,
) {
  const { unit, noun } = QUANTITY_KINDS[kind];
  const bare = unit === "1" ? "a plain number" : `a bare number is in ${unit}`;
  return z.union([z.number(), z.string().max(200), tolerancedSchema]).meta({
    description: `${description} (${noun}; ${bare}, or a text with a unit, or an object with a tolerance).`,
    ...(example === undefined ? {} : { example }),
  });
}

export const FEWEST_TRIALS = 1_000;
export const MOST_TRIALS = 1_000_000;
export const DEFAULT_TRIALS = 100_000;

/** What to make of the tolerances. */
export const uncertaintyRequestSchema = z
  .discriminatedUnion(
    "method",
    [
      z.strictObject({ method: z.literal("propagation") }).meta({
        description:
          "First-order propagation of variances (JCGM 100, clause 5); low and high are ±1.96 standard uncertainties.",
      }),
      z.strictObject({ method: z.literal("worst-case") }).meta({
        description: "The smallest and the largest resistance in the box of all tolerances.",
      }),
      z
        .strictObject({
          method: z.literal("monte-carlo"),
          trials: z.int().min(FEWEST_TRIALS).max(MOST_TRIALS).optional().meta({
            description:
              "Number of trials, at most 1,000,000; if left out 100,000. For a graded medium both are a tenth of this, and less where one value takes still more work. Each 100,000 begun count one computation.",
            example: 100_000,
          }),
          seed: z.int().min(0).max(4_294_967_295).optional().meta({
            description: "Start of the random numbers; the same seed gives the same answer. 1 if left out.",
            example: 1,
          }),
        })
        .meta({
          description:
            "Propagation of distributions (JCGM 101); low and high enclose 95 % of the trials, 2.5 % on either side.",
        }),
    ],
    {
      error: (issue) =>
        issue.code === "invalid_union"
          ? 'must be one of "propagation", "worst-case", "monte-carlo".'
          : undefined,
    },
  )
  .meta({
    description:
      "How far the resistance strays with the tolerances of the inputs and the stated uncertainty of the materials.",
    example: { method: "propagation" },
  });

export type UncertaintyRequest = z.infer<typeof uncertaintyRequestSchema>;

/** What finds a dimension: the body of a resistance request with that dimension left out, and the target. */
import { z } from "zod";
import { quantitySchema } from "../../quantity/quantity-schema";
import { resistanceRequestSchema } from "../request-schema";
import {
  boundedResistanceSchema,
  resistanceResultSchema,
  sourceSchema,
  usedMaterialSchema,
} from "../result-schema";
import { anyQuantitySchema } from "../../quantity/quantity-schema";

export const sizingFields = {
  solveFor: z.string().min(1).max(64).meta({
    description: "The dimension to find, by any of its names; it is left out of `dimensions`.",
    example: "width",
  }),
  target: quantitySchema("resistance", "The resistance to reach", "5 mohm"),
  within: z
    .array(anyQuantitySchema)
    .length(2)
    .optional()
    .meta({
      description:
        "Smallest and largest value of the dimension to look at; all that the shape admits if left out (lengths from 1e-12 to 1e6 m).",
      example: ["1 mm", "50 mm"],
    }),
};

/** The whole body of a sizing. */
export const sizingRequestSchema = z
  .strictObject({ ...resistanceRequestSchema.shape, ...sizingFields })
  .meta({
    description: "A resistance request with one dimension left out, and the resistance that it is to give.",
  });

export type SizingRequest = z.infer<typeof sizingRequestSchema>;

const found = z
  .object({
    value: z.number().meta({
      description: "Value of the dimension in `unit`; as a bare number it goes back into `dimensions`.",
    }),
    unit: z.enum(["m", "m^2", "deg", "1"]),
    text: z.string().meta({
      description:
        "The value for people; of a solution with at least as many digits as give the same resistance to 1e-5 when the text is used in a request.",
    }),
  })
  .meta({ description: "A value of the dimension." });

const {
  resistance,
  conductance,
  method,
  operating,
  uncertainty,
  verdict,
  quadrature,
  peak,
  steps,
  profile,
  checks,
  cautions,
} = resistanceResultSchema.shape;

export const sizingSolutionSchema = z
  .object({
    dimension: found,
    resistance,
    sensitivity: z.number().meta({
      description:
        "Derivative of the resistance by the dimension there, in ohms per `unit` of the dimension; for a whole number the change that one more makes, or that the last one made where no more are admitted.",
    }),
    exact: z.boolean().meta({
      description:
        "Whether the target lies within the bounds of `resistance`, which is computed from this very value. False for the whole numbers on either side of the target where none gives it, and where a double cannot hold the dimension finely enough: `cautions` then say how far off it is, and which other dimension resolves it.",
    }),
    conductance,
    method,
    operating,
    quadrature,
    uncertainty,
    verdict,
    peak,
    steps,
    profile,
    checks,
    cautions,
  })
  .meta({ description: "A value of the dimension with the resistance that it gives." });

export const sizingResultSchema = z
  .object({
    shape: z.string().optional().meta({ description: "The shape; left out for an outline." }),
    solveFor: z.string(),
    target: boundedResistanceSchema.pick({ value: true, unit: true, text: true }),
    within: z.array(found).length(2).meta({ description: "The range that was searched." }),
    solutions: z
      .array(sizingSolutionSchema)
      .meta({ description: "All that lie in the range, smallest first." }),
    assumptions: z.array(z.string()),
    sources: z.array(sourceSchema),
    materials: z.array(usedMaterialSchema),
    engine: z.string(),
    catalogue: z.string(),
  })
  .meta({ description: "The values of one dimension that give a resistance." });

export type SizingResult = z.infer<typeof sizingResultSchema>;
export type SizingSolution = z.infer<typeof sizingSolutionSchema>;

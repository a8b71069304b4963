/** What is answered about the uncertainty of a resistance. */
import { z } from "zod";

export const contributionSchema = z
  .object({
    input: z.string().meta({
      description:
        "Place of the input in the request, such as `dimensions.innerRadius`; a material stands for its stated uncertainty.",
    }),
    sensitivity: z.number().meta({
      description:
        "Derivative of the resistance by the input at the nominal values, in ohms per SI unit (per radian, per kelvin; for a material per unit of the ratio of true to nominal resistivity).",
    }),
    standard: z
      .number()
      .meta({ description: "Standard uncertainty of the input in SI (rad, K; a ratio for a material)." }),
    share: z.number().meta({
      description:
        "Part of the whole that is due to this input, 0 … 1: of the variance, or for `worst-case` of the ranges that the inputs span one at a time.",
    }),
  })
  .meta({ description: "What one input contributes." });

export const uncertaintySchema = z
  .object({
    method: z.enum(["propagation", "worst-case", "monte-carlo"]),
    standard: z.number().meta({
      description:
        "Standard uncertainty of the resistance in ohms; for `worst-case` that of first-order propagation.",
    }),
    low: z.number().meta({ description: "Lower end of the range in ohms." }),
    high: z.number().meta({ description: "Upper end of the range in ohms." }),
    coverage: z.number().meta({
      description:
        "Probability that the range covers the resistance: 0.95; 1 for `worst-case`, whose range is the whole box.",
    }),
    text: z.string().meta({ description: "The range for people, rounded by JCGM 100, 7.2.6." }),
    basis: z.string().meta({ description: "How the range was found, in one or two sentences." }),
    mean: z.number().optional().meta({ description: "Mean of the trials in ohms; `monte-carlo` only." }),
    trials: z.int().optional().meta({ description: "Trials made; `monte-carlo` only." }),
    seed: z.int().optional().meta({ description: "Seed used; `monte-carlo` only." }),
    contributions: z.array(contributionSchema).meta({ description: "The budget, largest share first." }),
  })
  .meta({
    description:
      "How far the resistance strays with the tolerances of the inputs; bounds are a separate statement.",
  });

export type Uncertainty = z.infer<typeof uncertaintySchema>;

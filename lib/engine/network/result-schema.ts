/** What a network is answered with. */
import { z } from "zod";
import {
  boundedResistanceSchema,
  boundsBasisSchema,
  conductanceSchema,
  operatingPointSchema,
  sourceSchema,
  usedMaterialSchema,
  verdictSchema,
} from "../resistance/result-schema";
import { uncertaintySchema } from "../resistance/uncertainty/result-schema";

const plain = (description: string) => z.number().meta({ description });

export const networkResistanceSchema = z
  .object({
    ...boundedResistanceSchema.shape,
    boundsBasis: z.enum(["rounding", "elements"]).meta({
      description:
        "Where the bounds come from: rounding alone, or the elements' own bounds (all at their lowest, all at their highest; a network's resistance never falls when an element's rises) and rounding.",
    }),
  })
  .meta({ description: "The resistance between the ports, with its bounds." });

export const networkNodeSchema = z
  .object({ name: z.string(), voltage: plain("Potential against the second port, V.") })
  .meta({ description: "A node." });

export const networkElementResultSchema = z
  .object({
    name: z.string(),
    between: z.array(z.string()).length(2),
    resistance: plain("Resistance, ohm."),
    bounds: z
      .object({
        lower: plain("Lower bound, ohm."),
        upper: plain("Upper bound, ohm."),
        boundsBasis: boundsBasisSchema,
        proved: z.boolean(),
      })
      .optional()
      .meta({ description: "How sure its resistance is, where a request gave it." }),
    current: plain("Current from its first node to its second, A."),
    voltage: plain("Potential of its first node above its second, V."),
    power: plain("Power turned to heat, W."),
    share: plain("Its part of the whole power, 0 … 1."),
    sensitivity: plain(
      "By how much the network's resistance rises when its own rises, ohm per ohm: the square of its part of the current.",
    ),
  })
  .meta({ description: "An element with what passes through it." });

export const networkCheckSchema = z
  .object({
    name: z.enum(["current-law", "voltage-law", "power-balance"]),
    applies: z.literal(true),
    passed: z.boolean(),
    deviation: plain("Largest relative deviation found."),
    tolerance: plain("Largest deviation that passes."),
  })
  .meta({
    description:
      "One of the checks on this very answer: currents at each node add up to nothing (current-law), element voltages are differences of node voltages (voltage-law), the elements' power is that of the ports (power-balance).",
  });

const contribution = z
  .object({
    element: z.string().optional().meta({ description: "Name of the element, or else:" }),
    material: z.string().optional().meta({
      description:
        "A material whose stated uncertainty all its elements share; for `worst-case` it counts within them.",
    }),
    sensitivity: plain(
      "Derivative of the network's resistance: ohm per ohm of the element, or ohm per unit of the material's ratio of true to nominal resistivity.",
    ),
    standard: plain("Standard uncertainty of the element (ohm) or of the ratio."),
    share: plain(
      "Part of the whole, 0 … 1: of the variance, or for `worst-case` of the elements' spans to first order.",
    ),
  })
  .meta({ description: "What one element or material contributes." });

const { standard, low, high, coverage, text, basis } = uncertaintySchema.shape;
export const networkUncertaintySchema = z
  .object({
    method: z.enum(["propagation", "worst-case"]),
    standard,
    low,
    high,
    coverage,
    text,
    basis,
    contributions: z.array(contribution).meta({ description: "The budget, largest share first." }),
  })
  .meta({
    description:
      "How far the network's resistance strays with its elements; bounds are a separate statement.",
  });

export type NetworkUncertainty = z.infer<typeof networkUncertaintySchema>;

export const networkResultSchema = z
  .object({
    resistance: networkResistanceSchema,
    conductance: conductanceSchema,
    operating: operatingPointSchema,
    per: z.enum(["operating-point", "volt"]).meta({
      description:
        "Whether nodes and elements are told at the operating point or for one volt between the ports.",
    }),
    uncertainty: networkUncertaintySchema.optional(),
    verdict: verdictSchema.optional(),
    nodes: z.array(networkNodeSchema),
    elements: z.array(networkElementResultSchema),
    checks: z.array(networkCheckSchema),
    cautions: z.array(z.string()),
    assumptions: z.array(z.string()),
    sources: z.array(sourceSchema),
    materials: z.array(usedMaterialSchema),
    engine: z.string(),
    catalogue: z.string(),
  })
  .meta({ description: "The resistance between the ports, and what passes through each element." });

export type NetworkResult = z.infer<typeof networkResultSchema>;
export type NetworkCheck = z.infer<typeof networkCheckSchema>;

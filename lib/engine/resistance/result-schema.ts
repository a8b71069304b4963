/** What a resistance calculation answers, as zod schemas with descriptions and as types. */
import { z } from "zod";
import { uncertaintySchema } from "./uncertainty/result-schema";

const plain = (description: string) => z.number().meta({ description });
const samples = (description: string) => z.array(z.number()).meta({ description });

export const boundsBasisSchema = z
  .enum(["rounding", "quadrature", "rayleigh", "formula-accuracy", "energy", "energy-quadrature"])
  .meta({
    description:
      "Where the bounds come from: rounding (closed form or converged series), quadrature (error estimate), rayleigh (conducting sheets and insulating walls), formula-accuracy (stated accuracy of a published formula), energy (two field solutions), energy-quadrature (the same with estimated integrals).",
  });

export const methodSchema = z
  .enum(["closed-form", "quadrature", "field"])
  .meta({ description: "How the value was computed." });

export const boundedResistanceSchema = z
  .object({
    value: plain("Resistance in ohms; lower ≤ value ≤ upper."),
    unit: z.literal("ohm"),
    text: z.string().meta({ description: "The value for people, rounded as its bounds allow." }),
    lower: plain("Lower bound in ohms, below the upper one always."),
    upper: plain("Upper bound in ohms."),
    boundsBasis: boundsBasisSchema,
    proved: z.boolean().meta({ description: "Whether the bounds are proved for the stated problem." }),
  })
  .meta({ description: "A resistance with its bounds." });

export const conductanceSchema = z
  .object({
    value: plain("Conductance in siemens."),
    unit: z.literal("siemens"),
    text: z.string().meta({ description: "The value for people." }),
  })
  .meta({ description: "The reciprocal of the resistance." });

export const operatingPointSchema = z
  .object({
    temperature: plain("Temperature in °C at which the medium was evaluated."),
    voltage: plain("Voltage across the terminals in volts.").optional(),
    current: plain("Current in amperes.").optional(),
    power: plain("Power in watts.").optional(),
  })
  .meta({
    description: "The operating point; voltage, current and power only where the request gave one of them.",
  });

const peakQuantity = (unit: "V/m" | "A/m^2" | "A/m", what: string) =>
  z
    .object({
      value: z
        .number()
        .nullable()
        .meta({ description: `${what}; null where it is unbounded or not known.` }),
      unit: z.literal(unit),
      text: z.string(),
    })
    .meta({ description: what });

export const peakPositionSchema = z
  .object({
    coordinate: z
      .string()
      .nullable()
      .meta({ description: "Coordinate of the shape, or null where it has none." }),
    value: z.number().nullable().meta({ description: "Value of that coordinate, m or rad." }),
    unit: z.enum(["m", "rad"]).nullable(),
    text: z.string().meta({ description: "The place in words." }),
  })
  .meta({ description: "Where the peak lies." });

export const peakSchema = z
  .object({
    field: peakQuantity("V/m", "Largest field strength"),
    currentDensity: z.union([
      peakQuantity("A/m^2", "Largest current density"),
      peakQuantity("A/m", "Largest sheet current density"),
    ]),
    position: peakPositionSchema.meta({ description: "Where the field is largest." }),
    currentDensityPosition: peakPositionSchema.meta({ description: "Where the current density is largest." }),
    per: z
      .enum(["operating-point", "volt"])
      .meta({ description: "Whether the values hold at the operating point or at one volt." }),
  })
  .meta({ description: "Where the field and the current density are largest." });

export const stepSchema = z
  .object({
    title: z.string(),
    tex: z.string().meta({ description: "The step as TeX." }),
    value: z.string().optional().meta({ description: "Its outcome for people." }),
  })
  .meta({ description: "One step of how the number came about." });

export const profileResultSchema = z
  .object({
    coordinate: z.string().meta({ description: "Name of the coordinate along the flow." }),
    unit: z.enum(["m", "rad"]).meta({ description: "Unit of the positions." }),
    per: z.enum(["operating-point", "volt"]),
    position: samples("Values of the coordinate from the high to the low terminal, m or rad."),
    potential: samples("Potential against the low terminal in volts."),
    field: samples("Field strength in V/m."),
    currentDensity: samples("Current density in A/m^2."),
    conductivity: samples("Conductivity in S/m."),
    across: z
      .object({
        coordinate: z.string(),
        unit: z.enum(["m", "rad"]),
        position: samples("Values of the coordinate across the flow, m or rad."),
        conductivity: samples("Conductivity in S/m."),
        currentDensity: samples("Current density in A/m^2 where the tube's field is largest."),
      })
      .optional()
      .meta({ description: "For a medium graded across the flow." }),
  })
  .meta({ description: "101 samples along the flow, at the operating point or per volt." });

export const checkNameSchema = z.enum(["voltage-independence", "current-continuity", "second-route"]);

export const checkSchema = z
  .object({
    name: checkNameSchema,
    applies: z
      .boolean()
      .meta({ description: "false where the shape has nothing to compare; then `reason` says why." }),
    passed: z.boolean().optional(),
    deviation: z.number().optional().meta({ description: "Relative deviation found." }),
    tolerance: z.number().optional().meta({ description: "Largest relative deviation that passes." }),
    reason: z.string().optional(),
  })
  .meta({ description: "One of the engine's checks on this very answer." });

export const sourceSchema = z
  .object({
    title: z.string(),
    detail: z.string().optional(),
    provenance: z.enum(["source at hand", "from memory", "derived here", "measured"]),
  })
  .meta({ description: "Where a law or a number comes from." });

export const usedMaterialSchema = z
  .object({ id: z.string(), version: z.number().int(), name: z.string() })
  .meta({ description: "A material used, with its version." });

export const quadratureSchema = z
  .object({
    status: z.enum(["converged", "limit"]),
    evaluations: z.number().int(),
    relativeError: plain("Estimated relative error of the integral."),
  })
  .meta({ description: "How the integral went; only where the method is quadrature." });

export const verdictSchema = z.enum(["met", "not-met", "undecided"]).meta({
  description:
    "Whether the requirement is met; decided only if the bounds, and with `uncertainty` its range too, lie wholly on one side.",
});

export const resistanceResultSchema = z
  .object({
    shape: z.string(),
    resistance: boundedResistanceSchema,
    conductance: conductanceSchema,
    method: methodSchema,
    operating: operatingPointSchema,
    quadrature: quadratureSchema.optional(),
    uncertainty: uncertaintySchema.optional(),
    verdict: verdictSchema.optional(),
    peak: peakSchema.nullable().optional(),
    steps: z.array(stepSchema).optional(),
    profile: profileResultSchema.nullable().optional(),
    checks: z.array(checkSchema).optional(),
    cautions: z.array(z.string()),
    assumptions: z.array(z.string()),
    sources: z.array(sourceSchema),
    materials: z.array(usedMaterialSchema),
    engine: z.string(),
    catalogue: z.string(),
  })
  .meta({ description: "A resistance, how sure it is and how it came about." });

export type ResistanceResult = z.infer<typeof resistanceResultSchema>;
export type Check = z.infer<typeof checkSchema>;
export type Step = z.infer<typeof stepSchema>;
export type Peak = z.infer<typeof peakSchema>;
export type PeakPosition = z.infer<typeof peakPositionSchema>;
export type ProfileResult = z.infer<typeof profileResultSchema>;
export type ResultSource = z.infer<typeof sourceSchema>;
export type UsedMaterial = z.infer<typeof usedMaterialSchema>;

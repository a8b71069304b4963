import { z } from "zod";
import {
  fieldRequestSchema,
  fieldResultSchema,
  outlineRequestSchema,
  outlineSchema,
  terminalSchema,
} from "@/lib/engine";

export const fieldRequest = fieldRequestSchema.meta({ id: "FieldRequest" });
export const outlineRequest = outlineRequestSchema.meta({ id: "OutlineRequest" });

export const fieldResult = fieldResultSchema.meta({ id: "FieldResult" });

export const fieldSchema = z
  .object({
    id: z.string(),
    status: z.enum(["queued", "running", "done", "limited", "failed", "cancelled"]).meta({
      description:
        "`limited`: a cap on unknowns or time was met; the bracket reached stands. `failed`: `failure` says why.",
    }),
    createdAt: z.iso.datetime(),
    finishedAt: z.iso.datetime().nullable(),
    progress: z
      .object({
        lower: z.number().meta({ description: "Lower bound so far, in ohms." }),
        upper: z.number().meta({ description: "Upper bound so far, in ohms." }),
        unknowns: z.int(),
        refinements: z.int(),
      })
      .nullable()
      .meta({ description: "The bracket so far; null before the first one." }),
    result: fieldResult.nullable(),
    failure: z.string().optional().meta({ description: "Why there is no result, for a status `failed`." }),
    record: z
      .object({ id: z.string(), url: z.string() })
      .optional()
      .meta({ description: "The record, where one was asked for and the solution is finished." }),
    replay: z
      .object({
        record: z.object({ id: z.string(), url: z.string() }),
        before: fieldResult.meta({ description: "What the record holds." }),
        drift: z.number().nullable().meta({
          description:
            "(now − before)/before of the resistance, of the pair that changed most for three terminals and more; null until the solution is finished.",
        }),
        identical: z.boolean().nullable().meta({
          description: "Whether values and bounds are the same to the last bit; null until it is finished.",
        }),
      })
      .optional()
      .meta({ description: "For the replay of a record: what it repeats." }),
  })
  .meta({ id: "Field", description: "A field solution, finished or on its way." });

export const storedOutlineSchema = z
  .object({
    id: z.string(),
    name: z.string().meta({ description: "Empty where it was stored without one." }),
    createdAt: z.iso.datetime(),
    outline: outlineSchema.meta({ description: "The outline as it was cleaned." }),
    terminals: z.array(terminalSchema),
    regions: z.array(z.unknown()).meta({ description: "Regions found on the drawing; none for JSON." }),
    repairs: z.array(z.string()).meta({ description: "What was put right, as sentences." }),
  })
  .meta({ id: "Outline", description: "A stored outline." });

const line = z.array(z.number()).meta({ description: "x and y interleaved, in the outline's unit." });
const point = z.tuple([z.number(), z.number()]);

export const fieldMapSchema = z
  .object({
    unit: z.string().meta({ description: "Unit of all coordinates here." }),
    per: z.literal("volt"),
    between: z.tuple([z.string(), z.string()]).meta({ description: "The high and the low terminal." }),
    equipotentials: z.array(
      z.object({ potential: z.number().meta({ description: "Volts, for one volt." }), lines: z.array(line) }),
    ),
    streamlines: z
      .array(line)
      .meta({ description: "From the high terminal; the same current passes between any two neighbours." }),
    currentBetweenStreamlines: z.number().meta({ description: "In amperes, for one volt." }),
    raster: z
      .object({
        origin: point.meta({ description: "Centre of the first cell, lower left." }),
        cell: z.number().meta({ description: "Size of a cell." }),
        columns: z.int(),
        rows: z.int(),
        density: z.array(z.number().nullable()).meta({
          description:
            "Size of the current density for one volt, row by row from below, in A/m (A/m² where axisymmetric); null outside.",
        }),
      })
      .meta({ description: "The current density on a grid." }),
    edges: z
      .array(
        z.object({
          from: point,
          to: point,
          ring: z.int(),
          terminal: z.string(),
          current: z.number().meta({ description: "Into the conductor, in amperes for one volt." }),
        }),
      )
      .meta({ description: "Pieces of the terminals with the current through each." }),
  })
  .meta({ id: "FieldMap", description: "A field solution as lines, raster and fluxes." });

export const fieldLineSchema = z
  .object({
    unit: z.string(),
    per: z.literal("volt"),
    distance: z.array(z.number()).meta({ description: "From the start, in metres." }),
    points: z.array(point).meta({ description: "In the outline's unit." }),
    potential: z.array(z.number().nullable()).meta({ description: "Volts for one volt; null outside." }),
    density: z
      .array(z.number().nullable())
      .meta({ description: "Size of the current density for one volt, A/m (A/m² where axisymmetric)." }),
    densityAlong: z.array(z.number().nullable()).meta({ description: "Its component along the line." }),
  })
  .meta({ id: "FieldLine", description: "Potential and current density along a straight line." });

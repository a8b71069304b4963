import { z } from "zod";
import { fieldResult } from "./field";
import { resistanceResult } from "./resistance";

export const recordSchema = z
  .object({
    id: z.string(),
    operation: z.string().meta({ description: "What computed it: `resistance` or `field`." }),
    label: z.string(),
    createdAt: z.iso.datetime(),
    by: z
      .object({ kind: z.string(), id: z.string(), name: z.string() })
      .meta({ description: "Who stored it." }),
    request: z.record(z.string(), z.unknown()).meta({ description: "What was asked." }),
    result: z.union([resistanceResult, fieldResult]).meta({
      description: "What came out: a ResistanceResult, or a FieldResult where `operation` is `field`.",
    }),
    materials: z
      .array(z.object({ id: z.string(), version: z.int() }))
      .meta({ description: "Materials that went in, with the versions that a replay uses." }),
    engine: z.string().meta({ description: "Version of the engine that computed it." }),
    catalogue: z.string(),
  })
  .meta({ id: "Record", description: "A stored calculation." });

export const relabelSchema = z
  .strictObject({ label: z.string().trim().min(1).max(200) })
  .meta({ id: "RecordChange", description: "The new label." });

export const replaySchema = z
  .object({
    before: resistanceResult,
    now: resistanceResult,
    drift: z.number().meta({ description: "(now − before)/before of the resistance." }),
    identical: z.boolean().meta({ description: "Whether value and bounds are the same to the last bit." }),
  })
  .meta({ id: "Replay", description: "A stored calculation beside the same one computed today." });

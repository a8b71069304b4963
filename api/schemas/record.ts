import { z } from "zod";
import { fieldResult } from "./field";
import { networkResult } from "./network";
import { resistanceResult } from "./resistance";
import { sizingResult } from "./sizing";

export const recordSchema = z
  .object({
    id: z.string(),
    operation: z
      .string()
      .meta({ description: "What computed it: `resistance`, `sizing`, `network` or `field`." }),
    label: z.string(),
    createdAt: z.iso.datetime(),
    by: z
      .object({ kind: z.string(), id: z.string(), name: z.string() })
      .meta({ description: "Who stored it." }),
    request: z.record(z.string(), z.unknown()).meta({ description: "What was asked." }),
    result: z.union([resistanceResult, sizingResult, networkResult, fieldResult]).meta({
      description:
        "What came out: a ResistanceResult, a SizingResult where `operation` is `sizing`, a NetworkResult where it is `network`, or a FieldResult where it is `field`.",
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
    before: z.union([resistanceResult, sizingResult, networkResult]),
    now: z.union([resistanceResult, sizingResult, networkResult]),
    drift: z.number().meta({
      description: "(now − before)/before of the resistance; of a sizing, of the dimension found.",
    }),
    identical: z.boolean().meta({
      description:
        "Whether value, bounds and uncertainty, or the dimensions found, are the same to the last bit.",
    }),
  })
  .meta({ id: "Replay", description: "A stored calculation beside the same one computed today." });

import { z } from "zod";
import { sizingResultSchema } from "@/lib/engine";

export const sizingResult = sizingResultSchema.meta({
  id: "SizingResult",
  description: "The values of one dimension that give a resistance.",
});

/** The answer of `POST /sizing`: the result, and the record where one was asked for. */
export const answeredSizing = z
  .object({
    ...sizingResultSchema.shape,
    record: z
      .object({ id: z.string(), url: z.string().meta({ description: "Path of the stored record." }) })
      .optional()
      .meta({ description: "Where the calculation was stored; only if `record` was in the request." }),
  })
  .meta({ id: "AnsweredSizing", description: "The values of one dimension that give a resistance." });

import { z } from "zod";
import {
  networkElementSchema,
  networkRequestSchema,
  networkResultSchema,
  tolerancedQuantitySchema,
} from "@/lib/engine";
import { documentedResistanceRequest } from "./resistance";

/** The body of a network as the document tells it. */
export function documentedNetwork(): z.ZodType {
  const { elements, ...rest } = networkRequestSchema.shape;
  const element = z
    .strictObject({
      ...networkElementSchema.shape,
      resistance: tolerancedQuantitySchema("resistance", "Its resistance", "42 uohm").optional(),
      request: documentedResistanceRequest().optional().meta({
        description:
          "In place of a resistance: a body of `POST /resistance` that gives it, without record, include, requirement, uncertainty and drive.",
      }),
    })
    .meta({
      id: "NetworkElementRequest",
      description: "A resistance between two nodes: exactly one of `resistance` and `request`.",
    });
  return z
    .strictObject({
      elements: z
        .array(element)
        .min(1)
        .max(10_000)
        .meta(elements.meta() ?? {}),
      ...rest,
    })
    .meta({ id: "NetworkRequest", description: "Elements between named nodes, and two ports." });
}

export const networkResult = networkResultSchema.meta({
  id: "NetworkResult",
  description: "The resistance between the ports, and what passes through each element.",
});

/** The answer of `POST /networks`: the result, and the record where one was asked for. */
export const answeredNetwork = z
  .object({
    ...networkResultSchema.shape,
    record: z
      .object({ id: z.string(), url: z.string().meta({ description: "Path of the stored record." }) })
      .optional()
      .meta({ description: "Where the calculation was stored; only if `record` was in the request." }),
  })
  .meta({ id: "AnsweredNetwork", description: "The resistance between the ports, element by element." });

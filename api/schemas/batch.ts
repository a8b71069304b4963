import { z } from "zod";
import { documentedResistanceRequest, resistanceResult } from "./resistance";
import { problemSchema } from "./problem";

/** The body of a batch as the document tells it. */
export function documentedBatch(): z.ZodType {
  return z
    .strictObject({
      items: z.array(documentedResistanceRequest()).max(10_000).meta({
        description: "Bodies of `POST /resistance`, without `record`.",
      }),
    })
    .meta({ id: "BatchRequest", description: "Up to 10,000 requests." });
}

const answeredItem = z
  .object({
    index: z.int().meta({ description: "Place in the request, from 0." }),
    status: z.literal(200),
    result: resistanceResult,
  })
  .meta({ id: "AnsweredItem", description: "An item that was answered." });

const refusedItem = z
  .object({
    index: z.int().meta({ description: "Place in the request, from 0." }),
    status: z
      .int()
      .min(400)
      .meta({ description: "422 for a mistake in the item; 503 where the batch's time was over before it." }),
    problem: problemSchema.meta({ description: "What was wrong; pointers start at the item." }),
  })
  .meta({ id: "RefusedItem", description: "An item that was refused or not computed." });

export const batchAnswer = z
  .object({
    items: z
      .array(z.union([answeredItem, refusedItem]))
      .meta({ description: "In the order of the request." }),
    counts: z.object({
      answered: z.int(),
      refused: z.int(),
      notComputed: z.int().meta({ description: "Items for which the batch's time did not suffice." }),
    }),
  })
  .meta({ id: "BatchAnswer", description: "Every item answered or refused on its own." });

export const csvTable = z.string().meta({
  description: "A CSV table (RFC 4180, UTF-8) with a header.",
  example: "shape,length/m,width/mm,thickness/mm,material\r\nbar,1,50,10,copper-annealed\r\n",
});

import { z } from "zod";

/** The body of every answer of 400 and above (RFC 9457). */
export const problemSchema = z
  .object({
    type: z
      .url()
      .meta({ description: "Page that explains the problem; its last part is the problem's code." }),
    title: z.string(),
    status: z.int().min(400).max(599),
    detail: z.string().meta({ description: "What happened this time, in one or two sentences." }),
    instance: z.string().meta({ description: "The request id, as in the Request-Id header." }),
    errors: z
      .array(
        z.union([
          z.object({
            pointer: z.string().meta({ description: "JSON pointer of the member, as a URI fragment." }),
            detail: z.string(),
            at: z.tuple([z.number(), z.number()]).optional().meta({
              description:
                "Where on the outline, in its unit, if the place is no vertex: two edges that cross between their ends.",
            }),
          }),
          z.object({
            parameter: z.string().meta({ description: "Name of the query parameter." }),
            detail: z.string(),
          }),
        ]),
      )
      .optional()
      .meta({
        description: "Every complaint about the input; the sentence goes on from the name of the place.",
      }),
  })
  .meta({ id: "Problem", description: "Why a call was refused (RFC 9457)." });

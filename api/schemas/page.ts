import { z } from "zod";

/** `?limit=` and `?cursor=` of every list. */
export function pageQuery(standard: number, largest: number) {
  return {
    limit: z.coerce
      .number({ error: "must be a whole number." })
      .int({ error: "must be a whole number." })
      .min(1)
      .max(largest)
      .default(standard)
      .meta({ description: `Most entries of a page, 1 to ${largest}.` }),
    cursor: z.string().max(400).optional().meta({ description: "`next` of the page before." }),
  };
}

/** A page of a list; the next one also stands in the `Link` header. */
export function pageOf<Item extends z.ZodType>(items: Item, description: string) {
  return z
    .object({
      items: z.array(items),
      next: z.string().nullable().meta({ description: "Cursor of the next page; null on the last one." }),
    })
    .meta({ description });
}

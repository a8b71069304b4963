import { z } from "zod";
import {
  DEFAULT_MINUTE_QUOTA,
  DEFAULT_MONTH_QUOTA,
  LARGEST_MINUTE_QUOTA,
  LARGEST_QUOTA,
  URL_MINUTE_QUOTA,
  URL_MONTH_QUOTA,
} from "../limits/quota";
import { SCOPE_NAMES } from "./scope";

const origin = z
  .string()
  .max(200)
  .regex(
    /^https?:\/\/[a-z0-9.:[\]-]+$/,
    "an origin is a scheme and a host in lower case, such as https://intranet.example",
  )
  .meta({ description: "Scheme, host and port of pages that may call with the key." });

/** What is chosen when a key is issued, as the API, the shell and the console send it. */
export const keySettings = z.strictObject({
  name: z
    .string()
    .trim()
    .min(1)
    .max(100)
    .meta({ description: "What the key is for, for people.", examples: ["CAD scripts"] }),
  scopes: z
    .array(z.enum(SCOPE_NAMES))
    .min(1)
    .max(SCOPE_NAMES.length)
    .meta({ description: "What the key may do; never more than the key that grants it." }),
  quotas: z
    .strictObject({
      minute: z
        .int()
        .min(1)
        .max(LARGEST_MINUTE_QUOTA)
        .optional()
        .meta({
          description: `Requests a minute; where left out ${DEFAULT_MINUTE_QUOTA}, or ${URL_MINUTE_QUOTA} with \`allowedInUrl\`.`,
        }),
      month: z
        .int()
        .min(0)
        .max(LARGEST_QUOTA)
        .optional()
        .meta({
          description: `Computations a calendar month (UTC); where left out ${DEFAULT_MONTH_QUOTA}, or ${URL_MONTH_QUOTA} with \`allowedInUrl\`.`,
        }),
    })
    .optional(),
  origins: z
    .array(origin)
    .max(50)
    .optional()
    .meta({ description: "Origins of browser pages that may use the key; none where left out." }),
  allowedInUrl: z
    .boolean()
    .optional()
    .meta({ description: "Whether the key may also come as `?key=` (spreadsheets); false where left out." }),
  expiresAt: z.iso
    .datetime({ offset: true })
    .optional()
    .meta({
      description: "When the key ends (RFC 3339); never where left out.",
      examples: ["2030-01-01T00:00:00Z"],
    }),
});

export type KeySettings = z.infer<typeof keySettings>;

/** What may be changed about a key later: any of it; an expiry of null takes the end away. */
export const keyChange = z
  .strictObject({
    ...keySettings.shape,
    expiresAt: z.iso.datetime({ offset: true }).nullable(),
  })
  .partial();

export type KeyChangeInput = z.infer<typeof keyChange>;

import { z } from "zod";
import { requireKey } from "@/lib/auth/access";
import { usageReport } from "@/lib/usage/report";
import { bucketsOf } from "../call";
import { defineOperation, json } from "../operation";

const quota = (description: string) =>
  z.object({ quota: z.int(), remaining: z.int(), resetsAt: z.iso.datetime() }).meta({ description });

export const readUsage = defineOperation({
  id: "readUsage",
  method: "GET",
  path: "/usage",
  tag: "Service",
  summary: "What this key has used",
  description:
    "The calling key's own usage of the last 31 days and what is left of its quotas. A month is a calendar month in UTC. This call itself counts from the next report on.",
  scope: "any",
  request: {},
  responses: {
    200: {
      description: "Usage and quotas.",
      content: {
        "application/json": z
          .object({
            key: z.string().meta({ description: "Id of the key." }),
            scopes: z.array(z.string()),
            minute: quota("Requests a minute."),
            month: quota("Computations of the calendar month (UTC)."),
            byDay: z.array(
              z.object({
                day: z.iso.date(),
                requests: z.int(),
                computations: z.int(),
                refused: z.int().meta({ description: "Requests answered with 400 or above." }),
              }),
            ),
          })
          .meta({ id: "Usage", description: "A key's usage and quotas." }),
      },
    },
  },
  errors: ["team-required"],
  examples: [{ name: "usage", summary: "Usage of a key that has computed a few shapes", status: 200 }],
  handler: async (_input, { service, principal, now }) => {
    const key = requireKey(principal, "Usage");
    return json(200, await usageReport(service, key, bucketsOf(key, now), now));
  },
});

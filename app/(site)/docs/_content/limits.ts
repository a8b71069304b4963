import { DEFAULT_MINUTE_QUOTA, DEFAULT_MONTH_QUOTA } from "@/lib/limits/quota";
import { CALL_LIMITS } from "./call-limits";
import type { DocPage } from "./page";

const count = (value: number) => value.toLocaleString("en");

export const limits: DocPage = {
  slug: "limits",
  title: "Limits and quotas",
  summary: "What a key may use, what a call may weigh, and how to see what is left.",
  sections: ({ origin }) => [
    {
      id: "quotas",
      title: "Quotas",
      blocks: [
        "A key has two quotas. They are set when it is issued and can differ from key to key.",
        {
          table: {
            head: ["quota", "counts", "where nothing else is said"],
            rows: [
              ["minute", "requests, whatever comes of them", count(DEFAULT_MINUTE_QUOTA)],
              ["month", "computations, by the calendar month in UTC", count(DEFAULT_MONTH_QUOTA)],
            ],
          },
        },
        "One resistance is one computation, each answered item of a batch is one, a field solution counts [by its unknowns](/docs/fields#costs). A refused request costs no computation.",
      ],
    },
    {
      id: "left",
      title: "What is left",
      blocks: [
        "Every answer carries `RateLimit-Policy` and `RateLimit`: the quotas, what remains of them, and the seconds until they are whole again. `GET /usage` says the same with the usage of each day.",
        {
          snippets: [
            {
              language: "sh",
              label: "curl",
              code: `curl -s -o answer.json -D - ${origin}/api/v1/usage \\\n  -H "Authorization: Bearer $RHOFORM_KEY" | grep -i ratelimit`,
              prints: "minute",
            },
          ],
        },
        "The requests of a minute that are used up are [429](/docs/problems/too-many-requests), the computations of a month [429 of another kind](/docs/problems/quota-exhausted). Both say in `Retry-After` how long it takes.",
      ],
    },
    {
      id: "sizes",
      title: "Sizes",
      blocks: [
        {
          table: {
            head: ["what", "most"],
            rows: [
              ["body of a call", CALL_LIMITS.body],
              ["body of an outline or a field", CALL_LIMITS.outlineBody],
              ["body of a batch", `${CALL_LIMITS.batchBody} and ${CALL_LIMITS.batchItems} items`],
              ["body of a network", `${CALL_LIMITS.networkBody} and ${CALL_LIMITS.networkElements} elements`],
              ["`Prefer: wait`", CALL_LIMITS.wait],
              ["an expression", `${CALL_LIMITS.expression} characters`],
              ["a page of a list", "`limit`, with the next page in `next` and in the `Link` header"],
            ],
          },
        },
      ],
    },
    {
      id: "pages",
      title: "Without a key",
      blocks: [
        "The catalogue, the OpenAPI document and `/health` are limited per address. So are the pages of this service while nobody is signed in.",
      ],
    },
  ],
};

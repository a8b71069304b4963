import { jsonBlock } from "./call-blocks";
import type { DocPage } from "./page";

/** What the API says of the call below; the test of the snippets holds it to that. */
const COMPLAINT =
  'must be a length, but "kg" measures a mass; give a length, such as 0.00025, "0.25 mm", "10 mil".';

export const errors: DocPage = {
  slug: "errors",
  title: "Errors and retries",
  summary: "Every refusal is a problem document that says which field is wrong and what is allowed.",
  sections: ({ origin }) => [
    {
      id: "document",
      title: "The problem document",
      blocks: [
        "Refusals have the media type `application/problem+json` (RFC 9457):",
        {
          snippets: [
            {
              language: "sh",
              label: "a wrong unit",
              code: `curl -s ${origin}/api/v1/resistance \\\n  -H "Authorization: Bearer $RHOFORM_KEY" \\\n  -H "Content-Type: application/json" \\\n  -d '{ "shape": "bar", "dimensions": { "length": "1 m", "width": "5 kg", "thickness": "1 mm" }, "medium": { "resistivity": 1 } }'`,
              prints: JSON.stringify({ pointer: "#/dimensions/width", detail: COMPLAINT }),
            },
          ],
        },
        jsonBlock("its answer", {
          type: `${origin}/docs/problems/invalid-input`,
          title: "The input cannot be used",
          status: 422,
          detail: `#/dimensions/width ${COMPLAINT}`,
          instance: "req_…",
          errors: [{ pointer: "#/dimensions/width", detail: COMPLAINT }],
        }),
        "`type` leads to a page that explains the problem; its last part is a stable code to branch on. `instance` is the id of the request, also in the `Request-Id` header: quote it to whoever runs the service. `errors` has every complaint at once, each with a JSON pointer into the body, or with the name of a query parameter.",
        "All of them are listed under [problems](/docs/problems).",
      ],
    },
    {
      id: "retries",
      title: "What to try again",
      blocks: [
        {
          table: {
            head: ["answer", "what to do"],
            rows: [
              [
                "400, 401, 403, 404, 405, 406, 410, 413, 415, 422, 428",
                "nothing changes by a repeat: mend the call",
              ],
              ["409", "read the newest version and decide again, or wait for the call that is still running"],
              ["429, 503", "wait as `Retry-After` says; nothing has been done, so a repeat is safe"],
              ["500", "report it with its `instance`"],
              ["502, 504, a broken connection", "repeat what may be made twice"],
            ],
          },
        },
        "`429` has two causes: the requests of a minute, which are back within it, and the computations of a month, where `Retry-After` is days. The [clients](/docs/clients#habits) wait for the first and give up on the second.",
      ],
    },
    {
      id: "idempotency",
      title: "Idempotency keys",
      blocks: [
        "Every POST that stores something honours `Idempotency-Key`, a text of your choice. A repeat with the same key within a day gets the first answer again and stores nothing twice. The same key with another body is [422](/docs/problems/idempotency-key-reused), while the first call still runs it is [409](/docs/problems/request-in-progress). A repeat of issuing or rotating a key is answered without the secret.",
      ],
    },
  ],
};

import { SCOPES } from "@/lib/auth/scope";
import { callBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const authentication: DocPage = {
  slug: "authentication",
  title: "Authentication and scopes",
  summary: "How a program proves who it is, what its key may do, and how keys are replaced.",
  sections: ({ origin }) => [
    {
      id: "keys",
      title: "Keys",
      blocks: [
        "A call carries its key as a bearer token: `Authorization: Bearer rho_<id>_<secret>`. The service keeps a hash of the secret, so it can never show a key again. The catalogue, the OpenAPI document and `/health` need no key; everything else is 401 without one.",
        "A key belongs to a team. It sees the team’s own materials, records, outlines and field solutions beside the shared library; what another team owns is 404.",
        callBlock(
          origin,
          {
            operation: "readUsage",
            method: "GET",
            path: "/usage",
            typescript: ["console.log(answer.scopes, answer.month.remaining);"],
            python: ["print(answer.scopes, answer.month.remaining)"],
          },
          "compute",
        ),
      ],
    },
    {
      id: "scopes",
      title: "Scopes",
      blocks: [
        "A key may do what its scopes say and nothing else; a call beyond them is [403](/docs/problems/insufficient-scope). Give a key the fewest it needs.",
        {
          table: {
            head: ["scope", "allows to"],
            rows: Object.entries(SCOPES).map(([scope, text]) => [`\`${scope}\``, text]),
          },
        },
      ],
    },
    {
      id: "browsers",
      title: "Keys in browsers",
      blocks: [
        "A page of another site may use a key only if the key’s allowed origins name that site. Preflight requests are answered without a key; the origin is enforced on the call itself ([403](/docs/problems/origin-not-allowed)). Whoever can open the page can read the key: give it `compute` alone and a small quota.",
      ],
    },
    {
      id: "addresses",
      title: "Keys in addresses",
      blocks: [
        "A key that was issued with `allowedInUrl` may come as `?key=…`, for [spreadsheets](/docs/spreadsheets). Any other key in an address is [refused](/docs/problems/key-not-allowed-in-url), and so is a call with two keys.",
      ],
    },
    {
      id: "rotation",
      title: "Rotation and revocation",
      blocks: [
        "`POST /keys/{id}/rotate` gives a second secret and an end date for the first, so that programs can change over without a gap. A revoked key ends with the next request. Both can be done in the console, with a key of the scope `keys:manage`, or in a shell:",
        {
          snippets: [
            {
              language: "sh",
              label: "shell, on the service’s machine",
              code: "npm run -s keys -- list\nnpm run -s keys -- rotate <id> --overlap 7d\nnpm run -s keys -- revoke <id>",
              shownOnly: true,
            },
          ],
        },
        "A key with `keys:manage` can issue keys of its own team with no more scopes than it has itself.",
      ],
    },
    {
      id: "pages",
      title: "Our own pages",
      blocks: [
        "The pages of this service call the same API with a short-lived signed token. Signed out, a page computes under a strict limit per address and solves small fields only; signed in, it calls for the reader’s team.",
      ],
    },
  ],
};

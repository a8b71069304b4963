import { clientInstall, packedClient, pythonDownload } from "./client-files";
import type { DocPage } from "./page";

export const clients: DocPage = {
  slug: "clients",
  title: "Clients",
  summary: "Typed clients for TypeScript and Python, and a command for the shell.",
  sections: ({ origin }) => [
    {
      id: "python",
      title: "Python",
      blocks: [
        "One file, Python 3.9 and newer, standard library only. Put it beside your script, or into the script folder of a CAD program:",
        pythonDownload(origin),
        "It can be downloaded [here](/docs/python/rhoform.py) as well. With the repository at hand, `python3 -m pip install ./sdk/python` installs it, in a virtual environment where the system’s Python refuses; that needs no network.",
        {
          snippets: [
            {
              language: "python",
              label: "Python",
              prints: "bar is 50 mm wide",
              code: [
                "import os",
                "import rhoform",
                "",
                `client = rhoform.Client("${origin}", key=os.environ["RHOFORM_KEY"])`,
                "",
                "# A class for each shape: a wrong name is found before the call.",
                'bar = rhoform.Bar(length="1.2 m", width="50 mm", thickness="10 mm")',
                'answer = client.resistance(bar, {"material": "copper-annealed"}, operating={"temperature": "75 degC"})',
                'print("The bar is 50 mm wide:", answer.resistance.text, answer.resistance.bounds_basis)',
              ].join("\n"),
            },
          ],
        },
        "Methods and members have Python’s names (`compute_resistance`, `bounds_basis`); bodies given as dictionaries keep the API’s. `rhoform.to_dict(answer)` gives plain values again. A refusal raises `rhoform.RhoformProblem`; `RhoformTimeout` and `RhoformUnreachable` tell of the way there, and all of them are `rhoform.RhoformError`.",
      ],
    },
    {
      id: "shell",
      title: "A shell",
      blocks: [
        "The same file is a command. It reads `RHOFORM_URL` and `RHOFORM_KEY`.",
        {
          snippets: [
            {
              language: "sh",
              label: "shell",
              prints: "145.83\u2009GΩ",
              code: [
                `export RHOFORM_URL=${origin}`,
                "python3 -m rhoform shapes cylindrical-shell",
                "python3 -m rhoform resistance cylindrical-shell innerRadius=2mm outerRadius=5mm length=1m conductivity=1e-12",
              ].join("\n"),
            },
          ],
        },
        "`python3 -m rhoform help` lists the other commands: a table of requests, a field solution, any operation.",
      ],
    },
    {
      id: "typescript",
      title: "TypeScript and JavaScript",
      blocks: [
        "ES modules with types for Node 18.17 and newer and for browsers, without dependencies. This service hands out the package of its own version:",
        clientInstall(origin),
        "The lock file of your project then holds its address and digest. Where builds do not reach this service, [download the file](/docs/clients/" +
          packedClient() +
          ") and install it from your repository. In a project whose `package.json` lacks `type: module`, name a file `.mjs`, or `.mts` where it has types.",
        {
          snippets: [
            {
              language: "ts",
              label: "TypeScript",
              prints: "proved",
              code: [
                'import { computeResistance, rhoform, RhoformProblem } from "@rhoform/client";',
                "",
                `const client = rhoform({ baseUrl: "${origin}", key: process.env.RHOFORM_KEY });`,
                "",
                "try {",
                "  const { resistance } = await computeResistance({",
                "    client,",
                "    body: {",
                '      shape: "bar",',
                '      dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },',
                '      medium: { material: "copper-annealed" },',
                "    },",
                "  });",
                '  console.log(resistance.text, resistance.proved ? "proved" : "estimated");',
                "} catch (error) {",
                "  if (error instanceof RhoformProblem) console.error(error.code, error.errors);",
                "  else throw error;",
                "}",
              ].join("\n"),
            },
          ],
        },
        "Calls are functions, so that a bundler leaves out what is not used. Each shape’s dimensions are typed: a wrong name does not compile. In a browser, use a key whose allowed origins name your page; everyone who opens the page can read it.",
      ],
    },
    {
      id: "habits",
      title: "What both do by themselves",
      blocks: [
        {
          table: {
            head: ["what happens", "what the client does"],
            rows: [
              ["no answer within 30 s", "a timeout error; the time can be set"],
              ["429 or 503", "waits as `Retry-After` says, at most 60 s, and tries twice more"],
              [
                "a broken connection, 502, 504",
                "tries again for reads and for calls with an `Idempotency-Key`",
              ],
              [
                "a call that may store something",
                "gets an `Idempotency-Key` by itself, except issuing and rotating keys and replaying records",
              ],
              ["any other refusal", "throws a `RhoformProblem` with `status`, `code`, `detail` and `errors`"],
              ["an error of any kind", "never has the key in its text"],
            ],
          },
        },
      ],
    },
    {
      id: "examples",
      title: "Examples to start from",
      blocks: [
        {
          table: {
            head: ["script", "what it does"],
            rows: [
              [
                "[`sweep.py`](/docs/python/examples/sweep.py), `sweep.ts`",
                "sweeps one dimension and prints a table",
              ],
              [
                "[`parts_list.py`](/docs/python/examples/parts_list.py), `parts-list.ts`",
                "reads a parts list from CSV; exits with 1 if a row is refused",
              ],
              [
                "[`replay_records.py`](/docs/python/examples/replay_records.py), `replay-records.ts`",
                "replays records, as a nightly job; exits with 1 on drift",
              ],
            ],
          },
        },
        "They read `RHOFORM_URL` and `RHOFORM_KEY` from the environment. A Python one goes beside `rhoform.py`; each says at its top what it is called with:",
        {
          snippets: [
            {
              language: "sh",
              label: "Python, in a shell",
              prints: "width/mm,resistance/ohm",
              code: [
                `export RHOFORM_URL=${origin}`,
                `curl -fsSO ${origin}/docs/python/examples/sweep.py`,
                "python3 sweep.py",
              ].join("\n"),
            },
            {
              language: "sh",
              label: "TypeScript, in a shell",
              shownOnly: true,
              code: [
                `export RHOFORM_URL=${origin}`,
                "cp node_modules/@rhoform/client/examples/sweep.ts sweep.mts",
                "npx tsx sweep.mts",
              ].join("\n"),
            },
          ],
        },
        "The TypeScript ones come with the package. Copy one into your project before you change it; Node 22.18 and newer runs the copy without `tsx`, as `node sweep.mts`.",
      ],
    },
  ],
};

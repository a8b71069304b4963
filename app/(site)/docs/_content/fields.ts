import { FIELD_COSTS, SIGNED_OUT_UNKNOWNS } from "@/lib/jobs/field-cost";
import { callBlock } from "./call-blocks";
import { CALL_LIMITS } from "./call-limits";
import type { DocPage } from "./page";

const ELBOW = {
  outline: {
    unit: "mm",
    outer: [
      [0, 0],
      [40, 0],
      [40, 10],
      [10, 10],
      [10, 40],
      [0, 40],
    ],
  },
  terminals: [
    {
      name: "in",
      segments: [
        [
          [40, 0],
          [40, 10],
        ],
      ],
    },
    {
      name: "out",
      segments: [
        [
          [10, 40],
          [0, 40],
        ],
      ],
    },
  ],
  medium: { sheetResistance: "50 ohm/sq" },
  accuracy: 1e-4,
};

const count = (value: number) => value.toLocaleString("en");

export const fields: DocPage = {
  slug: "fields",
  title: "Outlines and fields",
  summary: "Any plan shape: an outline, terminals on its edges, and a resistance between two bounds.",
  sections: ({ origin }) => [
    {
      id: "solve",
      title: "Solve one",
      blocks: [
        "The field is solved twice, for the potential and for its conjugate. The energies of the two lie on either side of the true resistance, and the mesh is refined where they differ until `(upper − lower)/value` is at most `accuracy` (1e-2 to 1e-8, 1e-4 where left out). The same can be drawn on the [outline page](/outline).",
        callBlock(
          origin,
          {
            operation: "solveField",
            method: "POST",
            path: "/fields",
            body: ELBOW,
            wait: 30,
            typescript: [
              "console.log(answer.status, answer.result?.resistance?.text, answer.result?.squares?.text);",
            ],
            python: ["print(answer.status, answer.result.resistance.text, answer.result.squares.text)"],
          },
          "done",
        ),
        `\`Prefer: wait=30\` waits up to ${CALL_LIMITS.wait} for the end. A solution that is not ready is answered with 202 and a \`Location\` to ask at; \`GET /fields/{id}/events\` streams the progress as server-sent events.`,
      ],
    },
    {
      id: "jobs",
      title: "Longer ones",
      blocks: [
        "The clients wait for the end, tell each new bracket in ohms, and can stop:",
        {
          snippets: [
            {
              language: "ts",
              label: "TypeScript client",
              prints: "done",
              code: [
                'import { rhoform, runField } from "@rhoform/client";',
                "",
                `const client = rhoform({ baseUrl: "${origin}", key: process.env.RHOFORM_KEY });`,
                "const field = await runField({",
                "  client,",
                "  // An abort cancels the solution as well.",
                "  signal: AbortSignal.timeout(300_000),",
                "  onProgress: ({ lower, upper }) => console.log(lower, upper),",
                "  body: {",
                '    outline: { unit: "mm", outer: [[0, 0], [30, 0], [30, 10], [0, 10]] },',
                "    terminals: [",
                '      { name: "in", segments: [[[0, 0], [0, 10]]] },',
                '      { name: "out", segments: [[[30, 2], [30, 8]]] },',
                "    ],",
                '    medium: { material: "copper-annealed", thickness: "35 um" },',
                "  },",
                "});",
                "console.log(field.status, field.result?.resistance?.text);",
              ].join("\n"),
            },
            {
              language: "python",
              label: "Python client",
              prints: "done",
              code: [
                "import os",
                "import rhoform",
                "",
                `client = rhoform.Client("${origin}", key=os.environ["RHOFORM_KEY"])`,
                "field = client.field(",
                "    {",
                '        "outline": {"unit": "mm", "outer": [[0, 0], [30, 0], [30, 10], [0, 10]]},',
                '        "terminals": [',
                '            {"name": "in", "segments": [[[0, 0], [0, 10]]]},',
                '            {"name": "out", "segments": [[[30, 2], [30, 8]]]},',
                "        ],",
                '        "medium": {"material": "copper-annealed", "thickness": "35 um"},',
                "    },",
                "    timeout=300,",
                "    on_progress=lambda bracket: print(bracket.lower, bracket.upper),",
                ")",
                "print(field.status, field.result.resistance.text)",
              ].join("\n"),
            },
          ],
        },
        "The status is `queued`, `running`, then `done`, `limited`, `failed` or `cancelled`. `limited` means that a cap on unknowns or time was met; the bracket reached stands. A solution that fails, is refused or is cancelled costs nothing.",
      ],
    },
    {
      id: "outline",
      title: "The outline",
      blocks: [
        {
          list: [
            "`outer` is an open list of vertices, `holes` a list of such lists; the direction does not matter. Coordinates are in `unit`.",
            'In place of a vertex an arc arrives as `{ "arcTo": [x, y], "center": [x, y], "clockwise": false }`.',
            '`symmetry: "axisymmetric"` makes the plan a half section: x is the radius, y the axis, and the medium has no thickness.',
            "`POST /outlines` checks, cleans and stores an outline; a field then names it by `outlineId`. What was mended is listed under `repairs`.",
          ],
        },
      ],
    },
    {
      id: "terminals",
      title: "Terminals",
      blocks: [
        'A terminal is one or more parts of the boundary, on the outer ring or on a hole: straight `segments` that lie on edges, or `parts: [{ "ring": 0, "edge": 3, "from": 0, "to": 1 }]`, where ring 0 is the outer one and edge i runs from vertex i to i + 1.',
        "Two terminals give `resistance`. Three or more give `conductance`, the matrix in siemens with the other terminals at zero volts, and `pairs` with the resistance of each pair, the others floating or grounded.",
      ],
    },
    {
      id: "medium",
      title: "The medium",
      blocks: [
        "A sheet resistance, or a material, resistivity or conductivity with a `thickness`. `regions` put another medium into parts of the plan. An `expression` in x and y (metres) makes the conductivity vary; the bounds are then estimated and not proved.",
      ],
    },
    {
      id: "pictures",
      title: "Picture and values",
      blocks: [
        {
          table: {
            head: ["call", "gives"],
            rows: [
              ["`GET /fields/{id}/plot.svg`", "the finished picture with scale, terminals and legend"],
              [
                "`GET /fields/{id}/map.json`",
                "equipotentials, stream lines, a raster of the density, edges with their current",
              ],
              ["`GET /fields/{id}/line?from=x,y&to=x,y`", "potential and density along a line"],
            ],
          },
        },
        "At a re-entrant corner the density of the ideal field is unbounded; `peak` says so in place of a number that would depend on the mesh.",
      ],
    },
    {
      id: "costs",
      title: "What it counts",
      blocks: [
        {
          table: {
            head: ["unknowns up to", "computations of the month"],
            rows: FIELD_COSTS.map(({ upToUnknowns, computations }) => [
              count(upToUnknowns),
              String(computations),
            ]),
          },
        },
        `The most is reserved at the start and the rest given back at the end. Pages that nobody has signed in to solve up to ${count(SIGNED_OUT_UNKNOWNS)} unknowns.`,
      ],
    },
  ],
};

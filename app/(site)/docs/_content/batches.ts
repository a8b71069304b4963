import { callBlock } from "./call-blocks";
import { CALL_LIMITS } from "./call-limits";
import type { DocPage } from "./page";

const bar = (width: string) => ({
  shape: "bar",
  dimensions: { length: "1.2 m", width, thickness: "10 mm" },
  medium: { material: "copper-annealed" },
  include: [],
});

export const batches: DocPage = {
  slug: "batches",
  title: "Batches",
  summary: `Up to ${CALL_LIMITS.batchItems} requests in one call, each answered or refused on its own.`,
  sections: ({ origin }) => [
    {
      id: "call",
      title: "One call",
      blocks: [
        "`items` are bodies of `POST /resistance`, without `record`. The answer has an item for each, in order: `status` 200 with a `result`, or another status with a `problem` whose pointers start at the item. One bad item does not hinder the others, and refused items cost no quota.",
        callBlock(
          origin,
          {
            operation: "computeBatch",
            method: "POST",
            path: "/resistance/batch",
            body: { items: [bar("50 mm"), bar("50 kg")] },
            typescript: [
              "for (const item of answer.items) {",
              '  console.log(item.index, "result" in item ? item.result.resistance.text : item.problem.detail);',
              "}",
            ],
            python: [
              "for item in answer.items:",
              "    print(item.index, item.result.resistance.text if item.status == 200 else item.problem.detail)",
            ],
          },
          "µΩ",
        ),
        "`include: []` in an item leaves out the checks and makes the answer smaller. Answers stream out as they are ready.",
      ],
    },
    {
      id: "any-number",
      title: "Any number of requests",
      blocks: [
        "The clients cut a long list to the limits of a call, keep the order, and ask again for items for which the service had no time.",
        {
          snippets: [
            {
              language: "ts",
              label: "TypeScript client",
              prints: "12",
              code: [
                'import { computeAll, rhoform, type ResistanceRequest } from "@rhoform/client";',
                "",
                `const client = rhoform({ baseUrl: "${origin}", key: process.env.RHOFORM_KEY });`,
                "const requests = Array.from({ length: 12 }, (_, index): ResistanceRequest => ({",
                '  shape: "bar",',
                '  dimensions: { length: "1 m", width: `${10 * (index + 1)} mm`, thickness: "5 mm" },',
                '  medium: { material: "copper-annealed" },',
                "  include: [],",
                "}));",
                "const items = await computeAll({ client, requests });",
                'console.log(items.length, items.filter((item) => "result" in item).length);',
              ].join("\n"),
            },
            {
              language: "python",
              label: "Python client",
              prints: "12",
              code: [
                "import os",
                "import rhoform",
                "",
                `client = rhoform.Client("${origin}", key=os.environ["RHOFORM_KEY"])`,
                "requests = [",
                "    rhoform.request_of(",
                '        rhoform.Bar(length="1 m", width=f"{10 * (index + 1)} mm", thickness="5 mm"),',
                '        {"material": "copper-annealed"},',
                "        include=[],",
                "    )",
                "    for index in range(12)",
                "]",
                "items = client.batch(requests)",
                "print(len(items), [item.result.resistance.value for item in items])",
              ].join("\n"),
            },
          ],
        },
      ],
    },
    {
      id: "csv",
      title: "Tables",
      blocks: [
        "A body of the type `text/csv` is a table, a row a request, and is answered as a table: see [spreadsheets](/docs/spreadsheets#table). `Accept` or `format=json` asks for JSON in place of it.",
        {
          table: {
            head: ["column", "content"],
            rows: [
              ["`shape`", "id of the shape; required"],
              ["`length`, `innerRadius`, …", "dimensions by name; cells of other shapes stay empty"],
              ["`material`, `resistivity`, `conductivity`, `sheetResistance`, `thickness`", "the medium"],
              ["`core.material`, `upper.resistivity`, …", "media of a shape that has two"],
              ["`temperature`, `voltage`, `current`, `power`", "the operating point"],
              ["`label`", "yours; it comes back as it is"],
            ],
          },
        },
        "A unit stands in the cell, or in the header for the whole column: `width/mm`. Empty rows are skipped. A cell that a spreadsheet would take for a formula comes back with an apostrophe in front.",
      ],
    },
    {
      id: "limits",
      title: "Limits",
      blocks: [
        `A call takes ${CALL_LIMITS.batchItems} items and ${CALL_LIMITS.batchBody}; more is [413](/docs/problems/body-too-large). As many computations as there are items are reserved of the month at the start; those of refused items are given back. The items for which the time of a batch does not suffice have status 503 and can be sent again.`,
      ],
    },
  ],
};

import { callBlock, resistanceBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const records: DocPage = {
  slug: "records",
  title: "Records and replay",
  summary: "A stored calculation that can be shown in a review and computed again years later.",
  sections: ({ origin }) => [
    {
      id: "store",
      title: "Store one",
      blocks: [
        "A resistance, a sizing, a network or a field solution is stored only if its request asks for it:",
        resistanceBlock(
          origin,
          {
            shape: "bar",
            dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },
            medium: { material: "copper-annealed" },
            record: { label: "Riser, rev C" },
          },
          {
            typescript: ["console.log(answer.record?.id, answer.record?.url);"],
            python: ["print(answer.record.id, answer.record.url)"],
          },
          "/records/",
        ),
        "A record holds the request, the result, the versions of the materials, of the engine and of the catalogue, who stored it and when. Nothing of it changes later but its label. Whoever is signed in and belongs to the team sees it as a page.",
      ],
    },
    {
      id: "find",
      title: "Find them",
      blocks: [
        "`GET /records` takes `operation`, `shape` and `search` (part of the label), and answers page by page.",
        callBlock(
          origin,
          {
            operation: "listRecords",
            method: "GET",
            path: "/records",
            query: { shape: "bar", search: "rev C" },
            typescript: [
              "for (const record of answer.items) console.log(record.id, record.label, record.engine);",
            ],
            python: ["for record in answer.items:", "    print(record.id, record.label, record.engine)"],
          },
          "Riser, rev C",
        ),
      ],
    },
    {
      id: "replay",
      title: "Replay",
      blocks: [
        "`POST /records/{id}/replay` computes the stored request again with today’s engine and the stored versions of the materials. The answer has the result `before` and `now`, the relative `drift` between them, and `identical`. Nothing is stored. A field solution is replayed as a job, and answered as `POST /fields` is.",
        "A change of any number by more than its bounds raises the engine’s major version and stands in the [changelog](/docs/changelog); replaying your records on every update shows what it means for you. A script that does it every night comes with the clients: [`replay_records.py`](/docs/python/examples/replay_records.py) and `replay-records.ts`, see [examples](/docs/clients#examples).",
      ],
    },
  ],
};

import { callBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const materials: DocPage = {
  slug: "materials",
  title: "Materials and provenance",
  summary: "A shared library with sources, your team’s own materials, and a version for every change.",
  sections: ({ origin }) => [
    {
      id: "library",
      title: "The library",
      blocks: [
        "Every material has a law of resistivity over temperature, the range in which it holds, its uncertainty, and where it comes from.",
        callBlock(
          origin,
          {
            operation: "readMaterial",
            method: "GET",
            path: "/materials/{id}",
            pathValues: { id: "copper-annealed" },
            typescript: ["console.log(answer.name, answer.version, answer.provenance, answer.source);"],
            python: ["print(answer.name, answer.version, answer.provenance, answer.source)"],
          },
          "opper",
        ),
        "`GET /materials` lists the library and then the team’s own. Material data is nominal unless your team measured it.",
      ],
    },
    {
      id: "provenance",
      title: "Provenance",
      blocks: [
        {
          table: {
            head: ["provenance", "meaning"],
            rows: [
              ["`source at hand`", "read from the named source while the entry was written"],
              ["`from memory`", "written from common knowledge of the trade; check it before you rely on it"],
              ["`measured`", "measured by the team that owns the material"],
            ],
          },
        },
      ],
    },
    {
      id: "own",
      title: "Your own",
      blocks: [
        "A key with `materials:write` creates materials of its team, usable by their id at once.",
        callBlock(
          origin,
          {
            operation: "createMaterial",
            method: "POST",
            path: "/materials",
            body: {
              name: "Contact bronze, lot 7",
              kind: "alloy",
              resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
              range: { from: -40, to: 150 },
              uncertainty: { lower: 0.98, upper: 1.02, note: "Four-wire measurement of five samples." },
              source: "Incoming inspection, lot 7",
              provenance: "measured",
            },
            typescript: ["console.log(answer.id, answer.version);"],
            python: ["print(answer.id, answer.version)"],
          },
          "",
        ),
        "Laws are `linear`, `polynomial`, `table`, `constant`, `silicon` (by dopant density) and `sea-water` (by salinity); the [reference](/docs/api) has their members.",
        "A measured table can be sent as CSV, a header with units and a row a measurement:",
        {
          snippets: [
            {
              language: "csv",
              label: "bronze.csv",
              file: "bronze.csv",
              code: "temperature/degC,resistivity/uohm cm\n-40,8.87\n20,9.50\n100,10.34\n150,10.86",
            },
          ],
        },
        {
          snippets: [
            {
              language: "sh",
              label: "curl",
              code: `curl -s "${origin}/api/v1/materials?name=Contact+bronze&kind=alloy&source=Inspection&uncertainty=2+%25" \\\n  -H "Authorization: Bearer $RHOFORM_KEY" \\\n  -H "Content-Type: text/csv" \\\n  --data-binary @bronze.csv`,
              prints: "table",
            },
          ],
        },
      ],
    },
    {
      id: "versions",
      title: "Versions",
      blocks: [
        "`PATCH /materials/{id}` makes the next version. It needs `If-Match` with the version it was made from, so that two people do not overwrite each other: without it the answer is [428](/docs/problems/precondition-required), with an old one [409](/docs/problems/version-conflict). Old versions stay readable with `?version=`, and every record names the version it used.",
        "`DELETE` retires a material: it can no longer be used in new requests, and records that used it stay as they are. The shared library cannot be changed.",
      ],
    },
  ],
};

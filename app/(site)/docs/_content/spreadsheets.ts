import { URL_MINUTE_QUOTA, URL_MONTH_QUOTA } from "@/lib/limits/quota";
import type { DocPage } from "./page";

const ADDRESS =
  "/api/v1/resistance/bar?length=1200mm&width=50mm&thickness=10mm&material=copper-annealed&temperature=75&format=text&key=";

export const spreadsheets: DocPage = {
  slug: "spreadsheets",
  title: "Spreadsheets",
  summary: "A resistance in a cell by a formula, or a whole sheet by a table of requests.",
  sections: ({ origin }) => [
    {
      id: "key",
      title: "A key that may travel in an address",
      blocks: [
        "A formula can send an address and nothing else, so the key has to be part of it. Addresses end up in histories and in files that are passed on. Therefore a key may do this only if it was issued so, which is off by default; give it the scope `compute` alone, a small quota, and an end date. " +
          `Where nothing else is said it has ${URL_MINUTE_QUOTA} requests a minute and ${URL_MONTH_QUOTA.toLocaleString("en")} computations a month.`,
        {
          snippets: [
            {
              language: "sh",
              label: "shell, on the service’s machine",
              code: 'npm run -s keys -- issue --team busbar --name "Cost sheet" --scopes compute --in-url',
              shownOnly: true,
            },
          ],
        },
        "The service writes neither the address nor the key to its logs or to its usage.",
      ],
    },
    {
      id: "formula",
      title: "One cell",
      blocks: [
        "`GET /resistance/{shape}` takes every dimension as a parameter of its own name. With `format=text` the answer is the bare number in ohms. With the key in cell B1:",
        {
          snippets: [
            {
              language: "text",
              label: "formula for Excel and LibreOffice",
              code: `=NUMBERVALUE(WEBSERVICE("${origin}${ADDRESS}"&$B$1),".")`,
              shownOnly: true,
            },
            {
              language: "text",
              label: "formula with dimensions from cells",
              code: `=NUMBERVALUE(WEBSERVICE("${origin}/api/v1/resistance/bar?length="&A4&"mm&width="&B4&"mm&thickness="&C4&"mm&material=copper-annealed&format=text&key="&$B$1),".")`,
              shownOnly: true,
            },
          ],
        },
        '`NUMBERVALUE(…,".")` reads the point as the decimal sign whatever the sheet’s language. Cells that hold decimal commas must be written with a point before they go into the address: `SUBSTITUTE(A4,",",".")`. A refusal is one line that begins with `error:`, which the spreadsheet shows as an error value; open the address without `format=text` to read all of it.',
        "Every shape’s formula stands under “Use this elsewhere” on its [calculator page](/calculate). Two media take a prefix, `core.material=…&cladding.resistivity=…`. Graded media need the body of a call and do not fit an address.",
        "To try an address in a shell, with a key that may travel:",
        {
          snippets: [
            {
              language: "sh",
              label: "curl",
              code: `curl -s "${origin}${ADDRESS}$RHOFORM_URL_KEY"`,
              prints: "0.00005",
            },
          ],
        },
      ],
    },
    {
      id: "table",
      title: "A whole sheet",
      blocks: [
        "Save the sheet as CSV, send it, open what comes back: the same rows and columns, and behind them `resistance/ohm`, `lower/ohm`, `upper/ohm`, `text`, `status` and `problem`. No key is in the file. A unit stands in the cell or in the header, as `width/mm`. Semicolons and tabs separate as well as commas. Where semicolons separate, numbers may have decimal commas, all of them; the results then have them too.",
        {
          snippets: [
            {
              language: "csv",
              label: "parts.csv",
              file: "parts.csv",
              code: [
                "shape,length/mm,width/mm,thickness/mm,material,temperature,label",
                "bar,1200,50,10,copper-annealed,75,Riser",
                "bar,800,40,10,copper-annealed,75,Link",
                "bar,800,40,,copper-annealed,75,Link without thickness",
              ].join("\n"),
            },
          ],
        },
        {
          snippets: [
            {
              language: "sh",
              label: "curl",
              code: `curl -s ${origin}/api/v1/resistance/batch \\\n  -H "Authorization: Bearer $RHOFORM_KEY" \\\n  -H "Content-Type: text/csv" \\\n  --data-binary @parts.csv`,
              prints: "Riser",
            },
            {
              language: "sh",
              label: "Python client, in a shell",
              code: `RHOFORM_URL=${origin} python3 -m rhoform batch parts.csv || echo "some rows were refused"`,
              prints: "Riser",
            },
          ],
        },
        "A row that cannot be computed says why in `problem` and does not hinder the others; the Python command then leaves with 1. Each [shape’s page](/docs/shapes) has a template with its columns to download.",
      ],
    },
  ],
};

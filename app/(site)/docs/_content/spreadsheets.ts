import { URL_MINUTE_QUOTA, URL_MONTH_QUOTA } from "@/lib/limits/quota";
import type { DocPage } from "./page";

const ADDRESS =
  "/api/v1/resistance/bar?length=1200mm&width=50mm&thickness=10mm&material=copper-annealed&temperature=75&format=text&key=";

/** The formula of a row, with cells written into the address by `written`. */
function formula(origin: string, written: (cell: string) => string, comma: "," | ";"): string {
  const dimensions = (["length", "width", "thickness"] as const).map(
    (name, column) => `${name}="&${written(`${"ABC"[column]}4`)}&"mm&`,
  );
  return `=NUMBERVALUE(WEBSERVICE("${origin}/api/v1/resistance/bar?${dimensions.join("")}material=copper-annealed&temperature=75&format=text&key="&$B$1)${comma}".")`;
}

export const spreadsheets: DocPage = {
  slug: "spreadsheets",
  title: "Spreadsheets",
  summary: "A resistance in a cell by a formula, or a whole sheet by a table of requests.",
  sections: ({ origin }) => [
    {
      id: "key",
      title: "1. A key that may travel in an address",
      blocks: [
        "A formula can send an address and nothing else, so the key has to be part of it. Addresses end up in histories and in files that are passed on; therefore a key counts there only if it was issued for that. In the console:",
        {
          steps: [
            "Open [Keys](/console/keys) and press “Issue a key”.",
            "Name it after the workbook, such as “Cost sheet”.",
            "Tick the scope `compute` and untick every other: a formula needs no more, library materials included.",
            `Switch on “May travel in a URL, as ?key=”. The quotas become small by that: ${URL_MINUTE_QUOTA} requests a minute, ${URL_MONTH_QUOTA.toLocaleString("en")} computations a month.`,
            "Choose a last day, such as the end of the project.",
            "Press “Issue”, copy the key, and paste it into cell B1 of the workbook. Hide that cell before you pass the file on, or clear it.",
          ],
        },
        "Whoever runs the service can issue one in a shell as well, with [the service’s settings](/docs/running#people):",
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
      title: "2. One cell",
      blocks: [
        "`GET /resistance/{shape}` takes every dimension as a parameter of its own name. With `format=text` the answer is the bare number in ohms, with a point as the decimal sign. With the key in B1, and in row 4 the length, width and thickness in millimetres:",
        {
          snippets: [
            {
              language: "text",
              label: "Excel and LibreOffice",
              code: formula(origin, (cell) => `SUBSTITUTE(${cell},",",".")`, ","),
              shownOnly: true,
            },
            {
              language: "text",
              label: "the same where a semicolon parts arguments",
              code: formula(origin, (cell) => `SUBSTITUTE(${cell};",";".")`, ";"),
              shownOnly: true,
            },
            {
              language: "text",
              label: "fixed values",
              code: `=NUMBERVALUE(WEBSERVICE("${origin}${ADDRESS}"&$B$1),".")`,
              shownOnly: true,
            },
          ],
        },
        {
          list: [
            '`WEBSERVICE` fetches the address. `NUMBERVALUE(…,".")` reads the point as the decimal sign whatever the sheet’s language.',
            '`SUBSTITUTE(A4,",",".")` writes a cell with a point where the sheet shows a decimal comma; where it shows a point it changes nothing.',
            "With a decimal comma, most sheets part arguments by a semicolon: take the second form. A sheet in another language has its own names for the three functions.",
            "A spreadsheet without `WEBSERVICE` has a function of another name that loads one value from an address; give it the same address, and read its text as a number with a point.",
            "A spreadsheet that runs on another company’s servers calls from there: it reaches this service only if the service is open to it.",
          ],
        },
        "A refusal is one line that begins with `error:`, which the spreadsheet shows as an error value; open the address without `format=text` to read all of it. A sheet asks again when a cell that the formula names changes, and some ask for every formula when the file is opened: mind the quota in a sheet of thousands of rows, and use the table below for those.",
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
      title: "3. A whole sheet",
      blocks: [
        {
          steps: [
            "Download the table of the shape from its [page](/docs/shapes), “Table of requests to start from”: its columns, with the example as the first row. Open it in the spreadsheet and fill in a row for each part.",
            "Save it as CSV in UTF-8. Commas, semicolons and tabs separate; a unit stands in the cell or in the header, as `width/mm`. Numbers need decimal points here: a cell with a decimal comma is refused in its row. The [table page](/calculate/table) reads decimal commas and gives them back.",
            "Send the file as below, or paste it into the [table](/calculate/table), which needs no key.",
            "Open what comes back: the same rows and columns, and behind them `resistance/ohm`, `lower/ohm`, `upper/ohm`, `text`, `status` and `problem`.",
          ],
        },
        "No key is in the file.",
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
        "A row that cannot be computed says why in `problem` and does not hinder the others; the Python command then leaves with 1. To keep the answer, add `> answered.csv` to either command.",
      ],
    },
  ],
};

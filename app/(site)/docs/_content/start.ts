import { SHELL_START, shellRequest } from "../../_live/shell-request";
import { resistanceBlock } from "./call-blocks";
import { clientInstall, pythonDownload } from "./client-files";
import type { DocPage } from "./page";

export const start: DocPage = {
  slug: "start",
  title: "Start",
  summary: "From a key to a resistance with its bounds in three minutes.",
  sections: ({ origin }) => [
    {
      id: "key",
      title: "1. Get a key",
      blocks: [
        "Every computation needs a key of your team. Issue one in the [console](/console/keys) and press “Open the start page with this key”: the calls on these pages are then copied with it. Without an account, ask whoever runs the service; the demo company’s key is printed when the service starts.",
        { part: "key" },
        "A key is shown once. Keep it in your password store, and give it to programs by a variable:",
        {
          snippets: [
            { language: "sh", label: "shell", code: "export RHOFORM_KEY=rho_…", shownOnly: true },
            {
              language: "text",
              label: "PowerShell",
              code: '$env:RHOFORM_KEY = "rho_…"',
              shownOnly: true,
            },
          ],
        },
      ],
    },
    {
      id: "client",
      title: "2. Get a client, or none",
      blocks: [
        "curl needs nothing else. For TypeScript or JavaScript, in an empty folder with Node 18.17 or newer:",
        clientInstall(origin),
        "For Python 3.9 or newer, one file beside your script:",
        pythonDownload(origin),
      ],
    },
    {
      id: "call",
      title: "3. Make a call",
      blocks: [
        "This asks for the resistance of an insulating sleeve between its inside and its outside. Dimensions carry their unit; a bare number is SI.",
        resistanceBlock(origin, shellRequest(SHELL_START), undefined, "145.83\u2009GΩ"),
        "Paste the curl form into the shell. Save the TypeScript form as `call.mjs` and run `node call.mjs`; save the Python form as `call.py` and run `python3 call.py`. For a formula in a cell see [spreadsheets](/docs/spreadsheets).",
      ],
    },
    {
      id: "answer",
      title: "4. Read the answer",
      blocks: [
        {
          list: [
            "`resistance.value` is the number in ohms, `resistance.text` the same for people.",
            "`resistance.lower` and `resistance.upper` are its bounds, `boundsBasis` says where they come from and `proved` whether they are proved. What each basis promises is under [bounds](/docs/bounds).",
            "`cautions` and `assumptions` belong to the number: show them where you show it.",
            "`checks` are the engine’s tests of this very answer, `sources` where the formula comes from.",
          ],
        },
        "A wrong input is answered with 422 and the field it is about; see [errors](/docs/errors).",
      ],
    },
    {
      id: "next",
      title: "Where to go next",
      blocks: [
        {
          list: [
            "[Shapes](/docs/shapes): what can be computed, with a call for each.",
            "[Media](/docs/media): materials, plain resistivities, graded material.",
            "[Batches](/docs/batches): ten thousand requests in one call.",
            "[Outlines and fields](/docs/fields): any plan shape, with a two-sided bracket.",
            "[Spreadsheets](/docs/spreadsheets): a formula in a cell.",
            "[API reference](/docs/api): every operation, to try from the page.",
          ],
        },
      ],
    },
  ],
};

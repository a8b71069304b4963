import { SHELL_START, shellRequest } from "../../_live/shell-request";
import { resistanceBlock } from "./call-blocks";
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
        "Every computation needs a key of your team. Whoever runs the service issues it in the [console](/console/keys) or in a shell; the demo company’s key is printed when the service starts. A key is shown once: keep it in your password store or secret manager.",
        { part: "key" },
      ],
    },
    {
      id: "call",
      title: "2. Make a call",
      blocks: [
        "This asks for the resistance of an insulating sleeve between its inside and its outside. Dimensions carry their unit; a bare number is SI.",
        resistanceBlock(origin, shellRequest(SHELL_START), undefined, "145.83\u2009GΩ"),
        "The curl form needs nothing but curl. The other two need [a client](/docs/clients): one file for Python, one package for TypeScript.",
      ],
    },
    {
      id: "answer",
      title: "3. Read the answer",
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

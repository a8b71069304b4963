import type { DocPage } from "./page";

export const accessibility: DocPage = {
  slug: "accessibility",
  title: "Accessibility",
  summary: "What these pages hold to, how it is checked, and where they fall short.",
  sections: () => [
    {
      id: "aim",
      title: "The aim",
      blocks: [
        "The pages aim at WCAG 2.2, level AA: at widths from 360 px, by keyboard alone, at 200 % zoom, in light and dark, with reduced motion.",
      ],
    },
    {
      id: "checks",
      title: "How it is checked",
      blocks: [
        {
          list: [
            "An automatic test (axe) runs over every kind of page in light and dark, and holds the contrast of every pair of colours to 4.5:1 for text and 3:1 for graphics.",
            "Every page answers with its heading and text before any script; the docs and their search need no script at all.",
            "Drawings and plots have a description in words; formulas carry MathML; plots have their data as CSV.",
            "Nothing is told by colour alone.",
          ],
        },
      ],
    },
    {
      id: "limits",
      title: "Where they fall short",
      blocks: [
        {
          list: [
            "The interactive [API reference](/docs/api) is a component of others and needs scripts. The same contract is the [OpenAPI document](/api/v1/openapi.json).",
            "No one who relies on a screen reader has tested the pages yet.",
          ],
        },
        "If something stands in your way, tell whoever runs this service; they can pass it on with the address of the page.",
      ],
    },
  ],
};

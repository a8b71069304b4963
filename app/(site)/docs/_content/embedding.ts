import { DEFAULT_EMBED_QUOTA } from "@/lib/embeds/definition";
import type { DocPage } from "./page";

export const embedding: DocPage = {
  slug: "embedding",
  title: "Embedding",
  summary: "A calculator for exactly your part in a page of your own, without a key in that page.",
  sections: ({ origin }) => [
    {
      id: "make",
      title: "Make one",
      blocks: [
        "A widget is made in the [console](/console/embeds): a shape, which inputs are fixed, hidden or open and within which limits, a requirement, what is shown, and how it looks. Its visitors can change what is open and nothing else; the service holds every call to that.",
        "A widget appears only on pages whose origins it names. It has a quota of its own, " +
          `${DEFAULT_EMBED_QUOTA.toLocaleString("en")} computations a month where nothing else is said. A change is published as a new version; the pages show it at once.`,
      ],
    },
    {
      id: "place",
      title: "Place it",
      blocks: [
        {
          snippets: [
            {
              language: "text",
              label: "HTML",
              code: `<script src="${origin}/embed/v1.js" async></script>\n<rhoform-embed embed="emb_…" values='{"length":"1.2 m"}'></rhoform-embed>`,
              shownOnly: true,
            },
          ],
        },
        {
          table: {
            head: ["attribute", "meaning"],
            rows: [
              ["`embed`", "id of the widget"],
              ["`values`", "JSON with values of open inputs to start from"],
              ["`theme`", "`light` or `dark`, where the widget follows its host"],
              ["`lang`", "language of the widget; that of the page where left out"],
            ],
          },
        },
        "The frame is as high as its content and as wide as its place, from 320 px. It needs no cookies. A page with a Content-Security-Policy must allow it:",
        {
          snippets: [
            {
              language: "text",
              label: "Content-Security-Policy of the host page",
              code: `script-src ${origin}/embed/v1.js;\nframe-src ${origin};\nconnect-src ${origin}`,
              shownOnly: true,
            },
          ],
        },
      ],
    },
    {
      id: "talk",
      title: "Talk to it",
      blocks: [
        "The element fires `rhoform:ready`, `rhoform:result` and `rhoform:error`, and takes `set(values)` and `compute()`:",
        {
          snippets: [
            {
              language: "text",
              label: "JavaScript in the host page",
              code: [
                'const widget = document.querySelector("rhoform-embed");',
                'widget.addEventListener("rhoform:result", ({ detail }) => {',
                "  console.log(detail.resistance.text);",
                "});",
                'widget.set({ length: "2 m" });',
              ].join("\n"),
              shownOnly: true,
            },
          ],
        },
        'Underneath, frame and page exchange messages `{ "source": "rhoform", "version": 1, "type", "embed", "data" }` by `postMessage`: the frame sends `ready`, `size`, `result` and `error`, the page `set` and `compute`. Both sides check origin, window, source and version. A page that works without the script must check them itself.',
      ],
    },
    {
      id: "withdraw",
      title: "Withdraw it",
      blocks: [
        "A withdrawn widget says so in its place, and its calls are answered with [410](/docs/problems/embed-withdrawn). The console shows whose pages used it in the last 31 days before you withdraw it.",
      ],
    },
  ],
};

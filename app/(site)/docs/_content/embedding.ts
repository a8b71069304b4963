import { DEFAULT_EMBED_QUOTA, MOST_WIDGET_TRIALS } from "@/lib/embeds/definition";
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
        "A widget is made in the [console](/console/embeds): a shape of the catalogue or [an outline](#outlines), which inputs are fixed, hidden or open and within which limits, a requirement, what is shown, and how it looks. Its visitors can change what is open and nothing else; the service holds every call to that.",
        "A widget appears only on pages whose origins it names. It has a quota of its own, " +
          `${DEFAULT_EMBED_QUOTA.toLocaleString("en")} computations a month where nothing else is said. A change is published as a new version; the pages show it at once.`,
      ],
    },
    {
      id: "outlines",
      title: "On an outline",
      blocks: [
        "A widget may stand on an outline that your team has stored: “Keep outline” on the [outline page](/outline) stores what is drawn there, `POST /outlines` what a program sends. Its terminals come with it, or are given in the builder. What fills it (a sheet resistance, or a material, resistivity or conductivity with a thickness) and the operating point are fixed, hidden or open as for a shape; how narrow the bracket shall be is the builder's to say.",
        "A stored outline never changes and stays, so what is published stays as it is; another drawing is another outline and another widget.",
        "The frame sends its values to `POST /fields`, shows the bracket closing in, and then the bounds, the drawing and, where the builder says so, the picture of the field. It costs what [a field solution](/docs/fields) costs: while one runs, the most that it can cost is held back from the widget's month. A value that is changed on the way cancels it. `rhoform:result` then carries the `result` of `GET /fields/{id}`; its `method` is `field`.",
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
        "The frame is as high as its content and as wide as its place, from 320 px. Where the page changes an attribute, what was typed stays. It needs no cookies. A page with a Content-Security-Policy must allow it:",
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
        'Underneath, frame and page exchange messages `{ "source": "rhoform", "version": 1, "type", "embed", "data" }` by `postMessage`: the frame sends `ready`, `size`, `values` (what stands in its fields), `result` and `error`, the page `set` and `compute`. Both sides check origin, window, source and version. A page that works without the script must check them itself.',
      ],
    },
    {
      id: "tolerances",
      title: "Tolerances",
      blocks: [
        "A widget of a shape can say how far its resistance strays: by first-order propagation, in the worst case, or by Monte Carlo with up to " +
          `${MOST_WIDGET_TRIALS.toLocaleString("en")} trials, which cost one computation. Each input has no tolerance, a fixed one, or one that visitors change within limits. The frame shows the range beside the bounds, a verdict that counts both, and, where the builder says so, the budget by input. A [material](/docs/materials) brings its own stated uncertainty.`,
        'An open tolerance is a value like any other, named after its input: `widget.set({ "length.tolerance": "0.5 mm" })`, `values=\'{"length.tolerance":"1 %"}\'`, `?length.tolerance=1%25`. Fixed tolerances, method and trials are the version\'s, whatever a page sends. `detail.uncertainty` of `rhoform:result` is the API\'s own, described under [Uncertainty](/docs/uncertainty).',
      ],
    },
    {
      id: "languages",
      title: "Languages",
      blocks: [
        "The frame speaks English, German, French, Spanish, Swedish or Japanese, with numbers in the reader's locale: the language that the builder fixes, else that of `lang`, of the page, of the reader's browser. The catalogue's labels and the cautions come in the same language; title, labels and help that you write stay as you wrote them. Details of a refused value, names of materials and the result of `rhoform:result` stay in English, as the API has them.",
      ],
    },
    {
      id: "iframe",
      title: "Without scripts, or in a sandbox",
      blocks: [
        "Where a page or a wiki allows no scripts of its own, a plain frame does; it cannot follow its content's height, and values go into its address:",
        {
          snippets: [
            {
              language: "text",
              label: "HTML with a plain iframe",
              code: [
                `<iframe src="${origin}/embed/emb_…?length=1.2m&lang=de&theme=light"`,
                '  title="Busbar section" width="480" height="720"',
                '  style="border: 0; max-width: 100%"></iframe>',
              ].join("\n"),
              shownOnly: true,
            },
          ],
        },
        "A frame with `sandbox` needs `allow-scripts` and nothing else; without it the frame says what is missing. With `allow-popups` its link to this service opens.",
        "Files opened from a disk have no origin, so no widget can name them: serve the page.",
      ],
    },
    {
      id: "errors",
      title: "When there is no answer",
      blocks: [
        "`rhoform:error` carries a `code` and a `message`; the frame says the same calmly and keeps what was typed.",
        {
          table: {
            head: ["`code`", "meaning"],
            rows: [
              ["`fields`", "a value cannot be used; `errors` names the inputs"],
              ["`failed`", "the field on an outline has no solution for these values; `message` says why"],
              ["`quota`", "the month's computations are used up; the frame says when they return"],
              ["`pause`", "too many calls in this minute; the frame asks again by itself"],
              ["`away`", "the service cannot be reached; it is asked again"],
              ["`stale`", "another version was published; the frame offers to reload"],
              ["`gone`, `withdrawn`", "the widget was withdrawn, while it was open or before"],
              ["`not-found`", "no widget is published under this id"],
              [
                "`refused`",
                "the page's origin is not among those of the widget; its team adds it in the console, under “Place”, and it counts at once",
              ],
              ["`policy`", "the page's own policy has no `frame-src` for this service"],
            ],
          },
        },
      ],
    },
    {
      id: "examples",
      title: "Examples",
      blocks: [
        "[Pages with widgets](/embed-examples), each with its source to copy:",
        {
          list: [
            "[Plain HTML](/embed-examples/plain)",
            "[React](/embed-examples/react), by `RhoformEmbed` of `@rhoform/client/react`",
            "[A page with a strict policy](/embed-examples/strict-policy)",
            "[Two widgets that feed each other](/embed-examples/two-widgets)",
          ],
        },
        "They show the demo's widget, or yours: add `?embed=emb_…` to the address. `@rhoform/client/embed` has the types of the element and its events, and `loadEmbeds(origin)`, which loads it once. `@rhoform/client/react` needs React 18 or newer in your project, and its types; the package brings none. Both come with the [TypeScript client](/docs/clients#typescript).",
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

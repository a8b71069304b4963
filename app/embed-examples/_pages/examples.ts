/** Pages as other teams would write them, around a real widget: plain files, nothing of our own pages in them. */

export interface ExampleFacts {
  readonly origin: string;
  readonly embed: string;
  readonly nonce: string;
}

export interface Example {
  readonly title: string;
  readonly about: string;
  /** What stands in the body, after the heading. */
  readonly body: (facts: ExampleFacts) => string;
  /** File of the repository that its own script was bundled from, to be shown beside it. */
  readonly script?: string;
  /** Its policy; without one the page has none, like most bare files. */
  readonly policy?: (facts: ExampleFacts) => string;
}

const loader = ({ origin, nonce }: ExampleFacts) =>
  `<script nonce="${nonce}" src="${origin}/embed/v1.js" async></script>`;

const strictPolicy = ({ origin, nonce }: ExampleFacts) =>
  [
    "default-src 'none'",
    `script-src ${origin}/embed/v1.js 'nonce-${nonce}'`,
    `frame-src ${origin}`,
    `connect-src ${origin}`,
    `style-src 'nonce-${nonce}'`,
    "base-uri 'none'",
    "form-action 'none'",
  ].join("; ");

export const EXAMPLES: Readonly<Record<string, Example>> = {
  plain: {
    title: "Plain HTML",
    about: "The loader and one element. The page sets a value, and reads every result.",
    body: (facts) => `<p>
  <button type="button" id="metre">Set the length to 1 m</button>
  Last result: <output id="answer">none yet</output>
</p>
${loader(facts)}
<rhoform-embed id="section" embed="${facts.embed}"></rhoform-embed>
<script nonce="${facts.nonce}">
  const section = document.getElementById("section");
  const answer = document.getElementById("answer");
  section.addEventListener("rhoform:result", (event) => {
    answer.textContent = event.detail.resistance.text;
  });
  section.addEventListener("rhoform:error", (event) => {
    answer.textContent = event.detail.message;
  });
  document.getElementById("metre").addEventListener("click", () => section.set({ length: "1 m" }));
</script>`,
  },
  react: {
    title: "React",
    about: "The component of the TypeScript client: values go in as a prop, results come out as a call.",
    body: ({ origin, embed, nonce }) => `<div id="root" data-origin="${origin}" data-embed="${embed}"></div>
<script nonce="${nonce}" src="${origin}/embed-examples/react.js" defer></script>`,
    script: "sdk/typescript/examples/embed-react.tsx",
  },
  "strict-policy": {
    title: "A page with a strict policy",
    about:
      "Everything is forbidden but what the widget needs: its script, its frame, and one call by which the loader tells a refused frame from a service that is away.",
    policy: strictPolicy,
    body: (facts) => `<pre>${strictPolicy({ ...facts, nonce: "…" }).replaceAll("; ", ";\n")}</pre>
${loader(facts)}
<rhoform-embed embed="${facts.embed}"></rhoform-embed>`,
  },
  "two-widgets": {
    title: "Two widgets that feed each other",
    about:
      "Two sections of busbar in series carry the same current: what is set in one is set in the other, and the page adds up.",
    body: (facts) => `<p>Both sections: <output id="sum">no answer yet</output></p>
${loader(facts)}
<div class="side">
  <rhoform-embed id="first" embed="${facts.embed}" values='{"length":"400 mm"}'></rhoform-embed>
  <rhoform-embed id="second" embed="${facts.embed}" values='{"length":"1 m"}'></rhoform-embed>
</div>
<script nonce="${facts.nonce}">
  const pair = [document.getElementById("first"), document.getElementById("second")];
  const currentOf = (embed) => embed.result && embed.result.operating.current;
  for (const embed of pair) {
    embed.addEventListener("rhoform:result", () => {
      const other = pair.find((each) => each !== embed);
      const current = currentOf(embed);
      // Only a difference is passed on, so that the two come to rest.
      if (current && currentOf(other) && current !== currentOf(other)) other.set({ current: current + " A" });
      if (!pair.every((each) => each.result)) return;
      const ohms = pair.reduce((sum, each) => sum + each.result.resistance.value, 0);
      const watts = pair.reduce((sum, each) => sum + (each.result.operating.power || 0), 0);
      document.getElementById("sum").textContent =
        (ohms * 1e6).toPrecision(5) + " µΩ, " + watts.toPrecision(4) + " W";
    });
  }
</script>`,
  },
};

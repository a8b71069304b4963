import { readFileSync } from "node:fs";
import { join } from "node:path";
import { type ExampleFacts, EXAMPLES } from "./examples";

const STYLE = `
:root { color-scheme: light dark; }
body { font: 1rem/1.6 system-ui, sans-serif; max-width: 64rem; margin: 2rem auto; padding: 0 1rem; }
a { color: light-dark(#1f6f62, #6cc3b0); }
pre { overflow-x: auto; border: 1px solid; padding: 0.75rem; font-size: 0.875rem; }
button, select { font: inherit; min-height: 44px; padding: 0 0.75rem; }
.side { display: flex; flex-wrap: wrap; gap: 1rem; }
.side > * { flex: 1 1 20rem; }
details { margin-top: 2rem; }
nav { margin-top: 2rem; border-top: 1px solid; padding-top: 0.5rem; }
dt { margin-top: 1rem; font-weight: 600; }
dd { margin: 0; }
`;

/** The whole document of an example, with its own source to read, and the ways to the others. */
export function examplePage(name: string, facts: ExampleFacts, asked?: string): string {
  const { title, about, body, policy, script } = EXAMPLES[name];
  const source = body({ ...facts, nonce: "" }).replaceAll(' nonce=""', "");
  const others = Object.entries(EXAMPLES)
    .filter(([other]) => other !== name)
    .map(([other, example]) => `<a href="${addressOf(other, asked)}">${example.title}</a>`);
  const content = `<h1>${title}</h1>
<p>${about} <a href="/docs/embedding">How embedding works</a></p>
${body(facts)}
<details><summary>The source of this part</summary><pre tabindex="0">${escaped(source)}</pre></details>
${script ? scriptSource(script) : ""}<nav aria-label="Examples"><a href="${addressOf(undefined, asked)}">All examples</a> · ${others.join(" · ")}</nav>`;
  return documentOf(`${title} · widgets`, content, facts.nonce, policy === undefined);
}

/** The list of the examples with what each shows. */
export function indexPage(nonce: string, asked?: string): string {
  const entries = Object.entries(EXAMPLES).map(
    ([name, { title, about }]) =>
      `<dt><a href="${addressOf(name, asked)}">${title}</a></dt>\n<dd>${about}</dd>`,
  );
  const content = `<h1>Pages with widgets</h1>
<p>Four pages as another team would write them, each with its source to copy. They show the demo’s widget; with
<code>?embed=emb_…</code> at the end of the address they show yours.
<a href="/docs/embedding">How embedding works</a> · <a href="/console/embeds">Make a widget</a></p>
<dl>
${entries.join("\n")}
</dl>`;
  return documentOf("Pages with widgets", content, nonce, true);
}

/** What an example says where there is no widget to show. */
export function noWidgetPage(nonce: string): string {
  const content = `<h1>No widget to show</h1>
<p>Name one that is published at the end of the address: <code>?embed=emb_…</code></p>
<nav aria-label="Examples"><a href="${addressOf()}">All examples</a> · <a href="/console/embeds">Make a widget</a></nav>`;
  return documentOf("No widget to show", content, nonce, true);
}

/** Address of an example, or of their list, that keeps the widget that was asked for. */
function addressOf(name?: string, asked?: string): string {
  const path = name === undefined ? "/embed-examples" : `/embed-examples/${name}`;
  return asked === undefined ? path : `${path}?embed=${encodeURIComponent(asked)}`;
}

/** The module that a page's own bundle was made from. */
function scriptSource(file: string): string {
  const text = readFileSync(join(process.cwd(), file), "utf8");
  return `<details><summary>The source of its script</summary><pre tabindex="0">${escaped(text)}</pre></details>\n`;
}

function documentOf(title: string, content: string, nonce: string, withIcon: boolean): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${title}</title>
${withIcon ? '<link rel="icon" href="/icon.svg">\n' : ""}<style nonce="${nonce}">${STYLE}</style>
</head>
<body>
<main>
${content}
</main>
</body>
</html>
`;
}

function escaped(text: string): string {
  return text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");
}

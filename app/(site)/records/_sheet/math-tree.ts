import katex from "katex";

/** A node of a formula, as MathML has them; `text` of leaves only. */
export interface MathNode {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly MathNode[];
  readonly text: string;
}

/** Reads TeX into a tree, or null where it is none. */
export function mathTree(tex: string): MathNode | null {
  let markup: string;
  try {
    markup = katex.renderToString(tex, {
      output: "mathml",
      throwOnError: true,
      strict: "ignore",
      trust: false,
    });
  } catch {
    return null;
  }
  const root = readMarkup(markup);
  return find(root, "semantics")?.children[0] ?? null;
}

interface Open {
  readonly name: string;
  readonly attributes: Record<string, string>;
  readonly children: MathNode[];
  text: string;
}

/** Reads the well-formed markup that KaTeX writes. */
function readMarkup(markup: string): MathNode {
  const root: Open = { name: "", attributes: {}, children: [], text: "" };
  const path: Open[] = [root];
  for (const [, closing, name, attributes, empty, text] of markup.matchAll(
    /<(\/?)([a-z]+)((?: [a-zA-Z:-]+="[^"]*")*)(\/?)>|([^<]+)/g,
  )) {
    const here = path[path.length - 1];
    if (text !== undefined) here.text += plain(text);
    else if (closing) path.pop();
    else {
      const node: Open = { name, attributes: readAttributes(attributes), children: [], text: "" };
      here.children.push(node);
      if (!empty) path.push(node);
    }
  }
  return root;
}

function readAttributes(text: string): Record<string, string> {
  return Object.fromEntries(
    [...text.matchAll(/ ([a-zA-Z:-]+)="([^"]*)"/g)].map(([, name, value]) => [name, plain(value)]),
  );
}

const ENTITIES: Readonly<Record<string, string>> = { amp: "&", lt: "<", gt: ">", quot: '"', "#x27": "'" };

function plain(text: string): string {
  return text.replace(/&(amp|lt|gt|quot|#x27);/g, (_, name: string) => ENTITIES[name]);
}

function find(node: MathNode, name: string): MathNode | undefined {
  if (node.name === name) return node;
  for (const child of node.children) {
    const found = find(child, name);
    if (found) return found;
  }
  return undefined;
}

/** The call of a page as code to copy. Each runs as it stands once RHOFORM_KEY holds a key. */
export interface Snippet {
  readonly id: string;
  readonly label: string;
  readonly code: string;
}

/** What tells the snippets of one operation from those of another. */
interface SnippetParts {
  /** Path below `/api/v1`. */
  readonly path: string;
  readonly body: object;
  /** Headers beside key and media type. */
  readonly headers?: readonly (readonly [string, string])[];
  /** Lines that use `answer`, after it was received and found good. */
  readonly typescript: readonly string[];
  readonly python: readonly string[];
  /** Longest wait of the Python call, s. */
  readonly timeout?: number;
}

export function resistanceSnippets(origin: string, request: object): readonly Snippet[] {
  return snippets(origin, {
    path: "/resistance",
    body: request,
    typescript: ["console.log(answer.resistance.text, answer.resistance.lower, answer.resistance.upper);"],
    python: [
      'print(answer["resistance"]["text"], answer["resistance"]["lower"], answer["resistance"]["upper"])',
    ],
  });
}

export function sizingSnippets(origin: string, request: object): readonly Snippet[] {
  return snippets(origin, {
    path: "/sizing",
    body: request,
    typescript: [
      "for (const { dimension, resistance } of answer.solutions) console.log(dimension.text, resistance.text);",
    ],
    python: [
      'for solution in answer["solutions"]:',
      '    print(solution["dimension"]["text"], solution["resistance"]["text"])',
    ],
  });
}

/** A network: its resistance, and what each element loses. */
export function networkSnippets(origin: string, request: object): readonly Snippet[] {
  return snippets(origin, {
    path: "/networks",
    body: request,
    typescript: [
      "console.log(answer.resistance.text, answer.resistance.lower, answer.resistance.upper);",
      "for (const { name, current, share } of answer.elements) console.log(name, current, share);",
    ],
    python: [
      'print(answer["resistance"]["text"], answer["resistance"]["lower"], answer["resistance"]["upper"])',
      'for element in answer["elements"]:',
      '    print(element["name"], element["current"], element["share"])',
    ],
  });
}

/** A field solution: the call waits for its end as long as the API lets it. */
export function fieldSnippets(origin: string, request: object, terminals: number): readonly Snippet[] {
  const several = terminals > 2;
  return snippets(origin, {
    path: "/fields",
    body: request,
    headers: [["Prefer", "wait=30"]],
    timeout: 60,
    typescript: [
      "// Still on its way after 30 s: ask again at the path in Location.",
      'if (!answer.result) throw new Error(`${answer.status}: ${response.headers.get("Location")}`);',
      several
        ? "for (const { between, floating } of answer.result.pairs) console.log(...between, floating.text);"
        : "const { resistance } = answer.result;",
      ...(several ? [] : ["console.log(resistance.text, resistance.lower, resistance.upper);"]),
    ],
    python: [
      "# Still on its way after 30 s: ask again at the path in Location.",
      'if not answer["result"]:',
      "    raise SystemExit(f\"{answer['status']}: {response.headers['Location']}\")",
      ...(several
        ? ['for pair in answer["result"]["pairs"]:', '    print(*pair["between"], pair["floating"]["text"])']
        : [
            'resistance = answer["result"]["resistance"]',
            'print(resistance["text"], resistance["lower"], resistance["upper"])',
          ]),
    ],
  });
}

function snippets(origin: string, parts: SnippetParts): readonly Snippet[] {
  const { path, headers = [], typescript, python, timeout = 30 } = parts;
  const url = `${origin}/api/v1${path}`;
  const body = jsonText(parts.body);
  return [
    {
      id: "curl",
      label: "curl",
      code: [
        `curl -s ${url} \\`,
        `  -H "Authorization: Bearer $RHOFORM_KEY" \\`,
        `  -H "Content-Type: application/json" \\`,
        ...headers.map(([name, value]) => `  -H "${name}: ${value}" \\`),
        `  -d '${body.replaceAll("'", "'\\''")}'`,
      ].join("\n"),
    },
    {
      id: "typescript",
      label: "TypeScript",
      code: [
        `const response = await fetch("${url}", {`,
        `  method: "POST",`,
        `  headers: {`,
        "    Authorization: `Bearer ${process.env.RHOFORM_KEY}`,",
        `    "Content-Type": "application/json",`,
        ...headers.map(([name, value]) => `    ${name}: "${value}",`),
        `  },`,
        `  body: JSON.stringify(${indent(body, 2)}),`,
        `});`,
        `const answer = await response.json();`,
        `if (!response.ok) throw new Error(answer.detail);`,
        ...typescript,
      ].join("\n"),
    },
    {
      id: "python",
      label: "Python",
      code: [
        `import json`,
        `import os`,
        `import urllib.request`,
        ``,
        `request = urllib.request.Request(`,
        `    "${url}",`,
        `    data=json.dumps(${indent(pythonLiteral(body), 4)}).encode(),`,
        `    headers={`,
        `        "Authorization": f"Bearer {os.environ['RHOFORM_KEY']}",`,
        `        "Content-Type": "application/json",`,
        ...headers.map(([name, value]) => `        "${name}": "${value}",`),
        `    },`,
        `)`,
        `with urllib.request.urlopen(request, timeout=${timeout}) as response:`,
        `    answer = json.load(response)`,
        ...python,
      ].join("\n"),
    },
  ];
}

/** Longest line of JSON on a page, in characters. */
const LINE = 84;

/** JSON for people: what fits on a line stands on one, and the rest is indented. The whole is never one line. */
export function jsonText(value: object): string {
  return spread(value, "");
}

function spread(value: object, margin: string): string {
  const inner = `${margin}  `;
  const named = !Array.isArray(value);
  const lines = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .map(([name, member]: [string, unknown]) => {
      const label = named ? `${JSON.stringify(name)}: ` : "";
      const line = onOneLine(member);
      const fits = inner.length + label.length + line.length < LINE;
      return inner + label + (fits || !isComposite(member) ? line : spread(member, inner));
    });
  const [open, close] = named ? "{}" : "[]";
  return lines.length === 0 ? `${open}${close}` : `${open}\n${lines.join(",\n")}\n${margin}${close}`;
}

function onOneLine(value: unknown): string {
  if (!isComposite(value)) return JSON.stringify(value) ?? "null";
  if (Array.isArray(value)) return `[${value.map(onOneLine).join(", ")}]`;
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .map(([name, member]: [string, unknown]) => `${JSON.stringify(name)}: ${onOneLine(member)}`);
  return members.length === 0 ? "{}" : `{ ${members.join(", ")} }`;
}

function isComposite(value: unknown): value is object {
  return typeof value === "object" && value !== null;
}

/** JSON's flags as Python spells them; texts are left alone. */
export function pythonLiteral(json: string): string {
  return json.replace(/"(?:[^"\\]|\\.)*"|\b(?:true|false)\b/g, (token) =>
    token === "true" ? "True" : token === "false" ? "False" : token,
  );
}

export function indent(text: string, spaces: number): string {
  return text.replaceAll("\n", `\n${" ".repeat(spaces)}`);
}

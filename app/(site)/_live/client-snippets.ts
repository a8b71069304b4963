import { jsonText, pythonLiteral, indent, type Snippet } from "./snippets";

/** One call of the API, told once for every language. */
export interface ClientCall {
  /** `computeResistance`; Python spells it `compute_resistance`. */
  readonly operation: string;
  readonly method: "GET" | "POST" | "DELETE" | "PATCH";
  /** Below `/api/v1`, path parameters in braces. */
  readonly path: string;
  readonly pathValues?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly body?: object;
  /** Seconds that the service may wait for a field solution. */
  readonly wait?: number;
  /** Whether it needs a key; true where left out. */
  readonly keyed?: boolean;
  /** Lines that use `answer`. */
  readonly typescript: readonly string[];
  readonly python: readonly string[];
}

/** The call as curl, for the TypeScript client and for the Python client; each runs as it stands. */
export function clientSnippets(origin: string, call: ClientCall): readonly Snippet[] {
  return [curlSnippet(origin, call), typescriptSnippet(origin, call), pythonSnippet(origin, call)];
}

/** One resistance through the clients, for pages that show the plain calls beside them. */
export function resistanceClientSnippets(origin: string, request: object): readonly Snippet[] {
  const call: ClientCall = {
    operation: "computeResistance",
    method: "POST",
    path: "/resistance",
    body: request,
    typescript: ["console.log(answer.resistance.text, answer.resistance.lower, answer.resistance.upper);"],
    python: ["print(answer.resistance.text, answer.resistance.lower, answer.resistance.upper)"],
  };
  return clientSnippets(origin, call).filter(({ id }) => id !== "curl");
}

function curlSnippet(origin: string, call: ClientCall): Snippet {
  const { method, body, query, wait, keyed = true } = call;
  const path = call.path.replace(/\{(\w+)\}/g, (_whole, name: string) => call.pathValues?.[name] ?? name);
  const search = query ? `?${new URLSearchParams(query).toString()}` : "";
  const address = `${origin}/api/v1${path}${search}`;
  const lines = [
    `curl -s ${method === "GET" || method === "POST" ? "" : `-X ${method} `}${search ? `"${address}"` : address}`,
    ...(keyed ? ['-H "Authorization: Bearer $RHOFORM_KEY"'] : []),
    ...(wait === undefined ? [] : [`-H "Prefer: wait=${wait}"`]),
    ...(body === undefined
      ? method === "POST"
        ? ["-X POST"]
        : []
      : ['-H "Content-Type: application/json"', `-d '${jsonText(body).replaceAll("'", "'\\''")}'`]),
  ];
  return { id: "curl", label: "curl", code: lines.join(" \\\n  ") };
}

function typescriptSnippet(origin: string, call: ClientCall): Snippet {
  const { operation, pathValues, query, body, wait, keyed = true } = call;
  const members = [
    "client",
    ...(pathValues ? [`path: ${inline(pathValues)}`] : []),
    ...(query ? [`query: ${inline(query)}`] : []),
    ...(wait === undefined ? [] : [`headers: { Prefer: "wait=${wait}" }`]),
    ...(body === undefined ? [] : [`body: ${indent(unquoted(jsonText(body)), 2)}`]),
  ];
  const argument = body === undefined ? `{ ${members.join(", ")} }` : `{\n  ${members.join(",\n  ")},\n}`;
  return {
    id: "typescript-client",
    label: "TypeScript client",
    code: [
      `import { ${operation}, rhoform } from "@rhoform/client";`,
      "",
      `const client = rhoform({ baseUrl: "${origin}"${keyed ? ", key: process.env.RHOFORM_KEY" : ""} });`,
      `const answer = await ${operation}(${argument});`,
      ...call.typescript,
    ].join("\n"),
  };
}

function pythonSnippet(origin: string, call: ClientCall): Snippet {
  const { operation, pathValues, query, body, wait, keyed = true } = call;
  const values = [
    ...Object.values(pathValues ?? {}).map((value) => JSON.stringify(value)),
    ...(body === undefined ? [] : [pythonLiteral(jsonText(body))]),
    ...Object.entries(query ?? {}).map(([name, value]) => `${snake(name)}=${JSON.stringify(value)}`),
    ...(wait === undefined ? [] : [`wait=${wait}`]),
  ];
  return {
    id: "python-client",
    label: "Python client",
    code: [
      ...(keyed ? ["import os"] : []),
      "import rhoform",
      "",
      `client = rhoform.Client("${origin}"${keyed ? ', key=os.environ["RHOFORM_KEY"]' : ""})`,
      `answer = client.${snake(operation)}(${values.join(", ")})`,
      ...call.python,
    ].join("\n"),
  };
}

function inline(values: Readonly<Record<string, string>>): string {
  const members = Object.entries(values).map(
    ([name, value]) => `${/^\w+$/.test(name) ? name : JSON.stringify(name)}: ${JSON.stringify(value)}`,
  );
  return `{ ${members.join(", ")} }`;
}

/** JSON as people write it in TypeScript: names without quotes. */
function unquoted(json: string): string {
  return json.replace(/"((?:[^"\\]|\\.)*)"(:)?/g, (token, text: string, colon?: string) =>
    colon !== undefined && /^[A-Za-z_]\w*$/.test(text) ? `${text}:` : token,
  );
}

function snake(name: string): string {
  return name.replace(/([a-z0-9])([A-Z])/g, "$1_$2").toLowerCase();
}

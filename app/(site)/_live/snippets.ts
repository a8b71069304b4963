/** The call of a page as code to copy. Each runs as it stands once RHOFORM_KEY holds a key. */
export interface Snippet {
  readonly id: string;
  readonly label: string;
  readonly code: string;
}

export function resistanceSnippets(origin: string, request: object): readonly Snippet[] {
  const url = `${origin}/api/v1/resistance`;
  const body = JSON.stringify(request, null, 2);
  return [
    {
      id: "curl",
      label: "curl",
      code: [
        `curl -s ${url} \\`,
        `  -H "Authorization: Bearer $RHOFORM_KEY" \\`,
        `  -H "Content-Type: application/json" \\`,
        `  -d '${body.replaceAll("'", "'\\''")}'`,
      ].join("\n"),
    },
    {
      id: "typescript",
      label: "TypeScript",
      code: `const response = await fetch("${url}", {
  method: "POST",
  headers: {
    Authorization: \`Bearer \${process.env.RHOFORM_KEY}\`,
    "Content-Type": "application/json",
  },
  body: JSON.stringify(${indent(body, 2)}),
});
const answer = await response.json();
if (!response.ok) throw new Error(answer.detail);
console.log(answer.resistance.text, answer.resistance.lower, answer.resistance.upper);`,
    },
    {
      id: "python",
      label: "Python",
      code: `import json
import os
import urllib.request

request = urllib.request.Request(
    "${url}",
    data=json.dumps(${indent(body, 4)}).encode(),
    headers={
        "Authorization": f"Bearer {os.environ['RHOFORM_KEY']}",
        "Content-Type": "application/json",
    },
)
with urllib.request.urlopen(request, timeout=30) as response:
    answer = json.load(response)
print(answer["resistance"]["text"], answer["resistance"]["lower"], answer["resistance"]["upper"])`,
    },
  ];
}

function indent(text: string, spaces: number): string {
  return text.replaceAll("\n", `\n${" ".repeat(spaces)}`);
}

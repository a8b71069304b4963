import { describe, expect, it } from "vitest";
import { jsonText } from "@/app/(site)/_live/snippets";
import { clientSnippets } from "@/app/(site)/_live/client-snippets";
import { catalogue } from "@/lib/engine";

const network = {
  elements: [
    { name: 'bar "A"', between: ["in", "joint"], resistance: "42 uohm" },
    {
      name: "braid",
      between: ["joint", "out"],
      request: {
        shape: "bar",
        dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },
        medium: { material: "copper-annealed" },
        include: [],
      },
    },
  ],
  ports: ["in", "out"],
};

describe("JSON on a page", () => {
  it("keeps on one line what fits on one", () => {
    expect(jsonText(network)).toBe(`{
  "elements": [
    { "name": "bar \\"A\\"", "between": ["in", "joint"], "resistance": "42 uohm" },
    {
      "name": "braid",
      "between": ["joint", "out"],
      "request": {
        "shape": "bar",
        "dimensions": { "length": "1.2 m", "width": "50 mm", "thickness": "10 mm" },
        "medium": { "material": "copper-annealed" },
        "include": []
      }
    }
  ],
  "ports": ["in", "out"]
}`);
  });

  it.each(catalogue.map(({ id, example }) => [id, example] as const))(
    "says the same as JSON: %s",
    (_, value) => {
      const text = jsonText(value);
      expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)));
    },
  );

  it("leaves out what has no value, and writes an empty body as such", () => {
    expect(JSON.parse(jsonText({ a: undefined, b: [{ c: undefined, d: null }], e: {} }))).toEqual({
      b: [{ d: null }],
      e: {},
    });
    expect(jsonText({})).toBe("{}");
  });
});

it("writes names without quotes in TypeScript, and leaves texts alone", () => {
  const call = {
    operation: "solveNetwork",
    method: "POST",
    path: "/networks",
    body: { ...network, record: { label: 'a, "b": c' } },
    typescript: [],
    python: [],
  } as const;
  const code = clientSnippets("http://host.example", call).find(({ id }) => id === "typescript-client")?.code;
  expect(code).toContain('dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },');
  expect(code).toContain('record: { label: "a, \\"b\\": c" }');
});

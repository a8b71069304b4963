import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { computeNetwork, InputError, libraryMaterial, type Problem } from "@/lib/engine";

const context = { material: libraryMaterial };

function complaints(request: unknown): readonly Problem[] {
  try {
    computeNetwork(request, context);
  } catch (error) {
    if (error instanceof InputError) return error.errors;
    throw error;
  }
  throw new Error("The network was accepted.");
}

const told = (request: unknown) => complaints(request).map(({ pointer, detail }) => `${pointer} ${detail}`);
const element = (name: string, from: string, to: string, resistance: unknown = 1) => ({
  name,
  between: [from, to],
  resistance,
});

describe("what is wrong with a network is told with its place", () => {
  test("names, ports, self loops, zero and negative resistances, all at once", () => {
    const request = {
      elements: [
        element("a", "in", "out"),
        element("a", "in", "in"),
        element("c", "in", "out", 0),
        element("d", "in", "out", "-1 ohm"),
        element("e", "in", "out", "5 kg"),
      ],
      ports: ["in", "outt"],
    };
    expect(told(request)).toEqual([
      '#/elements/1/name "a" is the name of element 1 already.',
      '#/elements/1/between begins and ends at "in"; an element joins two nodes.',
      '#/ports/1 "outt" is no node of an element. Did you mean "out"?',
      "#/elements/2/resistance must be greater than 0; nodes that nothing parts are one node: give them one name.",
      "#/elements/3/resistance must be greater than 0.",
      expect.stringMatching(/^#\/elements\/4\/resistance must be a resistance/),
    ]);
  });

  test("both ports at one node, ports that nothing joins, islands", () => {
    const elements = [element("a", "in", "out"), element("b", "x", "y"), element("c", "z", "y")];
    expect(told({ elements, ports: ["in", "in"] })[0]).toBe(
      '#/ports/1 is "in" like the first; a resistance is between two nodes.',
    );
    expect(told({ elements, ports: ["in", "z"] })).toEqual([
      '#/ports No chain of elements joins "in" and "z".',
    ]);
    expect(told({ elements, ports: ["in", "out"] })).toEqual([
      '#/elements/1/between belongs to an island: no element joins "x", "y", "z" to the ports.',
    ]);
  });

  test("elements with neither or both, requests with mistakes, members of a single call", () => {
    const between = ["in", "out"];
    const request = {
      shape: "bar",
      dimensions: { length: "1 kg", width: 1, thickness: 1 },
      medium: { resistivity: 1 },
    };
    const places = (elements: unknown[]) =>
      complaints({ elements, ports: between }).map(({ pointer }) => pointer);
    expect(places([{ name: "a", between }])).toEqual(["#/elements/0"]);
    expect(places([{ name: "a", between, resistance: 1, request }])).toEqual(["#/elements/0/request"]);
    expect(places([{ name: "a", between, request }])).toEqual(["#/elements/0/request/dimensions/length"]);
    expect(
      places([
        {
          name: "a",
          between,
          request: { ...request, record: { label: "x" }, include: [], operating: { current: 1 } },
        },
      ]),
    ).toEqual([
      "#/elements/0/request/record",
      "#/elements/0/request/include",
      "#/elements/0/request/operating/current",
    ]);
    expect(places([{ name: "a", between: ["in"], resistance: 1 }])).toEqual(["#/elements/0/between"]);
  });

  test("no elements, wrong types, unknown members", () => {
    expect(told({ elements: [], ports: ["a", "b"] })[0]).toContain("#/elements must not be empty.");
    expect(told(5)).toEqual(["# must be an object."]);
    expect(complaints({ elements: [element("a", "x", "y")] })[0].pointer).toBe("#/ports");
    expect(complaints({ elements: [element("a", "x", "y")], ports: ["x", "y"], port: 1 })[0].pointer).toBe(
      "#/port",
    );
  });

  test("resistances that doubles cannot hold together", () => {
    const elements = [element("a", "in", "m", 1e-200), element("b", "m", "out", 1e200)];
    expect(told({ elements, ports: ["in", "out"] })[0]).toContain("too far apart");
    const far = [element("a", "in", "m", 1e-60), element("b", "m", "out", 1e60)];
    expect(computeNetwork({ elements: far, ports: ["in", "out"] }, context).resistance.value).toBe(1e60);
  });

  test("ten thousand complaints are cut short", () => {
    const elements = Array.from({ length: 1_000 }, (_, k) => element(`e${k}`, "in", "out", "x"));
    const list = complaints({ elements, ports: ["in", "out"] });
    expect(list).toHaveLength(101);
    expect(list[100].detail).toBe("and 900 more complaints.");
  });
});

test("whatever arrives is answered or refused", () => {
  const name = fc.constantFrom("a", "b", "c", "d", "");
  const quantity = fc.oneof(
    fc.double(),
    fc.constantFrom("1 ohm", "2 kohm", "1e400", "0", ""),
    fc.constant(null),
  );
  const entry = fc.oneof(
    {
      weight: 9,
      arbitrary: fc.record({ name: fc.string(), between: fc.tuple(name, name), resistance: quantity }),
    },
    fc.anything(),
  );
  const request = fc.record({ elements: fc.array(entry, { maxLength: 8 }), ports: fc.tuple(name, name) });
  fc.assert(
    fc.property(request, (body) => {
      try {
        const { lower, value, upper } = computeNetwork(body, context).resistance;
        expect(lower < upper && lower <= value && value <= upper).toBe(true);
      } catch (error) {
        if (!(error instanceof InputError)) throw error;
        expect(error.errors.length).toBeGreaterThan(0);
      }
    }),
    { seed: 8, numRuns: 2_000 },
  );
});

import { describe, expect, test } from "vitest";
import { networkBody } from "@/app/(site)/network/_model/body";
import { layOut } from "@/app/(site)/network/_model/layout";
import { addressOf, fromText, newElement, START, toText } from "@/app/(site)/network/_model/network";
import { firstSolution } from "@/app/(site)/network/_server/first-solution";
import { shapeRequest } from "@/app/(site)/network/_server/shape-request";

describe("a network in an address", () => {
  test("comes back as it was; a foreign text does not", () => {
    const back = fromText(toText(START));
    expect(back && toText(back)).toBe(toText(START));
    for (const text of [
      "",
      "{}",
      "5",
      '{"elements":[],"ports":["a"],"drive":{"kind":"none","text":""},"temperature":""}',
    ]) {
      expect(fromText(text)).toBeNull();
    }
  });

  test("a pasted link of a calculation is told from a resistance", () => {
    expect(addressOf("https://rhoform.example/calculate/bar?length=1m#x")).toBe("bar?length=1m");
    expect(addressOf("/calculate/clad-wire")).toBe("clad-wire");
    for (const text of ["42 uohm", "/calculate", "/calculate/table?shape=bar", "/docs/bar"]) {
      expect(addressOf(text)).toBeNull();
    }
  });

  test("a calculation's drive and record are left out of its element", () => {
    const found = shapeRequest(
      "bar",
      new URLSearchParams("length=1m&width=2mm&thickness=3mm&resistivity=1&current=5A&max=1ohm"),
    );
    expect(found?.request).toEqual({
      shape: "bar",
      dimensions: { length: "1 m", width: "2 mm", thickness: "3 mm" },
      medium: { resistivity: "1" },
    });
    expect(shapeRequest("nothing", new URLSearchParams())).toBeNull();
  });

  test("the example is solved by the engine before the first call", () => {
    const { result, text } = firstSolution();
    expect(result.elements).toHaveLength(START.elements.length);
    expect(text).toContain('"operating":{"temperature":"65 degC","current":"630 A"}');
    expect(networkBody(START, new Map())).toBeNull();
  });
});

describe("the drawing", () => {
  const element = (name: string, from: string, to: string) =>
    newElement({ name, from, to, value: { kind: "resistance", text: "1" } });

  test("runs from port to port, nodes apart, parallel elements side by side", () => {
    const { nodes, elements, width, height } = layOut(START);
    const place = (name: string) => nodes.find((node) => node.name === name);
    expect(place("in")?.x).toBeLessThan(place("joint")?.x ?? 0);
    expect(place("joint")?.x).toBeLessThan(place("lug")?.x ?? 0);
    expect(place("lug")?.x).toBeLessThan(place("out")?.x ?? 0);
    const [first, second] = elements.filter(({ from, to }) => from.name === "in" && to.name === "joint");
    expect(Math.sign(first.bend)).toBe(-Math.sign(second.bend));
    for (const { x, y } of nodes) expect(x > 0 && x < width && y > 0 && y < height).toBe(true);
  });

  test("holds whatever is typed: islands, loops, ports that are no nodes, nothing at all", () => {
    const odd = {
      ...START,
      elements: [
        element("a", "x", "y"),
        element("b", "z", "z"),
        element("c", "", "q"),
        element("d", "in", "w"),
      ],
    };
    const spots = layOut(odd).nodes.map(({ x, y }) => `${x} ${y}`);
    expect(new Set(spots).size).toBe(spots.length);
    expect(spots.join(" ")).not.toContain("NaN");
    expect(layOut({ ...odd, elements: [] }).nodes).toHaveLength(2);
  });
});

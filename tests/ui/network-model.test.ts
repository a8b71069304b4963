import { describe, expect, test } from "vitest";
import { networkBody } from "@/app/(site)/network/_model/body";
import { elementAt, sortComplaints } from "@/app/(site)/network/_model/complaints";
import { layOut } from "@/app/(site)/network/_model/layout";
import {
  addressOf,
  fromText,
  newElement,
  readValue,
  START,
  toText,
} from "@/app/(site)/network/_model/network";
import { readBodyText } from "@/app/(site)/network/_model/read-body";
import { bringsTolerance, changedTolerance } from "@/app/(site)/network/_model/tolerance";
import { firstSolution } from "@/app/(site)/network/_server/first-solution";
import { shapeRequest } from "@/app/(site)/network/_server/shape-request";
import { computeNetwork, libraryMaterial } from "@/lib/engine";

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

describe("a network as JSON", () => {
  test("comes back from the body of its own call", () => {
    const request = { shape: "bar", dimensions: { length: "1 m" } };
    const body = {
      elements: [
        { name: "a", between: ["in", "n"], resistance: "42 uohm" },
        { name: "b", between: ["n", "out"], request },
      ],
      ports: ["in", "out"],
      operating: { temperature: "65 degC", current: "630 A" },
      requirement: { min: "1 uohm", max: "50 uohm" },
    };
    const reading = readBodyText(JSON.stringify(body));
    if (!reading.ok) throw new Error(JSON.stringify(reading.complaints));
    expect(networkBody(reading.network, new Map())).toEqual(body);
    const kept = fromText(toText(reading.network));
    expect(kept && networkBody(kept, new Map())).toEqual(body);
  });

  test.each([
    ["{", "#", "is no JSON"],
    ["5", "#", "must be an object"],
    ['{"elements":[],"ports":["a","b"],"requirement":5}', "#/requirement", "must be an object"],
    [
      '{"elements":[],"ports":["a","b"],"requirement":{"max":true}}',
      "#/requirement/max",
      "a number or a text",
    ],
    ['{"elements":[],"ports":["a","b"],"requirement":{"most":1}}', "#/requirement/most", "has no field"],
    ['{"elements":[],"ports":["in"]}', "#/ports", "must name two nodes"],
    ['{"elements":[],"ports":["a","b"],"include":["checks"]}', "#/include", "has no field on this page"],
    [
      '{"elements":[{"name":"a","between":["a","b"]}],"ports":["a","b"]}',
      "#/elements/0",
      "exactly one of resistance and request",
    ],
    [
      '{"elements":[{"name":"a","between":["a","b"],"resistance":true}],"ports":["a","b"]}',
      "#/elements/0/resistance",
      "a number or a text with a unit",
    ],
  ])("%s has its complaint at %s", (text, pointer, detail) => {
    const reading = readBodyText(text);
    const found = reading.ok ? [] : reading.complaints;
    expect(found.find((complaint) => complaint.pointer === pointer)?.detail).toContain(detail);
  });
});

describe("tolerances of a network", () => {
  const body = {
    elements: [
      { name: "a", between: ["in", "n"], resistance: { value: "42 uohm", tolerance: "5 %" } },
      {
        name: "b",
        between: ["n", "m"],
        resistance: { value: "6 uohm", plus: "2 uohm", minus: "1 uohm", distribution: "triangular" },
      },
      { name: "c", between: ["m", "out"], resistance: "1 uohm" },
    ],
    ports: ["in", "out"],
    uncertainty: { method: "worst-case" },
  };
  const read = (asked: object) => {
    const reading = readBodyText(JSON.stringify(asked));
    if (!reading.ok) throw new Error(JSON.stringify(reading.complaints));
    return reading.network;
  };

  test("come from JSON, stand in the address and go into the body", () => {
    const network = read(body);
    expect(networkBody(network, new Map())).toEqual(body);
    const kept = fromText(toText(network));
    expect(kept && networkBody(kept, new Map())).toEqual(body);
    // An address without tolerances is as it always was.
    expect(toText(START)).not.toContain("uncertainty");
    expect(toText(START)).not.toContain("requirement");
  });

  test("a bare one is in ohms in the body and in the value's unit on the page", () => {
    const resistance = { value: "42 uohm", tolerance: 2e-6 };
    const network = read({ ...body, elements: [{ ...body.elements[0], resistance }] });
    const ports = ["in", "n"];
    const before = { ...body, elements: [{ ...body.elements[0], resistance }], ports };
    const after = { ...networkBody(network, new Map()), ports };
    const [asked, given] = [before, after].map((one) => computeNetwork(one, { material: libraryMaterial }));
    expect(given.uncertainty?.low).toBe(asked.uncertainty?.low);

    const typed = {
      ...START,
      elements: [{ ...network.elements[0], value: readValue("42 µΩ", { plus: "1,5" }) }],
    };
    expect(networkBody(typed, new Map())?.elements).toMatchObject([
      { resistance: { value: "42 µΩ", plus: "1.5 µΩ" } },
    ]);
  });

  test("change as the fields of a calculation do, and stay with a resistance that is typed anew", () => {
    const one = changedTolerance("element-3", undefined, {
      "element-3.tolerance": "1 %",
      uncertainty: "propagation",
    });
    expect(one).toEqual({ tolerance: "1 %" });
    const apart = { "element-3.tolerance": undefined, "element-3.plus": "1 %", "element-3.minus": "" };
    expect(changedTolerance("element-3", one, apart)).toEqual({ plus: "1 %", minus: "" });
    expect(changedTolerance("element-3", one, { "element-3.tolerance": undefined })).toBeUndefined();
    expect(readValue("7 ohm", one)).toEqual({ kind: "resistance", text: "7 ohm", tolerance: one });
    expect(readValue("/calculate/bar", one)).toEqual({ kind: "shape", address: "bar" });
  });

  test("of a calculation come with its link", () => {
    const link = "/calculate/bar?length=1m&width=2mm&width.tolerance=1%25&thickness=3mm&resistivity=1";
    expect(bringsTolerance(readValue(link))).toBe(true);
    expect(bringsTolerance(readValue("/calculate/bar?length=1m"))).toBe(false);
    const found = shapeRequest("bar", new URLSearchParams(link.split("?")[1]));
    expect(found?.request.dimensions).toMatchObject({ width: { value: "2 mm", tolerance: "1 %" } });
    expect(found?.request.uncertainty).toBeUndefined();
  });

  test.each([
    [{ value: "1", tolerance: true }, "#/elements/0/resistance/tolerance", "a number or a text"],
    [{ value: "1", tolerance: 1, plus: 1 }, "#/elements/0/resistance", "either tolerance, or plus and minus"],
    [{ value: null, plus: 1 }, "#/elements/0/resistance/value", "a number or a text"],
    [{ value: 1, plus: 1, distribution: "gauss" }, "#/elements/0/resistance/distribution", "uniform, normal"],
    [{ value: 1, plus: 1, sigma: 1 }, "#/elements/0/resistance/sigma", "has no field"],
  ])("%j is not taken over", (resistance, pointer, detail) => {
    const reading = readBodyText(
      JSON.stringify({ ...body, elements: [{ ...body.elements[0], resistance }] }),
    );
    const found = reading.ok ? [] : reading.complaints;
    expect(found.find((complaint) => complaint.pointer === pointer)?.detail).toContain(detail);
  });

  test.each([
    [{ method: "monte-carlo" }, "#/uncertainty/method", '"propagation" or "worst-case"'],
    [{ method: "propagation", trials: 5 }, "#/uncertainty/trials", "has no field"],
    ["propagation", "#/uncertainty", "an object with a method"],
  ])("the method %j is not taken over", (uncertainty, pointer, detail) => {
    const reading = readBodyText(JSON.stringify({ ...body, uncertainty }));
    const found = reading.ok ? [] : reading.complaints;
    expect(found.find((complaint) => complaint.pointer === pointer)?.detail).toContain(detail);
  });

  test("complaints stand at the row, at the choice, or are told as a whole", () => {
    const errors = [
      { pointer: "#/elements/1/resistance/tolerance", detail: "must be smaller." },
      { pointer: "#/elements/2/resistance/distribution", detail: "must be uniform." },
      { pointer: "#/elements/2/resistance/value", detail: "must be a resistance." },
      { pointer: "#/elements/0/request/dimensions/width", detail: "must be a length." },
      { pointer: "#/uncertainty/method", detail: "must be known." },
      { pointer: "#/ports/0", detail: "is no node." },
      { pointer: "#/operating/current", detail: "must be a current." },
      { pointer: "#/requirement/min", detail: "must be a resistance." },
      { pointer: "#/requirement", detail: "must have min below max." },
    ];
    const sorted = sortComplaints({ title: "Wrong", errors }, [11, 12, 13]);
    expect(sorted.complaints.get(12)).toEqual({ tolerance: { tolerance: "Must be smaller." } });
    expect(sorted.complaints.get(13)).toEqual({
      tolerance: { tolerance: "Must be uniform." },
      value: "Must be a resistance.",
    });
    expect(sorted.complaints.get(11)).toEqual({ value: "width must be a length." });
    expect(sorted.uncertainty).toBe("Must be known.");
    expect(sorted.ports).toEqual(["is no node."]);
    expect([...sorted.requirement]).toEqual([
      ["min", "Must be a resistance."],
      ["max", "Must have min below max."],
    ]);
    expect(sorted.rest?.errors).toEqual([errors[6]]);
  });

  test("an element's place is told by its name", () => {
    const names = ["bar A", "braid"];
    expect(elementAt("#/elements/1/resistance/tolerance", names)).toBe("Element braid");
    expect(elementAt("#/elements/7/name", names)).toBeUndefined();
    expect(elementAt("#/ports/0", names)).toBeUndefined();
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

  test("runs on from a node that is given as both ports", () => {
    const { nodes } = layOut({ ...START, ports: ["in", "in"] });
    const x = ["in", "joint", "lug", "out"].map((name) => nodes.find((node) => node.name === name)?.x ?? NaN);
    expect(x).toEqual([...x].sort((a, b) => a - b));
    expect(new Set(x).size).toBe(4);
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

  test("an element keeps off nodes that it does not join", () => {
    const network = {
      ...START,
      elements: [...START.elements, element("tie", "in", "lug"), element("open", "lug", "spare")],
    };
    const { nodes, elements } = layOut(network);
    for (const { from, to, bend } of elements) {
      const [dx, dy] = [to.x - from.x, to.y - from.y];
      const length = Math.hypot(dx, dy);
      const [cx, cy] = [
        (from.x + to.x) / 2 - (2 * bend * dy) / length,
        (from.y + to.y) / 2 + (2 * bend * dx) / length,
      ];
      for (const node of nodes) {
        if (node.name === from.name || node.name === to.name) continue;
        for (let t = 0; t <= 1; t += 0.02) {
          const x = (1 - t) ** 2 * from.x + 2 * t * (1 - t) * cx + t * t * to.x;
          const y = (1 - t) ** 2 * from.y + 2 * t * (1 - t) * cy + t * t * to.y;
          expect(Math.hypot(x - node.x, y - node.y)).toBeGreaterThan(38);
        }
      }
    }
  });

  test("islands stand apart from the ports' part and from each other", () => {
    const island = (name: string) => [
      element(`${name}1`, `${name}p`, `${name}q`),
      element(`${name}2`, `${name}q`, `${name}r`),
      element(`${name}3`, `${name}p`, `${name}r`),
    ];
    const network = { ...START, elements: [...START.elements, ...island("a"), ...island("b")] };
    const { nodes, width, height } = layOut(network);
    const box = (prefix: RegExp) => {
      const own = nodes.filter(({ name }) => prefix.test(name));
      const [xs, ys] = [own.map(({ x }) => x), own.map(({ y }) => y)];
      return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), foot: Math.max(...ys) };
    };
    const boxes = [box(/^(in|joint|lug|out)$/), box(/^a[pqr]$/), box(/^b[pqr]$/)];
    for (const [k, one] of boxes.entries()) {
      for (const other of boxes.slice(k + 1)) {
        const apart =
          one.right < other.left || other.right < one.left || one.foot < other.top || other.foot < one.top;
        expect(apart).toBe(true);
      }
      expect(one.right < width && one.foot < height).toBe(true);
    }
    // Two ports that nothing joins are two parts.
    const parted = layOut({ ...START, elements: [element("x", "in", "a"), element("y", "out", "b")] });
    expect(new Set(parted.nodes.map(({ x, y }) => `${x} ${y}`)).size).toBe(4);
  });
});

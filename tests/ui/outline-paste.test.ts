import { describe, expect, it } from "vitest";
import { edgeOf } from "@/app/(site)/outline/_model/edges";
import { bowEdge, placeVertices, QUARTER_BOW } from "@/app/(site)/outline/_model/edit";
import { isTable, readPastedPoints } from "@/app/(site)/outline/_model/pasted-points";
import { fieldBody } from "@/app/(site)/outline/_model/field-body";
import { startSketch } from "@/app/(site)/outline/_model/start-outlines";
import { libraryMaterial, prepareField } from "@/lib/engine";

const bend = startSketch("bend");
const last = bend.rings[0].length - 1;

describe("a pasted text", () => {
  it.each(["1\t2", "1 2\n3 4", "x;y\n1;2", "10,5\n20,5"])("%j is a table", (text) => {
    expect(isTable(text)).toBe(true);
  });
  it.each(["12.5", "12,5 mm\n", " 1/2 in ", "1 234.5"])("%j is one number", (text) => {
    expect(isTable(text)).toBe(false);
  });
  it("is read with its units, converted to the drawing's", async () => {
    const inches = await readPastedPoints("x/in\ty/in\r\n0,5\t1\r\n1\t0\r\n", "mm");
    expect(inches).toEqual({
      ok: true,
      points: [
        [12.7, 25.4],
        [25.4, 0],
      ],
    });
  });
  it.each([
    ["1 2\n3", "Line 2 has one column; a point needs two."],
    ["1 2\nx y", 'Line 2, column 1: "x" is no number.'],
    ["1;2\n3;4 kg", 'Point 2: "4 kg" is no length.'],
  ])("%j is refused whole", async (text, problem) => {
    expect(await readPastedPoints(text, "mm")).toEqual({ ok: false, problem });
  });
});

describe("vertices with new places", () => {
  it("take them from the given one on, others stay", () => {
    const next = placeVertices(bend, 0, 1, [
      [41, 1],
      [41, 11],
    ]);
    expect(next.rings[0].slice(1, 3)).toEqual([
      { x: 41, y: 1 },
      { x: 41, y: 11 },
    ]);
    expect(next.rings[0].filter((_, i) => i < 1 || i > 2)).toEqual(
      bend.rings[0].filter((_, i) => i < 1 || i > 2),
    );
    expect(next.terminals).toEqual(bend.terminals);
  });

  it("are added behind the last, and the closing edge keeps its terminal", () => {
    const marked = {
      ...bend,
      terminals: [
        { ...bend.terminals[0], parts: [{ ring: 0, edge: last, from: 0, to: 1 }] },
        bend.terminals[1],
      ],
    };
    const { x, y } = bend.rings[0][last];
    const next = placeVertices(marked, 0, last, [
      [x, y],
      [x - 5, y + 1],
      [x - 9, y + 1],
    ]);
    expect(next.rings[0]).toHaveLength(last + 3);
    expect(next.terminals[0].parts).toEqual([{ ring: 0, edge: last + 2, from: 0, to: 1 }]);
    expect(next.terminals[1]).toEqual(bend.terminals[1]);
  });

  it("keep the sweep of their arcs, and give the engine an outline it takes", () => {
    const arced = bowEdge(bend, 0, 2, QUARTER_BOW);
    const k = arced.rings[0].findIndex(({ arc }) => arc);
    expect(k).toBeGreaterThan(-1);
    const ring = arced.rings[0];
    const n = ring.length;
    const sweep = (i: number, of = ring) => edgeOf(of, (i + n - 1) % n).arc?.sweep;
    const next = placeVertices(
      arced,
      0,
      0,
      ring.map(({ x, y }) => [2 * x + 1, 2 * y - 3] as const),
    );
    expect(sweep(k, next.rings[0])).toBeCloseTo(sweep(k) ?? NaN, 12);
    prepareField(fieldBody(next), { material: libraryMaterial, outline: () => undefined });
  });
});

import { describe, expect, it } from "vitest";
import { accept, BEND, BEND_TERMINALS, ENDS, meshOf, rectangle } from "./support/outlines";

type Ring = Array<[number, number]>;

describe("repairs", () => {
  it("a sound outline has none", () => {
    expect(accept(BEND, BEND_TERMINALS).repairs).toEqual([]);
  });

  it("a closing vertex", () => {
    const outline = accept({ ...BEND, outer: [...BEND.outer, BEND.outer[0]] }, BEND_TERMINALS);
    expect(outline.repairs).toEqual([
      "The outer ring repeats its first vertex at the end; the repetition was left out.",
    ]);
  });

  it("repeated vertices, of a hole as well", () => {
    const outer: Ring = [
      [0, 0],
      [10, 0],
      [10, 0],
      [10, 5],
      [0, 5],
    ];
    const hole: Ring = [
      [2, 2],
      [3, 2],
      [3, 2],
      [3, 2],
      [3, 3],
    ];
    const outline = accept({ outer, holes: [hole] }, [
      {
        name: "a",
        segments: [
          [
            [0, 0],
            [0, 5],
          ],
        ],
      },
      {
        name: "b",
        segments: [
          [
            [10, 0],
            [10, 5],
          ],
        ],
      },
    ]);
    expect(outline.repairs).toEqual([
      "The outer ring: vertex 2 repeated the one before and was left out.",
      "The hole 0: vertices 2, 3 repeated the one before and were left out.",
    ]);
    expect(outline.rings[0].source).toEqual(Int32Array.of(0, 1, 3, 4));
  });

  it("vertices on a straight line, also across the first vertex", () => {
    const outer: Ring = [
      [5, 0],
      [10, 0],
      [10, 3],
      [10, 5],
      [0, 5],
      [0, 0],
    ];
    const outline = accept({ outer }, [
      {
        name: "a",
        segments: [
          [
            [0, 0],
            [0, 5],
          ],
        ],
      },
      {
        name: "b",
        segments: [
          [
            [10, 0],
            [10, 5],
          ],
        ],
      },
    ]);
    expect(outline.repairs).toEqual([
      "The outer ring: vertices 0, 2 lie on straight lines between their neighbours and were left out.",
    ]);
    expect(meshOf(outline).mesh.triangles.length / 3).toBeLessThan(8);
  });

  it("600 collinear vertices, slanted and far from the origin", () => {
    for (const offset of [0, 1e6]) {
      const line: Ring = Array.from({ length: 600 }, (_, i) => [
        offset + (i * 0.7) / 599,
        offset + (i * 0.3) / 599,
      ]);
      const outline = accept(
        { outer: [...line, [offset, offset + 1]] },
        [
          { name: "a", parts: [{ ring: 0, edge: 599 }] },
          { name: "b", parts: [{ ring: 0, edge: 600 }].map((p) => ({ ...p, to: 0.5 })) },
        ].map((t, i) => (i === 0 ? { ...t, parts: [{ ring: 0, edge: 599, to: 0.4 }] } : t)),
      );
      expect(outline.rings[0].source.length).toBeLessThanOrEqual(3);
      expect(outline.repairs).toHaveLength(1);
      expect(outline.repairs[0]).toContain("598 vertices (1, 2, 3, 4, 5, …)");
    }
  });

  it("does not mistake a fine circle for a line, nor let small bends add up", () => {
    const n = 40_000;
    const circle: Ring = Array.from({ length: n }, (_, i) => {
      const angle = (2 * Math.PI * i) / n;
      return [Math.cos(angle), Math.sin(angle)];
    });
    const outline = accept({ outer: circle }, [
      { name: "a", parts: [{ ring: 0, edge: 0 }] },
      { name: "b", parts: [{ ring: 0, edge: n / 2 }] },
    ]);
    expect(outline.repairs).toEqual([]);
    // A shallow parabola: each vertex is within rounding of its neighbours' chord, the whole is not straight.
    const shallow: Ring = Array.from({ length: 2000 }, (_, i) => [
      i / 1999,
      1e-11 * (i / 1999) * (i / 1999 - 1),
    ]);
    const kept = accept({ outer: [...shallow, [0.5, 1]] }, [
      { name: "a", parts: [{ ring: 0, edge: 1999, to: 0.4 }] },
      { name: "b", parts: [{ ring: 0, edge: 2000, from: 0.6 }] },
    ]);
    expect(kept.rings[0].source.length).toBeGreaterThan(20);
  });

  it("the frame is a power of two around the middle", () => {
    for (const [x, y, size] of [
      [0, 0, 40],
      [1e6, -3e5, 1],
      [-1e-9, 0, 3e-9],
      [5, 5, 1e9],
    ]) {
      const { frame, rings } = accept({ outer: rectangle(x, y, x + size, y + size / 3) }, ENDS);
      expect(Number.isInteger(Math.log2(frame.scale))).toBe(true);
      expect(frame.extent).toBeGreaterThan(0.5);
      expect(frame.extent).toBeLessThanOrEqual(1);
      expect(Math.max(...rings[0].xy.map(Math.abs))).toBeLessThan(0.6);
    }
  });
});

import { describe, expect, it } from "vitest";
import { outlineSchema } from "@/lib/engine/field/outline/schema";
import { BEND, BEND_TERMINALS, check, ENDS, gon, rectangle, refusals } from "./support/outlines";

const plate = { unit: "mm" as const, outer: rectangle(0, 0, 20, 10) };

describe("rings that are refused", () => {
  it("crossing edges, with the place", () => {
    const bowtie = {
      outer: [
        [0, 0],
        [4, 4],
        [4, 0],
        [0, 4],
      ] as Array<[number, number]>,
    };
    const found = refusals(bowtie, [
      { name: "a", parts: [{ ring: 0, edge: 1 }] },
      { name: "b", parts: [{ ring: 0, edge: 3 }] },
    ]);
    expect(found).toEqual([
      "#/outline/outer/2: Edges 0 and 2 of the outer ring cross at (2, 2). " +
        "A ring may neither cross nor touch itself; its edges meet only at the vertex they share.",
    ]);
  });

  it("crossings are told in the coordinates submitted, far from the origin as well", () => {
    const outer = [
      [0, 0],
      [4, 4],
      [4, 0],
      [0, 4],
    ].map(([x, y]): [number, number] => [x + 1e6, y - 3e5]);
    const found = refusals({ outer }, ENDS);
    expect(found[0]).toContain("cross at (1000002, -299998)");
  });

  it("every crossing, also of edges that both cross a third one", () => {
    // A five-pointed star in one stroke: each of its edges crosses two others.
    const outer = [0, 2, 4, 1, 3].map((k): [number, number] => {
      const angle = (2 * Math.PI * k) / 5;
      return [Math.cos(angle), Math.sin(angle)];
    });
    const result = check({ outer }, ENDS);
    const found = result.ok ? [] : result.errors;
    const pairs = found.map(({ detail }) =>
      /^Edges (\d) and (\d) .* cross at/.exec(detail)?.slice(1).join(" "),
    );
    expect(pairs.sort()).toEqual(["0 2", "0 3", "1 3", "1 4", "2 4"]);
    // The inner pentagon of the star: its corners lie (3 − √5)/2 from the middle.
    for (const { at } of found) expect(Math.hypot(...(at ?? []))).toBeCloseTo((3 - Math.sqrt(5)) / 2, 9);
    expect(new Set(found.map(({ at }) => String(at))).size).toBe(5);
  });

  it("one edge through many others: each crossing with its place, twenty at most", () => {
    const comb = (teeth: number) => {
      const outer = Array.from({ length: teeth }, (_, i): [number, number] => [i, i % 2 ? 1 : -1]);
      outer.push([teeth, -3], [teeth + 1, 0], [-1, 0]);
      const result = check({ outer }, ENDS);
      return result.ok ? [] : result.errors;
    };
    const few = comb(7);
    expect(few.map(({ at }) => at).sort((a, b) => (a?.[0] ?? 0) - (b?.[0] ?? 0))).toEqual(
      [0.5, 1.5, 2.5, 3.5, 4.5, 5.5].map((x) => [x, 0]),
    );
    expect(few.every(({ pointer }) => pointer === "#/outline/outer/8")).toBe(true);
    expect(comb(500)).toHaveLength(20);
  });

  it.each([0, 1, 2])("%i points", (n) => {
    const found = refusals({ outer: rectangle(0, 0, 1, 1).slice(0, n) }, ENDS);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatch(
      /^#\/outline\/outer: The outer ring has [012] points?; a ring needs at least three, or an arc\.$/,
    );
  });

  it("three points of which two are the same", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [1, 0],
      [1, 0],
    ];
    expect(refusals({ outer }, ENDS)[0]).toContain("has 2 distinct points; a ring needs at least three");
  });

  it("no area: all points on a line", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [1, 1],
      [3, 3],
      [2, 2],
    ];
    expect(refusals({ outer }, ENDS)[0]).toContain("#/outline/outer: The outer ring encloses no area");
    expect(
      refusals(
        {
          outer: [
            [2, 2],
            [2, 2],
            [2, 2],
          ],
        },
        ENDS,
      )[0],
    ).toContain("single point");
  });

  it("a spike that goes out and back along itself", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [4, 0],
      [4, 4],
      [7, 4],
      [4, 4],
      [0, 4],
    ];
    const found = refusals({ outer }, ENDS);
    expect(found).toHaveLength(1);
    expect(found[0]).toContain(
      "#/outline/outer/3: The outer ring goes to (7, 4) and comes back along the same line",
    );
  });

  it("a spike of which only a part comes back along itself", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [4, 0],
      [4, 7],
      [4, 4],
      [0, 4],
    ];
    expect(refusals({ outer }, ENDS)[0]).toContain("#/outline/outer/2: The outer ring goes to (4, 7)");
  });

  it("a vertex visited twice", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [4, 0],
      [2, 2],
      [4, 4],
      [0, 4],
      [2, 2],
    ];
    const found = refusals({ outer }, ENDS);
    expect(found[0]).toContain("of the outer ring touch at (2, 2)");
  });

  it("a vertex on another edge of the same ring", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [4, 0],
      [4, 4],
      [2, 0],
      [0, 4],
    ];
    expect(refusals({ outer }, ENDS)[0]).toMatch(/Edges 0 and [23] of the outer ring touch at \(2, 0\)/);
  });

  it("a vertex within 1e-12 of another edge", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [4, 0],
      [4, 4],
      [2, 1e-12],
      [0, 4],
    ];
    expect(refusals({ outer }, ENDS)[0]).toContain("touch at (2, 0)");
    const clear: Array<[number, number]> = [
      [0, 0],
      [4, 0],
      [4, 4],
      [2, 1e-10],
      [0, 4],
    ];
    expect(check({ outer: clear }, ENDS).ok).toBe(true);
  });
});

describe("holes that are refused", () => {
  const withHoles = (...holes: Array<Array<[number, number]>>) => refusals({ ...plate, holes }, ENDS);

  it("outside the outer ring", () => {
    expect(withHoles(gon(30, 5, 1, 5))).toEqual([
      "#/outline/holes/0: Hole 0, which begins at (31, 5), lies outside the outer ring. A hole must lie inside the outer ring.",
    ]);
  });

  it("around the outer ring", () => {
    expect(withHoles(rectangle(-1, -1, 21, 11))[0]).toContain(
      "#/outline/holes/0: Hole 0, which begins at (-1, -1), surrounds",
    );
  });

  it("crossing the outer ring", () => {
    const found = withHoles(rectangle(2, 2, 4, 4), rectangle(18, 4, 22, 6));
    const rule = "A hole must lie inside the outer ring without touching it.";
    expect(found.sort()).toEqual([
      `#/outline/holes/1/0: Edge 0 of hole 1 crosses edge 1 of the outer ring at (20, 4). ${rule}`,
      `#/outline/holes/1/2: Edge 2 of hole 1 crosses edge 1 of the outer ring at (20, 6). ${rule}`,
    ]);
  });

  it("touching the outer ring in a vertex, along an edge, or in a common vertex", () => {
    expect(
      withHoles([
        [10, 0],
        [11, 2],
        [9, 2],
      ])[0],
    ).toContain("touches edge 0 of the outer ring at (10, 0)");
    expect(withHoles(rectangle(8, 0, 9, 2))[0]).toContain("of hole 0 touches edge 0 of the outer ring");
    expect(
      withHoles([
        [0, 0],
        [3, 1],
        [1, 3],
      ])[0],
    ).toContain("of the outer ring at (0, 0)");
  });

  it("overlapping each other", () => {
    const found = withHoles(rectangle(2, 2, 6, 6), rectangle(4, 4, 8, 8));
    expect(found).toHaveLength(2);
    for (const place of ["(4, 6)", "(6, 4)"]) {
      expect(found.join()).toMatch(
        /of hole 1 crosses edge \d of hole 0 at .* Holes may neither overlap nor touch\./,
      );
      expect(found.join()).toContain(place);
    }
  });

  it("touching each other", () => {
    expect(withHoles(rectangle(2, 2, 6, 6), rectangle(6, 3, 8, 5))[0]).toContain("of hole 1 touches edge");
  });

  it("inside another hole, and the same hole twice", () => {
    expect(withHoles(rectangle(2, 2, 8, 8), rectangle(4, 4, 5, 5))).toEqual([
      "#/outline/holes/1: Hole 1, which begins at (4, 4), lies inside hole 0. Holes may not overlap.",
    ]);
    expect(withHoles(rectangle(2, 2, 8, 8), rectangle(2, 2, 8, 8))[0]).toContain("of hole 1 touches edge");
  });
});

describe("sizes that are refused", () => {
  it("more than 50,000 vertices, counted over all rings and regions", () => {
    const outline = { outer: gon(0, 0, 1, 49_000), holes: [gon(0, 0, 0.5, 1001)] };
    expect(refusals(outline, ENDS)).toEqual([
      "#/outline: The outline has 50001 vertices, regions included; at most 50000 are allowed.",
    ]);
    expect(refusals({ outer: gon(0, 0, 1, 49_000) }, ENDS, [gon(0, 0, 0.5, 1001)])[0]).toContain(
      "50001 vertices",
    );
  });

  it("a coordinate beyond 1e12 m", () => {
    const found = refusals(
      {
        unit: "km",
        outer: [
          [0, 0],
          [1, 0],
          [1, 2e9],
        ],
      },
      ENDS,
    );
    expect(found).toEqual([
      "#/outline/outer/2: The point (1, 2000000000) lies too far out; coordinates go up to 1e12 m (1000000000 km).",
    ]);
  });

  it("an extent below 1e-12 m or above 1e12 m", () => {
    expect(refusals({ unit: "nm", outer: rectangle(0, 0, 1e-4, 1e-4) }, ENDS)[0]).toContain(
      "#/outline/outer: The outline's largest extent is 1e-13 m; allowed are 1e-12 m to 1e12 m.",
    );
    expect(refusals({ outer: rectangle(-1e12, 0, 1e12, 1) }, ENDS)[0]).toContain(
      "largest extent is 2000000000000 m",
    );
  });

  it("an outline too far from the origin for its size", () => {
    expect(refusals({ outer: rectangle(1e9, 0, 1e9 + 1e-2, 1e-2) }, ENDS)[0]).toContain(
      "so far from the origin",
    );
  });

  it("anything that is not a finite number, by the schema", () => {
    for (const bad of [NaN, Infinity, "1", null]) {
      expect(
        outlineSchema.safeParse({
          outer: [
            [0, 0],
            [1, bad],
            [1, 1],
          ],
        }).success,
      ).toBe(false);
    }
    expect(outlineSchema.safeParse({ outer: [[0, 0, 0]] }).success).toBe(false);
    expect(outlineSchema.safeParse({ outer: [], unit: "furlong" }).success).toBe(false);
    expect(outlineSchema.safeParse({ outer: [], colour: "red" }).success).toBe(false);
  });
});

describe("axisymmetric outlines", () => {
  const symmetry = "axisymmetric" as const;

  it("a negative radius", () => {
    const found = refusals({ symmetry, outer: rectangle(-1, 0, 2, 1) }, ENDS);
    expect(found).toHaveLength(2);
    expect(found[0]).toBe(
      "#/outline/outer/0: The point (-1, 0) has the radius -1; in an axisymmetric outline x is the radius and may not be negative.",
    );
  });

  it("an arc that swings past the axis", () => {
    const outer = [[1, 0], { arcTo: [1, 2], center: [1, 1], clockwise: true }, [3, 2], [3, 0]];
    const parsed = outlineSchema.parse({ symmetry, outer });
    expect(
      check({ ...parsed, outer: [...parsed.outer] }, [
        { name: "a", parts: [{ ring: 0, edge: 2 }] },
        { name: "b", parts: [{ ring: 0, edge: 1 }] },
      ]).ok,
    ).toBe(false);
    const deeper = [[0.5, 0], { arcTo: [0.5, 2], center: [0.5, 1], clockwise: true }, [3, 2], [3, 0]];
    const found = refusals({ symmetry, outer: outlineSchema.parse({ outer: deeper }).outer }, ENDS);
    expect(found[0]).toContain("#/outline/outer/1: The arc to (0.5, 2) reaches the radius -0.5");
  });

  it("a terminal on the axis", () => {
    const found = refusals({ symmetry, outer: rectangle(0, 0, 2, 1) }, ENDS);
    expect(found).toHaveLength(1);
    expect(found[0]).toContain("#/terminals/0/parts/0: This stretch lies on the axis x = 0");
  });
});

describe("several complaints at once", () => {
  it("terminals are checked although the ring crosses itself", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [4, 4],
      [4, 0],
      [0, 4],
    ];
    const found = refusals({ outer }, BEND_TERMINALS);
    expect(found.some((f) => f.startsWith("#/terminals/0/segments/0"))).toBe(true);
    expect(found.some((f) => f.startsWith("#/outline/outer/2"))).toBe(true);
  });

  it("fifty at most", () => {
    const segments = Array.from({ length: 300 }, (_, i): [[number, number], [number, number]] => [
      [100 + i, 100],
      [100 + i, 101],
    ]);
    expect(refusals(BEND, [{ name: "a", segments }, BEND_TERMINALS[1]])).toHaveLength(50);
  });

  it("a sound outline has none", () => {
    expect(refusals(BEND, BEND_TERMINALS)).toEqual([]);
  });
});

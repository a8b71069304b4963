import { describe, expect, it } from "vitest";
import { validateMesh } from "@/lib/engine/field/mesh/validate-mesh";
import { accept, BEND, BEND_TERMINALS, ENDS, gon, meshOf, rectangle, refusals } from "./support/outlines";

const sheet = { unit: "mm" as const, outer: rectangle(0, 0, 20, 10) };
type Regions = Array<Array<[number, number]>>;

/** Area of each medium in the mesh, in the outline's unit squared; the background first. */
function areas(outline: Parameters<typeof accept>[0], regions: Regions, terminals = ENDS): number[] {
  const checked = accept(outline, terminals, regions);
  const { mesh, status } = meshOf(checked, "nominal", 1e-5);
  expect(status).toBe("complete");
  expect(validateMesh(mesh).faults).toEqual([]);
  const sums = [0, ...regions.map(() => 0)];
  const { xy, triangles, region } = mesh;
  for (let t = 0; t < region.length; t++) {
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    const twice = (xy[b] - xy[a]) * (xy[c + 1] - xy[a + 1]) - (xy[b + 1] - xy[a + 1]) * (xy[c] - xy[a]);
    sums[region[t]] += (twice / 2) * checked.frame.scale ** 2;
  }
  return sums.map((area) => Number(area.toPrecision(10)));
}

describe("regions", () => {
  it("inside, either way round", () => {
    expect(areas(sheet, [rectangle(4, 2, 8, 6)])).toEqual([184, 16]);
    expect(areas(sheet, [rectangle(4, 2, 8, 6).reverse()])).toEqual([184, 16]);
  });

  it("touching the border along edges, in corners, on both sides, and covering everything", () => {
    expect(areas(sheet, [rectangle(4, 0, 8, 6)])).toEqual([176, 24]);
    expect(areas(sheet, [rectangle(0, 0, 8, 10)])).toEqual([120, 80]);
    expect(areas(sheet, [rectangle(4, 0, 8, 10)])).toEqual([160, 40]);
    expect(
      areas(sheet, [
        [
          [4, 0],
          [8, 5],
          [2, 5],
        ],
      ]),
    ).toEqual([185, 15]);
    expect(areas(sheet, [rectangle(0, 0, 20, 10)])).toEqual([0, 200]);
  });

  it("touching each other along parts of edges and in points", () => {
    expect(areas(sheet, [rectangle(4, 2, 8, 6), rectangle(8, 3, 12, 9)])).toEqual([160, 16, 24]);
    expect(areas(sheet, [rectangle(8, 3, 12, 9), rectangle(4, 2, 8, 6)])).toEqual([160, 24, 16]);
    expect(areas(sheet, [rectangle(4, 2, 8, 6), rectangle(8, 6, 12, 9)])).toEqual([172, 16, 12]);
    expect(areas(sheet, [rectangle(0, 0, 10, 10), rectangle(10, 0, 20, 10)])).toEqual([0, 100, 100]);
    // A frame of two halves around a middle one.
    const left: Array<[number, number]> = [
      [0, 0],
      [10, 0],
      [10, 3],
      [8, 3],
      [8, 7],
      [10, 7],
      [10, 10],
      [0, 10],
    ];
    expect(areas(sheet, [left, rectangle(8, 3, 12, 7)])).toEqual(
      [96, 92, 12].map((a, i) => (i === 0 ? 200 - 92 - 16 : i === 2 ? 16 : a)),
    );
  });

  it("on slanted borders, whose points are off by rounding", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [7, 3],
      [6, 5.5],
      [-1, 2.5],
    ];
    const third = (a: [number, number], b: [number, number], t: number): [number, number] => [
      a[0] + t * (b[0] - a[0]),
      a[1] + t * (b[1] - a[1]),
    ];
    const ring = [
      third(outer[0], outer[1], 1 / 3),
      third(outer[0], outer[1], 0.7),
      third(outer[3], outer[2], 0.7),
      third(outer[3], outer[2], 1 / 3),
    ];
    const whole = 7 * 2.5 + 3;
    const sums = areas({ outer }, [ring]);
    expect(sums[0] + sums[1]).toBeCloseTo(whole, 8);
    expect(sums[1]).toBeCloseTo(whole * (0.7 - 1 / 3), 8);
  });

  it("around a hole, and up to the edge of a hole", () => {
    const holed = { ...sheet, holes: [rectangle(5, 4, 7, 6)] };
    expect(areas(holed, [rectangle(4, 2, 8, 8)])).toEqual([176, 20]);
    expect(areas(holed, [rectangle(7, 4, 9, 6)])).toEqual([192, 4]);
  });

  it("across a terminal's end", () => {
    const terminals = [
      {
        name: "a",
        segments: [
          [
            [0, 2],
            [0, 8],
          ] as [[number, number], [number, number]],
        ],
      },
      { name: "b", parts: [{ ring: 0, edge: 1 }] },
    ];
    expect(areas(sheet, [rectangle(0, 5, 3, 10)], terminals)).toEqual([185, 15]);
  });

  it("with corners on an arc, where the conductor bulges out", () => {
    const outer = [
      [0, 0] as [number, number],
      [2, 0] as [number, number],
      { arcTo: [0, 2] as [number, number], center: [0, 0] as [number, number] },
    ];
    const ring: Array<[number, number]> = [
      [0, 0],
      [2, 0],
      [Math.SQRT2, Math.SQRT2],
    ];
    const sums = areas(
      { outer },
      [ring],
      [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 1, from: 0.2, to: 0.3 }] },
      ],
    );
    expect(sums[1]).toBeCloseTo(Math.SQRT2, 9);
    expect(sums[0]).toBeCloseTo(Math.PI - Math.SQRT2, 3);
  });
});

describe("regions that are refused", () => {
  const pointer = "#/medium/regions/0/ring";

  it("sticking out, outside, larger than the conductor, in a hole", () => {
    expect(refusals(sheet, ENDS, [rectangle(15, 2, 25, 6)])).toEqual([
      "#/medium/regions/0/ring/1: The point (25, 2) of region 0 lies outside the outline. " +
        "A region lies inside the conductor; it may touch the border but not stick out.",
    ]);
    const notch: Array<[number, number]> = [
      [0, 0],
      [20, 0],
      [20, 10],
      [12, 10],
      [12, 4],
      [8, 4],
      [8, 10],
      [0, 10],
    ];
    const ends = [
      { name: "a", parts: [{ ring: 0, edge: 7 }] },
      { name: "b", parts: [{ ring: 0, edge: 1 }] },
    ];
    expect(refusals({ outer: notch }, ends, [rectangle(10, 2, 14, 6)])[0]).toMatch(
      /^#\/medium\/regions\/0\/ring\/\d: Edge \d of region 0 crosses edge [34] of the outer ring at .* A region lies inside/,
    );
    expect(refusals({ outer: notch }, ends, [rectangle(9, 5, 11, 6)])[0]).toBe(
      `${pointer}: Region 0 reaches outside the conductor; it may touch the border, but not stick out.`,
    );
    expect(refusals({ outer: notch }, ends, [rectangle(0, 0, 20, 10)])[0]).toContain("reaches outside");
    const holed = { ...sheet, holes: [rectangle(5, 3, 9, 7)] };
    expect(refusals(holed, ENDS, [rectangle(6, 4, 8, 6)])[0]).toContain("reaches outside");
  });

  it("overlapping, nested, or twice the same", () => {
    expect(refusals(sheet, ENDS, [rectangle(2, 2, 6, 6), rectangle(4, 4, 8, 8)])[0]).toMatch(
      /crosses edge \d of region \d at .* Regions may touch, but not overlap\./,
    );
    expect(refusals(sheet, ENDS, [rectangle(2, 2, 8, 8), rectangle(4, 4, 6, 6)])).toEqual([
      "#/medium/regions/1/ring: Regions 0 and 1 overlap. Regions may touch, but not overlap.",
    ]);
    expect(refusals(sheet, ENDS, [rectangle(4, 4, 6, 6), rectangle(2, 2, 8, 8)])[0]).toContain("overlap");
    expect(refusals(sheet, ENDS, [rectangle(2, 2, 8, 8), rectangle(2, 2, 8, 8)])[0]).toContain(
      "Regions 0 and 1 overlap",
    );
  });

  it("no area, too few points, crossing itself, coming back to a point", () => {
    expect(refusals(sheet, ENDS, [[]])[0]).toContain(`${pointer}: Region 0 encloses no area`);
    expect(
      refusals(sheet, ENDS, [
        [
          [1, 1],
          [2, 2],
        ],
      ])[0],
    ).toContain("encloses no area");
    expect(
      refusals(sheet, ENDS, [
        [
          [1, 1],
          [2, 2],
          [3, 3],
        ],
      ])[0],
    ).toContain(`${pointer}`);
    expect(
      refusals(sheet, ENDS, [
        [
          [1, 1],
          [5, 5],
          [5, 1],
          [1, 6],
        ],
      ])[0],
    ).toContain("The border of a region may neither cross nor touch itself");
    expect(
      refusals(sheet, ENDS, [
        [
          [1, 1],
          [3, 3],
          [5, 1],
          [5, 5],
          [3, 3],
          [1, 5],
        ],
      ])[0],
    ).toContain("comes to the point (3, 3) twice");
  });

  it("a coordinate far out", () => {
    expect(
      refusals(sheet, ENDS, [
        [
          [1, 1],
          [1e16, 2],
          [3, 4],
        ],
      ])[0],
    ).toContain("#/medium/regions/0/ring/1: The point (10000000000000000, 2) of region 0 lies outside");
  });

  it("nothing to say about none", () => {
    expect(refusals(BEND, BEND_TERMINALS, [])).toEqual([]);
    expect(refusals({ ...sheet, holes: [gon(5, 5, 1, 7)] }, ENDS, [rectangle(10, 2, 12, 4)])).toEqual([]);
  });
});

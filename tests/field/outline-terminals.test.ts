import { describe, expect, it } from "vitest";
import { accept, BEND, BEND_TERMINALS, gon, meshOf, rectangle, refusals } from "./support/outlines";

type Terminals = Parameters<typeof refusals>[1];
type Segment = [[number, number], [number, number]];

const out = BEND_TERMINALS[1];
const first = (...segments: Segment[]): Terminals => [{ name: "in", segments }, out];

/** Length of each terminal's boundary in the mesh, in the outline's unit. */
function lengths(...request: Parameters<typeof accept>): number[] {
  const outline = accept(...request);
  const { mesh } = meshOf(outline);
  const sums = outline.terminalNames.map(() => 0);
  for (let i = 0; i < mesh.boundary.length; i += 3) {
    const { terminal } = mesh.sides[mesh.boundary[i + 2]];
    if (terminal < 0) continue;
    const [a, b] = [mesh.boundary[i], mesh.boundary[i + 1]];
    const { xy } = mesh;
    sums[terminal] += outline.frame.scale * Math.hypot(xy[2 * b] - xy[2 * a], xy[2 * b + 1] - xy[2 * a + 1]);
  }
  return sums;
}

describe("terminals that are refused", () => {
  it("none, or only one", () => {
    expect(refusals(BEND, [])[0]).toBe("#/terminals: There is no terminal; a resistance needs at least two.");
    expect(refusals(BEND, [out])[0]).toBe(
      "#/terminals: There is only one terminal; a resistance needs at least two.",
    );
  });

  it("repeated names", () => {
    const found = refusals(BEND, [BEND_TERMINALS[0], { ...out, name: "in" }]);
    expect(found).toEqual(['#/terminals/1/name: Terminals 0 and 1 are both named "in"; names must differ.']);
  });

  it("no segments at all", () => {
    expect(refusals(BEND, [{ name: "in", segments: [] }, out])[0]).toContain(
      '#/terminals/0/segments: Terminal "in" names no',
    );
    expect(refusals(BEND, [{ name: "in" }, out])[0]).toContain("#/terminals/0/segments:");
    expect(refusals(BEND, [{ name: "in", parts: [] }, out])[0]).toContain("#/terminals/0/parts:");
  });

  it("an empty segment", () => {
    expect(
      refusals(
        BEND,
        first([
          [40, 0],
          [40, 0],
        ]),
      ),
    ).toEqual(["#/terminals/0/segments/0: The segment at (40, 0) has no length."]);
  });

  it("off the boundary, with the nearest point", () => {
    const found = refusals(
      BEND,
      first([
        [41, 2],
        [40, 10],
      ]),
    );
    expect(found).toEqual([
      "#/terminals/0/segments/0/0: The point (41, 2) lies outside the conductor, 1 mm off the boundary; a terminal must lie " +
        "on it (within 1e-9 of the outline's size). The nearest point of the boundary is (40, 2) on the outer ring.",
    ]);
  });

  it("inside, and inside a hole", () => {
    expect(
      refusals(
        BEND,
        first([
          [40, 0],
          [20, 4],
        ]),
      )[0],
    ).toContain("#/terminals/0/segments/0/1: The point (20, 4) lies inside the conductor, 4 mm off");
    const outline = { ...BEND, holes: [gon(5, 5, 2, 6)] };
    expect(
      refusals(
        outline,
        first([
          [40, 0],
          [5, 5],
        ]),
      )[0],
    ).toContain("(5, 5) lies outside the conductor");
  });

  it("ends on the boundary, but not along it", () => {
    const found = refusals(
      BEND,
      first([
        [40, 0],
        [10, 10],
      ]),
    );
    expect(found[0]).toContain(
      "#/terminals/0/segments/0: The segment from (40, 0) to (10, 10) has its ends on the boundary but",
    );
  });

  it("around a corner in one segment", () => {
    expect(
      refusals(
        BEND,
        first([
          [30, 0],
          [40, 5],
        ]),
      )[0],
    ).toContain("does not run along it");
  });

  it("overlapping another, touching another in a point, wrapped into another", () => {
    const touching = refusals(BEND, [
      BEND_TERMINALS[0],
      {
        name: "b",
        segments: [
          [
            [40, 10],
            [20, 10],
          ],
        ],
      },
    ]);
    expect(touching).toEqual([
      '#/terminals/1/segments/0: Terminals "in" and "b" touch at (40, 10): the resistance between them is zero. ' +
        "Leave insulated boundary between them.",
    ]);
    const overlapping = refusals(BEND, [
      BEND_TERMINALS[0],
      {
        name: "b",
        segments: [
          [
            [40, 9],
            [40, 5],
          ],
        ],
      },
    ]);
    expect(overlapping[0]).toContain('Terminals "in" and "b" overlap at (40, 5)');
    const same = refusals(BEND, [BEND_TERMINALS[0], { ...BEND_TERMINALS[0], name: "b" }]);
    expect(same[0]).toContain("overlap");
    const aroundStart = refusals(BEND, [
      {
        name: "a",
        segments: [
          [
            [0, 0],
            [5, 0],
          ],
        ],
      },
      {
        name: "b",
        segments: [
          [
            [0, 0],
            [0, 5],
          ],
        ],
      },
    ]);
    expect(aroundStart[0]).toContain('"a" touch at (0, 0)');
  });

  it("parts that do not exist or have no length", () => {
    const part = (p: { ring: number; edge: number; from?: number; to?: number }): string =>
      refusals(BEND, [{ name: "in", parts: [p] }, out])[0];
    expect(part({ ring: 1, edge: 0 })).toContain(
      "#/terminals/0/parts/0/ring: There is no ring 1; the outline has ring 0",
    );
    expect(part({ ring: 0, edge: 6 })).toContain(
      "#/terminals/0/parts/0/edge: The outer ring has no edge 6; its edges are 0 to 5.",
    );
    expect(part({ ring: 0, edge: 1, from: 0.5, to: 0.5 })).toContain(
      "#/terminals/0/parts/0: The part has no length",
    );
    expect(part({ ring: 0, edge: 1, from: 0.5, to: 0.5 + 1e-13 })).toContain("The part has no length");
    const repeated = { ...BEND, outer: [...BEND.outer.slice(0, 2), BEND.outer[1], ...BEND.outer.slice(2)] };
    expect(refusals(repeated, [{ name: "in", parts: [{ ring: 0, edge: 1 }] }, out])[0]).toContain(
      "Edge 1 of the outer ring has no length",
    );
  });
});

describe("terminals that are accepted", () => {
  it("whole edges and parts of edges, either way round", () => {
    expect(lengths(BEND, BEND_TERMINALS)).toEqual([10, 10]);
    expect(
      lengths(
        BEND,
        first([
          [40, 7],
          [40, 3],
        ]),
      )[0],
    ).toBeCloseTo(4, 12);
    expect(
      lengths(BEND, [{ name: "in", parts: [{ ring: 0, edge: 0, from: 0.75, to: 0.25 }] }, out])[0],
    ).toBeCloseTo(20, 12);
  });

  it("wrapped around a corner, also around vertex 0", () => {
    const outline = accept(
      BEND,
      first(
        [
          [35, 0],
          [40, 0],
        ],
        [
          [40, 0],
          [40, 10],
        ],
      ),
    );
    const { mesh } = meshOf(outline);
    expect(mesh.sides.filter((s) => s.terminal === 0)).toHaveLength(1);
    expect(
      lengths(
        BEND,
        first(
          [
            [0, 5],
            [0, 0],
          ],
          [
            [0, 0],
            [6, 0],
          ],
        ),
      )[0],
    ).toBeCloseTo(11, 12);
    const wrapped = meshOf(
      accept(
        BEND,
        first(
          [
            [0, 5],
            [0, 0],
          ],
          [
            [0, 0],
            [6, 0],
          ],
        ),
      ),
    ).mesh;
    expect(wrapped.sides.map((s) => s.terminal)).toHaveLength(4);
  });

  it("on several edges, overlapping itself, on a hole and on a whole hole", () => {
    expect(
      lengths(
        BEND,
        first(
          [
            [40, 0],
            [40, 10],
          ],
          [
            [5, 0],
            [15, 0],
          ],
        ),
      )[0],
    ).toBeCloseTo(20, 12);
    expect(
      lengths(
        BEND,
        first(
          [
            [40, 0],
            [40, 6],
          ],
          [
            [40, 4],
            [40, 10],
          ],
        ),
      )[0],
    ).toBeCloseTo(10, 12);
    const holed = { ...BEND, holes: [rectangle(2, 2, 6, 5)] };
    expect(
      lengths(
        holed,
        first([
          [2, 2],
          [6, 2],
        ]),
      )[0],
    ).toBeCloseTo(4, 12);
    const whole = [0, 1, 2, 3].map((edge) => ({ ring: 1, edge }));
    const outline = accept(holed, [{ name: "in", parts: whole }, out]);
    const { mesh } = meshOf(outline);
    expect(mesh.sides.filter((s) => s.ring === 1)).toEqual([{ ring: 1, terminal: 0 }]);
  });

  it("along several nearly collinear edges in one segment", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [10, 0],
      [10, 2],
      [10.000000001, 5],
      [10, 8],
      [10, 10],
      [0, 10],
    ];
    const terminals: Terminals = [
      {
        name: "a",
        segments: [
          [
            [10, 1],
            [10, 9],
          ],
        ],
      },
      {
        name: "b",
        segments: [
          [
            [0, 0],
            [0, 10],
          ],
        ],
      },
    ];
    expect(lengths({ outer }, terminals)[0]).toBeCloseTo(8, 8);
  });

  it("a touch off the boundary, as drawing programs round", () => {
    expect(
      lengths(
        BEND,
        first([
          [40.00000001, -0.00000001],
          [40, 9.99999999],
        ]),
      )[0],
    ).toBe(10);
  });

  it("edges keep their submitted numbers after repairs", () => {
    const outer: Array<[number, number]> = [
      [0, 0],
      [10, 0],
      [20, 0],
      [40, 0],
      [40, 0],
      [40, 10],
      [10, 10],
      [10, 40],
      [0, 40],
    ];
    const parts = [{ ring: 0, edge: 4 }];
    expect(lengths({ unit: "mm", outer }, [{ name: "in", parts }, out])[0]).toBeCloseTo(10, 12);
    const middle = [{ ring: 0, edge: 1, from: 0.5, to: 1 }];
    const outline = accept({ unit: "mm", outer }, [{ name: "in", parts: middle }, out]);
    expect(lengths({ unit: "mm", outer }, [{ name: "in", parts: middle }, out])[0]).toBeCloseTo(5, 12);
    expect(outline.repairs).toHaveLength(2);
  });

  it("clockwise outlines and counter-clockwise holes give the same sides", () => {
    const reversed = { ...BEND, outer: [...BEND.outer].reverse() };
    expect(lengths(reversed, BEND_TERMINALS)).toEqual([10, 10]);
    const { mesh } = meshOf(accept(reversed, BEND_TERMINALS));
    expect(mesh.sides.map((s) => s.terminal).sort()).toEqual([-1, -1, 0, 1]);
  });
});

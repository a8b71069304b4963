import { describe, expect, it } from "vitest";
import { validateMesh } from "@/lib/engine/field/mesh/validate-mesh";
import { buildDomain } from "@/lib/engine/field/outline/build-domain";
import { accept, BEND, BEND_TERMINALS, check, meshOf, rectangle, refusals } from "./support/outlines";

type Outer = Parameters<typeof accept>[0]["outer"];

/** A quarter of an annulus, radii 1 and 2, terminals across its ends. */
const quarter: Outer = [
  [2, 0],
  { arcTo: [0, 2], center: [0, 0] },
  [0, 1],
  { arcTo: [1, 0], center: [0, 0], clockwise: true },
];
const quarterEnds = [
  { name: "a", parts: [{ ring: 0, edge: 1 }] },
  { name: "b", parts: [{ ring: 0, edge: 3 }] },
];

function areaOf(
  outline: ReturnType<typeof accept>,
  role: "nominal" | "upper" | "lower",
  tolerance: number,
): number {
  const { mesh } = meshOf(outline, role, tolerance);
  const report = validateMesh(mesh);
  expect(report.faults).toEqual([]);
  return report.area * outline.frame.scale ** 2;
}

describe("arcs", () => {
  it("enclose their exact area in the limit; insulated ones shrink the conductor for the upper bound", () => {
    const exact = (Math.PI * 3) / 4;
    const outline = accept({ outer: quarter }, quarterEnds);
    for (const tolerance of [1e-2, 1e-3, 1e-4]) {
      const upper = areaOf(outline, "upper", tolerance);
      const lower = areaOf(outline, "lower", tolerance);
      expect(upper).toBeLessThan(exact);
      expect(lower).toBeGreaterThan(exact);
      // Two arcs of less than 5 units together, each off by at most the tolerance times the scale of 2.
      expect(lower - upper).toBeLessThan(5 * 2 * 2 * tolerance);
    }
  });

  it("with terminals on the arcs, the other way round", () => {
    const exact = (Math.PI * 3) / 4;
    const outline = accept({ outer: quarter }, [
      { name: "a", parts: [{ ring: 0, edge: 0 }] },
      { name: "b", parts: [{ ring: 0, edge: 2 }] },
    ]);
    expect(areaOf(outline, "upper", 1e-3)).toBeGreaterThan(exact);
    expect(areaOf(outline, "lower", 1e-3)).toBeLessThan(exact);
  });

  it("a terminal on a part of an arc ends exactly there, and each stretch moves its own way", () => {
    const outline = accept({ outer: quarter }, [
      { name: "a", parts: [{ ring: 0, edge: 0, from: 0.25, to: 0.5 }] },
      { name: "b", parts: [{ ring: 0, edge: 3 }] },
    ]);
    const { frame } = outline;
    for (const role of ["upper", "lower"] as const) {
      const domain = buildDomain(outline, role, 1e-3);
      const side = domain.sides.findIndex((s) => s.terminal === 0);
      const points = Array.from(domain.segmentSide.keys())
        .filter((s) => domain.segmentSide[s] === side)
        .map((s) => domain.segments[2 * s])
        .map((p) =>
          Math.hypot(
            domain.xy[2 * p] * frame.scale + frame.originX,
            domain.xy[2 * p + 1] * frame.scale + frame.originY,
          ),
        );
      expect(points[0]).toBeCloseTo(2, 14);
      for (const radius of points.slice(1)) {
        if (role === "upper") expect(radius).toBeGreaterThan(2.00001);
        else expect(radius).toBeCloseTo(2, 14);
      }
    }
  });

  it("nominal corners lie on the arc, closer than the tolerance asks", () => {
    const outline = accept({ outer: quarter }, quarterEnds);
    const domain = buildDomain(outline, "nominal", 1e-4);
    const { frame } = outline;
    for (let s = 0; s < domain.segments.length; s += 2) {
      const [p, q] = [domain.segments[s], domain.segments[s + 1]];
      const x = ((domain.xy[2 * p] + domain.xy[2 * q]) / 2) * frame.scale + frame.originX;
      const y = ((domain.xy[2 * p + 1] + domain.xy[2 * q + 1]) / 2) * frame.scale + frame.originY;
      if (domain.sides[domain.segmentSide[s / 2]].terminal >= 0) continue;
      const off = Math.min(Math.abs(Math.hypot(x, y) - 2), Math.abs(Math.hypot(x, y) - 1));
      expect(off).toBeLessThanOrEqual(1e-4 * frame.scale * 1.0001);
    }
  });

  it("a circle as one arc, and a ring that begins with an arc", () => {
    const disc = [{ arcTo: [1, 0] as [number, number], center: [0, 0] as [number, number] }];
    const outline = accept({ outer: disc }, [
      { name: "a", parts: [{ ring: 0, edge: 0, from: 0, to: 0.1 }] },
      { name: "b", parts: [{ ring: 0, edge: 0, from: 0.5, to: 0.6 }] },
    ]);
    expect(areaOf(outline, "nominal", 1e-5)).toBeCloseTo(Math.PI, 3);
    const turned: Outer = [
      { arcTo: [0, 2], center: [0, 0] },
      [0, 1],
      { arcTo: [1, 0], center: [0, 0], clockwise: true },
      [2, 0],
    ];
    const same = accept({ outer: turned }, [
      { name: "a", parts: [{ ring: 0, edge: 0 }] },
      { name: "b", parts: [{ ring: 0, edge: 2 }] },
    ]);
    expect(areaOf(same, "nominal", 1e-5)).toBeCloseTo((Math.PI * 3) / 4, 3);
  });

  it("a circle repeated as a vertex and an arc to itself", () => {
    const outline = accept(
      {
        outer: rectangle(-2, -2, 2, 2),
        holes: [[[1, 0], { arcTo: [1, 0], center: [0, 0], clockwise: true }]],
      },
      [
        { name: "a", parts: [{ ring: 0, edge: 1 }] },
        { name: "b", parts: [{ ring: 0, edge: 3 }] },
      ],
    );
    expect(areaOf(outline, "nominal", 1e-5)).toBeCloseTo(16 - Math.PI, 3);
    expect(areaOf(outline, "upper", 1e-3)).toBeLessThan(16 - Math.PI);
    expect(areaOf(outline, "lower", 1e-3)).toBeGreaterThan(16 - Math.PI);
  });

  it("rounded corners are tangent to their neighbours", () => {
    const outer: Outer = [
      [1, 0],
      [9, 0],
      { arcTo: [10, 1], center: [9, 1] },
      [10, 4],
      { arcTo: [9, 5], center: [9, 4] },
      [0, 5],
      [0, 1],
      { arcTo: [1, 0], center: [1, 1] },
    ];
    const terminals = [
      { name: "a", parts: [{ ring: 0, edge: 2 }] },
      { name: "b", parts: [{ ring: 0, edge: 5 }] },
    ];
    const exact = 50 - 3 * (1 - Math.PI / 4);
    for (const role of ["nominal", "upper", "lower"] as const) {
      expect(areaOf(accept({ outer }, terminals), role, 1e-4)).toBeCloseTo(exact, 1);
    }
  });

  it("come as near to other edges as they like, without touching", () => {
    // A hole of radius 1 with 1e-6 left to the wall: chords of the usual width would cut into the wall.
    const outline = accept(
      { outer: rectangle(-1.000001, -3, 3, 3), holes: [[{ arcTo: [1, 0], center: [0, 0] }]] },
      [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 2 }] },
      ],
    );
    for (const role of ["nominal", "upper", "lower"] as const) {
      expect(validateMesh(meshOf(outline, role, 1e-2).mesh).faults).toEqual([]);
    }
  });

  it("a hole between an arc and its chord is inside", () => {
    const outer: Outer = [[-1, 0], [1, 0], { arcTo: [-1, 0], center: [0, 0] }];
    const y = 0.999;
    const hole: Array<[number, number]> = [
      [0, y],
      [1e-4, y],
      [0, y + 1e-4],
    ];
    const outline = accept({ outer, holes: [hole] }, [
      { name: "a", parts: [{ ring: 0, edge: 0, from: 0.1, to: 0.2 }] },
      { name: "b", parts: [{ ring: 0, edge: 0, from: 0.8, to: 0.9 }] },
    ]);
    for (const role of ["nominal", "upper", "lower"] as const) {
      expect(validateMesh(meshOf(outline, role, 0.05).mesh).faults).toEqual([]);
    }
  });
});

describe("arcs that are refused", () => {
  it("different radii at the two ends", () => {
    const outer: Outer = [[0, 0], [2, 0], { arcTo: [0, 2.001], center: [0, 0] }];
    expect(refusals({ outer }, quarterEnds)[0]).toBe(
      "#/outline/outer/2: The arc from (2, 0) to (0, 2.001) has radius 2 at its start and 2.001 at its end; " +
        "they may differ by 1e-9 of the radius.",
    );
    const near: Outer = [[0, 0], [2, 0], { arcTo: [0, 2 + 1e-9], center: [0, 0] }];
    expect(
      check(
        { outer: near },
        quarterEnds.map((t, i) => ({ ...t, parts: [{ ring: 0, edge: 2 * i }] })),
      ).ok,
    ).toBe(false);
    expect(refusals({ outer: near }, quarterEnds).filter((e) => e.startsWith("#/outline"))).toEqual([]);
  });

  it("no radius", () => {
    const outer: Outer = [[0, 0], [2, 0], { arcTo: [0, 2], center: [2, 0] }];
    expect(refusals({ outer }, quarterEnds)[0]).toContain(
      "#/outline/outer/2: The arc to (0, 2) has no radius",
    );
  });

  it("crossing another edge, at the place where the curves meet and not their chords", () => {
    const outer: Outer = [[0, 0], [4, 0], [4, 4], { arcTo: [0, 4], center: [2, 5], clockwise: true }];
    expect(check({ outer }, quarterEnds).ok).toBe(true);
    const low: Outer = [[0, 3], [4, 3], [4, 4], { arcTo: [0, 4], center: [2, 5], clockwise: true }];
    const found = refusals({ outer: low }, [
      { name: "a", parts: [{ ring: 0, edge: 1 }] },
      { name: "b", parts: [{ ring: 0, edge: 3 }] },
    ]);
    expect(found.map((text) => text.split(". ")[0]).sort()).toEqual([
      "#/outline/outer/2: Edges 0 and 2 of the outer ring cross at (1, 3)",
      "#/outline/outer/2: Edges 0 and 2 of the outer ring cross at (3, 3)",
    ]);
  });

  it("touching another edge", () => {
    const holes = [[{ arcTo: [1, 0] as [number, number], center: [0, 0] as [number, number] }]];
    const found = refusals({ outer: rectangle(-1, -3, 3, 3), holes }, [
      { name: "a", parts: [{ ring: 0, edge: 0 }] },
      { name: "b", parts: [{ ring: 0, edge: 2 }] },
    ]);
    expect(found[0]).toMatch(
      /^#\/outline\/holes\/0\/0: Edge 0 of hole 0 (touches|crosses) edge 3 of the outer ring at \(-1, /,
    );
  });

  it("a cusp", () => {
    // The arc leaves (4, 0) along the edge that arrived there.
    const outer: Outer = [[0, 0], [4, 0], { arcTo: [2, 2], center: [4, 2], clockwise: true }, [0, 2]];
    expect(refusals({ outer }, quarterEnds)[0]).toContain(
      "#/outline/outer/1: The outer ring has a cusp at (4, 0)",
    );
  });

  it("a straight segment named as a terminal on an arc", () => {
    const found = refusals({ outer: quarter }, [
      quarterEnds[0],
      {
        name: "b",
        segments: [
          [
            [2, 0],
            [0, 2],
          ],
        ],
      },
    ]);
    expect(found[0]).toContain("which is an arc there; name arcs by ring and edge under parts.");
  });
});

describe("roles without arcs", () => {
  it("are one and the same domain", () => {
    const outline = accept(BEND, BEND_TERMINALS);
    const domain = buildDomain(outline, "nominal");
    expect(buildDomain(outline, "upper", 1e-7)).toBe(domain);
    expect(buildDomain(outline, "lower")).toBe(domain);
  });
});

import { describe, expect, it } from "vitest";
import { cornerAngles } from "@/lib/engine/field/mesh/corners";
import { locate } from "@/lib/engine/field/mesh/locate";
import type { FieldMesh } from "@/lib/engine/field/mesh/mesh";
import { meshDomain } from "@/lib/engine/field/mesh/mesh-domain";
import { inCircle, orient } from "@/lib/engine/field/mesh/predicates";
import { validateMesh } from "@/lib/engine/field/mesh/validate-mesh";
import { buildDomain } from "@/lib/engine/field/outline/build-domain";
import { seeded } from "./support/ugly-outlines";
import { accept, BEND, BEND_TERMINALS, ENDS, gon, meshOf, rectangle } from "./support/outlines";

type Ring = Array<[number, number]>;

const PLATE = {
  outer: rectangle(0, 0, 10, 6),
  holes: [gon(3, 3, 1, 48), gon(6, 1.8, 0.8, 48), gon(6.5, 4.3, 0.9, 48)],
};
const PLATE_TERMINALS = [
  {
    name: "in",
    segments: [
      [
        [0, 1],
        [0, 3],
      ],
    ] as Array<[[number, number], [number, number]]>,
  },
  {
    name: "out",
    segments: [
      [
        [10, 2.5],
        [10, 5],
      ],
    ] as Array<[[number, number], [number, number]]>,
  },
];

function sound(mesh: FieldMesh): ReturnType<typeof validateMesh> {
  const report = validateMesh(mesh);
  expect(report.faults).toEqual([]);
  return report;
}

describe("sign convention", () => {
  it("y points up, counter-clockwise is positive", () => {
    expect(orient(0, 0, 1, 0, 0, 1)).toBeGreaterThan(0);
    expect(orient(0, 0, 0, 1, 1, 0)).toBeLessThan(0);
    expect(inCircle(0, 0, 1, 0, 0, 1, 0.5, 0.5)).toBeGreaterThan(0);
    expect(inCircle(0, 0, 1, 0, 0, 1, 2, 2)).toBeLessThan(0);
  });

  it("is exact at the limit of rounding", () => {
    const tiny = 2 ** -53;
    expect(orient(0.5, 0.5, 12, 12, 24 + 24 * tiny * 2, 24)).toBeLessThan(0);
    expect(orient(0.5, 0.5, 12, 12, 24, 24)).toBe(0);
  });
});

describe("first meshes", () => {
  it("a bend takes a handful of triangles", () => {
    const { mesh, status } = meshOf(accept(BEND, BEND_TERMINALS));
    const report = sound(mesh);
    expect(status).toBe("complete");
    expect(report.triangles).toBeLessThanOrEqual(20);
    expect(report.minimumAngleDeg).toBeGreaterThan(20);
    expect(report.area).toBeCloseTo(700 / 64 ** 2, 14);
  });

  it("a plate with three round holes stays below a thousand", () => {
    const { mesh, status } = meshOf(accept(PLATE, PLATE_TERMINALS));
    const report = sound(mesh);
    expect(status).toBe("complete");
    expect(report.triangles).toBeLessThan(1000);
    expect(report.minimumAngleDeg).toBeGreaterThan(19.99);
    expect(mesh.sides).toHaveLength(7);
  });

  it("the first corner lies opposite the longest edge", () => {
    const { mesh } = meshOf(accept(PLATE, PLATE_TERMINALS));
    const { xy, triangles } = mesh;
    const length = (a: number, b: number): number =>
      Math.hypot(xy[2 * a] - xy[2 * b], xy[2 * a + 1] - xy[2 * b + 1]);
    for (let t = 0; t < triangles.length; t += 3) {
      const [a, b, c] = triangles.subarray(t, t + 3);
      expect(length(b, c)).toBeGreaterThanOrEqual(Math.max(length(a, b), length(a, c)) - 1e-15);
    }
  });

  it("boundary edges follow their ring, the conductor on the left", () => {
    const { mesh } = meshOf(accept(PLATE, PLATE_TERMINALS));
    const areas = new Map<number, number>();
    for (let i = 0; i < mesh.boundary.length; i += 3) {
      const [a, b, s] = mesh.boundary.subarray(i, i + 3);
      const { ring } = mesh.sides[s];
      const cross = mesh.xy[2 * a] * mesh.xy[2 * b + 1] - mesh.xy[2 * b] * mesh.xy[2 * a + 1];
      areas.set(ring, (areas.get(ring) ?? 0) + cross / 2);
    }
    expect([...areas.values()].map(Math.sign)).toEqual([1, -1, -1, -1]);
  });

  it("an axisymmetric outline marks the axis", () => {
    const outline = accept({ symmetry: "axisymmetric", outer: rectangle(0, 0, 2, 1) }, [
      { name: "bottom", parts: [{ ring: 0, edge: 0 }] },
      { name: "top", parts: [{ ring: 0, edge: 2 }] },
    ]);
    const { mesh } = meshOf(outline);
    sound(mesh);
    expect(mesh.sides).toEqual([
      { ring: 0, terminal: 0 },
      { ring: 0, terminal: -1 },
      { ring: 0, terminal: 1 },
      { ring: 0, terminal: -1, axis: true },
    ]);
    const onAxis = mesh.boundary.filter((_, i) => i % 3 === 0 && mesh.sides[mesh.boundary[i + 2]].axis);
    for (const v of onAxis) expect(mesh.xy[2 * v]).toBe(0);
    expect(outline.frame.originX).toBe(0);
  });

  it("the allowance of vertices is kept, and what is left is a sound mesh", () => {
    const domain = buildDomain(accept(PLATE, PLATE_TERMINALS), "nominal");
    for (const maximumVertices of [0, 160, 200, 250]) {
      const { mesh, status } = meshDomain(domain, { maximumVertices });
      expect(status).toBe("capped");
      const report = sound(mesh);
      expect(report.vertices).toBeLessThanOrEqual(Math.max(maximumVertices, domain.xy.length / 2));
    }
  });
});

describe("hard cases end, with sound meshes", () => {
  const angle = (5 * Math.PI) / 180;
  const slope = Math.tan(angle);
  const cases: Array<[string, { outer: Ring; holes?: Ring[] }]> = [
    [
      "a 5° tip",
      {
        outer: [
          [0, 0],
          [1, 0],
          [1, slope],
        ],
      },
    ],
    [
      "a 0.01° tip",
      {
        outer: [
          [0, 0],
          [1, 0],
          [1, slope / 500],
        ],
      },
    ],
    [
      "a re-entrant 5° notch",
      {
        outer: [
          [0, 0],
          [2, 0],
          [2, 2],
          [1 + slope, 2],
          [1, 0.5],
          [1 - slope, 2],
          [0, 2],
        ],
      },
    ],
    ["a sliver of 1:1000", { outer: rectangle(0, 0, 1000, 1) }],
    [
      "a sliver of 1:1000, turned",
      { outer: rectangle(0, 0, 1000, 1).map(([x, y]) => [0.8 * x - 0.6 * y, 0.6 * x + 0.8 * y]) },
    ],
    [
      "holes 1e-5 apart",
      { outer: rectangle(-3, -3, 3, 3), holes: [gon(-1 - 1e-5, 0, 1, 16), gon(1, 0, 1, 16)] },
    ],
    ["a hole of radius 1e-5", { outer: rectangle(-2, -2, 2, 2), holes: [gon(0.3, 0.2, 1e-5, 12)] }],
    ["a gap of 1e-6 to the border", { outer: rectangle(0, 0, 4, 3), holes: [gon(1, 1, 1 - 1e-6, 4)] }],
    [
      "two squares with corners 1e-6 apart",
      { outer: rectangle(-3, -3, 3, 3), holes: [gon(-1, 0, 1 - 5e-7, 4), gon(1, 0, 1 - 5e-7, 4)] },
    ],
    [
      "coordinates around 1e6",
      { outer: rectangle(1e6, -1e6, 1e6 + 1, -1e6 + 1), holes: [gon(1e6 + 0.5, -1e6 + 0.5, 0.25, 24)] },
    ],
    ["scale 1e-9", { outer: rectangle(0, 0, 4e-9, 3e-9), holes: [gon(1e-9, 1e-9, 0.7e-9, 9)] }],
    ["scale 1e9", { outer: rectangle(0, 0, 4e9, 3e9), holes: [gon(1e9, 1e9, 0.7e9, 9)] }],
  ];

  it.each(cases)("%s", (_, outline) => {
    const n = outline.outer.length;
    const checked = accept(outline, [
      { name: "a", parts: [{ ring: 0, edge: 0, from: 0.2, to: 0.8 }] },
      { name: "b", parts: [{ ring: 0, edge: n - 1, from: 0.3, to: 0.6 }] },
    ]);
    const { mesh, status } = meshOf(checked);
    const report = sound(mesh);
    expect(status).toBe("complete");
    const sharpest = (Math.min(...cornerAngles(mesh).angle) * 180) / Math.PI;
    const least = sharpest >= 60 ? 19.99 : 0.4 * Math.min(20, sharpest);
    expect(report.minimumObtuseDeg).toBeGreaterThan(least);
    expect(report.triangles).toBeLessThan(600);
    const plain = meshOf(checked, "nominal", undefined, { spanChannels: false });
    expect(plain.status).toBe("complete");
    expect(sound(plain.mesh).minimumAngleDeg).toBeGreaterThan(least);
    expect(sound(plain.mesh).triangles).toBeLessThan(20_000);
  });

  it("600 vertices on a line that cannot be merged", () => {
    // Every other one is moved by a millionth, so that each is a corner of its own.
    const line: Ring = Array.from({ length: 600 }, (_, i) => [i / 599, (i % 2) * 1e-6]);
    const checked = accept({ outer: [...line, [1, 1], [0, 1]] }, [
      { name: "a", parts: [{ ring: 0, edge: 599 }] },
      { name: "b", parts: [{ ring: 0, edge: 601 }] },
    ]);
    expect(checked.rings[0].source).toHaveLength(602);
    const { mesh, status } = meshOf(checked);
    sound(mesh);
    expect(status).toBe("complete");
  });

  it("a hundred holes", () => {
    const holes = Array.from({ length: 100 }, (_, i) => gon(1 + (i % 10), 1 + Math.floor(i / 10), 0.3, 12));
    const { mesh, status } = meshOf(accept({ outer: rectangle(0, 0, 11, 11), holes }, ENDS));
    expect(status).toBe("complete");
    expect(sound(mesh).minimumAngleDeg).toBeGreaterThan(19.99);
  });

  it("50,000 vertices", () => {
    const outer = gon(0, 0, 1, 50_000);
    const checked = accept({ outer }, [
      { name: "a", parts: [{ ring: 0, edge: 0 }] },
      { name: "b", parts: [{ ring: 0, edge: 25_000 }] },
    ]);
    const { mesh, status } = meshOf(checked);
    expect(status).toBe("complete");
    expect(mesh.triangles.length / 3).toBeGreaterThan(50_000);
  });
});

describe("channels", () => {
  const ends = [
    { name: "a", parts: [{ ring: 0, edge: 1 }] },
    { name: "b", parts: [{ ring: 0, edge: 3 }] },
  ];
  /** Triangles of a rectangle of this length and width 1 with the channel spanned, and without. */
  const counts = (outer: Ring, holes: Ring[] = [], terminals = ends): [number, number] => {
    const checked = accept({ outer, holes }, terminals);
    const spanned = meshOf(checked);
    const plain = meshOf(checked, "nominal", undefined, { spanChannels: false });
    expect(spanned.status).toBe("complete");
    expect(sound(spanned.mesh).area).toBeCloseTo(sound(plain.mesh).area, 11);
    expect(sound(spanned.mesh).minimumObtuseDeg).toBeGreaterThan(19.99);
    return [spanned.mesh.region.length, plain.mesh.region.length];
  };

  it("cost the same however long they are", () => {
    const [short] = counts(rectangle(0, 0, 30, 1));
    for (const length of [100, 1000, 1e5]) expect(counts(rectangle(0, 0, length, 1))[0]).toBe(short);
    expect(short).toBeLessThan(20);
  });

  it("are left alone where they are short", () => {
    const [spanned, plain] = counts(rectangle(0, 0, 13, 1));
    expect(spanned).toBe(plain);
  });

  it("between a hole and the border, 1e-6 wide", () => {
    expect(counts(rectangle(0, 0, 4, 3), [rectangle(1e-6, 1, 2, 2)])[0]).toBeLessThan(250);
  });

  it("with vertices on both sides, and tapered", () => {
    const outer: Ring = [
      [0, 0],
      [40, 0],
      [100, 0.2],
      [100, 1],
      [60, 0.9],
      [0, 1.4],
    ];
    const terminals = [
      { name: "a", parts: [{ ring: 0, edge: 2 }] },
      { name: "b", parts: [{ ring: 0, edge: 5 }] },
    ];
    const [spanned, plain] = counts(outer, [], terminals);
    expect(spanned).toBeLessThan(0.7 * plain);
    // A taper of 1:30 takes a number of cells, each not much narrower than the one before.
    expect(
      counts([
        [0, 0],
        [10, 0],
        [10, 0.3],
        [0, 0.01],
      ])[0],
    ).toBeGreaterThan(20);
  });

  it("of one medium only: a border of regions inside is meshed as usual", () => {
    const checked = accept({ outer: rectangle(0, 0, 1000, 1) }, ends, [rectangle(0, 0, 1000, 0.5)]);
    const { mesh } = meshOf(checked);
    expect(sound(mesh).minimumAngleDeg).toBeGreaterThan(19.99);
  });

  it("that begin at the axis of a body of revolution are cut where the radius grows", () => {
    const disc = accept({ symmetry: "axisymmetric", outer: rectangle(0, 0, 100, 1) }, [
      { name: "a", parts: [{ ring: 0, edge: 0, from: 0, to: 0.01 }] },
      { name: "b", parts: [{ ring: 0, edge: 1 }] },
    ]);
    const { mesh } = meshOf(disc);
    sound(mesh);
    const { xy, triangles } = mesh;
    for (let t = 0; t < triangles.length; t += 3) {
      const radii = Array.from(triangles.subarray(t, t + 3), (v) => xy[2 * v]);
      if (Math.min(...radii) > 0.08) expect(Math.max(...radii) / Math.min(...radii)).toBeLessThan(1.5);
    }
  });
});

describe("corners", () => {
  it("angles of a bend and what meets there", () => {
    const { mesh } = meshOf(accept(BEND, BEND_TERMINALS));
    const corners = cornerAngles(mesh);
    const bent = Array.from(corners.angle.keys()).filter((i) => Math.abs(corners.angle[i] - Math.PI) > 1e-9);
    const degrees = bent.map((i) => Math.round((corners.angle[i] * 180) / Math.PI)).sort((a, b) => a - b);
    expect(degrees).toEqual([90, 90, 90, 90, 90, 270]);
    const terminal = (s: number): number => mesh.sides[s].terminal;
    const mixed = bent.filter((i) => terminal(corners.sideBefore[i]) !== terminal(corners.sideAfter[i]));
    expect(mixed).toHaveLength(4);
  });

  it("a terminal that ends within an edge meets insulation at 180°", () => {
    const { mesh } = meshOf(accept(PLATE, PLATE_TERMINALS));
    const corners = cornerAngles(mesh);
    let ends = 0;
    for (let i = 0; i < corners.vertex.length; i++) {
      if (corners.sideBefore[i] === corners.sideAfter[i]) continue;
      ends++;
      expect(corners.angle[i]).toBeCloseTo(Math.PI, 12);
    }
    expect(ends).toBe(4);
  });
});

describe("locating points", () => {
  it("finds the triangle of every centroid and corner, and none outside", () => {
    const { mesh } = meshOf(accept(PLATE, PLATE_TERMINALS));
    const { xy, triangles } = mesh;
    for (let t = 0; t < triangles.length / 3; t++) {
      const [a, b, c] = triangles.subarray(3 * t, 3 * t + 3);
      const x = (xy[2 * a] + xy[2 * b] + xy[2 * c]) / 3;
      const y = (xy[2 * a + 1] + xy[2 * b + 1] + xy[2 * c + 1]) / 3;
      expect(locate(mesh, x, y)).toBe(t);
      const found = locate(mesh, xy[2 * a], xy[2 * a + 1]);
      expect(Array.from(triangles.subarray(3 * found, 3 * found + 3))).toContain(a);
    }
    expect(locate(mesh, 0.9, 0)).toBe(-1);
  });

  it("agrees with trying all triangles, holes included", () => {
    const outline = accept(PLATE, PLATE_TERMINALS);
    const { mesh } = meshOf(outline);
    const { xy, triangles } = mesh;
    const random = seeded(7);
    for (let k = 0; k < 2000; k++) {
      const x = random() - 0.5;
      const y = random() - 0.5;
      let expected = -1;
      for (let t = 0; t < triangles.length / 3 && expected < 0; t++) {
        const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
        const inside =
          orient(xy[a], xy[a + 1], xy[b], xy[b + 1], x, y) >= 0 &&
          orient(xy[b], xy[b + 1], xy[c], xy[c + 1], x, y) >= 0 &&
          orient(xy[c], xy[c + 1], xy[a], xy[a + 1], x, y) >= 0;
        if (inside) expected = t;
      }
      expect(locate(mesh, x, y)).toBe(expected);
    }
  });
});

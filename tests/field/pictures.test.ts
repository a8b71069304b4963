import { describe, expect, it } from "vitest";
import { boundaryFlux } from "@/lib/engine/field/picture/boundary-flux";
import { fieldLines } from "@/lib/engine/field/picture/contours";
import { sampleLine } from "@/lib/engine/field/picture/line";
import { densityPeak } from "@/lib/engine/field/picture/peak";
import { densityRaster } from "@/lib/engine/field/picture/raster";
import { FieldSampler } from "@/lib/engine/field/picture/sampler";
import { solveField, type FieldSolution, type SheetConductance } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

type Points = [number, number][];

function solve(
  outer: Points,
  terminals: Points[][],
  holes: Points[] = [],
  conductance: SheetConductance = 1,
): FieldSolution {
  const outline = accept(
    { unit: "mm", outer, holes },
    terminals.map((list, k) => ({
      name: `t${k}`,
      segments: list.map(([p, q]): [Points[0], Points[0]] => [p, q]),
    })),
  );
  return solveField({ outline, conductance: [conductance] }, { accuracy: 1e-5 });
}

const strip: Points = [
  [10, 5],
  [14, 5],
  [14, 7],
  [10, 7],
];
const stripEnds: Points[][] = [
  [
    [
      [10, 5],
      [10, 7],
    ],
  ],
  [
    [
      [14, 5],
      [14, 7],
    ],
  ],
];
const bend: Points = [
  [0, 0],
  [4, 0],
  [4, 1],
  [1, 1],
  [1, 4],
  [0, 4],
];
const bendEnds: Points[][] = [
  [
    [
      [4, 0],
      [4, 1],
    ],
  ],
  [
    [
      [0, 4],
      [1, 4],
    ],
  ],
];
const hole: Points = [
  [1.5, 1.5],
  [2.5, 1.5],
  [2.5, 2.5],
  [1.5, 2.5],
];
const square: Points = [
  [0, 0],
  [4, 0],
  [4, 4],
  [0, 4],
];
const holeSides: Points[] = hole.map((p, k) => [p, hole[(k + 1) % 4]]);

describe("a strip", () => {
  // 4 mm long, 2 mm wide, 0.02 S per square: 100 Ω; at 1 V 10 mA, 5 A/m, 250 V/m.
  const { map } = solve(strip, stripEnds, [], 0.02);

  it("has the uniform field at every point, in SI, and none outside", () => {
    const sampler = new FieldSampler(map);
    for (const [x, y] of [
      [10.1, 5.1],
      [12, 6],
      [13.7, 6.9],
    ]) {
      const values = sampler.at(x, y);
      if (!values) throw new Error("outside");
      expect(values.potential).toBeCloseTo((14 - x) / 4, 12);
      expect(values.field[0]).toBeCloseTo(250, 9);
      expect(values.field[1]).toBeCloseTo(0, 9);
      expect(values.density[0]).toBeCloseTo(5, 10);
      expect(values.density[1]).toBeCloseTo(0, 10);
    }
    expect(sampler.at(9.9, 6)).toBeNull();
    expect(map.current).toBeCloseTo(0.01, 13);
  });

  it("gives samples along a line, with gaps outside", () => {
    const line = sampleLine(map, [9, 6], [15, 6], 7);
    expect(line.distanceM[6]).toBeCloseTo(6e-3, 15);
    expect(line.potential.map((v) => (v === null ? null : Math.round(v * 1e9) / 1e9))).toEqual([
      null,
      1,
      0.75,
      0.5,
      0.25,
      0,
      null,
    ]);
    expect(line.density[3]).toBeCloseTo(5, 10);
    expect(line.densityAlong[3]).toBeCloseTo(5, 10);
  });

  it("has straight lines at equal distances, in the outline's coordinates", () => {
    const { equipotentials, streamlines, currentBetweenLines } = fieldLines(map, 4, 5);
    expect(equipotentials.map((e) => e.potential)).toEqual([0.25, 0.5, 0.75]);
    for (const { potential, lines } of equipotentials) {
      expect(lines).toHaveLength(1);
      for (let k = 0; k < lines[0].length; k += 2) expect(lines[0][k]).toBeCloseTo(14 - 4 * potential, 6);
      const ys = [lines[0][1], lines[0][lines[0].length - 1]].sort((a, b) => a - b);
      expect(ys[0]).toBeCloseTo(5, 9);
      expect(ys[1]).toBeCloseTo(7, 9);
    }
    expect(streamlines).toHaveLength(5);
    expect(currentBetweenLines).toBeCloseTo(0.002, 13);
    const heights = streamlines.map((line) => line[1]).sort((a, b) => a - b);
    heights.forEach((y, k) => expect(y).toBeCloseTo(5 + 2 * ((k + 0.5) / 5), 6));
    for (const line of streamlines) {
      expect(line[0]).toBeCloseTo(10, 9);
      expect(line[line.length - 2]).toBeCloseTo(14, 9);
    }
  });

  it("has a raster of the density and a bounded peak", () => {
    const raster = densityRaster(map, 40);
    expect([raster.columns, raster.rows]).toEqual([40, 20]);
    expect(raster.origin[0]).toBeCloseTo(10.05, 9);
    expect(raster.origin[1]).toBeCloseTo(5.05, 9);
    for (const value of raster.density) expect(value).toBeCloseTo(5, 8);
    const peak = densityPeak(map, null);
    expect(peak.unbounded).toBe(false);
    expect(peak.density).toBeCloseTo(5, 8);
    expect(peak.distanceM).toBe(0);
  });
});

describe("a bend", () => {
  const { map, resistance } = solve(bend, bendEnds);

  it("has an unbounded density at the inner corner and says at what distance it was read", () => {
    const peak = densityPeak(map, null);
    expect(peak.unbounded).toBe(true);
    expect(peak.position[0]).toBeCloseTo(1, 9);
    expect(peak.position[1]).toBeCloseTo(1, 9);
    expect(peak.distanceM).toBeGreaterThan(0);
    expect(peak.distanceM).toBeLessThan(1e-4);
    // r^(-1/3): at an eighth of the distance it is twice as high.
    const sampler = new FieldSampler(map);
    const at = (d: number): number => Math.hypot(...(sampler.at(1 - d, 1 - d)?.density ?? [NaN, NaN]));
    expect(at(1e-3) / at(8e-3)).toBeCloseTo(2, 1);
  });

  it("carries the whole current through each terminal", () => {
    const total = [0, 0];
    for (const edge of boundaryFlux(map)) total[edge.terminal] += edge.current;
    expect(total[0]).toBeCloseTo(-map.current, 12);
    expect(total[1]).toBeCloseTo(map.current, 12);
    expect(1 / map.current).toBeCloseTo(resistance?.value ?? NaN, 3);
  });

  it("has stream lines that never end inside and equipotentials from wall to wall", () => {
    const { streamlines, equipotentials } = fieldLines(map, 12, 9);
    expect(streamlines).toHaveLength(9);
    for (const line of streamlines) {
      expect(line[0]).toBeCloseTo(4, 6);
      expect(line[line.length - 1]).toBeCloseTo(4, 6);
    }
    for (const { lines } of equipotentials) expect(lines).toHaveLength(1);
  });
});

describe("domains with cuts", () => {
  it("a hole as a terminal: stream lines cross the cut without a break", () => {
    const { map } = solve(
      square,
      [
        holeSides,
        [
          [
            [4, 0],
            [4, 4],
          ],
          [
            [0, 0],
            [0, 1],
          ],
        ],
      ],
      [hole],
    );
    const { streamlines } = fieldLines(map, 10, 24);
    expect(streamlines).toHaveLength(24);
    for (const line of streamlines) {
      const [x, y] = [line[0], line[1]];
      expect(Math.max(Math.abs(x - 2), Math.abs(y - 2))).toBeCloseTo(0.5, 6);
      const [u, v] = [line[line.length - 2], line[line.length - 1]];
      expect(Math.abs(u - 4) < 1e-6 || (Math.abs(u) < 1e-6 && v < 1.001)).toBe(true);
    }
  });

  it("three terminals: the picture is for one volt between the first two, the third floating", () => {
    const { map, pairs } = solve(square, [
      [
        [
          [0, 0],
          [0, 4],
        ],
      ],
      [
        [
          [4, 0],
          [4, 4],
        ],
      ],
      [
        [
          [1.5, 4],
          [2.5, 4],
        ],
      ],
    ]);
    const floating = pairs?.[0].floating;
    if (!floating) throw new Error("no pair");
    expect(1 / map.current).toBeCloseTo(floating.value, 4);
    const sampler = new FieldSampler(map);
    expect(sampler.at(1e-9, 2)?.potential).toBeCloseTo(1, 6);
    expect(sampler.at(4 - 1e-9, 2)?.potential).toBeCloseTo(0, 6);
    expect(sampler.at(2, 4 - 1e-9)?.potential).toBeCloseTo(0.5, 5);
    const total = [0, 0, 0];
    for (const edge of boundaryFlux(map)) total[edge.terminal] += edge.current;
    expect(total[2]).toBeCloseTo(0, 5);
  });

  it("can be sent as it is: plain data and typed arrays", () => {
    const { map } = solve(
      square,
      [
        [
          [
            [0, 0],
            [0, 4],
          ],
        ],
        [
          [
            [4, 0],
            [4, 4],
          ],
        ],
      ],
      [hole],
    );
    const copy = structuredClone(map);
    expect(new FieldSampler(copy).at(1, 1)).toEqual(new FieldSampler(map).at(1, 1));
    expect(new FieldSampler(copy).at(2, 2)).toBeNull();
  });
});

import { describe, expect, it } from "vitest";
import { plotSvg } from "@/lib/engine/field/picture/plot-svg";
import { regionBorders } from "@/lib/engine/field/picture/region-borders";
import { solveField } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

type Point = [number, number];

const STRIP: Point[] = [
  [0, 0],
  [24, 0],
  [24, 8],
  [0, 8],
];
const PATCH: Point[] = [
  [8, 2],
  [16, 2],
  [16, 8],
  [8, 8],
];

function mapWith(regions: Point[][]) {
  const outline = accept(
    { unit: "mm", outer: STRIP },
    [
      { name: "in", parts: [{ ring: 0, edge: 3 }] },
      { name: "out", parts: [{ ring: 0, edge: 1 }] },
    ],
    regions,
  );
  const conductance = [0.02, ...regions.map(() => 0.2)];
  return solveField({ outline, conductance }, { accuracy: 1e-3 }).map;
}

describe("borders between media", () => {
  it("are drawn where a region ends inside the conductor, not along its border", () => {
    const map = mapWith([PATCH]);
    const segments = regionBorders(map);
    const length = segments.reduce((sum, [ax, ay, bx, by]) => sum + Math.hypot(bx - ax, by - ay), 0);
    // Two sides of 6 mm and one of 8; the fourth lies on the outline.
    expect(length).toBeCloseTo(20, 9);
    expect(segments.every(([, ay, , by]) => Math.min(ay, by) >= 2 - 1e-9)).toBe(true);
    const text = { title: "R", subtitle: "", terminalNames: ["in", "out"], unit: "mm" };
    expect(plotSvg(map, text)).toContain('stroke-width="2" stroke-linecap="round"');
    expect(plotSvg(mapWith([]), text)).not.toContain('stroke-width="2" stroke-linecap="round"');
  });

  it("are none in one medium", () => expect(regionBorders(mapWith([]))).toEqual([]));
});

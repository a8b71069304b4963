import { describe, expect, it } from "vitest";
import type { RingElement } from "@/lib/engine/field/outline/schema";
import { densityPeak } from "@/lib/engine/field/picture/peak";
import { solveField } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

const SQUARE: RingElement[] = [
  [-20, -20],
  [20, -20],
  [20, 20],
  [-20, 20],
];

function peakWith(holes: RingElement[][], outer = SQUARE, ends: readonly [number, number] = [3, 1]) {
  const outline = accept({ unit: "mm", outer, holes }, [
    { name: "in", parts: [{ ring: 0, edge: ends[0], from: 0, to: 1 }] },
    { name: "out", parts: [{ ring: 0, edge: ends[1], from: 0, to: 1 }] },
  ]);
  return densityPeak(solveField({ outline, conductance: [1] }, { accuracy: 1e-4 }).map, 1);
}

describe("the peak on an outline with arcs", () => {
  it("is twice the density around at a small round hole, and not unbounded at its chords", () => {
    const hole: RingElement[] = [
      { arcTo: [-1, 0], center: [0, 0], clockwise: false },
      { arcTo: [1, 0], center: [0, 0], clockwise: false },
    ];
    const peak = peakWith([hole]);
    expect(peak.unbounded).toBe(false);
    // A round hole in a wide sheet doubles the density beside it (potential flow around a cylinder; from memory).
    // Thirty chords, whose means are the arc's density but for terms in the square of their turn.
    expect(peak.density / 25).toBeGreaterThan(1.98);
    expect(peak.density / 25).toBeLessThan(2.02);
    expect(peak.spread).toBeGreaterThan(Math.abs(peak.density / 50 - 1));
    expect(peak.spread).toBeLessThan(0.01);
    expect(Math.abs(peak.position[0])).toBeLessThan(0.2);
    expect(Math.abs(peak.position[1])).toBeCloseTo(1, 1);
  });

  it("is I/(2πr) at the inner one of two round terminals, and V/(πr) at the inside of a half ring", () => {
    const circle = (r: number): RingElement[] => [
      { arcTo: [-r, 0], center: [0, 0], clockwise: false },
      { arcTo: [r, 0], center: [0, 0], clockwise: false },
    ];
    const outline = accept({ unit: "mm", outer: circle(20), holes: [circle(5)] }, [
      { name: "in", parts: [0, 1].map((edge) => ({ ring: 1, edge, from: 0, to: 1 })) },
      { name: "out", parts: [0, 1].map((edge) => ({ ring: 0, edge, from: 0, to: 1 })) },
    ]);
    const half: RingElement[] = [
      [5, 0],
      [20, 0],
      { arcTo: [-20, 0], center: [0, 0], clockwise: false },
      [-5, 0],
      { arcTo: [5, 0], center: [0, 0], clockwise: true },
    ];
    for (const accuracy of [1e-2, 1e-4]) {
      const { map } = solveField({ outline, conductance: [1] }, { accuracy });
      // One volt drives 2π/ln(20/5) amperes.
      expect(densityPeak(map, 1).density * 0.005 * Math.log(4)).toBeCloseTo(1, 3);
    }
    const inside = peakWith([], half, [0, 2]);
    expect(inside.density * Math.PI * 0.005).toBeCloseTo(1, 3);
    expect(Math.hypot(...inside.position)).toBeCloseTo(5, 1);
  });

  it("is unbounded where arcs meet at a re-entrant corner", () => {
    // A lens with its points across the flow.
    const lens: RingElement[] = [
      { arcTo: [0, -4], center: [3, 0], clockwise: false },
      { arcTo: [0, 4], center: [-3, 0], clockwise: false },
    ];
    const peak = peakWith([lens]);
    expect(peak.unbounded).toBe(true);
    expect(Math.abs(peak.position[1])).toBeCloseTo(4, 9);
  });

  it("is bounded at a rounded inner corner and unbounded at a sharp one", () => {
    const bend = (corner: RingElement[]): RingElement[] => [
      [0, 0],
      [40, 0],
      [40, 10],
      ...corner,
      [10, 40],
      [0, 40],
    ];
    const rounded = bend([[12, 10], { arcTo: [10, 12], center: [12, 12], clockwise: true }]);
    expect(peakWith([], rounded, [1, 5]).unbounded).toBe(false);
    expect(peakWith([], bend([[10, 10]]), [1, 4]).unbounded).toBe(true);
  });
});

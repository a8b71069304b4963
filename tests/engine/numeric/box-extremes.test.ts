import { describe, expect, it } from "vitest";
import { boxExtremes, NoValue } from "@/lib/engine/numeric/box-extremes";

const options = { noise: 1e-12, lines: 40, points: 4096 };

/** The extremes on a dense grid: never beyond the true ones, and near them. */
function dense(
  f: (x: Float64Array) => number,
  from: number[],
  to: number[],
  levels: number,
): [number, number] {
  const n = from.length;
  let low = Infinity;
  let high = -Infinity;
  const x = new Float64Array(n);
  for (let k = 0; k < levels ** n; k++) {
    for (let i = 0, rest = k; i < n; i++, rest = Math.floor(rest / levels)) {
      x[i] = from[i] + ((to[i] - from[i]) * (rest % levels)) / (levels - 1);
    }
    const value = f(x);
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return [low, high];
}

describe("extremes on a box", () => {
  it("lie at corners where the function is monotone, to the last bit", () => {
    const f = ([a, b, c]: Float64Array): number => a / (b * c);
    const found = boxExtremes(f, [1, 2, 3], [1.1, 2.2, 3.3], options);
    expect(found.low).toBe(1 / (2.2 * 3.3));
    expect(found.high).toBe(1.1 / (2 * 3));
    expect(found.monotone).toEqual([true, true, true]);
  });

  it.each<[string, (x: Float64Array) => number, number[], number[], boolean[]]>([
    ["a bowl", ([x, y]) => (x - 0.3) ** 2 + (y + 0.2) ** 2, [-1, -1], [1, 1], [false, false]],
    [
      "a ridge in one of two",
      ([x, y]) => y * Math.exp(-((x - 0.613) ** 2) * 200),
      [0, 1],
      [1, 2],
      [false, true],
    ],
    ["a saddle", ([x, y]) => x * y, [-1, -2], [1, 3], [false, false]],
    [
      "two hills",
      ([x]) => Math.exp(-((x - 0.2) ** 2) * 90) + 1.1 * Math.exp(-((x - 0.83) ** 2) * 90),
      [0],
      [1],
      [false],
    ],
    [
      "waves",
      ([x, y, z]) => Math.sin(5 * x) + Math.cos(4 * y) * z,
      [0, 0, -1],
      [2, 2, 1],
      [false, false, false],
    ],
  ])("of %s agree with a dense grid", (_, f, from, to, monotone) => {
    const found = boxExtremes(f, from, to, options);
    const [low, high] = dense(f, from, to, [4001, 401, 101][from.length - 1]);
    const span = high - low;
    expect(found.low).toBeLessThanOrEqual(low + 1e-12 * span);
    expect(found.high).toBeGreaterThanOrEqual(high - 1e-12 * span);
    // A grid misses the true extreme by its spacing squared at most.
    expect(low - found.low).toBeLessThan(1e-3 * span);
    expect(found.high - high).toBeLessThan(1e-3 * span);
    expect(found.monotone).toEqual(monotone);
  });

  it("tells the point that has no value", () => {
    const f = ([x]: Float64Array): number => (x > 0.9 ? Number.NaN : x);
    expect(() => boxExtremes(f, [0], [1], options)).toThrow(NoValue);
  });
});

import { expect, it } from "vitest";
import { CompensatedSum } from "@/lib/engine/numeric/compensated-sum";
import { log1pRatio, overAtan, overLog1p } from "@/lib/engine/numeric/stable-ratios";

it("a compensated sum keeps what plain addition loses", () => {
  const sum = new CompensatedSum();
  for (const term of [1, 1e100, 1, -1e100]) sum.add(term);
  expect(sum.value).toBe(2);
  const tenths = new CompensatedSum();
  for (let i = 0; i < 1_000_000; i++) tenths.add(0.1);
  expect(tenths.value).toBeCloseTo(100000, 10);
  const over = new CompensatedSum();
  over.add(1e308);
  over.add(1e308);
  expect(over.value).toBe(Infinity);
});

it("the ratios that tend to 1 do so without losing digits", () => {
  expect(log1pRatio(0)).toBe(1);
  expect(log1pRatio(1e-13)).toBeCloseTo(1 - 0.5e-13, 16);
  expect(overLog1p(0)).toBe(1);
  expect(overLog1p(1e-20)).toBe(1);
  expect(overAtan(0)).toBe(1);
  expect(overAtan(1)).toBeCloseTo(4 / Math.PI, 15);
});

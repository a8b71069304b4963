import { scaleLinear } from "d3-scale";
import { expect, test } from "vitest";
import { countTicks } from "@/app/console/_parts/bar-chart";

const ticks = (most: number) => countTicks(scaleLinear([0, most], [100, 0]).nice(4));

test("the numbers beside counts are whole, however few there are", () => {
  expect(ticks(1)).toEqual([0, 1]);
  expect(ticks(2)).toEqual([0, 1, 2]);
  expect(ticks(150)).toEqual([0, 50, 100, 150]);
});

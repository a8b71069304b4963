import { scaleLinear, scaleLog } from "d3-scale";
import { describe, expect, test } from "vitest";
import { decadeTicks, roundDomain, roundLabels, roundTicks, scaleOf } from "@/app/_ui/plot/scale";

/** A fixed sequence of domains, from parts in 10^9 to 10^9. */
const DOMAINS = Array.from({ length: 400 }, (_, index) => {
  const at = (k: number) => ((index * 7919 + k * 104_729) % 9973) / 9973;
  const size = 10 ** Math.round(at(1) * 18 - 9);
  const from = index % 3 === 0 ? 0 : (at(2) - 0.5) * size;
  return [from, from + (0.05 + at(3)) * size] as const;
});

const RANGE = [180, 10] as const;

describe("the scales of line plots", () => {
  test("have the ticks, labels, round ends and places of d3-scale, the reference here", () => {
    for (const domain of DOMAINS) {
      const reference = scaleLinear(domain, RANGE);
      for (const count of [3, 5, 8]) {
        expect(roundTicks(domain, count)).toEqual(reference.ticks(count).map((tick) => tick + 0));
        const label = roundLabels(domain, count);
        expect(roundTicks(domain, count).map(label)).toEqual(
          reference.ticks(count).map(reference.tickFormat(count)),
        );
      }
      expect(roundDomain(false, domain)).toEqual(reference.copy().nice().domain());
      const middle = domain[0] + (domain[1] - domain[0]) / 3;
      expect(scaleOf(false, domain, RANGE)(middle)).toBeCloseTo(reference(middle), 9);
    }
  });

  test("do so over decades too", () => {
    for (const [, end] of DOMAINS) {
      for (const ratio of [1.05, 3, 40, 1e4, 1e12]) {
        const domain = [Math.abs(end), Math.abs(end) * ratio] as const;
        const reference = scaleLog(domain, RANGE);
        expect(decadeTicks(domain)).toEqual(reference.ticks());
        expect(roundDomain(true, domain)).toEqual(reference.copy().nice().domain());
        const middle = domain[0] * Math.sqrt(ratio);
        expect(scaleOf(true, domain, RANGE)(middle)).toBeCloseTo(reference(middle), 9);
      }
    }
  });

  test("have no place for what a logarithm has none for, and one for a domain without a width", () => {
    const log = scaleOf(true, [1, 10], RANGE);
    expect([Number.isFinite(log(0)), Number.isFinite(log(-1))]).toEqual([false, false]);
    const flat = scaleOf(false, [1e300, 1e300], RANGE);
    expect(flat(1e300)).toBe(95);
    expect(roundTicks(flat.domain, 5)).toEqual([1e300]);
    expect(roundDomain(false, flat.domain)).toEqual(flat.domain);
  });
});

/** The means of 1/distance, in the corners where a careless form loses its digits. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  asinhIncrease,
  inclinedMean,
  inlineMean,
  parallelMean,
} from "@/lib/engine/shape/earthing/line-potential";
import { type D, deviationFrom, exact } from "../../../support/shape-law";
import { armMean } from "../../../support/thin-wires";

const decade = (from: number, to: number) =>
  fc.double({ min: from, max: to, noNaN: true }).map((x) => 10 ** x);

/** Φ(x) = x·asinh(x/d) − √(x²+d²) with 60 digits, whose second differences are the means. */
function phi(x: InstanceType<typeof D>, d: InstanceType<typeof D>) {
  return x.times(x.div(d).asinh()).minus(x.times(x).plus(d.times(d)).sqrt());
}

describe("inlineMean", () => {
  it("agrees with the second difference of 60 digits to 3e-14, segments of 1e-6 to 1e6 of each other", () => {
    fc.assert(
      fc.property(
        decade(-6, 0),
        decade(-6, 0),
        decade(-8, 3),
        decade(-5, 0),
        fc.boolean(),
        (l1, l2, g, d, touching) => {
          const gap = touching ? 0 : g;
          const [a, b, c, e] = [exact(l1), exact(l2), exact(gap), exact(d)];
          const sum = phi(c.plus(a).plus(b), e)
            .minus(phi(c.plus(a), e))
            .minus(phi(c.plus(b), e))
            .plus(phi(c, e));
          expect(deviationFrom(inlineMean(gap, l1, l2, d), sum.div(a).div(b))).toBeLessThan(3e-14);
        },
      ),
      { seed: 3, numRuns: 400 },
    );
  });

  it("is symmetric in its segments, and 1/distance far away", () => {
    expect(inlineMean(0.3, 2, 1e-5, 0.01)).toBe(inlineMean(0.3, 1e-5, 2, 0.01));
    expect(Math.abs(inlineMean(1e9, 1, 2, 0.5) * (1e9 + 1.5) - 1)).toBeLessThan(1e-15);
  });

  it("of two halves of a segment, with their own, is the whole's own mean", () => {
    const [l, d] = [3, 0.008];
    const halves = (parallelMean(l / 2, d) + inlineMean(0, l / 2, l / 2, d)) / 2;
    expect(Math.abs(halves / parallelMean(l, d) - 1)).toBeLessThan(1e-15);
  });
});

describe("parallelMean", () => {
  it("is 1/distance for a point, 2(ln 2l/d − 1)/l for a long wire", () => {
    expect(Math.abs(parallelMean(1e-9, 2) * 2 - 1)).toBeLessThan(1e-15);
    expect(Math.abs(parallelMean(1, 1e-12) / (2 * (Math.log(2e12) - 1)) - 1)).toBeLessThan(1e-12);
  });
});

describe("asinhIncrease", () => {
  it("keeps its digits where both are close", () => {
    const [q, step] = [1e3, 1e-9];
    const expected = exact(q).plus(exact(step)).asinh().minus(exact(q).asinh());
    expect(deviationFrom(asinhIncrease(q, step), expected)).toBeLessThan(1e-15);
  });
});

describe("inclinedMean", () => {
  it("agrees with integration over one arm, from close planes to far ones", () => {
    const angles = fc.constantFrom(
      Math.PI / 4,
      Math.PI / 3,
      Math.PI / 2,
      (2 * Math.PI) / 3,
      (3 * Math.PI) / 4,
    );
    fc.assert(
      fc.property(angles, decade(-5, 2), (angle, d) => {
        expect(Math.abs(inclinedMean(1, angle, d) / armMean(0, 1, 0, 1, angle, d) - 1)).toBeLessThan(1e-11);
      }),
      { seed: 4, numRuns: 200 },
    );
  });

  it("of arms in one line is that of two segments end to end", () => {
    expect(inclinedMean(2, Math.PI, 0.01)).toBe(inlineMean(0, 2, 2, 0.01));
    expect(Math.abs(inclinedMean(2, Math.PI - 1e-5, 0.01) / inlineMean(0, 2, 2, 0.01) - 1)).toBeLessThan(
      1e-9,
    );
  });

  it("falls to 1/distance far away", () => {
    expect(Math.abs(inclinedMean(1, 1, 1e7) * 1e7 - 1)).toBeLessThan(1e-13);
  });
});

/** The axial shapes beyond bar, wire and tube: closed forms with 60 digits, references, bounds by curvature. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { integrate } from "@/lib/engine/numeric/gauss-kronrod";
import { mediaFactor } from "../../../support/media-law";
import { D, deviationFrom, exact, law, referenceValue, tubes, type Given } from "../../../support/shape-law";

const decade = (from: number, to: number) =>
  fc.double({ min: from, max: to, noNaN: true }).map((x) => 10 ** x);
const pi = D.acos(-1);
const off = (found: number, expected: number) => Math.abs(found / expected - 1);

describe("closed forms with 60 digits, to 1e-13 over sizes of 1e-9 to 1e6 m", () => {
  const size = decade(-9, 6);

  it("etched-trace", () => {
    fc.assert(
      fc.property(size, size, size, size, (length, baseWidth, topWidth, thickness) => {
        const mean = exact(baseWidth).plus(exact(topWidth)).div(2);
        const expected = exact(length).div(exact(thickness)).div(mean);
        expect(
          deviationFrom(law("etched-trace", { length, baseWidth, topWidth, thickness }), expected),
        ).toBeLessThan(1e-15);
      }),
      { seed: 1, numRuns: 300 },
    );
  });

  it("via-barrel, platings from 1e-12 to 1e3 of the hole", () => {
    fc.assert(
      fc.property(
        size,
        size,
        decade(-12, 3),
        fc.integer({ min: 1, max: 1000 }),
        (height, holeDiameter, ratio, count) => {
          const plating = holeDiameter * ratio;
          const area = pi
            .times(exact(plating))
            .times(exact(holeDiameter).plus(exact(plating)))
            .times(count);
          const found = law("via-barrel", { height, holeDiameter, plating, count });
          expect(deviationFrom(found, exact(height).div(area))).toBeLessThan(2e-15);
        },
      ),
      { seed: 2, numRuns: 300 },
    );
  });

  it("box-tube, walls from 1e-12 of the smaller side to all of it", () => {
    fc.assert(
      fc.property(size, size, size, decade(-12, 0), (length, outerWidth, outerHeight, part) => {
        const wall = 0.5 * part * Math.min(outerWidth, outerHeight) * (1 - 1e-13);
        fc.pre(2 * wall < Math.min(outerWidth, outerHeight));
        const t = exact(wall);
        const rest = exact(outerWidth).plus(exact(outerHeight)).minus(t.times(2));
        const found = law("box-tube", { length, outerWidth, outerHeight, wall });
        expect(deviationFrom(found, exact(length).div(t.times(2).times(rest)))).toBeLessThan(2e-15);
      }),
      { seed: 3, numRuns: 300 },
    );
  });

  it("stranded-conductor", () => {
    fc.assert(
      fc.property(
        size,
        size,
        fc.integer({ min: 1, max: 1e6 }),
        fc.double({ min: 1, max: 10, noNaN: true }),
        (length, strandDiameter, strands, layFactor) => {
          const area = exact(strandDiameter).pow(2).times(pi).div(4).times(strands);
          const found = law("stranded-conductor", { length, strands, strandDiameter, layFactor });
          expect(deviationFrom(found, exact(length).times(exact(layFactor)).div(area))).toBeLessThan(2e-15);
        },
      ),
      { seed: 4, numRuns: 300 },
    );
  });

  it("helical-winding", () => {
    fc.assert(
      fc.property(
        decade(-6, 6),
        size,
        decade(-9, 9),
        decade(-9, -0.01),
        (turns, meanDiameter, steep, thin) => {
          const pitch = meanDiameter * steep;
          const wireDiameter = meanDiameter * thin;
          const turn = pi.times(exact(meanDiameter)).pow(2).plus(exact(pitch).pow(2)).sqrt();
          const expected = turn.times(exact(turns)).times(4).div(pi).div(exact(wireDiameter).pow(2));
          const found = law("helical-winding", { turns, meanDiameter, pitch, wireDiameter });
          expect(deviationFrom(found, expected)).toBeLessThan(3e-15);
        },
      ),
      { seed: 5, numRuns: 300 },
    );
  });

  it("flat-spiral, from nearly a circle to nearly a ray", () => {
    fc.assert(
      fc.property(decade(-6, 5), size, decade(-12, 9), (turns, innerRadius, wide) => {
        const pitch = innerRadius * wide;
        const width = innerRadius * 1e-12;
        const b = exact(pitch).div(pi.times(2));
        // (1/2b)[r·√(r²+b²) + b²·asinh(r/b)] between the two radii.
        const part = (r: InstanceType<typeof D>) =>
          r
            .times(r.pow(2).plus(b.pow(2)).sqrt())
            .plus(b.pow(2).times(r.div(b).asinh()))
            .div(b.times(2));
        const inner = exact(innerRadius);
        const arc = part(inner.plus(exact(pitch).times(exact(turns)))).minus(part(inner));
        const found = law("flat-spiral", { turns, innerRadius, pitch, width, thickness: 1 });
        expect(deviationFrom(found, arc.div(exact(width)))).toBeLessThan(4e-15);
      }),
      { seed: 6, numRuns: 300 },
    );
  });

  it("clad-wire, resistivities 1e-12 to 1e12 of each other", () => {
    fc.assert(
      fc.property(size, size, decade(-9, 3), decade(-12, 12), (length, coreDiameter, thin, contrast) => {
        const claddingThickness = coreDiameter * thin;
        const [d, t, L] = [exact(coreDiameter), exact(claddingThickness), exact(length)];
        const conductance = d
          .pow(2)
          .times(pi)
          .div(4)
          .div(L)
          .plus(pi.times(t).times(d.plus(t)).div(L).div(exact(contrast)));
        const found = mediaFactor(
          "clad-wire",
          { length, coreDiameter, claddingThickness },
          { core: 1, cladding: contrast },
        );
        expect(deviationFrom(found.value, new D(1).div(conductance))).toBeLessThan(found.relativeError);
      }),
      { seed: 7, numRuns: 300 },
    );
  });
});

describe("reference values with 50 digits", () => {
  const close = (id: string, shape: string, given: (i: Readonly<Record<string, number>>) => Given) => {
    const { inputs, value, condition = 4 } = referenceValue(id);
    expect(deviationFrom(inputs.rho * law(shape, given(inputs)), value)).toBeLessThan(
      (condition + 2) * 2.3e-16,
    );
  };

  it("A-trapezoid-1", () =>
    close("A-trapezoid-1", "etched-trace", (i) => ({
      length: i.L,
      baseWidth: i.wb,
      topWidth: i.wt,
      thickness: i.t,
    })));

  it("A-etchfactor-1: the top is narrower by 2t/ef", () =>
    close("A-etchfactor-1", "etched-trace", (i) => ({
      length: i.L,
      baseWidth: i.wb,
      topWidth: i.wb - (2 * i.t) / i.ef,
      thickness: i.t,
    })));

  it("A-via-1: its D is the drill, so the finished hole is D − 2t", () =>
    close("A-via-1", "via-barrel", (i) => ({
      height: i.h,
      holeDiameter: i.D - 2 * i.t,
      plating: i.t,
      count: 1,
    })));

  it("A-boxtube-1", () =>
    close("A-boxtube-1", "box-tube", (i) => ({ length: i.L, outerWidth: i.w, outerHeight: i.h, wall: i.t })));

  it("A-helix-1", () =>
    close("A-helix-1", "helical-winding", (i) => ({
      turns: i.N,
      meanDiameter: i.D,
      pitch: i.p,
      wireDiameter: i.d,
    })));

  it("A-spiral-1", () =>
    close("A-spiral-1", "flat-spiral", (i) => ({
      turns: i.N,
      innerRadius: i.r0,
      pitch: i.s,
      width: i.w,
      thickness: i.t,
    })));

  it("A-strand-1: a lay of m mean diameters makes the factor √(1+(π/m)²)", () =>
    close("A-strand-1", "stranded-conductor", (i) => ({
      length: i.L,
      strands: i.n,
      strandDiameter: i.d,
      layFactor: Math.hypot(1, Math.PI / i.m),
    })));

  it("A-clad-1", () => {
    const { inputs: i, value } = referenceValue("A-clad-1");
    const found = mediaFactor(
      "clad-wire",
      { length: i.L, coreDiameter: i.dc, claddingThickness: i.t },
      { core: i.rc, cladding: i.rs },
    );
    expect(deviationFrom(found.value, value)).toBeLessThan(1e-15);
  });
});

describe("graded across: the tubes make up the whole", () => {
  it.each([
    ["etched-trace", { length: 2, baseWidth: 3, topWidth: 1, thickness: 0.5 }],
    ["etched-trace", { length: 2, baseWidth: 1e-9, topWidth: 1, thickness: 0.5 }],
    ["via-barrel", { height: 1.6e-3, holeDiameter: 2.5e-4, plating: 2.5e-5, count: 3 }],
  ] as const)("%s", (id, given) => {
    for (const { tube, extent } of tubes(id, given).across) {
      const conductance = integrate(tube, 0, extent, { relative: 1e-13 }).value;
      expect(off(conductance * law(id, given), 1)).toBeLessThan(1e-12);
    }
  });
});

import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { computeNetwork, computeResistance, InputError, libraryMaterial } from "@/lib/engine";

const context = { material: libraryMaterial };
const element = (name: string, from: string, to: string, resistance: unknown) => ({
  name,
  between: [from, to],
  resistance,
});
const solve = (elements: readonly unknown[], method?: string, more: object = {}) =>
  computeNetwork(
    { elements, ports: ["in", "out"], ...(method ? { uncertainty: { method } } : {}), ...more },
    context,
  );
const uncertaintyOf = (elements: readonly unknown[], method: string) => {
  const { uncertainty } = solve(elements, method);
  if (!uncertainty) throw new Error("no uncertainty");
  return uncertainty;
};
const near = (value: number, expected: number, part = 1e-12) =>
  expect(Math.abs(value / expected - 1)).toBeLessThan(part);

describe("propagation by hand (JCGM 100, 5.1.2)", () => {
  test("in series the variances add", () => {
    const found = uncertaintyOf(
      [
        element("a", "in", "m", { value: 3, tolerance: 0.3 }),
        element("b", "m", "out", { value: 5, tolerance: "4 %", distribution: "normal" }),
        element("c", "m", "out", 1e9),
      ],
      "propagation",
    );
    const [u, v] = [0.3 / Math.sqrt(3), 0.1];
    near(found.standard, Math.hypot(u, v), 1e-7);
    near(found.high - found.low, 2 * 1.959963984540054 * found.standard);
    expect(found.contributions.map((part) => part.element)).toEqual(["a", "b"]);
    near(found.contributions[0].share, u ** 2 / (u ** 2 + v ** 2), 1e-7);
    near(found.contributions[1].standard, 0.1);
  });

  test("in parallel each counts by the square of its part of the current", () => {
    const found = uncertaintyOf(
      [
        element("a", "in", "out", { value: 3, tolerance: "1 %" }),
        element("b", "out", "in", { value: 6, tolerance: "1 %" }),
      ],
      "propagation",
    );
    near(found.standard, Math.hypot((4 / 9) * 0.03, (1 / 9) * 0.06) / Math.sqrt(3));
    near(found.contributions[0].sensitivity, 4 / 9);
  });

  test("tolerances of unequal sides move the range", () => {
    const found = uncertaintyOf([element("a", "in", "out", { value: 10, plus: 0.6 })], "propagation");
    near((found.low + found.high) / 2, 10.3);
  });

  test("unequal strays side by side bend the resistance: the range reaches their ends", () => {
    const wide = { value: 1, tolerance: "90 %" };
    const { uncertainty, cautions } = solve(
      [element("a", "in", "out", wide), element("b", "in", "out", wide)],
      "propagation",
    );
    expect(cautions.some((caution) => /first-order propagation is rough/.test(caution))).toBe(true);
    expect(uncertainty?.low).toBeLessThanOrEqual(0.1 / 2);
    expect(uncertainty?.high).toBeGreaterThanOrEqual(1.9 / 2);
  });
});

describe("worst case", () => {
  const bridge = (values: readonly unknown[]) =>
    [
      ["in", "l"],
      ["l", "out"],
      ["in", "r"],
      ["r", "out"],
      ["l", "r"],
    ].map(([from, to], k) => element(`e${k}`, from, to, values[k]));

  test("is all low and all high, and holds every bridge within", () => {
    const value = fc.double({ min: 0.1, max: 10, noNaN: true });
    const part = fc.double({ min: 0, max: 0.9, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(fc.tuple(value, part, fc.double({ min: -1, max: 1, noNaN: true })), {
          minLength: 5,
          maxLength: 5,
        }),
        (drawn) => {
          const found = uncertaintyOf(
            bridge(drawn.map(([ohm, wide]) => ({ value: ohm, tolerance: ohm * wide }))),
            "worst-case",
          );
          const plain = (values: readonly number[]) => solve(bridge(values)).resistance.value;
          near(found.low, plain(drawn.map(([ohm, wide]) => ohm - ohm * wide)));
          near(found.high, plain(drawn.map(([ohm, wide]) => ohm + ohm * wide)));
          const within = plain(drawn.map(([ohm, wide, at]) => ohm * (1 + at * wide)));
          expect(within).toBeGreaterThanOrEqual(found.low * (1 - 1e-12));
          expect(within).toBeLessThanOrEqual(found.high * (1 + 1e-12));
          expect(found.coverage).toBe(1);
        },
      ),
      { seed: 8, numRuns: 100 },
    );
  });

  test("the requirement is held against it", () => {
    const elements = [element("a", "in", "out", { value: 10, tolerance: 1 })];
    const verdict = (max: number, method?: string) =>
      solve(elements, method, { requirement: { max } }).verdict;
    expect([verdict(10.5), verdict(10.5, "worst-case"), verdict(11.5, "worst-case")]).toEqual([
      "met",
      "undecided",
      "met",
    ]);
  });
});

describe("elements with requests of their own", () => {
  const bar = (tolerance: string) => ({
    shape: "bar",
    dimensions: { length: "1 m", width: { value: "50 mm", tolerance }, thickness: "10 mm" },
    medium: { material: "copper-annealed" },
  });
  const requested = (name: string, from: string, to: string, tolerance: string) => ({
    name,
    between: [from, to],
    request: bar(tolerance),
  });

  test("one alone strays as its request does", () => {
    for (const method of ["propagation", "worst-case"] as const) {
      const { uncertainty: single } = computeResistance({ ...bar("2 %"), uncertainty: { method } }, context);
      const found = uncertaintyOf([requested("bar", "in", "out", "2 %")], method);
      if (!single) throw new Error("no uncertainty");
      near(found.standard, single.standard);
      near(found.low, single.low);
      near(found.high, single.high);
    }
  });

  test("two of one material stray together with it, with their widths apart", () => {
    const { uncertainty: single } = computeResistance(
      { ...bar("2 %"), uncertainty: { method: "propagation" } },
      context,
    );
    const part = (input: string) => {
      const found = single?.contributions.find((entry) => entry.input === input);
      return (found?.sensitivity ?? 0) * (found?.standard ?? 0);
    };
    const [width, material] = [part("dimensions.width"), part("medium.material")];
    expect(material).toBeGreaterThan(0);
    const found = uncertaintyOf(
      [requested("a", "in", "m", "2 %"), requested("b", "m", "out", "2 %")],
      "propagation",
    );
    near(found.standard, Math.hypot(Math.SQRT2 * width, 2 * material), 1e-9);
    expect(found.contributions.map((entry) => entry.element ?? entry.material)).toContain("copper-annealed");
    near(
      found.contributions.reduce((sum, { share }) => sum + share, 0),
      1,
    );
  });

  test("without uncertainty the tolerances are told as unused", () => {
    const { assumptions, uncertainty } = solve([element("a", "in", "out", { value: 1, tolerance: "1 %" })]);
    expect(uncertainty).toBeUndefined();
    expect(assumptions.some((text) => /tolerances in the request are not used/.test(text))).toBe(true);
  });
});

describe("refused with its place", () => {
  test.each<[string, unknown, string, string | undefined, RegExp]>([
    ["a tolerance as large as the value", { value: 1, tolerance: 1 }, "/tolerance", "propagation", /smaller/],
    [
      "a tolerance of another kind",
      { value: 1, tolerance: "1 m" },
      "/tolerance",
      "propagation",
      /resistance/,
    ],
    ["an unknown member", { value: 1, tolerance: 0.1, sigma: 1 }, "/sigma", undefined, /not known/],
    ["a value of another kind", { value: "1 kg", tolerance: 0.1 }, "/value", undefined, /resistance/],
  ])("%s", (_, resistance, place, method, pattern) => {
    try {
      solve([element("a", "in", "out", resistance)], method);
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
      expect(error.errors[0].pointer).toBe(`#/elements/0/resistance${place}`);
      expect(error.errors[0].detail).toMatch(pattern);
      return;
    }
    throw new Error("accepted");
  });

  test("trials, and an uncertainty of one element", () => {
    const one = [element("a", "in", "out", 1)];
    expect(() => solve(one, "monte-carlo")).toThrow(
      /#\/uncertainty\/method: must be one of "propagation", "worst-case"/,
    );
    const request = { shape: "bar", dimensions: {}, medium: {}, uncertainty: { method: "propagation" } };
    expect(() => solve([{ name: "a", between: ["in", "out"], request }])).toThrow(
      /#\/elements\/0\/request\/uncertainty: is for the network as a whole/,
    );
  });
});

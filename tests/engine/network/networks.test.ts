import Decimal from "decimal.js";
import { describe, expect, test } from "vitest";
import { computeNetwork, computeResistance, exampleRequest, findShape, libraryMaterial } from "@/lib/engine";

const context = { material: libraryMaterial };
interface Element {
  readonly name: string;
  readonly between: readonly [string, string];
  readonly resistance: number;
}
const element = (name: string, from: string, to: string, resistance: number): Element => ({
  name,
  between: [from, to],
  resistance,
});
const solve = (elements: readonly unknown[], ports: readonly string[], more: object = {}) =>
  computeNetwork({ elements, ports, ...more }, context);

/** Bounds enclose the exact value, and are narrow. */
function expectExact(result: ReturnType<typeof solve>, exact: number | Decimal, width = 1e-12): void {
  const { value, lower, upper, boundsBasis, proved } = result.resistance;
  expect(new Decimal(lower).lte(exact) && new Decimal(upper).gte(exact), `${lower} ${exact} ${upper}`).toBe(
    true,
  );
  expect(upper / lower - 1).toBeLessThan(width);
  expect(lower <= value && value <= upper).toBe(true);
  expect([boundsBasis, proved]).toEqual(["rounding", true]);
}

describe("networks solved by hand", () => {
  test("in series and in parallel (common practice)", () => {
    const series = solve([element("a", "in", "m", 3), element("b", "m", "out", 5)], ["in", "out"]);
    expectExact(series, 8);
    expect(series.nodes.map(({ voltage }) => voltage)).toEqual([1, 0.625, 0]);
    const parallel = solve([element("a", "in", "out", 3), element("b", "out", "in", 6)], ["in", "out"], {
      operating: { current: "9 A" },
    });
    expectExact(parallel, 2);
    expect(parallel.elements.map(({ current }) => current)).toEqual([6, -3]);
    expect(parallel.elements.map(({ voltage }) => voltage)).toEqual([18, -18]);
    expect(parallel.elements.map(({ power }) => power)).toEqual([108, 54]);
    expect(parallel.operating).toEqual({ temperature: 20, voltage: 18, current: 9, power: 162 });
  });

  test("a balanced bridge: no current and no sensitivity in its middle, to the last digit that counts", () => {
    const { elements, resistance } = solve(
      [
        element("a", "in", "l", 1),
        element("b", "l", "out", 2),
        element("c", "in", "r", 10),
        element("d", "r", "out", 20),
        element("middle", "l", "r", 7),
      ],
      ["in", "out"],
    );
    expect(resistance.value).toBeCloseTo(30 / 11, 13);
    const middle = elements[4];
    expect(Math.abs(middle.current)).toBeLessThan(1e-16);
    expect(middle.sensitivity).toBeLessThan(1e-30);
  });

  test("a bridge out of balance by the star–delta formula (Kennelly 1899, from memory)", () => {
    const [a, b, c, d, e] = [3, 5, 7, 11, 13];
    const sum = a + c + e;
    const exact = (a * c) / sum + 1 / (1 / ((a * e) / sum + b) + 1 / ((c * e) / sum + d));
    const result = solve(
      [
        element("a", "in", "l", a),
        element("b", "l", "out", b),
        element("c", "in", "r", c),
        element("d", "r", "out", d),
        element("e", "l", "r", e),
      ],
      ["in", "out"],
    );
    expectExact(result, new Decimal(exact), 1e-13);
  });

  // Common practice, no source: the cube of twelve equal resistors.
  test.each([
    ["a body diagonal", "7", 5 / 6],
    ["a face diagonal", "3", 3 / 4],
    ["an edge", "1", 7 / 12],
  ])("the cube of 1 Ω resistors between the ends of %s", (_, far, exact) => {
    const cube: Element[] = [];
    for (let corner = 0; corner < 8; corner++) {
      for (const step of [1, 2, 4]) {
        if (corner & step) continue;
        cube.push(element(`${corner}-${corner | step}`, String(corner), String(corner | step), 1));
      }
    }
    const result = solve(cube, ["0", far]);
    expect(result.resistance.value).toBeCloseTo(exact, 14);
    // Foster's theorem (common practice): over all elements, resistance between their ends adds up to nodes − 1.
    const total = cube.reduce((sum, { between }) => sum + solve(cube, between).resistance.value, 0);
    expect(total).toBeCloseTo(7, 12);
  });

  test("ladders of equal resistors: quotients of Fibonacci numbers, the golden ratio in the limit", () => {
    const ladder = (rungs: number) =>
      Array.from({ length: rungs }, (_, k) => [
        element(`side ${k}`, k === 0 ? "in" : `n${k}`, `n${k + 1}`, 1),
        element(`rung ${k}`, `n${k + 1}`, "out", 1),
      ]).flat();
    let [before, now] = [0, 1];
    for (let rungs = 1; rungs <= 30; rungs++) {
      [before, now] = [before + now, before + 2 * now];
      expectExact(solve(ladder(rungs), ["in", "out"]), new Decimal(now).div(before));
    }
    expect(solve(ladder(500), ["in", "out"]).resistance.value).toBeCloseTo((1 + Math.sqrt(5)) / 2, 14);
  });
});

describe("resistances of any ratio keep their digits", () => {
  test("a ladder from 1e-6 to 1e6 ohm against exact arithmetic", () => {
    Decimal.set({ precision: 60 });
    let exact: Decimal | undefined;
    const elements: Element[] = [];
    for (let k = 0; k < 60; k++) {
      const side = 10 ** (6 * Math.sin(37 * k));
      const rung = 10 ** (6 * Math.cos(91 * k));
      elements.push(element(`s${k}`, k === 59 ? "in" : `n${k + 1}`, `n${k}`, side));
      elements.push(element(`r${k}`, `n${k}`, "out", rung));
      const behind = exact
        ? new Decimal(1).div(new Decimal(1).div(rung).add(new Decimal(1).div(exact)))
        : new Decimal(rung);
      exact = behind.add(side);
    }
    if (exact) expectExact(solve(elements, ["in", "out"]), exact);
  });

  test("a microohm between megohms: its voltage and current to 14 digits", () => {
    const { elements } = solve(
      [
        element("a", "in", "m", 1e6),
        element("joint", "m", "n", 1e-6),
        element("leak", "m", "n", 1e6),
        element("b", "n", "out", 1e6),
      ],
      ["in", "out"],
    );
    const exact = new Decimal(1).div(new Decimal(2e6).add(new Decimal(1).div(new Decimal(1e6).add(1e-6))));
    const [, joint, leak] = elements;
    expect(joint.current / exact.toNumber()).toBeCloseTo(1, 11);
    expect(leak.current / joint.current / 1e-12).toBeCloseTo(1, 13);
    expect(joint.voltage / (joint.current * 1e-6)).toBeCloseTo(1, 13);
  });
});

/** Numbers that come the same each time. */
function random(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

function randomNetwork(seed: number, nodes: number, count: number, decades: number): Element[] {
  const next = random(seed);
  const size = () => 10 ** (decades * (next() - 0.5));
  const elements: Element[] = [];
  for (let n = 1; n < nodes; n++) {
    elements.push(element(`t${n}`, `n${n}`, `n${Math.floor(next() * n)}`, size()));
  }
  while (elements.length < count) {
    const [a, b] = [Math.floor(next() * nodes), Math.floor(next() * nodes)];
    if (a !== b) elements.push(element(`x${elements.length}`, `n${a}`, `n${b}`, size()));
  }
  return elements;
}

/** The node equations at 50 digits, by elimination without any arrangement. */
function exactly(elements: readonly Element[], nodes: number): { ohm: Decimal; potential: Decimal[] } {
  Decimal.set({ precision: 50 });
  const rows = Array.from({ length: nodes }, () => Array.from({ length: nodes + 1 }, () => new Decimal(0)));
  for (const { between, resistance } of elements) {
    const [a, b] = between.map((name) => Number(name.slice(1)));
    const g = new Decimal(1).div(resistance);
    rows[a][a] = rows[a][a].add(g);
    rows[b][b] = rows[b][b].add(g);
    rows[a][b] = rows[a][b].sub(g);
    rows[b][a] = rows[b][a].sub(g);
  }
  // One ampere into node 0, out of node 1, which is at nought.
  rows[0][nodes] = new Decimal(1);
  rows[1] = Array.from({ length: nodes + 1 }, (_, j) => new Decimal(j === 1 ? 1 : 0));
  for (let k = 0; k < nodes; k++) {
    for (let i = 0; i < nodes; i++) {
      if (i === k || rows[i][k].isZero()) continue;
      const factor = rows[i][k].div(rows[k][k]);
      for (let j = k; j <= nodes; j++) rows[i][j] = rows[i][j].sub(factor.mul(rows[k][j]));
    }
  }
  const potential = rows.map((row, k) => row[nodes].div(row[k]));
  return { ohm: potential[0], potential };
}

describe("random networks against 50-digit arithmetic", () => {
  test.each([
    [1, 12, 20, 2],
    [2, 25, 60, 12],
    [3, 40, 70, 24],
    [4, 30, 400, 12],
    [5, 45, 46, 6],
  ])("seed %i: %i nodes, %i elements over %i decades", (seed, nodes, count, decades) => {
    const elements = randomNetwork(seed, nodes, count, decades);
    const { ohm, potential } = exactly(elements, nodes);
    const result = solve(elements, ["n0", "n1"], { operating: { current: 1 } });
    expectExact(result, ohm);
    for (const { name, voltage } of result.nodes) {
      const exact = potential[Number(name.slice(1))];
      expect(exact.sub(voltage).abs().div(ohm).lt(1e-12), name).toBe(true);
    }
    for (const [e, { between, resistance }] of elements.entries()) {
      const [a, b] = between.map((name) => potential[Number(name.slice(1))]);
      const current = a.sub(b).div(resistance);
      expect(current.sub(result.elements[e].current).abs().lt(1e-12), elements[e].name).toBe(true);
    }
    const shares = result.elements.reduce((sum, { share }) => sum + share, 0);
    expect(shares).toBeCloseTo(1, 12);
    for (const check of result.checks) expect(check.passed, check.name).toBe(true);
  });

  test("sensitivities are the derivatives", () => {
    const elements = randomNetwork(7, 14, 30, 2);
    const { resistance, elements: told } = solve(elements, ["n0", "n1"]);
    for (const [e, { resistance: ohm }] of elements.entries()) {
      const step = ohm * 1e-5;
      const at = (value: number) => {
        const changed = elements.map((entry, k) => (k === e ? { ...entry, resistance: value } : entry));
        return solve(changed, ["n0", "n1"]).resistance.value;
      };
      const slope = (at(ohm + step) - at(ohm - step)) / (2 * step);
      expect(Math.abs(slope - told[e].sensitivity) * ohm).toBeLessThan(1e-8 * resistance.value);
    }
  });

  test("the order of elements and their direction do not matter; a network as one element of another neither", () => {
    const elements = randomNetwork(9, 20, 50, 6);
    const turned = elements.toReversed().map((entry) => ({ ...entry, between: entry.between.toReversed() }));
    const first = solve(elements, ["n0", "n1"]).resistance;
    expect(solve(turned, ["n1", "n0"]).resistance.value / first.value).toBeCloseTo(1, 13);
    const beside = solve([element("net", "a", "b", first.value), element("shunt", "a", "b", 3)], ["a", "b"]);
    const whole = solve([...elements, element("shunt", "n0", "n1", 3)], ["n0", "n1"]);
    expect(whole.resistance.value / beside.resistance.value).toBeCloseTo(1, 13);
  });

  test("large and dense ones: a part grows dense on the way", () => {
    const elements = randomNetwork(11, 900, 2_000, 6);
    const { checks, resistance } = solve(elements, ["n0", "n1"]);
    expect(checks.every(({ passed }) => passed)).toBe(true);
    expect(resistance.upper / resistance.lower - 1).toBeLessThan(1e-10);
    // All elements doubled: the same network in other units.
    const doubled = elements.map((entry) => ({ ...entry, resistance: entry.resistance * 2 }));
    expect(solve(doubled, ["n0", "n1"]).resistance.value).toBe(2 * resistance.value);
  });
});

function exampleOf(id: string): Record<string, unknown> {
  const shape = findShape(id);
  if (!shape) throw new Error(`no shape ${id}`);
  return exampleRequest(shape);
}

describe("elements by a request", () => {
  const grid = exampleOf("earth-grid");
  const bar = (temperature?: number) => ({
    shape: "bar",
    dimensions: { length: "1 m", width: "50 mm", thickness: "10 mm" },
    medium: { material: "copper-annealed" },
    ...(temperature === undefined ? {} : { operating: { temperature } }),
  });
  const single = (request: unknown) => computeResistance(request, context).resistance;

  test("the network's temperature holds where the element names none", () => {
    const elements = [
      { name: "warm", between: ["in", "m"], request: bar() },
      { name: "hot", between: ["m", "out"], request: bar(120) },
    ];
    const {
      resistance,
      elements: told,
      materials,
    } = solve(elements, ["in", "out"], {
      operating: { temperature: 75, current: "630 A" },
    });
    const [warm, hot] = [single(bar(75)), single(bar(120))];
    expect(resistance.value / (warm.value + hot.value)).toBeCloseTo(1, 14);
    expect(told.map(({ resistance: ohm }) => ohm)).toEqual([warm.value, hot.value]);
    expect(told[0].bounds).toEqual({
      lower: warm.lower,
      upper: warm.upper,
      boundsBasis: "rounding",
      proved: true,
    });
    expect(materials.map(({ id }) => id)).toEqual(["copper-annealed"]);
  });

  test("bounds come from all elements at their lowest and at their highest", () => {
    const { value, lower, upper, proved } = single(grid);
    expect(upper / lower).toBeGreaterThan(1.0001);
    const elements = [
      { name: "grid 1", between: ["top", "earth"], request: grid },
      { name: "grid 2", between: ["top", "earth"], request: grid },
      { name: "lead", between: ["clamp", "top"], resistance: "0.1 ohm" },
    ];
    const { resistance } = solve(elements, ["clamp", "earth"]);
    expect(resistance.boundsBasis).toBe("elements");
    expect(resistance.proved).toBe(proved);
    expect(resistance.value).toBeCloseTo(0.1 + value / 2, 10);
    expect(resistance.lower / (0.1 + lower / 2) - 1).toBeLessThanOrEqual(0);
    expect(resistance.lower / (0.1 + lower / 2)).toBeCloseTo(1, 12);
    expect(resistance.upper / (0.1 + upper / 2) - 1).toBeGreaterThanOrEqual(0);
    expect(resistance.upper / (0.1 + upper / 2)).toBeCloseTo(1, 12);
  });
});

describe("elements that no current can pass", () => {
  test("carry exactly nothing and are named; their nodes have a voltage", () => {
    const { elements, nodes, cautions, resistance } = solve(
      [
        element("way", "in", "out", 2),
        element("stub", "in", "end", 5),
        element("ring 1", "end", "p", 1),
        element("ring 2", "p", "q", 1),
        element("ring 3", "q", "end", 1),
      ],
      ["in", "out"],
    );
    expect(resistance.value).toBe(2);
    expect(elements.slice(1).every(({ current, power }) => current === 0 && power === 0)).toBe(true);
    expect(nodes.slice(2).map(({ voltage }) => voltage)).toEqual([1, 1, 1]);
    expect(cautions[0]).toBe(
      '"stub", "ring 1", "ring 2", "ring 3" carry no current: no way through leads from port to port.',
    );
  });
});

test("held against a requirement", () => {
  const elements = [element("a", "in", "out", 2)];
  expect(solve(elements, ["in", "out"], { requirement: { max: 3 } }).verdict).toBe("met");
  expect(solve(elements, ["in", "out"], { requirement: { min: "3 ohm" } }).verdict).toBe("not-met");
});

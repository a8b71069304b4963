import { describe, expect, it } from "vitest";
import { solveField, type BoundedValue, type FieldSolution } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

type Segment = [[number, number], [number, number]];

function solve(
  outer: [number, number][],
  terminals: Segment[][],
  options: { accuracy: number; holes?: [number, number][][]; conductance?: number },
): FieldSolution {
  const outline = accept(
    { unit: "mm", outer, holes: options.holes ?? [] },
    terminals.map((segments, k) => ({ name: `t${k}`, segments })),
  );
  return solveField({ outline, conductance: [options.conductance ?? 1] }, { accuracy: options.accuracy });
}

function expectHolds({ lower, upper }: BoundedValue, exact: number, slack = 0): void {
  expect(lower).toBeLessThanOrEqual(exact + slack);
  expect(upper).toBeGreaterThanOrEqual(exact - slack);
}

/** A tee: bar and stub of width 1, all arms 5 from the inner corners. */
const TEE: [number, number][] = [
  [-5.5, 0],
  [5.5, 0],
  [5.5, 1],
  [0.5, 1],
  [0.5, 6],
  [-0.5, 6],
  [-0.5, 1],
  [-5.5, 1],
];
const TEE_ENDS: Segment[][] = [
  [
    [
      [-5.5, 0],
      [-5.5, 1],
    ],
  ],
  [
    [
      [5.5, 0],
      [5.5, 1],
    ],
  ],
  [
    [
      [-0.5, 6],
      [0.5, 6],
    ],
  ],
];

describe("three terminals", () => {
  // F-Tthrough and F-Tbranch (conformal mapping; 50 digits in tests/fixtures/values.json).
  const THROUGH = 0.846890361542079373;
  const BRANCH = 0.533491215129991121;

  it("a tee: through the bar and into the stub, the third arm floating", () => {
    for (const accuracy of [1e-3, 1e-5, 1e-7]) {
      const solution = solve(TEE, TEE_ENDS, { accuracy });
      expect(solution.status).toBe("done");
      expect(solution.resistance).toBeNull();
      const [through, left, right] = solution.pairs ?? [];
      expect(through.between).toEqual([0, 1]);
      expectHolds(through.floating, 10 + THROUGH, 1e-11);
      expectHolds(left.floating, 10 + BRANCH, 1e-11);
      expectHolds(right.floating, 10 + BRANCH, 1e-11);
      for (const { floating } of solution.pairs ?? []) {
        expect((floating.upper - floating.lower) / floating.value).toBeLessThanOrEqual(accuracy);
      }
    }
  });

  it("its conductance matrix is that of the star with arms T/2, T/2, B-T/2", () => {
    const solution = solve(TEE, TEE_ENDS, { accuracy: 1e-6, conductance: 0.25 });
    const arms = [5 + THROUGH / 2, 5 + THROUGH / 2, 5 + BRANCH - THROUGH / 2].map((r) => r / 0.25);
    const total = arms.reduce((sum, r) => sum + 1 / r, 0);
    for (let a = 0; a < 3; a++) {
      for (let b = 0; b < 3; b++) {
        const exact = (a === b ? 1 / arms[a] : 0) - 1 / (arms[a] * arms[b] * total);
        const entry = solution.conductance?.[a][b];
        if (!entry) throw new Error("no entry");
        expectHolds(entry, exact, 1e-11);
        expect(entry.upper - entry.lower).toBeLessThan(1e-6);
      }
    }
    // grounded = -1/G_ab
    const first = solution.pairs?.[0];
    if (!first) throw new Error("no pair");
    expectHolds(first.grounded, arms[0] * arms[1] * total, 1e-9);
  });

  it("rows of the matrix add up to nothing and the matrix is symmetric", () => {
    const square: [number, number][] = [
      [0, 0],
      [4, 0],
      [4, 3],
      [0, 3],
    ];
    const terminals: Segment[][] = [
      [
        [
          [0, 0],
          [0, 2],
        ],
      ],
      [
        [
          [4, 1],
          [4, 3],
        ],
        [
          [2, 0],
          [3, 0],
        ],
      ],
      [
        [
          [1, 3],
          [2, 3],
        ],
      ],
      [
        [
          [1, 1],
          [1.5, 1],
        ],
        [
          [1.5, 1],
          [1.5, 1.5],
        ],
        [
          [1.5, 1.5],
          [1, 1.5],
        ],
        [
          [1, 1.5],
          [1, 1],
        ],
      ],
    ];
    const hole: [number, number][] = [
      [1, 1],
      [1.5, 1],
      [1.5, 1.5],
      [1, 1.5],
    ];
    const solution = solve(square, terminals, { accuracy: 1e-4, holes: [hole] });
    expect(solution.status).toBe("done");
    const g = solution.conductance ?? [];
    for (let a = 0; a < 4; a++) {
      expect(g[a].reduce((s, e) => s + e.lower, 0)).toBeLessThanOrEqual(0);
      expect(g[a].reduce((s, e) => s + e.upper, 0)).toBeGreaterThanOrEqual(0);
      for (let b = 0; b < 4; b++) {
        expect(g[a][b]).toEqual(g[b][a]);
        if (a !== b) expect(g[a][b].upper).toBeLessThan(0);
        else expect(g[a][b].lower).toBeGreaterThan(0);
      }
    }
    // Joining all others to b can only lower the resistance, cutting them off can only raise it.
    for (const { between, floating } of solution.pairs ?? []) {
      const [a, b] = between;
      expect(floating.upper).toBeGreaterThanOrEqual(1 / g[a][a].upper);
      expect(floating.upper).toBeGreaterThanOrEqual(1 / g[b][b].upper);
    }
  });

  it("a third terminal that floats gives the two-terminal value of the same outline with it", () => {
    // A floating terminal across a strip changes nothing: the strip's potential is even there.
    const strip: [number, number][] = [
      [0, 0],
      [6, 0],
      [6, 1],
      [0, 1],
    ];
    const hole: [number, number][] = [
      [2.9, 0.4],
      [3.1, 0.4],
      [3.1, 0.6],
      [2.9, 0.6],
    ];
    const ends: Segment[][] = [
      [
        [
          [0, 0],
          [0, 1],
        ],
      ],
      [
        [
          [6, 0],
          [6, 1],
        ],
      ],
    ];
    const insulated = solve(strip, ends, { accuracy: 1e-5, holes: [hole] });
    const sides = hole.map((p, k): Segment => [p, hole[(k + 1) % 4]]);
    const floating = solve(strip, [...ends, sides], { accuracy: 1e-5, holes: [hole] });
    const full = 6;
    const bare = floating.pairs?.[0].floating;
    if (!bare || !insulated.resistance) throw new Error("no value");
    // A conducting patch lowers the resistance of the full strip, an insulated hole raises it.
    expect(bare.upper).toBeLessThan(full);
    expect(insulated.resistance.lower).toBeGreaterThan(full);
  });
});

describe("three arcs of a disc", () => {
  it("of sixty degrees with gaps of sixty: a star of arms 1/√3, since the disc is its own dual", () => {
    // Terminals and gaps change places under a turn: the triangle 3r of the star r is also its dual 1/r.
    const at = (k: number): [number, number] => [Math.cos((k * Math.PI) / 3), Math.sin((k * Math.PI) / 3)];
    const outline = accept(
      {
        unit: "m",
        outer: Array.from({ length: 6 }, (_, k) => ({ arcTo: at(k), center: [0, 0] as [number, number] })),
        holes: [],
      },
      [0, 2, 4].map((edge) => ({ name: `t${edge}`, parts: [{ ring: 0, edge }] })),
    );
    for (const accuracy of [1e-2, 1e-4]) {
      const solution = solveField({ outline, conductance: [1] }, { accuracy });
      expect(solution.status).toBe("done");
      expect(solution.proved).toBe(true);
      for (const { floating, grounded } of solution.pairs ?? []) {
        expectHolds(floating, 2 / Math.sqrt(3));
        expectHolds(grounded, Math.sqrt(3));
        expect((floating.upper - floating.lower) / floating.value).toBeLessThanOrEqual(accuracy);
        expect((grounded.upper - grounded.lower) / grounded.value).toBeLessThanOrEqual(accuracy * 1.001);
      }
    }
  });
});

describe("terminals in every position", () => {
  const outer: [number, number][] = [
    [0, 0],
    [6, 0],
    [6, 4],
    [0, 4],
  ];
  const hole: [number, number][] = [
    [2, 1.5],
    [3, 1.5],
    [3, 2.5],
    [2, 2.5],
  ];
  const sides = hole.map((p, k): Segment => [p, hole[(k + 1) % 4]]);
  const right: Segment = [
    [6, 0],
    [6, 4],
  ];

  it.each([
    ["a whole hole", [sides, [right]]],
    [
      "a whole hole against several pieces",
      [
        sides,
        [
          [
            [6, 1],
            [6, 2],
          ],
          [
            [1, 0],
            [2, 0],
          ],
          [
            [0, 3],
            [0, 4],
          ],
          [
            [0, 4],
            [1, 4],
          ],
        ],
      ],
    ],
    ["part of a hole wrapped around its corner", [[sides[0], sides[1]], [right]]],
    ["both on the hole", [[sides[0]], [sides[2]]]],
    [
      "one terminal on both rings",
      [
        [
          [
            [0, 0],
            [0, 4],
          ],
          sides[1],
        ],
        [right],
      ],
    ],
    [
      "ends within edges",
      [
        [
          [
            [0, 1],
            [0, 2.2],
          ],
        ],
        [
          [
            [6, 0.3],
            [6, 0.4],
          ],
        ],
      ],
    ],
    [
      "wrapped around two outer corners",
      [
        [
          [
            [1, 0],
            [0, 0],
          ],
          [
            [0, 0],
            [0, 4],
          ],
          [
            [0, 4],
            [1, 4],
          ],
        ],
        [right],
      ],
    ],
  ] as [string, Segment[][]][])("%s", (_, terminals) => {
    let last = { lower: 0, upper: Infinity };
    for (const accuracy of [1e-2, 1e-4, 1e-6]) {
      const solution = solve(outer, terminals, { accuracy, holes: [hole] });
      if (!solution.resistance) throw new Error("no resistance");
      const { lower, upper } = solution.resistance;
      expect(solution.status).toBe("done");
      expect(lower).toBeLessThanOrEqual(last.upper);
      expect(upper).toBeGreaterThanOrEqual(last.lower);
      expect(solution.checks.every((check) => check.passed)).toBe(true);
      last = { lower, upper };
    }
  });
});

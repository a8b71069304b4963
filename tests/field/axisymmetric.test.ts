import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { solveField, type FieldSolution, type SheetConductance } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

type Points = [number, number][];
type Vertex = Points[number] | { arcTo: [number, number]; center: [number, number]; clockwise?: boolean };

const values = JSON.parse(readFileSync(new URL("../fixtures/values.json", import.meta.url), "utf8")) as {
  id: string;
  inputs: Record<string, number>;
  value: string;
}[];

function reference(id: string): { value: number; inputs: Record<string, number> } {
  const entry = values.find((v) => v.id === id);
  if (!entry) throw new Error(`no reference value ${id}`);
  return { value: Number(entry.value), inputs: entry.inputs };
}

interface Body {
  outer: Vertex[];
  a: Points[];
  b: Points[];
  holes?: Points[];
  regions?: Points[];
  conductivity?: SheetConductance[];
  unit?: "m" | "mm";
}

function solve(body: Body, accuracy: number): FieldSolution {
  const segments = (list: Points[]): [Points[number], Points[number]][] => list.map(([p, q]) => [p, q]);
  const outline = accept(
    { unit: body.unit ?? "m", outer: body.outer, holes: body.holes ?? [], symmetry: "axisymmetric" },
    [
      { name: "a", segments: segments(body.a) },
      { name: "b", segments: segments(body.b) },
    ],
    body.regions,
  );
  return solveField({ outline, conductance: body.conductivity ?? [1] }, { accuracy });
}

function expectHolds(body: Body, exact: number, accuracies: number[], slack = 1e-13): void {
  for (const accuracy of accuracies) {
    const solution = solve(body, accuracy);
    if (!solution.resistance) throw new Error("no resistance");
    const { lower, upper } = solution.resistance;
    expect(solution.status).toBe("done");
    expect(solution.checks.filter((check) => !check.passed)).toEqual([]);
    expect(lower).toBeLessThanOrEqual(exact * (1 + slack));
    expect(upper).toBeGreaterThanOrEqual(exact * (1 - slack));
    // Integrals with 1/r are by quadrature: an estimate, and said to be one.
    expect(solution.boundsBasis).toBe("energy-quadrature");
    expect(solution.proved).toBe(false);
    expect(solution.squares).toBeNull();
  }
}

const ACCURACIES = [1e-3, 1e-5, 1e-7];

describe("bodies of revolution", () => {
  it("a rod (on the axis) and a tube (off it), axial flow: L/(σπ(b²-a²))", () => {
    const rod: Body = {
      outer: [
        [0, 0],
        [1, 0],
        [1, 2],
        [0, 2],
      ],
      a: [
        [
          [0, 0],
          [1, 0],
        ],
      ],
      b: [
        [
          [0, 2],
          [1, 2],
        ],
      ],
    };
    expectHolds(rod, 2 / Math.PI, ACCURACIES);
    const tube: Body = {
      outer: [
        [1, 0],
        [2, 0],
        [2, 1],
        [1, 1],
      ],
      a: [
        [
          [1, 0],
          [2, 0],
        ],
      ],
      b: [
        [
          [1, 1],
          [2, 1],
        ],
      ],
    };
    expectHolds(tube, 1 / (3 * Math.PI), ACCURACIES);
  });

  it("a shell, radial flow: ln(b/a)/(2πσL), in millimetres and with a conductivity", () => {
    const { value, inputs } = reference("B-cylshell-1");
    const { rho, a, t, L } = inputs;
    const [p, q, l] = [a, a + t, L].map((x) => 1000 * x);
    const shell: Body = {
      unit: "mm",
      outer: [
        [p, 0],
        [q, 0],
        [q, l],
        [p, l],
      ],
      a: [
        [
          [p, 0],
          [p, l],
        ],
      ],
      b: [
        [
          [q, 0],
          [q, l],
        ],
      ],
      conductivity: [1 / rho],
    };
    expectHolds(shell, value, ACCURACIES);
  });

  it("a shell whose conductivity goes like r^n (G-cyl-power)", () => {
    const { value, inputs } = reference("G-cyl-power-1");
    const { a, t, L, s0, n } = inputs;
    const shell: Body = {
      outer: [
        [a, 0],
        [a + t, 0],
        [a + t, L],
        [a, L],
      ],
      a: [
        [
          [a, 0],
          [a, L],
        ],
      ],
      b: [
        [
          [a + t, 0],
          [a + t, L],
        ],
      ],
      conductivity: [(r) => s0 * (r / a) ** n],
    };
    expectHolds(shell, value, ACCURACIES);
  });

  it("a rod whose conductivity falls towards its surface (G-ax-parab)", () => {
    const { value, inputs } = reference("G-ax-parab-1");
    const { a, L, s0, k } = inputs;
    const rod: Body = {
      outer: [
        [0, 0],
        [a, 0],
        [a, L],
        [0, L],
      ],
      a: [
        [
          [0, 0],
          [a, 0],
        ],
      ],
      b: [
        [
          [0, L],
          [a, L],
        ],
      ],
      conductivity: [(r) => s0 * (1 - k * (r / a) ** 2)],
    };
    expectHolds(rod, value, ACCURACIES);
  });

  it("D-frustumflat: a cone with flat ends", () => {
    const { value, inputs } = reference("D-frustumflat-1");
    const { L, a, b } = inputs;
    const cone: Body = {
      outer: [
        [0, 0],
        [a, 0],
        [b, L],
        [0, L],
      ],
      a: [
        [
          [0, 0],
          [a, 0],
        ],
      ],
      b: [
        [
          [0, L],
          [b, L],
        ],
      ],
    };
    expectHolds(cone, value, ACCURACIES, 1e-10);
  });

  it("a spot in a cylinder, ε = 0.5: L/π + ψ/(4·0.5) with ψ = 0.3396093901356 (converged, 8-formulas)", () => {
    const body: Body = {
      outer: [
        [0, 0],
        [1, 0],
        [1, 4],
        [0, 4],
      ],
      a: [
        [
          [0, 0],
          [0.5, 0],
        ],
      ],
      b: [
        [
          [0, 4],
          [1, 4],
        ],
      ],
    };
    expectHolds(body, 4 / Math.PI + 0.3396093901356 / 2, ACCURACIES, 1e-9);
  });

  it("two concentric media in series (B-twolayer, thick second layer)", () => {
    const [a, t1, t2, r1, r2] = [1, 0.5, 0.7, 0.31, 4.7];
    const exact = (r1 * Math.log((a + t1) / a) + r2 * Math.log((a + t1 + t2) / (a + t1))) / (2 * Math.PI);
    const body: Body = {
      outer: [
        [a, 0],
        [a + t1 + t2, 0],
        [a + t1 + t2, 1],
        [a, 1],
      ],
      a: [
        [
          [a, 0],
          [a, 1],
        ],
      ],
      b: [
        [
          [a + t1 + t2, 0],
          [a + t1 + t2, 1],
        ],
      ],
      regions: [
        [
          [a, 0],
          [a + t1, 0],
          [a + t1, 1],
          [a, 1],
        ],
      ],
      conductivity: [1 / r2, 1 / r1],
    };
    expectHolds(body, exact, ACCURACIES);
  });

  it("B-hemishell: a hemispherical shell, by arcs", () => {
    const { value, inputs } = reference("B-hemishell-1");
    const { rho, a, t } = inputs;
    const b = a + t;
    const outline = accept(
      {
        unit: "m",
        symmetry: "axisymmetric",
        outer: [
          [a, 0],
          [b, 0],
          { arcTo: [0, b], center: [0, 0] },
          [0, a],
          { arcTo: [a, 0], center: [0, 0], clockwise: true },
        ],
        holes: [],
      },
      [
        { name: "a", parts: [{ ring: 0, edge: 1 }] },
        { name: "b", parts: [{ ring: 0, edge: 3 }] },
      ],
    );
    const { resistance, status } = solveField({ outline, conductance: [1 / rho] }, { accuracy: 1e-3 });
    expect(status).toBe("done");
    expect(resistance?.lower).toBeLessThanOrEqual(value);
    expect(resistance?.upper).toBeGreaterThanOrEqual(value);
  });

  it("a toroidal cavity and a terminal on its wall: brackets stay consistent", () => {
    const hole: Points = [
      [0.4, 0.8],
      [0.7, 0.8],
      [0.7, 1.2],
      [0.4, 1.2],
    ];
    const walls = hole.map((p, k): Points => [p, hole[(k + 1) % 4]]);
    const rod: Body = {
      outer: [
        [0, 0],
        [1, 0],
        [1, 2],
        [0, 2],
      ],
      holes: [hole],
      a: [
        [
          [0, 0],
          [1, 0],
        ],
      ],
      b: [
        [
          [0, 2],
          [1, 2],
        ],
      ],
    };
    for (const body of [
      rod,
      { ...rod, a: walls },
      {
        ...rod,
        a: [walls[0], walls[1]],
        b: [
          [
            [0, 0],
            [1, 0],
          ],
          [
            [0, 2],
            [1, 2],
          ],
        ] as Points[],
      },
    ]) {
      let last = { lower: 0, upper: Infinity };
      for (const accuracy of [1e-2, 1e-4, 1e-5]) {
        const { resistance, checks, status } = solve(body, accuracy);
        if (!resistance) throw new Error("no resistance");
        expect(status).toBe("done");
        expect(checks.filter((check) => !check.passed)).toEqual([]);
        expect(resistance.lower).toBeLessThanOrEqual(last.upper);
        expect(resistance.upper).toBeGreaterThanOrEqual(last.lower);
        last = resistance;
      }
      if (body === rod) expect(last.lower).toBeGreaterThan(2 / Math.PI);
    }
  });
});

import { describe, expect, it } from "vitest";
import { singularVertices } from "@/lib/engine/field/bounds/exponents";
import { findBoundaryRuns } from "@/lib/engine/field/assembly/boundary-runs";
import {
  FieldMediumError,
  solveField,
  type FieldOptions,
  type FieldSolution,
  type SheetConductance,
} from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";
import { cellMesh } from "./support/meshes";

type Points = [number, number][];

interface Case {
  outer: Points;
  holes?: Points[];
  a: Points;
  b: Points;
  regions?: Points[];
  conductance?: SheetConductance[];
}

function solve(c: Case, options: FieldOptions): FieldSolution {
  const outline = accept(
    { unit: "mm", outer: c.outer, holes: c.holes ?? [] },
    [
      { name: "a", segments: [[c.a[0], c.a[1]]] },
      { name: "b", segments: [[c.b[0], c.b[1]]] },
    ],
    c.regions,
  );
  return solveField({ outline, conductance: c.conductance ?? [1] }, options);
}

/** Solves at several accuracies; all brackets must overlap and all checks pass. Returns the last. */
function consistent(c: Case, accuracies: number[]): { lower: number; upper: number; status: string } {
  let last = { lower: 0, upper: Infinity, status: "" };
  for (const accuracy of accuracies) {
    const solution = solve(c, { accuracy });
    if (!solution.resistance) throw new Error("no resistance");
    const { lower, upper } = solution.resistance;
    expect(solution.checks.filter((check) => !check.passed)).toEqual([]);
    expect(lower).toBeGreaterThan(0);
    expect(lower).toBeLessThan(upper);
    expect(lower).toBeLessThanOrEqual(last.upper);
    expect(upper).toBeGreaterThanOrEqual(last.lower);
    if (solution.status === "done") expect((upper - lower) / upper).toBeLessThanOrEqual(accuracy);
    last = { lower, upper, status: solution.status };
  }
  return last;
}

const square: Points = [
  [0, 0],
  [1, 0],
  [1, 1],
  [0, 1],
];
const across: Pick<Case, "outer" | "a" | "b"> = {
  outer: square,
  a: [
    [0, 0],
    [0, 1],
  ],
  b: [
    [1, 0],
    [1, 1],
  ],
};

function polygon(x: number, y: number, r: number, n: number): Points {
  return Array.from({ length: n }, (_, k) => {
    const angle = (2 * Math.PI * k) / n;
    return [x + r * Math.cos(angle), y + r * Math.sin(angle)];
  });
}

describe("hard outlines", () => {
  it("a tip of five degrees", () => {
    const outer: Points = [
      [0, 0],
      [10, 0],
      [10, 10 * Math.tan((5 * Math.PI) / 180)],
    ];
    const result = consistent(
      {
        outer,
        a: [
          [10, 0],
          [10, outer[2][1]],
        ],
        b: [
          [0, 0],
          [4, 0],
        ],
      },
      [1e-2, 1e-4, 1e-6],
    );
    expect(result.status).toBe("done");
  });

  it("a sliver of 1 : 1000", () => {
    const outer: Points = [
      [0, 0],
      [1000, 0.3],
      [1000, 0.9],
      [0, 1],
    ];
    const result = consistent(
      {
        outer,
        a: [
          [0, 0],
          [0, 1],
        ],
        b: [
          [1000, 0.3],
          [1000, 0.9],
        ],
      },
      [1e-3, 1e-6],
    );
    expect(result.status).toBe("done");
  });

  it("two holes 1e-5 apart", () => {
    const holes = [
      [
        [0.3, 0.3],
        [0.5, 0.3],
        [0.5, 0.6],
        [0.3, 0.6],
      ],
      [
        [0.50001, 0.3],
        [0.7, 0.3],
        [0.7, 0.6],
        [0.50001, 0.6],
      ],
    ] as Points[];
    expect(consistent({ ...across, holes }, [1e-2, 1e-4]).status).toBe("done");
    // Across the gap instead of along it.
    const turned: Case = {
      outer: square,
      holes,
      a: [
        [0, 0],
        [1, 0],
      ],
      b: [
        [0, 1],
        [1, 1],
      ],
    };
    expect(consistent(turned, [1e-2, 1e-4]).status).toBe("done");
  });

  it("a hole of radius 1e-5 raises the resistance by 2π r² (dipole of a small hole, unit square)", () => {
    const radius = 1e-5;
    const result = consistent({ ...across, holes: [polygon(0.5, 0.5, radius, 12)] }, [1e-4, 1e-8]);
    expect(result.lower).toBeLessThan(1 + 2.1 * Math.PI * radius ** 2);
    expect(result.upper).toBeGreaterThan(1 + 1.5 * Math.PI * radius ** 2);
  });

  it("600 vertices on a line", () => {
    const top: Points = Array.from({ length: 600 }, (_, k) => [6 - k / 100, 1]);
    const outer: Points = [[0, 0], [6, 0], ...top, [0, 1]];
    const result = consistent(
      {
        outer,
        a: [
          [0, 0],
          [0, 1],
        ],
        b: [
          [6, 0],
          [6, 1],
        ],
      },
      [1e-4],
    );
    expect(result.lower).toBeLessThanOrEqual(6);
    expect(result.upper).toBeGreaterThanOrEqual(6);
  });

  it("a corner of 270 degrees between terminal and insulation (α = 1/3)", () => {
    const outer: Points = [
      [0, 0],
      [2, 0],
      [2, 1],
      [1, 1],
      [1, 2],
      [0, 2],
    ];
    const c: Case = {
      outer,
      a: [
        [1, 1],
        [2, 1],
      ],
      b: [
        [0, 2],
        [0, 0],
      ],
    };
    expect(consistent(c, [1e-2, 1e-4, 1e-6]).status).toBe("done");
  });

  it("a corner of nearly 360 degrees between terminal and insulation (α = 1/4): as narrow as the digits allow", () => {
    const outer: Points = [
      [0, 0],
      [2, 0],
      [2, 1],
      [1, 1.0001],
      [2, 1.0002],
      [2, 2],
      [0, 2],
    ];
    const c: Case = {
      outer,
      a: [
        [1, 1.0001],
        [2, 1.0002],
      ],
      b: [
        [0, 2],
        [0, 0],
      ],
    };
    expect(consistent(c, [1e-2, 1e-4]).status).toBe("done");
  });

  it("terminals that nearly touch", () => {
    const c: Case = {
      outer: square,
      a: [
        [0, 0],
        [0.499999, 0],
      ],
      b: [
        [0.500001, 0],
        [1, 0],
      ],
    };
    expect(consistent(c, [1e-2, 1e-4, 1e-6]).status).toBe("done");
  });

  it("100 holes", () => {
    const holes: Points[] = [];
    for (let i = 0; i < 10; i++)
      for (let j = 0; j < 10; j++) holes.push(polygon(0.05 + i / 10, 0.05 + j / 10, 0.03, 6));
    expect(consistent({ ...across, holes }, [1e-1, 1e-3]).status).toBe("done");
  });
});

describe("media", () => {
  it.each([1e-8, 1e-6, 1e6, 1e8])("an inclusion of %s times the conductance", (ratio) => {
    const regions: Points[] = [
      [
        [0.25, 0.25],
        [0.7, 0.3],
        [0.6, 0.75],
      ],
    ];
    const result = consistent({ ...across, regions, conductance: [1, ratio] }, [1e-2, 1e-4, 1e-6]);
    expect(result.status).toBe("done");
    if (ratio > 1) expect(result.upper).toBeLessThan(1);
    else expect(result.lower).toBeGreaterThan(1);
  });

  it("a chessboard with a ratio of 100: by duality R = 1/√(σ1 σ2)", () => {
    // Keller 1964: a two-phase board that maps onto itself with the phases exchanged under a turn by 90 degrees. Two by
    // two cells between terminals left and right are such a board.
    const regions: Points[] = [
      [
        [0, 0],
        [0.5, 0],
        [0.5, 0.5],
        [0, 0.5],
      ],
      [
        [0.5, 0.5],
        [1, 0.5],
        [1, 1],
        [0.5, 1],
      ],
    ];
    const result = consistent({ ...across, regions, conductance: [1, 100, 100] }, [1e-1, 1e-2, 1e-4]);
    expect(result.lower).toBeLessThanOrEqual(0.1);
    expect(result.upper).toBeGreaterThanOrEqual(0.1);
  });

  it("knows the exponent of the chessboard's centre: (4/π)·atan(1/√ratio)", () => {
    // Angular eigenvalue of four sectors of 90 degrees, by symmetry tan(απ/4) = 1/√ratio.
    for (const ratio of [2, 100, 2000]) {
      const mesh = cellMesh(
        2,
        2,
        0.5,
        () => true,
        (x) => (x < 1e-9 ? 0 : x > 1 - 1e-9 ? 1 : -1),
      );
      const sigma = Float64Array.from({ length: 8 }, (_, t) => {
        const c = [0, 1].map(
          (k) => [0, 1, 2].reduce((s, i) => s + mesh.xy[2 * mesh.triangles[3 * t + i] + k], 0) / 3,
        );
        return c[0] < 0.5 === c[1] < 0.5 ? ratio : 1;
      });
      const found = singularVertices(mesh, findBoundaryRuns(mesh), sigma);
      const centre = found.find(
        ({ vertex }) => mesh.xy[2 * vertex] === 0.5 && mesh.xy[2 * vertex + 1] === 0.5,
      );
      expect(centre?.exponent).toBeCloseTo((4 / Math.PI) * Math.atan(1 / Math.sqrt(ratio)), 6);
    }
  });

  it("a jump of the conductance that lies on no mesh line keeps the brackets consistent and is not proved", () => {
    // In series along x: R = 0.37 + 0.63/5.
    const exact = 0.37 + 0.63 / 5;
    const conductance: SheetConductance[] = [(x) => (x < 0.37e-3 ? 1 : 5)];
    for (const accuracy of [1e-1, 1e-2]) {
      const solution = solve({ ...across, conductance }, { accuracy, maximumUnknowns: 20_000 });
      if (!solution.resistance) throw new Error("no resistance");
      expect(solution.proved).toBe(false);
      expect(solution.boundsBasis).toBe("energy-quadrature");
      expect(solution.resistance.lower).toBeLessThanOrEqual(exact);
      expect(solution.resistance.upper).toBeGreaterThanOrEqual(exact);
    }
  });

  it("a conductance that is not positive somewhere is refused with the place", () => {
    const conductance: SheetConductance[] = [(x) => x - 0.5e-3];
    expect(() => solve({ ...across, conductance }, { accuracy: 1e-2 })).toThrow(FieldMediumError);
    try {
      solve({ ...across, conductance }, { accuracy: 1e-2 });
    } catch (error) {
      if (!(error instanceof FieldMediumError)) throw error;
      expect(error.xM).toBeGreaterThanOrEqual(0);
      expect(error.xM).toBeLessThanOrEqual(0.5e-3);
      expect(error.value).toBeCloseTo(error.xM - 0.5e-3, 12);
    }
  });
});

describe("caps", () => {
  const bend: Case = {
    outer: [
      [0, 0],
      [4, 0],
      [4, 1],
      [1, 1],
      [1, 4],
      [0, 4],
    ],
    a: [
      [4, 0],
      [4, 1],
    ],
    b: [
      [0, 4],
      [1, 4],
    ],
  };
  const exact = 6 + 1 - (2 / Math.PI) * Math.LN2;

  it.each([
    ["unknowns", { maximumUnknowns: 400 }],
    ["refinements", { maximumRefinements: 1 }],
    ["stopped", { shouldStop: () => true }],
  ] as const)("running into the cap of %s is a status with the bracket reached", (limit, options) => {
    const solution = solve(bend, { accuracy: 1e-9, ...options });
    expect(solution.status).toBe("limited");
    expect(solution.limit).toBe(limit);
    expect(solution.resistance?.lower).toBeLessThan(exact);
    expect(solution.resistance?.upper).toBeGreaterThan(exact - 1e-8);
    if (limit === "unknowns") expect(solution.unknowns).toBeLessThanOrEqual(400);
  });

  it("progress comes with both bounds nearer to each other every time", () => {
    const steps: { lower: number; upper: number }[] = [];
    solve(bend, { accuracy: 1e-8, onProgress: (progress) => steps.push(progress) });
    expect(steps.length).toBeGreaterThan(1);
    steps.slice(1).forEach((step, k) => {
      expect(step.lower).toBeGreaterThanOrEqual(steps[k].lower);
      expect(step.upper).toBeLessThanOrEqual(steps[k].upper);
    });
  });
});

import Decimal from "decimal.js";
import { describe, expect, it } from "vitest";
import { currentOf } from "@/lib/engine/field/bounds/bracket";
import { BoundaryReference } from "@/lib/engine/field/bounds/displacement";
import { ElementField } from "@/lib/engine/field/bounds/element-field";
import { Accumulator, down, up } from "@/lib/engine/field/bounds/interval";
import { functionScale } from "@/lib/engine/field/element/basis";
import { refine } from "@/lib/engine/field/mesh/bisect";
import type { FieldMesh } from "@/lib/engine/field/mesh/mesh";
import { buildDomain } from "@/lib/engine/field/outline/build-domain";
import type { DiscreteField } from "@/lib/engine/field/solve/pair";
import type { LinearSystem } from "@/lib/engine/field/solve/system";
import { exactGradients } from "./support/exact-gradients";
import { bendMesh, holedMesh, onHole } from "./support/meshes";
import { accept, meshOf } from "./support/outlines";
import { solveOn } from "./support/solutions";

const D = Decimal.clone({ precision: 45 });
const ORDER = 4;
const exact = new Map(exactGradients(D, ORDER).map((entry) => [entry.f, entry]));

/** A double as it is: decimal.js itself reads the shortest decimal that rounds to it. */
function exactly(x: number): Decimal {
  if (x === 0) return new D(0);
  const exponent = Math.floor(Math.log2(Math.abs(x))) - 60;
  return new D(BigInt(x * 2 ** -exponent).toString()).times(new D(2).pow(exponent));
}

/** ∫|grad|² of a discrete field from its own doubles, at 45 digits; jumps across cuts are added exactly. */
function exactEnergy(system: LinearSystem, field: DiscreteField): Decimal {
  const element = new ElementField();
  const { set, map, structure } = system;
  const { xy, triangles } = set.mesh;
  let total = new D(0);
  for (let t = 0; t < set.triangleCount; t++) {
    const layout = set.layouts[t];
    element.load(system, field, t);
    element.recover(system, t);
    const corner = [0, 1, 2].map((i) => {
      const e = map.vertexEntity[triangles[3 * t + i]];
      let value = exactly(
        e >= 0 ? field.x[structure.entityFirst[e]] : e === -1 ? 0 : field.prescribed[-2 - e],
      );
      for (let k = map.jumps?.start[3 * t + i] ?? 0; map.jumps && k < map.jumps.start[3 * t + i + 1]; k++) {
        value = value.plus(
          exactly(field.x[structure.entityFirst[map.jumps.entity[k]]]).times(map.jumps.sign[k]),
        );
      }
      return value;
    });
    const a = Array.from({ length: layout.modes }, () => new D(0));
    const b = Array.from({ length: layout.modes }, () => new D(0));
    a[0] = corner[1].minus(corner[0]).div(new D(2).sqrt());
    b[0] = corner[2].minus(corner[0]).div(new D(2).sqrt());
    layout.functions.forEach((f, i) => {
      const entry = exact.get(f);
      if (f < 3 || !entry) return;
      const c = exactly(element.values[i]).times(exactly(functionScale(f)));
      entry.xi.forEach((value, k) => (a[k] = a[k].plus(value.times(c))));
      entry.eta.forEach((value, k) => (b[k] = b[k].plus(value.times(c))));
    });
    const [p, q, r] = [0, 1, 2].map((i) => [0, 1].map((k) => exactly(xy[2 * triangles[3 * t + i] + k])));
    const [x1, y1] = [q[0].minus(p[0]), q[1].minus(p[1])];
    const [x2, y2] = [r[0].minus(p[0]), r[1].minus(p[1])];
    const det = x1.times(y2).minus(x2.times(y1));
    let sum = new D(0);
    for (let k = 0; k < layout.modes; k++) {
      const u = y2.times(a[k]).minus(y1.times(b[k]));
      const v = x1.times(b[k]).minus(x2.times(a[k]));
      sum = sum.plus(u.times(u)).plus(v.times(v));
    }
    total = total.plus(sum.div(det));
  }
  return total;
}

describe("the bracket in floating point", () => {
  const meshes: [string, FieldMesh][] = [
    ["a bend", bendMesh(1)],
    ["a hole as a terminal (with a cut)", holedMesh(5, (x, y) => (onHole(x, y) ? 0 : x > 1 - 1e-9 ? 1 : -1))],
  ];

  it.each(meshes)("%s: both energies at 45 digits lie within the error that is stated", (_, mesh) => {
    const { pair, energies, lower, upper } = solveOn(mesh, ORDER);
    for (const [system, fields, found] of [
      [pair.potentialSystem, pair.potentials, energies.potential[0]],
      [pair.streamSystem, pair.streams, energies.stream[0]],
    ] as const) {
      const truth = exactEnergy(system, fields[0]);
      const off = truth.minus(exactly(found.value)).abs().toNumber();
      expect(off).toBeLessThanOrEqual(found.error);
      // The statement is not empty: thirteen digits.
      expect(found.error).toBeLessThan(1e-12 * found.value);
    }
    // The same at 45 digits for the two sides of the bracket.
    const energy = exactEnergy(pair.potentialSystem, pair.potentials[0]);
    expect(exactly(lower).lessThanOrEqualTo(new D(1).div(energy))).toBe(true);
    const current = currentOf(pair.streamSystem, pair.streams[0], pair.currents[0]);
    const bound = exactEnergy(pair.streamSystem, pair.streams[0]).div(exactly(current.value).pow(2));
    expect(exactly(upper).greaterThanOrEqualTo(bound)).toBe(true);
  });

  it("holds for any field with the right boundary values, not only for the solution of the linear system", () => {
    const { pair, lower, upper } = solveOn(bendMesh(2), ORDER);
    const disturbed = (field: DiscreteField): DiscreteField => ({
      ...field,
      x: field.x.map((value, k) => value + 1e-3 * Math.sin(12.9898 * k)),
    });
    const energy = exactEnergy(pair.potentialSystem, disturbed(pair.potentials[0]));
    expect(new D(1).div(energy).toNumber()).toBeLessThan(lower);
    const stream = disturbed(pair.streams[0]);
    const current = currentOf(pair.streamSystem, stream, pair.currents[0]).value;
    expect(
      exactEnergy(pair.streamSystem, stream)
        .div(current * current)
        .toNumber(),
    ).toBeGreaterThan(upper);
  });

  it("sums with an error that is bounded", () => {
    const sum = new Accumulator();
    let truth = new D(0);
    for (let k = 0; k < 20_000; k++) {
      const term = Math.sin(k) * 10 ** (k % 17);
      sum.add(term);
      truth = truth.plus(exactly(term));
    }
    const { value, error } = sum.result();
    expect(truth.minus(exactly(value)).abs().toNumber()).toBeLessThanOrEqual(error);
    for (const x of [1, 1 / 3, 1e-300, 12345.678]) {
      expect(down(x)).toBeLessThan(x);
      expect(up(x)).toBeGreaterThan(x);
    }
  });
});

describe("rounded midpoints", () => {
  it("are measured against the outline: nothing along the axes, a few parts in 1e16 on slanting edges", () => {
    const outline = accept(
      {
        unit: "mm",
        outer: [
          [0, 0],
          [3, 1.1],
          [2.7, 2.9],
          [0.3, 1.7],
        ],
        holes: [],
      },
      [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 2 }] },
      ],
    );
    let { mesh } = meshOf(outline);
    const reference = new BoundaryReference(buildDomain(outline, "nominal"), mesh);
    for (let k = 0; k < 8; k++) {
      const displacements = reference.displacements(mesh);
      const largest = Math.max(...displacements);
      expect(largest).toBeGreaterThan(0);
      expect(largest).toBeLessThan(1e-12);
      mesh = refine(mesh, new Uint8Array(mesh.triangles.length / 3).fill(1));
    }
  });
});

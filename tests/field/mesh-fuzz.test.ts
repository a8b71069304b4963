import { orient2d } from "robust-predicates";
import { describe, expect, it } from "vitest";
import { refine } from "@/lib/engine/field/mesh/bisect";
import { refineTowards } from "@/lib/engine/field/mesh/corner-layers";
import { cornerAngles } from "@/lib/engine/field/mesh/corners";
import { validateMesh } from "@/lib/engine/field/mesh/validate-mesh";
import { check, meshOf } from "./support/outlines";
import { seeded, uglyOutline, type Polygon } from "./support/ugly-outlines";

/** By hand with FIELD_FUZZ=20000 for a long run. */
const RUNS = Number(process.env.FIELD_FUZZ ?? 210);

describe("ugly outlines", () => {
  it("spikes, combs, sieves, mazes, ribbons and needles give sound meshes at any scale, place and angle", () => {
    for (let seed = 0; seed < RUNS; seed++) {
      const { name, outer, holes } = uglyOutline(seed);
      const random = seeded(seed ^ 0x55555);
      const edge = Math.floor(random() * outer.length);
      const other = (edge + 2) % outer.length;
      const checked = check({ outer, holes }, [
        { name: "a", parts: [{ ring: 0, edge, from: 0.2, to: 0.8 }] },
        {
          name: "b",
          parts: [{ ring: 0, edge: other === edge ? (edge + 1) % outer.length : other, from: 0.3, to: 0.7 }],
        },
      ]);
      if (!checked.ok) {
        // Scaled up and moved away, a few lie beyond the largest coordinate.
        expect(checked.errors[0].detail, `${name} ${seed}`).toContain("lies too far out");
        continue;
      }
      const { mesh, status } = meshOf(checked.outline);
      const report = validateMesh(mesh);
      expect(report.faults, `${name} ${seed}`).toEqual([]);
      const sharpest = (Math.min(...cornerAngles(mesh).angle) * 180) / Math.PI;
      const least = sharpest >= 60 ? 19.99 : 0.4 * Math.min(20, sharpest);
      if (status === "complete") expect(report.minimumObtuseDeg, `${name} ${seed}`).toBeGreaterThan(least);
      if (seed % 3 === 0) {
        const plain = meshOf(checked.outline, "nominal", undefined, { spanChannels: false });
        const checkedPlain = validateMesh(plain.mesh);
        expect(checkedPlain.faults, `${name} ${seed}`).toEqual([]);
        if (plain.status === "complete") {
          expect(checkedPlain.minimumAngleDeg, `${name} ${seed}`).toBeGreaterThan(least);
        }
      }
      if (report.triangles > 4000) continue;
      const vertices = cornerAngles(mesh)
        .vertex.filter(() => random() < 0.1)
        .subarray(0, 8);
      let finer = refineTowards(
        mesh,
        vertices,
        Int32Array.from(vertices, () => Math.floor(40 * random())),
      );
      for (let round = 0; round < 2; round++) {
        finer = refine(
          finer,
          Uint8Array.from(finer.region, () => (random() < 0.1 ? 1 : 0)),
        );
      }
      expect(validateMesh(finer).faults, `${name} ${seed}`).toEqual([]);
    }
  }, 600_000);
});

describe("random rings", () => {
  it("are refused exactly when two edges meet, as trying all pairs says", () => {
    let simple = 0;
    for (let seed = 0; seed < 10 * RUNS; seed++) {
      const outer = randomRing(seeded(seed));
      const checked = check({ outer }, [
        { name: "a", parts: [{ ring: 0, edge: 0, from: 0.1, to: 0.2 }] },
        { name: "b", parts: [{ ring: 0, edge: 1, from: 0.5, to: 0.6 }] },
      ]);
      const complaints = checked.ok ? [] : checked.errors.filter((e) => e.pointer.startsWith("#/outline"));
      const expected = isSimple(outer);
      expect(complaints.length === 0, `${seed} ${JSON.stringify(outer)}`).toBe(expected);
      if (expected) simple++;
    }
    expect(simple).toBeGreaterThan(RUNS);
  });
});

/** Few points, on a small grid in half of all cases so that they coincide, line up and touch; often sorted by angle. */
function randomRing(random: () => number): Polygon {
  const n = 4 + Math.floor(random() * 9);
  const onGrid = random() < 0.5;
  const coordinate = (): number => (onGrid ? Math.floor(random() * 7) : random());
  const ring = Array.from({ length: n }, (): [number, number] => [coordinate(), coordinate()]);
  if (!onGrid && random() < 0.7) {
    ring.sort((p, q) => Math.atan2(p[1] - 0.5, p[0] - 0.5) - Math.atan2(q[1] - 0.5, q[0] - 0.5));
  }
  return ring;
}

function isSimple(ring: Polygon): boolean {
  const points = ring.filter(([x, y], i) => {
    const [px, py] = ring[(i + ring.length - 1) % ring.length];
    return x !== px || y !== py;
  });
  const n = points.length;
  if (n < 3) return false;
  type P = [number, number];
  const side = (a: P, b: P, c: P): number => Math.sign(orient2d(...a, ...b, ...c));
  const within = (p: number, q: number, r: number): boolean => Math.min(p, q) <= r && r <= Math.max(p, q);
  const on = (a: P, b: P, c: P): boolean =>
    side(a, b, c) === 0 && within(a[0], b[0], c[0]) && within(a[1], b[1], c[1]);
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      const [a, b, c, d] = [points[i], points[(i + 1) % n], points[j], points[(j + 1) % n]];
      if (j === i + 1 || (i === 0 && j === n - 1)) {
        const [x, y, z] = j === i + 1 ? [a, b, d] : [c, a, b];
        const back = (x[0] - y[0]) * (z[0] - y[0]) + (x[1] - y[1]) * (z[1] - y[1]) > 0;
        if (side(x, y, z) === 0 && back) return false;
        continue;
      }
      if (on(a, b, c) || on(a, b, d) || on(c, d, a) || on(c, d, b)) return false;
      if (side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0) return false;
    }
  }
  return true;
}

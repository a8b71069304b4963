import { describe, expect, it } from "vitest";
import { refine } from "@/lib/engine/field/mesh/bisect";
import { refineTowards } from "@/lib/engine/field/mesh/corner-layers";
import { cornerAngles } from "@/lib/engine/field/mesh/corners";
import type { FieldMesh } from "@/lib/engine/field/mesh/mesh";
import { validateMesh } from "@/lib/engine/field/mesh/validate-mesh";
import { seeded } from "./support/ugly-outlines";
import { accept, BEND, BEND_TERMINALS, ENDS, gon, meshOf, rectangle } from "./support/outlines";

const bend = (): FieldMesh => meshOf(accept(BEND, BEND_TERMINALS)).mesh;
const holed = (): FieldMesh =>
  meshOf(accept({ outer: rectangle(0, 0, 10, 6), holes: [gon(3, 3, 1, 12)] }, ENDS, [rectangle(5, 1, 8, 6)]))
    .mesh;

/** Area of each medium and length of each side. */
function measures(mesh: FieldMesh): number[] {
  const { xy, triangles, region, boundary } = mesh;
  const sums = new Array<number>(8 + mesh.sides.length).fill(0);
  for (let t = 0; t < region.length; t++) {
    const [a, b, c] = [2 * triangles[3 * t], 2 * triangles[3 * t + 1], 2 * triangles[3 * t + 2]];
    sums[region[t]] +=
      ((xy[b] - xy[a]) * (xy[c + 1] - xy[a + 1]) - (xy[b + 1] - xy[a + 1]) * (xy[c] - xy[a])) / 2;
  }
  for (let i = 0; i < boundary.length; i += 3) {
    const [a, b] = [2 * boundary[i], 2 * boundary[i + 1]];
    sums[8 + boundary[i + 2]] += Math.hypot(xy[b] - xy[a], xy[b + 1] - xy[a + 1]);
  }
  return sums;
}

function same(before: FieldMesh, after: FieldMesh): void {
  expect(validateMesh(after).faults).toEqual([]);
  const [old, now] = [measures(before), measures(after)];
  old.forEach((value, i) => expect(now[i]).toBeCloseTo(value, 12));
  expect(after.sides).toBe(before.sides);
  expect(Array.from(after.xy.subarray(0, before.xy.length))).toEqual(Array.from(before.xy));
}

describe("bisection", () => {
  it("leaves a mesh alone when nothing is marked", () => {
    const mesh = bend();
    expect(refine(mesh, new Uint8Array(mesh.region.length))).toBe(mesh);
  });

  it("bisects every triangle at least once, or three times", () => {
    const mesh = holed();
    const once = refine(mesh, new Uint8Array(mesh.region.length).fill(1));
    same(mesh, once);
    expect(once.region.length).toBeGreaterThanOrEqual(2 * mesh.region.length);
    const thrice = refine(mesh, new Uint8Array(mesh.region.length).fill(2));
    same(mesh, thrice);
    expect(thrice.region.length).toBe(4 * mesh.region.length);
  });

  it("keeps region, boundary, sides and angles through many rounds of random marks", () => {
    const random = seeded(11);
    for (const start of [bend(), holed()]) {
      let mesh = start;
      const bound = validateMesh(start).minimumAngleDeg / 2;
      for (let round = 0; round < 14; round++) {
        const marked = Uint8Array.from({ length: mesh.region.length }, () => {
          const dice = random();
          return dice < 0.08 ? 1 : dice < 0.1 ? 2 : 0;
        });
        mesh = refine(mesh, marked);
        same(start, mesh);
        // A triangle's descendants by newest-vertex bisection have four shapes; none has less than half its least angle.
        expect(validateMesh(mesh).minimumAngleDeg).toBeGreaterThanOrEqual(bound - 1e-9);
      }
      expect(mesh.region.length).toBeGreaterThan(1000);
    }
  });

  it("refines a single triangle over and over with little spreading", () => {
    let mesh = bend();
    const before = mesh.region.length;
    for (let round = 0; round < 40; round++) {
      const marked = new Uint8Array(mesh.region.length);
      marked[0] = 1;
      mesh = refine(mesh, marked);
    }
    expect(validateMesh(mesh).faults).toEqual([]);
    expect(mesh.region.length - before).toBeLessThan(40 * 16);
  });
});

describe("corner layers", () => {
  const reentrant = (mesh: FieldMesh): number => {
    const corners = cornerAngles(mesh);
    return corners.vertex[corners.angle.indexOf(Math.max(...corners.angle))];
  };

  function starSize(mesh: FieldMesh, v: number): { size: number; triangles: number } {
    let size = 0;
    let triangles = 0;
    for (let t = 0; t < mesh.region.length; t++) {
      const corners = Array.from(mesh.triangles.subarray(3 * t, 3 * t + 3));
      if (!corners.includes(v)) continue;
      triangles++;
      for (const a of corners) {
        size = Math.max(
          size,
          Math.hypot(mesh.xy[2 * a] - mesh.xy[2 * v], mesh.xy[2 * a + 1] - mesh.xy[2 * v + 1]),
        );
      }
    }
    return { size, triangles };
  }

  it("halve the star of the vertex at a constant price", () => {
    const mesh = bend();
    const v = reentrant(mesh);
    const before = starSize(mesh, v);
    for (const layers of [1, 7, 30]) {
      const graded = refineTowards(mesh, Int32Array.of(v), Int32Array.of(layers));
      same(mesh, graded);
      const after = starSize(graded, v);
      expect(after.triangles).toBe(before.triangles);
      expect(after.size).toBeCloseTo(before.size * 2 ** -layers, 12);
      expect(graded.region.length).toBe(mesh.region.length + 2 * layers * before.triangles);
    }
  });

  it("keep the angles bounded however many there are", () => {
    const mesh = bend();
    const v = reentrant(mesh);
    const few = validateMesh(refineTowards(mesh, Int32Array.of(v), Int32Array.of(2))).minimumAngleDeg;
    const many = validateMesh(refineTowards(mesh, Int32Array.of(v), Int32Array.of(35))).minimumAngleDeg;
    expect(many).toBeCloseTo(few, 3);
    expect(few).toBeGreaterThan(10);
  });

  it("towards all corners at once, neighbours included, then bisection", () => {
    for (const mesh of [bend(), holed()]) {
      const { vertex } = cornerAngles(mesh);
      const layers = Int32Array.from(vertex, (_, i) => 1 + (i % 12));
      const graded = refineTowards(mesh, vertex, layers);
      same(mesh, graded);
      same(mesh, refine(graded, new Uint8Array(graded.region.length).fill(1)));
    }
  });

  it("towards a vertex inside", () => {
    const mesh = holed();
    const onBoundary = new Set(mesh.boundary.filter((_, i) => i % 3 === 0));
    let inside = 0;
    while (onBoundary.has(inside)) inside++;
    same(mesh, refineTowards(mesh, Int32Array.of(inside), Int32Array.of(9)));
  });

  it("stop where coordinates end, and do nothing for no layers", () => {
    const mesh = bend();
    const v = reentrant(mesh);
    const graded = refineTowards(mesh, Int32Array.of(v), Int32Array.of(1000));
    expect(validateMesh(graded).faults).toEqual([]);
    expect(starSize(graded, v).size).toBeGreaterThan(2 ** -43);
    expect(refineTowards(mesh, Int32Array.of(v), Int32Array.of(0)).region).toEqual(mesh.region);
  });
});

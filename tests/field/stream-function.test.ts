import { describe, expect, it } from "vitest";
import { findBoundaryRuns } from "@/lib/engine/field/assembly/boundary-runs";
import { makeElements } from "@/lib/engine/field/assembly/elements";
import { streamUnknowns } from "@/lib/engine/field/assembly/stream";
import { listTriangleEntities, type UnknownMap } from "@/lib/engine/field/assembly/unknowns";
import { currentOf, upperBound } from "@/lib/engine/field/bounds/bracket";
import { fieldEnergies } from "@/lib/engine/field/bounds/energies";
import { analyse } from "@/lib/engine/field/solve/symbolic";
import { dissect } from "@/lib/engine/field/solve/dissection";
import { factorise, substitute } from "@/lib/engine/field/solve/factor";
import { holedMesh, onHole, type TerminalAt } from "./support/meshes";
import { solveOn } from "./support/solutions";

const left = (x: number): boolean => x < 1e-9;
const right = (x: number): boolean => x > 1 - 1e-9;
const holeLeft = (x: number, y: number): boolean => onHole(x, y) && x < 0.401;
const holeRight = (x: number, y: number): boolean => onHole(x, y) && x > 0.599;
const holeBelow = (x: number, y: number): boolean => onHole(x, y) && y < 0.401;

/** Terminals in every position that the cohomology of the stream function knows. */
const CASES: [string, TerminalAt][] = [
  ["insulated hole, both terminals outside", (x) => (left(x) ? 0 : right(x) ? 1 : -1)],
  ["one terminal is the hole, the other a side", (x, y) => (onHole(x, y) ? 0 : right(x) ? 1 : -1)],
  ["both terminals are whole rings", (x, y) => (onHole(x, y) ? 0 : 1)],
  [
    "the hole a terminal, three pieces outside",
    (x, y) => (onHole(x, y) ? 0 : y < 1e-9 || (left(x) && y > 0.6) || (right(x) && y < 0.4) ? 1 : -1),
  ],
  ["part of the hole, part of the outside", (x, y) => (holeLeft(x, y) ? 0 : right(x) ? 1 : -1)],
  ["both terminals on the hole", (x, y) => (holeLeft(x, y) ? 0 : holeRight(x, y) ? 1 : -1)],
  [
    "a terminal wrapped around a corner of the hole",
    (x, y) => (holeLeft(x, y) || holeBelow(x, y) ? 0 : right(x) ? 1 : -1),
  ],
  [
    "one terminal with pieces on both rings",
    (x, y) => (holeLeft(x, y) ? 0 : holeRight(x, y) || (right(x) && y > 0.5) ? 1 : -1),
  ],
  [
    "both terminals with pieces on both rings",
    (x, y) =>
      holeLeft(x, y) || (left(x) && y > 0.5)
        ? 0
        : holeRight(x, y) || (right(x) && y > 0.5) || (y < 1e-9 && x < 0.5)
          ? 1
          : -1,
  ],
  ["the whole outside and a part of the hole", (x, y) => (holeLeft(x, y) ? 0 : onHole(x, y) ? -1 : 1)],
];

describe("the stream function on domains with a hole", () => {
  it.each(CASES)("%s", (_, terminal) => {
    let before = { lower: 0, upper: Infinity };
    for (const order of [1, 2, 3, 5]) {
      const { pair, energies, lower, upper, gap } = solveOn(holedMesh(10, terminal), order);
      // Admissible fields: the power of E on J is current times voltage, so the gaps add up to the bracket's width.
      const current = currentOf(pair.streamSystem, pair.streams[0], pair.currents[0]).value;
      expect(energies.work[0]).toBeCloseTo(current, 11);
      expect(gap).toBeCloseTo(1 / lower - 1 / upper, 10);
      // The currents out of both terminals cancel.
      const other = currentOf(pair.streamSystem, pair.streams[0], pair.currents[1]).value;
      expect(other).toBeCloseTo(-current, 12);
      // Nested spaces: both bounds only ever come nearer.
      expect(lower).toBeLessThan(upper);
      expect(lower).toBeGreaterThanOrEqual(before.lower * (1 - 1e-12));
      expect(upper).toBeLessThanOrEqual(before.upper * (1 + 1e-12));
      before = { lower, upper };
    }
  });

  it("gives the same bracket whichever way the terminals are numbered", () => {
    for (const [, terminal] of CASES) {
      const a = solveOn(holedMesh(10, terminal), 3);
      const swapped: TerminalAt = (x, y) => [-1, 1, 0][terminal(x, y) + 1];
      const b = solveOn(holedMesh(10, swapped), 3);
      expect(b.lower).toBeCloseTo(a.lower, 10);
      expect(b.upper).toBeCloseTo(a.upper, 10);
    }
  });
});

describe("the constant of an insulated hole", () => {
  const mesh = holedMesh(10, (x) => (left(x) ? 0 : right(x) ? 1 : -1));
  const set = makeElements(mesh, new Uint8Array(mesh.triangles.length / 3).fill(3));
  const runs = findBoundaryRuns(mesh);
  const good = solveOn(mesh, 3);
  const truth = solveOn(
    holedMesh(20, (x) => (left(x) ? 0 : right(x) ? 1 : -1)),
    5,
  );
  const isHole = (v: number): boolean => onHole(mesh.xy[2 * v], mesh.xy[2 * v + 1]);
  const { map, currents } = streamUnknowns(set, runs, 2);

  /** Solves for the stream function with a changed map and returns what would be taken for the upper bound. */
  function supposedUpper(changed: UnknownMap): number {
    const entities = listTriangleEntities(changed, mesh.triangles, set.edges.edgeOf);
    const structure = analyse(dissect(set), entities, changed.entitySize);
    const system = { ...good.pair.streamSystem, map: changed, structure };
    const x = new Float64Array(structure.unknowns);
    currents[0].entity.forEach((e, k) => (x[structure.entityFirst[e]] += currents[0].coefficient[k]));
    substitute(factorise(system), x);
    const field = { x, prescribed: [] };
    const energies = fieldEnergies({ ...good.pair, streamSystem: system, streams: [field] }, [1], null);
    return upperBound(energies.stream[0], currentOf(system, field, currents[0]));
  }

  it("as one unknown gives the bound", () => {
    const tied = supposedUpper(map);
    expect(tied).toBeCloseTo(good.upper, 12);
    expect(tied).toBeGreaterThan(truth.lower);
  });

  it("left out, the hole's vertices free, would give a false bound: below the true resistance", () => {
    const vertexEntity = map.vertexEntity.slice();
    const entitySize = map.entitySize.slice();
    for (let v = 0; v < set.vertexCount; v++) {
      if (!isHole(v)) continue;
      vertexEntity[v] = v;
      entitySize[v] = 1;
      const next = runs.next[v];
      for (let e = 0; e < set.edges.count; e++) {
        const [a, b] = [set.edges.ends[2 * e], set.edges.ends[2 * e + 1]];
        if ((a === v && b === next) || (b === v && a === next)) entitySize[map.firstEdge + e] = 2;
      }
    }
    entitySize[map.vertexEntity.find((_, v) => isHole(v)) ?? -1] = 0;
    // The current then crosses the hole's wall as if there were conductor in the hole's place.
    expect(supposedUpper({ ...map, vertexEntity, entitySize })).toBeLessThan(truth.lower);
  });

  it("merely fixed gives a bound that is valid but loose", () => {
    const vertexEntity = map.vertexEntity.map((e, v) => (isHole(v) ? -1 : e));
    const fixed = supposedUpper({ ...map, vertexEntity });
    expect(fixed).toBeGreaterThan(1.05 * truth.upper);
  });
});

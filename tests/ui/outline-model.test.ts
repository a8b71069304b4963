import { describe, expect, it } from "vitest";
import { sketchFromHash, sketchToHash } from "@/app/(site)/outline/_model/address";
import { complaintsAt, placed, placeId, placeOf, placeTitle } from "@/app/(site)/outline/_model/complaints";
import { bowOf, bowThrough, centreOfRadius, edgeOf, pointAt } from "@/app/(site)/outline/_model/edges";
import {
  bowEdge,
  insertVertex,
  moveVertex,
  QUARTER_BOW,
  removeRing,
  removeVertex,
  rescale,
  setArc,
} from "@/app/(site)/outline/_model/edit";
import { EventReader } from "@/app/(site)/outline/_model/events";
import { fieldBody } from "@/app/(site)/outline/_model/field-body";
import { commit, redo, startHistory, undo } from "@/app/(site)/outline/_model/history";
import { readBody, readBodyText } from "@/app/(site)/outline/_model/read-body";
import { roomiest } from "@/app/(site)/outline/_model/room";
import type { Sketch } from "@/app/(site)/outline/_model/sketch";
import { EMPTY_SKETCH, START_OUTLINES, startSketch } from "@/app/(site)/outline/_model/start-outlines";
import { partOfSegment, toggleEdge } from "@/app/(site)/outline/_model/terminals";
import { whatIsMissing } from "@/app/(site)/outline/_model/unready";
import { fitView, shownStep, snapTo, toPlane, toScreen, zoomAt } from "@/app/(site)/outline/_model/view";
import { libraryMaterial, prepareField } from "@/lib/engine";

const bend = startSketch("bend");

function accepted(sketch: Sketch): boolean {
  prepareField(fieldBody(sketch), { material: libraryMaterial, outline: () => undefined });
  return true;
}

describe("start outlines", () => {
  it.each(START_OUTLINES.map(({ id }) => id))(
    "%s is accepted as it stands and comes back from its body",
    (id) => {
      const sketch = startSketch(id);
      expect(accepted(sketch)).toBe(true);
      expect(readBody(fieldBody(sketch), EMPTY_SKETCH)).toEqual({ ok: true, sketch, holds: "field" });
    },
  );
});

describe("vertices", () => {
  it("keep terminals on their edges when one is put in before them", () => {
    const next = insertVertex(bend, 0, 0);
    expect(next.rings[0][1]).toEqual({ x: 20, y: 0 });
    expect(next.terminals.map(({ parts }) => parts[0].edge)).toEqual([2, 5]);
    expect(accepted(next)).toBe(true);
  });

  it("split a terminal's edge in two parts and join them again", () => {
    const split = insertVertex(bend, 0, 1, 0.25);
    expect(split.terminals[0].parts.map(({ edge, from, to }) => [edge, from, to])).toEqual([
      [1, 0, 1],
      [2, 0, 1],
    ]);
    const joined = removeVertex(split, 0, 2);
    expect(joined.rings).toEqual(bend.rings);
    expect(joined.terminals).toEqual(bend.terminals);
  });

  it("renumber edges when the first vertex goes", () => {
    const next = removeVertex(bend, 0, 0);
    expect(next.rings[0]).toHaveLength(5);
    expect(next.terminals.map(({ parts }) => parts[0].edge)).toEqual([0, 3]);
  });

  it("carry a ring and its terminals away when too few are left", () => {
    const plate = startSketch("plate");
    const without = removeRing(plate, 1);
    expect(without.rings).toHaveLength(1);
    const triangle: Sketch = {
      ...bend,
      rings: [bend.rings[0].slice(0, 3)],
      terminals: [{ ...bend.terminals[0] }],
    };
    const none = removeVertex(triangle, 0, 1);
    expect(none.rings).toEqual([[]]);
    expect(none.terminals[0].parts).toEqual([]);
  });

  it("change unit by conversion", () => {
    const inches = { ...rescale(bend, 0.001 / 0.0254), unit: "in" as const };
    expect(inches.rings[0][1].x).toBeCloseTo(40 / 25.4, 10);
    expect(rescale(inches, 25.4).rings[0].map(({ x, y }) => [x, y])).toEqual(
      bend.rings[0].map(({ x, y }) => [x, y]),
    );
  });

  it("change unit around many times and come back to the decimals that were typed", () => {
    const typed = { ...bend, rings: [[0, 7, 0.1, 12.345, 1e-7].map((x) => ({ x, y: 7 - x }))] };
    let there = typed as typeof bend;
    for (const ratio of [0.1, 1 / 2.54, 25.4, 1000, 1e-3 / 0.0254, 0.0254, 1]) there = rescale(there, ratio);
    expect(there.rings[0].map(({ x }) => x)).toEqual(typed.rings[0].map(({ x }) => x));
  });
});

describe("arcs", () => {
  it("bow out of an edge, pass the engine's check and go straight again", () => {
    const bowed = bowEdge(bend, 0, 0, QUARTER_BOW);
    const { arc } = edgeOf(bowed.rings[0], 0);
    expect(Math.abs(arc?.sweep ?? 0)).toBeCloseTo(Math.PI / 2, 9);
    expect(accepted(bowed)).toBe(true);
    // To the right of the way from (0, 0) to (40, 0) is below.
    expect(pointAt(edgeOf(bowed.rings[0], 0), 0.5)[1]).toBeLessThan(0);
    expect(setArc(bowed, 0, 0, null)).toEqual(bend);
  });

  it("follow the pointer and keep their sweep when an end moves", () => {
    const bow = bowThrough([0, 0], [40, 0], [20, 13]) ?? 0;
    const bowed = bowEdge(bend, 0, 0, bow);
    expect(pointAt(edgeOf(bowed.rings[0], 0), 0.5)[1]).toBeCloseTo(13, 9);
    const moved = moveVertex(bowed, 0, 0, -7, 3);
    expect(bowOf(edgeOf(moved.rings[0], 0))).toBeCloseTo(bow, 9);
    expect(bowThrough([0, 0], [40, 0], [60, 0])).toBeNull();
  });

  it("take a radius, on the same side and the same way round", () => {
    const edge = edgeOf(bowEdge(bend, 0, 0, QUARTER_BOW).rings[0], 0);
    const centre = centreOfRadius(edge, 25);
    expect(Math.hypot(centre?.x ?? 0, centre?.y ?? 0)).toBeCloseTo(25, 9);
    expect(centre?.y).toBeCloseTo(15, 9);
    expect(centreOfRadius(edge, 19)).toBeNull();
  });

  it("stay a circle when a vertex of a round hole moves or a vertex is put on it", () => {
    const plate = startSketch("plate");
    const wider = moveVertex(plate, 1, 1, 53, 22);
    expect(accepted(wider)).toBe(true);
    const more = insertVertex(plate, 1, 0, 0.3);
    expect(more.rings[1]).toHaveLength(3);
    expect(accepted(more)).toBe(true);
    // Its two halves share the centre, so taking it out gives the same arc again.
    expect(removeVertex(more, 1, 1)).toEqual(plate);
  });
});

describe("room", () => {
  it("is found inside the conductor, away from edges and holes", () => {
    const inBend = roomiest(bend.rings);
    expect(inBend?.x).toBeLessThan(10);
    expect(inBend?.y).toBeLessThan(10);
    expect(inBend?.distance).toBeGreaterThan(4.5);
    const inPlate = roomiest(startSketch("plate").rings);
    expect(Math.hypot((inPlate?.x ?? 40) - 40, (inPlate?.y ?? 20) - 20)).toBeGreaterThan(18);
    expect(roomiest([[]])).toBeNull();
  });
});

describe("terminals", () => {
  it("take an edge from each other and give it back", () => {
    const taken = toggleEdge(bend, 1, 0, 1);
    expect(taken.terminals.map(({ parts }) => parts.length)).toEqual([0, 2]);
    expect(toggleEdge(taken, 1, 0, 1).terminals[1]).toEqual(bend.terminals[1]);
  });

  it("are found on their edge from the ends of a segment", () => {
    const segment = [
      [40, 2.5],
      [40, 10],
    ] as const;
    expect(partOfSegment(bend.rings, segment)).toEqual({ ring: 0, edge: 1, from: 0.25, to: 1 });
    expect(
      partOfSegment(bend.rings, [
        [41, 0],
        [41, 10],
      ]),
    ).toBeNull();
  });
});

describe("history", () => {
  it("steps back and forth, a run of one tag as one step", () => {
    let history = startHistory(0);
    for (const n of [1, 2, 3]) history = commit(history, n, "drag");
    history = commit(history, 4);
    history = undo(history);
    expect(history.present).toBe(3);
    history = undo(history);
    expect(history.present).toBe(0);
    expect(undo(history)).toBe(history);
    history = redo(redo(history));
    expect(history.present).toBe(4);
    expect(redo(history)).toBe(history);
    expect(commit(undo(history), 9).future).toEqual([]);
  });
});

describe("bodies", () => {
  it("are read from an outline alone, keeping medium and settings", () => {
    const reading = readBodyText(
      '{"unit":"mm","outer":[[0,0],[4,0],{"arcTo":[0,4],"center":[0,0]}],"holes":[]}',
      bend,
    );
    expect(reading.ok && [reading.holds, reading.sketch.medium, reading.sketch.rings[0][2]]).toEqual([
      "outline",
      bend.medium,
      { x: 0, y: 4, arc: { x: 0, y: 0, clockwise: false } },
    ]);
  });

  it("keep segments that lie on no edge, for the API to judge", () => {
    const body = {
      ...fieldBody(bend),
      terminals: [
        {
          name: "in",
          segments: [
            [
              [50, 0],
              [50, 10],
            ],
          ],
        },
      ],
    };
    const reading = readBody(body, EMPTY_SKETCH);
    expect(reading.ok && fieldBody(reading.sketch).terminals).toEqual(body.terminals);
  });

  it("come from the answer to a stored outline as well", () => {
    const outline = {
      unit: "mm",
      outer: [
        [0, 0],
        [4, 0],
        [0, 4],
      ],
      holes: [],
      symmetry: "plan",
    };
    const stored = { id: "out_1", name: "", createdAt: "", outline, terminals: [], regions: [], repairs: [] };
    expect(readBody(stored, bend)).toMatchObject({ ok: true, sketch: { unit: "mm" } });
  });

  it.each([
    ["{", "#"],
    ["[]", "#"],
    ["{}", "#/outline"],
    ['{"outer":[[0,0],[1]]}', "#/outer/1"],
    ['{"outline":{"outer":[[0,0],{"arcTo":[1,1]}]}}', "#/outline/outer/1/center"],
    ['{"unit":"parsec","outer":[]}', "#/unit"],
    ['{"outer":[],"terminals":[{"name":"a","parts":[{"ring":0}]}]}', "#/terminals/0/parts/0/edge"],
    ['{"outline":{"outer":[]},"medium":{"colour":1}}', "#/medium/colour"],
    ['{"outer":[],"hole":[[[1,1],[2,1],[2,2]]]}', "#/hole"],
    ['{"outline":{"outer":[],"colour":"red"}}', "#/outline/colour"],
    ['{"outline":{"outer":[]},"accurracy":1e-6}', "#/accurracy"],
    ['{"outline":{"outer":[]},"regions":[{"name":"a","ring":[]}]}', "#/regions"],
    ['{"outer":[{"arcTo":[1,1],"center":[0,0],"cw":true}]}', "#/outer/0/cw"],
    ['{"outer":[],"terminals":[{"name":"a","edges":[1]}]}', "#/terminals/0/edges"],
    [
      '{"outer":[],"terminals":[{"name":"a","parts":[{"ring":0,"edge":1,"until":0.5}]}]}',
      "#/terminals/0/parts/0/until",
    ],
    ['{"outline":{"outer":[]},"medium":{"resistivity":1,"sheetResistance":2}}', "#/medium"],
  ])("complain at the place: %s", (text, pointer) => {
    const reading = readBodyText(text, EMPTY_SKETCH);
    expect(reading.ok ? [] : reading.complaints.map((complaint) => complaint.pointer)).toContain(pointer);
  });

  it("travel behind the # of an address, long ones packed", async () => {
    for (const { id } of START_OUTLINES) {
      const hash = await sketchToHash(startSketch(id));
      expect(await sketchFromHash(hash, EMPTY_SKETCH)).toEqual(startSketch(id));
    }
    let many = bend;
    for (let k = 0; k < 400; k++) many = insertVertex(many, 0, 0, 0.5);
    const hash = await sketchToHash(many);
    expect(hash.startsWith("packed=")).toBe(true);
    expect(await sketchFromHash(hash, EMPTY_SKETCH)).toEqual(many);
    expect(await sketchFromHash("body=%7B", EMPTY_SKETCH)).toBeNull();
  });
});

describe("complaints", () => {
  it.each([
    ["#/outline/outer/3", { kind: "vertex", ring: 0, index: 3 }],
    ["#/outline/holes/1/2", { kind: "vertex", ring: 2, index: 2 }],
    ["#/outline/holes/1", { kind: "ring", ring: 2 }],
    ["#/medium/regions/0/ring/4", { kind: "vertex", ring: -1, index: 4 }],
    ["#/medium/regions/2/medium/thickness", { kind: "region", region: 2, name: "thickness" }],
    ["#/medium/sheetResistance", { kind: "medium", name: "sheetResistance" }],
    ["#/terminals/1/parts/0", { kind: "terminal", terminal: 1, list: "parts", item: 0 }],
    ["#/terminals", { kind: "setting", name: "terminals" }],
    ["#/requirement/min", { kind: "setting", name: "min" }],
    ["#/elsewhere", null],
  ])("%s", (pointer, place) => expect(placeOf(pointer)).toEqual(place));

  it.each([
    ["#/outline/outer/3", [1, 2] as const, "Outer ring, edge 3", null],
    ["#/outline/holes/0/1", undefined, "Hole 0, vertex 1", null],
    ["#/outline/outer", undefined, "Outer ring", null],
    ["#/terminals/0", undefined, "Terminal in", "terminal-0"],
    ["#/terminals/1/parts/0/edge", undefined, "Terminal out, part 1", "terminal-1"],
    ["#/terminals", undefined, "Terminals", "terminals"],
    ["#/medium/sheetResistance", undefined, "Medium, sheet resistance", "medium"],
    ["#/medium/regions/2/medium/thickness", undefined, "Region 2, thickness", "region-2"],
    ["#/requirement/min", undefined, "Requirement, at least", "goal"],
    ["#", undefined, "This outline", null],
  ])("%s has words and a place on the page", (pointer, at, title, id) => {
    const [complaint] = placed([{ pointer, detail: "is wrong.", at }]);
    expect(placeTitle(complaint, bend)).toBe(title);
    expect(complaint.place && placeId(complaint.place)).toBe(id);
  });

  it("are all told at one place, each once", () => {
    const found = placed(
      ["cross at (1, 0).", "cross at (2, 0).", "cross at (2, 0)."].map((detail) => ({
        pointer: "#/outline/outer/3",
        detail,
      })),
    );
    expect(complaintsAt(found, ({ kind }) => kind === "vertex")).toEqual([
      "Cross at (1, 0).",
      "Cross at (2, 0).",
    ]);
    expect(complaintsAt(found, ({ kind }) => kind === "ring")).toEqual([]);
  });
});

describe("what is missing", () => {
  const bare = (terminal: Sketch["terminals"][number]) => ({ ...terminal, parts: [] });
  it.each([
    ["an outer ring", EMPTY_SKETCH, /^Draw the outer ring first/],
    ["terminals", { ...bend, terminals: [] }, /^Add two terminals/],
    ["one more terminal", { ...bend, terminals: bend.terminals.slice(1) }, /^Add a second terminal/],
    [
      "an edge",
      { ...bend, terminals: [bend.terminals[0], bare(bend.terminals[1])] },
      /^Give terminal out an edge/,
    ],
  ])("%s", (_, sketch, words) => expect(whatIsMissing(sketch)).toMatch(words));

  it("is nothing once the API can be asked", () => {
    for (const { id } of START_OUTLINES) expect(whatIsMissing(startSketch(id))).toBeNull();
  });
});

describe("the view", () => {
  const size = { width: 800, height: 600 };
  it("maps there and back and keeps the point under the pointer", () => {
    const view = fitView({ minX: 0, minY: 0, maxX: 40, maxY: 10 }, size, 40);
    expect(toScreen(view, size, [0, 5])).toEqual([40, 300]);
    const at = [123, 456] as const;
    const near = zoomAt(view, size, at, 3);
    const [before, after] = [toPlane(view, size, at), toPlane(near, size, at)];
    expect(after[0]).toBeCloseTo(before[0], 9);
    expect(after[1]).toBeCloseTo(before[1], 9);
  });

  it("snaps without dust and thins a dense grid", () => {
    expect(snapTo(0.1, [0.31, -0.04])).toEqual([0.3, 0]);
    expect(shownStep(1, 1)).toBe(10);
    expect(shownStep(1, 20)).toBe(1);
  });
});

describe("events", () => {
  it("come whole from pieces", () => {
    const reader = new EventReader();
    expect(reader.read(": waiting\n\nevent: progress\nda")).toEqual([]);
    expect(reader.read('ta: {"a":1}\n\nevent: end\ndata: {}\n\n')).toEqual([
      { event: "progress", data: '{"a":1}' },
      { event: "end", data: "{}" },
    ]);
  });
});

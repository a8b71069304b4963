import { describe, expect, it } from "vitest";
import { plotSvg } from "@/lib/engine/field/picture/plot-svg";
import { FILE_LOOK, PAPER_COLOURS } from "@/lib/engine/field/picture/plot-look";
import { NAME_HEIGHT, nameWidth } from "@/lib/engine/field/picture/terminal-label";
import { solveField } from "@/lib/engine/field/solve-field";
import { accept } from "./support/outlines";

type Point = [number, number];
interface Part {
  readonly ring: number;
  readonly edge: number;
  readonly from?: number;
  readonly to?: number;
}
interface Case {
  readonly outer: Point[];
  readonly holes?: Point[][];
  readonly symmetry?: "axisymmetric";
  readonly terminals: readonly { readonly name: string; readonly parts: Part[] }[];
}

const RECTANGLE: Point[] = [
  [0, 0],
  [50, 0],
  [50, 30],
  [0, 30],
];
const circle = (x: number, y: number, radius: number): Point[] =>
  Array.from({ length: 24 }, (_, k) => [
    x + radius * Math.cos((Math.PI * k) / 12),
    y + radius * Math.sin((Math.PI * k) / 12),
  ]);
const whole = (edge: number, ring = 0): Part[] => [{ ring, edge }];

const CASES: Readonly<Record<string, Case>> = {
  bend: {
    outer: [
      [0, 0],
      [4, 0],
      [4, 1],
      [1, 1],
      [1, 4],
      [0, 4],
    ],
    terminals: [
      { name: "in", parts: whole(1) },
      { name: "out", parts: whole(4) },
    ],
  },
  "plate with holes": {
    outer: RECTANGLE,
    holes: [circle(12, 15, 6), circle(30, 10, 5)],
    terminals: [
      { name: "left lug", parts: whole(3) },
      { name: "bolt", parts: circle(0, 0, 1).map((_, edge) => ({ ring: 2, edge })) },
    ],
  },
  meander: {
    outer: [
      [0, 0],
      [1, 0],
      [1, 19],
      [3, 19],
      [3, 0],
      [7, 0],
      [7, 20],
      [6, 20],
      [6, 1],
      [4, 1],
      [4, 20],
      [0, 20],
    ],
    terminals: [
      { name: "in", parts: whole(0) },
      { name: "out", parts: whole(6) },
    ],
  },
  "body of revolution": {
    outer: [
      [0.5, 0],
      [3, 0],
      [2, 5],
      [0.5, 5],
    ],
    symmetry: "axisymmetric",
    terminals: [
      { name: "bottom flange", parts: whole(0) },
      { name: "top", parts: whole(2) },
    ],
  },
  "tiny terminal in a slot": {
    outer: [
      [0, 0],
      [50, 0],
      [50, 30],
      [26, 30],
      [26, 20],
      [25, 20],
      [25, 30],
      [0, 30],
    ],
    terminals: [
      { name: "probe of the slot", parts: [{ ring: 0, edge: 4 }] },
      { name: "ground", parts: whole(0) },
    ],
  },
  "close terminals": {
    outer: RECTANGLE,
    terminals: [
      { name: "force +", parts: [{ ring: 0, edge: 2, from: 0.46, to: 0.48 }] },
      { name: "sense +", parts: [{ ring: 0, edge: 2, from: 0.5, to: 0.52 }] },
      { name: "return of the measuring current", parts: whole(1) },
    ],
  },
};

interface Name {
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Names, conductor and frame as they stand in a picture. */
function pictured({ outer, holes = [], symmetry, terminals }: Case, width: number) {
  const outline = accept({ unit: "mm", outer, holes, ...(symmetry ? { symmetry } : {}) }, [...terminals]);
  const { map } = solveField({ outline, conductance: [1] }, { accuracy: 1e-2 });
  const names = terminals.map(({ name }) => name);
  const svg = plotSvg(
    map,
    { title: "R", subtitle: "", terminalNames: names, unit: "mm" },
    { width, tallest: 560, titled: false, ground: false, colours: PAPER_COLOURS, id: "p" },
  );
  const placed: Name[] = [
    ...svg.matchAll(/<text x="([\d.]+)" y="([\d.]+)"[^>]*font-weight="600"[^>]*>([^<]*)</g),
  ].map(([, x, y, text]) => {
    const wide = nameWidth(text);
    return {
      text,
      x: Number(x) - wide / 2,
      y: Number(y) - 5 - NAME_HEIGHT / 2,
      width: wide,
      height: NAME_HEIGHT,
    };
  });
  const rings = (/<clipPath id="p-conductor"><path d="([^"]*)"/.exec(svg)?.[1] ?? "")
    .split("Z")
    .filter((ring) => ring !== "")
    .map((ring) =>
      ring
        .split(/[ML]/)
        .slice(1)
        .map((pair) => pair.split(" ").map(Number) as Point),
    );
  return { svg, names, placed, rings };
}

function inside([x, y]: Point, rings: readonly Point[][]): boolean {
  let crossings = 0;
  for (const ring of rings) {
    ring.forEach(([ax, ay], k) => {
      const [bx, by] = ring[(k + 1) % ring.length];
      if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) crossings++;
    });
  }
  return crossings % 2 === 1;
}

const SAMPLES = [0, 0.1, 0.25, 0.5, 0.75, 0.9, 1];

describe.each(Object.entries(CASES))("the names of the terminals of a %s", (_, shape) => {
  it.each([400, 880, 960])("stand outside the conductor and apart, %i px wide", (width) => {
    const { names, placed, rings } = pictured(shape, width);
    expect(placed.map(({ text }) => text).sort()).toEqual([...names].sort());
    for (const name of placed) {
      expect([name.text, name.x >= 0, name.x + name.width <= width, name.y >= 0]).toEqual([
        name.text,
        true,
        true,
        true,
      ]);
      const points = SAMPLES.flatMap((s) =>
        SAMPLES.map((t): Point => [name.x + s * name.width, name.y + t * name.height]),
      );
      expect([name.text, points.some((point) => inside(point, rings))]).toEqual([name.text, false]);
      for (const other of placed) {
        if (other === name) continue;
        const apart =
          name.x + name.width <= other.x ||
          other.x + other.width <= name.x ||
          name.y + name.height <= other.y ||
          other.y + other.height <= name.y;
        expect([name.text, other.text, apart]).toEqual([name.text, other.text, true]);
      }
    }
  });
});

describe("a picture's looks", () => {
  it("has a leader to a name that found no room beside its terminal", () => {
    expect(pictured(CASES["tiny terminal in a slot"], 880).svg).toMatch(
      /<path d="M[^"]*" fill="none" stroke="#9c4a1f" stroke-width="1"\/>/,
    );
    expect(pictured(CASES.bend, 880).svg).not.toMatch(/stroke-width="1"\/>/);
  });

  it("has no ground, no rules of style and no title inside a page, and all but rules as a file", () => {
    const { svg } = pictured(CASES.bend, 880);
    expect(svg).not.toMatch(/<style|#faf8f3|font-size="22"/);
    const outline = accept({ unit: "mm", outer: CASES.bend.outer, holes: [] }, [...CASES.bend.terminals]);
    const { map } = solveField({ outline, conductance: [1] }, { accuracy: 1e-2 });
    const file = plotSvg(map, { title: "R = 1", subtitle: "", terminalNames: ["in", "out"], unit: "mm" });
    expect(file).toContain(`<rect width="${FILE_LOOK.width}"`);
    expect(file).toContain(">R = 1</text>");
    expect(file).not.toContain("<style");
  });
});

import type { Response } from "supertest";
import { expect } from "vitest";
import { call } from "./call";
import type { TestServer } from "./server";

export type Point = [number, number];

/** Vertices of a rectangle, from its lower left corner. */
export const rectangle = (x0: number, y0: number, x1: number, y1: number): Point[] => [
  [x0, y0],
  [x1, y0],
  [x1, y1],
  [x0, y1],
];

/** Vertices of a regular polygon. */
export const polygon = (x: number, y: number, radius: number, count: number): Point[] =>
  Array.from({ length: count }, (_, k) => [
    x + radius * Math.cos((2 * Math.PI * k) / count),
    y + radius * Math.sin((2 * Math.PI * k) / count),
  ]);

const terminal = (name: string, ...segments: [Point, Point][]) => ({ name, segments });

/** An L of 1 mm track: legs of 3 mm from the inner corner, 6 + 0.55873… squares. */
export const BEND = {
  outline: {
    unit: "mm",
    outer: [
      [0, 0],
      [4, 0],
      [4, 1],
      [1, 1],
      [1, 4],
      [0, 4],
    ] as Point[],
  },
  terminals: [
    terminal("in", [
      [4, 0],
      [4, 1],
    ]),
    terminal("out", [
      [1, 4],
      [0, 4],
    ]),
  ],
  medium: { sheetResistance: "50 ohm/sq" },
};

/** A strip of 10 mm by 2 mm along x. */
export const STRIP = {
  outline: { unit: "mm", outer: rectangle(0, 0, 10, 2) },
  terminals: [
    terminal("left", [
      [0, 0],
      [0, 2],
    ]),
    terminal("right", [
      [10, 0],
      [10, 2],
    ]),
  ],
  medium: { sheetResistance: 1 },
};

/**
 * A plate of many holes that no machine brings to 1e-8 within the first seconds: for jobs that must still be running
 * when something happens to them.
 */
export function hardPlate(rows = 6): typeof STRIP & { outline: { holes: Point[][] }; accuracy: number } {
  const holes = Array.from({ length: rows * rows }, (_, k) =>
    polygon(1 + 2 * (k % rows), 1 + 2 * Math.floor(k / rows), 0.7, 24),
  );
  const side = 2 * rows;
  return {
    outline: { unit: "mm", outer: rectangle(0, 0, side, side), holes },
    terminals: [
      terminal("left", [
        [0, 0],
        [0, side / 3],
      ]),
      terminal("right", [
        [side, side / 2],
        [side, side],
      ]),
    ],
    medium: { sheetResistance: 1 },
    accuracy: 1e-8,
  };
}

/** Solves and waits; expects an answer. */
export async function solve(server: TestServer, key: string, body: object): Promise<Response> {
  const response = await call(server, "post", "/fields", { key, body, headers: { Prefer: "wait=30" } });
  expect([response.status, response.status === 200 ? "" : response.text]).toEqual([200, ""]);
  return response;
}

/** Waits until a solution is finished; answers with it. */
export async function finished(server: TestServer, key: string, id: string, seconds = 60): Promise<Response> {
  const until = Date.now() + 1000 * seconds;
  for (;;) {
    const response = await call(server, "get", `/fields/${id}`, { key, headers: { Prefer: "wait=5" } });
    expect(response.status).toBe(200);
    if (!["queued", "running"].includes(response.body.status)) return response;
    if (Date.now() > until) throw new Error(`The solution ${id} did not end: ${response.text}`);
  }
}

/** Resolves when a look gives true; fails where it does not within so many seconds. */
export async function until(look: () => boolean | Promise<boolean>, seconds = 20): Promise<void> {
  const end = Date.now() + 1000 * seconds;
  while (!(await look())) {
    if (Date.now() > end) throw new Error("What was waited for did not happen.");
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

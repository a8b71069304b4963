import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { BEND, finished, hardPlate, rectangle, solve, STRIP } from "../support/field";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
let strip: string;
beforeAll(async () => {
  server = await startServer();
  ({ key } = server.issue({ team: "thin-film" }));
  strip = (await solve(server, key, STRIP)).body.id;
});
afterAll(() => server.stop());

const get = (path: string, headers = {}) => call(server, "get", path, { key, headers });

describe("GET /fields/{id}/map.json 200", () => {
  test("equal steps of voltage and equal shares of the current", async () => {
    const { body } = await get(`/fields/${strip}/map.json?lines=4&resolution=20`);
    expect(body).toMatchObject({ unit: "mm", per: "volt", between: ["left", "right"] });
    expect(body.equipotentials.map(({ potential }: { potential: number }) => potential)).toEqual([
      0.25, 0.5, 0.75,
    ]);
    // 1 V over 10 mm: three quarters of it are left at 2.5 mm.
    for (const { potential, lines } of body.equipotentials) {
      for (const line of lines) {
        for (let k = 0; k < line.length; k += 2) expect(line[k]).toBeCloseTo(10 * (1 - potential), 6);
      }
    }
    // 0.2 A in four shares.
    expect(body.currentBetweenStreamlines).toBeCloseTo(0.05, 9);
    expect(body.streamlines.length).toBeGreaterThanOrEqual(3);
    for (const line of body.streamlines) {
      for (let k = 3; k < line.length; k += 2) expect(line[k]).toBeCloseTo(line[1], 6);
    }
    expect(body.raster.columns).toBe(20);
    expect(body.raster.density).toHaveLength(body.raster.columns * body.raster.rows);
    for (const density of body.raster.density) if (density !== null) expect(density).toBeCloseTo(100, 6);
    const current = (name: string) =>
      body.edges
        .filter(({ terminal }: { terminal: string }) => terminal === name)
        .reduce((sum: number, edge: { current: number }) => sum + edge.current, 0);
    expect(current("left")).toBeCloseTo(0.2, 9);
    expect(current("right")).toBeCloseTo(-0.2, 9);
  });

  test("422 for what it cannot draw", async () => {
    for (const query of ["lines=1", "lines=101", "resolution=7", "resolution=x", "colour=red"]) {
      const response = await get(`/fields/${strip}/map.json?${query}`);
      expect([query, response.status, places(response)]).toEqual([query, 422, [query.split("=")[0]]]);
    }
  });
});

describe("GET /fields/{id}/line 200", () => {
  test("potential and density along a line, null outside", async () => {
    const { body } = await get(`/fields/${strip}/line?from=-2.5,1&to=12.5,1&samples=7`);
    expect(body.unit).toBe("mm");
    expect(body.points[1]).toEqual([0, 1]);
    expect(body.distance[6]).toBeCloseTo(0.015, 12);
    expect([body.potential[0], body.potential[6]]).toEqual([null, null]);
    expect(body.potential[3]).toBeCloseTo(0.5, 9);
    expect(body.density[3]).toBeCloseTo(100, 6);
    expect(body.densityAlong[3]).toBeCloseTo(100, 6);
    const across = (await get(`/fields/${strip}/line?from=5,0.5&to=5,1.5&samples=3`)).body;
    expect(across.densityAlong[1]).toBeCloseTo(0, 6);
  });

  test("422 without two places, or for too many samples", async () => {
    for (const [query, parameter] of [
      ["to=1,1", "from"],
      ["from=1,1&to=1", "to"],
      ["from=1,1&to=1,e", "to"],
      ["from=1,1&to=1,1e999", "to"],
      ["from=1,1&to=2,2&samples=1", "samples"],
      ["from=1,1&to=2,2&samples=10001", "samples"],
    ]) {
      const response = await get(`/fields/${strip}/line?${query}`);
      expect([query, response.status, places(response)]).toEqual([query, 422, [parameter]]);
    }
  });
});

describe("GET /fields/{id}/plot.svg 200", () => {
  const picture = async (id: string) => {
    const response = await get(`/fields/${id}/plot.svg`);
    expect(response.status).toBe(200);
    expect(response.headers["content-type"]).toMatch(/^image\/svg\+xml/);
    return response.text ?? String(response.body);
  };

  test("whole, with terminals, bounds, scale bar and legend", async () => {
    const svg = await picture(strip);
    expect(svg).toMatch(/^<svg [\s\S]*<\/svg>\s*$/);
    expect(svg).not.toMatch(/NaN|undefined|Infinity|null/);
    for (const text of ["left", "right", "5 squares", "mm", "A/m"])
      expect(svg.replaceAll("\u2009", " ")).toContain(text);
  });

  test("what a name brings along is text", async () => {
    const [left, right] = STRIP.terminals;
    const terminals = [{ ...left, name: '<script>"&' }, right];
    const { body } = await solve(server, key, { ...STRIP, terminals });
    const svg = await picture(body.id);
    expect(svg).not.toContain("<script>");
    expect(svg).toContain("&#60;script&#62;");
  });

  test("three terminals and a body of revolution have pictures too", async () => {
    const terminals = [
      ...STRIP.terminals,
      {
        name: "tap",
        segments: [
          [
            [4, 2],
            [6, 2],
          ],
        ],
      },
    ];
    const three = await solve(server, key, { ...STRIP, terminals });
    expect(await picture(three.body.id)).toContain("tap");
    const body = await solve(server, key, {
      outline: { unit: "cm", outer: rectangle(0, 0, 1, 3), symmetry: "axisymmetric" },
      terminals: [
        { name: "bottom", parts: [{ ring: 0, edge: 0 }] },
        { name: "top", parts: [{ ring: 0, edge: 2 }] },
      ],
      medium: { resistivity: 1 },
    });
    expect(await picture(body.body.id)).not.toMatch(/NaN/);
  });
});

describe("409 before there is a result", () => {
  test("running, with Retry-After; cancelled, without", async () => {
    const { body } = await call(server, "post", "/fields", { key, body: hardPlate() });
    for (const path of ["map.json", "plot.svg", "line?from=0,0&to=1,1"]) {
      const response = await get(`/fields/${body.id}/${path}`);
      expectProblem(response, 409, "not-ready");
      expect(response.headers["retry-after"]).toBe("1");
    }
    await call(server, "delete", `/fields/${body.id}`, { key });
    const cancelled = await get(`/fields/${body.id}/plot.svg`);
    expectProblem(cancelled, 409, "not-ready");
    expect(cancelled.headers["retry-after"]).toBeUndefined();
  });
});

interface Told {
  readonly event: string;
  readonly status: string;
  readonly progress: { lower: number; upper: number } | null;
}

/** Reads server-sent events until the stream closes. */
async function follow(id: string): Promise<Told[]> {
  const response = await fetch(`${server.base}/api/v1/fields/${id}/events`, {
    headers: { Authorization: `Bearer ${key}` },
  });
  expect(response.headers.get("content-type")).toMatch(/^text\/event-stream/);
  const text = await response.text();
  return text
    .split("\n\n")
    .filter((part) => part !== "" && !part.startsWith(":"))
    .map((part) => {
      const [, event, data] = /^event: (.*)\ndata: (.*)$/.exec(part) ?? [];
      return { event, ...JSON.parse(data) };
    });
}

describe("GET /fields/{id}/events 200", () => {
  test("a finished one is told at once", async () => {
    expect((await follow(strip)).map(({ event, status }) => [event, status])).toEqual([["end", "done"]]);
  });

  test("the bracket only narrows, and the end is what is read later", async () => {
    const { body } = await call(server, "post", "/fields", {
      key,
      body: { ...hardPlate(3), accuracy: 1e-6 },
    });
    const events = await follow(body.id);
    expect(events.slice(0, -1).every(({ event }) => event === "progress")).toBe(true);
    expect(events.length).toBeGreaterThan(2);
    const { event, ...end } = events[events.length - 1];
    expect(event).toBe("end");
    expect(end).toEqual((await finished(server, key, body.id)).body);
    const brackets = events.flatMap(({ progress }) => (progress ? [progress] : []));
    for (let k = 1; k < brackets.length; k++) {
      expect(brackets[k].lower).toBeGreaterThanOrEqual(brackets[k - 1].lower);
      expect(brackets[k].upper).toBeLessThanOrEqual(brackets[k - 1].upper);
    }
  });

  test("a cancelled one ends the stream", async () => {
    const { body } = await call(server, "post", "/fields", { key, body: hardPlate() });
    const following = follow(body.id);
    await new Promise((resolve) => setTimeout(resolve, 300));
    await call(server, "delete", `/fields/${body.id}`, { key });
    const events = await following;
    expect(events[events.length - 1]).toMatchObject({ event: "end", status: "cancelled" });
  });

  test("a bend to 1e-4 is not told apart from the others", async () => {
    const { body } = await call(server, "post", "/fields", { key, body: BEND });
    const events = await follow(body.id);
    expect(events[events.length - 1]).toMatchObject({ event: "end", status: "done" });
  });
});

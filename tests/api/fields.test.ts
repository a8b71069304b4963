import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { BEND, finished, hardPlate, polygon, rectangle, solve, STRIP } from "../support/field";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
let other: string;
beforeAll(async () => {
  server = await startServer();
  ({ key } = server.issue({ team: "thin-film" }));
  ({ key: other } = server.issue({ team: "earthing" }));
});
afterAll(() => server.stop());

/** Squares of the bend (P. M. Hall, Thin Solid Films 1 (1968) 277; equal widths; from memory); legs of 3 widths change it by about 0.11·e^(−6π), below 1e-9. */
const BEND_SQUARES = 6 + 1 - (2 / Math.PI) * Math.log(2);

const get = (path: string, as = key, headers = {}) => call(server, "get", path, { key: as, headers });
const bounded = ({ lower, value, upper }: { lower: number; value: number; upper: number }) => {
  expect(lower).toBeLessThan(upper);
  expect(value).toBeGreaterThanOrEqual(lower);
  expect(value).toBeLessThanOrEqual(upper);
};

describe("POST /fields 200", () => {
  test("a finished solution within the wait, as narrow as asked", async () => {
    const { body, headers } = await solve(server, key, { ...BEND, accuracy: 1e-6 });
    expect(headers.location).toBe(`/api/v1/fields/${body.id}`);
    expect(headers["preference-applied"]).toBe("wait=30");
    expect(body).toMatchObject({ status: "done", finishedAt: expect.stringMatching(/^\d{4}-/) });
    const { resistance, squares, checks, mesh, peak } = body.result;
    bounded(resistance);
    expect(resistance).toMatchObject({ unit: "ohm", boundsBasis: "energy", proved: true });
    expect((resistance.upper - resistance.lower) / resistance.value).toBeLessThanOrEqual(1e-6);
    expect(squares.lower).toBeLessThan(BEND_SQUARES + 1e-8);
    expect(squares.upper).toBeGreaterThan(BEND_SQUARES - 1e-8);
    expect(resistance.value).toBeCloseTo(50 * squares.value, 9);
    expect(checks.length).toBeGreaterThan(0);
    for (const { passed } of checks) expect(passed).toBe(true);
    expect(mesh.unknowns).toBeGreaterThan(0);
    // The inner corner is the only place where the current crowds without limit.
    expect(peak).toMatchObject({ unbounded: true, position: { x: 1, y: 1, unit: "mm" }, per: "volt" });
    expect(peak.distance.value).toBeGreaterThan(0);
    // Density and field obey Ohm's law on the sheet of 50 ohm/sq.
    expect(peak.currentDensity.value / (peak.field.value / 50)).toBeCloseTo(1, 12);
    expect(body.progress.upper).toBe(resistance.upper);
    expect((await get(`/fields/${body.id}`)).body).toEqual(body);
  });

  test("the same to the last bit when asked again", async () => {
    const [a, b] = [await solve(server, key, BEND), await solve(server, key, BEND)];
    expect(b.body.id).not.toBe(a.body.id);
    expect(b.body.result.resistance).toEqual(a.body.result.resistance);
  });

  test("a straight strip is its length over its width", async () => {
    const { body } = await solve(server, key, STRIP);
    expect(body.result.squares.value).toBeCloseTo(5, 12);
    expect(body.result.peak.unbounded).toBe(false);
  });

  test("a material with a thickness, at a temperature", async () => {
    const medium = { material: "copper-annealed", thickness: "35 um" };
    const { body } = await solve(server, key, { ...STRIP, medium, operating: { temperature: 20 } });
    // IEC 60028: 1/58 ohm mm²/m at 20 °C.
    expect(body.result.resistance.value).toBeCloseTo((5 * (1e-6 / 58)) / 35e-6, 9);
    expect(body.result.materials).toEqual([expect.objectContaining({ id: "copper-annealed" })]);
    const warm = await solve(server, key, { ...STRIP, medium, operating: { temperature: "120 degC" } });
    expect(warm.body.result.resistance.value / body.result.resistance.value).toBeCloseTo(1.393, 6);
  });

  test("operating current and requirement", async () => {
    const request = { ...STRIP, operating: { current: "2 A" }, requirement: { max: "5.1 ohm" } };
    const { body } = await solve(server, key, request);
    expect(body.result.operating).toMatchObject({ current: 2, temperature: 20 });
    expect(body.result.operating.voltage).toBeCloseTo(10, 9);
    expect(body.result.operating.power).toBeCloseTo(20, 9);
    expect(body.result.peak.per).toBe("operating-point");
    expect(body.result.peak.currentDensity.value).toBeCloseTo(1000, 3);
    expect(body.result.verdict).toBe("met");
    const failing = await solve(server, key, { ...STRIP, requirement: { max: 4.9 } });
    expect(failing.body.result.verdict).toBe("not-met");
    // A limit inside the bracket decides nothing.
    const coarse = await solve(server, key, { ...BEND, accuracy: 1e-2 });
    const { lower, upper } = coarse.body.result.resistance;
    const within = { ...BEND, accuracy: 1e-2, requirement: { max: (lower + upper) / 2 } };
    expect((await solve(server, key, within)).body.result.verdict).toBe("undecided");
  });

  test("three terminals: matrix, its bounds, and pairs", async () => {
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
    const { body } = await solve(server, key, { ...STRIP, terminals });
    const { result } = body;
    expect(result.resistance).toBeUndefined();
    expect(result.conductance).toHaveLength(3);
    for (let i = 0; i < 3; i++) {
      const row: number[] = result.conductance[i];
      // What goes in comes out, whichever terminal is at one volt.
      expect(row[0] + row[1] + row[2]).toBeCloseTo(0, 3);
      for (let j = 0; j < 3; j++) {
        const [lower, upper] = [result.conductanceBounds.lower[i][j], result.conductanceBounds.upper[i][j]];
        bounded({ lower, value: row[j], upper });
        expect(row[j]).toBeCloseTo(result.conductance[j][i], 9);
        expect(Math.sign(row[j])).toBe(i === j ? 1 : -1);
      }
    }
    expect(result.pairs.map(({ between }: { between: string[] }) => between)).toEqual([
      ["left", "right"],
      ["left", "tap"],
      ["right", "tap"],
    ]);
    for (const { floating, grounded } of result.pairs) {
      bounded(floating);
      bounded(grounded);
      expect(floating.value).toBeLessThan(grounded.value);
      for (const found of [floating, grounded])
        expect(found).toMatchObject({ unit: "ohm", boundsBasis: "energy", proved: true });
    }
    // A floating tap can only lower the resistance of the bare strip.
    expect(result.pairs[0].floating.value).toBeLessThan(5);
  });

  test("regions in series add up", async () => {
    const regions = [{ ring: rectangle(4, 0, 10, 2), medium: { sheetResistance: 0.1 } }];
    const { body } = await solve(server, key, { ...STRIP, medium: { sheetResistance: 1, regions } });
    expect(body.result.resistance.value).toBeCloseTo(2 + 0.3, 9);
    expect(body.result.resistance).toMatchObject({ boundsBasis: "energy", proved: true });
    expect(body.result.squares).toBeUndefined();
  });

  test("an expression, and that its bracket is not proved", async () => {
    const medium = { expression: "5e7*exp(-x/0.01)", quantity: "conductivity", thickness: "35 um" };
    const { body } = await solve(server, key, { ...STRIP, medium });
    const exact = ((Math.E - 1) * 0.01) / (5e7 * 35e-6 * 0.002);
    expect(Math.abs(body.result.resistance.value / exact - 1)).toBeLessThan(1e-4);
    expect(body.result.resistance).toMatchObject({ boundsBasis: "energy-quadrature", proved: false });
    expect(body.result.cautions.join(" ")).toMatch(/not proved/);
  });

  test("arcs: a quarter of a ring between its straight ends", async () => {
    const { body } = await solve(server, key, {
      outline: {
        unit: "mm",
        outer: [
          [1, 0],
          [2, 0],
          { arcTo: [0, 2], center: [0, 0] },
          [0, 1],
          { arcTo: [1, 0], center: [0, 0], clockwise: true },
        ],
      },
      terminals: [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 2 }] },
      ],
      medium: { sheetResistance: 1 },
    });
    // arc-bar: φ/ln(b/a).
    const exact = Math.PI / 2 / Math.LN2;
    expect(body.result.resistance.lower).toBeLessThan(exact);
    expect(body.result.resistance.upper).toBeGreaterThan(exact);
    expect(body.result.resistance.upper / body.result.resistance.lower - 1).toBeLessThan(1.01e-4);
  });

  test("axisymmetric: a solid cylinder, and a tube from inside to outside", async () => {
    const medium = { resistivity: "2 ohm m" };
    const solid = await solve(server, key, {
      outline: { unit: "cm", outer: rectangle(0, 0, 1, 3), symmetry: "axisymmetric" },
      terminals: [
        { name: "bottom", parts: [{ ring: 0, edge: 0 }] },
        { name: "top", parts: [{ ring: 0, edge: 2 }] },
      ],
      medium,
    });
    expect(solid.body.result.resistance.value).toBeCloseTo((2 * 0.03) / (Math.PI * 1e-4), 6);
    expect(solid.body.result.peak.currentDensity.unit).toBe("A/m^2");
    const tube = await solve(server, key, {
      outline: { unit: "cm", outer: rectangle(1, 0, 2, 3), symmetry: "axisymmetric" },
      terminals: [
        { name: "inside", parts: [{ ring: 0, edge: 3 }] },
        { name: "outside", parts: [{ ring: 0, edge: 1 }] },
      ],
      medium,
    });
    const exact = (2 * Math.LN2) / (2 * Math.PI * 0.03);
    expect(Math.abs(tube.body.result.resistance.value / exact - 1)).toBeLessThan(1e-4);
  });

  test("a hole never lowers the resistance", async () => {
    const holes = [polygon(5, 1, 0.5, 24)];
    const { body } = await solve(server, key, { ...STRIP, outline: { ...STRIP.outline, holes } });
    expect(body.result.resistance.lower).toBeGreaterThan(5);
  });

  test("harmless faults are repaired and listed", async () => {
    const outer = [
      [0, 0],
      [5, 0],
      [10, 0],
      [10, 0],
      [10, 2],
      [0, 2],
    ];
    const { body } = await solve(server, key, { ...STRIP, outline: { unit: "mm", outer } });
    expect(body.result.repairs.length).toBeGreaterThan(0);
    expect(body.result.squares.value).toBeCloseTo(5, 12);
  });

  test("a stored outline, its own terminals or others", async () => {
    const stored = await call(server, "post", "/outlines", {
      key,
      body: { outline: BEND.outline, terminals: BEND.terminals },
    });
    const { medium } = BEND;
    const { body } = await solve(server, key, { outlineId: stored.body.id, medium });
    expect(body.result.squares.value).toBeCloseTo(BEND_SQUARES, 3);
    const terminals = [
      BEND.terminals[0],
      {
        name: "side",
        segments: [
          [
            [0, 0],
            [0, 4],
          ],
        ],
      },
    ];
    const side = await solve(server, key, { outlineId: stored.body.id, terminals, medium });
    expect(side.body.result.squares.value).toBeLessThan(4);
    const request = { outlineId: stored.body.id, medium };
    const foreign = await call(server, "post", "/fields", { key: other, body: request });
    expect([foreign.status, places(foreign)]).toEqual([422, ["#/outlineId"]]);
  });
});

describe("POST /fields 202", () => {
  test("the place to ask, and the finished solution there", async () => {
    const { status, body, headers } = await call(server, "post", "/fields", { key, body: BEND });
    expect([status, headers.location]).toEqual([202, `/api/v1/fields/${body.id}`]);
    expect(headers["preference-applied"]).toBeUndefined();
    expect(body).toMatchObject({ progress: null, result: null, finishedAt: null });
    expect(["queued", "running"]).toContain(body.status);
    expect((await finished(server, key, body.id)).body.status).toBe("done");
  });

  test("a wait that is too short, or cannot be read, is no mistake", async () => {
    for (const prefer of ["wait=0", "wait=soon", "respond-async", "wait=1;x=2, handling=lenient"]) {
      const response = await call(server, "post", "/fields", {
        key,
        body: BEND,
        headers: { Prefer: prefer },
      });
      expect([prefer, [200, 202].includes(response.status)]).toEqual([prefer, true]);
    }
  });

  test("Idempotency-Key: a repeat gives the same solution, another body is refused", async () => {
    const headers = { "Idempotency-Key": "bend-1" };
    const first = await call(server, "post", "/fields", { key, body: BEND, headers });
    const again = await call(server, "post", "/fields", { key, body: BEND, headers });
    expect([again.status, again.body.id]).toEqual([first.status, first.body.id]);
    expect(again.headers.location).toBe(first.headers.location);
    const reused = await call(server, "post", "/fields", { key, body: STRIP, headers });
    expectProblem(reused, 422, "idempotency-key-reused");
  });
});

describe("DELETE /fields/{id} 204", () => {
  const remove = (id: string, as = key) => call(server, "delete", `/fields/${id}`, { key: as });

  test("a finished one is gone with its pictures", async () => {
    const { body } = await solve(server, key, BEND);
    expect((await remove(body.id)).status).toBe(204);
    expectProblem(await get(`/fields/${body.id}`), 404, "not-found");
    expectProblem(await get(`/fields/${body.id}/plot.svg`), 404, "not-found");
    expectProblem(await remove(body.id), 404, "not-found");
  });

  test("a running one is cancelled soon, and then deleted", async () => {
    const { body } = await call(server, "post", "/fields", { key, body: hardPlate() });
    const started = Date.now();
    while ((await get(`/fields/${body.id}`)).body.status === "queued") {
      if (Date.now() - started > 30_000) throw new Error("It was never started.");
    }
    const cancelled = Date.now();
    expect((await remove(body.id)).status).toBe(204);
    expect((await get(`/fields/${body.id}`)).body).toMatchObject({ status: "cancelled", result: null });
    // The thread is free again when a small one is answered.
    await solve(server, key, STRIP);
    expect(Date.now() - cancelled).toBeLessThan(5000);
    expectProblem(await get(`/fields/${body.id}/map.json`), 409, "not-ready");
    expect((await remove(body.id)).status).toBe(204);
    expectProblem(await get(`/fields/${body.id}`), 404, "not-found");
  });
});

describe("another team's", () => {
  test("does not exist: 404 for everything", async () => {
    const { body } = await solve(server, key, BEND);
    for (const path of ["", "/map.json", "/plot.svg", "/line?from=0,0&to=1,1", "/events"])
      expectProblem(await get(`/fields/${body.id}${path}`, other), 404, "not-found");
    expectProblem(await call(server, "delete", `/fields/${body.id}`, { key: other }), 404, "not-found");
    expect((await get(`/fields/${body.id}`)).status).toBe(200);
  });
});

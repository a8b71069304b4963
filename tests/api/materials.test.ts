import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { activityOfSubject } from "@/db/queries/activity";
import { libraryMaterials } from "@/lib/engine";
import { call, expectProblem, places, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue({ team: "thin-film" }).key;
});
afterAll(() => server.stop());

const ALLOY = {
  name: "Contact bronze",
  kind: "alloy",
  resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
  range: { from: -40, to: 150 },
  uncertainty: { lower: 0.98, upper: 1.02, note: "Four-wire measurement." },
  source: "Incoming inspection",
  provenance: "measured",
};

const create = (body: unknown = ALLOY) => call(server, "post", "/materials", { key, body });
const useIn = (material: string, over: object = {}) =>
  call(server, "post", "/resistance", { key, body: { ...SLEEVE, medium: { material }, ...over } });

describe("GET /materials", () => {
  test("200 the library, with owner and provenance", async () => {
    const response = await call(server, "get", "/materials?owner=library&limit=500", { key });
    expect(response.status).toBe(200);
    const ids = response.body.items.map(({ id }: { id: string }) => id);
    expect(ids).toEqual(libraryMaterials.map(({ id }) => id));
    for (const item of response.body.items) {
      expect(item).toMatchObject({ owner: "library", retiredAt: null });
      expect(["source at hand", "from memory", "measured"]).toContain(item.provenance);
    }
  });

  test("200 page by page, the library first, then the team's own, each once", async () => {
    const own = [];
    for (let i = 0; i < 3; i++) own.push((await create({ ...ALLOY, name: `Bronze ${i}` })).body.id);
    const all = await call(server, "get", "/materials?limit=500", { key });
    const wanted = all.body.items.map(({ id }: { id: string }) => id);
    expect(wanted).toEqual(expect.arrayContaining([libraryMaterials[0].id, ...own]));
    const found: string[] = [];
    let path: string | null = "/materials?limit=2";
    while (path !== null) {
      const response: Awaited<ReturnType<typeof call>> = await call(server, "get", path, { key });
      expect(response.body.items.length).toBeLessThanOrEqual(2);
      found.push(...response.body.items.map(({ id }: { id: string }) => id));
      const link = /^<\/api\/v1([^>]+)>; rel="next"$/.exec(response.headers.link ?? "");
      expect(link === null).toBe(response.body.next === null);
      path = link ? link[1] : null;
    }
    expect(found).toEqual(wanted);
  });

  test("200 and 404 by id, an older version by its number", async () => {
    const copper = await call(server, "get", "/materials/copper-annealed", { key });
    expect(copper.status).toBe(200);
    expect(copper.headers.etag).toBe(`"${copper.body.version}"`);
    expectProblem(await call(server, "get", "/materials/unobtainium", { key }), 404, "not-found");
    expectProblem(
      await call(server, "get", "/materials/copper-annealed?version=99", { key }),
      404,
      "not-found",
    );
  });
});

describe("POST /materials", () => {
  test("201 with an id, version 1 and the team as owner, usable at once", async () => {
    const response = await create();
    expect(response.status).toBe(201);
    expect(response.body).toEqual({
      ...ALLOY,
      id: expect.stringMatching(/^mat-[0-9a-z]{20}$/),
      version: 1,
      owner: "thin-film",
      retiredAt: null,
    });
    expect(response.headers.location).toBe(`/api/v1/materials/${response.body.id}`);
    expect(response.headers.etag).toBe('"1"');
    const used = await useIn(response.body.id);
    expect(used.status).toBe(200);
    expect(used.body.materials).toEqual([expect.objectContaining({ id: response.body.id, version: 1 })]);
    const [act] = activityOfSubject(server.service.db, response.body.id);
    expect(act).toMatchObject({ action: "material.create", actorKind: "key", subjectKind: "material" });
  });

  test("422 with a pointer for every member that is wrong", async () => {
    const response = await create({
      ...ALLOY,
      source: undefined,
      kind: "mettal",
      extra: 1,
      range: { from: 5, to: 1 },
    });
    expectProblem(response, 422, "invalid-input");
    expect(places(response).sort()).toEqual(["#/extra", "#/kind", "#/range/to", "#/source"]);
    const model = await create({
      ...ALLOY,
      resistivity: { model: "linear", resistivity: -1, coefficient: 0, reference: 20 },
    });
    expect(places(model)).toEqual(["#/resistivity/resistivity"]);
    const none = await create({ ...ALLOY, resistivity: { model: "nothing" } });
    expect(places(none)[0]).toMatch(/^#\/resistivity/);
  });

  test("201 from a measured table, in any order of rows and units", async () => {
    const csv = "\uFEFFtemperature/degC,resistivity/uohm cm\r\n100,10.34\r\n20,9.50\r\n\r\n-40,8.87\r\n";
    const query = "name=Bronze,%20lot%208&kind=alloy&source=Inspection&uncertainty=2%20%25";
    const response = await call(server, "post", `/materials?${query}`, {
      key,
      body: csv,
      headers: { "Content-Type": "text/csv" },
    });
    expect(response.status).toBe(201);
    expect(response.body).toMatchObject({
      name: "Bronze, lot 8",
      provenance: "measured",
      range: { from: -40, to: 100 },
      uncertainty: { lower: 0.98, upper: 1.02 },
    });
    expect(response.body.resistivity).toMatchObject({ model: "table", temperatures: [-40, 20, 100] });
    expect(response.body.resistivity.values[1]).toBeCloseTo(9.5e-8, 15);
    const used = await useIn(response.body.id, { operating: { temperature: 20 } });
    // ρ·ln(b/a)/(2πL), common practice
    expect(used.body.resistance.value).toBeCloseTo((9.5e-8 * Math.log(2.5)) / (2 * Math.PI), 18);
    const outside = await useIn(response.body.id, { operating: { temperature: 300 } });
    expectProblem(outside, 422, "invalid-input");
  });

  test.each([
    ["no header", "1,2\n3,4\n"],
    ["another column", "temperature,voltage\n1,2\n3,4\n"],
    ["three columns", "temperature,resistivity,x\n1,2,3\n"],
    ["one row", "temperature,resistivity\n1,2\n"],
    ["nothing", "\n"],
    ["a cell that is no number", "temperature,resistivity\n1,2\n2,abc\n"],
    ["a cell with a wrong unit", "temperature,resistivity\n1,2\n2,3 kg\n"],
    ["a negative resistivity", "temperature,resistivity\n1,2\n2,-3\n"],
    ["a temperature twice", "temperature,resistivity\n1,2\n1,3\n"],
    ["a row too short", "temperature,resistivity\n1,2\n3\n"],
    ["semicolons", "temperature;resistivity\n1;2\n2;3\n"],
  ])("422 for a table with %s", async (_, csv) => {
    const query = "name=x&kind=alloy&source=y&uncertainty=1%25";
    const response = await call(server, "post", `/materials?${query}`, {
      key,
      body: csv,
      headers: { "Content-Type": "text/csv" },
    });
    expectProblem(response, 422, "invalid-input");
    expect(response.body.errors.length).toBeGreaterThan(0);
  });

  test("422 for a table without its facts", async () => {
    const csv = { key, body: "temperature,resistivity\n1,2\n2,3\n", headers: { "Content-Type": "text/csv" } };
    const response = await call(server, "post", "/materials?kind=alloy", csv);
    expectProblem(response, 422, "invalid-input");
    const wrong = await call(server, "post", "/materials?name=x&kind=alloy&source=y&uncertainty=lots", csv);
    expect(wrong.body.errors).toEqual([expect.objectContaining({ parameter: "uncertainty" })]);
  });
});

describe("PATCH /materials/{id}", () => {
  const change = (id: string, body: unknown, version?: string) =>
    call(server, "patch", `/materials/${id}`, { key, body, headers: version ? { "If-Match": version } : {} });

  test("200 makes the next version; the one before stays readable", async () => {
    const { body } = await create();
    const response = await change(body.id, { name: "Contact bronze, better" }, '"1"');
    expect(response.status).toBe(200);
    expect(response.headers.etag).toBe('"2"');
    expect(response.body).toEqual({ ...body, version: 2, name: "Contact bronze, better" });
    expect((await call(server, "get", `/materials/${body.id}?version=1`, { key })).body).toEqual(body);
    expect((await useIn(body.id)).body.materials[0].version).toBe(2);
    const [act] = activityOfSubject(server.service.db, body.id);
    expect(act).toMatchObject({ action: "material.change", before: { version: 1 }, after: { version: 2 } });
  });

  test("428 without If-Match, 409 with an old version, 400 with what is none", async () => {
    const { id } = (await create()).body;
    expectProblem(await change(id, { name: "x" }), 428, "precondition-required");
    expect((await change(id, { name: "x" }, "*")).status).toBe(200);
    const conflict = await change(id, { name: "y" }, '"1"');
    expectProblem(conflict, 409, "version-conflict");
    expect(conflict.headers.etag).toBe('"2"');
    expectProblem(await change(id, { name: "y" }, '"two"'), 400, "invalid-header");
    expect((await call(server, "get", `/materials/${id}`, { key })).body.name).toBe("x");
  });

  test("of twenty changes from one version at once, one succeeds", async () => {
    const { id } = (await create()).body;
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, i) => change(id, { name: `Name ${i}` }, '"1"')),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, ...Array<number>(19).fill(409)]);
    expect((await call(server, "get", `/materials/${id}`, { key })).body.version).toBe(2);
  });

  test("403 for the library, 404 for the unknown, 422 for nothing and for what cannot change", async () => {
    expectProblem(await change("copper-annealed", { note: "x" }, '"1"'), 403, "library-read-only");
    expectProblem(await change("mat-0", { note: "x" }, '"1"'), 404, "not-found");
    const { id } = (await create()).body;
    const nothing = await change(id, {}, '"1"');
    expect(places(nothing)).toEqual(["#"]);
    const owner = await change(id, { owner: "busbar", version: 7 }, '"1"');
    expect(places(owner).sort()).toEqual(["#/owner", "#/version"]);
  });
});

describe("DELETE /materials/{id}", () => {
  test("204 retires: out of the list and of use, still readable", async () => {
    const { id } = (await create()).body;
    expect((await call(server, "delete", `/materials/${id}`, { key })).status).toBe(204);
    const list = await call(server, "get", "/materials?owner=team&limit=500", { key });
    expect(list.text).not.toContain(id);
    expectProblem(await useIn(id), 422, "invalid-input");
    const read = await call(server, "get", `/materials/${id}`, { key });
    expect(read.body.retiredAt).toMatch(/^\d{4}-/);
    expect((await call(server, "delete", `/materials/${id}`, { key })).status).toBe(204);
    const change = await call(server, "patch", `/materials/${id}`, {
      key,
      body: { name: "x" },
      headers: { "If-Match": "*" },
    });
    expectProblem(change, 422, "invalid-input");
    expect(activityOfSubject(server.service.db, id).map(({ action }) => action)).toEqual([
      "material.retire",
      "material.create",
    ]);
  });

  test("409 with another version, 403 for the library, 404 for the unknown", async () => {
    const { id } = (await create()).body;
    const old = await call(server, "delete", `/materials/${id}`, { key, headers: { "If-Match": '"7"' } });
    expectProblem(old, 409, "version-conflict");
    expectProblem(
      await call(server, "delete", "/materials/copper-annealed", { key }),
      403,
      "library-read-only",
    );
    expectProblem(await call(server, "delete", "/materials/mat-0", { key }), 404, "not-found");
  });
});

describe("a law that cannot be used", () => {
  test.each([
    ["#/resistivity", { resistivity: { ...ALLOY.resistivity, coefficient: -1 } }],
    ["#/resistivity", { resistivity: { ...ALLOY.resistivity, coefficient: 1e300 } }],
    ["#/resistivity/reference", { resistivity: { ...ALLOY.resistivity, reference: -300 } }],
    ["#/range/from", { range: { from: -400, to: 20 } }],
  ])("422 at %s", async (pointer, over) => {
    const created = await create({ ...ALLOY, ...over });
    expectProblem(created, 422, "invalid-input");
    expect(places(created)).toEqual([pointer]);
  });

  test("422 for a change that would make it so", async () => {
    const { body } = await create();
    const changed = await call(server, "patch", `/materials/${body.id}`, {
      key,
      body: { resistivity: { ...ALLOY.resistivity, coefficient: -1 } },
      headers: { "If-Match": '"1"' },
    });
    expectProblem(changed, 422, "invalid-input");
    expect(places(changed)).toEqual(["#/resistivity"]);
  });

  test("an unknown model is told all the models, a known one its own members", async () => {
    const unknown = await create({ ...ALLOY, resistivity: { model: "cubic" } });
    expect(unknown.body.errors).toEqual([
      {
        pointer: "#/resistivity/model",
        detail: 'must be one of "linear", "polynomial", "table", "constant", "silicon", "sea-water".',
      },
    ]);
    const table = await create({ ...ALLOY, resistivity: { model: "table", temperatures: [0, 100] } });
    expect(places(table)).toEqual([
      "#/resistivity/quantity",
      "#/resistivity/values",
      "#/resistivity/interpolation",
    ]);
  });
});

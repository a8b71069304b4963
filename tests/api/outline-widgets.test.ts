import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { embedUsageSince } from "@/db/queries/embeds";
import { libraryMaterial } from "@/lib/engine";
import { definitionProblems } from "@/lib/embeds/check-definition";
import { issueEmbedToken } from "@/lib/embeds/token";
import { teamOutline } from "@/lib/fields/team-outlines";
import { call, expectProblem, places } from "../support/call";
import { BEND, solve } from "../support/field";
import { startServer, type TestServer } from "../support/server";
import { definition, onOutline, publishedWidget, storedBend } from "../support/widget";

let server: TestServer;
beforeAll(async () => {
  server = await startServer({});
});
afterAll(() => server.stop());

async function tokenOf(embedId: string, host = "https://host.example") {
  const { secret } = server.service.config;
  return (await issueEmbedToken(secret, { embedId, version: 1, host, preview: false }, Date.now())).token;
}

async function widget(change: Parameters<typeof onOutline>[1] = {}, monthQuota = 1000) {
  const { id, teamId } = publishedWidget(server, onOutline(storedBend(server), change), { monthQuota });
  return { id, teamId, key: await tokenOf(id) };
}

const post = (key: string, body: unknown = { values: {} }) =>
  call(server, "post", "/fields", { key, body, headers: { Prefer: "wait=30" } });

describe("a widget on a stored outline", () => {
  test("solves what its version says, with the open values in place of the defaults", async () => {
    const { key } = await widget({ accuracy: 1e-5 });
    const answer = await post(key);
    expect([answer.status, answer.body.status]).toEqual([200, "done"]);
    const { key: team } = server.issue({ team: "widgets" });
    const plain = (sheetResistance: string) =>
      solve(server, team, {
        ...BEND,
        medium: { sheetResistance },
        operating: { temperature: "23.75 degC", current: "2 mA" },
        accuracy: 1e-5,
      });
    const { resistance, operating } = answer.body.result;
    const direct = (await plain("50 ohm/sq")).body.result;
    expect(resistance).toEqual(direct.resistance);
    expect(operating).toEqual(direct.operating);
    const changed = await post(key, { values: { sheetResistance: "20 ohm/sq" } });
    expect(changed.body.result.resistance).toEqual((await plain("20 ohm/sq")).body.result.resistance);
  });

  test("takes the terminals that its version gives, and tells the verdict", async () => {
    const { key } = await widget({
      terminals: [BEND.terminals[1], { ...BEND.terminals[0], name: "tail" }],
      requirement: { max: "1 kohm" },
    });
    const { body } = await post(key);
    expect(body.result.verdict).toBe("met");
    expect(body.result.cautions.length).toBeGreaterThan(0);
  });

  test("422 for what is fixed, hidden, out of range or no value; nothing is stored and nothing charged", async () => {
    const { id, key } = await widget();
    const refused = async (body: unknown) => {
      const response = await post(key, body);
      expectProblem(response, 422, "invalid-input");
      return places(response);
    };
    expect(await refused({ values: { temperature: "20 degC" } })).toEqual(["#/values/temperature"]);
    expect(await refused({ values: { current: "1 A" } })).toEqual(["#/values/current"]);
    expect(await refused({ values: { sheetResistance: "5 ohm/sq" } })).toEqual(["#/values/sheetResistance"]);
    expect(await refused({ values: { sheetResistance: "5 kg" } })).toEqual(["#/values/sheetResistance"]);
    expect(await refused({ values: { accuracy: "1e-8" } })).toEqual(["#/values/accuracy"]);
    expect(await refused({ ...BEND, values: {} })).toEqual(["#/outline", "#/terminals", "#/medium"]);
    expect(await refused({ outlineId: storedBend(server) })).toEqual(["#/outlineId"]);
    expect(await refused({ accuracy: 1e-8, record: { label: "mine" } })).toEqual(["#/accuracy", "#/record"]);
    const usage = embedUsageSince(server.service.db, Date.now() - 86_400_000, id);
    expect(usage.map(({ computations, refused: count }) => [computations, count])).toEqual([[0, 8]]);
  });

  test("never tells a hidden value in a complaint", async () => {
    const { key } = await widget({
      inputs: [
        { name: "material", rule: { mode: "fixed", value: "copper-annealed" } },
        { name: "thickness", rule: { mode: "open", value: "1 mm" } },
        { name: "temperature", rule: { mode: "hidden", value: "23.75 degC" } },
      ],
    });
    expect((await post(key)).body.status).toBe("done");
    const response = await post(key, { values: { thickness: "0 mm" } });
    expectProblem(response, 422, "invalid-input");
    expect(response.text).not.toContain("23.75");
  });
});

describe("its token", () => {
  test("reads, draws and cancels what its own widget asked for, and nothing else", async () => {
    const one = await widget({ show: { drawing: true, bounds: true, plots: true } });
    const two = await widget({ show: { drawing: true, bounds: true, plots: true } });
    const own = (await post(one.key)).body.id as string;
    const { key: team } = server.issue({ team: "widgets" });
    const teams = (await solve(server, team, BEND)).body.id as string;
    expect((await call(server, "get", `/fields/${own}`, { key: one.key })).body.status).toBe("done");
    const picture = await call(server, "get", `/fields/${own}/plot.svg`, { key: one.key });
    expect([picture.status, picture.headers["content-type"]]).toEqual([
      200,
      expect.stringContaining("image/svg+xml"),
    ]);
    for (const [key, id] of [
      [two.key, own],
      [one.key, teams],
      [team, own],
    ]) {
      expectProblem(await call(server, "get", `/fields/${id}`, { key }), 404, "not-found");
      expectProblem(await call(server, "get", `/fields/${id}/plot.svg`, { key }), 404, "not-found");
      expectProblem(await call(server, "delete", `/fields/${id}`, { key }), 404, "not-found");
    }
    for (const path of [`/fields/${own}/map.json`, `/fields/${own}/events`, `/fields/${own}/line`]) {
      expectProblem(await call(server, "get", path, { key: one.key }), 403, "insufficient-scope");
    }
    expect((await call(server, "delete", `/fields/${own}`, { key: one.key })).status).toBe(204);
    expectProblem(await call(server, "get", `/fields/${own}`, { key: one.key }), 404, "not-found");
  });

  test("403 for the picture where the widget shows none, and for what a widget of the other kind asks", async () => {
    const { key } = await widget();
    const { id } = (await post(key)).body;
    expectProblem(await call(server, "get", `/fields/${id}/plot.svg`, { key }), 403, "insufficient-scope");
    expectProblem(
      await call(server, "post", "/resistance", { key, body: { values: {} } }),
      403,
      "insufficient-scope",
    );
    expectProblem(await call(server, "post", "/outlines", { key, body: {} }), 403, "insufficient-scope");
    const bar = await tokenOf(publishedWidget(server).id);
    expectProblem(await post(bar), 403, "insufficient-scope");
    expectProblem(await call(server, "get", `/fields/${id}`, { key: bar }), 403, "insufficient-scope");
  });

  test("is charged as a field solution, by the page around; 429 where too few are left", async () => {
    const { id, key } = await widget({}, 21);
    await post(key);
    await post(key, { values: { sheetResistance: "20 ohm/sq" } });
    const spent = await post(key);
    // Two small solutions cost one computation each; the next one would have to reserve 20 of the 19 left.
    expectProblem(spent, 429, "quota-exhausted");
    const usage = embedUsageSince(server.service.db, Date.now() - 86_400_000, id);
    expect(usage.map(({ host, requests, computations }) => [host, requests, computations])).toEqual([
      ["https://host.example", 3, 2],
    ]);
  });
});

describe("a definition on an outline", () => {
  const problems = (change: Parameters<typeof onOutline>[1], outlineId = storedBend(server)) => {
    const { db } = server.service;
    const { teamId } = publishedWidget(server);
    return definitionProblems(definition(onOutline(outlineId, change)), libraryMaterial, (id) =>
      teamOutline(db, teamId, id),
    ).map(({ pointer }) => pointer);
  };

  test("may name the team's outlines and no others", () => {
    expect(problems({})).toEqual([]);
    expect(problems({}, "out_0000000000000000")).toEqual(["#/outlineId"]);
    expect(problems({}, storedBend(server, "another-team"))).toEqual(["#/outlineId"]);
  });

  test("names the place of each mistake", () => {
    expect(problems({ terminals: [BEND.terminals[0]] })).toEqual(["#/terminals"]);
    expect(problems({ graded: { profile: "linear" } as never })).toContain("#/graded");
    expect(problems({ inputs: [{ name: "width", rule: { mode: "open", value: "1 mm" } }] })).toEqual([
      "#/inputs/0/name",
    ]);
    expect(problems({ inputs: [{ name: "thickness", rule: { mode: "open", value: "1 mm" } }] })).toEqual([
      "#/inputs",
    ]);
    expect(definitionProblems(definition({ accuracy: 1e-4 }), libraryMaterial)).toEqual([
      { pointer: "#/accuracy", detail: expect.any(String) },
    ]);
  });
});

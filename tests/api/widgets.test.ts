import { SignJWT } from "jose";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { embedUsageSince } from "@/db/queries/embeds";
import { SHELL } from "@/lib/activity/append";
import { deriveKey } from "@/lib/config/secret";
import { rollBackEmbed, publishEmbed, saveEmbedDraft, withdrawEmbed } from "@/lib/embeds/manage-embeds";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { issueEmbedToken } from "@/lib/embeds/token";
import { issueSiteToken } from "@/lib/auth/site-token";
import { call, expectProblem, places, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";
import { definition, publishedWidget } from "../support/widget";

let server: TestServer;
beforeAll(async () => {
  server = await startServer({});
});
afterAll(() => server.stop());

interface Binding {
  readonly embedId: string;
  readonly version?: number;
  readonly host?: string;
  readonly preview?: boolean;
  readonly now?: number;
  readonly secret?: string;
}

async function tokenOf({ embedId, version = 1, host = "", preview = false, ...more }: Binding) {
  const { secret = server.service.config.secret, now = Date.now() } = more;
  return (await issueEmbedToken(secret, { embedId, version, host, preview }, now)).token;
}

const compute = (key: string, body: unknown = { values: {} }, headers: Record<string, string> = {}) =>
  call(server, "post", "/resistance", { key, body, headers });

describe("a widget's call", () => {
  test("computes what its version says, with the open values in place of the defaults", async () => {
    const { id } = publishedWidget(server);
    const key = await tokenOf({ embedId: id });
    const defaults = await compute(key);
    expect(defaults.status).toBe(200);
    const { key: team } = server.issue({ team: "widgets" });
    const plain = (length: string, material = "copper-annealed") =>
      call(server, "post", "/resistance", {
        key: team,
        body: {
          shape: "bar",
          dimensions: { length, width: "40 mm", thickness: "10 mm" },
          medium: { material },
          operating: { temperature: "60 degC" },
        },
      });
    expect(defaults.body.resistance).toEqual((await plain("250 mm")).body.resistance);
    const changed = await compute(key, { values: { length: "1 m", material: "aluminium-electrical" } });
    expect(changed.body.resistance).toEqual((await plain("1 m", "aluminium-electrical")).body.resistance);
  });

  test("422 for what is fixed, hidden, unknown, out of range or not on the list", async () => {
    const key = await tokenOf({ embedId: publishedWidget(server).id });
    const refused = async (values: unknown) => {
      const response = await compute(key, { values });
      expectProblem(response, 422, "invalid-input");
      return places(response);
    };
    expect(await refused({ width: "80 mm" })).toEqual(["#/values/width"]);
    expect(await refused({ temperature: "20 degC" })).toEqual(["#/values/temperature"]);
    expect(await refused({ voltage: "5 V" })).toEqual(["#/values/voltage"]);
    expect(await refused({ length: "5 m", thickness: "7 mm" })).toEqual([
      "#/values/length",
      "#/values/thickness",
    ]);
    expect(await refused({ length: "49.9 mm" })).toEqual(["#/values/length"]);
    expect(await refused({ material: "silver" })).toEqual(["#/values/material"]);
    expect(await refused({ length: "5 kg" })).toEqual(["#/values/length"]);
    expect(await refused({ length: "" })).toEqual(["#/values/length"]);
    expect(await refused({ length: { value: "1 m", tolerance: "3 m" } })).toEqual(["#/values/length"]);
    expect(await refused({ length: ["1 m"] })).toEqual(["#/values/length"]);
    expect(await refused({ ["__proto__x"]: 1, "dimensions.width": "1 m" })).toHaveLength(2);
    expect(await refused([])).toEqual(["#/values"]);
    expect(await refused({ length: "9".repeat(200) })).toEqual(["#/values/length"]);
  });

  test("422 for a body that tries to say more than values", async () => {
    const key = await tokenOf({ embedId: publishedWidget(server).id });
    const whole = await compute(key, SLEEVE);
    expectProblem(whole, 422, "invalid-input");
    expect(places(whole)).toEqual(["#/shape", "#/dimensions", "#/medium"]);
    expectProblem(await compute(key, { values: {}, record: { label: "mine" } }), 422, "invalid-input");
    expectProblem(await compute(key, { values: {}, include: ["steps"] }), 422, "invalid-input");
    expectProblem(await compute(key, []), 422, "invalid-input");
    expect(whole.body.errors.length).toBe(3);
  });

  test("403 for every other call of the API", async () => {
    const key = await tokenOf({ embedId: publishedWidget(server).id });
    for (const path of ["/resistance/bar?length=1m", "/usage", "/materials", "/records", "/keys"]) {
      const response = await call(server, "get", path, { key });
      expect([path, response.status]).toEqual([path, 403]);
    }
    const field = await call(server, "post", "/outlines", { key, body: {} });
    expectProblem(field, 403, "insufficient-scope");
    expect((await call(server, "get", "/shapes", { key })).status).toBe(200);
  });

  test("never tells a hidden value in a complaint", async () => {
    const { id } = publishedWidget(server, {
      shape: "cylindrical-shell",
      inputs: [
        { name: "innerRadius", rule: { mode: "hidden", value: "17.3 mm" } },
        { name: "outerRadius", rule: { mode: "open", value: "20 mm" } },
        { name: "length", rule: { mode: "fixed", value: "1 m" } },
        { name: "resistivity", rule: { mode: "hidden", value: "1e-7 ohm m" } },
      ],
    });
    const key = await tokenOf({ embedId: id });
    expect((await compute(key)).status).toBe(200);
    const response = await compute(key, { values: { outerRadius: "10 mm" } });
    expect(response.status).toBe(422);
    expect(response.text).not.toMatch(/17\.3|0\.0173/);
  });
});

describe("a widget's tolerances", () => {
  const tolerances: EmbedDefinition["tolerances"] = {
    uncertainty: { method: "worst-case" },
    budget: true,
    inputs: [
      { name: "length", rule: { mode: "open", value: "2 mm", min: "1 mm", max: "1 %" } },
      { name: "width", rule: { mode: "fixed", value: "0.4 mm", distribution: "normal" } },
      { name: "temperature", rule: { mode: "fixed", value: "5 K" } },
    ],
  };
  const withTolerances = (change: Partial<NonNullable<typeof tolerances>> = {}) =>
    publishedWidget(server, { tolerances: { ...tolerances, ...change }, requirement: { max: "13 uohm" } });

  test("answer as the whole request does, with range, budget and verdict", async () => {
    const key = await tokenOf({ embedId: withTolerances().id });
    const { key: team } = server.issue({ team: "widgets" });
    const plain = (length: string, tolerance: string) =>
      call(server, "post", "/resistance", {
        key: team,
        body: {
          shape: "bar",
          dimensions: {
            length: { value: length, tolerance },
            width: { value: "40 mm", tolerance: "0.4 mm", distribution: "normal" },
            thickness: "10 mm",
          },
          medium: { material: "copper-annealed" },
          operating: { temperature: { value: "60 degC", tolerance: "5 K" } },
          requirement: { max: "13 uohm" },
          uncertainty: { method: "worst-case" },
        },
      });
    const defaults = await compute(key);
    expect(defaults.status).toBe(200);
    const whole = await plain("250 mm", "2 mm");
    expect(defaults.body.uncertainty).toEqual(whole.body.uncertainty);
    expect(defaults.body.verdict).toBe(whole.body.verdict);
    expect(
      defaults.body.uncertainty.contributions.map(({ input }: { input: string }) => input).sort(),
    ).toEqual(["dimensions.length", "dimensions.width", "medium.material", "operating.temperature"]);
    const changed = await compute(key, { values: { length: "1 m", "length.tolerance": "10 mm" } });
    expect(changed.body.uncertainty).toEqual((await plain("1 m", "10 mm")).body.uncertainty);
  });

  test("422 for those that are fixed, unknown or beyond their limits, and for another method", async () => {
    const key = await tokenOf({ embedId: withTolerances().id });
    const refused = async (body: object) => {
      const response = await compute(key, body);
      expectProblem(response, 422, "invalid-input");
      return places(response);
    };
    const values = (given: object) => refused({ values: given });
    expect(await values({ "width.tolerance": "4 mm" })).toEqual(["#/values/width.tolerance"]);
    expect(await values({ "thickness.tolerance": "0 mm" })).toEqual(["#/values/thickness.tolerance"]);
    expect(await values({ "temperature.tolerance": "0 K" })).toEqual(["#/values/temperature.tolerance"]);
    // 1 % of the length is its limit, however it is written, and follows the length.
    expect(await values({ "length.tolerance": "2.51 mm" })).toEqual(["#/values/length.tolerance"]);
    expect(await values({ "length.tolerance": "1.01 %" })).toEqual(["#/values/length.tolerance"]);
    expect((await compute(key, { values: { "length.tolerance": "1 %" } })).status).toBe(200);
    expect((await compute(key, { values: { "length.tolerance": "2.5 mm" } })).status).toBe(200);
    expect(await values({ "length.tolerance": "0.9 mm" })).toEqual(["#/values/length.tolerance"]);
    expect(await values({ "length.tolerance": "-2 mm" })).toEqual(["#/values/length.tolerance"]);
    expect(await values({ "length.tolerance": "2 kg" })).toEqual(["#/values/length.tolerance"]);
    expect(await values({ "length.tolerance": "" })).toEqual(["#/values/length.tolerance"]);
    expect(await values({ "length.tolerance": { plus: "1 m" } })).toEqual(["#/values/length.tolerance"]);
    expect(await values({ "length.distribution": "normal" })).toEqual(["#/values/length.distribution"]);
    expect(await values({ "length.tolerance.tolerance": "2 mm" })).toHaveLength(1);
    expect(await refused({ values: {}, uncertainty: { method: "monte-carlo", trials: 1_000_000 } })).toEqual([
      "#/uncertainty",
    ]);
    expect(await values({ method: "propagation", trials: 1000 })).toEqual([
      "#/values/method",
      "#/values/trials",
    ]);
  });

  test("are none in a widget that has none", async () => {
    const key = await tokenOf({ embedId: publishedWidget(server).id });
    expect((await compute(key)).body.uncertainty).toBeUndefined();
    const response = await compute(key, { values: { "length.tolerance": "2 mm" } });
    expectProblem(response, 422, "invalid-input");
    expect(places(response)).toEqual(["#/values/length.tolerance"]);
  });

  test("make the trials of their version, and cost one computation", async () => {
    const { id } = withTolerances({ uncertainty: { method: "monte-carlo", trials: 2000, seed: 7 } });
    const { body } = await compute(await tokenOf({ embedId: id }));
    expect([body.uncertainty.trials, body.uncertainty.seed]).toEqual([2000, 7]);
    const [usage] = embedUsageSince(server.service.db, Date.now() - 86_400_000, id);
    expect(usage.computations).toBe(1);
  });

  test("that reach too far are told at their own field, and never with a hidden value", async () => {
    const { id } = publishedWidget(server, {
      shape: "cylindrical-shell",
      inputs: [
        { name: "innerRadius", rule: { mode: "hidden", value: "17.3 mm" } },
        { name: "outerRadius", rule: { mode: "fixed", value: "20 mm" } },
        { name: "length", rule: { mode: "open", value: "1 m" } },
        { name: "resistivity", rule: { mode: "hidden", value: "1e-7 ohm m" } },
      ],
      tolerances: {
        uncertainty: { method: "worst-case" },
        budget: false,
        inputs: [
          { name: "outerRadius", rule: { mode: "open", value: "0.1 mm" } },
          { name: "length", rule: { mode: "fixed", value: "10 mm" } },
        ],
      },
    });
    const key = await tokenOf({ embedId: id });
    const wide = await compute(key, { values: { "outerRadius.tolerance": "3 mm" } });
    expectProblem(wide, 422, "invalid-input");
    expect(places(wide)).toEqual(["#/values/outerRadius.tolerance"]);
    const long = await compute(key, { values: { length: "5 mm" } });
    expectProblem(long, 422, "invalid-input");
    expect(places(long)).toEqual(["#/values/length"]);
    expect(wide.text + long.text).not.toMatch(/17\.3|0\.0173/);
  });
});

describe("a widget's token", () => {
  test("401 once it is over, for another secret, another purpose, or another version than the shown one", async () => {
    const { id } = publishedWidget(server);
    expectProblem(
      await compute(await tokenOf({ embedId: id, now: Date.now() - 700_000 })),
      401,
      "invalid-token",
    );
    const forged = await tokenOf({ embedId: id, secret: "another secret entirely" });
    expectProblem(await compute(forged), 401, "invalid-token");
    expectProblem(await compute(await tokenOf({ embedId: id, version: 2 })), 401, "invalid-token");
    expectProblem(await compute(await tokenOf({ embedId: "emb_0000000000000000" })), 401, "invalid-token");
    const { secret } = server.service.config;
    const mixed = await new SignJWT({ ver: 1, host: "", pre: false })
      .setProtectedHeader({ alg: "HS256", typ: "embed+jwt" })
      .setSubject(id)
      .setAudience("rhoform:embed")
      .setExpirationTime("1h")
      .sign(deriveKey(secret, "site token"));
    expectProblem(await compute(mixed), 401, "invalid-token");
    const [head, , tail] = (await tokenOf({ embedId: id })).split(".");
    const other = (await tokenOf({ embedId: publishedWidget(server).id })).split(".")[1];
    expectProblem(await compute(`${head}.${other}.${tail}`), 401, "invalid-token");
    const none = Buffer.from(JSON.stringify({ alg: "none", typ: "embed+jwt" })).toString("base64url");
    expectProblem(await compute(`${none}.${other}.`), 401, "invalid-token");
  });

  test("counts for the version that is shown: publishing and rolling back hold at once", async () => {
    const { id } = publishedWidget(server);
    const { db } = server.service;
    const by = { actor: SHELL, now: Date.now() };
    const first = await tokenOf({ embedId: id });
    saveEmbedDraft(db, by, id, { definition: definition({ title: "Longer" }), from: null });
    expect((await compute(first)).status).toBe(200);
    expectProblem(await compute(await tokenOf({ embedId: id, version: 2 })), 401, "invalid-token");
    expect((await compute(await tokenOf({ embedId: id, version: 2, preview: true }))).status).toBe(200);
    publishEmbed(db, by, id);
    expectProblem(await compute(first), 401, "invalid-token");
    rollBackEmbed(db, by, id, 1);
    expect((await compute(await tokenOf({ embedId: id, version: 3 }))).status).toBe(200);
    withdrawEmbed(db, by, id);
    expectProblem(await compute(await tokenOf({ embedId: id, version: 3 })), 410, "embed-withdrawn");
    rollBackEmbed(db, by, id, 3);
    expect((await compute(await tokenOf({ embedId: id, version: 4 }))).status).toBe(200);
  });

  test("works from the service's own origin and from a sandboxed frame, and from no other page", async () => {
    const key = await tokenOf({ embedId: publishedWidget(server).id });
    const sandboxed = await compute(key, { values: {} }, { Origin: "null" });
    expect(sandboxed.status).toBe(200);
    expect(sandboxed.headers["access-control-allow-origin"]).toBe("null");
    expect(sandboxed.headers["access-control-allow-credentials"]).toBeUndefined();
    expect((await compute(key, { values: {} }, { Origin: server.base })).status).toBe(200);
    const other = await compute(key, { values: {} }, { Origin: "https://elsewhere.example" });
    expectProblem(other, 403, "origin-not-allowed");
    expect(other.headers["access-control-allow-origin"]).toBeUndefined();
    const site = (await issueSiteToken(server.service.config.secret, Date.now())).token;
    expectProblem(await compute(site, SLEEVE, { Origin: "null" }), 403, "origin-not-allowed");
  });
});

describe("a widget's quota", () => {
  test("429 when its month is used up, whoever asks; usage is kept by host", async () => {
    const { id } = publishedWidget(server, {}, { monthQuota: 2 });
    const one = await tokenOf({ embedId: id, host: "https://one.example" });
    const two = await tokenOf({ embedId: id, host: "https://two.example" });
    expect((await compute(one)).status).toBe(200);
    expect((await compute(one, { values: { length: "9 m" } })).status).toBe(422);
    expect((await compute(two)).status).toBe(200);
    const spent = await compute(two);
    expectProblem(spent, 429, "quota-exhausted");
    expect(Number(spent.headers["retry-after"])).toBeGreaterThan(0);
    const usage = embedUsageSince(server.service.db, Date.now() - 86_400_000, id);
    expect(
      usage.map(({ host, requests, computations, refused }) => [host, requests, computations, refused]),
    ).toEqual([
      ["https://one.example", 2, 1, 1],
      ["https://two.example", 2, 1, 1],
    ]);
  });
});

import { SignJWT } from "jose";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { embedUsageSince } from "@/db/queries/embeds";
import { SHELL } from "@/lib/activity/append";
import { deriveKey } from "@/lib/config/secret";
import { rollBackEmbed, publishEmbed, saveEmbedDraft, withdrawEmbed } from "@/lib/embeds/manage-embeds";
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

import { SignJWT } from "jose";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { answerSiteToken } from "@/api/site-token";
import { deriveKey } from "@/lib/config/secret";
import { issueSiteToken } from "@/lib/auth/site-token";
import { signedOutLimits, SIGNED_OUT_SETTING } from "@/lib/auth/signed-out-limits";
import { openSession } from "@/lib/auth/session";
import { sessionCookie } from "@/lib/auth/session-cookie";
import { newId } from "@/lib/service/identifier";
import { updatePerson } from "@/db/queries/people";
import { endSessionRow } from "@/db/queries/sessions";
import { writeSetting } from "@/db/queries/settings";
import { insertMembership, insertPerson, teamBySlug } from "@/db/queries/teams";
import type { Role } from "@/db/schema/organisation";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer({});
});
afterAll(() => server.stop());

const ask = (headers: Record<string, string>) =>
  answerSiteToken(
    new Request("http://rhoform.test/api/site/token", {
      method: "POST",
      headers: { host: "rhoform.test", ...headers },
    }),
    server.service,
  );
const token = async () => (await issueSiteToken(server.service.config.secret, Date.now())).token;
const compute = (key: string, headers: Record<string, string> = {}, body: unknown = SLEEVE) =>
  call(server, "post", "/resistance", { key, body, headers });

describe("POST /api/site/token", () => {
  test("200 for a page of our own", async () => {
    const response = await ask({ origin: "http://rhoform.test", "sec-fetch-site": "same-origin" });
    expect(response.status).toBe(200);
    expect(response.headers.get("cache-control")).toBe("no-store");
    const body = (await response.json()) as { token: string; expiresAt: string };
    const lasts = Date.parse(body.expiresAt) - Date.now();
    expect(lasts).toBeGreaterThan(60_000);
    expect(lasts).toBeLessThan(3_600_000);
    expect((await compute(body.token)).status).toBe(200);
  });

  test("403 for any other page, and for no page at all", async () => {
    const others: Record<string, string>[] = [
      {},
      { origin: "https://elsewhere.example" },
      { origin: "null" },
      { origin: "http://rhoform.test", "sec-fetch-site": "cross-site" },
      { "sec-fetch-site": "same-origin" },
    ];
    for (const headers of others) expect((await ask(headers)).status).toBe(403);
  });
});

describe("a page of somebody who is signed in", () => {
  const session = (role: Role, team: string | null = "busbar") => {
    const { db } = server.service;
    if (!teamBySlug(db, "busbar")) server.issue();
    const id = newId("per");
    insertPerson(db, { id, email: `${id}@merrow-pike.example`, name: "Ines Harrow", role, createdAt: 1 });
    if (team) insertMembership(db, id, teamBySlug(db, team)?.id ?? "", 1);
    const about = { personId: id, device: "d", client: "Firefox on Linux", address: "127.0.0.1" };
    return openSession(db, { ...about, now: Date.now() });
  };
  const tokenOf = async (opened: { id: string; personId: string; expiresAt: number }) => {
    const { config } = server.service;
    const cookie = (await sessionCookie(config, opened, Date.now())).split(";")[0];
    const own = { origin: "http://rhoform.test", "sec-fetch-site": "same-origin", cookie };
    const response = await ask(own);
    return (await response.json()) as { token: string; team: string | null };
  };

  test("stores for the team under the person's name, and is counted as theirs", async () => {
    const opened = session("developer");
    const { token: key, team } = await tokenOf(opened);
    expect(team).toBe("busbar");
    const stored = await compute(key, {}, { ...SLEEVE, record: { label: "From a page" } });
    expect(stored.status).toBe(200);
    const record = await call(server, "get", `/records/${stored.body.record.id}`, { key });
    expect(record.body.by).toMatchObject({ kind: "person", name: "Ines Harrow" });
    const counted = server.service.db.$client
      .prepare("select count(*) from usage_events where key_id like ?")
      .pluck()
      .get(`${opened.personId}:%`);
    expect(counted).toBe(2);
    expectProblem(await call(server, "get", "/keys", { key }), 403, "insufficient-scope");
  });

  test("403 for a viewer who stores, whose calls are answered all the same", async () => {
    const { token: key } = await tokenOf(session("viewer"));
    expect((await compute(key)).status).toBe(200);
    expectProblem(await compute(key, {}, { ...SLEEVE, record: { label: "x" } }), 403, "not-permitted");
    expect((await call(server, "get", "/records", { key })).status).toBe(200);
  });

  test("401 as soon as the session has ended or the person was removed", async () => {
    const first = session("developer");
    const { token: one } = await tokenOf(first);
    endSessionRow(server.service.db, first.id, Date.now());
    expectProblem(await compute(one), 401, "invalid-token");
    const second = session("developer");
    const { token: two } = await tokenOf(second);
    updatePerson(server.service.db, second.personId, { removedAt: Date.now() });
    expectProblem(await compute(two), 401, "invalid-token");
  });

  test("is nobody's page where the person has no team", async () => {
    const { team, token: key } = await tokenOf(session("developer", null));
    expect(team).toBeNull();
    expectProblem(await call(server, "get", "/records", { key }), 403, "insufficient-scope");
  });
});

describe("a signed-out page", () => {
  test("computes and reads the library under a strict limit of its address", async () => {
    const response = await compute(await token());
    expect(response.status).toBe(200);
    const { minuteQuota, monthQuota } = signedOutLimits(server.service.db);
    expect(response.headers["ratelimit-policy"]).toBe(
      `"minute";q=${minuteQuota};w=60, "month";q=${monthQuota}`,
    );
    const materials = await call(server, "get", "/materials", { key: await token() });
    expect(materials.status).toBe(200);
    const events = server.service.db.$client
      .prepare("select count(*) from usage_events where key_id = 'signed-out'")
      .pluck()
      .get();
    expect(Number(events)).toBeGreaterThan(1);
  });

  test("403 for what belongs to a team, for other scopes and from other origins", async () => {
    const key = await token();
    expectProblem(await compute(key, {}, { ...SLEEVE, record: { label: "x" } }), 403, "team-required");
    expectProblem(await call(server, "get", "/usage", { key }), 403, "team-required");
    expectProblem(await call(server, "get", "/records", { key }), 403, "insufficient-scope");
    expectProblem(await compute(key, { Origin: "https://elsewhere.example" }), 403, "origin-not-allowed");
    expect((await compute(key, { Origin: server.base })).status).toBe(200);
  });

  test("401 for a token that is over, for another purpose, or not signed by us", async () => {
    const { secret } = server.service.config;
    const old = await issueSiteToken(secret, Date.now() - 86_400_000);
    expectProblem(await compute(old.token), 401, "invalid-token");
    const forged = await issueSiteToken("another secret entirely", Date.now());
    expectProblem(await compute(forged.token), 401, "invalid-token");
    const other = await new SignJWT({})
      .setProtectedHeader({ alg: "HS256", typ: "session+jwt" })
      .setSubject("signed-out")
      .setAudience("rhoform:site")
      .setExpirationTime("1h")
      .sign(deriveKey(secret, "site token"));
    expectProblem(await compute(other), 401, "invalid-token");
    const inUrl = await call(server, "get", `/materials?key=${await token()}`);
    expectProblem(inUrl, 401, "invalid-key");
  });

  test("429 beyond the limit that administrators set", async () => {
    writeSetting(server.service.db, SIGNED_OUT_SETTING, { minuteQuota: 100, monthQuota: 0 }, Date.now());
    expectProblem(await compute(await token()), 429, "quota-exhausted");
    writeSetting(server.service.db, SIGNED_OUT_SETTING, { minuteQuota: 0, monthQuota: 5 }, Date.now());
    expectProblem(await compute(await token()), 429, "too-many-requests");
  });
});

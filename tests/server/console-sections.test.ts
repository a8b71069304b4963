import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { activityOfSubject } from "@/db/queries/activity";
import { teamBySlug } from "@/db/queries/teams";
import { newId } from "@/lib/service/identifier";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";

/** Teams of their own, so that the tests of others find nothing of these. */
const OURS = `ours-${newId("per").slice(-8).toLowerCase()}`;
const THEIRS = `theirs-${newId("per").slice(-8).toLowerCase()}`;

let server: TestServer;
let cookie: string;
let teamId: string;
let theirId: string;
beforeAll(async () => {
  server = await startServer();
  const pair = ({ name, value }: { name: string; value: string }) => `${name}=${value}`;
  cookie = pair(await signedInCookie(server.service, { team: OURS }));
  await signedInCookie(server.service, { team: THEIRS });
  teamId = teamBySlug(server.service.db, OURS)?.id ?? "";
  theirId = teamBySlug(server.service.db, THEIRS)?.id ?? "";
});
afterAll(() => server.stop());

async function send(method: string, path: string, body?: unknown): Promise<Response> {
  return fetch(`${server.base}/api/console/${path}`, {
    method,
    headers: {
      Cookie: cookie,
      Origin: server.base,
      ...(body === undefined ? {} : { "Content-Type": "application/json" }),
    },
    body: body === undefined ? undefined : JSON.stringify(body),
  });
}

async function answer<Body>(method: string, path: string, body?: unknown): Promise<Body> {
  const response = await send(method, path, body);
  if (!response.ok) throw new Error(`${method} ${path}: ${response.status} ${await response.text()}`);
  return (response.status === 204 ? undefined : await response.json()) as Body;
}

interface Page {
  readonly rows: readonly Record<string, unknown>[];
  readonly total: number;
}

const compute = (key: string, body: unknown = SLEEVE) => call(server, "post", "/resistance", { key, body });
const issue = (name: string) =>
  answer<{ id: string; key: string }>("POST", "keys", { teamId, name, scopes: ["compute", "records:read"] });

describe("keys", () => {
  test("from issue to first call, its usage, rotation and end, each act in the activity", async () => {
    const { id, key } = await issue("Sections");
    expect((await compute(key)).status).toBe(200);
    expect((await compute(key, {})).status).toBe(422);

    const usage = await answer<{ total: object; periods: object[] }>("GET", `usage?caller=${id}&by=hour`);
    expect(usage.total).toMatchObject({ requests: 2, computations: 1, refused: 1, failed: 0 });
    const requests = await answer<Page>("GET", `usage/requests?caller=${id}`);
    expect(requests.rows.map(({ status }) => status)).toEqual([422, 200]);
    const callers = await answer<Page>("GET", `usage/callers?q=${id}`);
    expect(callers.rows).toMatchObject([{ caller: { id, kind: "key", name: "Sections" }, requests: 2 }]);
    const shares = await answer<Page>("GET", `usage/shares?caller=${id}&by=status`);
    expect(shares.rows.map(({ name }) => name).sort()).toEqual(["200", "422"]);

    const detail = await answer<object>("GET", `keys/${id}`);
    expect(detail).toMatchObject({ monthUsed: 1, clients: [{ requests: 2 }], mayManage: true });
    expect(JSON.stringify(detail)).not.toContain(key.split("_").pop());

    await answer("PATCH", `keys/${id}`, { name: "Renamed", quotas: { month: 2 } });
    expect((await compute(key)).status).toBe(200);
    expectProblem(await compute(key), 429, "quota-exhausted");

    await answer("PATCH", `keys/${id}`, { quotas: { month: 100 } });
    const rotated = await answer<{ key: string }>("POST", `keys/${id}/rotate`, { overlap: "1h" });
    expect((await compute(key)).status).toBe(200);
    expect((await compute(rotated.key)).status).toBe(200);

    await answer("POST", `keys/${id}/revoke`);
    expectProblem(await compute(rotated.key), 401, "revoked-key");
    const acts = activityOfSubject(server.service.db, id);
    expect(acts.map(({ action }) => action)).toEqual([
      "key.revoke",
      "key.rotate",
      "key.change",
      "key.change",
      "key.issue",
    ]);
    expect(acts[3]).toMatchObject({
      actorKind: "person",
      before: { name: "Sections" },
      after: { name: "Renamed" },
    });
  });

  test("complaints name the fields, and nothing is stored", async () => {
    const response = await send("POST", "keys", { teamId, name: "", scopes: [], origins: ["intranet"] });
    expect(response.status).toBe(422);
    const { errors } = (await response.json()) as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer).sort()).toEqual(["#/name", "#/origins/0", "#/scopes"]);
    expect(await answer<Page>("GET", `keys?q=intranet`)).toMatchObject({ total: 0 });
  });
});

test("whatever belongs to another team is unknown", async () => {
  const their = server.issue({ team: THEIRS });
  const stored = await compute(their.key, { ...SLEEVE, record: { label: "theirs" } });
  const material = await call(server, "post", "/materials", { key: their.key, body: BRONZE });
  const record = stored.body.record.id;
  const statuses = await Promise.all([
    send("GET", `keys/${their.id}`),
    send("PATCH", `keys/${their.id}`, { name: "x" }),
    send("POST", `keys/${their.id}/rotate`, { overlap: "1h" }),
    send("POST", `keys/${their.id}/revoke`),
    send("POST", "keys", { teamId: theirId, name: "x", scopes: ["compute"] }),
    send("GET", `keys?team=${theirId}`),
    send("GET", `usage?caller=${their.id}`),
    send("GET", `usage?team=${theirId}`),
    send("GET", `usage/requests?team=${theirId}`),
    send("PATCH", `records/${record}`, { label: "x" }),
    send("POST", `records/${record}/replay`),
    send("DELETE", `records/${record}`),
    send("GET", `records?team=${theirId}`),
    send("GET", `materials/${material.body.id}`),
    send("PATCH", `materials/${material.body.id}`, { from: 1, name: "x" }),
    send("POST", `materials/${material.body.id}/retire`, { from: 1 }),
  ]);
  expect(statuses.map(({ status }) => status)).toEqual(statuses.map(() => 404));
  const seen = await answer<Page>("GET", `records?material=${material.body.id}`);
  expect(seen.total).toBe(0);
  expect((await compute(their.key)).status).toBe(200);
});

const BRONZE = {
  name: "Contact bronze",
  kind: "alloy",
  resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
  range: { from: -40, to: 150 },
  uncertainty: { lower: 0.98, upper: 1.02, note: "Four-wire measurement." },
  source: "Incoming inspection",
  provenance: "measured",
};

test("a material from a measured table to its next version, its records and its end", async () => {
  const text = "temperature/degC,resistivity/uohm cm\n-40,8.87\n20,9.50\n150,10.86\n";
  const table = await answer<{ resistivity: object; range: object }>("POST", "materials/table", { text });
  const { id } = await answer<{ id: string }>("POST", "materials", { teamId, ...BRONZE, ...table });
  const { key } = await issue("Materials");
  const body = {
    shape: "bar",
    dimensions: { length: "1 m", width: "10 mm", thickness: "5 mm" },
    medium: { material: id },
    record: { label: "Contact" },
  };
  const stored = await compute(key, body);
  expect(stored.status).toBe(200);
  await answer("PATCH", `materials/${id}`, { from: 1, name: "Contact bronze, lot 8" });
  const stale = await send("PATCH", `materials/${id}`, { from: 1, name: "too late" });
  expect(stale.status).toBe(409);

  const history = await answer<object>("GET", `materials/${id}`);
  expect(history).toMatchObject({
    versions: [
      { version: 1, name: "Contact bronze" },
      { version: 2, name: "Contact bronze, lot 8" },
    ],
    uses: [{ version: 1, records: 1 }],
    mayManage: true,
  });
  const used = await answer<Page>("GET", `records?material=${id}`);
  expect(await answer<Page>("GET", `records?material=${id}&page=9`)).toEqual({ rows: [], total: used.total });
  expect(used.rows).toMatchObject([{ id: stored.body.record.id, label: "Contact" }]);
  const replay = await answer<object>("POST", `records/${stored.body.record.id}/replay`);
  expect(replay).toMatchObject({ drift: 0, identical: true });

  await answer("POST", `materials/${id}/retire`, { from: 2 });
  expect((await compute(key, body)).status).toBe(422);
  expect((await send("PATCH", "materials/copper-annealed", { from: 1, name: "x" })).status).toBe(403);
});

test("lists search, order, page and export", async () => {
  for (const name of ["Ampere", "Biot", "Coulomb"]) await issue(name);
  const two = await answer<Page>("GET", "keys?q=o&sort=-name&size=1&page=2&state=active");
  expect(two.total).toBeGreaterThanOrEqual(2);
  // Past the end there are no rows, and still the total.
  expect(await answer<Page>("GET", "keys?q=o&page=99&state=active")).toEqual({ rows: [], total: two.total });
  const sorted = await answer<Page>("GET", "keys?sort=name");
  const names = sorted.rows.map(({ name }) => String(name));
  expect(names).toEqual([...names].sort((a, b) => a.toLowerCase().localeCompare(b.toLowerCase(), "en")));
  expect(new Set(sorted.rows.map(({ teamId: id }) => id))).toEqual(new Set([teamId]));

  const file = await send("GET", "keys?csv=1&q=Ampere");
  expect(file.headers.get("content-type")).toMatch(/^text\/csv/);
  expect(file.headers.get("content-disposition")).toContain("keys.csv");
  expect((await file.text()).split(/\r?\n/)[1]).toContain("Ampere");

  for (const wrong of ["keys?sort=secret", "keys?size=0", "usage?from=2025-13-01", "usage?from=2020-01-01"])
    expect([wrong, (await send("GET", wrong)).status]).toEqual([wrong, 422]);
});

test("what calls divide into names those that have no shape, in the page's rows and in the file", async () => {
  const { id, key } = await issue("Shares");
  const batch = await call(server, "post", "/resistance/batch", { key, body: { items: [SLEEVE] } });
  expect(batch.status).toBe(200);
  expect((await compute(key)).status).toBe(200);
  const { rows } = await answer<Page>("GET", `usage/shares?caller=${id}&by=shape`);
  expect(rows.map(({ label }) => label).sort()).toEqual(["cylindrical-shell", "no shape"]);
  const file = await (await send("GET", `usage/shares?caller=${id}&by=shape&csv=1`)).text();
  expect(file).toMatch(/^shape,requests,computations\r?\n/);
  expect(file).toMatch(/^no shape,1,1\r?$/m);
});

test("the overview sums what the team did", async () => {
  const overview = await answer<{ today: { requests: number }; errors: Page; slowest: unknown[] }>(
    "GET",
    "overview",
  );
  const { total } = await answer<{ total: { requests: number } }>("GET", "usage");
  expect(overview.today.requests).toBe(total.requests);
  expect(overview.errors.total).toBeGreaterThan(0);
  expect(overview.slowest.length).toBeGreaterThan(0);
});

test("somebody invited without a team is refused at the teams; the activity names the material that was changed", async () => {
  const { name, value } = await signedInCookie(server.service, { role: "admin", team: OURS });
  const admin = { Cookie: `${name}=${value}`, Origin: server.base, "Content-Type": "application/json" };
  const refused = await fetch(`${server.base}/api/console/people`, {
    method: "POST",
    headers: admin,
    body: JSON.stringify({ email: "maud@merrow-pike.example", name: "Maud", role: "viewer", teams: [] }),
  });
  expect(refused.status).toBe(422);
  expect(await refused.json()).toMatchObject({
    detail: "A viewer belongs to at least one team.",
    errors: [{ pointer: "#/teams" }],
  });

  const { id } = await answer<{ id: string }>("POST", "materials", { teamId, ...BRONZE });
  await answer("PATCH", `materials/${id}`, { from: 1, name: "Contact bronze, lot 9" });
  const acts = await answer<Page>("GET", `activity?subject=${id}`);
  expect(acts.rows).toMatchObject([
    { action: "material.change", subject: { id, name: "Contact bronze, lot 9", present: true } },
    { action: "material.create", before: null, after: { name: "Contact bronze" } },
  ]);
  const file = await (await send("GET", `activity?subject=${id}&csv=1`)).text();
  expect(file).toContain("Contact bronze, lot 9");
  expect(file).toContain('""coefficient"":0.0011');
});

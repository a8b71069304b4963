import { readdirSync, readFileSync } from "node:fs";
import { request as httpRequest } from "node:http";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { insertPerson, insertTeam, teamBySlug } from "@/db/queries/teams";
import { ROLES, type Role } from "@/db/schema/organisation";
import { ACTIONS, type Action, PERMISSIONS } from "@/lib/auth/permissions";
import { newId } from "@/lib/service/identifier";
import { call, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";

/** Teams of their own, so that the tests of others find nothing of these. */
const OWN = `own-${newId("per").slice(-8).toLowerCase()}`;
const OTHER = `other-${newId("per").slice(-8).toLowerCase()}`;

let server: TestServer;
const cookies = new Map<Role, string>();

beforeAll(async () => {
  server = await startServer();
  const { db } = server.service;
  for (const slug of [OWN, OTHER])
    insertTeam(db, { id: newId("team"), slug, name: slug, createdAt: Date.now() });
  for (const role of ROLES) {
    const { name, value } = await signedInCookie(server.service, { role, team: OWN });
    cookies.set(role, `${name}=${value}`);
  }
});
afterAll(() => server.stop());

type Method = "GET" | "POST" | "PATCH" | "DELETE";

interface Sent {
  readonly method: Method;
  readonly path: string;
  readonly body?: unknown;
}

/** One call that does an action to what belongs to a team; things it needs are made first. */
type Probe = (team: { readonly id: string; readonly slug: string }) => Sent | Promise<Sent>;

const newKey = (slug: string) => server.issue({ team: slug }).id;

async function newRecord(slug: string): Promise<string> {
  const { key } = server.issue({ team: slug });
  const response = await call(server, "post", "/resistance", {
    key,
    body: { ...SLEEVE, record: { label: "x" } },
  });
  return response.body.record.id;
}

async function newEmbed(teamId: string): Promise<string> {
  const body = { teamId, name: "Bar", shape: "bar" };
  const response = await send("admin", { method: "POST", path: "embeds", body });
  return ((await response.json()) as { id: string }).id;
}

function newPerson(): string {
  const id = newId("per");
  const email = `${id.toLowerCase()}@merrow-pike.example`;
  insertPerson(server.service.db, {
    id,
    email,
    name: "Jori Banfield",
    role: "viewer",
    createdAt: Date.now(),
  });
  return id;
}

const get = (path: string): Sent => ({ method: "GET", path });

/** Every action, by the calls that do it. */
const PROBES: Readonly<Record<Action, readonly Probe[]>> = {
  "overview.view": [() => get("overview")],
  "keys.view": [({ id }) => get(`keys?team=${id}`), ({ slug }) => get(`keys/${newKey(slug)}`)],
  "keys.manage": [
    ({ id }) => ({ method: "POST", path: "keys", body: { teamId: id, name: "CAD", scopes: ["compute"] } }),
    ({ slug }) => ({ method: "POST", path: `keys/${newKey(slug)}/rotate`, body: { overlap: "0" } }),
    ({ slug }) => ({ method: "POST", path: `keys/${newKey(slug)}/revoke` }),
  ],
  "embeds.view": [async ({ id }) => get(`embeds/${await newEmbed(id)}`)],
  "embeds.manage": [
    ({ id }) => ({ method: "POST", path: "embeds", body: { teamId: id, name: "Bar", shape: "bar" } }),
    async ({ id }) => ({ method: "POST", path: `embeds/${await newEmbed(id)}/withdraw` }),
  ],
  "usage.view": [({ id }) => get(`usage?team=${id}`)],
  "materials.view": [({ id }) => get(`materials?owner=${id}`)],
  "materials.manage": [
    ({ id }) => ({
      method: "POST",
      path: "materials",
      body: {
        teamId: id,
        name: "Measured copper",
        kind: "alloy",
        resistivity: { model: "linear", resistivity: 1.75e-8, coefficient: 0.0039, reference: 20 },
        range: { from: 0, to: 100 },
        uncertainty: { lower: 0.99, upper: 1.01, note: "Four-wire measurement." },
        source: "Own measurement",
        provenance: "measured",
      },
    }),
  ],
  "records.view": [({ id }) => get(`records?team=${id}`)],
  "records.manage": [
    async ({ slug }) => ({
      method: "PATCH",
      path: `records/${await newRecord(slug)}`,
      body: { label: "Rev D" },
    }),
    async ({ slug }) => ({ method: "DELETE", path: `records/${await newRecord(slug)}` }),
  ],
  "people.view": [({ id }) => get(`people?team=${id}`)],
  "people.manage": [
    ({ id }) => ({
      method: "POST",
      path: "people",
      body: { email: `${newId("per")}@merrow-pike.example`, name: "Maud", role: "viewer", teams: [id] },
    }),
    () => ({ method: "PATCH", path: `people/${newPerson()}`, body: { name: "Jori" } }),
    () => ({ method: "DELETE", path: `people/${newPerson()}` }),
    () => get(`people/${newPerson()}/sessions`),
  ],
  "teams.manage": [({ id }) => ({ method: "PATCH", path: `teams/${id}`, body: { name: "Renamed" } })],
  "activity.view": [({ id }) => get(`activity?team=${id}`)],
  "settings.view": [() => get("settings"), () => get("settings/mails")],
  "settings.manage": [() => ({ method: "PATCH", path: "settings", body: {} })],
  "account.manage": [() => get("account")],
};

function send(role: Role, { method, path, body }: Sent): Promise<Response> {
  return fetch(`${server.base}/api/console/${path}`, {
    method,
    headers: {
      Cookie: cookies.get(role) ?? "",
      Origin: server.base,
      ...(body === undefined ? {} : { "Content-Type": "application/json" }),
    },
    body: body === undefined ? undefined : JSON.stringify(body),
  });
}

/** What the table says of a cell, as a status. */
function expected(role: Role, action: Action, whose: "own" | "other"): "answered" | 403 | 404 {
  const reach = PERMISSIONS[action][role];
  // The overview is of all teams that the person sees, and names none.
  if (action === "overview.view") return "answered";
  if (reach === "none") return 403;
  return reach === "all" || whose === "own" ? "answered" : 404;
}

describe.each(ROLES)("a person with the role %s", (role) => {
  test.each(ACTIONS)("%s", async (action) => {
    for (const whose of ["own", "other"] as const) {
      const slug = whose === "own" ? OWN : OTHER;
      const team = { id: teamBySlug(server.service.db, slug)?.id ?? "", slug };
      for (const probe of PROBES[action]) {
        const sent = await probe(team);
        const { status } = await send(role, sent);
        const told = status >= 200 && status < 300 ? "answered" : status;
        expect([whose, sent.method, sent.path, told]).toEqual([
          whose,
          sent.method,
          sent.path,
          expected(role, action, whose),
        ]);
      }
    }
  });
});

interface Route {
  readonly path: string;
  readonly methods: readonly Method[];
}

/** The routes behind the sign-in, from the files that define them. */
function routes(folder = "app/api/console"): Route[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry): Route[] => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return routes(path);
    if (entry.name !== "route.ts") return [];
    const source = readFileSync(path, "utf8");
    const methods = (["GET", "POST", "PATCH", "DELETE"] as const).filter((method) =>
      new RegExp(`export const ${method}\\b|as ${method}\\b`).test(source),
    );
    return [{ path: folder.replace(/^app/, "").replace(/\[[^\]]+\]/g, "x"), methods }];
  });
}

describe("signed out", () => {
  test("every call behind the sign-in is a 401", async () => {
    const found = routes();
    expect(found.length).toBeGreaterThan(20);
    for (const { path, methods } of found) {
      expect(methods.length).toBeGreaterThan(0);
      for (const method of methods) {
        const response = await fetch(server.base + path, { method, headers: { Origin: server.base } });
        expect([method, path, response.status]).toEqual([method, path, 401]);
        expect(response.headers.get("content-type")).toMatch(/^application\/problem\+json/);
      }
    }
    // Where the pages are built as they are asked for, each of them takes seconds.
  }, 300_000);

  test("the 401 comes before any of the body was sent", async () => {
    const url = new URL("/api/console/keys", server.base);
    const headers = { Origin: server.base, "Content-Type": "application/json", "Content-Length": 500_000 };
    const status = await new Promise((resolve, reject) => {
      const sent = httpRequest(url, { method: "POST", headers }, (response) => {
        resolve(response.statusCode);
        sent.destroy();
      });
      sent.once("error", reject);
      sent.flushHeaders();
    });
    expect(status).toBe(401);
  });

  test("a page of the console leads to the sign-in and back", async () => {
    const response = await fetch(`${server.base}/console/people?role=admin`, { redirect: "manual" });
    expect(response.status).toBe(303);
    const to = new URL(response.headers.get("location") ?? "", server.base);
    expect([to.pathname, to.searchParams.get("next")]).toEqual(["/sign-in", "/console/people?role=admin"]);
  });
});

describe("from another site", () => {
  const others: Record<string, string>[] = [
    { Origin: "https://elsewhere.example" },
    { Origin: "null" },
    { "Sec-Fetch-Site": "cross-site" },
    {},
  ];
  test.each(others)("a change is refused: %j", async (headers) => {
    const response = await fetch(`${server.base}/api/console/settings`, {
      method: "PATCH",
      headers: { Cookie: cookies.get("admin") ?? "", "Content-Type": "application/json", ...headers },
      body: "{}",
    });
    expect(response.status).toBe(403);
    expect(((await response.json()) as { type: string }).type).toContain("origin-not-allowed");
  });
});

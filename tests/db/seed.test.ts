import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { listRecords } from "@/db/queries/records";
import { listTeams, teamBySlug } from "@/db/queries/teams";
import { demoKey, seedDemo } from "@/db/seed";
import { dispatch } from "@/api/dispatch";
import { registry } from "@/api/registry";
import { SHELL } from "@/lib/activity/append";
import { revokeKey } from "@/lib/auth/manage-keys";
import { readConfig } from "@/lib/config/environment";
import { replayResistance } from "@/lib/records/replay";
import { closeService, openService, type Service } from "@/lib/service/service";

let folder: string;
let service: Service;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "rhoform-seed-"));
  service = openService(readConfig({ RHOFORM_DATA: folder, RHOFORM_LOG: "off" }));
});
afterEach(() => {
  closeService(service);
  rmSync(folder, { recursive: true, force: true });
});

const recordsOf = (slug: string) =>
  listRecords(service.db, teamBySlug(service.db, slug)?.id ?? "", { limit: 100, maxChars: 1e9 }).rows;

describe("the demo company", () => {
  test("has its teams, invented people and a key a team that works", async () => {
    seedDemo(service);
    expect(listTeams(service.db).map(({ slug, name }) => [slug, name])).toEqual([
      ["busbar", "Busbar"],
      ["earthing", "Earthing"],
      ["thin-film", "Thin film"],
    ]);
    const emails = service.db.$client.prepare("select email from people").pluck().all() as string[];
    expect(emails.length).toBeGreaterThan(3);
    for (const email of emails) expect(email).toMatch(/@merrow-pike\.example$/);
    const keys = ["busbar", "thin-film", "earthing"].map((slug) => demoKey(service, slug));
    expect(new Set(keys).size).toBe(3);
    for (const key of keys) {
      const request = new Request("http://h/api/v1/usage", { headers: { Authorization: `Bearer ${key}` } });
      expect((await dispatch(request, service, registry)).status).toBe(200);
    }
  });

  test("is seeded once: a second time changes nothing, and the key is printed again", () => {
    seedDemo(service);
    const before = service.db.$client.serialize();
    const key = demoKey(service);
    seedDemo(service);
    expect(Buffer.compare(service.db.$client.serialize(), before)).toBe(0);
    expect(demoKey(service)).toBe(key);
  });

  test("a revoked demo key is not given out, nor made again", () => {
    seedDemo(service);
    const id = demoKey(service)?.split("_")[1] ?? "";
    revokeKey(service.db, { id, actor: SHELL, now: Date.now() });
    seedDemo(service);
    expect(demoKey(service)).toBeUndefined();
  });

  test("its history stands in the order of time: acts, calls and records", () => {
    seedDemo(service);
    for (const [table, time] of [
      ["activity", "at"],
      ["usage_events", "at"],
      ["records", "created_at"],
    ]) {
      const times = service.db.$client
        .prepare<[], number>(`select ${time} from ${table} order by rowid`)
        .pluck()
        .all();
      expect(times.length, table).toBeGreaterThan(6);
      expect(times, table).toEqual(times.toSorted((a, b) => a - b));
    }
  });

  test("its records were really computed", () => {
    seedDemo(service);
    const rows = ["busbar", "thin-film", "earthing"].flatMap(recordsOf);
    expect(rows.length).toBeGreaterThanOrEqual(6);
    for (const row of rows)
      expect(replayResistance(service.db, row)).toMatchObject({ drift: 0, identical: true });
  });
});

import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase } from "@/db/client";
import { claimKey, keepAnswer, keptAnswer, releaseKey } from "@/db/queries/idempotency";
import {
  endSecrets,
  insertKey,
  insertSecret,
  keyById,
  keyWithSecrets,
  listKeys,
  markRevoked,
  markUsed,
} from "@/db/queries/keys";
import {
  currentMaterial,
  insertMaterial,
  insertNextVersion,
  listMaterials,
  markRetired,
  materialVersion,
} from "@/db/queries/materials";
import { deleteRecord, insertRecord, listRecords, recordOfTeam, relabelRecord } from "@/db/queries/records";
import { forgetExpired } from "@/db/queries/rate-limits";
import { readSetting, writeSetting } from "@/db/queries/settings";
import { insertMembership, insertPerson, insertTeam } from "@/db/queries/teams";

let db: Database;
beforeEach(() => {
  db = openDatabase(":memory:");
  migrateDatabase(db);
  insertTeam(db, { id: "team_1", slug: "busbar", name: "Busbar", createdAt: 1 });
  insertTeam(db, { id: "team_2", slug: "earthing", name: "Earthing", createdAt: 2 });
});
afterEach(() => {
  db.$client.close();
});

const key = (id: string, teamId = "team_1", createdAt = 10) => ({
  id,
  teamId,
  name: `Key ${id}`,
  scopes: ["compute"],
  origins: ["https://intranet.merrow-pike.example"],
  allowedInUrl: false,
  minuteQuota: 600,
  monthQuota: 1000,
  createdAt,
  createdBy: "shell",
  expiresAt: null,
});

describe("keys", () => {
  test("are found with their team's short name and every secret", () => {
    insertKey(db, key("k1"));
    insertSecret(db, { id: "sec_1", keyId: "k1", hash: "aa", createdAt: 10 });
    insertSecret(db, { id: "sec_2", keyId: "k1", hash: "bb", createdAt: 20 });
    const found = keyWithSecrets(db, "k1");
    expect(found?.key).toMatchObject({ id: "k1", team: "busbar", scopes: ["compute"], allowedInUrl: false });
    expect(found?.secrets.map(({ hash }) => hash).sort()).toEqual(["aa", "bb"]);
    expect(keyWithSecrets(db, "k9")).toBeUndefined();
  });

  test("a rotation ends the secrets before, and never prolongs one that ends earlier", () => {
    insertKey(db, key("k1"));
    insertSecret(db, { id: "sec_1", keyId: "k1", hash: "aa", createdAt: 10 });
    endSecrets(db, "k1", 100);
    endSecrets(db, "k1", 500);
    expect(keyWithSecrets(db, "k1")?.secrets).toEqual([{ hash: "aa", validUntil: 100 }]);
    endSecrets(db, "k1", 50);
    expect(keyWithSecrets(db, "k1")?.secrets).toEqual([{ hash: "aa", validUntil: 50 }]);
  });

  test("are revoked once and remember their last use", () => {
    insertKey(db, key("k1"));
    expect(markRevoked(db, "k1", 30)).toBe(true);
    expect(markRevoked(db, "k1", 40)).toBe(false);
    markUsed(db, "k1", 25, "python");
    expect(keyById(db, "k1")).toMatchObject({ revokedAt: 30, lastUsedAt: 25, lastClient: "python" });
  });

  test("are listed by team, newest first, page by page", () => {
    for (const [i, id] of ["ka", "kb", "kc", "kd"].entries()) insertKey(db, key(id, "team_1", 10 + (i >> 1)));
    insertKey(db, key("kx", "team_2"));
    const ids = (rows: { id: string }[]) => rows.map(({ id }) => id);
    expect(ids(listKeys(db, { teamId: "team_1" }))).toEqual(["kd", "kc", "kb", "ka"]);
    expect(ids(listKeys(db, { teamId: "team_1", limit: 2, after: { at: 11, id: "kd" } }))).toEqual([
      "kc",
      "kb",
    ]);
    expect(listKeys(db, {})).toHaveLength(5);
  });

  test("cannot belong to a team that does not exist", () => {
    expect(() => insertKey(db, key("k1", "team_9"))).toThrow(/FOREIGN KEY/);
  });
});

describe("people", () => {
  test("have one account an address, whatever its letters' case", () => {
    const person = { name: "Ines Harrow", role: "admin" as const, createdAt: 1 };
    insertPerson(db, { id: "per_1", email: "Ines@Merrow-Pike.example", ...person });
    insertMembership(db, "per_1", "team_1", 1);
    expect(() => insertPerson(db, { id: "per_2", email: "ines@merrow-pike.EXAMPLE", ...person })).toThrow(
      /UNIQUE/,
    );
    expect(() => insertMembership(db, "per_1", "team_1", 2)).toThrow(/UNIQUE/);
  });
});

describe("materials", () => {
  const version = (note: string) => ({ data: { note }, createdAt: 5, createdBy: "shell" });

  test("get versions one after the other, each kept", () => {
    insertMaterial(db, "mat-1", "team_1", version("first"));
    expect(insertNextVersion(db, "mat-1", 1, version("second"))).toBe(true);
    expect(insertNextVersion(db, "mat-1", 1, version("lost"))).toBe(false);
    expect(currentMaterial(db, "team_1", "mat-1")).toMatchObject({
      version: 2,
      data: { note: "second" },
      team: "busbar",
    });
    expect(materialVersion(db, "team_1", "mat-1", 1)).toMatchObject({ version: 1, data: { note: "first" } });
    expect(materialVersion(db, "team_1", "mat-1", 3)).toBeUndefined();
  });

  test("of another team do not exist", () => {
    insertMaterial(db, "mat-1", "team_1", version("first"));
    expect(currentMaterial(db, "team_2", "mat-1")).toBeUndefined();
    expect(materialVersion(db, "team_2", "mat-1", 1)).toBeUndefined();
    expect(listMaterials(db, "team_2", 10)).toEqual([]);
  });

  test("once retired leave the list, keep their versions and get no more", () => {
    insertMaterial(db, "mat-1", "team_1", version("first"));
    expect(markRetired(db, "mat-1", 9)).toBe(true);
    expect(markRetired(db, "mat-1", 10)).toBe(false);
    expect(insertNextVersion(db, "mat-1", 1, version("second"))).toBe(false);
    expect(listMaterials(db, "team_1", 10)).toEqual([]);
    expect(currentMaterial(db, "team_1", "mat-1")).toMatchObject({ retiredAt: 9 });
  });
});

describe("records", () => {
  const record = (id: string, over: object = {}) => ({
    id,
    teamId: "team_1",
    operation: "resistance",
    label: `Label ${id}`,
    shape: "bar",
    createdAt: 10,
    byKind: "key",
    byId: "k1",
    byName: "Test",
    request: '{"shape":"bar"}',
    result: "{}",
    materials: [{ id: "copper-annealed", version: 1 }],
    engine: "1.0.0",
    catalogue: "1",
    ...over,
  });
  const list = (over: object = {}) => {
    const { rows, more } = listRecords(db, "team_1", { limit: 10, maxChars: 1e6, ...over });
    return { ids: rows.map(({ id }) => id), more };
  };

  test("come back as they went in", () => {
    insertRecord(db, record("rec_1"));
    expect(recordOfTeam(db, "team_1", "rec_1")).toEqual(record("rec_1"));
    expect(recordOfTeam(db, "team_2", "rec_1")).toBeUndefined();
  });

  test("are listed newest first, filtered, and cut by number and by size", () => {
    insertRecord(db, record("rec_1", { createdAt: 1, label: "100% copper_1" }));
    insertRecord(db, record("rec_2", { createdAt: 2, shape: "tube" }));
    insertRecord(db, record("rec_3", { createdAt: 3, result: "x".repeat(500) }));
    expect(list()).toEqual({ ids: ["rec_3", "rec_2", "rec_1"], more: false });
    expect(list({ limit: 2 })).toEqual({ ids: ["rec_3", "rec_2"], more: true });
    expect(list({ after: { at: 3, id: "rec_3" } })).toEqual({ ids: ["rec_2", "rec_1"], more: false });
    expect(list({ shape: "tube" }).ids).toEqual(["rec_2"]);
    expect(list({ operation: "sizing" }).ids).toEqual([]);
    expect(list({ maxChars: 100 })).toEqual({ ids: ["rec_3"], more: true });
  });

  test("are searched by what is typed, wildcards included", () => {
    insertRecord(db, record("rec_1", { label: "100% copper_1" }));
    insertRecord(db, record("rec_2", { label: "100x copperA1" }));
    expect(list({ search: "0% COPPER_" }).ids).toEqual(["rec_1"]);
    expect(list({ search: "\\" }).ids).toEqual([]);
    expect(list({ search: "copper" }).ids).toHaveLength(2);
  });

  test("are relabelled and deleted", () => {
    insertRecord(db, record("rec_1"));
    relabelRecord(db, "rec_1", "New");
    expect(recordOfTeam(db, "team_1", "rec_1")?.label).toBe("New");
    expect(deleteRecord(db, "rec_1")).toBe(true);
    expect(deleteRecord(db, "rec_1")).toBe(false);
  });
});

describe("idempotency keys", () => {
  const id = { owner: "k1", key: "abc" };
  const claim = { fingerprint: "f", startedAt: 100, expiresAt: 200 };

  test("are claimed once, keep an answer and are free again when they expire or are given back", () => {
    expect(claimKey(db, id, claim)).toBe(true);
    expect(claimKey(db, id, claim)).toBe(false);
    expect(claimKey(db, { ...id, owner: "k2" }, claim)).toBe(true);
    expect(keptAnswer(db, id)).toMatchObject({ fingerprint: "f", status: null });
    keepAnswer(db, id, { status: 201, headers: { ETag: "1" }, body: "{}", expiresAt: 1000 });
    expect(keptAnswer(db, id)).toEqual({ fingerprint: "f", status: 201, headers: { ETag: "1" }, body: "{}" });
    expect(claimKey(db, id, { ...claim, startedAt: 900 })).toBe(false);
    expect(claimKey(db, id, { ...claim, startedAt: 1001, expiresAt: 1200 })).toBe(true);
    releaseKey(db, id);
    expect(keptAnswer(db, id)).toBeUndefined();
  });
});

describe("settings and counters", () => {
  test("a setting is written over", () => {
    expect(readSetting(db, "x")).toBeUndefined();
    writeSetting(db, "x", { a: 1 }, 1);
    writeSetting(db, "x", { a: 2 }, 2);
    expect(readSetting(db, "x")).toEqual({ a: 2 });
  });

  test("expired counters are forgotten", () => {
    const insert = db.$client.prepare("insert into rate_limits (key, points, expire) values (?, 1, ?)");
    insert.run("old", 10);
    insert.run("new", 30);
    insert.run("forever", null);
    forgetExpired(db, 20);
    expect(db.$client.prepare("select key from rate_limits order by key").pluck().all()).toEqual([
      "forever",
      "new",
    ]);
  });
});

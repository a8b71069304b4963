import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, describe, expect, test } from "vitest";
import {
  type Database,
  migrateDatabase,
  openDatabase,
  prepared,
  sharedDatabase,
  transact,
} from "@/db/client";
import { insertActivity } from "@/db/queries/activity";
import { insertTeam, listTeams, teamBySlug } from "@/db/queries/teams";

const folders: string[] = [];
const opened: Database[] = [];

function file(): string {
  const folder = mkdtempSync(join(tmpdir(), "rhoform-db-"));
  folders.push(folder);
  return join(folder, "deep", "rhoform.sqlite");
}

function open(path: string): Database {
  const db = openDatabase(path);
  opened.push(db);
  return db;
}

afterEach(() => {
  for (const db of opened.splice(0)) if (db.$client.open) db.$client.close();
  for (const folder of folders.splice(0)) rmSync(folder, { recursive: true, force: true });
});

describe("migrations", () => {
  test("make every table from an empty file, and find them applied the second time", () => {
    const path = file();
    const db = open(path);
    migrateDatabase(db);
    migrateDatabase(db);
    migrateDatabase(open(path));
    const names = db.$client
      .prepare("select name from sqlite_master where type = 'table' and name not like 'sqlite_%'")
      .pluck()
      .all();
    expect(names).toEqual(
      expect.arrayContaining([
        "teams",
        "people",
        "memberships",
        "keys",
        "key_secrets",
        "usage_events",
        "usage_hours",
        "usage_days",
        "usage_day_details",
        "usage_hour_latencies",
        "materials",
        "material_versions",
        "records",
        "activity",
        "idempotency",
        "rate_limits",
        "settings",
      ]),
    );
    const journal = JSON.parse(readFileSync("db/migrations/meta/_journal.json", "utf8")) as {
      entries: unknown[];
    };
    const applied = db.$client.prepare("select count(*) from __drizzle_migrations").pluck().get();
    expect(applied).toBe(journal.entries.length);
  });

  test("leave the data of an older file alone", () => {
    const path = file();
    const db = open(path);
    migrateDatabase(db);
    insertTeam(db, { id: "team_1", slug: "busbar", name: "Busbar", createdAt: 1 });
    db.$client.close();
    const again = open(path);
    migrateDatabase(again);
    expect(listTeams(again)).toEqual([{ id: "team_1", slug: "busbar", name: "Busbar", createdAt: 1 }]);
  });

  test("keep the activity append-only", () => {
    const db = open(":memory:");
    migrateDatabase(db);
    insertActivity(db, {
      id: "act_1",
      at: 1,
      actorKind: "shell",
      actorId: "shell",
      actorName: "shell",
      action: "key.issue",
      subjectKind: "key",
      subjectId: "k1",
    });
    expect(() => db.$client.exec("update activity set action = 'nothing'")).toThrow(/append-only/);
    expect(() => db.$client.exec("delete from activity")).toThrow(/append-only/);
    expect(db.$client.prepare("select count(*) from activity").pluck().get()).toBe(1);
  });
});

describe("the open database", () => {
  test("uses the write-ahead log, waits for locks and enforces foreign keys", () => {
    const db = open(file());
    const pragma = (name: string) => db.$client.pragma(name, { simple: true });
    expect(pragma("journal_mode")).toBe("wal");
    expect(pragma("busy_timeout")).toBe(5000);
    expect(pragma("foreign_keys")).toBe(1);
    expect(pragma("synchronous")).toBe(1);
  });

  test("is one a path in the process, and opened anew after it was closed", () => {
    const path = file();
    const db = sharedDatabase(path);
    expect(sharedDatabase(path)).toBe(db);
    db.$client.close();
    const again = sharedDatabase(path);
    opened.push(again);
    expect(again).not.toBe(db);
    expect(again.$client.open).toBe(true);
  });

  test("rolls back the whole transaction, nested ones included", () => {
    const db = open(":memory:");
    migrateDatabase(db);
    const team = (slug: string) => ({ id: `team_${slug}`, slug, name: slug, createdAt: 1 });
    expect(() =>
      transact(db, () => {
        insertTeam(db, team("one"));
        transact(db, () => insertTeam(db, team("two")));
        throw new Error("no");
      }),
    ).toThrow("no");
    expect(listTeams(db)).toEqual([]);
    transact(db, () => {
      insertTeam(db, team("one"));
      expect(() =>
        transact(db, () => {
          insertTeam(db, team("two"));
          throw new Error("inner");
        }),
      ).toThrow("inner");
    });
    expect(teamBySlug(db, "one")).toBeDefined();
    expect(teamBySlug(db, "two")).toBeUndefined();
  });

  test("builds a prepared statement once a database", () => {
    const db = open(":memory:");
    const other = open(":memory:");
    let built = 0;
    const statement = (of: Database) => prepared(of, "test", () => ({ number: ++built }));
    expect(statement(db)).toBe(statement(db));
    expect(statement(other)).not.toBe(statement(db));
    expect(built).toBe(2);
  });
});

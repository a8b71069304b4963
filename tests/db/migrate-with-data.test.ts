import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase } from "@/db/client";

const folders: string[] = [];
const opened: Database[] = [];
afterEach(() => {
  for (const db of opened.splice(0)) db.$client.close();
  for (const folder of folders.splice(0)) rmSync(folder, { recursive: true, force: true });
});

/** The migrations up to one, as an installation has them that was not updated since. */
function migrationsBefore(name: string): string {
  const folder = mkdtempSync(join(tmpdir(), "rhoform-migrations-"));
  folders.push(folder);
  cpSync("db/migrations", folder, { recursive: true });
  const path = join(folder, "meta", "_journal.json");
  const journal = JSON.parse(readFileSync(path, "utf8")) as { entries: { tag: string }[] };
  const entries = journal.entries.slice(
    0,
    journal.entries.findIndex(({ tag }) => tag.startsWith(name)),
  );
  writeFileSync(path, JSON.stringify({ ...journal, entries }));
  return folder;
}

test("an installation in use gets its clients and latencies by day and its records by material", () => {
  const db = openDatabase(":memory:");
  opened.push(db);
  migrateDatabase(db, migrationsBefore("0006"));
  const day = 20_000;
  const at = day * 86_400_000;
  db.$client.exec(`
    insert into teams (id, slug, name, created_at) values ('t1', 'busbar', 'Busbar', 0);
    insert into usage_events
      (at, request_id, key_id, team_id, operation, shape, status, latency_us, computations, client) values
      (${at + 5}, 'r1', 'k1', 't1', 'computeResistance', 'bar', 200, 900, 1, 'python'),
      (${at + 9}, 'r2', 'k1', 't1', 'computeResistance', 'bar', 200, 900, 4, 'python'),
      (${at + 7}, 'r3', 'k1', 't1', 'computeResistance', null, 422, 200, 0, 'browser'),
      (${at + 86_400_000}, 'r4', 'k1', 't1', 'computeResistance', 'bar', 200, 900, 1, 'python');
    insert into usage_hour_latencies (hour, team_id, bucket, requests) values
      (${day * 24}, 't1', 39, 2), (${day * 24 + 23}, 't1', 39, 1), (${day * 24 + 24}, 't1', 30, 5);
    insert into records
      (id, team_id, operation, label, shape, created_at, by_kind, by_id, by_name, request, result, materials, engine, catalogue)
      values ('rec1', 't1', 'resistance', 'A', 'bar', 10, 'key', 'k1', 'K', '{}', '{}',
              '[{"id":"copper-annealed","version":1},{"id":"mat-x","version":3}]', '1', '1'),
             ('rec2', 't1', 'resistance', 'B', 'bar', 20, 'key', 'k1', 'K', '{}', '{}', '[]', '1', '1');
  `);
  migrateDatabase(db);
  const all = (sql: string) => db.$client.prepare(sql).raw().all();
  expect(
    all("select day, client, requests, computations, last_at from usage_day_clients order by day, client"),
  ).toEqual([
    [day, "browser", 1, 0, at + 7],
    [day, "python", 2, 5, at + 9],
    [day + 1, "python", 1, 1, at + 86_400_000],
  ]);
  expect(all("select material_id, record_id, version, created_at from record_materials order by 1")).toEqual([
    ["copper-annealed", "rec1", 1, 10],
    ["mat-x", "rec1", 3, 10],
  ]);
  expect(all("select day, bucket, requests from usage_day_latencies order by day")).toEqual([
    [day, 39, 3],
    [day + 1, 30, 5],
  ]);
  db.$client.prepare("delete from records where id = 'rec1'").run();
  expect(all("select * from record_materials")).toEqual([]);
});

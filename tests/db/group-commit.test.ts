import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type Database, migrateDatabase, openDatabase } from "@/db/client";
import { GroupCommit } from "@/db/group-commit";
import { insertTeam, listTeams } from "@/db/queries/teams";

let folder: string;
let db: Database;
let commits: GroupCommit;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "rhoform-group-"));
  db = openDatabase(join(folder, "rhoform.sqlite"));
  migrateDatabase(db);
  commits = GroupCommit.of(db);
});
afterEach(() => {
  db.$client.close();
  rmSync(folder, { recursive: true, force: true });
});

const team = (slug: string) => ({ id: `team_${slug}`, slug, name: slug, createdAt: 1 });
const slugs = (of: Database) => listTeams(of).map(({ slug }) => slug);

describe("writes of calls that end together", () => {
  test("are one transaction, seen by others when the callers are told", async () => {
    const other = openDatabase(join(folder, "rhoform.sqlite"));
    const seen: number[] = [];
    await Promise.all(
      ["a", "b", "c"].map(async (slug) => {
        await commits.run(() => insertTeam(db, team(slug)));
        seen.push(slugs(other).length);
      }),
    );
    other.$client.close();
    expect(seen).toEqual([3, 3, 3]);
  });

  test("one that fails takes back its own only", async () => {
    const results = await Promise.allSettled([
      commits.run(() => insertTeam(db, team("a"))),
      commits.run(() => {
        insertTeam(db, team("b"));
        throw new Error("no");
      }),
      commits.run(() => insertTeam(db, team("a"))),
      commits.run(() => {
        insertTeam(db, team("c"));
        return 5;
      }),
    ]);
    expect(results.map(({ status }) => status)).toEqual(["fulfilled", "rejected", "rejected", "fulfilled"]);
    expect(results[3]).toMatchObject({ value: 5 });
    expect(slugs(db)).toEqual(["a", "c"]);
  });

  test("all fail where the lock is not to be had, and the next group goes on", async () => {
    const other = openDatabase(join(folder, "rhoform.sqlite"));
    db.$client.pragma("busy_timeout = 10");
    other.$client.exec("begin immediate");
    const refused = await Promise.allSettled(
      ["a", "b"].map((slug) => commits.run(() => insertTeam(db, team(slug)))),
    );
    expect(refused.map(({ status }) => status)).toEqual(["rejected", "rejected"]);
    other.$client.exec("rollback");
    other.$client.close();
    await commits.run(() => insertTeam(db, team("c")));
    expect(slugs(db)).toEqual(["c"]);
  });
});

import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, test } from "vitest";
import { migrateDatabase, openDatabase } from "@/db/client";
import { insertTeam } from "@/db/queries/teams";
import { peopleCommand } from "@/lib/cli/people-command";
import { readConfig } from "@/lib/config/environment";
import { openService } from "@/lib/service/service";

const folder = mkdtempSync(join(tmpdir(), "rhoform-people-"));
const db = openDatabase(join(folder, "rhoform.sqlite"));
migrateDatabase(db);
insertTeam(db, { id: "team_1", slug: "busbar", name: "Busbar", createdAt: 1 });
db.$client.close();
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const people = (...args: string[]) =>
  peopleCommand(args, () => openService(readConfig({ RHOFORM_DATA: folder, RHOFORM_LOG: "off" })));

test("an administrator needs no team, anybody else does, and is told so", () => {
  expect(people("add-admin", "ines.harrow@merrow-pike.example")).toMatchObject({
    code: 0,
    stdout: expect.stringMatching(/^http\S+\/invitation\/\S+$/),
  });
  const refused = {
    code: 1,
    stdout: "",
    stderr:
      "A developer belongs to at least one team. (must name at least one team: only an admin may be without.)",
  };
  const tomas = "tomas.vell@merrow-pike.example";
  expect(people("add", tomas, "--role", "developer")).toEqual(refused);
  expect(people("add", tomas, "--role", "developer", "--teams", "busbar")).toMatchObject({ code: 0 });
  expect(people("change", tomas, "--teams", "")).toEqual(refused);
  expect(people("list").stdout).toMatch(/tomas\.vell@merrow-pike\.example +developer +invited .*busbar/);
});

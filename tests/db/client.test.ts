import { mkdtempSync, rmSync, statSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, it } from "vitest";
import { openDatabase } from "@/db/client";

it("a new database and its folder are for the account that runs the service alone", () => {
  const parent = mkdtempSync(join(tmpdir(), "rhoform-modes-"));
  const file = join(parent, "data", "rhoform.sqlite");
  const db = openDatabase(file);
  db.$client.exec("create table t (x)");
  const modes = [join(parent, "data"), file, `${file}-wal`].map((path) => statSync(path).mode & 0o777);
  expect(modes).toEqual([0o700, 0o600, 0o600]);
  db.$client.close();
  rmSync(parent, { recursive: true });
});

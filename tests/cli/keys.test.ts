import { spawn, spawnSync } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { migrateDatabase, openDatabase } from "@/db/client";
import { activityOfSubject } from "@/db/queries/activity";
import { insertTeam } from "@/db/queries/teams";
import { keysCommand } from "@/lib/cli/keys-command";
import { readConfig } from "@/lib/config/environment";
import { openService } from "@/lib/service/service";

const folder = mkdtempSync(join(tmpdir(), "rhoform-keys-"));
const env = { ...process.env, RHOFORM_DATA: folder, RHOFORM_LOG: "off", PORT: "0" };

function keys(...args: string[]) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ["--import", "tsx", "lib/cli/keys.ts", ...args],
    {
      env,
      encoding: "utf8",
    },
  );
  return { status, stdout, stderr };
}

/** The same command inside this process, while the server runs in another: as true, and it starts at once. */
const here = (...args: string[]) =>
  keysCommand(args, () => openService(readConfig({ RHOFORM_DATA: folder, RHOFORM_LOG: "off" })));

let base: string;
let server: ReturnType<typeof spawn>;
beforeAll(async () => {
  const db = openDatabase(join(folder, "rhoform.sqlite"));
  migrateDatabase(db);
  insertTeam(db, { id: "team_1", slug: "busbar", name: "Busbar", createdAt: 1 });
  db.$client.close();
  server = spawn(process.execPath, ["--import", "tsx", "lib/cli/api-process.ts"], {
    env,
    stdio: ["ignore", "pipe", "inherit"],
  });
  base = await new Promise<string>((resolve, reject) => {
    server.once("exit", (code) => reject(new Error(`The API process ended with ${code}.`)));
    server.stdout?.on("data", (data) => {
      const found = /http:\/\/[\d.]+:\d+/.exec(String(data));
      if (found) resolve(found[0]);
    });
  });
}, 60_000);
afterAll(async () => {
  const ended = new Promise((resolve) => server.once("exit", resolve));
  server.kill("SIGTERM");
  expect(await ended).toBe(0);
  rmSync(folder, { recursive: true, force: true });
});

const status = async (key: string) => {
  const response = await fetch(`${base}/api/v1/usage`, { headers: { Authorization: `Bearer ${key}` } });
  return response.status;
};

describe("npm run -s keys", () => {
  test("issue prints the new key and nothing else, and it works while the server runs", async () => {
    const {
      status: code,
      stdout,
      stderr,
    } = keys(
      "issue",
      ...["--team", "busbar", "--name", "CAD scripts", "--scopes", "compute,field,materials:read"],
      ...["--minute", "50", "--month", "1000", "--expires", "2099-01-01T00:00:00Z"],
      ...["--origins", "https://a.merrow-pike.example,https://b.merrow-pike.example"],
    );
    expect([code, stderr]).toEqual([0, ""]);
    expect(stdout).toMatch(/^rho_k[0-9A-Za-z]{15}_[0-9A-Za-z]{43}\n$/);
    const key = stdout.trim();
    const response = await fetch(`${base}/api/v1/usage`, { headers: { Authorization: `Bearer ${key}` } });
    expect(response.status).toBe(200);
    expect(response.headers.get("ratelimit-policy")).toBe('"minute";q=50;w=60, "month";q=1000');
    const body = (await response.json()) as { scopes: string[] };
    expect(body.scopes).toEqual(["compute", "field", "materials:read"]);
  });

  test("list, rotate with overlap and revoke, each seen by the next request", async () => {
    const first = here("issue", "--team", "busbar", "--name", "Rotating", "--scopes", "compute").stdout;
    const id = first.split("_")[1];
    const list = here("list", "--team", "busbar").stdout;
    expect(list).toMatch(new RegExp(`^${id} +busbar +active +Rotating`, "m"));
    expect(list).not.toContain(first.slice(-43));
    const rotated = here("rotate", id, "--overlap", "7d");
    expect(rotated.stdout).toMatch(new RegExp(`^rho_${id}_[0-9A-Za-z]{43}$`));
    const second = rotated.stdout;
    expect([await status(first), await status(second)]).toEqual([200, 200]);
    const third = here("rotate", id).stdout;
    expect([await status(first), await status(second), await status(third)]).toEqual([401, 401, 200]);
    expect(here("revoke", id).code).toBe(0);
    expect(await status(third)).toBe(401);
    const db = openDatabase(join(folder, "rhoform.sqlite"));
    const acts = activityOfSubject(db, id);
    db.$client.close();
    expect(acts.map(({ action, actorKind }) => [action, actorKind])).toEqual([
      ["key.revoke", "shell"],
      ["key.rotate", "shell"],
      ["key.rotate", "shell"],
      ["key.issue", "shell"],
    ]);
  });

  test.each([
    [["issue", "--team", "nobody", "--name", "x", "--scopes", "compute"], /no team "nobody".*busbar/],
    [["issue", "--team", "busbar", "--name", "x", "--scopes", "compute,all"], /scopes/],
    [["issue", "--team", "busbar", "--name", "x"], /--scopes/],
    [["issue", "--team", "busbar", "--name", "x", "--scopes", "compute", "--minute", "many"], /--minute/],
    [["issue", "--team", "busbar", "--name", "x", "--scopes", "compute", "--expires", "soon"], /expiresAt/],
    [
      [
        "issue",
        "--team",
        "busbar",
        "--name",
        "x",
        "--scopes",
        "compute",
        "--expires",
        "2001-01-01T00:00:00Z",
      ],
      /before it is issued.*lie in the future/,
    ],
    [["issue", "--team", "busbar", "--name", "x", "--scopes", "compute", "--colour", "red"], /colour/],
    [["revoke", "k0"], /no such key/],
    [["revoke"], /takes the id/],
    [["rotate", "k0", "--overlap", "forever"], /--overlap/],
    [["paint"], /Usage/],
  ])("%j is refused with one message, nothing on stdout", (args, message) => {
    const result = here(...args);
    expect([result.code, result.stdout]).toEqual([1, ""]);
    expect(result.stderr).toMatch(message);
  });
});

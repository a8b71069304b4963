import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { request } from "node:http";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, expect, test } from "vitest";
import { openDatabase } from "@/db/client";
import { keysCommand } from "@/lib/cli/keys-command";
import { teamsCommand } from "@/lib/cli/teams-command";
import { readConfig } from "@/lib/config/environment";
import { openService } from "@/lib/service/service";
import { SLEEVE } from "../support/call";

let folder: string;
let child: ChildProcess;
let base: string;
let exit: Promise<number | null>;
const open = () => openService(readConfig({ RHOFORM_DATA: folder, RHOFORM_LOG: "off" }));
beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), "rhoform-process-"));
  child = spawn(process.execPath, ["--import", "tsx", "lib/cli/api-process.ts"], {
    env: { ...process.env, RHOFORM_DATA: folder, RHOFORM_LOG: "off", PORT: "0" },
    stdio: ["ignore", "pipe", "inherit"],
  });
  exit = new Promise((resolve) => child.once("exit", resolve));
  base = await new Promise<string>((resolve) => {
    child.stdout?.on("data", (data) => {
      const found = /http:\/\/[\d.]+:\d+/.exec(String(data));
      if (found) resolve(found[0]);
    });
  });
}, 60_000);
afterEach(async () => {
  child.kill("SIGKILL");
  await exit;
  rmSync(folder, { recursive: true, force: true });
});

function newKey(): string {
  expect(teamsCommand(["add", "busbar", "--name", "Busbar"], open)).toMatchObject({
    code: 0,
    stdout: "busbar",
  });
  const { stdout } = keysCommand(["issue", "--team", "busbar", "--name", "x", "--scopes", "compute"], open);
  return stdout;
}

const compute = (key: string) =>
  fetch(`${base}/api/v1/resistance`, {
    method: "POST",
    headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/json" },
    body: JSON.stringify(SLEEVE),
  });

test("what was answered is counted, exactly once, also if the process is killed right after", async () => {
  const key = newKey();
  const answers = await Promise.all(Array.from({ length: 25 }, () => compute(key)));
  child.kill("SIGKILL");
  await exit;
  expect(answers.every(({ status }) => status === 200)).toBe(true);
  const db = openDatabase(join(folder, "rhoform.sqlite"));
  const one = (sql: string) => db.$client.prepare(sql).pluck().get();
  expect(one("select count(*) from usage_events")).toBe(25);
  for (const table of ["hours", "days", "day_details", "hour_latencies"]) {
    expect(one(`select sum(requests) from usage_${table}`)).toBe(25);
  }
  expect(one("select points from rate_limits where key like 'month:%'")).toBe(25);
  db.$client.close();
});

test("the base path alone and TRACE are refused with problem details", async () => {
  const bare = await fetch(`${base}/api/v1`);
  expect(bare.status).toBe(404);
  expect(bare.headers.get("content-type")).toMatch(/^application\/problem\+json/);
  const { method, status, type, allow } = await new Promise<Record<string, unknown>>((resolve, reject) => {
    const asked = request(`${base}/api/v1/resistance`, { method: "TRACE" }, (answer) => {
      const { "content-type": own, allow: methods } = answer.headers;
      answer.resume();
      resolve({ method: asked.method, status: answer.statusCode, type: own, allow: methods });
    });
    asked.once("error", reject).end();
  });
  expect([method, status]).toEqual(["TRACE", 405]);
  expect(type).toMatch(/^application\/problem\+json/);
  expect(allow).toMatch(/POST/);
});

test("SIGTERM ends it with 0 and leaves one database file", async () => {
  expect((await compute(newKey())).status).toBe(200);
  child.kill("SIGTERM");
  expect(await exit).toBe(0);
});

test("ends when the npm that started it is stopped", async () => {
  const npm = spawn("npm", ["run", "api"], {
    env: { ...process.env, RHOFORM_DATA: folder, RHOFORM_LOG: "off", PORT: "0" },
    stdio: ["ignore", "pipe", "inherit"],
  });
  const address = await new Promise<string>((resolve) => {
    let printed = "";
    npm.stdout.on("data", (data) => {
      const found = /http:\/\/[\d.]+:\d+/.exec((printed += String(data)));
      if (found) resolve(found[0]);
    });
  });
  const state = () =>
    fetch(`${address}/api/v1/health`).then(
      () => "answers",
      () => "gone",
    );
  expect(await state()).toBe("answers");
  npm.kill("SIGTERM");
  await expect.poll(state, { timeout: 30_000 }).toBe("gone");
});

test("a team is made once, with a short name", () => {
  newKey();
  for (const argv of [
    ["add", "busbar", "--name", "x"],
    ["add", "Bus Bar", "--name", "x"],
    ["add", "film"],
    ["paint"],
  ]) {
    const { code, stdout, stderr } = teamsCommand(argv, open);
    expect([code, stdout]).toEqual([1, ""]);
    expect(stderr).not.toBe("");
  }
  expect(teamsCommand(["list"], open).stdout).toBe("busbar  Busbar");
});

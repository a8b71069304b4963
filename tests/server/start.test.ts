import { execFileSync, spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { request } from "node:http";
import { tmpdir } from "node:os";
import { join } from "node:path";
import Sqlite from "better-sqlite3";
import { describe, expect, it } from "vitest";
import { type StartedService, startService } from "../support/start-server";

const BODY = JSON.stringify({
  shape: "bar",
  dimensions: { length: "1 m", width: "10 mm", thickness: "1 mm" },
  medium: { resistivity: "1.72e-8 ohm m" },
});

function keyIn(output: string): string | undefined {
  return /^Demo key: (rho_\S+)$/m.exec(output)?.[1];
}

/** A call whose body is finished only when told. */
function halfSent(service: StartedService, key: string) {
  const url = new URL("/api/v1/resistance", service.base);
  const call = request(url, {
    method: "POST",
    headers: {
      Authorization: `Bearer ${key}`,
      "Content-Type": "application/json",
      "Content-Length": Buffer.byteLength(BODY),
    },
  });
  const answer = new Promise<{ status: number | undefined; body: string }>((resolve, reject) => {
    call.once("error", reject);
    call.once("response", (response) => {
      let body = "";
      response.on("data", (chunk: Buffer) => (body += chunk.toString()));
      response.once("end", () => resolve({ status: response.statusCode, body }));
    });
  });
  call.write(BODY.slice(0, 10));
  return { answer, finish: () => call.end(BODY.slice(10)) };
}

describe("npm start", () => {
  it("prints an address, the demo key and one call that works; again the next time", async () => {
    const folder = mkdtempSync(join(tmpdir(), "rhoform-start-"));
    const first = await startService({ RHOFORM_DATA: folder, RHOFORM_DEMO: "1" });
    const output = first.output();
    expect(output).toContain(`Rhoform answers at ${first.base}\n`);
    expect(output.match(/curl/g)).toHaveLength(1);
    const [, email, password] = /^Demo sign-in: (\S+\.example)\n +password: (\S+)$/m.exec(output) ?? [];
    const signIn = await fetch(`${first.base}/api/auth/sign-in`, {
      method: "POST",
      headers: { Origin: first.base, "Content-Type": "application/json" },
      body: JSON.stringify({ email, password }),
    });
    expect(signIn.status).toBe(200);
    const command = output.split("\n").find((line) => line.startsWith("curl ")) ?? "";
    const answer: unknown = JSON.parse(execFileSync("sh", ["-c", command], { encoding: "utf8" }));
    // R = ln(5/2)/(2π·1e-12·1) = 145.83 GΩ (closed form, by hand).
    expect(answer).toMatchObject({ resistance: { text: "145.83\u2009GΩ", proved: true } });

    first.process.kill("SIGTERM");
    await new Promise((resolve) => first.process.once("exit", resolve));
    const second = await startService({ RHOFORM_DATA: folder, RHOFORM_DEMO: "1" });
    expect(keyIn(output)).toBeDefined();
    expect(keyIn(second.output())).toBe(keyIn(output));
    expect(await second.stop()).toBe(0);
  });

  it("starts without the demo", async () => {
    const service = await startService({ RHOFORM_DEMO: "0" });
    expect(service.output()).not.toContain("rho_");
    expect(service.output()).not.toContain("curl");
    expect(service.output()).toContain("npm run -s people -- add-admin");
    expect(await service.stop()).toBe(0);
  });

  it("refuses wrong settings with a sentence", async () => {
    const error: unknown = await startService({ RHOFORM_SECRET: "short" }).then(
      async (service) => service.stop(),
      (reason: unknown) => reason,
    );
    expect(String(error)).toContain("RHOFORM_SECRET: must have at least 16 characters");
    expect(String(error)).not.toContain("    at ");
  });

  it("says who has the port", async () => {
    const { RHOFORM_TEST_BASE = "" } = process.env;
    const error: unknown = await startService({ PORT: new URL(RHOFORM_TEST_BASE).port }).then(
      async (service) => service.stop(),
      (reason: unknown) => reason,
    );
    expect(String(error)).toContain("is taken by another program");
  });
});

describe("SIGTERM", () => {
  it("finishes the running call, closes the database and exits with 0", async () => {
    const folder = mkdtempSync(join(tmpdir(), "rhoform-start-"));
    const service = await startService({ RHOFORM_DATA: folder, RHOFORM_DEMO: "1" });
    const call = halfSent(service, keyIn(service.output()) ?? "");
    await new Promise((resolve) => setTimeout(resolve, 300));
    const exit = new Promise((resolve) => service.process.once("exit", resolve));
    service.process.kill("SIGTERM");
    await new Promise((resolve) => setTimeout(resolve, 300));
    // No new connections any more.
    await expect(fetch(`${service.base}/api/v1/health`)).rejects.toThrow();
    call.finish();
    const { status, body } = await call.answer;
    expect(status).toBe(200);
    expect(JSON.parse(body)).toMatchObject({ shape: "bar" });
    expect(await exit).toBe(0);
    // The write-ahead log is folded into the file when the last connection closes.
    expect(existsSync(join(folder, "rhoform.sqlite-wal"))).toBe(false);
    rmSync(folder, { recursive: true });
  });
});

describe("a signal to npm", () => {
  it("stops the service too", async () => {
    const folder = mkdtempSync(join(tmpdir(), "rhoform-start-"));
    const service = await startService({ RHOFORM_DATA: folder }, { command: ["npm", "start"] });
    service.process.kill("SIGTERM");
    await expect
      .poll(
        () =>
          fetch(`${service.base}/api/v1/health`).then(
            () => "answers",
            () => "gone",
          ),
        { timeout: 20_000 },
      )
      .toBe("gone");
    await expect.poll(() => existsSync(join(folder, "rhoform.sqlite-wal")), { timeout: 20_000 }).toBe(false);
    rmSync(folder, { recursive: true });
  });
});

describe("npm run backup", () => {
  it("copies a running service consistently", async () => {
    const { RHOFORM_TEST_DATA = "" } = process.env;
    const target = join(mkdtempSync(join(tmpdir(), "rhoform-backup-")), "copy");
    const { status, stdout } = spawnSync("node_modules/.bin/tsx", ["lib/cli/backup.ts", target], {
      encoding: "utf8",
      env: { ...process.env, RHOFORM_DATA: RHOFORM_TEST_DATA },
    });
    expect(status).toBe(0);
    expect(stdout).toContain(target);
    const copy = new Sqlite(join(target, "rhoform.sqlite"), { readonly: true });
    expect(copy.pragma("integrity_check", { simple: true })).toBe("ok");
    copy.close();
    expect(readFileSync(join(target, "secret"), "utf8")).toBe(
      readFileSync(join(RHOFORM_TEST_DATA, "secret"), "utf8"),
    );
    rmSync(target, { recursive: true });
  });
});

import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { readConfig } from "@/lib/config/environment";
import { fieldCost } from "@/lib/jobs/field-cost";
import { closeService, openService } from "@/lib/service/service";
import { call } from "../support/call";
import { BEND, finished, hardPlate, STRIP, until } from "../support/field";
import { issuer, type TestServer } from "../support/server";
import { freePort } from "../support/start-server";

/** One thread, so that an order shows, and little time. */
const NARROW = { RHOFORM_WORKERS: "1", RHOFORM_FIELD_SECONDS: "20" };

describe("another process on the same data", { timeout: 150_000 }, () => {
  const folder = mkdtempSync(join(tmpdir(), "rhoform-jobs-"));
  const processes: ChildProcess[] = [];
  afterAll(() => {
    for (const process of processes) if (process.exitCode === null) process.kill("SIGKILL");
    rmSync(folder, { recursive: true, force: true });
  });

  /** The API as `npm run api` starts it. */
  async function startProcess(): Promise<{ child: ChildProcess; server: TestServer }> {
    const port = await freePort();
    // One process, so that a signal reaches the service itself.
    const child = spawn(process.execPath, ["--import", "tsx", "lib/cli/api-process.ts"], {
      env: {
        ...process.env,
        ...NARROW,
        PORT: String(port),
        RHOFORM_DATA: folder,
      },
      stdio: ["ignore", "pipe", "inherit"],
    });
    processes.push(child);
    await new Promise<void>((resolve, reject) => {
      child.stdout?.on("data", (chunk: Buffer) => {
        if (chunk.toString().includes("answers at")) resolve();
      });
      child.once("exit", () => reject(new Error("The process ended while starting.")));
    });
    const base = `http://127.0.0.1:${port}`;
    return { child, server: { base } as TestServer };
  }
  const ended = (child: ChildProcess) =>
    new Promise<number | null>((resolve) =>
      child.exitCode === null && child.signalCode === null
        ? child.once("exit", resolve)
        : resolve(child.exitCode),
    );

  function issue(): string {
    const service = openService(readConfig({ RHOFORM_DATA: folder, RHOFORM_LOG: "off" }));
    const { key } = issuer(service)({ team: "thin-film" });
    closeService(service);
    return key;
  }

  test("kill -9: what waited and what ran is finished by the next one", async () => {
    const key = issue();
    const first = await startProcess();
    const start = async (body: object) =>
      (await call(first.server, "post", "/fields", { key, body })).body.id as string;
    const running = await start({ ...hardPlate(4), accuracy: 1e-6 });
    const waiting = [await start(BEND), await start({ ...STRIP, record: { label: "After the crash" } })];
    await until(
      async () => (await call(first.server, "get", `/fields/${running}`, { key })).body.status === "running",
    );
    first.child.kill("SIGKILL");
    await ended(first.child);
    const second = await startProcess();
    let cost = 0;
    for (const id of [running, ...waiting]) {
      const { body } = await finished(second.server, key, id);
      expect(body).toMatchObject({ id, status: "done" });
      cost += fieldCost(body.result.mesh.unknowns);
    }
    const last = (await call(second.server, "get", `/fields/${waiting[1]}`, { key })).body;
    expect((await call(second.server, "get", `/records/${last.record.id}`, { key })).body.label).toBe(
      "After the crash",
    );
    // What was reserved beyond that, before the crash, was given back after it.
    const { month } = (await call(second.server, "get", "/usage", { key })).body;
    expect(month.quota - month.remaining).toBe(cost);
    second.child.kill("SIGTERM");
    expect(await ended(second.child)).toBe(0);
  });

  test("SIGTERM: open streams and waits end, unfinished ones are handed back at once", async () => {
    const key = issue();
    const first = await startProcess();
    const { body } = await call(first.server, "post", "/fields", { key, body: hardPlate() });
    const events = fetch(`${first.server.base}/api/v1/fields/${body.id}/events`, {
      headers: { Authorization: `Bearer ${key}` },
    }).then((response) => response.text());
    const waiting = call(first.server, "post", "/fields", {
      key,
      body: BEND,
      headers: { Prefer: "wait=30" },
    });
    await new Promise((resolve) => setTimeout(resolve, 1000));
    const asked = Date.now();
    first.child.kill("SIGTERM");
    expect(await events).toContain("event: progress");
    const waited = await waiting;
    expect(waited.status).toBe(202);
    expect(await ended(first.child)).toBe(0);
    expect(Date.now() - asked).toBeLessThan(8000);
    const second = await startProcess();
    const began = Date.now();
    expect((await finished(second.server, key, waited.body.id)).body.status).toBe("done");
    expect(Date.now() - began).toBeLessThan(15_000);
    expect((await call(second.server, "delete", `/fields/${body.id}`, { key })).status).toBe(204);
    second.child.kill("SIGTERM");
    expect(await ended(second.child)).toBe(0);
  });
});

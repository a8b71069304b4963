import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { readConfig } from "@/lib/config/environment";
import { fieldCost, MOST_COMPUTATIONS } from "@/lib/jobs/field-cost";
import { closeService, openService } from "@/lib/service/service";
import { call, expectProblem } from "../support/call";
import { BEND, finished, hardPlate, solve, STRIP, until } from "../support/field";
import { issuer, startServer, type TestServer } from "../support/server";
import { freePort } from "../support/start-server";

/** One thread, so that an order shows, and little time. */
const NARROW = { RHOFORM_WORKERS: "1", RHOFORM_FIELD_SECONDS: "2" };

describe("the queue", () => {
  let server: TestServer;
  let key: string;
  beforeAll(async () => {
    server = await startServer(NARROW);
    ({ key } = server.issue({ team: "thin-film" }));
    await solve(server, key, STRIP);
  });
  afterAll(() => server.stop());

  const start = async (body: object) =>
    (await call(server, "post", "/fields", { key, body })).body.id as string;

  test("limited by time: the bracket reached stands, and it says which cap it was", async () => {
    const { body } = await solve(server, key, hardPlate());
    expect(body.status).toBe("limited");
    const { resistance, limit, seconds } = body.result;
    expect(limit).toBe("the time it may take");
    expect(seconds).toBeLessThan(8);
    expect(resistance.upper).toBeGreaterThan(resistance.lower);
    expect(resistance.upper / resistance.lower - 1).toBeGreaterThan(1e-8);
    expect((await call(server, "get", `/fields/${body.id}/plot.svg`, { key })).status).toBe(200);
  });

  test("small ones first", async () => {
    const running = await start(hardPlate());
    const large = await start({ ...hardPlate(4), accuracy: 1e-6 });
    const small = await start(STRIP);
    const ends = await Promise.all([large, small].map((id) => finished(server, key, id)));
    const [late, early] = ends.map(({ body }) => Date.parse(body.finishedAt));
    expect(early).toBeLessThan(late);
    await finished(server, key, running);
  });

  test("one that waits is cancelled without having run", async () => {
    const running = await start(hardPlate());
    const waiting = await start(BEND);
    expect((await call(server, "delete", `/fields/${waiting}`, { key })).status).toBe(204);
    expect((await call(server, "get", `/fields/${waiting}`, { key })).body.status).toBe("cancelled");
    await call(server, "delete", `/fields/${running}`, { key });
    await solve(server, key, STRIP);
    expect((await call(server, "get", `/fields/${waiting}`, { key })).body.status).toBe("cancelled");
  });

  test("one that was cancelled or deleted leaves no file", async () => {
    const folder = join(server.service.config.dataFolder, "fields");
    const files = () => readdirSync(folder).sort();
    const before = files();
    const running = await start({ ...hardPlate(3), accuracy: 1e-6 });
    await until(
      async () => (await call(server, "get", `/fields/${running}`, { key })).body.status === "running",
    );
    await call(server, "delete", `/fields/${running}`, { key });
    const { body } = await solve(server, key, STRIP);
    expect(files()).toEqual([...before, `${body.id}.map`].sort());
    await call(server, "delete", `/fields/${body.id}`, { key });
    expect(files()).toEqual(before);
  });

  test("quota: the most is reserved, the rest given back at the end", async () => {
    const { key: own, id } = server.issue({ quotas: { minute: 1000, month: 2 * MOST_COMPUTATIONS } });
    const usage = async () => (await call(server, "get", "/usage", { key: own })).body;
    const first = await call(server, "post", "/fields", { key: own, body: hardPlate() });
    expect(first.headers.ratelimit).toContain(`"month";r=${MOST_COMPUTATIONS}`);
    expect((await usage()).month.remaining).toBe(MOST_COMPUTATIONS);
    await call(server, "post", "/fields", { key: own, body: BEND });
    const third = await call(server, "post", "/fields", { key: own, body: BEND });
    expectProblem(third, 429, "quota-exhausted");
    expect(third.body.detail).toContain(`needs ${MOST_COMPUTATIONS} computations; none of this month's`);
    expect((await usage()).month.remaining).toBe(0);
    await call(server, "delete", `/fields/${first.body.id}`, { key: own });
    expect((await usage()).month.remaining).toBe(MOST_COMPUTATIONS);
    await until(async () => (await usage()).month.remaining === 2 * MOST_COMPUTATIONS - 1);
    expect((await usage()).byDay[0]).toMatchObject({ computations: 1, refused: 1 });
    const details = server.service.db.$client
      .prepare("select sum(computations) from usage_days where key_id = ?")
      .pluck()
      .get(id);
    expect(details).toBe(1);
  });

  test("a refused request costs nothing", async () => {
    const { key: own } = server.issue({ quotas: { minute: 1000, month: MOST_COMPUTATIONS } });
    for (let k = 0; k < 3; k++) {
      const response = await call(server, "post", "/fields", { key: own, body: { ...BEND, terminals: [] } });
      expect(response.status).toBe(422);
    }
    await solve(server, own, STRIP);
  });
});

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
        RHOFORM_FIELD_SECONDS: "20",
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

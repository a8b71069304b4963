import { readdirSync } from "node:fs";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { MOST_COMPUTATIONS } from "@/lib/jobs/field-cost";
import { call, expectProblem } from "../support/call";
import { BEND, finished, hardPlate, solve, STRIP, until } from "../support/field";
import { startServer, type TestServer } from "../support/server";

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

import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem, places } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue().key;
});
afterAll(() => server.stop());

const post = (body: unknown, headers: Record<string, string> = {}, as = key) =>
  call(server, "post", "/networks", { key: as, body, headers });
const plain = (name: string, from: string, to: string, resistance: unknown = 1) => ({
  name,
  between: [from, to],
  resistance,
});
const bar = {
  shape: "bar",
  dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },
  medium: { material: "copper-annealed" },
};
const riser = {
  elements: [
    plain("bar A", "in", "joint", "42 uohm"),
    { name: "bar B", between: ["in", "joint"], request: bar },
    plain("braid", "joint", "out", "18 uohm"),
  ],
  ports: ["in", "out"],
  operating: { current: "630 A" },
};

describe("POST /networks 200", () => {
  test("resistance, nodes, elements and checks", async () => {
    const { status, body } = await post(riser);
    expect(status).toBe(200);
    const single = await call(server, "post", "/resistance", { key, body: bar });
    const b = single.body.resistance.value;
    const exact = (42e-6 * b) / (42e-6 + b) + 18e-6;
    expect(body.resistance.value / exact).toBeCloseTo(1, 13);
    expect(body.nodes.map(({ name }: { name: string }) => name)).toEqual(["in", "joint", "out"]);
    expect(body.elements[2]).toMatchObject({ name: "braid", resistance: 18e-6 });
    expect(body.elements[2].sensitivity).toBeCloseTo(1, 14);
    expect(body.elements[2].current).toBeCloseTo(630, 9);
    expect(body.checks.map(({ passed }: { passed: boolean }) => passed)).toEqual([true, true, true]);
    expect(body.materials).toHaveLength(1);
  });

  test("a record is stored once, and its replay is the same to the last bit", async () => {
    const body = { ...riser, record: { label: "Riser path" } };
    const first = await post(body, { "Idempotency-Key": "path" });
    const again = await post(body, { "Idempotency-Key": "path" });
    expect(again.body.record).toEqual(first.body.record);
    const { id } = first.body.record;
    expect(first.headers.location).toBe(`/api/v1/records/${id}`);
    const record = await call(server, "get", `/records/${id}`, { key });
    expect(record.body).toMatchObject({ operation: "network", label: "Riser path", request: riser });
    const replay = await call(server, "post", `/records/${id}/replay`, { key });
    expect(replay.status).toBe(200);
    expect(replay.body).toMatchObject({ drift: 0, identical: true });
    expect(replay.body.now.elements).toEqual(first.body.elements);
  });

  test("costs one computation, or one for each request in it", async () => {
    const { key: own } = server.issue({ quotas: { minute: 100, month: 10 } });
    const left = async () => (await call(server, "get", "/usage", { key: own })).body.month.remaining;
    await post({ elements: [plain("a", "x", "y"), plain("b", "x", "y")], ports: ["x", "y"] }, {}, own);
    expect(await left()).toBe(9);
    const bars = ["1", "2", "3"].map((name) => ({ name, between: ["in", "joint"], request: bar }));
    await post({ elements: bars, ports: ["in", "joint"] }, {}, own);
    expect(await left()).toBe(6);
    await post({ elements: [...bars, plain("1", "x", "y")], ports: ["in", "joint"] }, {}, own);
    expect(await left()).toBe(6);
  });

  test("a grid of 10,000 elements", async () => {
    const size = 71;
    const elements = [];
    for (let i = 0; i < size; i++) {
      for (let j = 0; j < size; j++) {
        if (i + 1 < size) elements.push(plain(`right ${i} ${j}`, `${i},${j}`, `${i + 1},${j}`));
        if (j + 1 < size) elements.push(plain(`up ${i} ${j}`, `${i},${j}`, `${i},${j + 1}`));
      }
    }
    while (elements.length < 10_000) elements.push(plain(`more ${elements.length}`, "0,0", "0,1", "3 ohm"));
    const { status, body } = await post({ elements, ports: ["0,0", "70,70"] });
    expect(status).toBe(200);
    expect(body.elements).toHaveLength(10_000);
    expect(body.resistance.upper / body.resistance.lower - 1).toBeLessThan(1e-10);
    const over = await post({ elements: [...elements, plain("one", "0,0", "1,1")], ports: ["0,0", "1,1"] });
    expectProblem(over, 413, "body-too-large");
    expect(over.body.detail).toContain("at most 10,000");
  });
});

describe("POST /networks refused", () => {
  test("422 with every place", async () => {
    const answer = await post({
      elements: [...riser.elements, plain("bar A", "x", "x"), plain("void", "in", "out", 0)],
      ports: ["in", "outt"],
    });
    expectProblem(answer, 422, "invalid-input");
    expect(places(answer)).toEqual([
      "#/elements/3/name",
      "#/elements/3/between",
      "#/ports/1",
      "#/elements/4/resistance",
    ]);
    expect(places(await post([]))).toEqual(["#"]);
    expect(places(await post({ elements: 5, ports: [] }))).toContain("#/elements");
  });

  test("401, 403, 429 and a record without a team", async () => {
    expectProblem(await call(server, "post", "/networks", { body: riser }), 401, "missing-credentials");
    const { key: reader } = server.issue({ scopes: ["records:read"] });
    expectProblem(await post(riser, {}, reader), 403, "insufficient-scope");
    const { key: empty } = server.issue({ quotas: { minute: 10, month: 0 } });
    expectProblem(await post(riser, {}, empty), 429, "quota-exhausted");
  });
});

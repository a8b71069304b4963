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

const bar = {
  shape: "bar",
  dimensions: { length: "1 m", width: { value: "50 mm", tolerance: "1 %" }, thickness: "10 mm" },
  medium: { resistivity: 1.7e-8 },
  include: [],
} as const;
const compute = (over: object) => call(server, "post", "/resistance", { key, body: { ...bar, ...over } });

describe("POST /resistance with uncertainty", () => {
  test("200 propagation, with the members of the contract", async () => {
    const { status, body } = await compute({ uncertainty: { method: "propagation" } });
    expect(status).toBe(200);
    const { value } = body.resistance;
    expect(body.uncertainty).toMatchObject({ method: "propagation", coverage: 0.95 });
    // Uniform within ±1 %: u = 1 %/√3.
    expect(body.uncertainty.standard / value / (0.01 / Math.sqrt(3))).toBeCloseTo(1, 8);
    expect(body.uncertainty.contributions).toMatchObject([{ input: "dimensions.width", share: 1 }]);
    expect(body.uncertainty.contributions[0].sensitivity / (-value / 0.05)).toBeCloseTo(1, 8);
    expect(body.uncertainty.low).toBeLessThan(value);
    expect(body.uncertainty.high).toBeGreaterThan(value);
  });

  test("200 worst case is the box's own ends", async () => {
    const { body } = await compute({ uncertainty: { method: "worst-case" } });
    expect(body.uncertainty.low / body.resistance.value).toBeCloseTo(1 / 1.01, 12);
    expect(body.uncertainty.high / body.resistance.value).toBeCloseTo(1 / 0.99, 12);
  });

  test("200 Monte Carlo repeats for a seed and costs by its trials", async () => {
    const uncertainty = { method: "monte-carlo", trials: 150_000, seed: 5 };
    const left = async () => (await call(server, "get", "/usage", { key })).body.month.remaining as number;
    const before = await left();
    const first = await compute({ uncertainty });
    expect(before - (await left())).toBe(2);
    const second = await compute({ uncertainty });
    expect(second.body.uncertainty).toEqual(first.body.uncertainty);
    expect(first.body.uncertainty).toMatchObject({ trials: 150_000, seed: 5 });
  });

  test("200 stored, and replayed to the last bit", async () => {
    const uncertainty = { method: "monte-carlo", trials: 2000, seed: 11 };
    const { body } = await compute({ uncertainty, record: { label: "Busbar with tolerances" } });
    const replay = await call(server, "post", `/records/${body.record.id}/replay`, { key });
    expect(replay.body).toMatchObject({ identical: true, drift: 0 });
    expect(replay.body.now.uncertainty).toEqual(body.uncertainty);
  });

  test("200 without it the tolerance is taken and the nominal value answered", async () => {
    const { status, body } = await compute({});
    expect(status).toBe(200);
    expect(body).not.toHaveProperty("uncertainty");
    expect(body.assumptions.join()).toMatch(/tolerances/);
  });

  test.each<[string, object, string[]]>([
    ["a method that there is not", { uncertainty: { method: "guess" } }, ["#/uncertainty/method"]],
    [
      "too many trials",
      { uncertainty: { method: "monte-carlo", trials: 2_000_000 } },
      ["#/uncertainty/trials"],
    ],
    ["a seed for propagation", { uncertainty: { method: "propagation", seed: 1 } }, ["#/uncertainty/seed"]],
    [
      "a tolerance as large as the value",
      { dimensions: { ...bar.dimensions, width: { value: "1 mm", tolerance: "1 mm" } } },
      ["#/dimensions/width/tolerance"],
    ],
    [
      "several mistakes at once",
      {
        dimensions: {
          ...bar.dimensions,
          width: { value: "1 mm", tolerance: "-0.1 mm" },
          length: { value: "1 m", tolerance: "5 kg" },
        },
        operating: { temperature: { value: 20, tolerance: "1 %" } },
      },
      ["#/dimensions/width/tolerance", "#/dimensions/length/tolerance", "#/operating/temperature/tolerance"],
    ],
  ])("422 %s", async (_, over, pointers) => {
    const response = await compute(over);
    expectProblem(response, 422, "invalid-input");
    expect(places(response).sort()).toEqual([...pointers].sort());
  });
});

describe("GET /resistance/{shape} with tolerances", () => {
  const get = (query: string) => call(server, "get", `/resistance/bar?${query}`, { key });

  test("200 a tolerance behind the value", async () => {
    const width = encodeURIComponent("50mm±1%");
    const { status, body } = await get(
      `length=1m&width=${width}&thickness=10mm&resistivity=1.7e-8&uncertainty=worst-case`,
    );
    expect(status).toBe(200);
    expect(body.uncertainty.contributions[0]).toMatchObject({ input: "dimensions.width", share: 1 });
  });

  test("422 names the parameter", async () => {
    const rest = "length=1m&thickness=10mm&resistivity=1.7e-8";
    const wide = await get(`${rest}&width=${encodeURIComponent("50mm+/-60mm")}`);
    expectProblem(wide, 422, "invalid-input");
    expect(places(wide)).toEqual(["width"]);
    const method = await get(`${rest}&width=50mm&uncertainty=guess`);
    expect([method.status, places(method)]).toEqual([422, ["uncertainty"]]);
    const trials = await get(`${rest}&width=50mm&uncertainty=monte-carlo&trials=ten`);
    expect([trials.status, places(trials)]).toEqual([422, ["trials"]]);
    const lone = await get(`${rest}&width=50mm&seed=4`);
    expect([lone.status, places(lone)]).toEqual([422, ["uncertainty"]]);
  });
});

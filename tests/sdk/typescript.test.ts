import { afterEach, describe, expect, expectTypeOf, it } from "vitest";
import {
  computeAll,
  computeResistance,
  type FieldProgress,
  type DimensionsOf,
  readResistance,
  replayRecord,
  type ResistanceQuery,
  type ResistanceRequest,
  rhoform,
  runField,
} from "@/sdk/typescript/src/index";
import {
  type AnsweringService,
  answer,
  answeringService,
  type Handler,
  problem,
} from "./support/answering-service";

let running: AnsweringService | undefined;

afterEach(() => running?.stop());

async function service(handler: Handler) {
  running = await answeringService(handler);
  return { calls: running.calls, client: rhoform({ baseUrl: running.baseUrl, key: "rho_abc_secret" }) };
}

const request = (length: number): ResistanceRequest => ({
  shape: "bar",
  dimensions: { length, width: 1, thickness: 1 },
  medium: { resistivity: 1 },
});

describe("a batch", () => {
  it("is cut to the limits, keeps its order, and asks again for what there was no time for", async () => {
    const { calls, client } = await service((_request, response, call, body) => {
      const { items }: { items: { dimensions: { length: number } }[] } = JSON.parse(body);
      const answered = items.map(({ dimensions }, index) =>
        call === 2 && index >= 10
          ? { index, status: 503, problem: problem("not-computed", 503) }
          : { index, status: 200, result: { label: dimensions.length } },
      );
      answer(response, 200, { items: answered, counts: {} });
    });
    const seen: number[] = [];
    const items = await computeAll({
      client,
      requests: Array.from({ length: 1_200 }, (_, index) => request(index + 1)),
      onProgress: (answered) => seen.push(answered),
    });
    expect(items.map(({ index }) => index)).toEqual(items.map((_item, index) => index));
    expect(items).toMatchObject(items.map((_item, index) => ({ status: 200, result: { label: index + 1 } })));
    expect(seen).toEqual([500, 1_000, 1_200]);
    expect(calls.map(({ body }) => JSON.parse(body).items.length)).toEqual([500, 500, 490, 200]);
  });

  it("gives up on items that no round computes", async () => {
    const { calls, client } = await service((_request, response) =>
      answer(response, 200, { items: [{ index: 0, status: 503, problem: problem("not-computed", 503) }] }),
    );
    expect(await computeAll({ client, requests: [request(1)] })).toMatchObject([{ index: 0, status: 503 }]);
    expect(calls).toHaveLength(1);
  });
});

describe("a field", () => {
  const field = (status: string, lower?: number) => ({
    id: "field_1",
    status,
    progress: lower === undefined ? null : { lower, upper: 2, unknowns: 10, refinements: 1 },
    result: null,
  });
  const body = { terminals: [], medium: { sheetResistance: 1 } };

  it("is asked after until it ends, and tells each new bracket, none before the first", async () => {
    const brackets = [undefined, undefined, 0.5, 0.5, 1];
    const { calls, client } = await service((request, response, call) =>
      answer(
        response,
        request.method === "POST" ? 202 : 200,
        field(call < 5 ? "running" : "done", brackets[call - 1]),
      ),
    );
    const told: [number, number, string][] = [];
    const onProgress = ({ lower, upper }: FieldProgress, { status }: { status: string }) =>
      told.push([lower, upper, status]);
    expect(await runField({ client, body, everyMs: 5, onProgress })).toMatchObject({ status: "done" });
    expect(told).toEqual([
      [0.5, 2, "running"],
      [1, 2, "done"],
    ]);
    expect(calls).toHaveLength(5);
  });

  it("is cancelled by an abort, which is thrown with its reason", async () => {
    const { calls, client } = await service((request, response) =>
      answer(response, request.method === "DELETE" ? 204 : 200, field("running", 1)),
    );
    const stop = new AbortController();
    const reason = new Error("changed my mind");
    const onProgress = () => stop.abort(reason);
    await expect(runField({ client, body, signal: stop.signal, onProgress })).rejects.toBe(reason);
    expect(calls.map(({ method }) => method)).toEqual(["POST", "GET", "DELETE"]);
  });
});

describe("a broken connection", () => {
  it("is tried again with the key of the first try, and never for a replay", async () => {
    const { calls, client } = await service((request, response, call) =>
      call === 2 ? answer(response, 200, {}) : request.socket.destroy(),
    );
    await computeResistance({ client, body: request(1) });
    const [first, second] = calls.map(({ headers }) => headers["idempotency-key"]);
    expect(first).toMatch(/^[a-z0-9-]{12,}$/);
    expect(second).toBe(first);
    await expect(replayRecord({ client, path: { id: "rec_1" } })).rejects.toThrow("could not be reached");
    expect(calls).toHaveLength(3);
  });
});

describe("an address", () => {
  it("carries the dimensions of its shape", async () => {
    const { calls, client } = await service((_request, response) => answer(response, 200, {}));
    await readResistance({
      client,
      path: { shape: "clad-wire" },
      query: {
        coreDiameter: "1 mm",
        claddingThickness: "0.1 mm",
        length: "1 m",
        "core.material": "steel-plain",
        "cladding.resistivity": 1.7e-8,
      },
    });
    const { pathname, searchParams } = new URL(calls[0].url, "http://localhost");
    expect(pathname).toBe("/api/v1/resistance/clad-wire");
    expect(searchParams.get("coreDiameter")).toBe("1 mm");
    expect(searchParams.get("cladding.resistivity")).toBe("1.7e-8");
  });
});

describe("types", () => {
  it("know each shape's dimensions", () => {
    expectTypeOf<keyof DimensionsOf<"bar">>().toEqualTypeOf<"length" | "width" | "thickness">();
    expectTypeOf<ResistanceQuery<"bar">>().toHaveProperty("width");
    // @ts-expect-error There is no such dimension.
    expectTypeOf<ResistanceQuery<"bar">>().toHaveProperty("widht");
    // @ts-expect-error A wrong name of a dimension does not compile.
    const wrong: ResistanceRequest = { ...request(1), dimensions: { length: 1, widht: 1, thickness: 1 } };
    expect(wrong).toBeDefined();
  });
});

import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { catalogue, shapeEntrySchema } from "@/lib/engine";
import { call } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

describe("GET /shapes 200", () => {
  test("the whole catalogue without a key, on one page", async () => {
    const response = await call(server, "get", "/shapes");
    expect(response.status).toBe(200);
    expect(response.body.next).toBeNull();
    expect(response.headers.link).toBeUndefined();
    expect(response.body.items.map(({ id }: { id: string }) => id)).toEqual(catalogue.map(({ id }) => id));
  });

  test("page by page where a limit is given", async () => {
    const found: string[] = [];
    let path = "/shapes?limit=7";
    while (path !== "") {
      const { status, body, headers } = await call(server, "get", path);
      expect(status).toBe(200);
      found.push(...body.items.map(({ id }: { id: string }) => id));
      path = /^<\/api\/v1([^>]+)>; rel="next"$/.exec(headers.link ?? "")?.[1] ?? "";
      expect(path === "").toBe(body.next === null);
    }
    expect(found).toEqual(catalogue.map(({ id }) => id));
  });

  test("every entry has what a form needs", async () => {
    const { body } = await call(server, "get", "/shapes");
    for (const item of body.items) {
      const entry = shapeEntrySchema.parse(item);
      expect(item).toEqual(entry);
      for (const dimension of entry.dimensions) {
        expect(dimension.label && dimension.help).toBeTruthy();
        if (dimension.type === "choice") expect(dimension.choices?.length).toBeGreaterThan(1);
        else expect(dimension.unit && dimension.symbol).toBeTruthy();
      }
      const names = entry.dimensions.map(({ name }) => name);
      for (const group of entry.alternatives) expect(names).toEqual(expect.arrayContaining(group));
      expect(entry.formula && entry.summary && entry.terminals.high && entry.terminals.low).toBeTruthy();
      expect(entry.sources.length).toBeGreaterThan(0);
    }
  });

  test("each entry by its own address is the same", async () => {
    const { body } = await call(server, "get", "/shapes");
    for (const item of body.items) {
      expect((await call(server, "get", `/shapes/${item.id}`)).body).toEqual(item);
    }
  });

  test("every entry's example is computed", async () => {
    const { key } = server.issue();
    const { body } = await call(server, "get", "/shapes");
    for (const { id, example } of body.items) {
      const response = await call(server, "post", "/resistance", { key, body: example });
      expect([id, response.status]).toEqual([id, 200]);
      const { value, lower, upper } = response.body.resistance;
      expect(lower <= value && value <= upper && lower < upper).toBe(true);
    }
  });
});

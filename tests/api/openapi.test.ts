import Ajv2020 from "ajv/dist/2020";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { makeFixtures, performExample, type Fixtures, type Send } from "@/api/examples/perform";
import { openApiDocument } from "@/api/openapi";
import { PROBLEMS } from "@/api/problem";
import { registry } from "@/api/registry";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { catalogue } from "@/lib/engine";
import { call } from "../support/call";
import { startServer, type TestServer } from "../support/server";

interface Media {
  readonly schema: object;
  readonly examples?: Record<string, { summary: string; value: unknown }>;
}
interface Documented {
  readonly operationId: string;
  readonly summary: string;
  readonly description: string;
  readonly tags: string[];
  readonly security: object[];
  readonly parameters?: {
    name: string;
    in: string;
    description?: string;
    schema: object;
    examples?: object;
  }[];
  readonly requestBody?: { description: string; content: Record<string, Media> };
  readonly responses: Record<
    string,
    { description: string; headers: object; content?: Record<string, Media> }
  >;
}
interface Document {
  readonly openapi: string;
  readonly info: object;
  readonly servers: { url: string }[];
  readonly paths: Record<string, Record<string, Documented>>;
  readonly components: { schemas: Record<string, object>; headers: object; securitySchemes: object };
}

let server: TestServer;
let key: string;
let document: Document;
let fixtures: Fixtures;
let send: Send;
beforeAll(async () => {
  server = await startServer();
  key = server.issue({ scopes: [...SCOPE_NAMES], quotas: { minute: 100_000, month: 1_000_000 } }).key;
  document = (await call(server, "get", "/openapi.json")).body;
  send = (path, init) => fetch(server.base + path, init);
  fixtures = await makeFixtures(send, key);
});
afterAll(() => server.stop());

const operations = () =>
  Object.entries(document.paths).flatMap(([path, item]) =>
    Object.entries(item).map(([method, operation]) => ({ path, method, operation })),
  );

/** Follows every `$ref` inside the document. */
function resolveReferences(value: unknown, found: string[] = []): string[] {
  if (Array.isArray(value)) for (const entry of value) resolveReferences(entry, found);
  else if (typeof value === "object" && value !== null) {
    for (const [name, entry] of Object.entries(value)) {
      if (name === "$ref" && typeof entry === "string") found.push(entry);
      else resolveReferences(entry, found);
    }
  }
  return found;
}

describe("GET /openapi.json 200", () => {
  test("is OpenAPI 3.1, names every operation and no other", () => {
    expect(document.openapi).toMatch(/^3\.1\./);
    expect(document.servers).toEqual([{ url: "/api/v1" }]);
    const listed = operations().map(({ path, method }) => `${method.toUpperCase()} ${path}`);
    const registered = registry.operations.map(({ path, method }) => `${method} ${path}`);
    expect(listed.sort()).toEqual(registered.sort());
    const ids = operations().map(({ operation }) => operation.operationId);
    expect(new Set(ids).size).toBe(ids.length);
  });

  test("every reference leads somewhere", () => {
    for (const reference of resolveReferences(document)) {
      const target = reference
        .slice(2)
        .split("/")
        .reduce<unknown>((at, part) => (at as Record<string, unknown> | undefined)?.[part], document);
      expect([reference, typeof target]).toEqual([reference, "object"]);
    }
  });

  test("every path parameter is declared, every part described", () => {
    for (const { path, operation } of operations()) {
      expect(operation.summary && operation.description && operation.tags.length).toBeTruthy();
      expect(operation.security.length).toBeGreaterThan(0);
      const declared = (operation.parameters ?? [])
        .filter((entry) => entry.in === "path")
        .map(({ name }) => name);
      expect(declared).toEqual([...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]));
      for (const parameter of operation.parameters ?? []) expect(parameter.description).toBeTruthy();
      for (const [status, response] of Object.entries(operation.responses)) {
        expect(response.description).toBeTruthy();
        expect(Object.keys(response.headers)).toEqual(
          expect.arrayContaining(["Request-Id", "RateLimit", "RateLimit-Policy"]),
        );
        if (Number(status) >= 400) expect(response.content).toHaveProperty(["application/problem+json"]);
      }
      expect(Object.keys(operation.responses)).toEqual(
        expect.arrayContaining(["401", "422", "429", "500", "503"]),
      );
    }
  });

  test("every shape has a request of its own, told apart by `shape`", () => {
    const union = document.components.schemas.ResistanceRequest as {
      oneOf: object[];
      discriminator: { propertyName: string; mapping: Record<string, string> };
    };
    expect(union.discriminator.propertyName).toBe("shape");
    expect(Object.keys(union.discriminator.mapping)).toEqual(catalogue.map(({ id }) => id));
    for (const shape of catalogue) {
      const name = union.discriminator.mapping[shape.id].split("/").pop() ?? "";
      const schema = document.components.schemas[name] as {
        properties: { dimensions: { properties: Record<string, { description: string }> } };
      };
      const documented = schema.properties.dimensions.properties;
      expect(Object.keys(documented)).toEqual(expect.arrayContaining(Object.keys(shape.dimensions)));
      for (const { description } of Object.values(documented)) expect(description).toBeTruthy();
    }
  });

  test("every example fits the schema beside it", () => {
    const ajv = new Ajv2020({ strict: false, allErrors: true });
    addFormats(ajv);
    ajv.addSchema({ $id: "doc", components: document.components });
    const check = (where: string, { schema, examples }: Media) => {
      const text = JSON.stringify(schema).replaceAll('"#/', '"doc#/');
      const validate = ajv.compile(JSON.parse(text));
      for (const [name, { value }] of Object.entries(examples ?? {})) {
        validate(value);
        expect([where, name, validate.errors ?? []]).toEqual([where, name, []]);
      }
    };
    for (const { operation } of operations()) {
      const refused = new Set(
        registry.operations
          .find(({ id }) => id === operation.operationId)
          ?.examples.filter(({ status }) => status >= 400)
          .map(({ name }) => name),
      );
      for (const [type, media] of Object.entries(operation.requestBody?.content ?? {})) {
        const valid = Object.entries(media.examples ?? {}).filter(([name]) => !refused.has(name));
        check(`${operation.operationId} ${type}`, { ...media, examples: Object.fromEntries(valid) });
      }
      for (const [status, { content }] of Object.entries(operation.responses)) {
        for (const [type, media] of Object.entries(content ?? {})) {
          check(`${operation.operationId} ${status} ${type}`, media);
        }
      }
    }
  });

  test("every outcome has an example, and every problem leads to a page of the table", () => {
    for (const { operation } of operations()) {
      for (const [status, { content }] of Object.entries(operation.responses)) {
        // The document itself, and a picture: too long to be shown.
        if (["readOpenApi", "readFieldPlot"].includes(operation.operationId) && status === "200") continue;
        const examples = Object.values(content ?? {}).flatMap(({ examples = {} }) => Object.values(examples));
        if (content)
          expect([operation.operationId, status, examples.length > 0]).toEqual([
            operation.operationId,
            status,
            true,
          ]);
        if (Number(status) < 400) continue;
        for (const [, { value }] of Object.entries(content?.["application/problem+json"].examples ?? {})) {
          const { type, status: told } = value as { type: string; status: number };
          const code = type.split("/").pop() as keyof typeof PROBLEMS;
          expect([code, PROBLEMS[code]?.status, told]).toEqual([code, Number(status), Number(status)]);
        }
      }
    }
  });

  test("is the same each time it is made", async () => {
    const make = async () => JSON.stringify(await openApiDocument(registry, "https://rhoform.example"));
    const [first, second] = [await make(), await make()];
    let same = 0;
    while (same < first.length && first[same] === second[same]) same++;
    // The place where they part says more than a million characters.
    expect(second.slice(same - 80, same + 80)).toBe(first.slice(same - 80, same + 80));
  });

  test("carries no secret", () => {
    expect(JSON.stringify(document)).not.toMatch(/rho_k[0-9A-Za-z]{15}_[0-9A-Za-z]{43}/);
  });
});

describe("every example is executed", () => {
  const examples = registry.operations.flatMap((operation) =>
    operation.examples.map((example) => [operation.id, example.name, example.status] as const),
  );

  test.each(examples)("%s %s answers %i", async (id, name, status) => {
    const operation = registry.operations.find((entry) => entry.id === id);
    const example = operation?.examples.find((entry) => entry.name === name);
    if (!operation || !example) throw new Error("The example vanished.");
    const response = await performExample(send, operation, example, fixtures, key);
    const text = await response.text();
    expect([response.status, response.status === status ? "" : text]).toEqual([status, ""]);
    const type = (response.headers.get("content-type") ?? "").split(";")[0];
    const method = operation.method.toLowerCase();
    const content = document.paths[operation.path][method].responses[String(status)].content;
    if (!content) return;
    const shown = content[type].examples?.[name]?.value;
    expect(shown).toBeDefined();
    // What is computed is the same here as in the document, to the last bit.
    const resistance = (value: unknown) =>
      typeof value === "object" && value !== null && "resistance" in value ? value.resistance : undefined;
    if (type === "application/json") expect(resistance(JSON.parse(text))).toEqual(resistance(shown));
  });
});

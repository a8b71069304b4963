import { OpenAPIRegistry, OpenApiGeneratorV31 } from "@asteasolutions/zod-to-openapi";
import { SCOPES } from "@/lib/auth/scope";
import { CATALOGUE_VERSION } from "@/lib/engine";
import { BASE_PATH } from "./base-path";
import { collectExamples } from "./examples/collect";
import { documentHeaders } from "./openapi-headers";
import { documentedOperation } from "./openapi-operation";
import type { RouteTable } from "./route-table";
import { nameComponents } from "./schemas/resistance";

export type OpenApiDocument = ReturnType<OpenApiGeneratorV31["generateDocument"]>;

const TAGS = [
  {
    name: "Resistance",
    description: "From a shape, a medium and two terminals to a resistance with bounds.",
  },
  { name: "Networks", description: "Resistances between named nodes." },
  { name: "Shapes", description: "The catalogue." },
  { name: "Materials", description: "The shared library and the team's own materials." },
  { name: "Records", description: "Stored calculations, which can be replayed." },
  { name: "Keys", description: "The team's keys, for automation." },
  { name: "Service", description: "Usage, this document, liveness." },
];

const DESCRIPTION = `Turns a shape, a material and two terminals into a DC resistance that can be defended: with bounds, method, assumptions, cautions and sources.

**Quantities.** Every dimensional input is a bare number in SI (temperatures in °C, angles in degrees) or a text with its unit, such as \`"0.25 mm"\`, \`"58 MS/m"\` or \`"120 degC"\`.

**Keys.** Send \`Authorization: Bearer rho_…\`. A key has scopes and two quotas: requests a minute, computations a calendar month (UTC). Every answer tells in \`RateLimit\` what is left; a refused computation costs none.

**Problems.** Every refusal is a problem document (RFC 9457). Its \`type\` leads to a page that says what to do; a 422 points at every place in the input that is wrong.

**Repeats.** A POST that stores something honours \`Idempotency-Key\`: within a day the same call with the same key gets the same answer and stores nothing twice.`;

/**
 * The OpenAPI 3.1 document of the registry. Its examples are made by real calls on a service in memory; `origin` is
 * where the pages of the problems are.
 */
export async function openApiDocument(routes: RouteTable, origin: string): Promise<OpenApiDocument> {
  nameComponents();
  const examples = await collectExamples(routes, origin);
  const registry = new OpenAPIRegistry();
  registry.registerComponent("securitySchemes", "key", {
    type: "http",
    scheme: "bearer",
    bearerFormat: "rho_<id>_<secret>",
    description: `A key of a team. Scopes: ${Object.entries(SCOPES)
      .map(([scope, meaning]) => `\`${scope}\` (${meaning})`)
      .join("; ")}.`,
  });
  registry.registerComponent("securitySchemes", "keyInUrl", {
    type: "apiKey",
    in: "query",
    name: "key",
    description: "Only for keys that were issued for it: addresses end up in logs.",
  });
  documentHeaders(registry);
  for (const operation of routes.operations) {
    registry.registerPath(documentedOperation(operation, examples.get(operation.id) ?? [], origin));
  }
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: "3.1.0",
    info: {
      title: "Rhoform",
      version: "1.0.0",
      description: DESCRIPTION,
      "x-catalogue": CATALOGUE_VERSION,
    },
    // Relative: the document is valid wherever this service is reached.
    servers: [{ url: BASE_PATH }],
    tags: TAGS,
  });
  for (const operation of routes.operations) {
    const method = operation.method.toLowerCase();
    const item: unknown = document.paths?.[operation.path];
    const own = new Set(operation.examples.map(({ name }) => name));
    const shown = (examples.get(operation.id) ?? []).filter(({ name }) => own.has(name));
    addParameterExamples(item, method, shown);
  }
  return document;
}

interface Parameter {
  readonly name: string;
  readonly in: string;
  example?: unknown;
  examples?: Record<string, { summary: string; value: unknown }>;
}

/** Puts the examples' path and query values beside the parameters, under the names that their answers have. */
function addParameterExamples(
  item: unknown,
  method: string,
  examples: readonly { name: string; summary: string; path?: object; query?: object }[],
): void {
  const operation = (item as Record<string, { parameters?: Parameter[] }> | undefined)?.[method];
  for (const parameter of operation?.parameters ?? []) {
    const values = examples.flatMap(({ name, summary, path, query }) => {
      const value: unknown = Object.entries({ ...path, ...query }).find(
        ([key]) => key === parameter.name,
      )?.[1];
      return value === undefined ? [] : [[name, { summary, value }] as const];
    });
    if (values.length === 0) continue;
    delete parameter.example;
    parameter.examples = Object.fromEntries(values);
  }
}

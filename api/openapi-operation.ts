import type { RouteConfig } from "@asteasolutions/zod-to-openapi";
import { z } from "zod";
import { Refusal, type RefusalCode } from "@/lib/service/refusal";
import type { AnsweredExample } from "./examples/collect";
import { responseHeaders } from "./openapi-headers";
import type { Operation } from "./operation";
import { problemCodes } from "./problem-codes";
import { PROBLEMS } from "./problem";
import { problemAnswer } from "./respond";
import { problemSchema } from "./schemas/problem";

type Responses = RouteConfig["responses"];
type Named = Record<string, { summary: string; value: unknown }>;

/** An operation as the document tells it. */
export function documentedOperation(
  operation: Operation,
  examples: readonly AnsweredExample[],
  origin: string,
): RouteConfig {
  const { scope } = operation;
  const needs =
    scope === "none" ? "Needs no key." : scope === "any" ? "Needs a key." : `Needs the scope \`${scope}\`.`;
  const anyKey: Record<string, string[]>[] = [{ key: [] }, { keyInUrl: [] }];
  return {
    operationId: operation.id,
    method: lower(operation.method),
    path: operation.path,
    tags: [operation.tag],
    summary: operation.summary,
    description: `${operation.description} ${needs}`,
    security: scope === "none" ? [{}, ...anyKey] : anyKey,
    request: {
      ...(operation.request.path ? { params: operation.request.path } : {}),
      ...queryOf(operation),
      ...headersOf(operation),
      ...bodyOf(operation, examples),
    },
    responses: { ...successes(operation, examples), ...problems(operation, examples, origin) },
  };
}

function lower(method: Operation["method"]): "get" | "post" | "patch" | "delete" {
  return method === "GET" ? "get" : method === "POST" ? "post" : method === "PATCH" ? "patch" : "delete";
}

function queryOf(operation: Operation): { query?: z.ZodObject } {
  const { query } = operation.request;
  const formats = operation.produces.map((type) => (type === "text/plain" ? "text" : type.split("/")[1]));
  if (formats.length < 2) return query ? { query } : {};
  const format = z
    .enum(formats)
    .optional()
    .meta({ description: "Form of the answer; goes before the Accept header." });
  return { query: z.object({ ...query?.shape, format }) };
}

function headersOf(operation: Operation): { headers?: z.ZodObject } {
  const shape: Record<string, z.ZodType> = {};
  if (operation.mayStore) {
    shape["Idempotency-Key"] = z.string().max(255).optional().meta({
      description: "A text of the caller's choice; a repeat with it within a day gets the same answer.",
    });
  }
  if (operation.responses[202]) {
    shape.Prefer = z.string().max(255).optional().meta({
      description: "`wait=N` waits up to N seconds (at most 30) for the end (RFC 7240).",
      example: "wait=30",
    });
  }
  if (operation.errors.includes("precondition-required") || operation.errors.includes("version-conflict")) {
    const required = operation.errors.includes("precondition-required");
    const schema = z
      .string()
      .meta({ description: "The version that the change was made from, as the ETag gave it." });
    shape["If-Match"] = required ? schema : schema.optional();
  }
  return Object.keys(shape).length > 0 ? { headers: z.object(shape) } : {};
}

function bodyOf(
  operation: Operation,
  examples: readonly AnsweredExample[],
): Partial<NonNullable<RouteConfig["request"]>> {
  const { body } = operation.request;
  if (!body) return {};
  const of = (mediaType: string): Named =>
    Object.fromEntries(
      examples
        .filter(
          (example) => example.body !== undefined && (example.mediaType ?? "application/json") === mediaType,
        )
        .map(({ name, summary, body: value }) => [name, { summary, value }]),
    );
  const others = Object.entries(body.others ?? {}).map(([mediaType, { documented }]) => [
    mediaType,
    { schema: documented, examples: of(mediaType) },
  ]);
  return {
    body: {
      description: body.description,
      required: body.optional !== true,
      content: {
        "application/json": { schema: body.documented?.() ?? body.schema, examples: of("application/json") },
        ...Object.fromEntries(others),
      },
    },
  };
}

function answersOf(examples: readonly AnsweredExample[], status: number, mediaType: string): Named {
  return Object.fromEntries(
    examples
      .filter(({ answer }) => answer.status === status && answer.mediaType === mediaType)
      .map(({ name, summary, answer }) => [name, { summary, value: answer.body }]),
  );
}

function successes(operation: Operation, examples: readonly AnsweredExample[]): Responses {
  return Object.fromEntries(
    Object.entries(operation.responses).map(([code, { description, content, headers }]) => {
      const status = Number(code);
      const bodies = Object.entries(content ?? {}).map(([mediaType, schema]) => [
        mediaType,
        { schema, examples: answersOf(examples, status, mediaType) },
      ]);
      return [
        code,
        {
          description,
          headers: responseHeaders(status, headers),
          ...(bodies.length > 0 ? { content: Object.fromEntries(bodies) } : {}),
        },
      ];
    }),
  );
}

/** Every problem the operation may answer with, by status, each code with an example. */
function problems(operation: Operation, examples: readonly AnsweredExample[], origin: string): Responses {
  const byStatus = new Map<number, RefusalCode[]>();
  for (const code of problemCodes(operation)) {
    const { status } = PROBLEMS[code];
    byStatus.set(status, [...(byStatus.get(status) ?? []), code]);
  }
  const entries = [...byStatus].map(([status, codes]) => {
    const real = answersOf(examples, status, "application/problem+json");
    const shown = new Set(Object.values(real).map(({ value }) => codeOf(value)));
    const rest = codes.filter((code) => !shown.has(code)).map((code) => [camel(code), sample(code, origin)]);
    const text = operation.produces.includes("text/plain")
      ? {
          "text/plain": {
            schema: z.string().meta({ description: "One line that begins with `error:`." }),
            examples: answersOf(examples, status, "text/plain"),
          },
        }
      : {};
    return [
      status,
      {
        description: codes.map((code) => `\`${code}\`: ${PROBLEMS[code].description}`).join("\n\n"),
        headers: responseHeaders(status),
        content: {
          "application/problem+json": {
            schema: problemSchema,
            examples: { ...real, ...Object.fromEntries(rest) },
          },
          ...text,
        },
      },
    ];
  });
  return Object.fromEntries(entries);
}

function codeOf(value: unknown): string | undefined {
  const type = typeof value === "object" && value !== null && "type" in value ? value.type : undefined;
  return typeof type === "string" ? type.split("/").pop() : undefined;
}

function camel(code: string): string {
  return code.replace(/-(.)/g, (_, letter: string) => letter.toUpperCase());
}

/** What a problem looks like that no example of the operation brings about. */
function sample(code: RefusalCode, origin: string): { summary: string; value: unknown } {
  const { title, description } = PROBLEMS[code];
  const { body } = problemAnswer(
    new Refusal(code, description),
    "req_5HkXb2mQ9tWz7LcV",
    origin,
    "application/json",
  );
  return { summary: title, value: JSON.parse(String(body)) };
}

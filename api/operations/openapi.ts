import { createHash } from "node:crypto";
import { z } from "zod";
import { openApiDocument } from "../openapi";
import { defineOperation } from "../operation";
import type { RouteTable } from "../route-table";

/** The document is made once a process: its examples are real calls. */
const WRITTEN = new WeakMap<RouteTable, Promise<string>>();

export const readOpenApi = defineOperation({
  id: "readOpenApi",
  method: "GET",
  path: "/openapi.json",
  tag: "Service",
  summary: "This document",
  description:
    "The OpenAPI 3.1 document of the API, generated from the schemas that check the requests, with examples that were really computed.",
  scope: "none",
  request: {},
  responses: {
    200: {
      description: "The document.",
      content: {
        "application/json": z
          .looseObject({ openapi: z.string() })
          .meta({ description: "An OpenAPI 3.1 document." }),
      },
      headers: { ETag: "Changes when the document does; send it back in If-None-Match." },
    },
  },
  errors: [],
  // Its answer would be the document inside the document.
  examples: [],
  handler: async (_input, { registry, service }) => {
    let written = WRITTEN.get(registry);
    if (!written) {
      written = openApiDocument(registry, service.config.origin).then((document) => JSON.stringify(document));
      WRITTEN.set(registry, written);
      // A failure is told to those who wait for it and tried again by the next.
      written.catch(() => WRITTEN.delete(registry));
    }
    const text = await written;
    const etag = `W/"${createHash("sha256").update(text).digest("base64url").slice(0, 22)}"`;
    return {
      status: 200,
      content: { kind: "text", text, mediaType: "application/json" },
      headers: { ETag: etag, "Cache-Control": "no-cache" },
    };
  },
});

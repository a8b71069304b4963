import { z } from "zod";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "@/lib/engine";
import { defineOperation, json } from "../operation";

export const readHealth = defineOperation({
  id: "readHealth",
  method: "GET",
  path: "/health",
  tag: "Service",
  summary: "Is the service there",
  description: "Answers while the service and its database do, with the versions of engine and catalogue.",
  scope: "none",
  request: {},
  responses: {
    200: {
      description: "The service answers.",
      content: {
        "application/json": z
          .object({ status: z.literal("ok"), engine: z.string(), catalogue: z.string() })
          .meta({ id: "Health", description: "Liveness and versions." }),
      },
    },
  },
  errors: [],
  examples: [{ name: "alive", summary: "All is well", status: 200 }],
  handler: ({}, { service }) => {
    service.db.$client.prepare("select 1").get();
    return json(200, { status: "ok", engine: ENGINE_VERSION, catalogue: CATALOGUE_VERSION });
  },
});

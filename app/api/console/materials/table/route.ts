import { z } from "zod";
import { readMeasuredTable } from "@/lib/materials/measured-table";
import { consoleRoute } from "../../_server/console-route";

/** Reads a table of measurements as the API does, for the form to show before it is stored. */
export const POST = consoleRoute({
  action: "materials.manage",
  body: z.strictObject({ text: z.string().max(900_000) }),
  handle: ({ body }) => readMeasuredTable(body.text),
});

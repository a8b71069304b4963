import { csvTemplate } from "@/api/batch/csv-template";
import { findShape } from "@/lib/engine";

/** A CSV table to start from, for one shape: `?shape=bar`. */
export function GET(request: Request): Response {
  const shape = findShape(new URL(request.url).searchParams.get("shape") ?? "");
  if (!shape) return new Response("There is no such shape.\n", { status: 404 });
  return new Response(`\uFEFF${csvTemplate(shape)}`, {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": `attachment; filename="${shape.id}.csv"`,
    },
  });
}

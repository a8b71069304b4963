import { csvTemplate } from "@/api/batch/csv-template";
import { findShape } from "@/lib/engine";

interface Context {
  readonly params: Promise<{ readonly shape: string }>;
}

/** A table of requests to start from, with the shape's columns and its example. */
export async function GET(_request: Request, { params }: Context): Promise<Response> {
  const shape = findShape((await params).shape);
  if (!shape) return new Response("There is no such shape.\n", { status: 404 });
  return new Response(csvTemplate(shape), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": `attachment; filename="${shape.id}.csv"`,
    },
  });
}

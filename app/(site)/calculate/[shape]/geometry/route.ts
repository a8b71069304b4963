import { findShape, shapeEntry } from "@/lib/engine";
import { readGeometry } from "../../_server/geometry";

/** The drawing and the derived dimensions of a shape, for the page while numbers change. */
export async function GET(
  request: Request,
  { params }: { readonly params: Promise<{ readonly shape: string }> },
): Promise<Response> {
  const shape = findShape((await params).shape);
  if (!shape) return Response.json({ title: "There is no such shape." }, { status: 404 });
  const query = new URL(request.url).searchParams;
  const dimensions: Record<string, unknown> = {};
  for (const { name, type } of shapeEntry(shape).dimensions) {
    const text = query.get(name);
    if (text === null || text.length > 200) continue;
    dimensions[name] = type === "integer" && /^\d{1,15}$/.test(text) ? Number(text) : text;
  }
  const reading = readGeometry(shape, dimensions);
  if (!reading.ok) return Response.json({ errors: reading.errors }, { status: 422 });
  return Response.json(reading.geometry, { headers: { "Cache-Control": "private, max-age=300" } });
}

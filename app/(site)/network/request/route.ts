import { shapeRequest } from "../_server/shape-request";

/** What the address of a calculation page asks for: `?shape=bar&length=1m&…`. */
export function GET(request: Request): Response {
  const query = new URL(request.url).searchParams;
  const shape = query.get("shape") ?? "";
  query.delete("shape");
  const found = shapeRequest(shape, query);
  if (!found) return Response.json({ title: "There is no such shape." }, { status: 404 });
  return Response.json(found, { headers: { "Cache-Control": "private, max-age=300" } });
}

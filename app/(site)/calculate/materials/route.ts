import { libraryMaterials, readQuantity } from "@/lib/engine";
import { materialChoices } from "../_server/material-choices";

const DEFAULT_C = 20;

/** The library's materials with their resistivity at a temperature, for the picker. */
export function GET(request: Request): Response {
  const text = new URL(request.url).searchParams.get("temperature");
  const reading = readQuantity(text === null || text === "" ? DEFAULT_C : text, "temperature");
  if (!reading.ok) return Response.json({ title: reading.detail }, { status: 422 });
  return Response.json(materialChoices(libraryMaterials, reading.value), {
    headers: { "Cache-Control": "private, max-age=300" },
  });
}

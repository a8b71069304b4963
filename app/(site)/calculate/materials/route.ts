import { readQuantity } from "@/lib/engine";
import { materialChoices } from "../_server/material-choices";
import { readerMaterials } from "../_server/reader-materials";

const DEFAULT_C = 20;

/** The reader's materials with their resistivity at a temperature, for the picker. */
export async function GET(request: Request): Promise<Response> {
  const text = new URL(request.url).searchParams.get("temperature");
  const reading = readQuantity(text === null || text === "" ? DEFAULT_C : text, "temperature");
  if (!reading.ok) return Response.json({ title: reading.detail }, { status: 422 });
  return Response.json(materialChoices((await readerMaterials()).all, reading.value), {
    headers: { "Cache-Control": "private, no-store" },
  });
}

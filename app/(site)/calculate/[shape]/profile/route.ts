import { z } from "zod";
import { findShape } from "@/lib/engine";
import { previewProfile } from "../../_server/profile-preview";
import { readerMaterials } from "../../_server/reader-materials";

/** As large as a body of the API may be. */
const LARGEST = 1_000_000;

const bodySchema = z.object({
  dimensions: z.record(z.string().max(64), z.union([z.string().max(200), z.number()])),
  graded: z.object({ coordinate: z.unknown(), quantity: z.unknown(), profile: z.unknown() }).partial(),
});

/** A profile as a line to plot, for the editor while it changes. */
export async function POST(
  request: Request,
  { params }: { readonly params: Promise<{ readonly shape: string }> },
): Promise<Response> {
  const shape = findShape((await params).shape);
  if (!shape) return Response.json({ title: "There is no such shape." }, { status: 404 });
  if (Number(request.headers.get("Content-Length") ?? 0) > LARGEST) return tooLarge();
  const text = await request.text();
  if (text.length > LARGEST) return tooLarge();
  const parsed = bodySchema.safeParse(readJson(text));
  if (!parsed.success) return Response.json({ errors: [] }, { status: 422 });
  const reading = previewProfile(shape, parsed.data, (await readerMaterials()).find);
  return reading.ok
    ? Response.json(reading.preview)
    : Response.json({ errors: reading.errors }, { status: 422 });
}

function tooLarge(): Response {
  return Response.json({ title: "The profile is too large to preview." }, { status: 413 });
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

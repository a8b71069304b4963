import { readFile } from "node:fs/promises";
import { join } from "node:path";

const FILES = new Set([
  "spline-sans.woff2",
  "spline-sans-mono-400.woff2",
  "spline-sans-mono-500.woff2",
  "spline-sans-mono-600.woff2",
]);

interface Context {
  readonly params: Promise<{ readonly file: string }>;
}

/** Our fonts under fixed addresses, for documents that are not built with the pages: the interactive reference. */
export async function GET(_request: Request, { params }: Context): Promise<Response> {
  const { file } = await params;
  if (!FILES.has(file)) return new Response(null, { status: 404 });
  const content = Buffer.from(await readFile(join(process.cwd(), "fonts", file)));
  return new Response(content, {
    headers: { "Content-Type": "font/woff2", "Cache-Control": "public, max-age=86400" },
  });
}

import { referenceScript } from "../reference-script";

/** The script of the interactive reference, served from this host. */
export async function GET(request: Request): Promise<Response> {
  const { plain, zipped } = await referenceScript();
  const compressed = /\bgzip\b/.test(request.headers.get("Accept-Encoding") ?? "");
  return new Response(compressed ? zipped : plain, {
    headers: {
      "Content-Type": "text/javascript; charset=utf-8",
      "Cache-Control": "public, max-age=31536000, immutable",
      Vary: "Accept-Encoding",
      ...(compressed ? { "Content-Encoding": "gzip" } : {}),
    },
  });
}

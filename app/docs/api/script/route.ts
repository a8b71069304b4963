import { referenceScript } from "../reference-script";

/** The script of the interactive reference, served from this host (3.6 MB, 1 MB compressed on the way). */
export async function GET(): Promise<Response> {
  const { content } = await referenceScript();
  return new Response(content, {
    headers: {
      "Content-Type": "text/javascript; charset=utf-8",
      "Cache-Control": "public, max-age=31536000, immutable",
    },
  });
}

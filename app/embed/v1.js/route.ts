import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { sharedService } from "@/lib/service/service";

/** The loader for pages of other teams: a custom element, the same for every widget. */
export async function GET(): Promise<Response> {
  const path = join(/* turbopackIgnore: true */ process.cwd(), "dist", "embed", "v1.js");
  const text = (await readFile(path, "utf8")).replaceAll("%ORIGIN%", sharedService().config.origin);
  return new Response(text, {
    headers: {
      "Content-Type": "text/javascript; charset=utf-8",
      // Pages of other hosts load it, also with `crossorigin` and under a policy that isolates them.
      "Access-Control-Allow-Origin": "*",
      "Cross-Origin-Resource-Policy": "cross-origin",
      "Cache-Control": "public, max-age=300",
    },
  });
}

import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { demoEmbedId } from "@/lib/embeds/demo";
import { publishedEmbed } from "@/lib/embeds/show-embed";
import { sharedService } from "@/lib/service/service";
import { EXAMPLES, examplePage, noWidgetPage } from "../_pages/examples";

interface Context {
  readonly params: Promise<{ readonly name: string }>;
}

/** Pages as other teams would write them, with the demo's widget or the one that the address names. */
export async function GET(request: Request, { params }: Context): Promise<Response> {
  const { name } = await params;
  if (name === "react.js") return await reactExample();
  const example = Object.hasOwn(EXAMPLES, name) ? EXAMPLES[name] : undefined;
  if (!example) return new Response("There is no such example.", { status: 404, headers: PLAIN });

  const service = sharedService();
  const asked = new URL(request.url).searchParams.get("embed");
  const shown = publishedEmbed(service.db, asked ?? demoEmbedId(service.config.secret));
  if (!shown) return page(noWidgetPage(), 200, "default-src 'none'");
  const nonce = crypto.randomUUID().replaceAll("-", "");
  const facts = { origin: originOf(request, service.config.origin), embed: shown.embed.id, nonce };
  const usual = `default-src 'self'; style-src 'nonce-${nonce}'; script-src 'self' 'nonce-${nonce}'`;
  return page(examplePage(example, facts), 200, example.policy?.(facts) ?? usual);
}

const PLAIN = { "Content-Type": "text/plain; charset=utf-8" };

function page(body: string, status: number, policy: string): Response {
  return new Response(body, {
    status,
    headers: {
      "Content-Type": "text/html; charset=utf-8",
      "Cache-Control": "no-store",
      "Content-Security-Policy": `${policy}; frame-ancestors 'none'`,
      "X-Content-Type-Options": "nosniff",
      "Referrer-Policy": "strict-origin-when-cross-origin",
    },
  });
}

/** The address that the page was called at: examples run on whatever name the service has here. */
function originOf(request: Request, configured: string): string {
  const host = request.headers.get("host");
  if (host === null || !/^[a-z0-9.:[\]-]+$/i.test(host)) return configured;
  return `${configured.startsWith("https:") ? "https" : "http"}://${host}`;
}

async function reactExample(): Promise<Response> {
  const path = join(/* turbopackIgnore: true */ process.cwd(), "dist", "embed", "react-example.js");
  return new Response(await readFile(path, "utf8"), {
    headers: { "Content-Type": "text/javascript; charset=utf-8", "Cache-Control": "public, max-age=300" },
  });
}

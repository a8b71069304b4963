import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { demoEmbedId } from "@/lib/embeds/demo";
import { publishedEmbed } from "@/lib/embeds/show-embed";
import { sharedService } from "@/lib/service/service";
import { EXAMPLES } from "../_pages/examples";
import { examplePage, noWidgetPage } from "../_pages/documents";
import { newNonce, page, usualPolicy } from "../_pages/page-response";

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
  const nonce = newNonce();
  const usual = usualPolicy(nonce);
  if (!shown) return page(noWidgetPage(nonce), 200, usual);
  const facts = { origin: originOf(request, service.config.origin), embed: shown.embed.id, nonce };
  return page(examplePage(name, facts, asked ?? undefined), 200, example.policy?.(facts) ?? usual);
}

const PLAIN = { "Content-Type": "text/plain; charset=utf-8" };

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

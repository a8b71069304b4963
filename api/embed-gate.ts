import { cardDocument, type CardReason } from "@/lib/embeds/card";
import { embedState } from "@/lib/embeds/embed-view";
import { speechOf } from "@/lib/embeds/language";
import { previewedEmbed, publicEmbed, publishedEmbed, type ShownEmbed } from "@/lib/embeds/show-embed";
import { contentSecurityPolicy, documentHeaders } from "@/lib/http/security-headers";
import type { Service } from "@/lib/service/service";

/** What a frame's document needs before it is rendered. */
export interface FrameFacts {
  /** Whose pages may frame it. */
  readonly ancestors: readonly string[];
  readonly locale: string;
  readonly theme: "system" | "light" | "dark";
}

/** The widget's id in the address of a frame. */
export function framedEmbed(pathname: string): string | undefined {
  return /^\/embed\/([^/]{1,64})\/?$/.exec(pathname)?.[1];
}

/** Whether an address asks for a version that only its team sees; the page itself checks who asks. */
export function isPreview(url: URL): boolean {
  return url.searchParams.has("preview");
}

/** The theme of a frame: what the team fixed, else what the page around asks for, else the reader's device. */
export function frameTheme(chosen: "host" | "light" | "dark", asked: string | null): FrameFacts["theme"] {
  if (chosen !== "host") return chosen;
  return asked === "light" || asked === "dark" ? asked : "system";
}

/**
 * Before a frame is rendered: who may frame it, in which language and theme; or the card that stands in its place, 404
 * for what there is not and 410 for what was withdrawn. Undefined for every other address.
 */
export function embedGate(
  request: Request,
  service: Service,
  nonce: string,
  development: boolean,
): FrameFacts | Response | undefined {
  const url = new URL(request.url);
  const id = framedEmbed(url.pathname);
  if (id === undefined || id === "v1.js") return undefined;
  if (isPreview(url)) {
    const shown = previewedEmbed(service.db, id, versionIn(url));
    if (shown) return facts(request, url, shown, ["'self'"]);
  }
  const embed = publicEmbed(service.db, id);
  const shown = publishedEmbed(service.db, id);
  // Our own pages show widgets too: the examples, and the console beside them.
  if (embed && shown) return facts(request, url, shown, ["'self'", ...embed.origins]);

  const withdrawn = embed !== undefined && embedState(embed) === "withdrawn";
  const reason: CardReason = withdrawn ? "withdrawn" : "not-found";
  const { language } = speechOf(
    "reader",
    url.searchParams.get("lang") ?? undefined,
    request.headers.get("accept-language"),
  );
  const asked = frameTheme("host", url.searchParams.get("theme"));
  const theme = asked === "system" ? "host" : asked;
  const secure = service.config.origin.startsWith("https:");
  const frameAncestors = withdrawn && embed ? ["'self'", ...embed.origins] : ["*"];
  return new Response(cardDocument({ reason, embedId: id, language, theme, nonce }), {
    status: withdrawn ? 410 : 404,
    headers: {
      "Content-Type": "text/html; charset=utf-8",
      "Cache-Control": "no-store",
      "Content-Security-Policy": contentSecurityPolicy({ nonce, secure, development, frameAncestors }),
      ...Object.fromEntries(documentHeaders(secure).map(({ key, value }) => [key, value])),
    },
  });
}

/** The version that a preview names; the newest where it names none. */
export function versionIn(url: URL): number | undefined {
  const text = url.searchParams.get("version") ?? "";
  return /^[1-9]\d{0,6}$/.test(text) ? Number(text) : undefined;
}

function facts(
  request: Request,
  url: URL,
  { definition }: ShownEmbed,
  ancestors: readonly string[],
): FrameFacts {
  const page = url.searchParams.get("lang") ?? undefined;
  return {
    ancestors,
    locale: speechOf(definition.language, page, request.headers.get("accept-language")).locale,
    theme: frameTheme(definition.theme, url.searchParams.get("theme")),
  };
}

import type { Metadata } from "next";
import { headers } from "next/headers";
import { notFound } from "next/navigation";
import { isPreview, versionIn } from "@/api/embed-gate";
import { may } from "@/lib/auth/permissions";
import { signedInBy } from "@/lib/auth/session";
import { previewedEmbed, publishedEmbed, type ShownEmbed } from "@/lib/embeds/show-embed";
import { type Service, sharedService } from "@/lib/service/service";
import { Frame } from "../_frame/frame";
import { frameViewOf } from "../_frame/frame-view-of";

export const metadata: Metadata = { title: "Calculator", robots: { index: false } };

interface PageProps {
  readonly params: Promise<{ readonly embedId: string }>;
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

const LONGEST_VALUE = 120;

/** A widget as another page frames it. What there is not, or was withdrawn, never comes here: the proxy says so. */
export default async function EmbedPage({ params, searchParams }: PageProps) {
  const service = sharedService();
  const { embedId } = await params;
  const query = await searchParams;
  const plain = Object.fromEntries(
    Object.entries(query).flatMap(([name, value]) =>
      typeof value === "string" && value.length <= LONGEST_VALUE ? [[name, value] as const] : [],
    ),
  );
  const request = await headers();
  const address = new URL(`${service.config.origin}/?${new URLSearchParams(plain)}`);
  const preview = isPreview(address);
  const shown = preview
    ? await previewed(service, embedId, address, request)
    : publishedEmbed(service.db, embedId);
  if (!shown) notFound();

  const own = [service.config.origin, `http://${request.get("host")}`, `https://${request.get("host")}`];
  const host = originOf(request.get("referer"));
  const view = await frameViewOf(service, shown, {
    language: plain.lang,
    acceptLanguage: request.get("accept-language"),
    host: own.includes(host) || shown.embed.origins.includes(host) ? host : "",
    preview,
    values: plain,
    own,
  });
  if (!view) notFound();
  return <Frame view={view} />;
}

/** A draft or an earlier version, for those who may see the team's widgets. */
async function previewed(
  service: Service,
  embedId: string,
  address: URL,
  request: Headers,
): Promise<ShownEmbed | undefined> {
  const person = await signedInBy(service, request.get("cookie"));
  const shown = previewedEmbed(service.db, embedId, versionIn(address));
  return person && shown && may(person, "embeds.view", shown.embed.teamId) ? shown : undefined;
}

function originOf(referer: string | null): string {
  if (referer === null) return "";
  try {
    return new URL(referer).origin;
  } catch {
    return "";
  }
}

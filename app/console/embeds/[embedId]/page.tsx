import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { embedById } from "@/db/queries/embeds";
import { may } from "@/lib/auth/permissions";
import { requireSession } from "../../_shell/require-session";
import { embedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { EmbedEditor } from "./embed-editor";

export const metadata: Metadata = { title: "Embed" };

interface PageProps {
  readonly params: Promise<{ readonly embedId: string }>;
}

export default async function EmbedPage({ params }: PageProps) {
  const { person, service } = await requireSession("embeds.view");
  const row = embedById(service.db, (await params).embedId);
  if (!row || !may(person, "embeds.view", row.teamId)) notFound();
  const detail = await embedDetail(service, row, may(person, "embeds.manage", row.teamId), service.now());
  return <EmbedEditor first={detail} origin={service.config.origin} />;
}

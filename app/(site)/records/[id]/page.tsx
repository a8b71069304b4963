import type { Metadata } from "next";
import { headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import { cache } from "react";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { RecordActions } from "../_page/record-actions";
import { RecordSheet } from "../_page/record-sheet";
import { readRecordFor } from "../_server/read-record";

interface PageProps {
  readonly params: Promise<{ readonly id: string }>;
}

const reading = cache(async (id: string) => readRecordFor((await headers()).get("cookie"), id));

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const record = await reading((await params).id);
  return { title: record.kind === "read" ? record.content.label : "Record", robots: { index: false } };
}

export default async function RecordPage({ params }: PageProps) {
  const { id } = await params;
  const record = await reading(id);
  if (record.kind === "signed-out") redirect(`/sign-in?next=${encodeURIComponent(`/records/${id}`)}`);
  if (record.kind === "unknown") notFound();
  if (record.kind === "elsewhere") redirect(`/records/${record.id}`);
  const { content, rights } = record;
  return (
    <article>
      <div className="print:hidden">
        <Breadcrumb trail={[{ href: "/console/records", label: "Records" }]} />
      </div>
      <p className="text-small text-ink-soft">{content.subject}</p>
      <h1 className="[overflow-wrap:anywhere]">{content.label}</h1>
      <RecordActions
        id={content.id}
        label={content.label}
        openAgain={content.openAgain}
        readOnly={readOnly(rights, content.team)}
      />
      <RecordSheet content={content} />
    </article>
  );
}

function readOnly(
  rights: { readonly ownTeam: boolean; readonly manage: boolean },
  team: string,
): string | null {
  if (!rights.manage) return "Your role reads records; a developer of the team can replay or change them.";
  return rights.ownTeam ? null : `Switch to the team ${team} in the console to replay or change it.`;
}

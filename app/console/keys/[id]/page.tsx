import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { keyById } from "@/db/queries/keys";
import { may } from "@/lib/auth/permissions";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { requireSession } from "../../_shell/require-session";
import { KeyPage } from "../_parts/key-page";

export const metadata: Metadata = { title: "Key" };

export default async function OneKey({ params }: { readonly params: Promise<{ readonly id: string }> }) {
  const { person, service } = await requireSession("keys.view");
  const key = keyById(service.db, (await params).id);
  if (!key || !may(person, "keys.view", key.teamId)) notFound();
  return (
    <>
      <Breadcrumb trail={[{ href: "/console/keys", label: "Keys" }]} />
      <KeyPage id={key.id} name={key.name} />
    </>
  );
}

import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { listTeams } from "@/db/queries/teams";
import { may, reachOf } from "@/lib/auth/permissions";
import { materialHistory } from "@/lib/materials/console-materials";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { requireSession } from "../../_shell/require-session";
import { MaterialPage } from "../_parts/material-page";

export const metadata: Metadata = { title: "Material" };

export default async function OneMaterial({ params }: { readonly params: Promise<{ readonly id: string }> }) {
  const { person, service } = await requireSession("materials.view");
  const all = reachOf(person.role, "materials.view") === "all";
  const teamIds = all ? listTeams(service.db).map(({ id }) => id) : person.teamIds;
  const found = materialHistory(service.db, (await params).id, teamIds);
  if (!found || (found.teamId !== null && !may(person, "materials.view", found.teamId))) notFound();
  return (
    <>
      <Breadcrumb trail={[{ href: "/console/materials", label: "Materials" }]} />
      <MaterialPage id={found.id} name={found.versions.at(-1)?.name ?? found.id} />
    </>
  );
}

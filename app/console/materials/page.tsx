import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";
import { teamChoices } from "../_shell/team-choices";
import { MaterialList } from "./_parts/material-list";

export const metadata: Metadata = { title: "Materials" };

export default async function MaterialsPage() {
  const { person, service } = await requireSession("materials.view");
  return (
    <MaterialList
      teams={teamChoices(service, person, "materials.view")}
      createFor={teamChoices(service, person, "materials.manage")}
      ownTeamId={person.team?.id ?? ""}
    />
  );
}

import type { Metadata } from "next";
import { catalogue } from "@/lib/engine";
import { requireSession } from "../_shell/require-session";
import { teamChoices } from "../_shell/team-choices";
import { EmbedList } from "./embed-list";

export const metadata: Metadata = { title: "Embeds" };

export default async function Embeds() {
  const { person, service } = await requireSession("embeds.view");
  const teams = teamChoices(service, person, "embeds.manage");
  return (
    <EmbedList
      teams={teams}
      anyTeam={teamChoices(service, person, "embeds.view").length > 0}
      ownTeam={person.team?.id ?? teams[0]?.id ?? ""}
      shapes={catalogue.map(({ id, title, family }) => ({ id, title, family }))}
    />
  );
}

import type { Metadata } from "next";
import { listTeams } from "@/db/queries/teams";
import { may } from "@/lib/auth/permissions";
import { catalogue } from "@/lib/engine";
import { requireSession } from "../_shell/require-session";
import { EmbedList } from "./embed-list";

export const metadata: Metadata = { title: "Embeds" };

export default async function Embeds() {
  const { person, service } = await requireSession("embeds.view");
  const teams = listTeams(service.db)
    .filter(({ id }) => may(person, "embeds.manage", id))
    .map(({ id, name }) => ({ id, name }));
  return (
    <EmbedList
      teams={teams}
      ownTeam={person.team?.id ?? teams[0]?.id ?? ""}
      shapes={catalogue.map(({ id, title, family }) => ({ id, title, family }))}
    />
  );
}

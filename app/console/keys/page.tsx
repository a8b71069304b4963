import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";
import { teamChoices } from "../_shell/team-choices";
import { KeyList } from "./_parts/key-list";

export const metadata: Metadata = { title: "Keys" };

export default async function KeysPage() {
  const { person, service } = await requireSession("keys.view");
  return (
    <KeyList
      teams={teamChoices(service, person, "keys.view")}
      issueFor={teamChoices(service, person, "keys.manage")}
      ownTeamId={person.team?.id ?? ""}
    />
  );
}

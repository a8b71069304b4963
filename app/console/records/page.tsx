import type { Metadata } from "next";
import { may } from "@/lib/auth/permissions";
import { requireSession } from "../_shell/require-session";
import { teamChoices } from "../_shell/team-choices";
import { RecordList } from "./_parts/record-list";

export const metadata: Metadata = { title: "Records" };

export default async function RecordsPage() {
  const { person, service } = await requireSession("records.view");
  const teams = teamChoices(service, person, "records.view");
  return (
    <RecordList
      teams={teams}
      managed={teams.filter(({ id }) => may(person, "records.manage", id)).map(({ id }) => id)}
    />
  );
}

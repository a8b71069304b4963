import type { Metadata } from "next";
import { mayAnywhere } from "@/lib/auth/permissions";
import { requireSession } from "./_shell/require-session";
import { teamChoices } from "./_shell/team-choices";
import { OverviewPage } from "./_overview/overview-page";

export const metadata: Metadata = { title: "Overview" };

export default async function Overview() {
  const { person, service } = await requireSession("overview.view");
  return (
    <OverviewPage
      anyTeam={teamChoices(service, person, "overview.view").length > 0}
      mayIssue={mayAnywhere(person, "keys.manage")}
    />
  );
}

import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";
import { teamChoices } from "../_shell/team-choices";
import { ActivityList } from "./_parts/activity-list";

export const metadata: Metadata = { title: "Activity" };

export default async function ActivityPage() {
  const { person, service } = await requireSession("activity.view");
  return <ActivityList teams={teamChoices(service, person, "activity.view")} all={person.role === "admin"} />;
}

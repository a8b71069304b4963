import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";
import { teamChoices } from "../_shell/team-choices";
import { UsagePage } from "./_parts/usage-page";

export const metadata: Metadata = { title: "Usage" };

export default async function Usage() {
  const { person, service } = await requireSession("usage.view");
  return (
    <UsagePage
      teams={teamChoices(service, person, "usage.view")}
      today={new Date(service.now()).toISOString().slice(0, 10)}
    />
  );
}

import type { Metadata } from "next";
import { requireSession } from "./_shell/require-session";
import { OverviewPage } from "./_overview/overview-page";

export const metadata: Metadata = { title: "Overview" };

export default async function Overview() {
  await requireSession("overview.view");
  return <OverviewPage />;
}

import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";
import { SettingsPage } from "./_parts/settings-page";

export const metadata: Metadata = { title: "Settings" };

export default async function Settings() {
  await requireSession("settings.view");
  return <SettingsPage />;
}

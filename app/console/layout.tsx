import type { Metadata } from "next";
import type { ReactNode } from "react";
import { mayAnywhere } from "@/lib/auth/permissions";
import { ToastArea } from "../_ui/toast";
import { readerTheme } from "../reader-theme";
import { ConsoleFrame } from "./_shell/console-frame";
import { requireSession } from "./_shell/require-session";
import { SECTIONS } from "./_shell/sections";

export const metadata: Metadata = {
  title: { default: "Console · Rhoform", template: "%s · Console · Rhoform" },
  robots: { index: false },
};

export default async function ConsoleLayout({ children }: { readonly children: ReactNode }) {
  const { person } = await requireSession();
  const shown = SECTIONS.filter(({ permission }) => mayAnywhere(person, permission)).map(({ id }) => id);
  return (
    <ConsoleFrame theme={await readerTheme()} name={person.name} sections={shown}>
      <ToastArea>{children}</ToastArea>
    </ConsoleFrame>
  );
}

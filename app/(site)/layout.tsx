import type { ReactNode } from "react";
import { SiteFrame } from "../_ui/site/site-frame";
import { readerTheme } from "../reader-theme";

export default async function SiteLayout({ children }: { readonly children: ReactNode }) {
  return <SiteFrame theme={await readerTheme()}>{children}</SiteFrame>;
}

import type { ReactNode } from "react";
import { SiteFrame } from "../_ui/site/site-frame";
import { ReaderCorner } from "./_reader/reader-corner";
import { readerTheme } from "../reader-theme";

export default async function SiteLayout({ children }: { readonly children: ReactNode }) {
  return (
    <SiteFrame theme={await readerTheme()} reader={<ReaderCorner />}>
      {children}
    </SiteFrame>
  );
}

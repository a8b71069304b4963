import type { Metadata } from "next";
import type { ReactNode } from "react";
import { SiteFrame } from "../_ui/site/site-frame";
import { readerTheme } from "../reader-theme";

export const metadata: Metadata = { robots: { index: false }, referrer: "no-referrer" };

/** Pages around signing in: one narrow column. Their addresses may carry a link's secret, so no referrer leaves. */
export default async function AuthLayout({ children }: { readonly children: ReactNode }) {
  return (
    <SiteFrame theme={await readerTheme()}>
      <div className="mx-auto max-w-[26rem]">{children}</div>
    </SiteFrame>
  );
}

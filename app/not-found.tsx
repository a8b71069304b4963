import type { Metadata } from "next";
import { ButtonLink } from "./_ui/button";
import { SiteFrame } from "./_ui/site/site-frame";
import { readerTheme } from "./reader-theme";

export const metadata: Metadata = { title: "No page here" };

export default async function NotFound() {
  return (
    <SiteFrame theme={await readerTheme()}>
      <h1>No page at this address</h1>
      <p className="mt-2 max-w-prose">The link may be old, or the address mistyped.</p>
      <p className="mt-3 flex flex-wrap gap-1.5">
        <ButtonLink href="/" variant="primary">
          To the start page
        </ButtonLink>
        <ButtonLink href="/docs">To the docs</ButtonLink>
      </p>
    </SiteFrame>
  );
}

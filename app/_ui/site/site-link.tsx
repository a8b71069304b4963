import Link from "next/link";
import type { ReactNode } from "react";

/** Addresses that are served whole and not as pages of the application: the browser loads them anew. */
const WHOLE = ["/docs/api", "/api/"];

interface SiteLinkProps {
  readonly href: string;
  readonly className?: string;
  readonly children: ReactNode;
}

/** A link within this site. */
export function SiteLink({ href, className, children }: SiteLinkProps) {
  return WHOLE.some((prefix) => href.startsWith(prefix)) ? (
    <a href={href} className={className}>
      {children}
    </a>
  ) : (
    <Link href={href} className={className}>
      {children}
    </Link>
  );
}

import Link from "next/link";
import type { ReactNode } from "react";

/** Addresses that the browser loads anew: those served whole, and the console, which leads elsewhere when signed out. */
const WHOLE = ["/docs/api", "/api/", "/console"];

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

"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { useEffect, useRef } from "react";
import { SECTIONS } from "./sections";

/** The sections: a column at the side where it is wide, a strip that scrolls sideways where it is not. */
export function SectionNav({ sections }: { readonly sections: readonly string[] }) {
  // Links of a page may end with a slash.
  const path = usePathname().replace(/(.)\/$/, "$1");
  const current = useRef<HTMLAnchorElement>(null);
  const here = (href: string) =>
    href === "/console" ? path === href : path === href || path.startsWith(`${href}/`);

  useEffect(() => {
    // In the strip the current section may be out of sight.
    current.current?.scrollIntoView({ block: "nearest", inline: "center" });
  }, [path]);

  return (
    <nav
      aria-label="Console"
      className="shrink-0 border-b border-rule print:hidden wide:w-26 wide:border-e wide:border-b-0"
    >
      <ul className="flex overflow-x-auto px-1 text-table medium:px-2 wide:sticky wide:top-0 wide:flex-col wide:overflow-visible wide:px-0 wide:py-2">
        {SECTIONS.filter(({ id }) => sections.includes(id)).map(({ id, title, href, icon: Icon }) => (
          <li key={id} className="shrink-0">
            <Link
              ref={here(href) ? current : undefined}
              href={href}
              aria-current={here(href) ? "page" : undefined}
              className="flex min-h-5.5 items-center gap-1 border-transparent px-1 text-ink-soft hover:text-ink aria-[current]:border-copper aria-[current]:font-medium aria-[current]:text-ink max-wide:border-b-3 wide:min-h-4.5 wide:border-s-3 wide:px-2"
            >
              <Icon aria-hidden size={16} className="shrink-0" />
              {title}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

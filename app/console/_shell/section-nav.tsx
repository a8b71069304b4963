"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { SECTIONS } from "./sections";

/** The sections: a column at the side where it is wide, lines above the page where it is not. */
export function SectionNav({ sections }: { readonly sections: readonly string[] }) {
  // Links of a page may end with a slash.
  const path = usePathname().replace(/(.)\/$/, "$1");
  const here = (href: string) =>
    href === "/console" ? path === href : path === href || path.startsWith(`${href}/`);

  return (
    <nav
      aria-label="Console"
      className="shrink-0 border-b border-rule print:hidden wide:w-26 wide:border-e wide:border-b-0"
    >
      <ul className="flex flex-wrap px-1 text-table medium:px-2 wide:sticky wide:top-0 wide:flex-col wide:px-0 wide:py-2">
        {SECTIONS.filter(({ id }) => sections.includes(id)).map(({ id, title, href, icon: Icon }) => (
          <li key={id}>
            <Link
              href={href}
              aria-current={here(href) ? "page" : undefined}
              className="flex min-h-5.5 items-center gap-1 border-transparent px-1 text-ink-soft hover:text-ink aria-[current]:border-copper aria-[current]:font-medium aria-[current]:text-ink max-wide:border-b-3 medium:min-h-4.5 wide:border-s-3 wide:px-2"
            >
              <Icon aria-hidden size={16} className="shrink-0 max-wide:hidden" />
              {title}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

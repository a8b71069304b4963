"use client";

import { useEffect, useRef } from "react";
import { usePathname } from "next/navigation";
import { SiteLink } from "../../../_ui/site/site-link";

export interface ContentsGroup {
  readonly title: string;
  readonly entries: readonly { readonly href: string; readonly title: string }[];
}

/** The list of all pages; the one that is open is marked. */
export function Contents({ groups }: { readonly groups: readonly ContentsGroup[] }) {
  const path = usePathname();
  return (
    <ul className="grid gap-2 text-table">
      {groups.map(({ title, entries }) => (
        <li key={title}>
          <p className="font-semibold">{title}</p>
          <ul className="mt-0.5 grid">
            {entries.map((entry) => (
              <li
                key={entry.href}
                className={`border-s-2 ps-1 ${entry.href === path ? "border-copper font-medium" : "border-rule text-ink-soft"}`}
              >
                <Entry {...entry} current={entry.href === path} />
              </li>
            ))}
          </ul>
        </li>
      ))}
    </ul>
  );
}

function Entry({
  href,
  title,
  current,
}: {
  readonly href: string;
  readonly title: string;
  readonly current: boolean;
}) {
  const open = useRef<HTMLSpanElement>(null);
  useEffect(() => open.current?.scrollIntoView({ block: "nearest" }), []);
  if (current)
    return (
      <span ref={open} aria-current="page" className="block py-0.5">
        {title}
      </span>
    );
  return (
    <SiteLink href={href} className="block rounded py-0.5 hover:text-ink hover:underline">
      {title}
    </SiteLink>
  );
}

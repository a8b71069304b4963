import Link from "next/link";
import type { ReactNode } from "react";
import type { Theme } from "../theme";
import { ThemeSwitch } from "../theme-switch";
import { Mark } from "./mark";
import { NAVIGATION } from "./navigation";
import { SiteLink } from "./site-link";

const FOOTER = [
  { href: "/docs/problems", label: "Problems" },
  { href: "/docs/changelog", label: "Changelog" },
] as const;

interface SiteFrameProps {
  readonly theme: Theme;
  /** Who is signed in, or the way to sign in; left out where a page is about just that. */
  readonly reader?: ReactNode;
  readonly children: ReactNode;
}

/** Header, main region and footer of every public page. */
export function SiteFrame({ theme, reader, children }: SiteFrameProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#content"
        className="absolute start-2 top-2 z-10 -translate-y-20 rounded border border-edge bg-sheet px-2 py-1 focus:translate-y-0"
      >
        Skip to content
      </a>
      <header className="border-b border-rule print:hidden">
        <div className="mx-auto flex max-w-page flex-wrap items-center justify-between gap-x-2 px-2 py-0.5 medium:gap-x-3 medium:gap-y-0.5 medium:px-4 medium:py-1.5">
          <Link
            href="/"
            className="flex min-h-5.5 items-center gap-1 rounded text-lead font-semibold tracking-tight medium:min-h-0"
          >
            <Mark className="h-2.5 w-3.5" />
            Rhoform
          </Link>
          <nav
            aria-label="Site"
            className="order-last flex w-full grow flex-wrap gap-x-2.5 text-table wide:order-none wide:w-auto"
          >
            {NAVIGATION.map(({ href, label }) => (
              <SiteLink
                key={href}
                href={href}
                className="flex min-h-5.5 items-center rounded py-0.5 text-ink-soft hover:text-ink hover:underline medium:min-h-0"
              >
                {label}
              </SiteLink>
            ))}
          </nav>
          <div className="flex min-w-0 items-center gap-x-1">
            {reader}
            <ThemeSwitch initial={theme} />
          </div>
        </div>
      </header>
      <main
        id="content"
        tabIndex={-1}
        className="mx-auto w-full max-w-page grow px-2 py-5 outline-none medium:px-4 medium:py-7 print:p-0!"
      >
        {children}
      </main>
      <footer className="border-t border-rule text-small text-ink-soft print:hidden">
        <div className="mx-auto flex max-w-page flex-wrap items-baseline justify-between gap-x-4 gap-y-1 px-2 py-3 medium:px-4">
          <p className="max-w-prose">
            Results are DC resistances under the stated assumptions, and no proof of compliance.
          </p>
          <nav aria-label="More" className="-my-1.5 flex gap-x-2.5 medium:my-0">
            {FOOTER.map(({ href, label }) => (
              <Link
                key={href}
                href={href}
                className="flex min-h-5.5 items-center rounded hover:text-ink hover:underline medium:min-h-0"
              >
                {label}
              </Link>
            ))}
          </nav>
        </div>
      </footer>
    </div>
  );
}

import Link from "next/link";
import type { ReactNode } from "react";
import { Mark } from "../../_ui/site/mark";
import type { Theme } from "../../_ui/theme";
import { ThemeSwitch } from "../../_ui/theme-switch";
import { AccountLinks } from "./account-links";
import { SectionNav } from "./section-nav";

interface ConsoleFrameProps {
  readonly theme: Theme;
  /** Of the person who is signed in. */
  readonly name: string;
  /** Ids of the sections that the person's role shows. */
  readonly sections: readonly string[];
  readonly children: ReactNode;
}

/** Header, sections at the side (above, where it is narrow) and the main region of every console page. */
export function ConsoleFrame({ theme, name, sections, children }: ConsoleFrameProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#content"
        className="absolute start-2 top-2 z-10 -translate-y-20 rounded border border-edge bg-sheet px-2 py-1 focus:translate-y-0"
      >
        Skip to content
      </a>
      <header className="border-b border-rule print:hidden">
        <div className="flex flex-wrap items-center gap-x-2 gap-y-0.5 px-2 py-1 medium:px-3">
          <Link href="/" className="flex items-center gap-1 rounded text-lead font-semibold tracking-tight">
            <Mark className="h-2.5 w-3.5" />
            Rhoform
          </Link>
          <span className="grow text-table text-ink-soft max-medium:hidden">Console</span>
          <span className="grow medium:hidden" />
          <ThemeSwitch initial={theme} />
          <AccountLinks name={name} />
        </div>
      </header>
      <div className="flex grow flex-col wide:flex-row">
        <SectionNav sections={sections} />
        <main
          id="content"
          tabIndex={-1}
          className="min-w-0 grow px-2 py-3 outline-none medium:px-3 wide:px-4"
        >
          <div className="mx-auto max-w-page">{children}</div>
        </main>
      </div>
    </div>
  );
}

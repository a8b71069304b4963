"use client";

import { useEffect, useRef, useState } from "react";
import { ChevronDown, CircleUserRound, LogOut } from "lucide-react";
import { SiteLink } from "../../_ui/site/site-link";
import { callPage } from "./call-console";

interface ReaderMenuProps {
  readonly name: string;
  readonly email: string;
  /** Names of the person's teams. */
  readonly teams: readonly string[];
  /** The one that this browser's pages work for. */
  readonly team: string | null;
}

const ITEM =
  "flex min-h-5.5 w-full cursor-pointer items-center gap-1 rounded px-1 text-start text-table hover:bg-paper medium:min-h-4.5";

/** Who is signed in on this browser, for which team its pages work, and the ways on: console, account, out. */
export function ReaderMenu({ name, email, teams, team }: ReaderMenuProps) {
  const menu = useRef<HTMLDetailsElement>(null);
  const [busy, setBusy] = useState(false);

  useEffect(() => {
    const close = (event: Event) => {
      const { current } = menu;
      if (!current?.open) return;
      if (event instanceof KeyboardEvent) {
        if (event.key !== "Escape") return;
        current.querySelector("summary")?.focus();
      } else if (event.target instanceof Node && current.contains(event.target)) return;
      current.open = false;
    };
    const events = ["keydown", "pointerdown", "focusin"] as const;
    for (const event of events) document.addEventListener(event, close);
    return () => {
      for (const event of events) document.removeEventListener(event, close);
    };
  }, []);

  async function signOut() {
    setBusy(true);
    try {
      await callPage("POST", "auth/sign-out");
    } finally {
      // What was for the reader alone leads to the sign-in by itself.
      window.location.reload();
    }
  }

  const others = teams.filter((each) => each !== team);
  return (
    // In a phone's width the list takes the window's: from the name's end it would reach over the left edge.
    <details ref={menu} className="min-w-0 narrow:relative">
      <summary
        aria-label={`Signed in as ${name}`}
        className="flex min-h-5.5 cursor-pointer list-none items-center gap-0.5 rounded text-table text-ink-soft hover:text-ink medium:min-h-4 [&::-webkit-details-marker]:hidden"
      >
        <CircleUserRound aria-hidden size={16} className="shrink-0" />
        <span className="max-w-[6ch] truncate narrow:max-w-[12ch] medium:max-w-[18ch]">{name}</span>
        <ChevronDown aria-hidden size={14} className="shrink-0" />
      </summary>
      <div className="absolute inset-x-2 z-20 mt-0.5 rounded border border-ink bg-sheet p-1 text-table narrow:inset-x-auto narrow:end-0 narrow:top-full narrow:w-[17rem]">
        <p className="px-1 font-medium [overflow-wrap:anywhere]">{name}</p>
        <p className="px-1 text-small text-ink-soft [overflow-wrap:anywhere]">{email}</p>
        <p className="mt-0.5 px-1 text-small text-ink-soft [overflow-wrap:anywhere]">
          {team === null ? "In no team yet." : `These pages work for the team ${team}.`}
          {others.length > 0 ? ` Also in ${others.join(", ")}.` : ""}
        </p>
        <div className="mt-1 border-t border-rule pt-0.5">
          <SiteLink href="/console" className={ITEM}>
            Console
          </SiteLink>
          <SiteLink href="/console/account" className={ITEM}>
            Account
          </SiteLink>
          <button type="button" onClick={signOut} disabled={busy} className={ITEM}>
            <LogOut aria-hidden size={16} /> Sign out
          </button>
        </div>
      </div>
    </details>
  );
}

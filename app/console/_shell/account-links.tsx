"use client";

import Link from "next/link";
import { useState } from "react";
import { LogOut, UserRound } from "lucide-react";
import { callPage, openAnew } from "./call-console";

const LINK =
  "inline-flex min-h-5.5 cursor-pointer items-center gap-0.5 rounded px-0.5 text-table text-ink-soft hover:text-ink medium:min-h-4";

/** The person's own page, and the way out. */
export function AccountLinks({ name }: { readonly name: string }) {
  const [busy, setBusy] = useState(false);

  async function signOut() {
    setBusy(true);
    try {
      await callPage("POST", "auth/sign-out");
    } finally {
      openAnew("/sign-in");
    }
  }

  return (
    <div className="flex items-center gap-1">
      <Link href="/console/account" className={LINK} aria-label={`My account (${name})`}>
        <UserRound aria-hidden size={16} />
        <span className="max-w-[16ch] truncate max-medium:hidden">{name}</span>
      </Link>
      <button type="button" onClick={signOut} disabled={busy} className={LINK} aria-label="Sign out">
        <LogOut aria-hidden size={16} />
        <span className="max-medium:hidden">Sign out</span>
      </button>
    </div>
  );
}

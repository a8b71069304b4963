"use client";

import { useState } from "react";
import { expiryText, SOON_MS } from "@/lib/auth/key-expiry";
import { StateWord } from "../../_parts/state-word";
import type { Key } from "./key";

/** Whether a key works, and for how long where that is not long. */
export function KeyState({ state, expiresAt }: Pick<Key, "state" | "expiresAt">) {
  const [now] = useState(() => Date.now());
  if (state === "revoked") return <StateWord tone="bad">revoked</StateWord>;
  if (state === "expired" || (expiresAt !== null && Date.parse(expiresAt) <= now))
    return <StateWord tone="bad">expired</StateWord>;
  const left = expiresAt === null ? Infinity : Date.parse(expiresAt) - now;
  if (left > SOON_MS) return <StateWord tone="good">active</StateWord>;
  return <StateWord tone="caution">{expiryText(left)}</StateWord>;
}

"use client";

import { useState } from "react";
import { StateWord } from "../../_parts/state-word";
import type { Key } from "./key";

const SOON_MS = 14 * 86_400_000;

/** Whether a key works, and for how long where that is not long. */
export function KeyState({ state, expiresAt }: Pick<Key, "state" | "expiresAt">) {
  const [now] = useState(() => Date.now());
  if (state === "revoked") return <StateWord tone="bad">revoked</StateWord>;
  if (state === "expired") return <StateWord tone="bad">expired</StateWord>;
  const left = expiresAt === null ? Infinity : Date.parse(expiresAt) - now;
  if (left > SOON_MS) return <StateWord tone="good">active</StateWord>;
  const days = Math.floor(left / 86_400_000);
  return <StateWord tone="caution">{days < 1 ? "ends today" : `ends in ${days} d`}</StateWord>;
}

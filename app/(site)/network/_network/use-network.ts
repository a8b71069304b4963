"use client";

import { useCallback, useEffect, useState } from "react";
import { replaceAddress } from "../../calculate/replace-address";
import { fromText, type Network, START, toText } from "../_model/network";

const KEPT = "rhoform-network";
const KEEP_MS = 300;
/** Longest network that stands in the address; a longer one lives in this tab only. */
const LONGEST_ADDRESS = 6_000;

/** The network of this tab, behind the "#" of the address where it is short enough: a link reproduces it. */
export function useNetwork(): readonly [Network, (change: (network: Network) => Network) => void] {
  const [network, setNetwork] = useState(START);

  useEffect(() => {
    const read = () => {
      const hash = window.location.hash.slice(1);
      const linked = hash.startsWith("network=") ? fromText(decoded(hash.slice(8))) : null;
      const found = linked ?? fromText(kept());
      if (found) setNetwork((now) => (toText(now) === toText(found) ? now : found));
    };
    queueMicrotask(read);
    window.addEventListener("hashchange", read);
    return () => window.removeEventListener("hashchange", read);
  }, []);

  useEffect(() => {
    if (network === START) return;
    const timer = setTimeout(() => {
      const text = toText(network);
      try {
        window.sessionStorage.setItem(KEPT, text);
      } catch {
        // Without a store the address has it.
      }
      const hash = `network=${encodeURIComponent(text)}`;
      const address = hash.length <= LONGEST_ADDRESS ? `#${hash}` : "";
      replaceAddress(`${window.location.pathname}${address}`);
    }, KEEP_MS);
    return () => clearTimeout(timer);
  }, [network]);

  return [network, useCallback((change) => setNetwork(change), [])];
}

function kept(): string {
  try {
    return window.sessionStorage.getItem(KEPT) ?? "";
  } catch {
    return "";
  }
}

function decoded(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return "";
  }
}

"use client";

import { useCallback, useEffect, useState } from "react";
import { replaceAddress } from "../../calculate/replace-address";
import { fromText, type Network, networkFromHash, networkHash, START, toText } from "../_model/network";

const KEPT = "rhoform-network";
const KEEP_MS = 300;

/** The network of this tab, behind the "#" of the address where it is short enough: a link reproduces it. */
export function useNetwork(): readonly [Network, (change: (network: Network) => Network) => void] {
  const [network, setNetwork] = useState(START);

  useEffect(() => {
    const read = () => {
      const found = networkFromHash(window.location.hash.slice(1)) ?? fromText(kept());
      if (found) setNetwork((now) => (toText(now) === toText(found) ? now : found));
    };
    queueMicrotask(read);
    window.addEventListener("hashchange", read);
    return () => window.removeEventListener("hashchange", read);
  }, []);

  useEffect(() => {
    if (network === START) return;
    const timer = setTimeout(() => {
      try {
        window.sessionStorage.setItem(KEPT, toText(network));
      } catch {
        // Without a store the address has it.
      }
      // A network too long for the address lives in this tab only.
      const hash = networkHash(network);
      replaceAddress(`${window.location.pathname}${hash === null ? "" : `#${hash}`}`);
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

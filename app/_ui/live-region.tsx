"use client";

import { useEffect, useState } from "react";

/** How long a text must stand before it is read, so that typing is not talked over. */
const SETTLE_MS = 700;

/** Reads a text out politely once it has settled. Not seen. */
export function LiveRegion({ text }: { readonly text: string }) {
  const [said, setSaid] = useState("");
  useEffect(() => {
    const timer = setTimeout(() => setSaid(text), SETTLE_MS);
    return () => clearTimeout(timer);
  }, [text]);
  return (
    <p role="status" aria-live="polite" className="sr-only">
      {said}
    </p>
  );
}

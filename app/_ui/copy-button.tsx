"use client";

import { useEffect, useState } from "react";
import { Button } from "./button";

type State = "idle" | "copied" | "failed";

const TEXT: Record<State, string> = { idle: "Copy", copied: "Copied", failed: "Select and copy by hand" };

/** Copies a text to the clipboard and says whether it did. */
export function CopyButton({ text, what }: { readonly text: string; readonly what: string }) {
  const [state, setState] = useState<State>("idle");

  useEffect(() => {
    if (state === "idle") return;
    const timer = setTimeout(() => setState("idle"), 2000);
    return () => clearTimeout(timer);
  }, [state]);

  async function copy() {
    try {
      await navigator.clipboard.writeText(text);
      setState("copied");
    } catch {
      setState("failed");
    }
  }

  return (
    <Button
      variant="quiet"
      onClick={copy}
      className="min-w-9"
      aria-label={state === "idle" ? `Copy ${what}` : undefined}
    >
      <span aria-live="polite">{TEXT[state]}</span>
    </Button>
  );
}

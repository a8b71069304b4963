"use client";

import { useEffect, useState } from "react";
import { Button } from "./button";

type State = "idle" | "copied" | "failed";

const TEXT: Record<State, string> = { idle: "Copy", copied: "Copied", failed: "Select and copy by hand" };

interface CopyButtonProps {
  readonly text: string;
  /** What is copied, for the button's name. */
  readonly what: string;
  /** Shown in place of "Copy", and then the button's whole name. */
  readonly label?: string;
}

/** Copies a text to the clipboard and says whether it did. */
export function CopyButton({ text, what, label }: CopyButtonProps) {
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
      aria-label={state === "idle" && !label ? `Copy ${what}` : undefined}
    >
      <span aria-live="polite">{state === "idle" ? (label ?? TEXT.idle) : TEXT[state]}</span>
    </Button>
  );
}

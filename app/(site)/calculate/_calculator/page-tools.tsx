"use client";

import { useState } from "react";
import { Link2, RotateCcw } from "lucide-react";
import type { ShapeEntry } from "@/lib/engine";
import { Button } from "../../../_ui/button";
import { splitAddress } from "../_model/address";
import { type PageState, stateQuery } from "../_model/variants";

interface PageToolsProps {
  readonly state: PageState;
  readonly entry: ShapeEntry;
  readonly onRestart: () => void;
}

/** A link to exactly this state, and the way back to the example. */
export function PageTools({ state, entry, onRestart }: PageToolsProps) {
  const [said, setSaid] = useState("");

  async function copyLink() {
    const { query, behind } = splitAddress(stateQuery(state, entry));
    const { origin, pathname } = window.location;
    try {
      await navigator.clipboard.writeText(
        `${origin}${pathname}?${query}${behind === "" ? "" : `#${behind}`}`,
      );
      setSaid("Link copied");
    } catch {
      setSaid("The address bar has the link");
    }
    setTimeout(() => setSaid(""), 2500);
  }

  return (
    <div className="flex flex-wrap items-center gap-x-0.5">
      <span role="status" className="px-1 text-small text-ink-soft">
        {said}
      </span>
      <Button variant="quiet" onClick={copyLink}>
        <Link2 aria-hidden size={16} /> Copy link
      </Button>
      <Button variant="quiet" onClick={onRestart}>
        <RotateCcw aria-hidden size={16} /> Start over
      </Button>
    </div>
  );
}

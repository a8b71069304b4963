"use client";

import { Link2, Plus, RotateCcw } from "lucide-react";
import type { ShapeEntry } from "@/lib/engine";
import { Button } from "../../../_ui/button";
import { splitAddress } from "../_model/address";
import { type PageState, stateQuery } from "../_model/variants";
import { COMPARE_ID, variantId } from "./compare/focus";
import { focusSoon } from "./focus-soon";
import { useToast } from "../../../_ui/toast";
import type { PageActions } from "./use-page-state";

interface PageToolsProps {
  readonly state: PageState;
  readonly entry: ShapeEntry;
  readonly actions: PageActions;
}

/** A second variant, a link to exactly this state, and the way back to the example. */
export function PageTools({ state, entry, actions }: PageToolsProps) {
  const toast = useToast();

  async function copyLink() {
    const { query, behind } = splitAddress(stateQuery(state, entry));
    const { origin, pathname } = window.location;
    try {
      await navigator.clipboard.writeText(
        `${origin}${pathname}?${query}${behind === "" ? "" : `#${behind}`}`,
      );
      toast("The link is copied. It reproduces this page.");
    } catch {
      toast("The browser does not let the page copy; the address bar has the link.");
    }
  }

  function restart() {
    const before = state;
    actions.restart();
    toast("The example stands again.", { undo: () => actions.restore(before) });
  }

  function addVariant() {
    actions.add();
    focusSoon(variantId(1));
  }

  return (
    <>
      {state.variants.length === 1 ? (
        <Button id={COMPARE_ID} onClick={addVariant}>
          <Plus aria-hidden size={16} /> Compare with a variant
        </Button>
      ) : null}
      <Button variant="quiet" onClick={copyLink}>
        <Link2 aria-hidden size={16} /> Copy link
      </Button>
      <Button variant="quiet" onClick={restart}>
        <RotateCcw aria-hidden size={16} /> Start over
      </Button>
    </>
  );
}

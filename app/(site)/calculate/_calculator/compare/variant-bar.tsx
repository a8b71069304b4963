"use client";

import { Plus, X } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { useToast } from "../../../../_ui/toast";
import { focusSoon } from "../focus-soon";
import { COMPARE_ID, variantId } from "./focus";
import { type PageState, VARIANT_NAMES } from "../../_model/variants";
import type { PageActions } from "../use-page-state";

interface VariantBarProps {
  readonly state: PageState;
  readonly actions: PageActions;
}

/** Which variant the fields show; a copy of it can be added and changed. */
export function VariantBar({ state, actions }: VariantBarProps) {
  const toast = useToast();
  const { active } = state;
  const count = state.variants.length;

  function remove(index: number) {
    actions.remove(index);
    focusSoon(variantId(Math.max(0, index - 1)), COMPARE_ID);
    toast(`Variant ${VARIANT_NAMES[index]} is removed.`, { undo: () => actions.restore(state) });
  }

  return (
    <div className="mt-2 flex flex-wrap items-center gap-0.5 print:hidden">
      <div role="group" aria-label="Variant shown" className="flex flex-wrap gap-0.5">
        {VARIANT_NAMES.slice(0, count).map((name, index) => (
          <span key={name} className="inline-flex">
            <Button
              id={variantId(index)}
              aria-pressed={index === active}
              variant={index === active ? "primary" : "plain"}
              onClick={() => actions.show(index)}
            >
              Variant {name}
            </Button>
            {index === active ? (
              <Button aria-label={`Remove variant ${name}`} className="px-0.5!" onClick={() => remove(index)}>
                <X aria-hidden size={15} />
              </Button>
            ) : null}
          </span>
        ))}
      </div>
      {count < VARIANT_NAMES.length ? (
        <Button
          variant="quiet"
          onClick={() => {
            actions.add();
            focusSoon(variantId(count));
          }}
        >
          <Plus aria-hidden size={15} /> Variant
        </Button>
      ) : null}
    </div>
  );
}

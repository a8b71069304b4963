"use client";

import { type KeyboardEvent, type ReactNode, useId, useRef, useState } from "react";

interface Tab {
  readonly id: string;
  readonly label: string;
  readonly content: ReactNode;
}

/** A few views of the same thing, one shown at a time; arrow keys move between them. */
export function Tabs({ label, tabs }: { readonly label: string; readonly tabs: readonly Tab[] }) {
  const [active, setActive] = useState(tabs[0].id);
  const buttons = useRef(new Map<string, HTMLButtonElement>());
  const prefix = useId();

  function move(event: KeyboardEvent) {
    const index = tabs.findIndex((tab) => tab.id === active);
    const next = {
      ArrowRight: (index + 1) % tabs.length,
      ArrowLeft: (index + tabs.length - 1) % tabs.length,
      Home: 0,
      End: tabs.length - 1,
    }[event.key];
    if (next === undefined) return;
    event.preventDefault();
    setActive(tabs[next].id);
    buttons.current.get(tabs[next].id)?.focus();
  }

  return (
    <div>
      <div
        role="tablist"
        aria-label={label}
        onKeyDown={move}
        className="flex flex-wrap gap-x-2 text-table print:hidden"
      >
        {tabs.map((tab) => (
          <button
            key={tab.id}
            ref={(element) => {
              if (element) buttons.current.set(tab.id, element);
              else buttons.current.delete(tab.id);
            }}
            type="button"
            role="tab"
            id={`${prefix}-${tab.id}`}
            aria-selected={tab.id === active}
            aria-controls={`${prefix}-panel`}
            tabIndex={tab.id === active ? 0 : -1}
            onClick={() => setActive(tab.id)}
            className="min-h-5.5 cursor-pointer border-b-3 border-transparent py-0.5 text-ink-soft medium:min-h-4 hover:text-ink aria-selected:border-copper aria-selected:font-medium aria-selected:text-ink"
          >
            {tab.label}
          </button>
        ))}
      </div>
      <div role="tabpanel" id={`${prefix}-panel`} aria-labelledby={`${prefix}-${active}`} className="mt-1">
        {tabs.find((tab) => tab.id === active)?.content}
      </div>
    </div>
  );
}

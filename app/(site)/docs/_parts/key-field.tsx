"use client";

import { useId, useState, useSyncExternalStore } from "react";
import { Button } from "../../../_ui/button";
import { keepKey, keptKey, looksLikeKey, onKeyChange } from "../../../_ui/docs-key";

/** The reader's own key, which the snippets of all pages are then copied with. It never leaves the browser. */
export function KeyField() {
  const id = useId();
  const kept = useSyncExternalStore(onKeyChange, keptKey, () => "");
  const [typed, setTyped] = useState<string | null>(null);
  const text = typed ?? kept;
  const wrong = text !== "" && !looksLikeKey(text);

  function change(value: string) {
    const stays = (value === "" || looksLikeKey(value)) && keepKey(value);
    setTyped(stays ? null : value);
  }

  return (
    <div className="grid gap-1 print:hidden">
      <label htmlFor={id} className="text-table font-medium">
        Your key
      </label>
      <div className="flex gap-1">
        <input
          id={id}
          type="text"
          value={text}
          onChange={(event) => change(event.target.value.trim())}
          autoComplete="off"
          spellCheck={false}
          placeholder="rho_…"
          aria-invalid={wrong}
          aria-describedby={`${id}-help`}
          className={`min-h-5.5 w-full min-w-0 rounded border border-edge bg-sheet px-1 font-mono text-table medium:min-h-4 ${wrong ? "" : "[-webkit-text-security:disc]"}`}
        />
        {kept === "" ? null : (
          <Button className="shrink-0" onClick={() => change("")}>
            Forget it
          </Button>
        )}
      </div>
      <p id={`${id}-help`} className={`text-small ${wrong ? "text-oxide" : "text-ink-soft"}`}>
        {wrong
          ? "A key begins with rho_ and has letters, digits, - and _ only."
          : "The calls on all pages of the docs are then copied with it, and the API reference sends it. It stays in this tab and is gone with it."}
      </p>
    </div>
  );
}

"use client";

import { useId, useState, useSyncExternalStore } from "react";
import { CodeBlock } from "../../../_ui/code-block";
import { KEY_PLACE } from "../../../_ui/docs-key";

const CHANGED = "rhoform-docs-key-changed";
const KEY = /^rho_[A-Za-z0-9_-]+$/;

function subscribe(listener: () => void): () => void {
  window.addEventListener(CHANGED, listener);
  return () => window.removeEventListener(CHANGED, listener);
}

function read(): string {
  try {
    return sessionStorage.getItem(KEY_PLACE) ?? "";
  } catch {
    // Storage may be forbidden; then the field forgets with the page.
    return "";
  }
}

/** The reader's own key, filled into the line that the other snippets rely on. It never leaves the browser. */
export function KeyField() {
  const id = useId();
  const kept = useSyncExternalStore(subscribe, read, () => "");
  const [typed, setTyped] = useState<string | null>(null);
  const text = typed ?? kept;
  const wrong = text !== "" && !KEY.test(text);

  function change(value: string) {
    setTyped(value);
    if (value !== "" && !KEY.test(value)) return;
    try {
      if (value === "") sessionStorage.removeItem(KEY_PLACE);
      else sessionStorage.setItem(KEY_PLACE, value);
      window.dispatchEvent(new Event(CHANGED));
    } catch {
      // See above.
    }
  }

  return (
    <div className="grid gap-1">
      <div className="print:hidden">
        <label htmlFor={id} className="text-table font-medium">
          Your key
        </label>
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
          className="mt-0.5 block min-h-5.5 w-full rounded border border-edge bg-sheet px-1 font-mono text-table medium:min-h-4"
        />
        <p id={`${id}-help`} className={`mt-0.5 text-small ${wrong ? "text-oxide" : "text-ink-soft"}`}>
          {wrong
            ? "A key begins with rho_ and has letters, digits, - and _ only."
            : "Filled in below and in the API reference. It stays in this tab of the browser."}
        </p>
      </div>
      <CodeBlock
        code={`export RHOFORM_KEY=${KEY.test(text) ? text : "rho_…"}`}
        label="the key, for the shell"
      />
    </div>
  );
}

"use client";

import { useState, useSyncExternalStore } from "react";
import { CodeBlock } from "../../../_ui/code-block";
import { keptKey, maskedKey, onKeyChange, withKey } from "../../../_ui/docs-key";

interface OwnCodeProps {
  readonly code: string;
  readonly label: string;
}

/** A snippet; where the tab keeps its reader's key, it is copied with that key, which is hidden until asked for. */
export function OwnCode({ code, label }: OwnCodeProps) {
  const key = useSyncExternalStore(onKeyChange, keptKey, () => "");
  const [open, setOpen] = useState(false);
  const filled = key === "" ? code : withKey(code, key);
  if (filled === code) return <CodeBlock code={code} label={label} />;
  return (
    <div>
      <CodeBlock code={open ? filled : withKey(code, maskedKey(key))} copies={filled} label={label} />
      <p className="mt-0.5 text-small text-ink-soft print:hidden">
        Copied with your key; take it out again before you share the text.{" "}
        <button type="button" onClick={() => setOpen(!open)} className="link min-h-3 cursor-pointer">
          {open ? "Hide the key" : "Show the key"}
        </button>
      </p>
    </div>
  );
}

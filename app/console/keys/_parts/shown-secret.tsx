"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "../../../_ui/button";
import { CopyButton } from "../../../_ui/copy-button";
import { Dialog } from "../../../_ui/dialog";
import { keepKey } from "../../../_ui/docs-key";
import { LocalTime } from "../../../_ui/local-time";
import type { ShownKey } from "./key";

/** The whole key, this once. Only the button closes it: a stray press must not lose it. */
export function ShownSecret({ shown, onClose }: { readonly shown: ShownKey; readonly onClose: () => void }) {
  const router = useRouter();
  const [kept, setKept] = useState(true);

  function start() {
    // Kept by the tab alone: an address would be written down on the way.
    if (keepKey(shown.key)) router.push("/docs/start");
    else setKept(false);
  }

  return (
    <Dialog
      open
      deliberate
      onOpenChange={onClose}
      title="Copy the key now"
      description="It is shown this once; only its hash is stored. Who loses it rotates the key."
      actions={
        <>
          <Button onClick={start}>Open the start page with this key</Button>
          <Button variant="primary" onClick={onClose}>
            I have copied it
          </Button>
        </>
      }
    >
      <p className="text-table">{shown.name}</p>
      <div className="mt-0.5 flex items-center gap-1 rounded border border-edge bg-paper px-1 py-0.5">
        <code data-testid="secret" className="grow text-table break-all select-all">
          {shown.key}
        </code>
        <CopyButton text={shown.key} what="the key" />
      </div>
      {shown.previousUntil ? (
        <p className="mt-1 text-table">
          The secret before counts until <LocalTime at={shown.previousUntil} />.
        </p>
      ) : null}
      {kept ? null : (
        <p role="alert" className="mt-1 text-table text-oxide">
          This browser keeps nothing for the page; copy the key and paste it there.
        </p>
      )}
      <p className="mt-1 text-table text-ink-soft">
        Send it as <code>Authorization: Bearer …</code>, from a place that only the program can read.
      </p>
    </Dialog>
  );
}

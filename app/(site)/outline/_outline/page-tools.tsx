"use client";

import dynamic from "next/dynamic";
import { useState } from "react";
import { Braces, Link2, Redo2, Undo2 } from "lucide-react";
import { Button } from "../../../_ui/button";
import { CONTROL } from "../../../_ui/field";
import { useToast } from "../../../_ui/toast";
import { sketchToHash } from "../_model/address";
import { fieldBody } from "../_model/field-body";
import { readBodyText } from "../_model/read-body";
import type { Sketch } from "../_model/sketch";
import { EMPTY_SKETCH, START_OUTLINES, startSketch } from "../_model/start-outlines";
import type { SketchState } from "./use-sketch";

const JsonDialog = dynamic(() => import("../../_live/json-dialog").then((module) => module.JsonDialog), {
  ssr: false,
});

interface PageToolsProps {
  readonly state: SketchState;
  /** Another drawing takes the place of this one. */
  readonly onReplace: (sketch: Sketch) => void;
}

/** Another drawing, a step back or forth, JSON, and a link to exactly this state. */
export function PageTools({ state, onReplace }: PageToolsProps) {
  const { sketch, undo, redo, canUndo, canRedo } = state;
  const [json, setJson] = useState(false);
  const toast = useToast();

  // Also after further steps, which a step back would take first.
  const undoReplacing = () => onReplace(sketch);

  function begin(id: string) {
    onReplace(id === "empty" ? EMPTY_SKETCH : startSketch(id));
    const title = START_OUTLINES.find((start) => start.id === id)?.title ?? "An empty board";
    toast(`“${title}” has taken the place of your drawing. Undo brings yours back.`, { undo: undoReplacing });
  }

  async function copyLink() {
    const { origin, pathname } = window.location;
    try {
      await navigator.clipboard.writeText(`${origin}${pathname}#${await sketchToHash(sketch)}`);
      toast("The link is copied. It reproduces this page.");
    } catch {
      toast("The browser does not let the page copy; the address bar has the link.");
    }
  }

  function take(text: string) {
    const reading = readBodyText(text, sketch);
    if (!reading.ok) return reading.complaints;
    setJson(false);
    onReplace(reading.sketch);
    toast("The drawing is taken over.", { undo: undoReplacing });
    return [];
  }

  return (
    <>
      <select
        aria-label="Begin with"
        value=""
        onChange={(event) => begin(event.target.value)}
        className={`${CONTROL} w-18! font-sans!`}
      >
        <option value="" disabled>
          Begin with …
        </option>
        <option value="empty">An empty board</option>
        {START_OUTLINES.map(({ id, title }) => (
          <option key={id} value={id}>
            {title}
          </option>
        ))}
      </select>
      <Button variant="quiet" aria-label="Undo" title="Undo (Ctrl+Z)" disabled={!canUndo} onClick={undo}>
        <Undo2 aria-hidden size={16} />
      </Button>
      <Button
        variant="quiet"
        aria-label="Redo"
        title="Redo (Ctrl+Shift+Z)"
        disabled={!canRedo}
        onClick={redo}
      >
        <Redo2 aria-hidden size={16} />
      </Button>
      <Button variant="quiet" onClick={() => setJson(true)}>
        <Braces aria-hidden size={16} /> JSON
      </Button>
      <Button variant="quiet" onClick={copyLink}>
        <Link2 aria-hidden size={16} /> Copy link
      </Button>
      {json ? (
        <JsonDialog
          title="Outline as JSON"
          description="An outline alone, or the whole body of POST /fields."
          body={fieldBody(sketch)}
          fileName="outline.json"
          mostMB={10}
          take={take}
          onClose={() => setJson(false)}
        />
      ) : null}
    </>
  );
}

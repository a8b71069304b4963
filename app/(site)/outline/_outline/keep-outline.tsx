"use client";

import { useState } from "react";
import { Bookmark } from "lucide-react";
import { Button, ButtonLink } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { type ErrorShown, ProblemNotice } from "../../../_ui/problem-notice";
import { TextField } from "../../../_ui/text-field";
import { newAttemptKey } from "../../_live/attempt-key";
import { ApiProblem, postApi } from "../../_live/call-api";
import type { FieldBody } from "../_model/field-body";

const AWAY = {
  title: "The outline was not kept",
  detail: "The service cannot be reached. Nothing is lost.",
};

/** Stores the drawing with its terminals for the team: for widgets, and for calls by its id. */
export function KeepOutline({
  body,
  placeOf,
}: {
  readonly body: FieldBody;
  /** How the page calls the place of what is wrong with the outline. */
  readonly placeOf: (error: ErrorShown) => string;
}) {
  const [open, setOpen] = useState(false);
  const [name, setName] = useState("");
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiProblem["problem"] | null>(null);
  const [kept, setKept] = useState<{ readonly id: string; readonly name: string } | null>(null);

  async function keep() {
    setBusy(true);
    setProblem(null);
    const { outline, terminals } = body;
    // Terminals that have no edge yet come later, with a solution or in a widget.
    const placed = terminals.filter((terminal) => "segments" in terminal || hasParts(terminal));
    try {
      const text = JSON.stringify({ name: name.trim(), outline, terminals: placed });
      setKept(
        await postApi<{ id: string; name: string }>("/outlines", text, { idempotencyKey: newAttemptKey() }),
      );
    } catch (failure) {
      setProblem(failure instanceof ApiProblem ? failure.problem : AWAY);
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button
        variant="quiet"
        onClick={() => {
          setKept(null);
          setProblem(null);
          setOpen(true);
        }}
      >
        <Bookmark aria-hidden size={16} /> Keep outline
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={kept ? "The outline is kept" : "Keep the outline"}
        description={
          kept
            ? `“${kept.name || kept.id}” stays as it is now, whatever is drawn here later.`
            : "Stores the drawing and its terminals for your team, for embeds and for calls of the API."
        }
        actions={
          kept ? (
            <>
              <Button onClick={() => setOpen(false)}>Go on here</Button>
              <ButtonLink href={`/console/embeds?outline=${kept.id}`} variant="primary" prefetch={false}>
                Make an embed of it
              </ButtonLink>
            </>
          ) : (
            <>
              <Button onClick={() => setOpen(false)}>Not now</Button>
              <Button variant="primary" onClick={() => void keep()} disabled={busy || name.trim() === ""}>
                {busy ? "Keeping …" : "Keep"}
              </Button>
            </>
          )
        }
      >
        {kept ? (
          <p className="text-table">
            By the API it is <code>{`"outlineId": "${kept.id}"`}</code> in the body of{" "}
            <code>POST /api/v1/fields</code>.
          </p>
        ) : (
          <>
            <TextField
              label="Name of the outline"
              value={name}
              maxLength={100}
              onChange={(event) => setName(event.target.value)}
              onKeyDown={(event) => {
                if (event.key === "Enter" && !busy && name.trim() !== "") void keep();
              }}
            />
            {problem ? <ProblemNotice problem={problem} placeOf={placeOf} /> : null}
          </>
        )}
      </Dialog>
    </>
  );
}

function hasParts(terminal: object): boolean {
  return "parts" in terminal && Array.isArray(terminal.parts) && terminal.parts.length > 0;
}

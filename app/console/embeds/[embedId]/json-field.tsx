"use client";

import { useState } from "react";
import { CONTROL, Field } from "../../../_ui/field";

interface JsonFieldProps {
  readonly label: string;
  readonly help: string;
  /** What opens the field where there is nothing in it yet. */
  readonly offer: string;
  readonly placeholder: string;
  readonly value: unknown;
  readonly error: string | undefined;
  /** With what was typed, once it is JSON; undefined for nothing. */
  readonly onChange: (value: unknown) => void;
}

/** A member of a definition that is given as the API takes it, in JSON. Few widgets have one: it waits behind an offer. */
export function JsonField({ label, help, offer, placeholder, value, error, onChange }: JsonFieldProps) {
  const [text, setText] = useState(() => JSON.stringify(value, null, 2) ?? "");
  const [broken, setBroken] = useState(false);
  const [shown, setShown] = useState(text !== "");
  if (!shown && error === undefined) {
    return (
      <button
        type="button"
        className="link mt-1 min-h-5.5 cursor-pointer text-table"
        onClick={() => setShown(true)}
      >
        {offer}
      </button>
    );
  }

  function take(typed: string) {
    setText(typed);
    let read: unknown;
    try {
      read = typed.trim() === "" ? undefined : JSON.parse(typed);
    } catch {
      setBroken(true);
      return;
    }
    setBroken(false);
    onChange(read);
  }

  return (
    <Field label={label} help={help} error={broken ? "is not JSON yet." : error} className="mt-1">
      {(control) => (
        <textarea
          {...control}
          rows={6}
          value={text}
          spellCheck={false}
          placeholder={placeholder}
          className={CONTROL}
          onChange={(event) => take(event.target.value)}
        />
      )}
    </Field>
  );
}

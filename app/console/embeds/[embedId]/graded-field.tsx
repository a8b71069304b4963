"use client";

import { useState } from "react";
import { CONTROL, Field } from "../../../_ui/field";
import type { Draft } from "./use-draft";

/** A graded medium as the API takes it, fixed as a whole; only where the widget has one. */
export function GradedField({ draft }: { readonly draft: Draft }) {
  const { definition, change, problems } = draft;
  const [text, setText] = useState(() => JSON.stringify(definition.graded, null, 2) ?? "");
  const [broken, setBroken] = useState(false);
  if (definition.graded === undefined && text === "") {
    return (
      <button
        type="button"
        className="link mt-1 min-h-5.5 cursor-pointer text-table"
        onClick={() => setText("{\n}")}
      >
        Fix a graded medium
      </button>
    );
  }
  const refused = problems.find(({ pointer }) => pointer.startsWith("#/graded"))?.detail;
  return (
    <Field
      label="Graded medium"
      help="As the member graded of the API, in JSON; empty for none. It takes the place of material or resistivity."
      error={broken ? "is not JSON yet." : refused}
      className="mt-1"
    >
      {(control) => (
        <textarea
          {...control}
          rows={6}
          value={text}
          spellCheck={false}
          className={CONTROL}
          onChange={(event) => {
            setText(event.target.value);
            if (event.target.value.trim() === "") {
              setBroken(false);
              change({ graded: undefined });
              return;
            }
            try {
              change({ graded: JSON.parse(event.target.value) });
              setBroken(false);
            } catch {
              setBroken(true);
            }
          }}
        />
      )}
    </Field>
  );
}

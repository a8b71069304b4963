"use client";

import { useState } from "react";
import { toleranceText } from "../../(site)/calculate/_model/tolerances";
import { CONTROL, Field } from "../../_ui/field";
import { filled, type Words } from "../_words/words";
import type { OpenTolerance } from "./frame-view";
import { refusalText } from "./input-field";
import { shownQuantity } from "./local-number";

interface ToleranceProps {
  readonly tolerance: OpenTolerance;
  /** What stands in the input's own field: a tolerance without unit is in the unit of that. */
  readonly about: string;
  readonly value: string;
  readonly error: string | undefined;
  readonly words: Words;
  readonly locale: string;
  readonly onChange: (text: string) => void;
}

/** How far an input may stray: a quantity, or a share of its value. */
export function ToleranceField(props: ToleranceProps) {
  const { tolerance, about, value, error, words, locale, onChange } = props;
  const { name, label, range } = tolerance;
  // While it is typed it stays as it is typed.
  const [draft, setDraft] = useState<string | null>(null);
  return (
    <Field
      label={filled(words.tolerance, label)}
      help={range ?? undefined}
      error={error === undefined ? undefined : refusalText(error, words, locale, range)}
      className="border-s-2 border-rule ps-1"
    >
      {(control) => (
        <span className="flex items-center gap-1">
          <span aria-hidden className="font-mono">
            ±
          </span>
          <input
            {...control}
            name={name}
            value={draft ?? shownQuantity(value, locale)}
            onChange={(event) => {
              setDraft(event.target.value);
              onChange(toleranceText(event.target.value, about));
            }}
            onBlur={() => setDraft(null)}
            type="text"
            autoComplete="off"
            autoCapitalize="off"
            spellCheck={false}
            className={CONTROL}
          />
        </span>
      )}
    </Field>
  );
}

"use client";

import { useState } from "react";
import type { InputRule } from "@/lib/embeds/definition";
import { CONTROL, Field } from "../../../_ui/field";

export interface Material {
  readonly id: string;
  readonly name: string;
}

type OpenRule = Extract<InputRule, { mode: "open" }>;

interface ChoicesProps {
  readonly rule: OpenRule;
  /** The materials to choose from; null for values that are typed. */
  readonly materials: readonly Material[] | null;
  readonly error: string | undefined;
  readonly onChange: (rule: InputRule) => void;
}

/** The list that visitors choose from: materials to tick, or one value a line. */
export function ChoicesField({ rule, materials, error, onChange }: ChoicesProps) {
  const { choices = [] } = rule;
  const [text, setText] = useState(() =>
    choices.map(({ value, label }) => (label ? `${value} | ${label}` : value)).join("\n"),
  );

  if (materials) {
    const chosen = new Map(choices.map((choice) => [choice.value, choice]));
    return (
      <fieldset className="mb-1">
        <legend className="text-table">Materials allowed</legend>
        <div className="max-h-24 overflow-y-auto rounded border border-edge bg-sheet px-1 py-0.5">
          {materials.map(({ id, name }) => (
            <label key={id} className="flex min-h-4 cursor-pointer items-center gap-1 text-table">
              <input
                type="checkbox"
                checked={chosen.has(id)}
                onChange={(event) => {
                  const next = event.target.checked
                    ? [...choices, { value: id }]
                    : choices.filter(({ value }) => value !== id);
                  onChange({ ...rule, choices: next.length > 0 ? next : [{ value: rule.value }] });
                }}
              />
              {name}
            </label>
          ))}
        </div>
        {error ? <p className="text-small text-oxide">{error}</p> : null}
      </fieldset>
    );
  }

  return (
    <Field
      label="List"
      help="One value a line; what visitors read may follow after a bar: 5 mm | thin"
      error={error}
    >
      {(control) => (
        <textarea
          {...control}
          rows={Math.min(8, Math.max(3, choices.length + 1))}
          value={text}
          spellCheck={false}
          className={CONTROL}
          onChange={(event) => {
            setText(event.target.value);
            const next = readChoices(event.target.value);
            if (next.length > 0) onChange({ ...rule, choices: next });
          }}
        />
      )}
    </Field>
  );
}

function readChoices(text: string): { value: string; label?: string }[] {
  return text.split("\n").flatMap((line) => {
    const [value, ...rest] = line.split("|").map((part) => part.trim());
    const label = rest.join("|");
    if (value === "") return [];
    return [label === "" ? { value } : { value, label }];
  });
}

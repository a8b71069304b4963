"use client";

import { type FormEvent, useState } from "react";
import { Button } from "../../../_ui/button";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { TextField } from "../../../_ui/text-field";
import { callConsole } from "../../_shell/call-console";
import { useFormErrors } from "../../_shell/use-form-errors";

interface SettingField {
  readonly name: string;
  readonly label: string;
  /** A number is sent as one. */
  readonly value: string | number;
  readonly help?: string;
}

interface SettingFormProps {
  readonly title: string;
  /** Member of the settings that the fields make up. */
  readonly group: "organisation" | "retention" | "signedOut";
  readonly fields: readonly SettingField[];
  readonly onSaved: () => Promise<void>;
}

/** One group of settings with its button. */
export function SettingForm({ title, group, fields, onSaved }: SettingFormProps) {
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const given = new FormData(form);
    setBusy(true);
    errors.clear();
    const read = ({ name, value }: SettingField) => {
      const typed = String(given.get(`${group}.${name}`) ?? "").trim();
      // What is no number goes as it was typed: the answer says what is allowed.
      return [name, typeof value === "number" && /^-?\d+(\.\d+)?$/.test(typed) ? Number(typed) : typed];
    };
    try {
      await callConsole("PATCH", "settings", { [group]: Object.fromEntries(fields.map(read)) });
      await onSaved();
    } catch (error) {
      errors.take(error, form);
    }
    setBusy(false);
  }

  return (
    <section>
      <h2 className="mb-1.5 text-h3">{title}</h2>
      <form method="post" onSubmit={save} noValidate>
        {fields.map(({ name, label, value, help }) => (
          <TextField
            key={name}
            name={`${group}.${name}`}
            label={label}
            defaultValue={value}
            prose={typeof value === "string"}
            inputMode={typeof value === "number" ? "numeric" : undefined}
            autoComplete="off"
            help={help}
            error={errors.of(`${group}.${name}`)}
          />
        ))}
        <div role="alert">{errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}</div>
        <Button type="submit" disabled={busy}>
          Save
        </Button>
      </form>
    </section>
  );
}

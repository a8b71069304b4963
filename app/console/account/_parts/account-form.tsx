"use client";

import { type FormEvent, useState } from "react";
import { Button } from "../../../_ui/button";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { TextField } from "../../../_ui/text-field";
import { callConsole } from "../../_shell/call-console";
import { useFormErrors } from "../../_shell/use-form-errors";

interface AccountField {
  readonly name: string;
  readonly label: string;
  readonly type?: "text" | "email" | "password";
  readonly value?: string;
  readonly autoComplete: string;
  readonly help?: string;
}

interface AccountFormProps {
  readonly method: "POST" | "PATCH";
  /** Below `/api/console`. */
  readonly path: string;
  readonly submit: string;
  readonly fields: readonly AccountField[];
  /** Said when it was done; then the fields are empty again. */
  readonly done?: string;
  readonly onDone: () => unknown;
}

/** A few fields that one call takes; keeps them after an error. */
export function AccountForm({ method, path, submit, fields, done, onDone }: AccountFormProps) {
  const [busy, setBusy] = useState(false);
  const [said, setSaid] = useState(false);
  const errors = useFormErrors();

  async function send(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    setBusy(true);
    setSaid(false);
    errors.clear();
    try {
      const given = new FormData(form);
      await callConsole(method, path, Object.fromEntries(fields.map(({ name }) => [name, given.get(name)])));
      if (done !== undefined) {
        form.reset();
        setSaid(true);
      }
      await onDone();
    } catch (error) {
      errors.take(error, form);
    }
    setBusy(false);
  }

  return (
    <form method="post" onSubmit={send} noValidate>
      {fields.map(({ name, label, type, value, autoComplete, help }) => (
        <TextField
          key={name}
          name={name}
          label={label}
          type={type ?? "text"}
          defaultValue={value}
          autoComplete={autoComplete}
          help={help}
          required
          error={errors.of(name)}
        />
      ))}
      <div role="alert">{errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}</div>
      <div className="flex flex-wrap items-center gap-1.5">
        <Button type="submit" disabled={busy}>
          {submit}
        </Button>
        <p role="status" className="text-table text-ink-soft">
          {said ? done : ""}
        </p>
      </div>
    </form>
  );
}

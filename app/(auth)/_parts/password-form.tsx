"use client";

import { type FormEvent, useState } from "react";
import { Button } from "../../_ui/button";
import { TextField } from "../../_ui/text-field";
import { callPage, openAnew } from "../../console/_shell/call-console";
import { useFormErrors } from "../../console/_shell/use-form-errors";
import { FormProblem } from "./form-problem";

interface PasswordFormProps {
  /** The secret of the link that was followed. */
  readonly link: string;
  readonly email: string;
  /** Asked for where the person is new. */
  readonly name?: string;
  readonly submitLabel: string;
}

/** Chooses a password by a link, and goes on into the console. */
export function PasswordForm({ link, email, name, submitLabel }: PasswordFormProps) {
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const given = new FormData(form);
    setBusy(true);
    errors.clear();
    try {
      const body = {
        link,
        password: given.get("password"),
        ...(name === undefined ? {} : { name: given.get("name") }),
      };
      const { next } = await callPage<{ next: string }>("POST", "auth/password", body);
      openAnew(next);
    } catch (error) {
      errors.take(error, form);
      setBusy(false);
    }
  }

  return (
    <form method="post" onSubmit={submit} noValidate className="mt-4">
      <input type="email" name="username" autoComplete="username" value={email} readOnly hidden />
      {name === undefined ? null : (
        <TextField
          label="Your name"
          name="name"
          autoComplete="name"
          defaultValue={name}
          required
          error={errors.of("name")}
        />
      )}
      <TextField
        label="Password"
        name="password"
        type="password"
        autoComplete="new-password"
        required
        help="12 characters or more; a few words make a good one."
        error={errors.of("password")}
      />
      <FormProblem problem={errors.general} />
      <Button type="submit" variant="primary" disabled={busy}>
        {submitLabel}
      </Button>
    </form>
  );
}

"use client";

import Link from "next/link";
import { type FormEvent, useState } from "react";
import { Button } from "../../_ui/button";
import { TextField } from "../../_ui/text-field";
import { callPage, openAnew } from "../../console/_shell/call-console";
import { useFormErrors } from "../../console/_shell/use-form-errors";
import { FormProblem } from "../_parts/form-problem";

export function SignInForm({ next }: { readonly next: string }) {
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const given = new FormData(form);
    setBusy(true);
    errors.clear();
    try {
      const body = { email: given.get("email"), password: given.get("password"), next };
      const answer = await callPage<{ next: string }>("POST", "auth/sign-in", body);
      openAnew(answer.next);
    } catch (error) {
      errors.take(error, form);
      setBusy(false);
    }
  }

  return (
    <form method="post" onSubmit={submit} noValidate className="mt-4">
      <TextField
        label="E-mail address"
        name="email"
        type="email"
        autoComplete="username"
        autoFocus
        required
        error={errors.of("email")}
      />
      <TextField
        label="Password"
        name="password"
        type="password"
        autoComplete="current-password"
        required
        error={errors.of("password")}
      />
      <FormProblem problem={errors.general} />
      <div className="mt-1 flex flex-wrap items-center justify-between gap-2">
        <Button type="submit" variant="primary" disabled={busy}>
          Sign in
        </Button>
        <Link href="/forgotten" className="link text-table">
          Forgotten password
        </Link>
      </div>
    </form>
  );
}

"use client";

import Link from "next/link";
import { type FormEvent, useState } from "react";
import { Button } from "../../_ui/button";
import { Notice } from "../../_ui/notice";
import { TextField } from "../../_ui/text-field";
import { callPage } from "../../console/_shell/call-console";
import { useFormErrors } from "../../console/_shell/use-form-errors";
import { FormProblem } from "../_parts/form-problem";

export function ResetForm() {
  const [busy, setBusy] = useState(false);
  const [sentTo, setSentTo] = useState<string | null>(null);
  const errors = useFormErrors();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const email = String(new FormData(form).get("email"));
    setBusy(true);
    errors.clear();
    try {
      await callPage("POST", "auth/reset", { email });
      setSentTo(email);
    } catch (error) {
      errors.take(error, form);
    }
    setBusy(false);
  }

  return (
    <form method="post" onSubmit={submit} noValidate className="mt-4">
      <TextField
        label="E-mail address"
        name="email"
        type="email"
        autoComplete="username"
        required
        error={errors.of("email")}
      />
      <div role="status" className="mb-1.5">
        {sentTo ? (
          <Notice title="Look into your mail">
            If {sentTo} has an account here, a link is on its way. It works once, for an hour.
          </Notice>
        ) : null}
      </div>
      <FormProblem problem={errors.general} />
      <div className="flex flex-wrap items-center justify-between gap-2">
        <Button type="submit" variant="primary" disabled={busy}>
          Send the link
        </Button>
        <Link href="/sign-in" className="link text-table">
          Back to the sign-in
        </Link>
      </div>
    </form>
  );
}

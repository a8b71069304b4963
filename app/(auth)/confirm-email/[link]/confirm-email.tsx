"use client";

import { useState } from "react";
import { Button, ButtonLink } from "../../../_ui/button";
import { callPage, ConsoleProblem } from "../../../console/_shell/call-console";
import { FormProblem } from "../../_parts/form-problem";

interface ConfirmEmailProps {
  readonly link: string;
  readonly email: string;
  readonly before: string;
}

/** A push of a button follows the link, so that programs that look into mails do not. */
export function ConfirmEmail({ link, email, before }: ConfirmEmailProps) {
  const [state, setState] = useState<"open" | "busy" | "done">("open");
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);

  async function confirm() {
    setState("busy");
    try {
      await callPage("POST", "auth/email", { link });
      setState("done");
    } catch (error) {
      if (!(error instanceof ConsoleProblem)) throw error;
      setProblem(error);
      setState("open");
    }
  }

  if (state === "done") {
    return (
      <div role="status">
        <p className="mt-2">From now on you sign in with {email}.</p>
        <p className="mt-3">
          <ButtonLink href="/console/account" variant="primary">
            To my account
          </ButtonLink>
        </p>
      </div>
    );
  }
  return (
    <>
      <p className="mt-2 mb-3">
        You will sign in with {email} in place of {before}.
      </p>
      <FormProblem problem={problem} />
      <Button variant="primary" onClick={confirm} disabled={state === "busy"}>
        Confirm the address
      </Button>
    </>
  );
}

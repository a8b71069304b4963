import type { Metadata } from "next";
import { ButtonLink } from "../../_ui/button";
import { requireSession } from "../_shell/require-session";

export const metadata: Metadata = { title: "No access" };

export default async function NoAccess() {
  const { person } = await requireSession();
  return (
    <>
      <h1>Your role does not show this page</h1>
      <p className="mt-2 max-w-prose">
        You are signed in as {person.name} with the role {person.role}. An administrator can change it.
      </p>
      <p className="mt-3">
        <ButtonLink href="/console" variant="primary">
          To the console
        </ButtonLink>
      </p>
    </>
  );
}

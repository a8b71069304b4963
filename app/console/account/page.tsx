import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";

export const metadata: Metadata = { title: "My account" };

export default async function Account() {
  const { person } = await requireSession("account.manage");
  return (
    <>
      <h1>My account</h1>
      <dl className="mt-3 grid max-w-prose grid-cols-[auto_1fr] gap-x-3 gap-y-1 text-table">
        <dt className="text-ink-soft">Name</dt>
        <dd>{person.name}</dd>
        <dt className="text-ink-soft">E-mail address</dt>
        <dd>{person.email}</dd>
        <dt className="text-ink-soft">Role</dt>
        <dd>{person.role}</dd>
        <dt className="text-ink-soft">Teams</dt>
        <dd>{person.teams.map(({ name }) => name).join(", ") || "none"}</dd>
      </dl>
    </>
  );
}

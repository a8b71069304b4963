import type { Metadata } from "next";
import { followedLink } from "../../_parts/followed-link";
import { LinkOver } from "../../_parts/link-over";
import { PasswordForm } from "../../_parts/password-form";

export const metadata: Metadata = { title: "Invitation" };

export default async function Invitation({
  params,
}: {
  readonly params: Promise<{ readonly link: string }>;
}) {
  const { link } = await params;
  const open = followedLink(link, "invitation");
  if (!open) return <LinkOver>An administrator can send another invitation.</LinkOver>;
  const { name, email } = open.person;
  return (
    <>
      <h1>Choose a password</h1>
      <p className="mt-1 text-ink-soft">You will sign in with {email}.</p>
      <PasswordForm link={link} email={email} name={name} submitLabel="Begin" />
    </>
  );
}

import type { Metadata } from "next";
import { followedLink } from "../../_parts/followed-link";
import { LinkOver } from "../../_parts/link-over";
import { PasswordForm } from "../../_parts/password-form";

export const metadata: Metadata = { title: "New password" };

export default async function NewPassword({
  params,
}: {
  readonly params: Promise<{ readonly link: string }>;
}) {
  const { link } = await params;
  const open = followedLink(link, "reset");
  if (!open) return <LinkOver>Have another one sent if you still need it.</LinkOver>;
  const { email } = open.person;
  return (
    <>
      <h1>Choose a new password</h1>
      <p className="mt-1 text-ink-soft">For {email}. All devices are signed out.</p>
      <PasswordForm link={link} email={email} submitLabel="Set the password" />
    </>
  );
}

import type { Metadata } from "next";
import { followedLink } from "../../_parts/followed-link";
import { LinkOver } from "../../_parts/link-over";
import { ConfirmEmail } from "./confirm-email";

export const metadata: Metadata = { title: "E-mail address" };

export default async function EmailPage({ params }: { readonly params: Promise<{ readonly link: string }> }) {
  const { link } = await params;
  const open = followedLink(link, "email");
  if (!open) return <LinkOver>Ask for the change again under My account.</LinkOver>;
  return (
    <>
      <h1>Confirm your e-mail address</h1>
      <ConfirmEmail link={link} email={open.link.email} before={open.person.email} />
    </>
  );
}

import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { ownPath } from "@/lib/http/own-path";
import { currentPerson } from "../../console/_shell/require-session";
import { SignInForm } from "./sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

interface SignInProps {
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

export default async function SignIn({ searchParams }: SignInProps) {
  const { next } = await searchParams;
  const onward = ownPath(typeof next === "string" ? next : undefined);
  if (await currentPerson()) redirect(onward);
  return (
    <>
      <h1>Sign in</h1>
      <p className="mt-1 text-ink-soft">Keys, usage, records and people are in the console.</p>
      <SignInForm next={onward} />
    </>
  );
}

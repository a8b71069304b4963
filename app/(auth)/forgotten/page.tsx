import type { Metadata } from "next";
import { ResetForm } from "./reset-form";

export const metadata: Metadata = { title: "Forgotten password" };

export default function Forgotten() {
  return (
    <>
      <h1>Choose a new password</h1>
      <p className="mt-1 text-ink-soft">A link for it is sent to your e-mail address.</p>
      <ResetForm />
    </>
  );
}

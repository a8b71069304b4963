import type { Metadata } from "next";
import { ButtonLink } from "../_ui/button";

export const metadata: Metadata = { title: "Nothing here" };

/** What a section answers for something that is not there, or not of the reader's teams. */
export default function NotFound() {
  return (
    <>
      <h1>Nothing at this address</h1>
      <p className="mt-2 max-w-prose">It does not exist, or it belongs to a team that is not yours.</p>
      <p className="mt-3">
        <ButtonLink href="/console" variant="primary">
          To the overview
        </ButtonLink>
      </p>
    </>
  );
}

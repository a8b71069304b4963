import type { Metadata } from "next";
import { ButtonLink } from "../_ui/button";

export const metadata: Metadata = { title: "No page here" };

/** What a page of the site answers for a shape or a record that is not there; the frame is the layout's. */
export default function NotFound() {
  return (
    <>
      <h1>Nothing at this address</h1>
      <p className="mt-2 max-w-prose">
        The link may be old or mistyped, or what it leads to was deleted or belongs to another team.
      </p>
      <p className="mt-3 flex flex-wrap gap-1.5">
        <ButtonLink href="/calculate" variant="primary">
          To the shapes
        </ButtonLink>
        <ButtonLink href="/console/records">To the records</ButtonLink>
      </p>
    </>
  );
}

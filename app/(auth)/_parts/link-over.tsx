import { ButtonLink } from "../../_ui/button";

/** In place of a page whose link was followed before, has expired or was replaced. */
export function LinkOver({ children }: { readonly children: string }) {
  return (
    <>
      <h1>This link is over</h1>
      <p className="mt-2">It was used before, has expired, or was replaced by a newer one. {children}</p>
      <p className="mt-3 flex flex-wrap gap-1.5">
        <ButtonLink href="/sign-in" variant="primary">
          Sign in
        </ButtonLink>
        <ButtonLink href="/forgotten">Send a new link</ButtonLink>
      </p>
    </>
  );
}

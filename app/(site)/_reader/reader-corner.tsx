import "server-only";
import dynamic from "next/dynamic";
import { SiteLink } from "../../_ui/site/site-link";
import { currentPerson } from "../../console/_shell/require-session";

/** Of its own, so that a signed-out reader's page does not load it. */
const ReaderMenu = dynamic(() =>
  import("../../console/_shell/reader-menu").then((module) => module.ReaderMenu),
);

/** Who is signed in, or the way to sign in, in the corner of every page. */
export async function ReaderCorner() {
  const person = await currentPerson();
  if (!person) {
    return (
      <SiteLink
        href="/sign-in"
        className="flex min-h-4 items-center rounded text-table text-ink-soft hover:text-ink hover:underline"
      >
        Sign in
      </SiteLink>
    );
  }
  const { name, email, teams, team } = person;
  return (
    <ReaderMenu name={name} email={email} teams={teams.map((each) => each.name)} team={team?.name ?? null} />
  );
}

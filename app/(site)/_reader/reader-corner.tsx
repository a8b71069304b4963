import "server-only";
import { SiteLink } from "../../_ui/site/site-link";
import { currentPerson } from "../../console/_shell/require-session";
import { LateReaderMenu } from "./late-reader-menu";

/** Who is signed in, or the way to sign in, in the corner of every page. */
export async function ReaderCorner() {
  const person = await currentPerson();
  if (!person) {
    return (
      <SiteLink
        href="/sign-in"
        className="flex min-h-5.5 items-center rounded text-table text-ink-soft hover:text-ink hover:underline medium:min-h-4"
      >
        Sign in
      </SiteLink>
    );
  }
  const { name, email, teams, team } = person;
  return (
    <LateReaderMenu
      name={name}
      email={email}
      teams={teams.map((each) => each.name)}
      team={team?.name ?? null}
    />
  );
}

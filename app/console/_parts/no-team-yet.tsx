import Link from "next/link";
import { EmptyState } from "../../_ui/states";

/** In place of an empty list, where there is no team yet that could own anything in it. */
export function NoTeamYet({ what }: { readonly what: string }) {
  return (
    <EmptyState
      title="No team yet"
      action={
        <Link className="link" href="/console/people">
          Teams, under People
        </Link>
      }
    >
      {what} belong to a team. An administrator makes the first one and says who belongs to it.
    </EmptyState>
  );
}

import type { Metadata } from "next";
import { mayAnywhere } from "@/lib/auth/permissions";
import { requireSession } from "../_shell/require-session";
import { PeopleList } from "./_parts/people-list";
import { TeamPanel } from "./_parts/team-panel";

export const metadata: Metadata = { title: "People" };

export default async function PeoplePage() {
  const { person } = await requireSession("people.view");
  return (
    <>
      <PeopleList manages={mayAnywhere(person, "people.manage")} selfId={person.personId} />
      <TeamPanel manages={mayAnywhere(person, "teams.manage")} />
    </>
  );
}

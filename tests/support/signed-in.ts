import { insertMembership, insertPerson, insertTeam, teamBySlug } from "@/db/queries/teams";
import type { Role } from "@/db/schema/organisation";
import { openSession } from "@/lib/auth/session";
import { sessionCookie } from "@/lib/auth/session-cookie";
import { newId } from "@/lib/service/identifier";
import type { Service } from "@/lib/service/service";

/** A new person of a team with an open session; what a browser sends as its cookie. */
export async function signedInCookie(
  { db, config }: Service,
  { role = "developer", team, name = "Ines Hartwell" }: { role?: Role; team: string; name?: string },
): Promise<{ name: string; value: string }> {
  if (!teamBySlug(db, team))
    insertTeam(db, { id: newId("team"), slug: team, name: team, createdAt: Date.now() });
  const personId = newId("per");
  insertPerson(db, {
    id: personId,
    email: `${personId}@merrow-pike.example`,
    name,
    role,
    createdAt: Date.now(),
  });
  insertMembership(db, personId, teamBySlug(db, team)?.id ?? "", Date.now());
  const session = openSession(db, {
    personId,
    device: "d".repeat(64),
    client: "Browser tests",
    address: "127.0.0.1",
    now: Date.now(),
  });
  const [pair] = (await sessionCookie(config, session, Date.now())).split(";");
  const cut = pair.indexOf("=");
  return { name: pair.slice(0, cut), value: pair.slice(cut + 1) };
}

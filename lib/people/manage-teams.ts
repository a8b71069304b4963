import { z } from "zod";
import { transact } from "@/db/client";
import { insertTeam, renameTeam, type Team, teamById, teamBySlug } from "@/db/queries/teams";
import { type Actor, appendActivity } from "../activity/append";
import { newId } from "../service/identifier";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";

const name = z.string().trim().min(1).max(100);

export const newTeam = z.strictObject({
  slug: z
    .string()
    .trim()
    .regex(
      /^[a-z][a-z0-9-]{1,39}$/,
      "must be 2 to 40 lower-case letters, digits and hyphens, a letter first",
    ),
  name,
});

export const teamChange = z.strictObject({ name });

/** Makes a team. Its short name is part of addresses and answers, and never changes. */
export function addTeam(service: Service, given: z.infer<typeof newTeam>, actor: Actor): Team {
  const { db } = service;
  const now = service.now();
  return transact(db, () => {
    if (teamBySlug(db, given.slug)) {
      throw new Refusal("invalid-input", `There is a team "${given.slug}" already.`, {
        errors: [{ pointer: "#/slug", detail: "belongs to another team." }],
      });
    }
    const team = { id: newId("team"), ...given, createdAt: now };
    insertTeam(db, team);
    const act = { action: "team.add", teamId: team.id, subject: { kind: "team", id: team.id }, after: given };
    appendActivity(db, actor, act, now);
    return team;
  });
}

export function changeTeam(
  service: Service,
  id: string,
  { name }: z.infer<typeof teamChange>,
  actor: Actor,
): Team {
  const { db } = service;
  const now = service.now();
  return transact(db, () => {
    const team = teamById(db, id);
    if (!team) throw new Refusal("not-found", "There is no such team.");
    if (team.name === name) return team;
    renameTeam(db, id, name);
    appendActivity(
      db,
      actor,
      {
        action: "team.rename",
        teamId: id,
        subject: { kind: "team", id },
        before: { name: team.name },
        after: { name },
      },
      now,
    );
    return { ...team, name };
  });
}

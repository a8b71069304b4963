import { and, asc, count, desc, eq, gte, inArray, like, lt, or, type SQL, sql } from "drizzle-orm";
import type { Database } from "../client";
import { embeds } from "../schema/embeds";
import { activity } from "../schema/journal";
import { keys } from "../schema/keys";
import { materials, materialVersions } from "../schema/materials";
import { people, teams } from "../schema/organisation";
import { records } from "../schema/records";
import type { ActivityRow } from "./activity";

/** An act with the names of what it concerns, as they are now. */
export interface ActivityEntry extends ActivityRow {
  readonly team: { readonly id: string; readonly name: string } | null;
  readonly subjectName: string | null;
  /** Whether the subject is still there. */
  readonly subjectPresent: boolean;
}

export interface ActivityWanted {
  /** Whose acts may be read: of these teams, and the person's own; null for all. */
  readonly readers: { readonly teamIds: readonly string[]; readonly personId: string } | null;
  readonly teamId?: string;
  /** First word of the action: `key`, `person` … */
  readonly kind?: string;
  readonly actorKind?: ActivityRow["actorKind"];
  readonly subjectId?: string;
  /** Found in who acted, in the action or in what it concerned. */
  readonly search: string;
  /** Unix ms. */
  readonly from?: number;
  readonly before?: number;
  readonly oldestFirst: boolean;
  readonly limit: number;
  readonly offset: number;
}

/** The name of what an act concerned: its present one, or the one that was kept when it was deleted. */
const NAMES: SQL[] = [
  sql`(select ${people.name} from ${people} where ${people.id} = ${activity.subjectId} and ${people.removedAt} is null)`,
  sql`(select ${keys.name} from ${keys} where ${keys.id} = ${activity.subjectId})`,
  sql`(select ${embeds.name} from ${embeds} where ${embeds.id} = ${activity.subjectId})`,
  sql`(select json_extract(${materialVersions.data}, '$.name') from ${materials} join ${materialVersions} on ${materialVersions.materialId} = ${materials.id} and ${materialVersions.version} = ${materials.version} where ${materials.id} = ${activity.subjectId})`,
  sql`(select ${records.label} from ${records} where ${records.id} = ${activity.subjectId})`,
  sql`(select ${teams.name} from ${teams} where ${teams.id} = ${activity.subjectId})`,
];
const PRESENT = sql<string | null>`coalesce(${sql.join(NAMES, sql`, `)})`;
const KEPT = sql<
  string | null
>`coalesce((select ${people.name} from ${people} where ${people.id} = ${activity.subjectId}), json_extract(${activity.before}, '$.label'))`;

function conditions(wanted: ActivityWanted): SQL | undefined {
  const { readers, teamId, kind, actorKind, subjectId, search, from, before } = wanted;
  const pattern = `%${search.replace(/[\\%_]/g, "\\$&")}%`;
  const contains = (column: SQL | typeof activity.actorName) => sql`${column} like ${pattern} escape '\\'`;
  return and(
    readers === null
      ? undefined
      : or(
          readers.teamIds.length > 0 ? inArray(activity.teamId, [...readers.teamIds]) : undefined,
          eq(activity.actorId, readers.personId),
        ),
    teamId === undefined ? undefined : eq(activity.teamId, teamId),
    kind === undefined ? undefined : like(activity.action, `${kind.replace(/[%_]/g, "")}.%`),
    actorKind === undefined ? undefined : eq(activity.actorKind, actorKind),
    subjectId === undefined ? undefined : eq(activity.subjectId, subjectId),
    from === undefined ? undefined : gte(activity.at, from),
    before === undefined ? undefined : lt(activity.at, before),
    search === ""
      ? undefined
      : or(
          contains(activity.actorName),
          contains(sql`${activity.action}`),
          contains(sql`${activity.subjectId}`),
          contains(sql`coalesce(${PRESENT}, ${KEPT}, '')`),
        ),
  );
}

/** A page of the activity, and how many acts there are in all. */
export function pageOfActivity(
  db: Database,
  wanted: ActivityWanted,
): { readonly rows: ActivityEntry[]; readonly total: number } {
  const where = conditions(wanted);
  const rows = db
    .select({
      act: activity,
      teamName: teams.name,
      present: PRESENT,
      kept: KEPT,
    })
    .from(activity)
    .leftJoin(teams, eq(teams.id, activity.teamId))
    .where(where)
    .orderBy(wanted.oldestFirst ? asc(activity.seq) : desc(activity.seq))
    .limit(wanted.limit)
    .offset(wanted.offset)
    .all()
    .map(({ act, teamName, present, kept }) => ({
      ...act,
      team: act.teamId === null ? null : { id: act.teamId, name: teamName ?? act.teamId },
      subjectName: present ?? kept,
      subjectPresent: present !== null,
    }));
  const total = db.select({ acts: count() }).from(activity).where(where).get()?.acts ?? 0;
  return { rows, total };
}

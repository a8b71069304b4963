import { z } from "zod";
import { type ActivityEntry, pageOfActivity } from "@/db/queries/activity-list";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer, listQuery, paging } from "../_server/list-query";

const day = z.iso.date();
const DAY_MS = 86_400_000;

const view = (act: ActivityEntry) => ({
  id: act.id,
  at: new Date(act.at).toISOString(),
  actor: { kind: act.actorKind, id: act.actorId, name: act.actorName },
  team: act.team,
  action: act.action,
  subject: {
    kind: act.subjectKind,
    id: act.subjectId,
    name: act.subjectName,
    present: act.subjectPresent,
  },
  before: act.before ?? null,
  after: act.after ?? null,
  address: act.address,
  requestId: act.requestId,
});

const text = (value: unknown) => (value === null || value === undefined ? null : JSON.stringify(value));

/** Who did what: of the person's teams and the person's own; everything for an administrator. */
export const GET = consoleRoute({
  action: "activity.view",
  query: listQuery(["at"], "-at").extend({
    team: z.string().max(64).optional(),
    kind: z.string().max(40).optional(),
    actor: z.enum(["key", "person", "shell", "service"]).optional(),
    subject: z.string().max(80).optional(),
    from: day.optional(),
    to: day.optional(),
  }),
  handle: ({ db, query, person, requireTeam }) => {
    if (query.team !== undefined) requireTeam(query.team);
    const { order, limit, offset } = paging(query);
    const { rows, total } = pageOfActivity(db, {
      readers: person.role === "admin" ? null : { teamIds: person.teamIds, personId: person.personId },
      teamId: query.team,
      kind: query.kind,
      actorKind: query.actor,
      subjectId: query.subject,
      search: query.q,
      from: query.from === undefined ? undefined : Date.parse(query.from),
      before: query.to === undefined ? undefined : Date.parse(query.to) + DAY_MS,
      oldestFirst: !order.descending,
      limit,
      offset,
    });
    if (!query.csv) return { rows: rows.map(view), total };
    return csvAnswer(
      "activity.csv",
      {
        at: ({ at }) => new Date(at).toISOString(),
        who: ({ actorName }) => actorName,
        "kind of actor": ({ actorKind }) => actorKind,
        "id of actor": ({ actorId }) => actorId,
        action: ({ action }) => action,
        subject: ({ subjectName, subjectId }) => subjectName ?? subjectId,
        "id of subject": ({ subjectId }) => subjectId,
        team: ({ team }) => team?.name ?? null,
        before: ({ before }) => text(before),
        after: ({ after }) => text(after),
        from: ({ address }) => address,
        request: ({ requestId }) => requestId,
      },
      rows,
    );
  },
});

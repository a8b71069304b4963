import { z } from "zod";
import { ROLES } from "@/db/schema/organisation";
import { invitation, invitePerson } from "@/lib/people/manage-people";
import { peopleViews, type PersonView } from "@/lib/people/person-view";
import { sendSoon } from "@/lib/mail/outbox";
import { json } from "../../_server/page-call";
import { consoleRoute } from "../_server/console-route";
import { csvAnswer, listQuery, paging } from "../_server/list-query";
import { invitedAnswer } from "../_server/invited-answer";

const SORTS: Readonly<Record<string, (person: PersonView) => string>> = {
  name: ({ name }) => name.toLowerCase(),
  email: ({ email }) => email,
  role: ({ role }) => String(ROLES.indexOf(role)),
  state: ({ state }) => state,
  lastSeenAt: ({ lastSeenAt }) => lastSeenAt ?? "",
  createdAt: ({ createdAt }) => createdAt,
};

/** People of the person's teams; everybody for an administrator. */
export const GET = consoleRoute({
  action: "people.view",
  query: listQuery(["name", "email", "role", "state", "lastSeenAt", "createdAt"], "name").extend({
    team: z.string().max(64).optional(),
    role: z.enum(ROLES).optional(),
    state: z.enum(["active", "invited"]).optional(),
  }),
  handle: ({ db, query, person, now, requireTeam }) => {
    if (query.team !== undefined) requireTeam(query.team);
    const seen = person.role === "admin" ? undefined : person.teamIds;
    const { order, limit, offset } = paging(query);
    const wanted = query.q.toLowerCase();
    const found = peopleViews(db, now, seen).filter(
      (each) =>
        (query.team === undefined || each.teams.some(({ id }) => id === query.team)) &&
        (query.role === undefined || each.role === query.role) &&
        (query.state === undefined || each.state === query.state) &&
        (wanted === "" || `${each.name} ${each.email}`.toLowerCase().includes(wanted)),
    );
    const by = SORTS[order.by];
    found.sort((a, b) => by(a).localeCompare(by(b), "en") * (order.descending ? -1 : 1));
    const rows = found.slice(offset, offset + limit);
    if (!query.csv) return { rows, total: found.length };
    return csvAnswer(
      "people.csv",
      {
        name: ({ name }) => name,
        "e-mail": ({ email }) => email,
        role: ({ role }) => role,
        teams: ({ teams }) => teams.map(({ slug }) => slug).join(" "),
        state: ({ state }) => state,
        added: ({ createdAt }) => createdAt,
        "last seen": ({ lastSeenAt }) => lastSeenAt,
      },
      rows,
    );
  },
});

/** Invites somebody. */
export const POST = consoleRoute({
  action: "people.manage",
  body: invitation,
  handle: ({ service, body, actor }) => {
    const invited = invitePerson(service, body, actor);
    sendSoon(service);
    return json(invitedAnswer(service, invited), 201);
  },
});

import { changePerson, personChange, removePerson } from "@/lib/people/manage-people";
import { consoleRoute } from "../../_server/console-route";

/** Changes name, role or teams. */
export const PATCH = consoleRoute({
  action: "people.manage",
  body: personChange,
  handle: ({ service, params, body, actor }) => changePerson(service, params.id, body, actor),
});

/** Removes a person; keys and records stay with their teams. */
export const DELETE = consoleRoute({
  action: "people.manage",
  handle: ({ service, params, actor }) => removePerson(service, params.id, actor),
});

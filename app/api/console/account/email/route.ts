import { z } from "zod";
import { requestEmailChange } from "@/lib/auth/account";
import { emailAddress } from "@/lib/people/manage-people";
import { consoleRoute } from "../../_server/console-route";

/** Begins the change of one's own e-mail address: it counts once it is confirmed by the link that goes there. */
export const POST = consoleRoute({
  action: "account.manage",
  body: z.strictObject({ currentPassword: z.string().max(1000), email: emailAddress }),
  handle: async ({ service, person, actor, body }) => {
    await requestEmailChange(service, { ...person, actor }, body);
  },
});

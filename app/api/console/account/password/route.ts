import { z } from "zod";
import { changePassword } from "@/lib/auth/account";
import { consoleRoute } from "../../_server/console-route";

/** Changes one's own password; all other devices are signed out. */
export const POST = consoleRoute({
  action: "account.manage",
  body: z.strictObject({ currentPassword: z.string().max(1000), password: z.string().max(1000) }),
  handle: async ({ service, person, actor, body }) => {
    await changePassword(service, { ...person, actor }, body);
  },
});

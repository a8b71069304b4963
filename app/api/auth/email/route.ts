import { z } from "zod";
import { confirmEmail } from "@/lib/auth/account";
import { signInAddressBucket, spendAttempt } from "@/lib/auth/sign-in";
import { authRoute } from "../../_server/auth-route";

/** Confirms a new e-mail address by the link that went there. */
export const POST = authRoute(z.strictObject({ link: z.string().max(100) }), async ({ link }, call) => {
  await spendAttempt(call.service, [signInAddressBucket(call.address)]);
  return { email: confirmEmail(call.service, link, call) };
});

import { z } from "zod";
import { choosePassword } from "@/lib/auth/account";
import { signInAddressBucket, spendAttempt } from "@/lib/auth/sign-in";
import { authRoute } from "../../_server/auth-route";
import { json } from "../../_server/page-call";

const choice = z.strictObject({
  link: z.string().max(100),
  password: z.string().max(1000),
  name: z.string().trim().min(1).max(100).optional(),
});

/** Chooses a password by the link of an invitation or a reset, and signs in. */
export const POST = authRoute(choice, async ({ link, password, name }, call) => {
  await spendAttempt(call.service, [signInAddressBucket(call.address)]);
  const { setCookies } = await choosePassword(call.service, { secret: link, password, name }, call);
  return json({ next: "/console" }, 200, setCookies);
});

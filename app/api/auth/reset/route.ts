import { z } from "zod";
import { requestReset } from "@/lib/auth/account";
import { resetBuckets, spendAttempt } from "@/lib/auth/sign-in";
import { emailAddress } from "@/lib/people/manage-people";
import { authRoute } from "../../_server/auth-route";
import { json } from "../../_server/page-call";

/** Has a link for a new password sent; the answer is the same whether or not there is such an account. */
export const POST = authRoute(z.strictObject({ email: emailAddress }), async ({ email }, call) => {
  await spendAttempt(call.service, resetBuckets(email, call.address));
  requestReset(call.service, email, call);
  return json({}, 202);
});

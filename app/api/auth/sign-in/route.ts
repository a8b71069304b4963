import { z } from "zod";
import { signIn } from "@/lib/auth/sign-in";
import { ownPath } from "@/lib/http/own-path";
import { authRoute } from "../../_server/auth-route";
import { json } from "../../_server/page-call";

const credentials = z.strictObject({
  email: z.string().trim().min(3).max(254),
  password: z.string().min(1).max(1000),
  /** Where to go on to. */
  next: z.string().optional(),
});

/** Opens a session. */
export const POST = authRoute(credentials, async ({ next, ...given }, call) => {
  const { setCookies } = await signIn(call.service, given, call);
  return json({ next: ownPath(next) }, 200, setCookies);
});

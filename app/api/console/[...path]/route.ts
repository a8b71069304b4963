import { signedInBy } from "@/lib/auth/session";
import { Refusal } from "@/lib/service/refusal";
import { answerPageCall } from "../../_server/page-call";

/** What is no route of the console: signed out it looks like all the others. */
function answer(request: Request): Promise<Response> {
  return answerPageCall(request, async ({ service, headers, url }) => {
    if (!(await signedInBy(service, headers.get("cookie")))) {
      throw new Refusal("sign-in-required", "Sign in first.");
    }
    throw new Refusal("unknown-path", `There is nothing at ${url.pathname.slice(0, 200)}.`);
  });
}

export { answer as DELETE, answer as GET, answer as PATCH, answer as POST, answer as PUT };

import { issueSiteToken } from "@/lib/auth/site-token";
import { signedInBy } from "@/lib/auth/session";
import { requireSamePage } from "@/lib/http/same-page";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { Call } from "./call";
import { answerOf, type Answer, problemAnswer, respond } from "./respond";

/**
 * Gives a page of this service the token with which it calls the API, and says for which team. Only for pages of our
 * own origin; a browser says so itself and no script can forge it. Counts against the address.
 */
export async function answerSiteToken(request: Request, service: Service): Promise<Response> {
  const call = new Call(request, service);
  const { origin, secret } = service.config;
  let answer: Answer;
  try {
    await call.admit();
    requireSamePage(request.headers, origin);
    // Somebody without a team has nothing to compute for: their pages call as everybody's do.
    const person = await signedInBy(service, request.headers.get("cookie"));
    const token = await issueSiteToken(secret, call.now, person?.team ? person.sessionId : null);
    const value = { ...token, team: person?.team?.name ?? null };
    answer = answerOf(200, { kind: "json", value });
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    answer = problemAnswer(error, call.requestId, origin, "application/json");
  }
  return respond(answer, {
    requestId: call.requestId,
    secure: origin.startsWith("https:"),
    limits: await call.limits(),
    cors: [],
    bodyless: false,
  });
}

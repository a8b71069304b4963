import { issueSiteToken } from "@/lib/auth/site-token";
import { isOwnOrigin } from "@/lib/http/origin";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { Call } from "./call";
import { answerOf, type Answer, problemAnswer, respond } from "./respond";

/**
 * Gives a page of this service the token with which it calls the API while nobody is signed in. Only for pages of our
 * own origin; a browser says so itself and no script can forge it. Counts against the address.
 */
export async function answerSiteToken(request: Request, service: Service): Promise<Response> {
  const call = new Call(request, service);
  const { origin, secret } = service.config;
  let answer: Answer;
  try {
    await call.admit();
    requireOwnPage(request.headers, origin);
    answer = answerOf(200, { kind: "json", value: await issueSiteToken(secret, call.now) });
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

function requireOwnPage(headers: Headers, configured: string): void {
  const origin = headers.get("origin");
  const site = headers.get("sec-fetch-site");
  const own = origin !== null && isOwnOrigin(origin, headers, configured);
  if (own && (site === null || site === "same-origin")) return;
  throw new Refusal("origin-not-allowed", "This token is for pages of this service only.");
}

import "server-only";
import { isOwnOrigin } from "@/lib/http/origin";
import { addressBucket } from "@/lib/limits/quota";
import { Refusal } from "@/lib/service/refusal";
import { sharedService } from "@/lib/service/service";
import { answerPageCall, type PageCall } from "../../_server/page-call";

const HEADERS = "Authorization, Content-Type";

/** How long a browser may remember a preflight, s. */
const PREFLIGHT_SECONDS = 7200;

/**
 * One call of a widget's frame beside the API. A frame in a sandbox has the origin "null", which may read the answers:
 * everything in them is bound to the token that it sent, and there are no cookies.
 */
export async function answerFrameCall(
  request: Request,
  work: (call: PageCall) => Promise<unknown>,
): Promise<Response> {
  const response = await answerPageCall(request, async (call, limits) => {
    const { service, headers } = call;
    if (!mayRead(request)) {
      throw new Refusal("origin-not-allowed", "This call is for the frames of widgets only.");
    }
    const spending = await service.limiter.spend(
      addressBucket(call.address, service.config.addressMinuteQuota),
    );
    limits.push(spending);
    if (!spending.allowed) {
      throw new Refusal("too-many-requests", "Too many calls in this minute.", {
        headers: { "Retry-After": String(spending.resetSeconds) },
      });
    }
    if (!headers.get("authorization")) throw new Refusal("missing-credentials", "Send the widget's token.");
    return await work(call);
  });
  return readable(request, response);
}

/** The bearer token of a frame's call. */
export function frameToken({ headers }: PageCall): string {
  return /^Bearer +([^\s]+) *$/i.exec(headers.get("authorization") ?? "")?.[1] ?? "";
}

/** What a browser asks before a sandboxed frame may call. */
export function answerFramePreflight(request: Request): Response {
  const response = new Response(null, { status: 204, headers: { Allow: "OPTIONS, POST" } });
  if (mayRead(request)) {
    response.headers.set("Access-Control-Allow-Methods", "POST");
    response.headers.set("Access-Control-Allow-Headers", HEADERS);
    response.headers.set("Access-Control-Max-Age", String(PREFLIGHT_SECONDS));
  }
  return readable(request, response);
}

function mayRead(request: Request): boolean {
  const origin = request.headers.get("origin");
  if (origin === null) return false;
  return origin === "null" || isOwnOrigin(origin, request.headers, sharedService().config.origin);
}

function readable(request: Request, response: Response): Response {
  const origin = request.headers.get("origin");
  if (origin !== null && mayRead(request)) {
    response.headers.set("Access-Control-Allow-Origin", origin);
    response.headers.set("Access-Control-Expose-Headers", "Retry-After, Request-Id");
    response.headers.append("Vary", "Origin");
  }
  return response;
}

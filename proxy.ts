import { type NextRequest, NextResponse } from "next/server";
import { signedInBy } from "@/lib/auth/session";
import { embedGate, framedEmbed } from "@/api/embed-gate";
import { FRAME_HEADER } from "@/lib/embeds/frame-header";
import { contentSecurityPolicy, documentHeaders } from "@/lib/http/security-headers";
import { sharedService } from "@/lib/service/service";

/**
 * Runs before every page: the console is for those who are signed in, and every page gets a fresh nonce and the
 * security headers. Calls of the API and of our own pages are left out by the matcher: what passes here has its body read
 * first, and cut at 10 MB. They set their own headers, and `consoleRoute` asks for the session itself.
 */
export async function proxy(request: NextRequest): Promise<Response> {
  const elsewhere = await leadToSignIn(request);
  if (elsewhere) return elsewhere;
  // Written as other teams would write them, down to the policy.
  if (/^\/embed-examples(?:\/|$)/.test(request.nextUrl.pathname)) return NextResponse.next();
  const nonce = crypto.randomUUID().replaceAll("-", "");
  const secure = process.env.RHOFORM_ORIGIN?.startsWith("https:") ?? false;
  const development = process.env.NODE_ENV === "development";
  const isFrame = framedEmbed(request.nextUrl.pathname) !== undefined;
  const frame = isFrame ? embedGate(request, sharedService(), nonce, development) : undefined;
  if (frame instanceof Response) return frame;
  const policy = contentSecurityPolicy({ nonce, secure, development, frameAncestors: frame?.ancestors });

  // Next reads the nonce for its own scripts from the request's policy; pages read it from X-Nonce.
  const headers = new Headers(request.headers);
  headers.set("X-Nonce", nonce);
  headers.set("Content-Security-Policy", policy);
  headers.set(FRAME_HEADER, frame ? JSON.stringify({ locale: frame.locale, theme: frame.theme }) : "");

  const response = NextResponse.next({ request: { headers } });
  response.headers.set("Content-Security-Policy", policy);
  for (const { key, value } of documentHeaders(secure)) response.headers.set(key, value);
  return response;
}

/** Leads a signed-out reader of the console to the sign-in. */
async function leadToSignIn(request: NextRequest): Promise<Response | undefined> {
  const { nextUrl, headers } = request;
  if (!/^\/console(?:\/|$)/.test(nextUrl.pathname)) return undefined;
  if (await signedInBy(sharedService(), headers.get("cookie"))) return undefined;
  const next = encodeURIComponent(nextUrl.pathname + nextUrl.search);
  return NextResponse.redirect(new URL(`/sign-in?next=${next}`, nextUrl), 303);
}

export const config = {
  matcher: ["/((?!api/(?:v1|auth|console)(?:/|$)|_next/static/|_next/image).*)"],
};

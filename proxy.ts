import { type NextRequest, NextResponse } from "next/server";
import { contentSecurityPolicy, documentHeaders } from "@/lib/http/security-headers";

/**
 * Runs before every page: a fresh nonce and the security headers. The public API is left out by the matcher, since a
 * proxied body would be cut at 10 MB; it sets its own headers.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = crypto.randomUUID().replaceAll("-", "");
  const secure = process.env.RHOFORM_ORIGIN?.startsWith("https:") ?? false;
  const policy = contentSecurityPolicy({
    nonce,
    secure,
    development: process.env.NODE_ENV === "development",
  });

  // Next reads the nonce for its own scripts from the request's policy; pages read it from X-Nonce.
  const headers = new Headers(request.headers);
  headers.set("X-Nonce", nonce);
  headers.set("Content-Security-Policy", policy);

  const response = NextResponse.next({ request: { headers } });
  response.headers.set("Content-Security-Policy", policy);
  for (const { key, value } of documentHeaders(secure)) response.headers.set(key, value);
  return response;
}

export const config = {
  matcher: ["/((?!api/v1(?:/|$)|_next/static/|_next/image).*)"],
};

import { createHash } from "node:crypto";
import { errors, jwtVerify, SignJWT } from "jose";
import type { Config } from "../config/environment";
import { deriveKey } from "../config/secret";
import { randomText } from "../service/identifier";

/** Names of our cookies; behind https with the prefix that ties a cookie to this very host. */
const SESSION = "rhoform-session";
const DEVICE = "rhoform-device";

const AUDIENCE = "rhoform:session";
const DEVICE_SECONDS = 400 * 86_400;

const KEYS = new Map<string, Uint8Array>();

function signingKey(secret: string): Uint8Array {
  let key = KEYS.get(secret);
  if (!key) KEYS.set(secret, (key = deriveKey(secret, "session cookie")));
  return key;
}

type Where = Pick<Config, "origin" | "secret">;

const isSecure = ({ origin }: Pick<Config, "origin">) => origin.startsWith("https:");

/** Name of the session's cookie at that origin. */
export function sessionCookieName(config: Pick<Config, "origin">): string {
  return isSecure(config) ? `__Host-${SESSION}` : SESSION;
}

function setCookie(config: Where, name: string, value: string, seconds: number): string {
  const secure = isSecure(config);
  return [
    `${secure ? "__Host-" : ""}${name}=${value}`,
    "Path=/",
    `Max-Age=${seconds}`,
    "HttpOnly",
    "SameSite=Lax",
    ...(secure ? ["Secure"] : []),
  ].join("; ");
}

/** `Set-Cookie` of a session that lasts until `expiresAt` (Unix ms). */
export async function sessionCookie(
  config: Where,
  session: { readonly id: string; readonly personId: string; readonly expiresAt: number },
  now: number,
): Promise<string> {
  const token = await new SignJWT({ sid: session.id })
    .setProtectedHeader({ alg: "HS256", typ: "session+jwt" })
    .setSubject(session.personId)
    .setAudience(AUDIENCE)
    .setIssuedAt(Math.floor(now / 1000))
    .setExpirationTime(Math.floor(session.expiresAt / 1000))
    .sign(signingKey(config.secret));
  return setCookie(config, SESSION, token, Math.max(0, Math.floor((session.expiresAt - now) / 1000)));
}

/** `Set-Cookie` that takes the session's cookie away. */
export function clearedSessionCookie(config: Where): string {
  return setCookie(config, SESSION, "", 0);
}

/** The ids in the session's cookie of a call, if it is ours and not over; whether the session still is, the table says. */
export async function sessionInCookie(
  config: Where,
  cookieHeader: string | null,
  now: number,
): Promise<{ readonly id: string; readonly personId: string } | undefined> {
  const token = cookieValue(cookieHeader, sessionCookieName(config));
  if (!token) return undefined;
  try {
    const { payload } = await jwtVerify<{ sid?: unknown }>(token, signingKey(config.secret), {
      algorithms: ["HS256"],
      typ: "session+jwt",
      audience: AUDIENCE,
      currentDate: new Date(now),
      requiredClaims: ["exp", "sub", "sid"],
    });
    const { sid, sub } = payload;
    return typeof sid === "string" && sub !== undefined ? { id: sid, personId: sub } : undefined;
  } catch (error) {
    if (error instanceof errors.JOSEError) return undefined;
    throw error;
  }
}

/** A browser's own mark, by which it is known again at the next sign-in: what to set, and what is kept of it. */
export function deviceOf(config: Where, cookieHeader: string | null): { setCookie: string; hash: string } {
  const known = cookieValue(cookieHeader, `${isSecure(config) ? "__Host-" : ""}${DEVICE}`);
  const mark = known && /^[0-9A-Za-z]{32}$/.test(known) ? known : randomText(32);
  return {
    setCookie: setCookie(config, DEVICE, mark, DEVICE_SECONDS),
    hash: createHash("sha256").update(mark).digest("hex"),
  };
}

function cookieValue(header: string | null, name: string): string | undefined {
  for (const part of (header ?? "").split(";")) {
    const [key, ...value] = part.trim().split("=");
    if (key === name) return value.join("=");
  }
  return undefined;
}

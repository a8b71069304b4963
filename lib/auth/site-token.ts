import { errors, jwtVerify, SignJWT } from "jose";
import { deriveKey } from "../config/secret";

/** How long a page's token lasts, s; a page asks for the next one before. */
export const SITE_TOKEN_SECONDS = 900;

const PURPOSE = "rhoform:site";
const SIGNED_OUT = "signed-out";
const SIGNED_IN = "session";

const KEYS = new Map<string, Uint8Array>();

function signingKey(secret: string): Uint8Array {
  let key = KEYS.get(secret);
  if (!key) KEYS.set(secret, (key = deriveKey(secret, "site token")));
  return key;
}

/**
 * A token with which a page of our own calls the API: for the session that is open in the browser, or for nobody.
 * `now` is Unix ms.
 */
export async function issueSiteToken(
  secret: string,
  now: number,
  sessionId: string | null = null,
): Promise<{ token: string; expiresAt: string }> {
  const issued = Math.floor(now / 1000);
  const expires = issued + SITE_TOKEN_SECONDS;
  const token = await new SignJWT(sessionId === null ? {} : { sid: sessionId })
    .setProtectedHeader({ alg: "HS256", typ: "site+jwt" })
    .setSubject(sessionId === null ? SIGNED_OUT : SIGNED_IN)
    .setAudience(PURPOSE)
    .setIssuedAt(issued)
    .setExpirationTime(expires)
    .sign(signingKey(secret));
  return { token, expiresAt: new Date(expires * 1000).toISOString() };
}

/** Whether a token is ours, meant for this and not yet over; then the session it stands for, if any. */
export async function checkSiteToken(
  secret: string,
  token: string,
  now: number,
): Promise<{ readonly sessionId: string | null } | "expired" | "wrong"> {
  try {
    const { payload } = await jwtVerify<{ sid?: unknown }>(token, signingKey(secret), {
      algorithms: ["HS256"],
      typ: "site+jwt",
      audience: PURPOSE,
      currentDate: new Date(now),
      requiredClaims: ["exp"],
    });
    if (payload.sub === SIGNED_OUT) return { sessionId: null };
    return payload.sub === SIGNED_IN && typeof payload.sid === "string"
      ? { sessionId: payload.sid }
      : "wrong";
  } catch (error) {
    return error instanceof errors.JWTExpired ? "expired" : "wrong";
  }
}

import { errors, jwtVerify, SignJWT } from "jose";
import { deriveKey } from "../config/secret";

/** How long a page's token lasts, s; a page asks for the next one before. */
export const SITE_TOKEN_SECONDS = 900;

const PURPOSE = "rhoform:site";

const KEYS = new Map<string, Uint8Array>();

function signingKey(secret: string): Uint8Array {
  let key = KEYS.get(secret);
  if (!key) KEYS.set(secret, (key = deriveKey(secret, "site token")));
  return key;
}

/** A token with which a page of our own calls the API while nobody is signed in. `now` is Unix ms. */
export async function issueSiteToken(
  secret: string,
  now: number,
): Promise<{ token: string; expiresAt: string }> {
  const issued = Math.floor(now / 1000);
  const expires = issued + SITE_TOKEN_SECONDS;
  const token = await new SignJWT({})
    .setProtectedHeader({ alg: "HS256", typ: "site+jwt" })
    .setSubject("signed-out")
    .setAudience(PURPOSE)
    .setIssuedAt(issued)
    .setExpirationTime(expires)
    .sign(signingKey(secret));
  return { token, expiresAt: new Date(expires * 1000).toISOString() };
}

/** Whether a token is ours, meant for this and not yet over. */
export async function checkSiteToken(
  secret: string,
  token: string,
  now: number,
): Promise<"valid" | "expired" | "wrong"> {
  try {
    const { payload } = await jwtVerify(token, signingKey(secret), {
      algorithms: ["HS256"],
      typ: "site+jwt",
      audience: PURPOSE,
      subject: "signed-out",
      currentDate: new Date(now),
      requiredClaims: ["exp"],
    });
    return payload.sub === "signed-out" ? "valid" : "wrong";
  } catch (error) {
    return error instanceof errors.JWTExpired ? "expired" : "wrong";
  }
}

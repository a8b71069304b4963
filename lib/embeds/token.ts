import { errors, jwtVerify, SignJWT } from "jose";
import { z } from "zod";
import { deriveKey } from "../config/secret";

/** How long a widget's token lasts, s; the widget asks for the next one before. */
export const EMBED_TOKEN_SECONDS = 600;

const PURPOSE = "rhoform:embed";
const TYPE = "embed+jwt";

/** What a widget's token is bound to. */
export interface EmbedToken {
  readonly embedId: string;
  readonly version: number;
  /** Origin of the page around the widget, for the usage; empty where the browser did not tell it. */
  readonly host: string;
  /** A signed-in person looks at a draft in the console. */
  readonly preview: boolean;
}

const claims = z.object({
  sub: z.string(),
  ver: z.int().min(1),
  host: z.string().max(200),
  pre: z.boolean(),
});

const KEYS = new Map<string, Uint8Array>();

function signingKey(secret: string): Uint8Array {
  let key = KEYS.get(secret);
  if (!key) KEYS.set(secret, (key = deriveKey(secret, "embed token")));
  return key;
}

/** A token with which one widget's frame calls the API. `now` is Unix ms. */
export async function issueEmbedToken(
  secret: string,
  { embedId, version, host, preview }: EmbedToken,
  now: number,
): Promise<{ token: string; expiresAt: string }> {
  const issued = Math.floor(now / 1000);
  const expires = issued + EMBED_TOKEN_SECONDS;
  const token = await new SignJWT({ ver: version, host, pre: preview })
    .setProtectedHeader({ alg: "HS256", typ: TYPE })
    .setSubject(embedId)
    .setAudience(PURPOSE)
    .setIssuedAt(issued)
    .setExpirationTime(expires)
    .sign(signingKey(secret));
  return { token, expiresAt: new Date(expires * 1000).toISOString() };
}

/** Whether a token looks like a widget's, before its signature is looked at. */
export function isEmbedToken(token: string): boolean {
  try {
    const header: unknown = JSON.parse(Buffer.from(token.split(".")[0], "base64url").toString("utf8"));
    return typeof header === "object" && header !== null && "typ" in header && header.typ === TYPE;
  } catch {
    return false;
  }
}

/**
 * What a token of ours is bound to.
 * @param graceSeconds How long after its end it still counts: only for asking for the next one.
 */
export async function readEmbedToken(
  secret: string,
  token: string,
  now: number,
  graceSeconds = 0,
): Promise<EmbedToken | "expired" | "wrong"> {
  try {
    const { payload } = await jwtVerify(token, signingKey(secret), {
      algorithms: ["HS256"],
      typ: TYPE,
      audience: PURPOSE,
      currentDate: new Date(now),
      clockTolerance: graceSeconds,
      requiredClaims: ["exp", "sub"],
    });
    const read = claims.safeParse(payload);
    if (!read.success) return "wrong";
    const { sub, ver, host, pre } = read.data;
    return { embedId: sub, version: ver, host, preview: pre };
  } catch (error) {
    return error instanceof errors.JWTExpired ? "expired" : "wrong";
  }
}

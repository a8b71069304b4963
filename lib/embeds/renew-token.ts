import { embedById } from "@/db/queries/embeds";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";
import { embedState } from "./embed-view";
import { issueEmbedToken, readEmbedToken } from "./token";

/** A page may lie open that long and still renew its token, s: a weekend and more. */
const GRACE_SECONDS = 30 * 86_400;

/**
 * The next token for one that is about to end or has ended.
 * @throws Refusal 401 for what is none of ours, 409 where pages show another version by now, 410 where none.
 */
export async function renewEmbedToken(
  { db, config }: Service,
  token: string,
  now: number,
): Promise<{ token: string; expiresAt: string }> {
  const read = await readEmbedToken(config.secret, token, now, GRACE_SECONDS);
  const row = typeof read === "string" ? undefined : embedById(db, read.embedId);
  if (typeof read === "string" || !row) {
    throw new Refusal("invalid-token", "The token is over for good, or not one of this service: reload.");
  }
  if (!read.preview) {
    if (embedState(row) === "withdrawn") {
      throw new Refusal("embed-withdrawn", "This widget was withdrawn by the team that owns it.");
    }
    if (row.publishedVersion !== read.version) {
      throw new Refusal("version-conflict", "Another version of the widget is shown by now: reload.");
    }
  }
  return issueEmbedToken(config.secret, read, now);
}

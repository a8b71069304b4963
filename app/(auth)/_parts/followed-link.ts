import "server-only";
import { type OpenLink, openLink } from "@/lib/auth/links";
import type { LinkKind } from "@/db/schema/sign-in";
import { sharedService } from "@/lib/service/service";

/** What a followed link is for, if it is not over; looking at it does not use it up. */
export function followedLink(secret: string, kind: LinkKind): OpenLink | undefined {
  const { db, now } = sharedService();
  return openLink(db, secret, [kind], now());
}

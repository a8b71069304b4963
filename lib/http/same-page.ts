import { Refusal } from "../service/refusal";
import { isOwnOrigin } from "./origin";

/**
 * Refuses what another site's page has a browser send: a change must come from a page of our own. A browser says so
 * itself in `Origin` and `Sec-Fetch-Site`, which no script can forge.
 */
export function requireSamePage(headers: Headers, configured: string): void {
  const origin = headers.get("origin");
  const site = headers.get("sec-fetch-site");
  const own = origin !== null && isOwnOrigin(origin, headers, configured);
  if (own && (site === null || site === "same-origin")) return;
  throw new Refusal("origin-not-allowed", "This call is for pages of this service only.");
}

/** For reading: refuses what a browser fetches on behalf of another site. */
export function refuseOtherSites(headers: Headers): void {
  const site = headers.get("sec-fetch-site");
  if (site === null || site === "same-origin" || site === "none") return;
  throw new Refusal("origin-not-allowed", "This call is for pages of this service only.");
}

import { indexPage } from "./_pages/documents";
import { newNonce, page, usualPolicy } from "./_pages/page-response";

/** The list of pages with widgets; the widget that the address names goes on to them. */
export function GET(request: Request): Response {
  const nonce = newNonce();
  const asked = new URL(request.url).searchParams.get("embed") ?? undefined;
  return page(indexPage(nonce, asked), 200, usualPolicy(nonce));
}

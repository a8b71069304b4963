import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage } from "node:http";
import { PEER_HEADER } from "./client-address";

const PREPARED = Symbol.for("rhoform.incoming-requests");
type Holder = typeof globalThis & { [PREPARED]?: true };

/**
 * From now on every request that a server of this process receives carries the address of its socket in a header of
 * ours, in place of whatever the client sent there (frameworks pass headers on where they hide the socket), and has an
 * address that can be decoded (frameworks fail on one that cannot).
 */
export function prepareIncomingRequests(): void {
  const holder: Holder = globalThis;
  if (holder[PREPARED]) return;
  holder[PREPARED] = true;
  subscribe("http.server.request.start", (message) => {
    const { request } = message as { readonly request: IncomingMessage };
    request.headers[PEER_HEADER] = request.socket.remoteAddress ?? "";
    request.url = decodableTarget(request.url ?? "/");
  });
}

/** `/%zz` as `/%25zz`: an address that is no valid encoding is taken for what it looks like. */
export function decodableTarget(target: string): string {
  const end = target.indexOf("?");
  const path = end < 0 ? target : target.slice(0, end);
  try {
    decodeURIComponent(path);
    return target;
  } catch {
    return path.replaceAll("%", "%25") + (end < 0 ? "" : target.slice(end));
  }
}

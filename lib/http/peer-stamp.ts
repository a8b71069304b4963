import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage } from "node:http";
import { PEER_HEADER } from "./client-address";

const STAMPED = Symbol.for("rhoform.peer-stamp");
type Holder = typeof globalThis & { [STAMPED]?: true };

/**
 * From now on every request that a server of this process receives carries the address of its socket in a header of
 * ours, in place of whatever the client sent there. Frameworks pass headers on where they hide the socket.
 */
export function stampPeerAddresses(): void {
  const holder: Holder = globalThis;
  if (holder[STAMPED]) return;
  holder[STAMPED] = true;
  subscribe("http.server.request.start", (message) => {
    const { request } = message as { readonly request: IncomingMessage };
    request.headers[PEER_HEADER] = request.socket.remoteAddress ?? "";
  });
}

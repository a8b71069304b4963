import type { IncomingMessage, ServerResponse } from "node:http";
import { Readable } from "node:stream";
import type { ReadableStream as NodeStream } from "node:stream/web";
import { PEER_HEADER } from "../http/client-address";

/** Methods that no standard Request has; by another name the dispatcher refuses them as it does any unknown one. */
const FORBIDDEN: ReadonlySet<string> = new Set(["TRACE", "TRACK", "CONNECT"]);
const UNKNOWN = "UNKNOWN";

/** A request of node:http as the standard Request that the dispatcher takes. */
export function toRequest(incoming: IncomingMessage, origin: string): Request {
  const headers = new Headers();
  for (let i = 0; i < incoming.rawHeaders.length; i += 2) {
    headers.append(incoming.rawHeaders[i], incoming.rawHeaders[i + 1]);
  }
  headers.set(PEER_HEADER, incoming.socket.remoteAddress ?? "");
  const given = incoming.method ?? "GET";
  const method = FORBIDDEN.has(given) ? UNKNOWN : given;
  const target = incoming.url?.startsWith("/") ? incoming.url : "/";
  const bodyless = method === "GET" || method === "HEAD";
  return new Request(new URL(origin + target), {
    method,
    headers,
    ...(bodyless ? {} : { body: Readable.toWeb(incoming) as ReadableStream<Uint8Array>, duplex: "half" }),
  });
}

/** Writes a standard Response; a stream is passed on as it comes and cancelled when the client leaves. */
export async function writeResponse(response: Response, outgoing: ServerResponse): Promise<void> {
  outgoing.statusCode = response.status;
  for (const [name, value] of response.headers) outgoing.setHeader(name, value);
  if (!response.body) {
    outgoing.end();
    return;
  }
  const stream = Readable.fromWeb(response.body as NodeStream<Uint8Array>);
  outgoing.once("close", () => stream.destroy());
  stream.once("error", () => outgoing.destroy());
  stream.pipe(outgoing);
}

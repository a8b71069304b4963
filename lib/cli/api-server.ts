import { createServer, type Server } from "node:http";
import { BASE_PATH } from "@/api/base-path";
import { dispatch } from "@/api/dispatch";
import { registry } from "@/api/registry";
import type { Service } from "../service/service";
import { toRequest, writeResponse } from "./node-bridge";

/**
 * The API on plain node:http, without the pages: the same registry, the same dispatcher, the same answers, several
 * times the calls a second.
 */
export function createApiServer(service: Service): Server {
  const server = createServer((incoming, outgoing) => {
    const answer = async () => {
      const request = toRequest(incoming, service.config.origin);
      const { pathname } = new URL(request.url);
      if (pathname !== BASE_PATH && !pathname.startsWith(`${BASE_PATH}/`)) {
        outgoing.writeHead(404, { "Content-Type": "text/plain; charset=utf-8" });
        outgoing.end("This process serves the API only.\n");
        return;
      }
      await writeResponse(await dispatch(request, service, registry), outgoing);
    };
    answer().catch((error: unknown) => {
      // A request that cannot even be represented, such as one with a header the standard forbids.
      service.log.warn({ error: String(error) });
      if (!outgoing.headersSent) outgoing.writeHead(400, { "Content-Type": "text/plain; charset=utf-8" });
      outgoing.end();
    });
  });
  // Longer than what proxies in front usually keep, so that they never reuse a connection that is just closing.
  server.keepAliveTimeout = 65_000;
  return server;
}

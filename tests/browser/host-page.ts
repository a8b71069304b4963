import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

/** A page of another team: served from an origin of its own. */
export interface HostServer {
  /** `http://127.0.0.1:<port>`, or the same server as `localhost`, which is another site. */
  readonly origin: string;
  readonly otherSite: string;
  /** What is served from now on; a fresh path each time, so that nothing is cached. */
  readonly serve: (body: string, headers?: Readonly<Record<string, string>>) => string;
  readonly stop: () => Promise<void>;
}

export async function startHost(): Promise<HostServer> {
  const pages = new Map<string, { body: string; headers: Readonly<Record<string, string>> }>();
  const server = createServer((request: IncomingMessage, response: ServerResponse) => {
    const page = pages.get((request.url ?? "").split("?")[0]);
    // A browser asks for an icon by itself.
    if (!page) return void response.writeHead(request.url === "/favicon.ico" ? 204 : 404).end();
    response.writeHead(200, { "Content-Type": "text/html; charset=utf-8", ...page.headers }).end(page.body);
  });
  await new Promise<void>((resolve) => server.listen(0, resolve));
  const { port } = server.address() as AddressInfo;
  return {
    origin: `http://127.0.0.1:${port}`,
    otherSite: `http://localhost:${port}`,
    serve: (body, headers = {}) => {
      const path = `/${pages.size}.html`;
      pages.set(path, { body, headers });
      return path;
    },
    stop: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
}

/** A bare page with the loader; `content` stands in its body. It keeps every event of every widget. */
export function loaderPage(service: string, content: string, nonce?: string): string {
  const attribute = nonce === undefined ? "" : ` nonce="${nonce}"`;
  return `<!doctype html>
<html lang="en"><head><title>A page of another team</title></head><body>
<script${attribute}>
window.events = [];
for (const type of ["ready", "result", "error"])
  document.addEventListener("rhoform:" + type, (event) => events.push({ type, id: event.target.id, detail: event.detail }));
</script>
<script${attribute} src="${service}/embed/v1.js" async></script>
${content}
</body></html>`;
}

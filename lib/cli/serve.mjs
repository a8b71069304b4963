/** The web server of the built application, in this process, so that a signal sent to it reaches it. */
import { createServer } from "node:http";
import { followParent } from "./follow-parent.mjs";
import { ROOT } from "./setup.mjs";

/** How long running requests may take to end after a signal, ms. */
const DEADLINE = 25_000;

/**
 * Serves until a signal; then running requests end, the database is closed (by the application, as the process exits)
 * and the exit code is 0.
 * @param {{ host: string, port: number }} address
 * @returns {Promise<import("node:http").Server>} once it listens
 */
export async function serve({ host, port }) {
  const { default: next } = await import("next");
  const app = next({ dev: false, dir: ROOT, hostname: host, port });
  await app.prepare();
  const handle = app.getRequestHandler();

  let stopping = false;
  const server = createServer((request, response) => {
    if (stopping) response.setHeader("Connection", "close");
    handle(request, response);
  });
  // Longer than what proxies in front usually keep, so that they never reuse a connection that is just closing.
  server.keepAliveTimeout = 65_000;

  const stop = () => {
    if (stopping) process.exit(1);
    stopping = true;
    // Streams that would stay open for good end on this.
    process.emit("rhoform:stop");
    server.close(() => process.exit(0));
    server.closeIdleConnections();
    // Connections whose last answer is on its way now become idle only after it.
    setInterval(() => server.closeIdleConnections(), 100).unref();
    setTimeout(() => {
      server.closeAllConnections();
      process.exit(0);
    }, DEADLINE).unref();
  };
  process.on("SIGTERM", stop);
  process.on("SIGINT", stop);
  if (process.env.npm_lifecycle_event) followParent(stop);

  await new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, host, resolve);
  });
  return server;
}

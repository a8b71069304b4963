import { ConfigError, readConfig } from "../config/environment";
import { closeService, openService } from "../service/service";
import { createApiServer } from "./api-server";

/** How long running calls may take to finish after SIGTERM, ms. */
const DEADLINE_MS = 10_000;

/** `npm run api`: the API alone, on HOST and PORT. */
async function main(): Promise<void> {
  const service = openService(readConfig(process.env));
  const { host, port } = service.config;
  const server = createApiServer(service);
  const opened = service.fields.open();
  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    service.fields.close();
    server.close(() => closeService(service));
    server.closeIdleConnections();
    // Again and again: a connection whose last answer was on its way becomes idle only after it.
    setInterval(() => server.closeIdleConnections(), 100).unref();
    setTimeout(() => server.closeAllConnections(), DEADLINE_MS).unref();
  };
  process.on("SIGTERM", stop);
  process.on("SIGINT", stop);

  await opened;
  if (stopping) return;
  server.listen(port, host, () => {
    const address = server.address();
    const bound = typeof address === "object" && address ? address.port : port;
    console.log(`The API answers at http://${host.includes(":") ? `[${host}]` : host}:${bound}/api/v1`);
  });
}

main().catch((error: unknown) => {
  if (!(error instanceof ConfigError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
});

/**
 * What happens before the server starts: settings are checked, the database is migrated, the demo seeded on the first
 * start. Prints one JSON object for the start script.
 */
import { ConfigError, readConfig } from "../config/environment";
import { closeService, openService } from "../service/service";

function main(): void {
  const config = readConfig(process.env);
  const service = openService({ ...config, log: "off" });
  try {
    console.log(
      JSON.stringify({
        host: config.host,
        port: config.port,
        origin: config.origin,
        // Where this machine reaches the server, whatever its public origin.
        localBase: readConfig({ ...process.env, RHOFORM_ORIGIN: "" }).origin,
      }),
    );
  } finally {
    closeService(service);
  }
}

try {
  main();
} catch (error) {
  if (!(error instanceof ConfigError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}

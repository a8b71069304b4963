/**
 * What happens before the server starts: settings are checked, the database is migrated, the demo seeded on the first
 * start. Prints one JSON object for the start script.
 */
import { countRole } from "@/db/queries/people";
import { demoKey, demoSignIn, seedDemo } from "@/db/seed";
import { exampleRequest, findShape } from "@/lib/engine";
import { ConfigError, readConfig } from "../config/environment";
import { closeService, openService, type Service } from "../service/service";

/** Shape of the call that the start prints. */
const SHAPE = "cylindrical-shell";

interface Demo {
  readonly signIn?: { readonly email: string; readonly password: string };
  readonly key: string;
  readonly request: object;
}

/** Seeds the demo, if it is wanted, and tells what is needed to sign in and to call with its key. */
function demo(service: Service): Demo | undefined {
  if (!service.config.demo) return undefined;
  seedDemo(service);
  const key = demoKey(service);
  const shape = findShape(SHAPE);
  return key && shape ? { signIn: demoSignIn(service), key, request: exampleRequest(shape) } : undefined;
}

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
        demo: demo(service),
        administrators: countRole(service.db, "admin"),
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

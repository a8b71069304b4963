/**
 * `npm start`, from a fresh clone to a running service: install, build, migrate, seed the demo, serve, and say how to
 * call it. `--dev` serves with reloading instead.
 */
import { spawn } from "node:child_process";
import { join } from "node:path";
import {
  ROOT,
  SetupError,
  buildWorkers,
  checkNode,
  ensureBuilt,
  ensureInstalled,
  packClient,
  runNode,
} from "./setup.mjs";
import { serve } from "./serve.mjs";

const TSX = "node_modules/tsx/dist/cli.mjs";

/** Migrates, seeds and tells what the server needs to know; in a process of its own, since it is TypeScript. */
function prepare() {
  const output = runNode(TSX, ["lib/cli/prepare.ts"], { quiet: true });
  return JSON.parse(output);
}

/** Waits until the service answers; throws if it does not within a minute. */
async function answers(base) {
  let last = "there is no answer";
  for (let tries = 0; tries < 300; tries += 1) {
    try {
      const response = await fetch(`${base}/api/v1/health`);
      if (response.ok) return;
      last = `the answer is ${response.status}`;
    } catch {
      // Not listening yet.
    }
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new SetupError(`The service is not well at ${base}: ${last}. The log in the data folder says more.`);
}

/** Has the routes of the first calls loaded: a preflight needs no key and counts nowhere. */
async function loadRoutes(base) {
  for (const path of ["resistance", "fields"]) await fetch(`${base}/api/v1/${path}`, { method: "OPTIONS" });
}

function greet({ origin, demo, administrators }) {
  const lines = [`Rhoform answers at ${origin}`];
  if (demo) {
    const body = JSON.stringify(demo.request);
    if (demo.signIn) {
      lines.push("", `Demo sign-in: ${demo.signIn.email}`, `    password: ${demo.signIn.password}`);
    }
    lines.push(
      "",
      `Demo key: ${demo.key}`,
      "",
      "One call to try:",
      "",
      `curl -s ${origin}/api/v1/resistance -H 'Authorization: Bearer ${demo.key}' -H 'Content-Type: application/json' -d '${body}'`,
    );
  }
  if (administrators === 0) {
    lines.push("", "Nobody can sign in yet. The first administrator: npm run -s people -- add-admin <email>");
  }
  console.log(lines.join("\n"));
}

/** Serves from source with reloading, as a process of its own that gets our signals. */
function develop({ host, port }) {
  const next = spawn(
    process.execPath,
    [join(ROOT, "node_modules/next/dist/bin/next"), "dev", "-H", host, "-p", String(port)],
    { cwd: ROOT, stdio: "inherit", env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1" } },
  );
  for (const signal of ["SIGTERM", "SIGINT"]) process.on(signal, () => next.kill(signal));
  next.on("exit", (code) => process.exit(code ?? 0));
}

async function main() {
  const dev = process.argv.includes("--dev");
  process.chdir(ROOT);
  process.env.NEXT_TELEMETRY_DISABLED = "1";
  checkNode();
  ensureInstalled();
  if (dev) {
    buildWorkers();
    packClient();
  } else ensureBuilt();
  const settings = prepare();
  if (dev) return develop(settings);

  process.env.NODE_ENV = "production";
  try {
    await serve(settings);
  } catch (error) {
    if (error.code !== "EADDRINUSE") throw error;
    throw new SetupError(
      `${settings.host}:${settings.port} is taken by another program. Choose another port: PORT=3001 npm start`,
    );
  }
  await answers(settings.localBase);
  await loadRoutes(settings.localBase);
  greet(settings);
}

main().catch((error) => {
  console.error(error instanceof SetupError ? error.message : error);
  process.exit(1);
});

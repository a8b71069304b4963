import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";

/** A port that is free now. */
export async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  await new Promise((resolve) => server.close(resolve));
  return port;
}

export interface StartedService {
  readonly process: ChildProcess;
  readonly base: string;
  readonly dataFolder: string;
  /** What it has printed so far, both streams. */
  readonly output: () => string;
  /** Sends SIGTERM and waits; answers with the exit code. */
  readonly stop: () => Promise<number | null>;
}

interface StartOptions {
  /** Program and arguments. */
  readonly command?: readonly string[];
  /** Longest wait until it answers, ms. */
  readonly patience?: number;
  /** Folder of the project to start, this one unless a copy is meant. */
  readonly project?: string;
}

/** Starts the service as `npm start` does, on a free port and a data folder of its own; it builds first if it must. */
export async function startService(
  variables: Readonly<Record<string, string>> = {},
  {
    command = [process.execPath, "lib/cli/start.mjs"],
    patience = 300_000,
    project = process.cwd(),
  }: StartOptions = {},
): Promise<StartedService> {
  const port = await freePort();
  const folder = mkdtempSync(join(tmpdir(), "rhoform-server-"));
  const child = spawn(command[0], command.slice(1), {
    cwd: project,
    env: { ...process.env, NODE_ENV: "production", PORT: String(port), RHOFORM_DATA: folder, ...variables },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let output = "";
  const exit = new Promise<number | null>((resolve) => child.once("exit", resolve));
  const answering = new Promise<void>((resolve, reject) => {
    const timer = setTimeout(
      () => reject(new Error(`The service did not start in time:\n${output}`)),
      patience,
    );
    const read = (chunk: Buffer) => {
      output += chunk.toString();
      if (!output.includes("Rhoform answers at ")) return;
      clearTimeout(timer);
      resolve();
    };
    child.stdout.on("data", read);
    child.stderr.on("data", read);
    void exit.then(() => {
      clearTimeout(timer);
      reject(new Error(`The service ended while starting:\n${output}`));
    });
  });
  const stop = async () => {
    if (child.exitCode === null) child.kill("SIGTERM");
    const code = await exit;
    rmSync(variables.RHOFORM_DATA ?? folder, { recursive: true, force: true });
    return code;
  };
  try {
    await answering;
  } catch (error) {
    await stop();
    throw error;
  }
  return {
    process: child,
    base: `http://127.0.0.1:${port}`,
    dataFolder: variables.RHOFORM_DATA ?? folder,
    output: () => output,
    stop,
  };
}

/** Global set-up of the `server` tests: one built server for all of them, or the one that RHOFORM_TEST_BASE names. */
export default async function setup(): Promise<() => Promise<void>> {
  if (process.env.RHOFORM_TEST_BASE) return () => Promise.resolve();
  const service = await startService({ RHOFORM_DEMO: "0", RHOFORM_ADDRESS_QUOTA: "1000000" });
  process.env.RHOFORM_TEST_BASE = service.base;
  process.env.RHOFORM_TEST_DATA = service.dataFolder;
  return async () => {
    await service.stop();
  };
}

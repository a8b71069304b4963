/**
 * What the start and test scripts do before anything else can run: install the packages and build the pages, each only
 * when needed. Plain JavaScript without a dependency, since it runs before there are any.
 */
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

export const ROOT = join(dirname(fileURLToPath(import.meta.url)), "..", "..");

const OLDEST_NODE = [20, 9];

/** A reason to stop that a person can act on; its message is all that is printed. */
export class SetupError extends Error {}

export function checkNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major < OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor < OLDEST_NODE[1])) {
    throw new SetupError(
      `Rhoform needs Node ${OLDEST_NODE.join(".")} or newer; this is ${process.versions.node}.`,
    );
  }
}

/**
 * Runs a program in the project's folder and waits for it.
 * @param {string[]} argv program and arguments
 * @param {{ quiet?: boolean, env?: Record<string, string> }} [options] quiet: its output is shown only if it fails
 */
export function run([program, ...args], { quiet = false, env = {} } = {}) {
  const result = spawnSync(program, args, {
    cwd: ROOT,
    env: { ...process.env, ...env },
    stdio: ["ignore", quiet ? "pipe" : "inherit", quiet ? "pipe" : "inherit"],
    encoding: "utf8",
    maxBuffer: 1 << 28,
  });
  if (result.error) throw new SetupError(`${program} could not be run: ${result.error.message}`);
  if (result.status !== 0) {
    if (quiet) process.stderr.write(`${result.stdout}${result.stderr}`);
    throw new SetupError(`${[program, ...args].join(" ")} failed.`);
  }
  return result.stdout ?? "";
}

/** Runs a program of node_modules by its own file, so that no shell and no wrapper stands between. */
export function runNode(file, args = [], options = {}) {
  return run([process.execPath, join(ROOT, file), ...args], options);
}

/** Installs the packages of the lock file if node_modules lacks one of them or holds another version. */
export function ensureInstalled() {
  if (isInstalled()) return;
  console.error("Installing packages; this takes a few minutes, since the database library is compiled …");
  const missing = ["python3", "make", "g++"].filter((tool) => !onPath(tool));
  if (missing.length > 0) {
    throw new SetupError(
      `Compiling the database library needs ${missing.join(", ")}. On Debian: apt-get install -y python3 make g++`,
    );
  }
  run(["npm", "ci", "--include=dev", "--no-progress"], { quiet: true });
}

function isInstalled() {
  const installed = join(ROOT, "node_modules", ".package-lock.json");
  if (!existsSync(installed)) return false;
  if (!existsSync(join(ROOT, "node_modules/better-sqlite3/build/Release/better_sqlite3.node"))) return false;
  const wanted = JSON.parse(readFileSync(join(ROOT, "package-lock.json"), "utf8")).packages;
  const present = JSON.parse(readFileSync(installed, "utf8")).packages;
  return Object.entries(wanted).every(
    // Optional packages are for other machines, or for this one.
    ([path, entry]) => path === "" || entry.optional || present[path]?.version === entry.version,
  );
}

/** Whether a program of that name can be run from here. */
export function onPath(program) {
  return (process.env.PATH ?? "").split(":").some((folder) => folder && existsSync(join(folder, program)));
}

/** Folders and files that the built pages are made from. */
const SOURCES = [
  "api",
  "app",
  "db",
  "fonts",
  "lib",
  "public",
  "sdk/typescript/examples",
  "sdk/typescript/package.json",
  "sdk/typescript/README.md",
  "sdk/typescript/src",
  "sdk/typescript/tsconfig.json",
  "instrumentation.ts",
  "instrumentation-node.ts",
  "next.config.ts",
  "package-lock.json",
  "postcss.config.mjs",
  "proxy.ts",
  "tsconfig.json",
];

const STAMP = join(ROOT, ".next", "rhoform-sources");
const CLIENTS = join(ROOT, "dist", "clients");

/** Builds the pages if their sources changed since the last build. */
export function ensureBuilt() {
  const hash = hashSources();
  if (isBuilt(hash)) return;
  console.error("Building …");
  build(hash);
}

/** Whether what is built comes from the sources as they are. */
export function isBuilt(hash = hashSources()) {
  const built = [
    STAMP,
    join(ROOT, ".next", "BUILD_ID"),
    join(ROOT, "dist", "workers", "field-worker.mjs"),
    CLIENTS,
  ].every((path) => existsSync(path));
  return built && readFileSync(STAMP, "utf8") === hash;
}

/** Builds in any case, and remembers from what. */
export function build(hash = hashSources()) {
  buildWorkers();
  packClient();
  runNode("node_modules/next/dist/bin/next", ["build"], {
    quiet: true,
    env: { NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" },
  });
  writeFileSync(STAMP, hash);
}

export function buildWorkers() {
  runNode("lib/cli/build-workers.mjs", [], { quiet: true });
}

/** The TypeScript client as the docs hand it out; the same sources make the same bytes. */
export function packClient() {
  rmSync(CLIENTS, { recursive: true, force: true });
  mkdirSync(CLIENTS, { recursive: true });
  run(["npm", "pack", "./sdk/typescript", "--silent", "--pack-destination", CLIENTS], { quiet: true });
}

function hashSources() {
  const hash = createHash("sha256").update(process.version);
  const add = (path) => {
    if (path === join("lib", "cli")) return;
    const full = join(ROOT, path);
    if (!existsSync(full)) return;
    let entries;
    try {
      entries = readdirSync(full);
    } catch {
      hash.update(`${path}\0`).update(readFileSync(full)).update("\0");
      return;
    }
    for (const entry of entries.sort()) add(join(path, entry));
  };
  for (const source of SOURCES) add(source);
  return hash.digest("hex");
}

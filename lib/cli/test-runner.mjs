/**
 * `npm test`: sets itself up, then checks formatting, lint, types, generated files and the build, and runs every test.
 * The last line it prints is `N passed, N failed`, where each of those checks counts as one.
 */
import { spawn, spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { ROOT, SetupError, checkNode, ensureBuilt, ensureInstalled, onPath, run } from "./setup.mjs";

/** Debian's packages of Chromium that the browser tests can use, each at /usr/bin/<name>: the lighter first. */
const CHROMIUM = JSON.parse(readFileSync(join(ROOT, "lib", "cli", "chromium.json"), "utf8"));

function ensureChromium() {
  if (CHROMIUM.some((name) => existsSync(`/usr/bin/${name}`))) return;
  const install = ["apt-get", "install", "-y", "--no-install-recommends"];
  if (process.getuid?.() !== 0 || !onPath("apt-get")) {
    throw new SetupError(
      `The browser tests need one of ${CHROMIUM.join(", ")} in /usr/bin. On Debian: ${install.join(" ")} ${CHROMIUM.at(-1)}`,
    );
  }
  console.log("Installing Chromium for the browser tests …");
  const env = { DEBIAN_FRONTEND: "noninteractive" };
  run(["apt-get", "update"], { quiet: true, env });
  // Not every release of Debian has the lighter one.
  const known =
    CHROMIUM.find((name) => spawnSync("apt-cache", ["show", name]).status === 0) ?? CHROMIUM.at(-1);
  run([...install, known], { quiet: true, env });
}

const bin = (name) => join("node_modules", ".bin", name);

/** Checks that do not depend on each other, in lanes that run side by side: each keeps one core busy. */
const LANES = [
  [["lint", [bin("eslint"), ".", "--max-warnings", "0"]]],
  [
    ["types", [bin("tsc"), "--noEmit", "-p", "."]],
    ["format", [bin("prettier"), "--check", "--log-level", "warn", "."]],
    ["generated files", [bin("tsx"), "lib/cli/generate.ts", "--check"]],
  ],
];

/** Runs one check; what it says is shown whole once it has ended, so that two do not mingle. */
function passes([name, [program, ...args]]) {
  return new Promise((resolve) => {
    const said = [];
    const child = spawn(program, args, { cwd: ROOT, stdio: ["ignore", "pipe", "pipe"] });
    for (const stream of [child.stdout, child.stderr]) stream.on("data", (data) => said.push(data));
    const end = (passed, text) => {
      console.log(`\n── ${name}: ${passed ? "passed" : "failed"}${text ? `\n${text}` : ""}`);
      resolve(passed);
    };
    child.on("error", (error) => end(false, error.message));
    child.on("close", (status) => end(status === 0, Buffer.concat(said).toString().trimEnd()));
  });
}

/** Whether each of a lane's checks passes, one after the other. */
async function runLane(checks) {
  const results = [];
  for (const check of checks) results.push(await passes(check));
  return results;
}

/** Runs all tests and counts them from vitest's own report. */
function runTests() {
  const folder = mkdtempSync(join(tmpdir(), "rhoform-report-"));
  const report = join(folder, "report.json");
  console.log("\n── tests");
  const args = ["run", "--reporter=default", "--reporter=json", `--outputFile.json=${report}`];
  const { status } = spawnSync(bin("vitest"), args, { cwd: ROOT, stdio: ["ignore", "inherit", "inherit"] });
  try {
    const { numPassedTests, numTotalTests, success } = JSON.parse(readFileSync(report, "utf8"));
    const failed = numTotalTests - numPassedTests;
    // A file that could not be loaded, or an error between tests, fails the run without failing a test.
    const unseen = failed === 0 && (status !== 0 || !success) ? 1 : 0;
    return { passed: numPassedTests, failed: failed + unseen };
  } catch {
    return { passed: 0, failed: 1 };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

async function main() {
  process.chdir(ROOT);
  process.env.NEXT_TELEMETRY_DISABLED = "1";
  let passed = 0;
  let failed = 0;
  try {
    checkNode();
    ensureInstalled();
    ensureChromium();
    const results = (await Promise.all(LANES.map(runLane))).flat();
    passed += results.filter(Boolean).length;
    failed += results.filter((result) => !result).length;
    console.log("\n── build");
    ensureBuilt();
    passed += 1;
    const tests = runTests();
    passed += tests.passed;
    failed += tests.failed;
  } catch (error) {
    console.error(error instanceof SetupError ? error.message : error);
    failed += 1;
  }
  console.log(`${passed} passed, ${failed} failed`);
  process.exit(failed === 0 ? 0 : 1);
}

await main();

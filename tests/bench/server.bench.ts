/**
 * What a call costs through the whole service, as a share of what the framework itself allows: `POST /resistance` with
 * key, limits, checks and metering against an empty route handler of the same build, in turns, within one run.
 */
import { execFileSync, spawnSync } from "node:child_process";
import { cpSync, existsSync, mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { startService } from "../support/start-server";

export interface Throughput {
  /** Calls a second, the best round of each. */
  readonly empty: number;
  readonly resistance: number;
  readonly share: number;
  /** The share that is promised. */
  readonly limit: number;
  readonly passed: boolean;
}

const ROUNDS = 5;
const SECONDS = 4;
const CONNECTIONS = 16;
const PROMISED = 0.75;

const BODY = JSON.stringify({
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
});

/** A copy of the sources with one more route, which does nothing; the product itself has no such route. */
function copyWithEmptyRoute(): string {
  const copy = mkdtempSync(join(tmpdir(), "rhoform-bench-"));
  const left = new Set([".git", ".next", ".data", "node_modules", "backup"]);
  for (const entry of readdirSync("."))
    if (!left.has(entry)) cpSync(entry, join(copy, entry), { recursive: true });
  // Linked file by file: the bundler does not follow a link that leads out of the project.
  execFileSync("cp", ["-al", "node_modules", join(copy, "node_modules")]);
  const route = join(copy, "app/api/empty");
  mkdirSync(route, { recursive: true });
  writeFileSync(
    join(route, "route.ts"),
    "export function POST(): Response {\n  return Response.json({});\n}\n",
  );
  return copy;
}

interface AutocannonReport {
  readonly requests: { readonly average: number };
  readonly non2xx: number;
  readonly errors: number;
}

/** Calls a second over one round. */
function round(url: string, key: string): number {
  const { stdout } = spawnSync(
    process.execPath,
    [
      "node_modules/autocannon/autocannon.js",
      ...["--json", "-c", String(CONNECTIONS), "-d", String(SECONDS), "-m", "POST", "-b", BODY],
      ...["-H", "Content-Type=application/json", "-H", `Authorization=Bearer ${key}`, url],
    ],
    { encoding: "utf8", maxBuffer: 1 << 26 },
  );
  const report = JSON.parse(stdout) as AutocannonReport;
  if (report.non2xx + report.errors > 0) throw new Error(`${url} did not answer every call with a success.`);
  return report.requests.average;
}

export async function benchServer(): Promise<Throughput> {
  const copy = copyWithEmptyRoute();
  try {
    const service = await startService(
      { RHOFORM_DEMO: "1", RHOFORM_LOG: "off" },
      { patience: 600_000, project: copy },
    );
    try {
      const issue = [
        "lib/cli/keys.ts",
        "issue",
        "--team",
        "busbar",
        "--name",
        "Bench",
        "--scopes",
        "compute",
      ];
      const key = execFileSync(
        join("node_modules", ".bin", "tsx"),
        [...issue, "--minute", "1000000", "--month", "10000000"],
        { cwd: copy, encoding: "utf8", env: { ...process.env, RHOFORM_DATA: service.dataFolder } },
      ).trim();
      const empty: number[] = [];
      const resistance: number[] = [];
      round(`${service.base}/api/v1/resistance`, key);
      for (let turn = 0; turn < ROUNDS; turn += 1) {
        empty.push(round(`${service.base}/api/empty`, key));
        resistance.push(round(`${service.base}/api/v1/resistance`, key));
      }
      const best = { empty: Math.max(...empty), resistance: Math.max(...resistance) };
      const share = best.resistance / best.empty;
      return { ...best, share, limit: PROMISED, passed: share >= PROMISED };
    } finally {
      await service.stop();
    }
  } finally {
    if (existsSync(copy)) rmSync(copy, { recursive: true, force: true });
  }
}

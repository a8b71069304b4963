/**
 * What a batch costs over HTTP, as a multiple of parsing the same body, computing its items and serialising the answers
 * in process: 10,000 closed forms of mixed shapes to the process that serves the API alone, in turns with the same work
 * in this process. `npx tsx tests/bench/batch.bench.ts` prints it; `npm run bench` collects it.
 */
import { execFileSync, spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { catalogue, computeResistance, exampleRequest, InputError, libraryMaterial } from "@/lib/engine";

export interface BatchMeasurement {
  readonly overHttpMs: number;
  readonly inProcessMs: number;
  readonly ratio: number;
  readonly limit: number;
  readonly passed: boolean;
}

const ITEMS = 10_000;
const ROUNDS = 5;
const LIMIT = 2.5;
const FAMILIES = ["axial", "tapered", "radial", "spreading"];

/** Closed forms in turn, each with a temperature of its own, one in a hundred with a mistake. */
function batchText(): string {
  const requests = catalogue
    .filter(({ family, boundsBasis }) => FAMILIES.includes(family) && boundsBasis === "rounding")
    .map(exampleRequest)
    .filter((request) => computeResistance(request, { material: libraryMaterial }).method === "closed-form");
  const items = Array.from({ length: ITEMS }, (_, k) => {
    const request = requests[k % requests.length];
    return k % 100 === 99
      ? { ...request, dimensions: {} }
      : { ...request, operating: { temperature: 20 + (k % 40) } };
  });
  return JSON.stringify({ items });
}

function inProcess(text: string): string {
  const { items } = JSON.parse(text) as { items: unknown[] };
  const answers = items.map((request, index) => {
    try {
      return { index, status: 200, result: computeResistance(request, { material: libraryMaterial }) };
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
      return { index, status: 422, problem: { errors: error.errors } };
    }
  });
  return JSON.stringify({ items: answers });
}

export async function benchBatch(): Promise<BatchMeasurement> {
  const text = batchText();
  const folder = mkdtempSync(join(tmpdir(), "rhoform-batch-"));
  const port = await freePort();
  const environment = {
    ...process.env,
    RHOFORM_DATA: folder,
    RHOFORM_DEMO: "0",
    RHOFORM_LOG: "off",
    HOST: "127.0.0.1",
    PORT: String(port),
  };
  const tsx = join("node_modules", ".bin", "tsx");
  const run = (script: string, ...rest: string[]) =>
    execFileSync(tsx, [script, ...rest], { encoding: "utf8", env: environment }).trim();
  run("lib/cli/migrate.ts");
  run("lib/cli/teams.ts", "add", "bench", "--name", "Bench");
  const quotas = ["--minute", "100000", "--month", "10000000"];
  const key = run(
    "lib/cli/keys.ts",
    "issue",
    "--team",
    "bench",
    "--name",
    "Bench",
    "--scopes",
    "compute",
    ...quotas,
  );
  const server = spawn(process.execPath, ["--import", "tsx", "lib/cli/api-process.ts"], {
    env: environment,
    stdio: "ignore",
  });
  try {
    const base = `http://127.0.0.1:${port}/api/v1`;
    await untilUp(`${base}/health`);
    const overHttp = async () => {
      const response = await fetch(`${base}/resistance/batch`, {
        method: "POST",
        headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/json" },
        body: text,
      });
      const answer = await response.text();
      if (!response.ok || !answer.includes(`"answered":${ITEMS - ITEMS / 100}`))
        throw new Error(answer.slice(0, 500));
    };
    const times = { overHttp: Infinity, inProcess: Infinity };
    for (let round = 0; round < ROUNDS; round++) {
      times.overHttp = Math.min(times.overHttp, await timed(overHttp));
      times.inProcess = Math.min(times.inProcess, await timed(() => inProcess(text)));
    }
    const ratio = times.overHttp / times.inProcess;
    return {
      overHttpMs: times.overHttp,
      inProcessMs: times.inProcess,
      ratio,
      limit: LIMIT,
      passed: ratio <= LIMIT,
    };
  } finally {
    server.kill("SIGTERM");
    await once(server, "exit");
    rmSync(folder, { recursive: true, force: true });
  }
}

async function timed(work: () => unknown): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  const address = probe.address();
  probe.close();
  await once(probe, "close");
  if (typeof address !== "object" || address === null) throw new Error("No free port.");
  return address.port;
}

async function untilUp(url: string): Promise<void> {
  for (let attempt = 0; attempt < 300; attempt++) {
    const up = await fetch(url).then(
      ({ ok }) => ok,
      () => false,
    );
    if (up) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new Error(`Nothing answers at ${url}.`);
}

export function printBatch({ overHttpMs, inProcessMs, ratio, limit, passed }: BatchMeasurement): string {
  return (
    `${passed ? "ok  " : "over"} batch of ${ITEMS} closed forms over HTTP ${overHttpMs.toFixed(0)} ms, ` +
    `in process ${inProcessMs.toFixed(0)} ms: ${ratio.toFixed(2)} × (at most ${limit} ×)`
  );
}

if (process.argv[1]?.endsWith("batch.bench.ts")) {
  void benchBatch().then((measurement) => {
    process.stdout.write(`${printBatch(measurement)}\n`);
    if (!measurement.passed) process.exitCode = 1;
  });
}

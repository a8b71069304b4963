import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { build } from "esbuild";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { execute, python, type Ran } from "../sdk/support/python";
import { call, SLEEVE } from "../support/call";
import { type TestServer, startServer } from "../support/server";

let server: TestServer;
let folder: string;
let key: string;

beforeAll(async () => {
  server = await startServer({});
  folder = mkdtempSync(join(tmpdir(), "rhoform-examples-"));
  key = server.issue().key;
  const body = { ...SLEEVE, record: { label: "Sleeve, rev C" } };
  expect((await call(server, "post", "/resistance", { key, body })).status).toBe(200);
});

afterAll(async () => {
  rmSync(folder, { recursive: true });
  await server.stop();
});

const PARTS = "label,shape,length/mm,width/mm,thickness/mm,material\nRiser,bar,1200,50,10,copper-annealed\n";

async function runPython(name: string, ...args: string[]): Promise<Ran> {
  return python([resolve("sdk/python/examples", name), ...args], {
    RHOFORM_URL: server.base,
    RHOFORM_KEY: key,
  });
}

/** The example against the client's sources, as a process of its own; the service may live in this one. */
async function runTypescript(name: string, ...args: string[]): Promise<Ran> {
  const outfile = join(folder, "example.mjs");
  await build({
    entryPoints: [resolve("sdk/typescript/examples", name)],
    outfile,
    bundle: true,
    format: "esm",
    platform: "node",
    target: "node18",
    logLevel: "silent",
    alias: { "@rhoform/client": resolve("sdk/typescript/src/index.ts") },
  });
  return execute(process.execPath, [outfile, ...args], { RHOFORM_URL: server.base, RHOFORM_KEY: key });
}

describe.each([
  ["Python", runPython, "sweep.py", "parts_list.py", "replay_records.py"],
  ["TypeScript", runTypescript, "sweep.ts", "parts-list.ts", "replay-records.ts"],
] as const)("the examples in %s", (language, run, sweep, parts, replay) => {
  it("sweep a dimension", async () => {
    const { out, code, err } = await run(sweep);
    expect([code, err]).toEqual([0, ""]);
    const rows = out.trim().split("\n");
    expect(rows).toHaveLength(18);
    // R = ρ(65 °C)·1.2 m/(10 mm·10 mm), ρ = 1/58 µΩ·m·(1 + 0.00393·45).
    expect(Number(rows[1].split(",")[1])).toBeCloseTo((1.2 / 1e-4 / 58e6) * (1 + 0.00393 * 45), 8);
  });

  it("compute a parts list, and exit with 1 where a row is refused", async () => {
    const file = join(folder, "parts.csv");
    const args = language === "Python" ? [file, join(folder, "answered.csv")] : [file];
    writeFileSync(file, PARTS);
    const good = await run(parts, ...args);
    expect([good.code, good.err]).toEqual([0, ""]);
    expect(language === "Python" ? readFileSync(args[1], "utf8") : good.out).toMatch(
      /Riser.*,4\.1\d*e-5|Riser.*0\.00004/,
    );
    writeFileSync(file, `${PARTS}Link,bar,800,0,10,copper-annealed\n`);
    const bad = await run(parts, ...args);
    expect(bad.code).toBe(1);
    expect(bad.out + bad.err).toMatch(/Link.*greater than 0/);
  });

  it("replay records, and exit with 1 on drift", async () => {
    const same = await run(replay);
    expect([same.code, same.err]).toEqual([0, ""]);
    expect(same.out).toContain("1 replayed, 0 beyond");
    const strict = await run(replay, "-1");
    expect(strict.code).toBe(1);
    expect(strict.out).toContain("Sleeve, rev C");
  });
});

import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { readConfig } from "@/lib/config/environment";
import { resistanceSnippets } from "@/app/(site)/_live/snippets";
import { SHELL_START, shellRequest } from "@/app/(site)/_live/shell-request";
import { type TestServer, startServer } from "../support/server";

let server: TestServer;
let folder: string;
let environment: NodeJS.ProcessEnv;

beforeAll(async () => {
  server = await startServer();
  folder = mkdtempSync(join(tmpdir(), "rhoform-readme-"));
  environment = { ...process.env, RHOFORM_KEY: server.issue().key, PYTHONIOENCODING: "utf-8" };
});

afterAll(async () => {
  rmSync(folder, { recursive: true });
  await server.stop();
});

const README = readFileSync("README.md", "utf8");

function blocks(language: string): string[] {
  return [...README.matchAll(new RegExp("```" + language + "\\n([\\s\\S]*?)```", "g"))].map(
    ([, code]) => code,
  );
}

/** Runs a snippet as a reader would, against the server under test. */
function run(program: string, file: string, code: string): string {
  const path = join(folder, file);
  writeFileSync(path, code.replaceAll("http://127.0.0.1:3000", server.base));
  return execFileSync(program, [path], { encoding: "utf8", env: environment });
}

const RUNNERS = {
  curl: (code: string) => JSON.parse(run("sh", "call.sh", code)).resistance.text,
  TypeScript: (code: string) => run(process.execPath, "call.mjs", code),
  Python: (code: string) => run("python3", "call.py", code),
} as const;

describe("the README's calls", () => {
  it.each([
    ["curl", blocks("sh").filter((code) => code.startsWith("curl"))],
    ["TypeScript", blocks("ts")],
    ["Python", blocks("python")],
  ] as const)("%s", (name, found) => {
    expect(found).toHaveLength(1);
    expect(RUNNERS[name](found[0])).toContain("145.83\u2009GΩ");
  });
});

describe("the start page's snippets", () => {
  it.each(
    resistanceSnippets("http://127.0.0.1:3000", shellRequest(SHELL_START)).map(({ label, code }) => [
      label,
      code,
    ]),
  )("%s", (label, code) => {
    const runner = Object.entries(RUNNERS).find(([name]) => name === label)?.[1];
    expect(runner?.(code)).toContain("145.83\u2009GΩ");
  });
});

describe("the README's settings", () => {
  it("are those that the service reads, with their defaults", () => {
    const rows = [...README.matchAll(/^\| `([A-Z_]+)` +\| ([^|]*) \|/gm)].map(([, name, value]) => [
      name,
      value.trim().replaceAll("`", ""),
    ]);
    const config = readConfig({ RHOFORM_DATA: folder });
    expect(Object.fromEntries(rows)).toMatchObject({
      HOST: config.host,
      PORT: String(config.port),
      RHOFORM_DEMO: config.demo ? "1" : "0",
      RHOFORM_ADDRESS_QUOTA: String(config.addressMinuteQuota),
    });
    const source = ["environment", "mail"]
      .map((name) => readFileSync(`lib/config/${name}.ts`, "utf8"))
      .join("");
    const read = [...source.matchAll(/^ {2}([A-Z_]+): /gm)].map(([, name]) => name);
    expect(rows.map(([name]) => name).sort()).toEqual([...new Set(read)].sort());
  });
});

it("names only scripts that exist", () => {
  const { scripts } = JSON.parse(readFileSync("package.json", "utf8"));
  const text = README + readFileSync("DEVELOPERS.md", "utf8");
  for (const [, name] of text.matchAll(/npm run (?:-s )?([a-z:]+)/g)) expect(scripts).toHaveProperty([name]);
});

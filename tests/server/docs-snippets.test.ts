import { execFile } from "node:child_process";
import { copyFileSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { build } from "esbuild";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { catalogue } from "@/lib/engine";
import { GUIDES } from "@/app/(site)/docs/_content/pages";
import type { DocSnippet } from "@/app/(site)/docs/_content/page";
import { shapeSnippets } from "@/app/(site)/docs/shapes/shape-snippets";
import { type TestServer, startServer } from "../support/server";

const ORIGIN = "https://rhoform-docs.example";

let server: TestServer;
let folder: string;
let environment: NodeJS.ProcessEnv;

beforeAll(async () => {
  server = await startServer();
  folder = mkdtempSync(join(tmpdir(), "rhoform-docs-"));
  copyFileSync("sdk/python/rhoform.py", join(folder, "rhoform.py"));
  const urlKey = server.issue({ scopes: ["compute"], allowedInUrl: true }).key;
  environment = {
    ...process.env,
    RHOFORM_KEY: server.issue().key,
    RHOFORM_URL_KEY: urlKey,
    PYTHONIOENCODING: "utf-8",
    PYTHONDONTWRITEBYTECODE: "1",
    // What npm installs comes from the service alone: no registry answers there.
    npm_config_registry: "http://127.0.0.1:9",
    npm_config_audit: "false",
    npm_config_fund: "false",
    npm_config_cache: join(folder, "npm"),
  };
});

afterAll(async () => {
  rmSync(folder, { recursive: true });
  await server.stop();
});

function run(program: string, args: readonly string[]): Promise<string> {
  return new Promise((done, fail) => {
    execFile(program, [...args], { cwd: folder, env: environment, timeout: 60_000 }, (error, out, err) =>
      error ? fail(new Error(`${args.join(" ")}: ${err}${out}`)) : done(out),
    );
  });
}

/** Compiles against the client's own sources, as a project that has it installed would. */
async function runTypescript(code: string): Promise<string> {
  const entry = join(folder, "snippet.ts");
  const outfile = join(folder, "snippet.mjs");
  writeFileSync(entry, code);
  await build({
    entryPoints: [entry],
    outfile,
    bundle: true,
    format: "esm",
    platform: "node",
    target: "node18",
    logLevel: "silent",
    alias: { "@rhoform/client": resolve("sdk/typescript/src/index.ts") },
  });
  return run(process.execPath, [outfile]);
}

/** Runs a snippet as a reader would, against the server under test; answers with what it prints. */
async function perform({ language, code }: DocSnippet): Promise<string> {
  const text = code.replaceAll(ORIGIN, server.base);
  if (language === "ts") return runTypescript(text);
  const file = language === "python" ? "snippet.py" : "snippet.sh";
  writeFileSync(join(folder, file), text);
  return language === "python" ? run("python3", [file]) : run("sh", ["-e", file]);
}

const guides = GUIDES.map((guide) => ({
  slug: guide.slug,
  snippets: guide
    .sections({ origin: ORIGIN })
    .flatMap(({ blocks }) => blocks)
    .flatMap((block) => (typeof block !== "string" && "snippets" in block ? block.snippets : []))
    .filter(({ shownOnly }) => !shownOnly),
})).filter(({ snippets }) => snippets.length > 0);

describe("the snippets of a guide run and print what they should", () => {
  it.each(guides)("$slug", async ({ snippets }) => {
    for (const snippet of snippets) {
      if (snippet.file) {
        writeFileSync(join(folder, snippet.file), `${snippet.code}\n`);
        continue;
      }
      const printed = await perform(snippet);
      if (snippet.prints !== undefined)
        expect(printed, `${snippet.label}: ${snippet.code}`).toContain(snippet.prints);
    }
  });

  it("show nothing in a language that no test runs", () => {
    const run = new Set(["sh", "ts", "python", "csv"]);
    expect(guides.flatMap(({ snippets }) => snippets).filter(({ language }) => !run.has(language))).toEqual(
      [],
    );
  });
});

describe("the snippets of the clients' READMEs run", () => {
  it.each(["sdk/typescript/README.md", "sdk/python/README.md"])("%s", async (file) => {
    writeFileSync(
      join(folder, "parts.csv"),
      "shape,length,width,thickness,material\nbar,1 m,5 mm,1 mm,copper-annealed\n",
    );
    const found = [...readFileSync(file, "utf8").matchAll(/```(ts|python|sh)\n([\s\S]*?)```/g)];
    expect(found.length).toBeGreaterThan(1);
    for (const [, language, code] of found) {
      const here = code.replaceAll("http://127.0.0.1:3000", server.base);
      const text = language === "sh" ? `export RHOFORM_URL=${server.base}\n${here}` : here;
      const known = (["ts", "python", "sh"] as const).find((name) => name === language);
      await perform({ language: known ?? expect.fail(language), label: file, code: text });
    }
  });
});

describe("the snippets of all shapes run", () => {
  const codes = (language: string) =>
    catalogue.map((shape) => {
      const found = shapeSnippets(ORIGIN, shape).find((snippet) => snippet.language === language);
      return found?.code ?? expect.fail(`${shape.id} has no snippet in ${language}`);
    });
  const BOUNDS = /^\S+\u2009\S*Ω \d\S* \d\S*$/gm;

  it("curl", async () => {
    // The answers one after the other; -f makes a refusal a failure.
    const code = codes("sh").join("\n").replaceAll("curl -s ", "curl -sf ");
    const printed = await perform({ language: "sh", label: "curl", code });
    expect(printed.match(/"boundsBasis"/g)).toHaveLength(catalogue.length);
  });

  it("Python", async () => {
    const printed = await perform({ language: "python", label: "Python", code: codes("python").join("\n") });
    expect(printed.match(BOUNDS)).toHaveLength(catalogue.length);
  });

  it("TypeScript", async () => {
    const bodies = codes("ts").map((code) => {
      const [first, ...rest] = code.split("\n");
      expect(first).toBe('import { computeResistance, rhoform } from "@rhoform/client";');
      return `{\n${rest.join("\n")}\n}`;
    });
    const code = `import { computeResistance, rhoform } from "@rhoform/client";\n${bodies.join("\n")}`;
    const printed = await perform({ language: "ts", label: "TypeScript", code });
    expect(printed.match(BOUNDS)).toHaveLength(catalogue.length);
  });
});

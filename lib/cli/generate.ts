/**
 * `npm run generate`: what is made from the API's own description, the types and calls of the TypeScript client.
 * With `--check` nothing is written; it fails if writing would change a file.
 */
import { mkdirSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, relative } from "node:path";
import { createClient } from "@hey-api/openapi-ts";
import { openApiDocument } from "@/api/openapi";
import { registry } from "@/api/registry";

const TYPESCRIPT = "sdk/typescript/src/generated";

/** The problem pages' host in the document; the client's types and calls do not depend on it. */
const ORIGIN = "https://rhoform.example";

async function generateTypescript(folder: string, input: string): Promise<void> {
  await createClient({
    // The generator takes a path for an address unless it is relative and begins with a dot.
    input: `./${relative(process.cwd(), input)}`,
    output: { path: folder, entryFile: false, importFileExtension: ".js", postProcess: [] },
    logs: { level: "silent", file: false },
    plugins: [
      "@hey-api/typescript",
      { name: "@hey-api/client-fetch", throwOnError: true },
      { name: "@hey-api/sdk", responseStyle: "data" },
    ],
  });
}

function filesOf(folder: string): Map<string, string> {
  const files = new Map<string, string>();
  for (const entry of readdirSync(folder, { recursive: true, withFileTypes: true })) {
    if (!entry.isFile()) continue;
    const path = join(entry.parentPath, entry.name);
    files.set(relative(folder, path), readFileSync(path, "utf8"));
  }
  return files;
}

function differences(made: Map<string, string>, kept: Map<string, string>): string[] {
  return [...new Set([...made.keys(), ...kept.keys()])]
    .filter((path) => made.get(path) !== kept.get(path))
    .sort();
}

async function main(): Promise<number> {
  const work = mkdtempSync(join(tmpdir(), "rhoform-generate-"));
  try {
    const document = join(work, "openapi.json");
    writeFileSync(document, JSON.stringify(await openApiDocument(registry, ORIGIN)));
    const folder = join(work, "typescript");
    await generateTypescript(folder, document);
    const made = filesOf(folder);
    mkdirSync(TYPESCRIPT, { recursive: true });
    const changed = differences(made, filesOf(TYPESCRIPT));
    if (process.argv.includes("--check")) {
      for (const path of changed)
        console.error(`${join(TYPESCRIPT, path)} is not what npm run generate makes.`);
      return changed.length === 0 ? 0 : 1;
    }
    for (const path of changed) {
      const text = made.get(path);
      const target = join(TYPESCRIPT, path);
      if (text === undefined) rmSync(target);
      else {
        mkdirSync(join(target, ".."), { recursive: true });
        writeFileSync(target, text);
      }
    }
    console.log(
      changed.length === 0 ? "Nothing changed." : changed.map((path) => join(TYPESCRIPT, path)).join("\n"),
    );
    return 0;
  } finally {
    rmSync(work, { recursive: true, force: true });
  }
}

main().then(
  (code) => process.exit(code),
  (error: unknown) => {
    console.error(error);
    process.exit(1);
  },
);

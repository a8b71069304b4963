/**
 * `npm run generate`: what is made from the API's own description, the clients for TypeScript and Python.
 * With `--check` nothing is written; it fails if writing would change a file.
 */
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  readdirSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join, relative } from "node:path";
import { createClient } from "@hey-api/openapi-ts";
import { openApiDocument } from "@/api/openapi";
import { registry } from "@/api/registry";
import { pythonClient } from "./python/python-client";

const TYPESCRIPT = "sdk/typescript/src/generated";
const PYTHON = "sdk/python/rhoform.py";

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

/** Files to be, by path, and null for those that should be gone. */
async function generated(work: string): Promise<Map<string, string | null>> {
  const document = join(work, "openapi.json");
  const text = JSON.stringify(await openApiDocument(registry, ORIGIN));
  writeFileSync(document, text);
  const folder = join(work, "typescript");
  await generateTypescript(folder, document);
  // The generator leaves notes to its own authors in what it writes.
  const made = new Map(
    [...filesOf(folder)].map(([path, code]) => [path, code.replace(/^ *\/\/ TODO.*\n/gm, "")]),
  );
  mkdirSync(TYPESCRIPT, { recursive: true });
  const changes = new Map<string, string | null>();
  for (const path of differences(made, filesOf(TYPESCRIPT)))
    changes.set(join(TYPESCRIPT, path), made.get(path) ?? null);
  const python = pythonClient(text);
  if (!existsSync(PYTHON) || readFileSync(PYTHON, "utf8") !== python) changes.set(PYTHON, python);
  return changes;
}

async function main(): Promise<number> {
  const work = mkdtempSync(join(tmpdir(), "rhoform-generate-"));
  try {
    const changes = await generated(work);
    if (process.argv.includes("--check")) {
      for (const path of changes.keys()) console.error(`${path} is not what npm run generate makes.`);
      return changes.size === 0 ? 0 : 1;
    }
    for (const [path, text] of changes) {
      if (text === null) rmSync(path);
      else {
        mkdirSync(dirname(path), { recursive: true });
        writeFileSync(path, text);
      }
    }
    console.log(changes.size === 0 ? "Nothing changed." : [...changes.keys()].join("\n"));
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

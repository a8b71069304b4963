import { readFileSync } from "node:fs";
import { join } from "node:path";
import type { Block } from "./page";

/** The scripts in `sdk/python/examples`, which this service hands out one by one. */
export const PYTHON_EXAMPLES = ["sweep.py", "parts_list.py", "replay_records.py"] as const;

/** File name of the packed TypeScript client, as npm names it. */
export function packedClient(): string {
  const text = readFileSync(join(process.cwd(), "sdk/typescript/package.json"), "utf8");
  const { version }: { version: string } = JSON.parse(text);
  return `rhoform-client-${version}.tgz`;
}

/** How a project gets the TypeScript client from this service. */
export function clientInstall(origin: string): Block {
  const code = `npm install ${origin}/docs/clients/${packedClient()}`;
  return { snippets: [{ language: "sh", label: "shell", code }] };
}

/** How a script gets the Python client from this service. */
export function pythonDownload(origin: string): Block {
  const code = `curl -fsSO ${origin}/docs/python/rhoform.py`;
  return { snippets: [{ language: "sh", label: "shell", code }] };
}

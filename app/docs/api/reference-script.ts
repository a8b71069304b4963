import "server-only";
import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import { join } from "node:path";

interface ReferenceScript {
  /** Its address here; it carries a digest, so that browsers may keep it for good. */
  readonly path: string;
  readonly content: Buffer<ArrayBuffer>;
}

let loaded: Promise<ReferenceScript> | undefined;

/** The reference's own script, read from its package once. */
export function referenceScript(): Promise<ReferenceScript> {
  return (loaded ??= load());
}

async function load(): Promise<ReferenceScript> {
  const file = join(process.cwd(), "node_modules/@scalar/api-reference/dist/browser/standalone.js");
  const content = Buffer.from(await readFile(file));
  const digest = createHash("sha256").update(content).digest("base64url").slice(0, 12);
  return { path: `/docs/api/script?v=${digest}`, content };
}

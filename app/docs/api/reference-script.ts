import "server-only";
import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { promisify } from "node:util";
import { gzip } from "node:zlib";

interface ReferenceScript {
  /** Its address here; it carries a digest, so that browsers may keep it for good. */
  readonly path: string;
  readonly plain: Buffer<ArrayBuffer>;
  readonly zipped: Buffer<ArrayBuffer>;
}

let loaded: Promise<ReferenceScript> | undefined;

/** The reference's own script, read from its package and compressed once (3.6 MB, 1 MB compressed). */
export function referenceScript(): Promise<ReferenceScript> {
  return (loaded ??= load());
}

async function load(): Promise<ReferenceScript> {
  const file = join(process.cwd(), "node_modules/@scalar/api-reference/dist/browser/standalone.js");
  const plain = Buffer.from(await readFile(file));
  const digest = createHash("sha256").update(plain).digest("base64url").slice(0, 12);
  return {
    path: `/docs/api/script?v=${digest}`,
    plain,
    zipped: Buffer.from(await promisify(gzip)(plain, { level: 9 })),
  };
}

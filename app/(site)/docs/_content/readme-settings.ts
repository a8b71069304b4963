import { readFileSync } from "node:fs";
import { join } from "node:path";

/** The README's table of settings; a test there holds it to what the service reads. */
export function readmeSettings(): readonly (readonly [name: string, fallback: string, meaning: string])[] {
  const text = readFileSync(join(process.cwd(), "README.md"), "utf8");
  return [...text.matchAll(/^\| `([A-Z_]+)` +\| ([^|]*) \| ([^|]*) \|/gm)].map(
    ([, name, fallback, meaning]) => [`\`${name}\``, fallback.trim(), meaning.trim()] as const,
  );
}

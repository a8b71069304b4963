import "server-only";
import { readFile } from "node:fs/promises";
import { join } from "node:path";

export type ChangelogBlock =
  | { readonly kind: "version" | "section" | "paragraph"; readonly text: string }
  | { readonly kind: "list"; readonly items: readonly string[] };

/** CHANGELOG.md as blocks, without its title. It uses headings, paragraphs and flat lists only. */
export async function readChangelog(): Promise<readonly ChangelogBlock[]> {
  return parseChangelog(await readFile(join(process.cwd(), "CHANGELOG.md"), "utf8"));
}

export function parseChangelog(markdown: string): readonly ChangelogBlock[] {
  return markdown
    .split(/\n{2,}/)
    .map((block) => block.trim())
    .filter((block) => block !== "" && !block.startsWith("# "))
    .map((block): ChangelogBlock => {
      const flat = (text: string) => text.replace(/\s*\n\s*/g, " ").trim();
      if (block.startsWith("## ")) return { kind: "version", text: flat(block.slice(3)) };
      if (block.startsWith("### ")) return { kind: "section", text: flat(block.slice(4)) };
      if (!block.startsWith("- ")) return { kind: "paragraph", text: flat(block) };
      return { kind: "list", items: block.slice(2).split(/\n- /).map(flat) };
    });
}

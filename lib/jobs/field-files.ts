/** The maps of field solutions: one file each in the data folder, read again for pictures. */
import { mkdir, readFile, rename, rm, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { deserialize } from "node:v8";
import type { FieldMap } from "@/lib/engine";

/** Maps kept in memory, since a page asks for picture, map and lines one after the other. */
const KEPT = 4;

export class FieldFiles {
  private readonly kept = new Map<string, FieldMap>();

  constructor(private readonly folder: string) {}

  private path(id: string): string {
    return join(this.folder, `${id}.map`);
  }

  /** Written beside and renamed, so that no reader sees half a file. */
  async write(id: string, map: Uint8Array): Promise<void> {
    await mkdir(this.folder, { recursive: true });
    const path = this.path(id);
    await writeFile(`${path}.part`, map);
    await rename(`${path}.part`, path);
  }

  /** The map, or undefined where its file is gone. */
  async read(id: string): Promise<FieldMap | undefined> {
    const kept = this.kept.get(id);
    if (kept) return kept;
    let bytes: Buffer;
    try {
      bytes = await readFile(this.path(id));
    } catch (error) {
      if (error instanceof Error && "code" in error && error.code === "ENOENT") return undefined;
      throw error;
    }
    // Written by this application only: what was serialised there was a map.
    const map = deserialize(bytes) as FieldMap;
    this.kept.set(id, map);
    const [oldest] = this.kept.keys();
    if (this.kept.size > KEPT) this.kept.delete(oldest);
    return map;
  }

  async remove(id: string): Promise<void> {
    this.kept.delete(id);
    await rm(this.path(id), { force: true });
  }
}

import type { Database } from "@/db/client";
import { embedById, embedHistory, type EmbedRow, embedVersion } from "@/db/queries/embeds";
import { type EmbedDefinition, storedDefinition } from "./definition";
import { embedState } from "./embed-view";

/** A widget as a page shows it. */
export interface ShownEmbed {
  readonly embed: EmbedRow;
  readonly version: number;
  readonly definition: EmbedDefinition;
}

const ID = /^emb_[0-9A-Za-z]{16}$/;

/** The widget's row, if there is one that was ever published. */
export function publicEmbed(db: Database, id: string): EmbedRow | undefined {
  const row = ID.test(id) ? embedById(db, id) : undefined;
  return row && row.publishedVersion !== null ? row : undefined;
}

/** What every page shows; undefined where there is nothing to show: unknown, never published, or withdrawn. */
export function publishedEmbed(db: Database, id: string): ShownEmbed | undefined {
  const embed = publicEmbed(db, id);
  if (!embed || embedState(embed) !== "published" || embed.publishedVersion === null) return undefined;
  return shown(db, embed, embed.publishedVersion);
}

/** A version that its team looks at in the console: the draft, or any other. */
export function previewedEmbed(db: Database, id: string, version?: number): ShownEmbed | undefined {
  const embed = ID.test(id) ? embedById(db, id) : undefined;
  if (!embed) return undefined;
  const number = version ?? embedHistory(db, id)[0]?.number;
  return number === undefined ? undefined : shown(db, embed, number);
}

function shown(db: Database, embed: EmbedRow, number: number): ShownEmbed | undefined {
  const row = embedVersion(db, embed.id, number);
  return row && { embed, version: number, definition: storedDefinition(row.definition) };
}

import type { EmbedRow, EmbedVersionRow } from "@/db/queries/embeds";
import { type EmbedDefinition, storedDefinition } from "./definition";

export type EmbedState = "draft" | "published" | "withdrawn";

/** A widget as the console lists it. */
export interface EmbedView {
  readonly id: string;
  readonly teamId: string;
  readonly team: string;
  readonly teamName: string;
  readonly name: string;
  readonly state: EmbedState;
  readonly origins: readonly string[];
  readonly monthQuota: number;
  /** Version that pages show; null before the first one, and while withdrawn. */
  readonly version: number | null;
  readonly createdAt: string;
  readonly createdBy: string;
  readonly withdrawnAt: string | null;
}

/** One version in a widget's history. */
export interface VersionView {
  readonly number: number;
  readonly state: "draft" | "published" | "earlier";
  readonly definition: EmbedDefinition;
  readonly createdAt: string;
  readonly createdBy: string;
  /** Unix ms; the next save of the draft names it, so that two people do not overwrite each other. */
  readonly savedAt: number;
  readonly publishedAt: string | null;
  readonly publishedBy: string | null;
  readonly restores: number | null;
}

const iso = (at: number | null) => (at === null ? null : new Date(at).toISOString());

export function embedState(row: Pick<EmbedRow, "withdrawnAt" | "publishedVersion">): EmbedState {
  if (row.withdrawnAt !== null) return "withdrawn";
  return row.publishedVersion === null ? "draft" : "published";
}

export function embedView(row: EmbedRow): EmbedView {
  const state = embedState(row);
  return {
    id: row.id,
    teamId: row.teamId,
    team: row.team,
    teamName: row.teamName,
    name: row.name,
    state,
    origins: row.origins,
    monthQuota: row.monthQuota,
    version: state === "published" ? row.publishedVersion : null,
    createdAt: new Date(row.createdAt).toISOString(),
    createdBy: row.createdBy,
    withdrawnAt: iso(row.withdrawnAt),
  };
}

export function versionView(row: EmbedVersionRow, embed: EmbedRow): VersionView {
  const shown = row.number === embed.publishedVersion && embed.withdrawnAt === null;
  return {
    number: row.number,
    state: row.publishedAt === null ? "draft" : shown ? "published" : "earlier",
    definition: storedDefinition(row.definition),
    createdAt: new Date(row.createdAt).toISOString(),
    createdBy: row.createdBy,
    savedAt: row.savedAt,
    publishedAt: iso(row.publishedAt),
    publishedBy: row.publishedBy,
    restores: row.restores,
  };
}

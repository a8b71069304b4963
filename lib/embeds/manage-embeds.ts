import type { z } from "zod";
import { type Database, transact } from "@/db/client";
import {
  changeEmbed,
  deleteDraft,
  embedById,
  embedHistory,
  type EmbedRow,
  type EmbedVersionRow,
  embedVersion,
  insertEmbed,
  insertVersion,
  markPublished,
  markWithdrawn,
  saveDraft,
  showVersion,
} from "@/db/queries/embeds";
import { type Act, type Actor, appendActivity } from "../activity/append";
import type { Problem } from "@/lib/engine";
import { teamOutline } from "../fields/team-outlines";
import { usableMaterial } from "../materials/team-materials";
import { newId } from "../service/identifier";
import { Refusal } from "../service/refusal";
import { definitionProblems } from "./check-definition";
import { type EmbedDefinition, type embedSettings, storedDefinition } from "./definition";
import { type EmbedView, embedView, type VersionView, versionView } from "./embed-view";

export type EmbedSettings = z.infer<typeof embedSettings>;

/** Who changes a widget, and when (Unix ms). */
export interface By {
  readonly actor: Actor;
  readonly now: number;
}

/** Makes a widget with a draft; no page shows it before it is published. */
export function createEmbed(
  db: Database,
  { actor, now }: By,
  {
    teamId,
    settings,
    definition,
    id = newId("emb"),
  }: {
    readonly teamId: string;
    readonly settings: EmbedSettings;
    readonly definition: EmbedDefinition;
    /** For the demo, whose id is derived; random otherwise. */
    readonly id?: string;
  },
): EmbedView {
  return transact(db, () => {
    insertEmbed(db, {
      id,
      teamId,
      ...tidy(settings),
      publishedVersion: null,
      createdAt: now,
      createdBy: actor.name,
      withdrawnAt: null,
    });
    insertVersion(db, draftRow(id, 1, definition, { actor, now }));
    const view = embedView(mustFind(db, id));
    record(db, { actor, now }, "embed.create", view, { after: settings });
    return view;
  });
}

/** Changes name, origins and quota: at once, for every page. */
export function changeEmbedSettings(db: Database, by: By, id: string, settings: EmbedSettings): EmbedView {
  return transact(db, () => {
    const before = mustFind(db, id);
    changeEmbed(db, id, tidy(settings));
    const view = embedView(mustFind(db, id));
    const { name, origins, monthQuota } = before;
    record(db, by, "embed.change", view, { before: { name, origins, monthQuota }, after: settings });
    return view;
  });
}

/**
 * Saves the draft, or starts one. A draft is seen by its team only, so nothing is checked but its form.
 * @param from `savedAt` of what the change was made from; null where no draft was there.
 * @throws Refusal version-conflict where somebody else saved in between.
 */
export function saveEmbedDraft(
  db: Database,
  { actor, now }: By,
  id: string,
  { definition, from }: { readonly definition: EmbedDefinition; readonly from: number | null },
): VersionView {
  return transact(db, () => {
    const embed = mustFind(db, id);
    const [newest] = embedHistory(db, id);
    const draft = newest && newest.publishedAt === null ? newest : undefined;
    if ((draft?.savedAt ?? null) !== from) {
      throw new Refusal("version-conflict", "Somebody else changed the draft. Reload to see their change.");
    }
    if (draft) {
      // Two saves in one millisecond are still two.
      const savedAt = Math.max(now, draft.savedAt + 1);
      saveDraft(db, id, draft.number, { definition, savedAt });
      return versionView({ ...draft, definition, savedAt }, embed);
    }
    const row = draftRow(id, (newest?.number ?? 0) + 1, definition, { actor, now });
    insertVersion(db, row);
    return versionView(row, embed);
  });
}

/** Throws the draft away; the first one stays, since a widget without any version is nothing. */
export function discardEmbedDraft(db: Database, { actor, now }: By, id: string): void {
  transact(db, () => {
    const view = embedView(mustFind(db, id));
    const draft = requireDraft(db, id);
    if (draft.number === 1) {
      throw new Refusal("invalid-input", "The first draft cannot be thrown away.", {
        errors: [{ pointer: "#", detail: "has no earlier version to go back to." }],
      });
    }
    deleteDraft(db, id, draft.number);
    record(db, { actor, now }, "embed.discard-draft", view, { before: { version: draft.number } });
  });
}

/**
 * Shows the draft on every page from now on.
 * @throws Refusal with every reason why it cannot be shown, pointers going into the definition.
 */
export function publishEmbed(db: Database, { actor, now }: By, id: string): EmbedView {
  return transact(db, () => {
    const embed = mustFind(db, id);
    const draft = requireDraft(db, id);
    const problems = teamProblems(db, embed.teamId, storedDefinition(draft.definition));
    if (problems.length > 0) {
      throw new Refusal("invalid-input", "The draft cannot be published yet.", { errors: problems });
    }
    markPublished(db, id, draft.number, { publishedAt: now, publishedBy: actor.name });
    showVersion(db, id, draft.number);
    const view = embedView(mustFind(db, id));
    record(db, { actor, now }, "embed.publish", view, {
      before: { version: embed.publishedVersion },
      after: { version: draft.number },
    });
    return view;
  });
}

/** Brings an earlier version back, as a new one: the history only grows. A draft stays, numbered behind it. */
export function rollBackEmbed(db: Database, { actor, now }: By, id: string, number: number): EmbedView {
  return transact(db, () => {
    const embed = mustFind(db, id);
    const earlier = embedVersion(db, id, number);
    if (!earlier || earlier.publishedAt === null) {
      throw new Refusal("not-found", "There is no such published version.");
    }
    const problems = teamProblems(db, embed.teamId, storedDefinition(earlier.definition));
    if (problems.length > 0) {
      throw new Refusal("invalid-input", `Version ${number} cannot be shown any more.`, { errors: problems });
    }
    const [newest] = embedHistory(db, id);
    const draft = newest.publishedAt === null ? newest : undefined;
    const next = draft?.number ?? newest.number + 1;
    if (draft) deleteDraft(db, id, draft.number);
    insertVersion(db, {
      ...draftRow(id, next, earlier.definition, { actor, now }),
      publishedAt: now,
      publishedBy: actor.name,
      restores: number,
    });
    if (draft) insertVersion(db, { ...draft, number: next + 1 });
    showVersion(db, id, next);
    const view = embedView(mustFind(db, id));
    record(db, { actor, now }, "embed.roll-back", view, {
      before: { version: embed.publishedVersion },
      after: { version: next, restores: number },
    });
    return view;
  });
}

/** Takes a widget off every page. Withdrawing twice changes nothing; showing a version brings it back. */
export function withdrawEmbed(db: Database, by: By, id: string): EmbedView {
  return transact(db, () => {
    const before = embedView(mustFind(db, id));
    if (!markWithdrawn(db, id, by.now)) return before;
    const view = embedView(mustFind(db, id));
    record(db, by, "embed.withdraw", view, { before: { version: before.version } });
    return view;
  });
}

/** What stands in the way of publishing, with the materials and outlines that the team may use. */
export function teamProblems(db: Database, teamId: string, definition: EmbedDefinition): readonly Problem[] {
  return definitionProblems(
    definition,
    (id) => usableMaterial(db, teamId, id),
    (id) => teamOutline(db, teamId, id),
  );
}

function record(
  db: Database,
  { actor, now }: By,
  action: string,
  view: EmbedView,
  change: Pick<Act, "before" | "after">,
): void {
  appendActivity(
    db,
    actor,
    { action, teamId: view.teamId, subject: { kind: "embed", id: view.id }, ...change },
    now,
  );
}

function draftRow(embedId: string, number: number, definition: unknown, { actor, now }: By): EmbedVersionRow {
  return {
    embedId,
    number,
    definition,
    createdAt: now,
    createdBy: actor.name,
    savedAt: now,
    publishedAt: null,
    publishedBy: null,
    restores: null,
  };
}

function tidy({ name, origins, monthQuota }: EmbedSettings) {
  return { name, origins: [...new Set(origins)], monthQuota };
}

function requireDraft(db: Database, id: string): EmbedVersionRow {
  const [newest] = embedHistory(db, id);
  if (!newest || newest.publishedAt !== null) {
    throw new Refusal("invalid-input", "There is no draft.", {
      errors: [{ pointer: "#", detail: "has no draft: nothing was changed since the last version." }],
    });
  }
  return newest;
}

function mustFind(db: Database, id: string): EmbedRow {
  const row = embedById(db, id);
  if (!row) throw new Refusal("not-found", "There is no such widget.");
  return row;
}

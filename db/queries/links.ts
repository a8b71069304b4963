import { and, eq, isNull, lt } from "drizzle-orm";
import type { Database } from "../client";
import { type LinkKind, links } from "../schema/sign-in";

export type LinkRow = typeof links.$inferSelect;

export function insertLink(db: Database, link: LinkRow): void {
  db.insert(links).values(link).run();
}

export function linkByHash(db: Database, hash: string): LinkRow | undefined {
  return db.select().from(links).where(eq(links.hash, hash)).get();
}

/** Notes a link as followed; false where it was followed before. */
export function markLinkUsed(db: Database, id: string, at: number): boolean {
  return (
    db
      .update(links)
      .set({ usedAt: at })
      .where(and(eq(links.id, id), isNull(links.usedAt)))
      .run().changes > 0
  );
}

/** Ends the links of a person that nobody followed, all or those of one kind. */
export function voidLinks(db: Database, personId: string, at: number, kind?: LinkKind): void {
  db.update(links)
    .set({ usedAt: at })
    .where(
      and(
        eq(links.personId, personId),
        isNull(links.usedAt),
        kind === undefined ? undefined : eq(links.kind, kind),
      ),
    )
    .run();
}

export function forgetLinks(db: Database, at: number): number {
  return db.delete(links).where(lt(links.expiresAt, at)).run().changes;
}

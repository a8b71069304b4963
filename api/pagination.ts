import { z } from "zod";
import type { Mark } from "@/db/queries/keys";
import { json, type Outcome } from "./operation";
import { parameterRefusal } from "./parameters";

const mark = z.tuple([z.int(), z.string().max(100)]);

/** Where a page ended, as an opaque cursor. */
export function encodeCursor({ at, id }: Mark): string {
  return Buffer.from(JSON.stringify([at, id])).toString("base64url");
}

/** Reads a cursor of ours; anything else is refused. */
export function decodeCursor(cursor: string | undefined): Mark | undefined {
  if (cursor === undefined) return undefined;
  try {
    const [at, id] = mark.parse(JSON.parse(Buffer.from(cursor, "base64url").toString("utf8")));
    return { at, id };
  } catch {
    throw parameterRefusal([{ parameter: "cursor", detail: "is not one that this list gave." }]);
  }
}

/** A page as it is answered: with the next cursor in the body and in the `Link` header (RFC 8288). */
export function page(url: URL, items: readonly unknown[], next: string | null): Outcome {
  if (next === null) return json(200, { items, next });
  const target = new URL(url);
  target.searchParams.set("cursor", next);
  // A key in the address is no part of the list's address.
  target.searchParams.delete("key");
  return json(
    200,
    { items, next },
    { headers: { Link: `<${target.pathname}${target.search}>; rel="next"` } },
  );
}

/** Rows that were asked for one more than the page holds, cut to the page, and the cursor if there are more. */
export function cut<Row>(
  rows: readonly Row[],
  limit: number,
  markOf: (row: Row) => Mark,
): { rows: readonly Row[]; next: string | null } {
  if (rows.length <= limit) return { rows, next: null };
  const kept = rows.slice(0, limit);
  return { rows: kept, next: encodeCursor(markOf(kept[limit - 1])) };
}

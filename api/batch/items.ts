import { InputError } from "@/lib/engine";
import { Refusal } from "@/lib/service/refusal";

/** Most items of one batch. */
export const MOST_ITEMS = 10_000;
/** Largest body of a batch, bytes. */
export const BATCH_MAX_BYTES = 20_000_000;

/** A 413 that names the limit. */
export function tooManyItems(found: string): Refusal {
  return new Refusal(
    "body-too-large",
    `${found}; a batch may have at most ${MOST_ITEMS.toLocaleString("en")} items. Split it into several calls.`,
  );
}

/** The items of a JSON body. @throws InputError where it has none, a Refusal of 413 where it has too many. */
export function itemsOf(body: unknown): readonly unknown[] {
  if (typeof body !== "object" || body === null || Array.isArray(body)) {
    throw new InputError([{ pointer: "#", detail: 'must be an object with "items".' }]);
  }
  const complaints = Object.keys(body)
    .filter((name) => name !== "items")
    .slice(0, 50)
    .map((name) => ({
      pointer: `#/${encodeURIComponent(name.slice(0, 100))}`,
      detail: "is not a member known here; a batch has items only.",
    }));
  const items: unknown = "items" in body ? body.items : undefined;
  if (!Array.isArray(items)) {
    complaints.unshift({
      pointer: "#/items",
      detail: items === undefined ? "is required." : "must be an array of requests.",
    });
    throw new InputError(complaints);
  }
  if (complaints.length > 0) throw new InputError(complaints);
  if (items.length > MOST_ITEMS) throw tooManyItems(`There are ${items.length.toLocaleString("en")} items`);
  return items;
}

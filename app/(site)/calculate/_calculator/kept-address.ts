/** The way back to a page's state over signing in: its address, or where that is too long this tab's memory of it. */
import type { AddressParts } from "../_model/address";

/** The query of an address that asks for what this tab kept. */
const KEPT_QUERY = "kept";
const MEMORY = "rhoform:calculation";
/** Longest path that signing in leads back to. */
const LONGEST = 1800;

/** Path that leads back to this state; in the browser only. */
export function pathBack({ query, behind }: AddressParts): string {
  const { pathname } = window.location;
  const path = `${pathname}?${query}${behind === "" ? "" : `#${behind}`}`;
  if (path.length <= LONGEST) return path;
  try {
    sessionStorage.setItem(MEMORY, path);
    return `${pathname}?${KEPT_QUERY}`;
  } catch {
    // Without a memory of its own a tab can only lead back to the shape.
    return pathname;
  }
}

/** Query and what is behind the "#": of the address, or what was kept where the address asks for that. */
export function toldAddress(): { readonly search: string; readonly hash: string } {
  const { pathname, search, hash } = window.location;
  if (!new URLSearchParams(search).has(KEPT_QUERY)) return { search, hash };
  try {
    const path = sessionStorage.getItem(MEMORY);
    if (path === null || !path.startsWith(`${pathname}?`)) return { search, hash };
    const [query, behind = ""] = path.slice(pathname.length).split("#");
    return { search: query, hash: behind === "" ? "" : `#${behind}` };
  } catch {
    return { search, hash };
  }
}

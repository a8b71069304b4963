/** A law that is one smooth function over the whole coordinate, checked at both ends. */
import { siText } from "../../quantity/format-quantity";
import type { LawQuantity, ProfileLaw, ProfileSite } from "../profile";
import { valueComplaint } from "./profile-value";

export interface SmoothLaw {
  /** Value at x past the start of the coordinate. */
  readonly at: (x: number) => number;
  readonly quantity?: LawQuantity;
  /** Places x where it changes fast; those outside the range are left away. */
  readonly hints?: readonly number[];
  readonly tex: string;
}

/** The law as one piece; null after a complaint where a value at either end is not allowed. */
export function smoothLaw(site: ProfileSite, law: SmoothLaw): ProfileLaw | null {
  const { at, tex, quantity = site.values } = law;
  for (const x of [0, site.extent]) {
    const complaint = complaintAt(site, x, at(x), quantity);
    if (complaint === null) continue;
    site.problems.add(site.pointer, complaint);
    return null;
  }
  return {
    count: 1,
    from: [0],
    width: [site.extent],
    at: (_, t) => at(t),
    quantity,
    hints: law.hints?.filter((x) => x > 0 && x < site.extent),
    tex,
  };
}

/** Why the value at x past the start is not allowed, with its place, or null. */
export function complaintAt(
  site: ProfileSite,
  x: number,
  value: number,
  quantity: LawQuantity,
): string | null {
  const zeroAllowed = site.zeroAllowed && quantity !== "resistivity";
  if (Number.isFinite(value) && (value > 0 || (zeroAllowed && value === 0))) return null;
  const what = Number.isNaN(value)
    ? "is not a real number"
    : `is ${Number.isFinite(value) ? value : "infinite"}`;
  const rule = Number.isFinite(value)
    ? valueComplaint({ ...site, values: quantity }, zeroAllowed)
    : "must be finite.";
  return `${what} at ${placeText(site, x)}; it ${rule}`;
}

/** "s = 3.2 mm (u = 0.4)" */
export function placeText(site: ProfileSite, x: number): string {
  const u = site.extent > 0 ? x / site.extent : 0;
  return `s = ${siText(site.start + x, site.unit)} (u = ${Number(u.toPrecision(6))})`;
}

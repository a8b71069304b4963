/** Every kind of profile; the one list from which the schema, the documents and the laws are looked up. */
import { z } from "zod";
import type { ProfileKind, ProfileLaw, ProfileSite } from "../profile";
import { constantProfile } from "./constant";

/** Forgets the schema's type: a law is only ever built from a profile that this very schema has parsed. */
const forget = (kind: object): ProfileKind => kind as ProfileKind;

/** Any profile. */
export const profileSchema = z
  .discriminatedUnion("kind", [constantProfile.schema])
  .meta({ description: "How the quantity varies along the coordinate." });

/** The kinds of profile with their documentation. */
export const profileKinds: readonly ProfileKind[] = [constantProfile].map(forget);

const byKind = new Map(profileKinds.map((entry) => [entry.kind, entry]));

/** Builds the law of a parsed profile; null after complaints. */
export function buildProfile(profile: { readonly kind: string }, site: ProfileSite): ProfileLaw | null {
  const entry = byKind.get(profile.kind);
  return entry ? entry.build(profile, site) : null;
}

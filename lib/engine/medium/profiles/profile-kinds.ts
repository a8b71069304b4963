/** Every kind of profile; the one list from which the schema, the documents and the laws are looked up. */
import { z } from "zod";
import type { ProfileKind, ProfileLaw, ProfileSite } from "../profile";
import { complementaryErrorProfile } from "./complementary-error";
import { constantProfile } from "./constant";
import { dopantProfile } from "./dopant";
import { exponentialProfile } from "./exponential";
import { expressionProfile } from "./expression";
import { gaussianProfile } from "./gaussian";
import { layersProfile } from "./layers";
import { linearProfile } from "./linear";
import { powerProfile } from "./power";
import { tableProfile } from "./table";
import { temperatureProfile } from "./temperature";

/** Complaint about a kind that there is not. */
const unknownKind = (issue: { readonly code?: string }): string | undefined =>
  issue.code === "invalid_union"
    ? `must be one of ${profileKinds.map(({ kind }) => `"${kind}"`).join(", ")}.`
    : undefined;

/** Any profile. */
export const profileSchema = z
  .discriminatedUnion(
    "kind",
    [
      constantProfile.schema,
      linearProfile.schema,
      exponentialProfile.schema,
      powerProfile.schema,
      gaussianProfile.schema,
      complementaryErrorProfile.schema,
      layersProfile.schema,
      tableProfile.schema,
      expressionProfile.schema,
      temperatureProfile.schema,
      dopantProfile.schema,
    ],
    { error: unknownKind },
  )
  .meta({ description: "How the quantity varies along the coordinate." });

/** Forgets the schema's type: a law is only ever built from a profile that this very schema has parsed. */
const forget = (kind: object): ProfileKind => kind as ProfileKind;

/** The kinds of profile with their documentation. */
export const profileKinds: readonly ProfileKind[] = [
  constantProfile,
  linearProfile,
  exponentialProfile,
  powerProfile,
  gaussianProfile,
  complementaryErrorProfile,
  layersProfile,
  tableProfile,
  expressionProfile,
  temperatureProfile,
  dopantProfile,
].map(forget);

const byKind = new Map(profileKinds.map((entry) => [entry.kind, entry]));

/** The kinds whose values say themselves what they are, so that a grading needs no `quantity`. */
export const SELF_DESCRIBING: readonly string[] = [temperatureProfile.kind, dopantProfile.kind];

/** Builds the law of a parsed profile; null after complaints. */
export function buildProfile(profile: { readonly kind: string }, site: ProfileSite): ProfileLaw | null {
  const entry = byKind.get(profile.kind);
  return entry ? entry.build(profile, site) : null;
}

/** Reading the numbers inside a profile: values of the graded quantity, and positions along its coordinate. */
import { pointerTo } from "../../failure";
import { texNumber } from "../../quantity/format-quantity";
import { readQuantity } from "../../quantity/parse-quantity";
import { QUANTITY_KINDS } from "../../quantity/quantity-kind";
import { anyQuantitySchema } from "../../quantity/quantity-schema";
import type { LawQuantity, ProfileSite } from "../profile";

/** A value of the graded quantity: a bare number in S/m, ohm m or 1/cm³, or a text with a unit. */
export function valueSchema(description: string) {
  return anyQuantitySchema.meta({
    description: `${description}, in the graded quantity (bare numbers in S/m, ohm m, or 1/cm³ of a dopant).`,
  });
}

/** A position or distance along the coordinate: a bare number in metres (degrees for an angle), or a text with a unit. */
export function positionSchema(description: string) {
  return anyQuantitySchema.meta({
    description: `${description}, in the coordinate's unit (bare numbers in m, or in degrees for an angle).`,
  });
}

/** Reads a value that must be greater than 0 (0 is allowed where the site allows it); null after a complaint. */
export function readProfileValue(
  input: unknown,
  site: ProfileSite,
  path: string | readonly (string | number)[],
  options: { readonly zero?: boolean } = {},
): number | null {
  const pointer = pointerTo(site.pointer, ...(typeof path === "string" ? [path] : path));
  const reading = readQuantity(input, site.values);
  if (!reading.ok) {
    site.problems.add(pointer, reading.detail);
    return null;
  }
  const { value } = reading;
  const zeroAllowed = options.zero ?? (site.zeroAllowed && site.values !== "resistivity");
  if (value > 0 || (zeroAllowed && value === 0)) return value;
  site.problems.add(pointer, valueComplaint(site, zeroAllowed));
  return null;
}

/** Why a value is not allowed. */
export function valueComplaint(site: ProfileSite, zeroAllowed: boolean): string {
  const noun = QUANTITY_KINDS[site.values].noun.replace(/^an? /, "");
  if (zeroAllowed) return `must be 0 or greater: a ${noun} is never negative.`;
  return site.values === "resistivity"
    ? "must be greater than 0."
    : `must be greater than 0: a ${noun} of zero along the flow would interrupt the current.`;
}

/** Reads a position or distance along the coordinate in SI; null after a complaint. */
export function readPosition(
  input: unknown,
  site: ProfileSite,
  path: string | readonly (string | number)[],
  require: "any" | "positive" = "any",
): number | null {
  const pointer = pointerTo(site.pointer, ...(typeof path === "string" ? [path] : path));
  const reading = readQuantity(input, site.unit === "rad" ? "angle" : "length");
  if (!reading.ok) {
    site.problems.add(pointer, reading.detail);
    return null;
  }
  if (require === "any" || reading.value > 0) return reading.value;
  site.problems.add(pointer, "must be greater than 0.");
  return null;
}

const TEX_UNITS: Readonly<Record<LawQuantity, string>> = {
  conductivity: "\\mathrm{S/m}",
  resistivity: "\\Omega\\,\\mathrm{m}",
  density: "\\mathrm{cm^{-3}}",
};

/** A value of the graded quantity as TeX, with its unit. */
export function quantityText(value: number, quantity: LawQuantity): string {
  return `${texNumber(value)}\\,${TEX_UNITS[quantity]}`;
}

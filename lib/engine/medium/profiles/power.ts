import { z } from "zod";
import { pointerTo } from "../../failure";
import { readQuantity } from "../../quantity/parse-quantity";
import { anyQuantitySchema } from "../../quantity/quantity-schema";
import { defineProfile } from "../profile";
import { quantityText, positionSchema, readPosition, readProfileValue, valueSchema } from "./profile-value";
import { smoothLaw } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("power"),
    reference: valueSchema("Value at the position `at`"),
    at: positionSchema("Position where the value is `reference`, greater than 0"),
    exponent: anyQuantitySchema.meta({ description: "Exponent, a plain number between -100 and 100." }),
  })
  .meta({
    description: "reference·(s/at)^exponent.",
    example: { kind: "power", reference: 310, at: "11.3 mm", exponent: 1.3 },
  });

/** A power of the coordinate. */
export const powerProfile = defineProfile({
  kind: "power",
  title: "Power law",
  summary: "A power of the coordinate: reference·(s/at)^exponent.",
  tex: "f(s) = f_\\mathrm{ref} \\left(\\frac{s}{s_\\mathrm{ref}}\\right)^{n}",
  schema,
  build: (profile, site) => {
    const reference = readProfileValue(profile.reference, site, "reference", { zero: false });
    const at = readPosition(profile.at, site, "at", "positive");
    const exponent = readExponent(profile.exponent, pointerTo(site.pointer, "exponent"), site.problems);
    if (reference === null || at === null || exponent === null) return null;
    const { start, extent } = site;
    return smoothLaw(site, {
      at: (x) => reference * Math.pow((start + x) / at, exponent),
      hints: start < extent ? towardsStart(start, extent) : [],
      tex: `${quantityText(reference, site.values)}\\left(\\frac{s}{s_\\mathrm{ref}}\\right)^{${exponent}}`,
    });
  },
});

function readExponent(
  input: unknown,
  pointer: string,
  problems: { add: (pointer: string, detail: string) => void },
): number | null {
  const reading = readQuantity(input, "number");
  if (!reading.ok) {
    problems.add(pointer, reading.detail);
    return null;
  }
  if (Math.abs(reading.value) <= 100) return reading.value;
  problems.add(pointer, "must be between -100 and 100.");
  return null;
}

/** A range that spans decades of the coordinate changes fast near its start. */
function towardsStart(start: number, extent: number): number[] {
  const hints: number[] = [];
  for (let x = extent / 10, i = 0; i < 40 && x > start / 2 && x > extent * 1e-15; x /= 10, i++) hints.push(x);
  return hints;
}

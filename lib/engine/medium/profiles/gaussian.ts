import { z } from "zod";
import { defineProfile } from "../profile";
import { quantityText, positionSchema, readPosition, readProfileValue, valueSchema } from "./profile-value";
import { smoothLaw } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("gaussian"),
    peak: valueSchema("Value at the centre"),
    center: positionSchema("Position of the centre, inside the range or not"),
    spread: positionSchema("Standard deviation, greater than 0"),
    background: valueSchema("Value far from the centre, 0 by default").optional(),
  })
  .meta({
    description: "background + (peak − background)·exp(−(s − center)²/(2·spread²)).",
    example: { kind: "gaussian", peak: 1e19, center: 0, spread: "0.8 um", background: 1e15 },
  });

/** A bell over a background. */
export const gaussianProfile = defineProfile({
  kind: "gaussian",
  title: "Gaussian",
  summary: "A bell over a background: background + (peak − background)·exp(−(s − center)²/(2·spread²)).",
  tex: "f(s) = f_b + (f_p - f_b)\\,\\exp\\left(-\\frac{(s - s_c)^2}{2\\,w^2}\\right)",
  schema,
  build: (profile, site) => {
    const peak = readProfileValue(profile.peak, site, "peak");
    const center = readPosition(profile.center, site, "center");
    const spread = readPosition(profile.spread, site, "spread", "positive");
    const background = readBackground(profile.background, site);
    if (peak === null || center === null || spread === null || background === null) return null;
    // The centre as a distance from the coordinate's start, once, so that x keeps its digits.
    const middle = center - site.start;
    return smoothLaw(site, {
      at: (x) => {
        const d = (x - middle) / spread;
        return background + (peak - background) * Math.exp(-0.5 * d * d);
      },
      hints: [0, 1, 2.5, 4, 6, 9, 14, 20, 28, 38].flatMap((n) => [middle - n * spread, middle + n * spread]),
      tex: `${quantityText(peak, site.values)} \\text{ over } ${quantityText(background, site.values)}`,
    });
  },
});

/** The background of a bell or a diffusion: 0 unless given, and never below. */
export function readBackground(input: unknown, site: Parameters<typeof readProfileValue>[1]): number | null {
  if (input === undefined) return 0;
  return readProfileValue(input, site, "background", { zero: site.values !== "resistivity" });
}

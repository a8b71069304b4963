import { z } from "zod";
import { logRatio } from "../interpolation";
import { defineProfile } from "../profile";
import { quantityText, readProfileValue, valueSchema } from "./profile-value";
import { smoothLaw } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("exponential"),
    from: valueSchema("Value at the start of the coordinate, greater than 0"),
    to: valueSchema("Value at its end, greater than 0"),
  })
  .meta({
    description: "Geometric between the coordinate's two ends.",
    example: { kind: "exponential", from: 1e-12, to: 1e-10 },
  });

/** Geometric between the two ends. */
export const exponentialProfile = defineProfile({
  kind: "exponential",
  title: "Exponential",
  summary:
    "Geometric between the values at the coordinate's two ends: equal steps multiply the value by equal factors.",
  tex: "f(s) = f_0 \\left(\\frac{f_1}{f_0}\\right)^{u},\\quad u = \\frac{s - s_0}{s_1 - s_0}",
  schema,
  build: (profile, site) => {
    const from = readProfileValue(profile.from, site, "from", { zero: false });
    const to = readProfileValue(profile.to, site, "to", { zero: false });
    if (from === null || to === null) return null;
    const { extent } = site;
    const rate = logRatio(from, to) / extent;
    return smoothLaw(site, {
      at: (x) => (2 * x <= extent ? from * Math.exp(rate * x) : to * Math.exp(-rate * (extent - x))),
      // Decades of the value are spread evenly; a steep one wants cuts near the end where it is large.
      hints: Math.abs(rate * extent) > 20 ? endHints(extent, 10 / Math.abs(rate)) : [],
      tex: `${quantityText(from, site.values)} \\to ${quantityText(to, site.values)}`,
    });
  },
});

function endHints(extent: number, distance: number): number[] {
  const hints: number[] = [];
  for (let d = distance; d < extent / 2; d *= 2) hints.push(d, extent - d);
  return hints;
}

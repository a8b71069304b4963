import { z } from "zod";
import { defineProfile } from "../profile";
import { quantityText, readProfileValue, valueSchema } from "./profile-value";
import { smoothLaw } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("linear"),
    from: valueSchema("Value at the start of the coordinate"),
    to: valueSchema("Value at its end"),
  })
  .meta({
    description: "A straight line between the coordinate's two ends.",
    example: { kind: "linear", from: 2e6, to: 5e6 },
  });

/** A straight line between the two ends. */
export const linearProfile = defineProfile({
  kind: "linear",
  title: "Linear",
  summary: "A straight line between the values at the coordinate's two ends.",
  tex: "f(s) = f_0 + (f_1 - f_0)\\,u,\\quad u = \\frac{s - s_0}{s_1 - s_0}",
  schema,
  build: (profile, site) => {
    const from = readProfileValue(profile.from, site, "from");
    const to = readProfileValue(profile.to, site, "to");
    if (from === null || to === null) return null;
    const { extent } = site;
    const slope = (to - from) / extent;
    return smoothLaw(site, {
      // Measured from the nearer end, so that a small value at the far end keeps its digits.
      at: (x) => (2 * x <= extent ? from + slope * x : to - slope * (extent - x)),
      hints: nearSmallEnd(from, to, extent),
      tex: `${quantityText(from, site.values)} \\to ${quantityText(to, site.values)}`,
    });
  },
});

/** Where one end is far smaller than the other, its reciprocal changes fast near it: cuts at growing distances. */
function nearSmallEnd(from: number, to: number, extent: number): number[] {
  const small = Math.min(from, to);
  const large = Math.max(from, to);
  if (!(small > 0) || large / small < 100) return [];
  const hints: number[] = [];
  for (let part = small / large; part < 0.5; part *= 30) {
    hints.push(from < to ? extent * part : extent * (1 - part));
  }
  return hints;
}

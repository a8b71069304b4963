import { z } from "zod";
import { defineProfile } from "../profile";
import { quantityText, readProfileValue, valueSchema } from "./profile-value";

const schema = z
  .strictObject({ kind: z.literal("constant"), value: valueSchema("The value everywhere") })
  .meta({ description: "The same value everywhere." });

/** The same value everywhere. */
export const constantProfile = defineProfile({
  kind: "constant",
  title: "Constant",
  summary: "The same value everywhere.",
  tex: "f(s) = f_0",
  schema,
  build: (profile, site) => {
    const value = readProfileValue(profile.value, site, "value");
    if (value === null) return null;
    return {
      count: 1,
      from: [0],
      width: [site.extent],
      at: () => value,
      quantity: site.values,
      spread: () => 1,
      stepwise: true,
      tex: quantityText(value, site.values),
    };
  },
});

import { z } from "zod";
import { erfc } from "../../numeric/error-function";
import { defineProfile } from "../profile";
import { readBackground } from "./gaussian";
import { quantityText, positionSchema, readPosition, readProfileValue, valueSchema } from "./profile-value";
import { smoothLaw } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("complementary-error"),
    surface: valueSchema("Value at the surface"),
    length: positionSchema("Diffusion length, greater than 0"),
    background: valueSchema("Value far from the surface, 0 by default").optional(),
    from: z.enum(["start", "end"]).meta({ description: "Which end of the coordinate is the surface." }),
  })
  .meta({
    description: "background + (surface − background)·erfc(d/length), d = depth from that end.",
    example: {
      kind: "complementary-error",
      surface: 1e19,
      length: "0.8 um",
      background: 1e15,
      from: "start",
    },
  });

/** The profile of a diffusion from a constant surface. */
export const complementaryErrorProfile = defineProfile({
  kind: "complementary-error",
  title: "Complementary error function",
  summary: "A diffusion from one surface: background + (surface − background)·erfc(depth/length).",
  tex: "f(s) = f_b + (f_s - f_b)\\,\\operatorname{erfc}\\frac{d}{\\ell}",
  schema,
  build: (profile, site) => {
    const surface = readProfileValue(profile.surface, site, "surface");
    const length = readPosition(profile.length, site, "length", "positive");
    const background = readBackground(profile.background, site);
    if (surface === null || length === null || background === null) return null;
    const { extent } = site;
    const fromStart = profile.from === "start";
    return smoothLaw(site, {
      at: (x) => background + (surface - background) * erfc((fromStart ? x : extent - x) / length),
      hints: [0.7, 1.5, 2.5, 4, 6, 9, 14, 20, 27].map((n) => (fromStart ? n * length : extent - n * length)),
      tex: `${quantityText(surface, site.values)} \\text{ over } ${quantityText(background, site.values)}`,
    });
  },
});

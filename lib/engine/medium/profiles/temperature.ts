import { z } from "zod";
import { pointerTo } from "../../failure";
import { texNumber } from "../../quantity/format-quantity";
import { readQuantity } from "../../quantity/parse-quantity";
import { quantitySchema } from "../../quantity/quantity-schema";
import { resistivityLaw } from "../material";
import { defineProfile } from "../profile";
import { checkTemperature, findMaterial } from "../use-material";
import { smoothLaw } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("temperature"),
    material: z
      .string()
      .min(1)
      .max(64)
      .meta({ description: "Id of a material.", example: "copper-annealed" }),
    from: quantitySchema("temperature", "Temperature at the coordinate's start", 20),
    to: quantitySchema("temperature", "Temperature at its end", 90),
    extrapolate: z
      .boolean()
      .optional()
      .meta({ description: "Allow temperatures outside the material's range, with a caution." }),
  })
  .meta({
    description: "Resistivity of a material whose temperature is linear along the coordinate.",
    example: { kind: "temperature", material: "copper-annealed", from: 20, to: 90 },
  });

/** A material at a temperature that is linear along the coordinate. */
export const temperatureProfile = defineProfile({
  kind: "temperature",
  title: "Temperature",
  summary: "The resistivity of a material whose temperature is linear between the coordinate's two ends.",
  tex: "\\rho(s) = \\rho\\bigl(T_0 + (T_1 - T_0)\\,u\\bigr)",
  schema,
  build: (profile, site) => {
    const ends = (["from", "to"] as const).map((name) => {
      const reading = readQuantity(profile[name], "temperature");
      if (!reading.ok) site.problems.add(pointerTo(site.pointer, name), reading.detail);
      return reading.ok ? reading.value : null;
    });
    const material = findMaterial(profile.material, pointerTo(site.pointer, "material"), site);
    const [from, to] = ends;
    if (!material || from === null || to === null) return null;
    let allowed = true;
    for (const [name, temperature] of [["from", from] as const, ["to", to] as const]) {
      allowed =
        checkTemperature(material, temperature, profile.extrapolate, pointerTo(site.pointer, name), site) &&
        allowed;
    }
    if (!allowed) return null;
    const law = resistivityLaw(material);
    const slope = (to - from) / site.extent;
    return smoothLaw(site, {
      at: (x) => law(from + slope * x),
      quantity: "resistivity",
      hints: tableKnots(material.resistivity, from, slope),
      tex: `\\text{${material.name.replaceAll(/[\\{}$%&_#^~]/g, " ")}},\\ ${texNumber(from)} \\to ${texNumber(to)}\\,^\\circ\\mathrm{C}`,
    });
  },
});

/** Where the temperature passes a knot of a tabulated material the law has a kink. */
function tableKnots(
  model: { readonly model: string; readonly temperatures?: readonly number[] },
  from: number,
  slope: number,
) {
  if (model.model !== "table" || slope === 0 || !model.temperatures || model.temperatures.length > 500)
    return [];
  return model.temperatures.map((t) => (t - from) / slope);
}

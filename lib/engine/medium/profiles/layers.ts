import { z } from "zod";
import { CompensatedSum } from "../../numeric/compensated-sum";
import { pointerTo } from "../../failure";
import { siText } from "../../quantity/format-quantity";
import { defineProfile } from "../profile";
import { positionSchema, readPosition, readProfileValue, valueSchema } from "./profile-value";

const schema = z
  .strictObject({
    kind: z.literal("layers"),
    layers: z
      .array(
        z.strictObject({
          thickness: positionSchema("Thickness of the layer along the coordinate, greater than 0"),
          value: valueSchema("Value in the layer"),
        }),
      )
      .min(1)
      .max(10_000)
      .meta({ description: "Layers from the coordinate's start to its end." }),
  })
  .meta({
    description: "Uniform layers; the thicknesses add up to the coordinate's range within 1e-9 of it.",
    example: {
      kind: "layers",
      layers: [
        { thickness: "1 mm", value: 1e-12 },
        { thickness: "2 mm", value: 5e-12 },
      ],
    },
  });

/** Relative difference allowed between the sum of the thicknesses and the range. */
const SUM_TOLERANCE = 1e-9;

/** Uniform layers one after the other. */
export const layersProfile = defineProfile({
  kind: "layers",
  title: "Layers",
  summary: "Uniform layers from the coordinate's start to its end; the thicknesses add up to its range.",
  tex: "f(s) = f_i \\quad\\text{in layer } i",
  schema,
  build: (profile, site) => {
    const count = profile.layers.length;
    const from = new Float64Array(count);
    const width = new Float64Array(count);
    const values = new Float64Array(count);
    const sum = new CompensatedSum();
    let whole = true;
    for (const [i, layer] of profile.layers.entries()) {
      const thickness = readPosition(layer.thickness, site, ["layers", i, "thickness"], "positive");
      const value = readProfileValue(layer.value, site, ["layers", i, "value"]);
      whole &&= thickness !== null && value !== null;
      from[i] = sum.value;
      width[i] = thickness ?? 0;
      values[i] = value ?? 0;
      sum.add(width[i]);
    }
    if (!whole) return null;
    if (!(Math.abs(sum.value - site.extent) <= SUM_TOLERANCE * site.extent)) {
      site.problems.add(
        pointerTo(site.pointer, "layers"),
        `adds up to ${siText(sum.value, site.unit)}, but the range of ${site.coordinate} is ${siText(site.extent, site.unit)} (${siText(site.start, site.unit)} to ${siText(site.start + site.extent, site.unit)}).`,
      );
      return null;
    }
    return {
      count,
      from,
      width,
      at: (piece) => values[piece],
      quantity: site.values,
      spread: () => 1,
      stepwise: true,
      tex: `${count} \\text{ layers}`,
    };
  },
});

/**
 * A material: its resistivity at zero frequency as a function of temperature, how far that holds, how sure it is and
 * where it comes from. The models are data only; `resistivityAt` evaluates them.
 */
import { z } from "zod";
import { siliconConductivity } from "./dopant";
import { tableInterpolator } from "./interpolation";
import { seaWaterConductivity } from "./sea-water";

const finite = (description: string) => z.number().meta({ description });
const positive = (description: string) => z.number().positive().meta({ description });

const linearModel = z
  .strictObject({
    model: z.literal("linear"),
    resistivity: positive("Resistivity in ohm metres at the reference temperature."),
    coefficient: finite("Temperature coefficient in 1/K at the reference temperature."),
    reference: finite("Reference temperature in °C."),
  })
  .meta({ description: "ρ = resistivity·(1 + coefficient·(T − reference))." });

const polynomialModel = z
  .strictObject({
    model: z.literal("polynomial"),
    quantity: z.enum(["resistivity", "conductivity"]),
    reference: finite("Temperature in °C at which the powers vanish."),
    coefficients: z
      .array(z.number())
      .min(1)
      .max(12)
      .meta({ description: "Coefficients of the powers 0, 1, 2 … of (T − reference), in ohm m or S/m." }),
  })
  .meta({ description: "A polynomial in (T − reference)." });

const tableModel = z
  .strictObject({
    model: z.literal("table"),
    quantity: z.enum(["resistivity", "conductivity"]),
    temperatures: z
      .array(z.number())
      .min(2)
      .max(10_000)
      .meta({ description: "Temperatures in °C, increasing." }),
    values: z
      .array(z.number().positive())
      .min(2)
      .max(10_000)
      .meta({ description: "Values in ohm m or S/m." }),
    interpolation: z.enum(["linear", "log", "monotone-cubic"]),
  })
  .refine((table) => table.temperatures.length === table.values.length, {
    error: "must have as many values as temperatures.",
    path: ["values"],
  })
  .refine((table) => table.temperatures.every((t, i, all) => i === 0 || t > all[i - 1]), {
    error: "must increase from one temperature to the next.",
    path: ["temperatures"],
  })
  .meta({ description: "Values at given temperatures, interpolated." });

const constantModel = z
  .strictObject({
    model: z.literal("constant"),
    resistivity: positive("Resistivity in ohm metres over the whole range."),
  })
  .meta({
    description: "A resistivity that is not given as a function of temperature, such as that of a soil.",
  });

const siliconModel = z
  .strictObject({
    model: z.literal("silicon"),
    type: z.enum(["n", "p"]).meta({ description: "n: phosphorus, p: boron." }),
    density: positive("Dopant density in 1/cm³."),
  })
  .meta({ description: "Silicon at 23 °C by dopant density (ASTM F723 fits)." });

const seaWaterModel = z
  .strictObject({
    model: z.literal("sea-water"),
    salinity: z.number().min(2).max(42).meta({ description: "Practical salinity, 2 to 42." }),
  })
  .meta({ description: "Sea water at atmospheric pressure by the Practical Salinity Scale 1978." });

export const resistivityModelSchema = z
  .union([linearModel, polynomialModel, tableModel, constantModel, siliconModel, seaWaterModel])
  .meta({ description: "The law of resistivity against temperature." });

export const materialSchema = z
  .strictObject({
    id: z
      .string()
      .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/)
      .max(64)
      .meta({ description: "Name in requests: lower case, digits and hyphens.", example: "copper-annealed" }),
    version: z.number().int().min(1).meta({ description: "Every change makes the next version." }),
    name: z.string().min(1).max(120).meta({ example: "Copper, annealed (IACS)" }),
    kind: z
      .enum([
        "metal",
        "alloy",
        "solder",
        "carbon",
        "oxide",
        "semiconductor",
        "liquid",
        "soil",
        "building",
        "polymer",
        "other",
      ])
      .meta({ description: "What sort of material it is." }),
    resistivity: resistivityModelSchema,
    range: z
      .strictObject({ from: finite("Lowest temperature in °C."), to: finite("Highest temperature in °C.") })
      .refine(({ from, to }) => from <= to, { error: "must not end below its start.", path: ["to"] })
      .meta({ description: "Temperatures for which the model holds, °C." }),
    uncertainty: z
      .strictObject({
        lower: z
          .number()
          .positive()
          .max(1)
          .meta({ description: "Smallest ratio of true to nominal resistivity." }),
        upper: z.number().min(1).meta({ description: "Largest ratio of true to nominal resistivity." }),
        note: z.string().max(400).meta({ description: "What the ratios stand for." }),
      })
      .meta({
        description:
          "Nominal uncertainty: the true resistivity lies between lower and upper times the nominal one.",
      }),
    source: z.string().min(1).max(400).meta({ description: "Where the data come from." }),
    provenance: z.enum(["source at hand", "from memory", "measured"]),
    owner: z.string().max(64).meta({ description: "`library`, or the team that owns it." }),
    note: z.string().max(600).optional().meta({ description: "What a user should know." }),
  })
  .meta({ description: "A material with its law of resistivity." });

export type Material = z.infer<typeof materialSchema>;
export type ResistivityModel = z.infer<typeof resistivityModelSchema>;

/** Whether the material's model holds at that temperature (°C); a hair's breadth of rounding is forgiven. */
export function coversTemperature(material: Material, temperatureC: number): boolean {
  const { from, to } = material.range;
  const slack = 1e-9 * Math.max(1, Math.abs(from), Math.abs(to));
  return temperatureC >= from - slack && temperatureC <= to + slack;
}

/**
 * Resistivity in ohm metres at a temperature in °C. Outside the material's range the model is evaluated as it stands
 * (a table is extended by its end intervals); the caller decides whether that is allowed.
 * @returns NaN or a value ≤ 0 where the extrapolated law makes no sense; the caller must check.
 */
export function resistivityAt(material: Material, temperatureC: number): number {
  return resistivityLaw(material)(temperatureC);
}

/** Conductivity in S/m at a temperature in °C, with the same care outside of the range as `resistivityAt`. */
export function conductivityAt(material: Material, temperatureC: number): number {
  return 1 / resistivityAt(material, temperatureC);
}

/** The resistivity as a function, for many temperatures. */
export function resistivityLaw(material: Material): (temperatureC: number) => number {
  const model = material.resistivity;
  switch (model.model) {
    case "linear":
      return (t) => model.resistivity * (1 + model.coefficient * (t - model.reference));
    case "polynomial": {
      const value = (t: number): number => {
        const x = t - model.reference;
        let sum = 0;
        for (let k = model.coefficients.length - 1; k >= 0; k--) sum = sum * x + model.coefficients[k];
        return sum;
      };
      return model.quantity === "resistivity" ? value : (t) => 1 / value(t);
    }
    case "table": {
      const value = tableInterpolator(model.temperatures, model.values, model.interpolation);
      return model.quantity === "resistivity" ? value : (t) => 1 / value(t);
    }
    case "constant":
      return () => model.resistivity;
    case "silicon": {
      const resistivity = 1 / siliconConductivity(model.type, model.density);
      return () => resistivity;
    }
    case "sea-water":
      return (t) => 1 / seaWaterConductivity(model.salinity, t);
  }
}

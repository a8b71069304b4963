/** The body of a resistance request. Which dimensions and coordinates exist is the shape's affair, checked after this. */
import { z } from "zod";
import { mediumSchema } from "../medium/medium-schema";
import { anyQuantitySchema, quantitySchema } from "../quantity/quantity-schema";
import { suggestion } from "../shape/nearest-names";
import { uncertaintyRequestSchema } from "./uncertainty/tolerance-schema";

const DRIVES = ["voltage", "current", "power"] as const;

export const operatingSchema = z
  .strictObject({
    temperature: quantitySchema(
      "temperature",
      "Temperature of the medium, 20 °C by default",
      "75 degC",
    ).optional(),
    voltage: quantitySchema("voltage", "Voltage across the terminals", "500 V").optional(),
    current: quantitySchema("current", "Current through the terminals", "630 A").optional(),
    power: quantitySchema("power", "Power turned to heat", "1.5 W").optional(),
  })
  .superRefine((operating, context) => {
    const given = DRIVES.filter((name) => operating[name] !== undefined);
    if (given.length > 1) {
      context.addIssue({
        code: "custom",
        path: [given[1]],
        message: `is given together with ${given[0]}; give at most one of voltage, current and power.`,
      });
    }
  })
  .meta({ description: "Temperature, and at most one of voltage, current and power." });

export const includeSchema = z
  .array(z.enum(["steps", "profile", "checks", "peak"]))
  .max(16)
  .meta({
    description: 'Parts to add to the answer; `["checks"]` by default.',
    example: ["steps", "checks"],
  });

export const requirementSchema = z
  .strictObject({
    min: quantitySchema("resistance", "Smallest resistance allowed", "1 mohm").optional(),
    max: quantitySchema("resistance", "Largest resistance allowed", "5 mohm").optional(),
  })
  .superRefine((requirement, context) => {
    if (requirement.min === undefined && requirement.max === undefined) {
      context.addIssue({ code: "custom", path: [], message: "must have min, max or both." });
    }
  })
  .meta({ description: "A requirement that the answer is held against; it adds `verdict`." });

export const recordRequestSchema = z
  .strictObject({
    label: z
      .string()
      .min(1)
      .max(200)
      .meta({ description: "What the record is called.", example: "Sleeve, rev C" }),
  })
  .meta({ description: "Store this calculation as a record." });

export const dimensionsSchema = z.record(z.string().max(64), anyQuantitySchema).meta({
  description: "The shape's dimensions by name: quantities, whole numbers and choices.",
  example: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
});

export const mediaSchema = z
  .record(z.string().max(64), mediumSchema)
  .meta({ description: "For a shape of two media, each by its name, in place of `medium`." });

/** The whole body of `POST /resistance`. */
export const resistanceRequestSchema = z
  .strictObject({
    shape: z
      .string()
      .max(64)
      .meta({ description: "Id of a shape of the catalogue.", example: "cylindrical-shell" }),
    dimensions: dimensionsSchema,
    medium: mediumSchema.optional(),
    media: mediaSchema.optional(),
    operating: operatingSchema.optional(),
    include: includeSchema.optional(),
    record: recordRequestSchema.optional(),
    requirement: requirementSchema.optional(),
    uncertainty: uncertaintyRequestSchema.optional(),
  })
  .meta({ description: "A shape, its dimensions and medium, and what to answer." });

export type ResistanceRequest = z.infer<typeof resistanceRequestSchema>;

/** Complaint about a shape id that the catalogue lacks. */
export function unknownShape(id: string, ids: readonly string[]): string {
  return `is no shape of the catalogue.${suggestion(id, ids)}`;
}

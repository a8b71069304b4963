/** The body of a resistance request. Which dimensions and coordinates exist is the shape's affair, checked after this. */
import { z } from "zod";
import { pointerTo, type Problems } from "../failure";
import { mediumSchema } from "../medium/medium-schema";
import { anyQuantitySchema, quantitySchema } from "../quantity/quantity-schema";
import { suggestion } from "../shape/nearest-names";

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
  })
  .meta({ description: "A shape, its dimensions and medium, and what to answer." });

export type ResistanceRequest = z.infer<typeof resistanceRequestSchema>;

/** Members of a strict object are suggested by name; every zod issue becomes one sentence with its own pointer. */
export function addZodIssues(issues: readonly z.core.$ZodIssue[], base: string, problems: Problems): void {
  for (const issue of issues) {
    const pointer = pointerTo(base, ...issue.path);
    if (issue.code === "unrecognized_keys") {
      // So many are told; whoever sends more has sent something else.
      for (const key of issue.keys.slice(0, 50)) {
        problems.add(pointerTo(pointer, key), "is not a member known here.");
      }
    } else problems.add(pointer, sentence(issue));
  }
}

function sentence(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined && issue.message.includes("undefined")
        ? "is required."
        : `must be ${article(issue.expected)}.`;
    case "invalid_value":
      return `must be one of ${issue.values.map((value) => `"${String(value)}"`).join(", ")}.`;
    case "too_small":
      if (issue.minimum === 1 && (issue.origin === "string" || issue.origin === "array"))
        return "must not be empty.";
      return `must be at least ${String(issue.minimum)}${issue.origin === "string" ? " characters long" : issue.origin === "array" ? " entries long" : ""}.`;
    case "too_big":
      return `must be at most ${String(issue.maximum)}${issue.origin === "string" ? " characters long" : issue.origin === "array" ? " entries long" : ""}.`;
    default:
      return issue.message;
  }
}

function article(expected: string): string {
  if (expected === "array") return "an array";
  if (expected === "object" || expected === "record") return "an object";
  if (expected === "int") return "a whole number";
  return `a ${expected}`;
}

/** Complaint about a shape id that the catalogue lacks. */
export function unknownShape(id: string, ids: readonly string[]): string {
  return `is no shape of the catalogue.${suggestion(id, ids)}`;
}

/** The schema of a medium: exactly one of a material, a resistivity, a conductivity, a sheet resistance or a grading. */
import { z } from "zod";
import { quantitySchema } from "../quantity/quantity-schema";
import { profileSchema } from "./profiles/profile-kinds";

export const gradedSchema = z
  .strictObject({
    coordinate: z.string().max(64).meta({
      description: "A coordinate of the shape, along or across the flow; `GET /shapes/{shape}` lists them.",
      example: "radius",
    }),
    quantity: z.enum(["conductivity", "resistivity"]).optional().meta({
      description: "What the profile's values are; not needed for `temperature` and `dopant` profiles.",
    }),
    profile: profileSchema,
  })
  .meta({ description: "A medium that varies along one coordinate of the shape." });

/** The members of which a medium has exactly one. */
export const MEDIUM_MEMBERS = [
  "material",
  "resistivity",
  "conductivity",
  "sheetResistance",
  "graded",
] as const;

/** Members that go only with some of these. */
export const MEDIUM_COMPANIONS: readonly (readonly [Companion, readonly Member[]])[] = [
  ["extrapolate", ["material"]],
  ["thickness", ["material", "resistivity", "conductivity"]],
  ["temperatureCoefficient", ["resistivity", "conductivity"]],
  ["referenceTemperature", ["resistivity", "conductivity"]],
];
type Member = (typeof MEDIUM_MEMBERS)[number];
type Companion = "extrapolate" | "thickness" | "temperatureCoefficient" | "referenceTemperature";

/** Exactly one of `members`, and companions only beside those they go with. */
export function oneMedium(
  medium: Readonly<Record<string, unknown>>,
  members: readonly string[],
  companions: readonly (readonly [string, readonly string[]])[],
  context: z.RefinementCtx,
): void {
  const given = members.filter((name) => medium[name] !== undefined);
  if (given.length !== 1) {
    const found = given.length === 0 ? "none of them is given" : `${given.join(" and ")} are given`;
    context.addIssue({
      code: "custom",
      path: given.length === 0 ? [] : [given[1]],
      message: `must have exactly one of ${members.join(", ")}; ${found}.`,
    });
    return;
  }
  for (const [name, hosts] of companions) {
    if (medium[name] === undefined || hosts.includes(given[0])) continue;
    context.addIssue({
      code: "custom",
      path: [name],
      message: `goes only with ${hosts.join(", ")}, not with ${given[0]}.`,
    });
  }
}

/** Members of a medium that is the same everywhere. */
export const uniformMediumFields = {
  material: z
    .string()
    .min(1)
    .max(64)
    .optional()
    .meta({ description: "Id of a material of the library or the team.", example: "copper-annealed" }),
  extrapolate: z
    .boolean()
    .optional()
    .meta({ description: "Allow a temperature outside the material's range, with a caution." }),
  resistivity: quantitySchema("resistivity", "Resistivity", "1.72e-8 ohm m").optional(),
  conductivity: quantitySchema("conductivity", "Conductivity", "58 MS/m").optional(),
  temperatureCoefficient: quantitySchema(
    "temperatureCoefficient",
    "Temperature coefficient of the resistivity at the reference temperature",
    "0.00393 1/K",
  ).optional(),
  referenceTemperature: quantitySchema(
    "temperature",
    "Temperature at which the resistivity or conductivity is given, 20 °C by default",
    20,
  ).optional(),
  sheetResistance: quantitySchema(
    "sheetResistance",
    "Sheet resistance, for sheet shapes",
    "50 ohm/sq",
  ).optional(),
  thickness: quantitySchema(
    "length",
    "Thickness of the sheet, for sheet shapes, beside a material, resistivity or conductivity",
    "35 um",
  ).optional(),
};

export const mediumSchema = z
  .strictObject({
    ...uniformMediumFields,
    graded: gradedSchema.optional(),
  })
  .superRefine((medium, context) => oneMedium(medium, MEDIUM_MEMBERS, MEDIUM_COMPANIONS, context))
  .meta({
    description:
      "What fills the shape: exactly one of `material`, `resistivity`, `conductivity`, `sheetResistance` (sheet shapes) and `graded`.",
    example: { material: "copper-annealed" },
    oneOf: MEDIUM_MEMBERS.map((name) => ({ required: [name] })),
  });

export type MediumInput = z.infer<typeof mediumSchema>;
export type GradedInput = z.infer<typeof gradedSchema>;

/** A medium without grading. */
export type UniformMediumInput = Omit<MediumInput, "graded">;

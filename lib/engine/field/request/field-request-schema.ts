/** The body of a field solution. What an outline, a terminal or a medium must be beyond this is checked after it. */
import { z } from "zod";
import { MEDIUM_COMPANIONS, oneMedium, uniformMediumFields } from "../../medium/medium-schema";
import { operatingSchema, recordRequestSchema, requirementSchema } from "../../resistance/request-schema";
import { outlineSchema, regionRingSchema, terminalSchema } from "../outline/schema";

const MEMBERS = ["material", "resistivity", "conductivity", "sheetResistance"] as const;
const BACKGROUND_MEMBERS = [...MEMBERS, "expression"] as const;
/** An expression takes a thickness as a conductivity does, and says what its values are. */
const BACKGROUND_COMPANIONS = [
  ...MEDIUM_COMPANIONS.map(
    ([name, hosts]) => [name, name === "thickness" ? [...hosts, "expression"] : hosts] as const,
  ),
  ["quantity", ["expression"]] as const,
];

const regionMediumSchema = z
  .strictObject(uniformMediumFields)
  .superRefine((medium, context) => oneMedium(medium, MEMBERS, MEDIUM_COMPANIONS, context))
  .meta({
    description:
      "Medium of a region: a sheet resistance, or a material, resistivity or conductivity with a thickness.",
    example: { sheetResistance: 5 },
  });

export const fieldMediumSchema = z
  .strictObject({
    ...uniformMediumFields,
    expression: z.string().max(1000).optional().meta({
      description: "An expression in x and y, the position in metres, giving SI values.",
      example: "5e7*exp(-x/0.01)",
    }),
    quantity: z
      .enum(["conductivity", "resistivity"])
      .optional()
      .meta({ description: "What the expression's values are." }),
    regions: z
      .array(
        z.strictObject({
          ring: regionRingSchema.meta({
            description: "Border of the region, a polygon in the outline's unit.",
          }),
          medium: regionMediumSchema,
        }),
      )
      .max(1000)
      .optional()
      .meta({
        description: "Regions of another medium; they may touch the border and each other, not overlap.",
      }),
  })
  .superRefine((medium, context) => {
    oneMedium(medium, BACKGROUND_MEMBERS, BACKGROUND_COMPANIONS, context);
  })
  .meta({
    description:
      "What fills the outline: a sheet resistance; a material, resistivity or conductivity with a thickness (without one where the outline is axisymmetric); or an expression with its quantity and thickness.",
    example: { sheetResistance: "50 ohm/sq" },
  });

/** The whole body of `POST /fields`. */
export const fieldRequestSchema = z
  .strictObject({
    outline: outlineSchema.optional().meta({ description: "The plan drawing, or `outlineId`." }),
    outlineId: z
      .string()
      .max(64)
      .optional()
      .meta({ description: "Id of a stored outline, in place of `outline`." }),
    terminals: z.array(terminalSchema).max(64).optional().meta({
      description:
        "Two terminals, or more; each on edges of the outline. They may be left out where a stored outline has its own.",
    }),
    medium: fieldMediumSchema,
    accuracy: z
      .number()
      .min(1e-8)
      .max(1e-2)
      .default(1e-4)
      .meta({ description: "(upper − lower)/value that is wanted, 1e-2 … 1e-8." }),
    operating: operatingSchema.optional(),
    requirement: requirementSchema.optional(),
    record: recordRequestSchema.optional(),
  })
  .superRefine((body, context) => {
    if ((body.outline === undefined) === (body.outlineId === undefined)) {
      const found = body.outline === undefined ? "neither is given" : "both are given";
      context.addIssue({
        code: "custom",
        path: [body.outline === undefined ? "outline" : "outlineId"],
        message: `must be given as exactly one of outline and outlineId; ${found}.`,
      });
    }
    if (body.outlineId === undefined && body.terminals === undefined) {
      context.addIssue({
        code: "custom",
        path: ["terminals"],
        message: "is required: at least two terminals.",
      });
    }
  })
  .meta({ description: "An outline, its terminals and medium, and how narrow the bracket shall be." });

export type FieldRequest = z.output<typeof fieldRequestSchema>;
export type FieldMediumInput = FieldRequest["medium"];

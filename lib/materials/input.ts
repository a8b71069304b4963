import { z } from "zod";
import { materialSchema } from "@/lib/engine";

/** What a team says of a material; id, version and owner are the service's. */
export const newMaterialSchema = materialSchema
  .omit({ id: true, version: true, owner: true })
  .meta({ description: "A material of the team." });

/** Any of it, to make the next version; what is left out stays. */
export const materialChangeSchema = newMaterialSchema
  .partial()
  .meta({ description: "The members to change, at least one.", minProperties: 1 });

/** A material as it is answered. */
export const materialViewSchema = z
  .object({
    ...materialSchema.shape,
    retiredAt: z.iso.datetime().nullable().meta({
      description: "When the team withdrew it; null while it is in use. Records keep what they used.",
    }),
  })
  .meta({ description: "A material with its law of resistivity." });

export type NewMaterial = z.infer<typeof newMaterialSchema>;
export type MaterialChange = z.infer<typeof materialChangeSchema>;
export type MaterialView = z.infer<typeof materialViewSchema>;

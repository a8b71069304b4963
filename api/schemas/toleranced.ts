import { z } from "zod";
import { mediumSchema, operatingSchema, tolerancedSchema } from "@/lib/engine";

/** Quantities that take no tolerance: what must add up to a range, what lists positions, and what drives the current. */
const PLAIN = ["layers/thickness", "positions", "voltage", "current", "power"];

/**
 * The same schema for the document, with an object of value and tolerance beside every number and text that takes one.
 * The engine takes the tolerances out before its own schemas read a body, so that only the document needs this form.
 */
function withTolerances(schema: z.core.$ZodType, path: string): z.ZodType {
  const meta = z.globalRegistry.get(schema) ?? {};
  const described = (made: z.ZodType): z.ZodType => made.meta(meta);
  if (schema instanceof z.ZodOptional) return withTolerances(schema.unwrap(), path).optional();
  if (schema instanceof z.ZodDefault) return withTolerances(schema.unwrap(), path).optional();
  if (schema instanceof z.ZodArray) return described(z.array(withTolerances(schema.element, path)));
  if (schema instanceof z.ZodDiscriminatedUnion) {
    const [first, ...rest] = schema.options.map((option) => withTolerances(option, path));
    return described(z.union([first, ...rest]));
  }
  if (schema instanceof z.ZodUnion && isQuantity(schema)) {
    if (PLAIN.some((end) => path.endsWith(end))) return schema;
    return described(z.union([z.number(), z.string(), tolerancedSchema]));
  }
  if (schema instanceof z.ZodObject) {
    const members = Object.entries(schema.shape).map(([name, member]) => [
      name,
      withTolerances(member, `${path}/${name}`),
    ]);
    return described(z.strictObject(Object.fromEntries(members)));
  }
  return schema as z.ZodType;
}

/** A number or a text: how every quantity is declared. */
function isQuantity(schema: z.ZodUnion): boolean {
  return (
    schema.options.length === 2 &&
    schema.options.some((option) => option instanceof z.ZodNumber) &&
    schema.options.some((option) => option instanceof z.ZodString)
  );
}

/** The medium of a resistance request as it is documented. */
export const documentedMedium = withTolerances(mediumSchema, "medium");

/** Its operating point. */
export const documentedOperating = withTolerances(operatingSchema, "operating");

/** The body of a network request. What the names in it join is checked after this. */
import { z } from "zod";
import { operatingSchema, recordRequestSchema, requirementSchema } from "../resistance/request-schema";

/** Most elements of one network. */
export const MOST_ELEMENTS = 10_000;

const nodeName = z
  .string()
  .min(1)
  .max(100)
  .meta({ description: "Name of a node; every element that uses it ends there.", example: "joint" });

export const networkElementSchema = z
  .strictObject({
    name: z.string().min(1).max(100).meta({ description: "Unique in the network.", example: "bar A" }),
    between: z
      .array(nodeName)
      .length(2, { error: "must name the two nodes that the element joins." })
      .meta({ description: "The two nodes; its current counts as positive from the first to the second." }),
    // Read with its tolerance, if it has one, when its turn comes.
    resistance: z.unknown().optional(),
    request: z
      .record(z.string(), z.unknown())
      .optional()
      .meta({ description: "In place of a resistance: a body of `POST /resistance` that gives it." }),
  })
  .superRefine((element, context) => {
    const given = [element.resistance, element.request].filter((value) => value !== undefined).length;
    if (given === 1) return;
    const found = given === 0 ? "neither is given" : "both are given";
    context.addIssue({
      code: "custom",
      path: given === 0 ? [] : ["request"],
      message: `must have exactly one of resistance and request; ${found}.`,
    });
  })
  .meta({ description: "A resistance between two nodes." });

/** What to make of the tolerances of elements and of their requests. */
export const networkUncertaintyRequestSchema = z
  .strictObject({
    method: z.enum(["propagation", "worst-case"]),
  })
  .meta({
    description:
      "How far the resistance strays with the tolerances of elements, those in their requests, and the stated uncertainty of materials: by first-order propagation (JCGM 100), or as the range between all elements at their lowest and at their highest.",
    example: { method: "propagation" },
  });

export const networkRequestSchema = z
  .strictObject({
    elements: z.array(networkElementSchema).min(1).max(MOST_ELEMENTS),
    ports: z
      .array(nodeName)
      .length(2, { error: "must name the two nodes between which the resistance is asked." })
      .meta({ description: "The nodes where current enters and leaves.", example: ["in", "out"] }),
    operating: operatingSchema.optional().meta({
      description:
        "At most one of voltage, current and power between the ports; the temperature holds for elements whose request names none.",
    }),
    requirement: requirementSchema.optional(),
    uncertainty: networkUncertaintyRequestSchema.optional(),
    record: recordRequestSchema.optional(),
  })
  .meta({ description: "Elements between named nodes, and the two nodes to measure between." });

export type NetworkRequest = z.infer<typeof networkRequestSchema>;

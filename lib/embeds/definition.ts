import { z } from "zod";
import { distributionSchema, FEWEST_TRIALS, gradedSchema, terminalSchema } from "@/lib/engine";
import { LARGEST_QUOTA } from "../limits/quota";
import { LANGUAGES } from "./language";

/** No control characters: what is shown in a line stays in it. */
const line = (longest: number) =>
  z
    .string()
    .trim()
    .max(longest)
    .regex(/^\P{Cc}*$/u, "must be one line");

const quantity = line(120).min(1);
/** Of a dimension, a member of the medium or of the operating point, as the query form of the API names them. */
const inputName = z.string().regex(/^[A-Za-z][A-Za-z0-9]{0,40}(?:\.[A-Za-z][A-Za-z0-9]{0,40})?$/);

/** How a widget treats one input. Texts are the API's spelling of a quantity: "0.25 mm", also where it starts. */
export const inputRule = z
  .discriminatedUnion("mode", [
    z.strictObject({ mode: z.literal("fixed"), value: quantity, label: line(60).optional() }),
    z.strictObject({ mode: z.literal("hidden"), value: quantity }),
    z.strictObject({
      mode: z.literal("open"),
      value: quantity,
      label: line(60).optional(),
      help: line(200).optional(),
      min: quantity.optional(),
      max: quantity.optional(),
      choices: z
        .array(z.strictObject({ value: quantity, label: line(60).optional() }))
        .min(1)
        .max(50)
        .optional(),
    }),
  ])
  .meta({
    description: "Fixed and shown, fixed and not shown, or open: at will, within a range, or a list.",
  });

export type InputRule = z.infer<typeof inputRule>;

/** One call of a widget costs one computation, so it makes no more trials than one buys. */
export const MOST_WIDGET_TRIALS = 100_000;

/**
 * The tolerance of one input: ± a quantity or a share of the value, as the API spells them ("0.1 mm", "1 %"). Visitors
 * may change an open one within its limits, of which `min` is 0 if left out.
 */
export const toleranceRule = z.discriminatedUnion("mode", [
  z.strictObject({
    mode: z.literal("fixed"),
    value: quantity,
    distribution: distributionSchema.optional(),
  }),
  z.strictObject({
    mode: z.literal("open"),
    value: quantity,
    min: quantity.optional(),
    max: quantity.optional(),
    distribution: distributionSchema.optional(),
  }),
]);

export type ToleranceRule = z.infer<typeof toleranceRule>;

const tolerances = z.strictObject({
  uncertainty: z.discriminatedUnion("method", [
    z.strictObject({ method: z.literal("propagation") }),
    z.strictObject({ method: z.literal("worst-case") }),
    z.strictObject({
      method: z.literal("monte-carlo"),
      trials: z.int().min(FEWEST_TRIALS).max(MOST_WIDGET_TRIALS).optional(),
      seed: z.int().min(0).max(4_294_967_295).optional(),
    }),
  ]),
  /** Whether visitors see what each input contributes. */
  budget: z.boolean(),
  inputs: z
    .array(z.strictObject({ name: inputName, rule: toleranceRule }))
    .max(40)
    .superRefine(refuseTwins),
});

export type Tolerances = z.infer<typeof tolerances>;

/** What a version of a widget says: everything its visitors see and may change. */
export const embedDefinition = z
  .strictObject({
    shape: z.string().max(64).optional(),
    /** A stored outline of the team, in place of a shape. Stored outlines never change, so a version's never does. */
    outlineId: z.string().max(64).optional(),
    /** On the outline, in place of those that it was stored with. */
    terminals: z.array(terminalSchema).max(64).optional(),
    /** Width of the bracket on an outline over its value; 1e-4 if left out. */
    accuracy: z.number().min(1e-8).max(1e-2).optional(),
    title: line(100).min(1),
    intro: line(300).optional(),
    /** In the order in which they are shown. */
    inputs: z
      .array(z.strictObject({ name: inputName, rule: inputRule }))
      .max(40)
      .superRefine(refuseTwins),
    /** A graded medium is fixed as a whole. */
    graded: gradedSchema.optional(),
    requirement: z
      .strictObject({ min: quantity.optional(), max: quantity.optional() })
      .refine(({ min, max }) => min !== undefined || max !== undefined, "must have min, max or both.")
      .optional(),
    /** How far the resistance strays; left out where the widget does not ask. */
    tolerances: tolerances.optional(),
    show: z.strictObject({ drawing: z.boolean(), bounds: z.boolean(), plots: z.boolean() }),
    theme: z.enum(["host", "light", "dark"]),
    accent: z
      .string()
      .regex(/^#[0-9a-f]{6}$/, "must be a colour such as #9c4a1f")
      .optional(),
    density: z.enum(["comfortable", "compact"]),
    language: z.enum(["reader", ...LANGUAGES]),
  })
  .superRefine(({ shape, outlineId }, context) => {
    if ((shape === undefined) === (outlineId === undefined)) {
      context.addIssue({
        code: "custom",
        path: ["shape"],
        message: "must be given, or outlineId, and not both.",
      });
    }
  });

export type EmbedDefinition = z.infer<typeof embedDefinition>;

function refuseTwins(inputs: readonly { readonly name: string }[], context: z.RefinementCtx): void {
  inputs.forEach(({ name }, index) => {
    if (inputs.findIndex((other) => other.name === name) === index) return;
    context.addIssue({ code: "custom", path: [index, "name"], message: `is there twice: ${name}.` });
  });
}

/** An origin as browsers send it. */
export const hostOrigin = z
  .string()
  .max(200)
  .regex(
    /^https?:\/\/(?:[a-z0-9-]+(?:\.[a-z0-9-]+)*|\[[0-9a-f:]+\])(?::\d{1,5})?$/,
    "must be a scheme and a host in lower case, such as https://intranet.example",
  );

/** What counts at once, whatever version is shown. */
export const embedSettings = z.strictObject({
  name: line(100).min(1),
  origins: z.array(hostOrigin).max(50),
  monthQuota: z.int().min(0).max(LARGEST_QUOTA),
});

export const DEFAULT_EMBED_QUOTA = 10_000;

/** Reads what the database keeps. Throws where it is no definition: a defect, since only checked ones are written. */
export function storedDefinition(value: unknown): EmbedDefinition {
  return embedDefinition.parse(value);
}

import { z } from "zod";
import { gradedSchema } from "@/lib/engine";
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

/** What a version of a widget says: everything its visitors see and may change. */
export const embedDefinition = z.strictObject({
  shape: z.string().max(64),
  title: line(100).min(1),
  intro: line(300).optional(),
  /** In the order in which they are shown. */
  inputs: z
    .array(z.strictObject({ name: inputName, rule: inputRule }))
    .max(40)
    .superRefine((inputs, context) => {
      inputs.forEach(({ name }, index) => {
        if (inputs.findIndex((other) => other.name === name) === index) return;
        context.addIssue({ code: "custom", path: [index, "name"], message: `is there twice: ${name}.` });
      });
    }),
  /** A graded medium is fixed as a whole. */
  graded: gradedSchema.optional(),
  requirement: z
    .strictObject({ min: quantity.optional(), max: quantity.optional() })
    .refine(({ min, max }) => min !== undefined || max !== undefined, "must have min, max or both.")
    .optional(),
  show: z.strictObject({ drawing: z.boolean(), bounds: z.boolean(), plots: z.boolean() }),
  theme: z.enum(["host", "light", "dark"]),
  accent: z
    .string()
    .regex(/^#[0-9a-f]{6}$/, "must be a colour such as #9c4a1f")
    .optional(),
  density: z.enum(["comfortable", "compact"]),
  language: z.enum(["reader", ...LANGUAGES]),
});

export type EmbedDefinition = z.infer<typeof embedDefinition>;

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

import type { z } from "zod";
import { Refusal } from "@/lib/service/refusal";
import { unknownMember } from "@/lib/engine";
import { parameterComplaints } from "./issues";

/** Parameters that the dispatcher reads itself. */
const RESERVED = new Set(["key", "format"]);

/** The query by name, without what the dispatcher reads. Refuses a name that is given twice. */
export function queryObject(query: URLSearchParams): Record<string, string> {
  const values = new Map<string, string>();
  for (const [name, value] of query) {
    if (RESERVED.has(name)) continue;
    if (values.has(name)) throw parameterRefusal([{ parameter: name, detail: "is given more than once." }]);
    values.set(name, value);
  }
  return Object.fromEntries(values);
}

/** Checks the query; a schema that is left out admits no parameter. */
export function parseParameters(
  schema: z.ZodObject | undefined,
  query: URLSearchParams,
): Record<string, unknown> {
  const given = queryObject(query);
  if (!schema) {
    const names = Object.keys(given);
    if (names.length === 0) return {};
    throw parameterRefusal(names.map((parameter) => ({ parameter, detail: unknownMember(parameter, []) })));
  }
  const parsed = schema.safeParse(given, { reportInput: true });
  if (parsed.success) return parsed.data;
  throw parameterRefusal(parameterComplaints(schema, parsed.error.issues));
}

/** Checks the parts of the path: one that cannot be an id names nothing that exists. */
export function parsePathParameters(
  schema: z.ZodObject | undefined,
  path: Readonly<Record<string, string>>,
): Record<string, unknown> {
  const parsed = schema?.safeParse(path);
  if (!parsed) return {};
  if (parsed.success) return parsed.data;
  throw new Refusal("not-found", "There is nothing under this id.");
}

export function parameterRefusal(errors: readonly { parameter: string; detail: string }[]): Refusal {
  const [first] = errors;
  const more = errors.length > 1 ? ` (and ${errors.length - 1} more)` : "";
  return new Refusal("invalid-input", `The parameter ${first.parameter} ${first.detail}${more}`, { errors });
}

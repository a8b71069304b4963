/** What a schema found wrong, in sentences that begin at their verb ("must be …", "is required"), each with its place. */
import { z } from "zod";
import { pointerTo, type Problems } from "./failure";
import { nearestNames } from "./shape/nearest-names";

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];

/** So many unknown members are told; whoever sends more has sent something else. */
const MOST_UNKNOWN = 50;

export interface SchemaComplaint {
  readonly path: Path;
  readonly detail: string;
}

/**
 * One complaint a place. A missing member is pointed at by its own would-be path, an unknown one is told the nearest
 * names. Parse with `reportInput`.
 */
export function schemaComplaints(schema: z.ZodType, issues: readonly Issue[]): SchemaComplaint[] {
  return flatten(schema, issues, []);
}

/** The same as problems of a request, below the pointer `base`. */
export function addSchemaComplaints(
  schema: z.ZodType,
  issues: readonly Issue[],
  base: string,
  problems: Problems,
): void {
  for (const { path, detail } of flatten(schema, issues, [])) problems.add(pointerTo(base, ...path), detail);
}

const place = (path: Path) => JSON.stringify(path.map(String));

function flatten(schema: z.ZodType, issues: readonly Issue[], base: Path): SchemaComplaint[] {
  // What has the wrong type is not told its length as well.
  const mistyped = issues.filter(({ code }) => code === "invalid_type").map(({ path }) => place(path));
  return issues.flatMap((issue): SchemaComplaint[] => {
    const path = [...base, ...issue.path];
    if (issue.code === "unrecognized_keys") {
      const known = base.length === 0 ? membersAt(schema, path) : [];
      return issue.keys
        .slice(0, MOST_UNKNOWN)
        .map((key) => ({ path: [...path, key], detail: unknownMember(key, known) }));
    }
    // A union that has words of its own is told by them.
    const plain = issue.message === "Invalid input";
    if (issue.code === "invalid_union" && issue.errors.length > 0 && plain) {
      const wrong = discriminated(issue);
      return wrong
        ? [{ path: [...path, ...wrong.path], detail: wrong.detail }]
        : flatten(schema, closest(issue), path);
    }
    if (issue.code.startsWith("too_") && mistyped.includes(place(issue.path))) return [];
    return [{ path, detail: sentence(issue) }];
  });
}

/** Where every alternative of a union names itself by one member and none bears the name given: all the names. */
function discriminated(issue: Extract<Issue, { code: "invalid_union" }>): SchemaComplaint | undefined {
  const named = issue.errors.map((branch) => branch.find(({ code }) => code === "invalid_value"));
  const [first] = named;
  if (!first || issue.errors.length < 2) return undefined;
  const values: unknown[] = [];
  for (const entry of named) {
    if (entry?.code !== "invalid_value" || place(entry.path) !== place(first.path)) return undefined;
    values.push(...entry.values);
  }
  const names = [...new Set(values)].map((value) => JSON.stringify(value)).join(", ");
  return {
    path: first.path,
    detail: first.input === undefined ? "is required." : `must be one of ${names}.`,
  };
}

export function unknownMember(name: string, known: readonly string[]): string {
  const near = nearestNames(name, known);
  if (near.length > 0)
    return `is not known here. Did you mean ${near.map((entry) => `"${entry}"`).join(" or ")}?`;
  return known.length > 0 && known.length <= 12
    ? `is not known here; known are ${known.join(", ")}.`
    : "is not known here.";
}

/** Of the alternatives of a union, the complaints of the one that the input came nearest to. */
function closest(issue: Extract<Issue, { code: "invalid_union" }>): readonly Issue[] {
  const distance = (branch: readonly Issue[]) => {
    if (branch.some((entry) => entry.path.length === 0 && entry.code === "invalid_type")) return 1000;
    // An alternative that bears another name is not meant, however few members are wrong for it.
    return branch.length + (branch.some(({ code }) => code === "invalid_value") ? 500 : 0);
  };
  const [best] = [...issue.errors].sort((a, b) => distance(a) - distance(b));
  if (distance(best) < 1000) return best;
  const expected = issue.errors
    .flat()
    .flatMap((entry) => (entry.code === "invalid_type" ? [noun(entry.expected)] : []));
  const message =
    issue.input === undefined ? "is required." : `must be ${[...new Set(expected)].join(" or ")}.`;
  return [{ code: "custom", path: [], message, input: issue.input }];
}

/** Names of the members that the object at a path may have. */
function membersAt(schema: z.ZodType, path: Path): string[] {
  let here: z.core.$ZodType | undefined = schema;
  for (const part of path) {
    here = bare(here);
    if (here instanceof z.ZodObject) here = here.shape[String(part)];
    else if (here instanceof z.ZodArray) here = here.element;
    else if (here instanceof z.ZodRecord) here = here.valueType;
    else return [];
  }
  here = bare(here);
  return here instanceof z.ZodObject ? Object.keys(here.shape) : [];
}

function bare(schema: z.core.$ZodType | undefined): z.core.$ZodType | undefined {
  let here = schema;
  while (here instanceof z.ZodOptional || here instanceof z.ZodNullable || here instanceof z.ZodDefault) {
    here = here.unwrap();
  }
  return here;
}

function sentence(issue: Issue): string {
  switch (issue.code) {
    case "invalid_type":
      // Without `reportInput` the issue bears no input, and only its message tells that there was none.
      if (issue.input === undefined && issue.message.endsWith("received undefined")) return "is required.";
      if (issue.expected !== "number" || typeof issue.input !== "number")
        return `must be ${noun(issue.expected)}.`;
      return Number.isNaN(issue.input) ? "must be a number." : "must be a finite number.";
    case "invalid_value":
      if (issue.input === undefined) return "is required.";
      return `must be one of ${issue.values.map((value) => JSON.stringify(value)).join(", ")}.`;
    case "too_small":
      if (issue.minimum === 1 && issue.inclusive !== false && measure(issue.origin) !== "")
        return "must not be empty.";
      return `must ${issue.inclusive === false ? "be more than" : "be at least"} ${issue.minimum}${measure(issue.origin)}.`;
    case "too_big":
      return `must ${issue.inclusive === false ? "be less than" : "be at most"} ${issue.maximum}${measure(issue.origin)}.`;
    case "invalid_format":
      return issue.message.startsWith("Invalid") ? `must be ${format(issue.format)}.` : clause(issue.message);
    case "custom":
      return issue.message === "Invalid input" ? "cannot be used." : clause(issue.message);
    default:
      return clause(issue.message);
  }
}

function clause(message: string): string {
  const text = message.trim();
  return /[.!?]$/.test(text) ? text : `${text}.`;
}

function measure(origin: string): string {
  if (origin === "string") return " characters long";
  if (origin === "array" || origin === "set") return " entries long";
  return "";
}

function noun(expected: string): string {
  switch (expected) {
    case "array":
      return "an array";
    case "object":
    case "record":
      return "an object";
    case "int":
      return "a whole number";
    case "boolean":
      return "true or false";
    case "string":
      return "a text";
    default:
      return `a ${expected}`;
  }
}

function format(name: string): string {
  if (name === "datetime") return "a date and time such as 2030-01-01T00:00:00Z";
  return `a valid ${name}`;
}

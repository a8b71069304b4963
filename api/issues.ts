import { z } from "zod";
import { nearestNames } from "@/lib/engine";
import type { Complaint } from "@/lib/service/refusal";

type ParameterComplaint = Extract<Complaint, { parameter: string }>;

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];

/** A JSON pointer as a URI fragment (RFC 6901, section 6). */
export function pointer(path: Path): string {
  return ["#", ...path.map((part) => encodeURIComponent(escapePart(part)))].join("/");
}

const escapePart = (part: PropertyKey) => String(part).replaceAll("~", "~0").replaceAll("/", "~1");

/**
 * What a schema found wrong, each place with one sentence that begins at its verb ("must be …", "is required").
 * A missing member is pointed at by its own would-be pointer, an unknown one is told the nearest names.
 */
export function bodyComplaints(schema: z.ZodType, issues: readonly Issue[]): Complaint[] {
  return flatten(schema, issues, []).map(({ path, detail }) => ({ pointer: pointer(path), detail }));
}

/** The same for query or path parameters, which have a name only. */
export function parameterComplaints(schema: z.ZodType, issues: readonly Issue[]): ParameterComplaint[] {
  return flatten(schema, issues, []).map(({ path, detail }) => ({
    parameter: path.map(String).join("."),
    detail,
  }));
}

interface Found {
  readonly path: Path;
  readonly detail: string;
}

function flatten(schema: z.ZodType, issues: readonly Issue[], base: Path): Found[] {
  return issues.flatMap((issue): Found[] => {
    const path = [...base, ...issue.path];
    if (issue.code === "unrecognized_keys") {
      const known = membersAt(schema, issue.path);
      return issue.keys.map((key) => ({ path: [...path, key], detail: unknownMember(key, known) }));
    }
    if (issue.code === "invalid_union" && issue.errors.length > 0)
      return flatten(schema, closest(issue), path);
    return [{ path, detail: sentence(issue) }];
  });
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
  const distance = (branch: readonly Issue[]) =>
    branch.some((entry) => entry.path.length === 0 && entry.code === "invalid_type") ? 1000 : branch.length;
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
      if (issue.input === undefined) return "is required.";
      return issue.expected === "number" && typeof issue.input === "number"
        ? "must be a finite number."
        : `must be ${noun(issue.expected)}.`;
    case "invalid_value":
      if (issue.input === undefined) return "is required.";
      return `must be one of ${issue.values.map((value) => JSON.stringify(value)).join(", ")}.`;
    case "too_small":
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

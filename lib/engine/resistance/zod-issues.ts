/** What a schema of a resistance request found wrong, in sentences with pointers. */
import type { z } from "zod";
import { pointerTo, type Problems } from "../failure";

/** Members of a strict object are suggested by name; every zod issue becomes one sentence with its own pointer. */
export function addZodIssues(issues: readonly z.core.$ZodIssue[], base: string, problems: Problems): void {
  for (const issue of issues) {
    const pointer = pointerTo(base, ...issue.path);
    if (issue.code === "unrecognized_keys") {
      // So many are told; whoever sends more has sent something else.
      for (const key of issue.keys.slice(0, 50)) {
        problems.add(pointerTo(pointer, key), "is not a member known here.");
      }
    } else problems.add(pointer, sentence(issue));
  }
}

function sentence(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined && issue.message.includes("undefined")
        ? "is required."
        : `must be ${article(issue.expected)}.`;
    case "invalid_value":
      return `must be one of ${issue.values.map((value) => `"${String(value)}"`).join(", ")}.`;
    case "too_small":
      if (issue.minimum === 1 && (issue.origin === "string" || issue.origin === "array"))
        return "must not be empty.";
      return `must be at least ${String(issue.minimum)}${issue.origin === "string" ? " characters long" : issue.origin === "array" ? " entries long" : ""}.`;
    case "too_big":
      return `must be at most ${String(issue.maximum)}${issue.origin === "string" ? " characters long" : issue.origin === "array" ? " entries long" : ""}.`;
    default:
      return issue.message;
  }
}

function article(expected: string): string {
  if (expected === "array") return "an array";
  if (expected === "object" || expected === "record") return "an object";
  if (expected === "int") return "a whole number";
  return `a ${expected}`;
}

/** Expecting that a request is refused, with a pointer and a sentence. */
import { expect } from "vitest";
import { complaints } from "./compute";

/** One of the complaints must have that pointer and match the pattern. */
export function expectComplaint(request: unknown, pointer: string, pattern: RegExp): void {
  // Texts for people have thin spaces before their units.
  const found = complaints(request).map(({ pointer: at, detail }) => ({
    pointer: at,
    detail: detail.replaceAll("\u2009", " "),
  }));
  const match = found.find((problem) => problem.pointer === pointer && pattern.test(problem.detail));
  expect(match, JSON.stringify(found)).toBeDefined();
}

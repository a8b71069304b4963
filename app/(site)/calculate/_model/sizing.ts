/** The body of `POST /sizing` that a page's parameters stand for. */
import type { ShapeEntry } from "@/lib/engine";
import { dimensionGroups, type Parameters } from "./parameters";
import { requestBody } from "./request";

/** Null until a dimension and a target are given. */
export function sizingBody(
  entry: ShapeEntry,
  parameters: Parameters,
): Readonly<Record<string, unknown>> | null {
  const { solveFor } = parameters;
  const target = parameters.target?.trim();
  if (!solveFor || !target) return null;
  const { dimensions, ...rest } = requestBody(entry, parameters);
  const group = dimensionGroups(entry).find((names) => names.includes(solveFor)) ?? [solveFor];
  const others = Object.entries(dimensions).filter(([name]) => !group.includes(name));
  const [from, to] = [parameters.from?.trim() ?? "", parameters.to?.trim() ?? ""];
  return {
    ...rest,
    dimensions: Object.fromEntries(others),
    solveFor,
    target,
    // One end alone is asked as it is: the API then says at the other that it is missing.
    ...(from !== "" || to !== "" ? { within: [from, to] } : {}),
  };
}

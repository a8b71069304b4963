/** An element's tolerance as the fields of a calculation page have it: "element-3.plus" stands beside "element-3". */
import type { Parameters } from "../../calculate/_model/parameters";
import { type Given, given, tolerancedName } from "../../calculate/_model/tolerances";
import type { Network, Tolerance, Value } from "./network";

/** The parameters that stand for a tolerance. */
export function toleranceParameters(name: string, tolerance: Tolerance = {}): Parameters {
  return Object.fromEntries(Object.entries(tolerance).map(([member, text]) => [`${name}.${member}`, text]));
}

/** The tolerance after a change of those parameters; undefined once nothing is left of it. */
export function changedTolerance(
  name: string,
  tolerance: Tolerance | undefined,
  patch: Readonly<Record<string, string | undefined>>,
): Tolerance | undefined {
  const members = { ...toleranceParameters(name, tolerance), ...patch };
  const kept = Object.entries(members).flatMap(([key, text]) =>
    text !== undefined && key !== name && tolerancedName(key) === name
      ? [[key.slice(name.length + 1), text] as const]
      : [],
  );
  return kept.length > 0 ? Object.fromEntries(kept) : undefined;
}

/** A resistance as the API takes it, with its tolerance where it has one. */
export function givenResistance(text: string, tolerance: Tolerance | undefined): Given {
  return given(toleranceParameters("resistance", tolerance), "resistance", text);
}

/** Whether the link of a calculation brings tolerances along. */
export function bringsTolerance(value: Value): boolean {
  if (value.kind !== "shape") return false;
  const [, query = ""] = value.address.split("?", 2);
  return [...new URLSearchParams(query).keys()].some((name) => tolerancedName(name) !== name);
}

/** The member `uncertainty` of the body; none where tolerances are not evaluated. */
export function uncertaintyMember({ uncertainty }: Network): { readonly uncertainty?: object } {
  return uncertainty === "" ? {} : { uncertainty: { method: uncertainty } };
}

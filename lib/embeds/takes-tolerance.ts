import type { InputFacts } from "./inputs";

/** Whether the engine takes a tolerance on an input: on lengths, angles, numbers, members of the medium, temperature. */
export function takesTolerance({ type, place, name }: InputFacts): boolean {
  return type === "quantity" && (place !== "operating" || name === "temperature");
}

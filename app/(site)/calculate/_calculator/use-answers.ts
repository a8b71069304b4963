"use client";

import type { FirstAnswer } from "../_server/first-answer";
import { type Answer, useAnswer } from "./use-answer";

/**
 * One answer for each of one to four bodies. Hooks are called in a fixed number: a place without a body asks nothing.
 * @param first As the server found them, by place.
 */
export function useAnswers(
  bodies: readonly string[],
  first: readonly (FirstAnswer | null)[],
): readonly Answer[] {
  const a = useAnswer(bodies[0] ?? null, first[0] ?? null);
  const b = useAnswer(bodies[1] ?? null, first[1] ?? null);
  const c = useAnswer(bodies[2] ?? null, first[2] ?? null);
  const d = useAnswer(bodies[3] ?? null, first[3] ?? null);
  return [a, b, c, d].slice(0, bodies.length);
}

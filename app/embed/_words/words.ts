import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";

/** What a frame itself says. `{0}` and `{1}` are filled in. */
export interface Words {
  readonly resistance: string;
  readonly conductance: string;
  readonly proved: string;
  readonly notProved: string;
  readonly inputs: string;
  readonly fixed: string;
  readonly unitOf: string;
  readonly between: string;
  readonly atLeast: string;
  readonly atMost: string;
  readonly refused: string;
  readonly seeFields: string;
  readonly noAnswer: string;
  readonly met: string;
  readonly notMet: string;
  readonly undecided: string;
  readonly requirement: string;
  readonly cautions: string;
  readonly disclaimer: string;
  readonly service: string;
  readonly reset: string;
  readonly again: string;
  readonly quotaTitle: string;
  readonly quotaText: string;
  readonly pauseTitle: string;
  readonly pauseText: string;
  readonly awayTitle: string;
  readonly awayText: string;
  readonly goneTitle: string;
  readonly goneText: string;
  readonly staleTitle: string;
  readonly staleText: string;
  readonly noScript: string;
  readonly preview: string;
  readonly high: string;
  readonly low: string;
  readonly notToScale: string;
  readonly drawing: string;
  readonly dimensions: string;
  readonly potential: string;
  readonly field: string;
  readonly currentDensity: string;
  readonly atOneVolt: string;
  /** Of a stored outline: its size, and the names of its terminals. */
  readonly outlineOf: string;
  readonly solving: string;
  readonly limited: string;
  readonly noSolution: string;
  readonly fieldPicture: string;
  /** Where the bounds come from. */
  readonly basis: Readonly<Record<ResistanceResult["resistance"]["boundsBasis"], string>>;
  readonly metTolerances: string;
  readonly notMetTolerances: string;
  readonly undecidedTolerances: string;
  readonly tolerance: string;
  readonly withTolerances: string;
  readonly propagation: string;
  readonly worstCase: string;
  readonly monteCarlo: string;
  readonly budget: string;
  readonly share: string;
  readonly shareOfRange: string;
  readonly ofInput: string;
  readonly notShown: string;
  readonly stated: string;
  readonly standard: string;
  readonly noTolerance: string;
  readonly readOff: string;
  readonly noPosition: string;
}

/** A text with its places filled in. */
export function filled(text: string, ...parts: readonly string[]): string {
  return text.replace(/\{(\d)\}/g, (_, place: string) => parts[Number(place)] ?? "");
}

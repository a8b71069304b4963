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
  readonly potential: string;
  readonly field: string;
  readonly currentDensity: string;
  readonly atOneVolt: string;
  /** Names of common inputs, by what the catalogue calls them. */
  readonly names: Readonly<Record<string, string>>;
}

/** A text with its places filled in. */
export function filled(text: string, ...parts: readonly string[]): string {
  return text.replace(/\{(\d)\}/g, (_, place: string) => parts[Number(place)] ?? "");
}

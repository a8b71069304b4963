import { readQuantity } from "@/lib/engine";
import type { EmbedDefinition, ToleranceRule } from "./definition";
import { sizeOf, type InputFacts } from "./inputs";

/** What a widget's page calls the tolerance of an input among the values that it sends. */
export function toleranceName(input: string): string {
  return `${input}.tolerance`;
}

export interface OpenTolerance {
  readonly name: string;
  readonly rule: Extract<ToleranceRule, { mode: "open" }>;
}

/** The tolerances that visitors may change, by their inputs' names. */
export function openTolerances({ tolerances }: EmbedDefinition): readonly OpenTolerance[] {
  return (tolerances?.inputs ?? []).flatMap(({ name, rule }) =>
    rule.mode === "open" ? [{ name, rule }] : [],
  );
}

/** How a tolerance of that input reads, in the base unit of its kind; `about` is the value that it belongs to. */
type Reading = { readonly ok: true; readonly size: number } | { readonly ok: false; readonly detail: string };

const SHARE = /^([+\-−]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)\s*%$/;
const NEGATIVE = "must be 0 or greater: it is a distance from the value.";

/**
 * Reads a tolerance as the engine will.
 * @param about The value that it is a tolerance of; a share of one that cannot be read has no size.
 */
export function readTolerance(text: string, about: string, input: InputFacts): Reading {
  const share = SHARE.exec(text.trim());
  if (share && input.kind !== "temperature") {
    const percent = Number(share[1].replace("−", "-"));
    if (percent < 0) return { ok: false, detail: NEGATIVE };
    return { ok: true, size: (percent / 100) * Math.abs(sizeOf(about, input) ?? NaN) };
  }
  if (share) return { ok: false, detail: 'must be a difference such as "2 K".' };
  if (input.kind === null) return { ok: false, detail: "belongs to an input that takes none." };
  const reading = readQuantity(text, input.kind === "temperature" ? "temperatureDifference" : input.kind);
  if (!reading.ok) return { ok: false, detail: reading.detail };
  return reading.value >= 0 ? { ok: true, size: reading.value } : { ok: false, detail: NEGATIVE };
}

/** Why the definition does not allow a tolerance; undefined where it does. */
export function toleranceRefusal(
  text: string,
  about: string,
  rule: ToleranceRule,
  input: InputFacts,
): string | undefined {
  const given = readTolerance(text, about, input);
  if (!given.ok) return given.detail;
  if (rule.mode === "fixed") return undefined;
  const [min, max] = [rule.min, rule.max].map((limit) => {
    const reading = limit === undefined ? undefined : readTolerance(limit, about, input);
    return reading?.ok ? reading.size : undefined;
  });
  // What has no size, since its value has none, is refused with that value.
  const low = min !== undefined && given.size < min;
  const high = max !== undefined && given.size > max * (1 + SLACK);
  if (!low && !high) return undefined;
  if (rule.min === undefined) return `must be at most ${rule.max}.`;
  if (rule.max === undefined) return `must be at least ${rule.min}.`;
  return `must lie between ${rule.min} and ${rule.max}.`;
}

/** "1 %" of a length and the same length written out are two roundings of one number. */
const SLACK = 1e-12;

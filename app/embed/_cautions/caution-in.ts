import { filled } from "../_words/words";

/** Cautions by the engine's English; `{0}`, `{1}`, … stand for what an answer fills in. */
export type CautionTexts = Readonly<Record<string, string>>;

interface Said {
  readonly text: string;
  /** Whether it is still the engine's English. */
  readonly english: boolean;
}

/**
 * A caution of an answer in the frame's language, as far as `texts` know it. What an answer fills in is looked up once
 * more, since a material's caution ends with a sentence of its own.
 */
export function cautionIn(texts: CautionTexts, caution: string): Said {
  const exact = texts[caution];
  if (exact !== undefined) return { text: exact, english: false };
  for (const [english, text] of Object.entries(texts)) {
    if (!english.includes("{0}")) continue;
    const found = patternOf(english).exec(caution);
    if (!found) continue;
    const parts = found.slice(1).map((part) => (part.includes(" ") ? cautionIn(texts, part).text : part));
    return { text: filled(text, ...parts), english: false };
  }
  return { text: caution, english: true };
}

function patternOf(english: string): RegExp {
  const parts = english.split(/\{\d\}/).map((part) => part.replace(/[.*+?^${}()|[\]\\]/g, "\\$&"));
  return new RegExp(`^${parts.join("(.+?)")}$`);
}

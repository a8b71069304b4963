import "server-only";
import type { Language } from "@/lib/embeds/language";
import { catalogue } from "@/lib/engine";
import type { CautionTexts } from "./caution-in";
import { de } from "./de";
import { es } from "./es";
import { fr } from "./fr";
import { ja } from "./ja";
import { sv } from "./sv";

const ALL: Readonly<Record<Language, CautionTexts>> = { en: {}, de, fr, es, sv, ja };
const OF_SHAPES = new Set(catalogue.flatMap(({ cautions }) => cautions));

/** The cautions that a widget can show, in the frame's language: its own, and whatever an answer may add. */
export function cautionTexts(language: Language, own: readonly string[]): CautionTexts {
  return Object.fromEntries(
    Object.entries(ALL[language]).filter(([caution]) => own.includes(caution) || !OF_SHAPES.has(caution)),
  );
}

import "server-only";
import type { Language } from "@/lib/embeds/language";
import { de } from "./de";
import { en } from "./en";
import { es } from "./es";
import { fr } from "./fr";
import { ja } from "./ja";
import { sv } from "./sv";
import type { Words } from "./words";

const ALL: Readonly<Record<Language, Words>> = { en, de, fr, es, sv, ja };

/** The words of one language; only these travel to the frame. */
export function wordsOf(language: Language): Words {
  return ALL[language];
}

import "server-only";
import type { Language } from "@/lib/embeds/language";
import { de } from "./de";
import { es } from "./es";
import { fr } from "./fr";
import { ja } from "./ja";
import type { Labels } from "./labels";
import { sv } from "./sv";

const ALL: Readonly<Record<Language, Labels>> = { en: {}, de, fr, es, sv, ja };

/**
 * A label of the catalogue in the frame's language. A member of one of two media, "Resistivity, core", is put together
 * from both parts.
 */
export function labelIn(language: Language, label: string): string {
  const labels = ALL[language];
  if (Object.hasOwn(labels, label)) return labels[label];
  const parts = label.split(", ");
  const known = parts.length === 2 && parts.every((part) => Object.hasOwn(labels, part));
  return known ? parts.map((part) => labels[part]).join(language === "ja" ? "、" : ", ") : label;
}

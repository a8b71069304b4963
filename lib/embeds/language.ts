/** Languages of a widget's own words, of the catalogue's labels and its cautions. What a team wrote stays as it is. */
export const LANGUAGES = ["en", "de", "fr", "es", "sv", "ja"] as const;

export type Language = (typeof LANGUAGES)[number];

export interface Speech {
  readonly language: Language;
  /** BCP 47, for numbers: the reader's own region where the language is theirs, "de-CH". */
  readonly locale: string;
}

const TAG = /^[A-Za-z]{2,3}(?:-[A-Za-z0-9]{2,8}){0,3}$/;

/**
 * The language and the locale in which a widget speaks.
 * @param chosen What the widget's team chose; `reader` follows the page around it, then the reader's browser.
 * @param page Language that the page around it asks for, a BCP 47 tag.
 * @param accepted The browser's Accept-Language.
 */
export function speechOf(
  chosen: Language | "reader",
  page: string | undefined,
  accepted: string | null,
): Speech {
  const tags = [page ?? "", ...acceptedTags(accepted ?? "")].filter(knownTag);
  if (chosen === "reader") {
    const tag = tags.find((candidate) => languageOf(candidate) !== undefined);
    return tag === undefined
      ? { language: "en", locale: "en" }
      : { language: languageOf(tag) ?? "en", locale: tag };
  }
  return { language: chosen, locale: tags.find((tag) => languageOf(tag) === chosen) ?? chosen };
}

function languageOf(tag: string): Language | undefined {
  const primary = tag.split("-")[0].toLowerCase();
  return LANGUAGES.find((language) => language === primary);
}

/** Whether numbers can be written by that tag; a hostile one is no reason to fail. */
function knownTag(tag: string): boolean {
  if (!TAG.test(tag)) return false;
  try {
    return Intl.NumberFormat.supportedLocalesOf(tag).length > 0;
  } catch {
    return false;
  }
}

/** Tags of an Accept-Language header, the preferred one first (RFC 9110, 12.5.4). */
function acceptedTags(header: string): string[] {
  return header
    .slice(0, 500)
    .split(",")
    .map((part, place) => {
      const [tag, ...parameters] = part.split(";").map((text) => text.trim());
      const quality = parameters.map((text) => /^q=([\d.]+)$/.exec(text)?.[1]).find((text) => text);
      return { tag, quality: quality === undefined ? 1 : Number(quality), place };
    })
    .filter(({ quality }) => quality > 0)
    .sort((a, b) => b.quality - a.quality || a.place - b.place)
    .map(({ tag }) => tag);
}

/**
 * A text of the API ("1.2345 mΩ", "×10⁻³") with its numbers written as the locale does: the digits stay as they are,
 * so that nothing is rounded twice.
 */
export function localNumbers(text: string, locale: string): string {
  const mark = decimalMark(locale);
  return mark === "." ? text : text.replace(/(\d)\.(?=\d)/g, `$1${mark}`);
}

function decimalMark(locale: string): string {
  const part = new Intl.NumberFormat(locale, { numberingSystem: "latn" })
    .formatToParts(1.5)
    .find(({ type }) => type === "decimal");
  return part?.value ?? ".";
}

const SIGNS: readonly (readonly [RegExp, string])[] = [
  [/\b([pnumkMGT]?)ohm\b/g, "$1Ω"],
  [/\bu(?=[mΩAVWSs])/g, "µ"],
  [/\bdegC\b/g, "°C"],
  [/\bdegF\b/g, "°F"],
  [/ ?\bdeg\b/g, "°"],
  [/\^2/g, "²"],
  [/\^3/g, "³"],
];

/** A quantity as the definition has it ("0.25 mm", "60 degC") for people. */
export function shownQuantity(text: string, locale: string): string {
  return localNumbers(
    SIGNS.reduce((line, [pattern, sign]) => line.replace(pattern, sign), text),
    locale,
  );
}

/** A share, 0 … 1, in per cent with up to three digits: "95 %", "12.3 %". */
export function localShare(share: number, locale: string): string {
  return new Intl.NumberFormat(locale, { style: "percent", maximumSignificantDigits: 3 }).format(share);
}

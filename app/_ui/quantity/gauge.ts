/**
 * Diameter of a wire gauge in millimetres: ASTM B258, d = 0.005 in · 92^((36 − n)/39), 1/0 to 4/0 being n = 0 to −3.
 * @param text "AWG 24", "24 AWG", "AWG 4/0"
 * @returns null where the text is no gauge.
 */
export function gaugeMm(text: string): number | null {
  const found = /^(?:AWG\s*(\d{1,2}|[1-4]\/0)|(\d{1,2}|[1-4]\/0)\s*AWG)$/i.exec(text.trim());
  const size = found?.[1] ?? found?.[2];
  if (size === undefined) return null;
  const number = size.endsWith("/0") ? 1 - Number(size[0]) : Number(size);
  return 0.127 * Math.pow(92, (36 - number) / 39);
}

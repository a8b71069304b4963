import "server-only";
import { formatQuantity, type resolveDimensions, type Shape, type ShapeEntry } from "@/lib/engine";

interface DimensionTexts {
  readonly labels: Readonly<Record<string, { readonly symbol: string; readonly value: string }>>;
  readonly values: Readonly<Record<string, number>>;
}

/**
 * Values of all dimensions, given or derived, radius and diameter twins too, and what to write on the drawing: what
 * the reader typed where they typed it, else the value with four digits.
 */
export function dimensionTexts(
  shape: Shape,
  entry: ShapeEntry,
  resolved: ReturnType<typeof resolveDimensions>,
  given: Readonly<Record<string, unknown>>,
): DimensionTexts {
  const labels: Record<string, { symbol: string; value: string }> = {};
  const values: Record<string, number> = {};
  for (const [name, dimension] of Object.entries(shape.dimensions)) {
    const value = resolved[name];
    if (typeof value !== "number") continue;
    const { symbol } = dimension;
    if (dimension.type !== "quantity") {
      values[name] = value;
      labels[name] = { symbol, value: String(value) };
      continue;
    }
    const shown = dimension.kind === "angle" ? (value / Math.PI) * 180 : value;
    values[name] = shown;
    labels[name] = { symbol, value: typedText(given[name]) ?? valueText(shown, dimension.kind) };
    if (dimension.diameter) values[dimension.diameter] = shown * 2;
    if (dimension.radius) values[dimension.radius] = shown / 2;
    const twin = dimension.diameter ?? dimension.radius;
    const twinEntry = entry.dimensions.find((other) => other.name === twin);
    const twinText = twin === undefined ? null : typedText(given[twin]);
    // A drawing says what the drawing office said: a diameter where a diameter was given.
    if (twinEntry && twinText) labels[name] = { symbol: twinEntry.symbol, value: twinText };
  }
  return { labels, values };
}

const UNIT_SIGNS: readonly (readonly [RegExp, string])[] = [
  [/\bu(?=m\b)/, "µ"],
  [/\^2\b/, "²"],
  [/ ?deg\b/, "°"],
  [/\bohm\b/, "Ω"],
];

/** What was typed, with its unit as people write it; null where it was a bare number, or nothing. */
function typedText(given: unknown): string | null {
  if (typeof given !== "string" || !/[A-Za-z°"]/.test(given.replace(/\d[eE][+-]?\d/, ""))) return null;
  const text = UNIT_SIGNS.reduce((line, [pattern, sign]) => line.replace(pattern, sign), given.trim());
  return text.length <= 16 ? text : null;
}

function valueText(value: number, kind: "length" | "area" | "angle"): string {
  if (kind === "length") return formatQuantity(value, "metre", { digits: 4 });
  if (kind === "angle") return formatQuantity(value, "degree", { digits: 4 });
  const small = Math.abs(value) < 1e-2;
  return small
    ? formatQuantity(value * 1e6, "m^2", { digits: 4 }).replace("m²", "mm²")
    : formatQuantity(value, "m^2", { digits: 4 });
}

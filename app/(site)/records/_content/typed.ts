/** Quantities of a request as people read them: as they were typed, and in SI. */
import { formatQuantity, type QuantityKindName, readQuantity, type TextUnit } from "@/lib/engine";

const SI_UNITS: Partial<Record<QuantityKindName, TextUnit>> = {
  length: "metre",
  area: "m^2",
  angle: "degree",
  temperature: "degC",
  voltage: "volt",
  current: "ampere",
  power: "watt",
  resistance: "ohm",
  resistivity: "ohm m",
  conductivity: "S/m",
  sheetResistance: "ohm/sq",
};

/** Units that a bare number is in. */
const BARE: Partial<Record<QuantityKindName, string>> = {
  length: "m",
  area: "m²",
  angle: "°",
  temperature: "°C",
  temperatureDifference: "K",
  temperatureCoefficient: "1/K",
  voltage: "V",
  current: "A",
  power: "W",
  resistance: "Ω",
  resistivity: "Ω·m",
  conductivity: "S/m",
  sheetResistance: "Ω/□",
};

/** A quantity as it was typed; a bare number gets the unit that it stands in. */
export function typedText(given: unknown, kind?: QuantityKindName): string {
  if (typeof given === "number") return withUnit(String(given), kind && BARE[kind]);
  if (typeof given === "string") {
    const bare = given.trim() !== "" && Number.isFinite(Number(given));
    return bare ? withUnit(given.trim(), kind && BARE[kind]) : given;
  }
  if (given === null || typeof given !== "object") return String(given);
  return tolerancedText(given, kind);
}

function withUnit(text: string, unit: string | undefined): string {
  if (unit === undefined || unit === "") return text;
  return unit === "°" ? `${text}°` : `${text}\u2009${unit}`;
}

function tolerancedText(given: object, kind?: QuantityKindName): string {
  if (!("value" in given)) return JSON.stringify(given);
  const { value, tolerance, plus, minus, distribution } = given as Record<string, unknown>;
  // Temperatures differ by kelvins, whatever the unit of the value.
  const difference = kind === "temperature" ? "temperatureDifference" : kind;
  const spread =
    tolerance !== undefined
      ? `± ${typedText(tolerance, difference)}`
      : `+ ${typedText(plus ?? 0, difference)}, − ${typedText(minus ?? 0, difference)}`;
  const law = typeof distribution === "string" ? `, ${distribution}` : "";
  return `${typedText(value, kind)} ${spread}${law}`;
}

/** The nominal value of a quantity with or without a tolerance. */
export function nominal(given: unknown): unknown {
  return given !== null && typeof given === "object" && "value" in given ? given.value : given;
}

/** The value in SI with its unit (angles in radians beside it are not needed: a drawing says degrees); "" if unread. */
export function siText(given: unknown, kind: QuantityKindName): string {
  const value = nominal(given);
  if (typeof value !== "number" && typeof value !== "string") return "";
  const reading = readQuantity(value, kind);
  if (!reading.ok) return "";
  return siNumber(kind === "angle" ? (reading.value / Math.PI) * 180 : reading.value, kind);
}

/** An SI number with its unit, without prefix: what a program takes. */
export function siNumber(value: number, kind: QuantityKindName): string {
  const unit = SI_UNITS[kind];
  if (unit === "degree") return formatQuantity(value, unit, { digits: 12 });
  const text = plainNumber(value);
  return withUnit(text, BARE[kind]);
}

/** A number with up to twelve digits, a power of ten where it is long. */
export function plainNumber(value: number): string {
  const rounded = Number(value.toPrecision(12));
  const size = Math.abs(rounded);
  if (size === 0 || (size >= 1e-3 && size < 1e6)) return String(rounded).replace("-", "−");
  const [mantissa, exponent] = rounded.toExponential().split("e");
  const power = [...String(Number(exponent))]
    .map((c) => (c === "-" ? "⁻" : "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(c)]))
    .join("");
  return `${mantissa.replace("-", "−")}×10${power}`;
}

/** A camelCase name as words: "temperatureCoefficient" is "Temperature coefficient". */
export function words(name: string): string {
  const spaced = name.replace(
    /([a-z])([A-Z])/g,
    (_, before: string, next: string) => `${before} ${next.toLowerCase()}`,
  );
  return spaced.charAt(0).toUpperCase() + spaced.slice(1).replaceAll("-", " ");
}
